import { plain, tidy } from "@/lib/calc/exact";
import { kvaOf } from "@/lib/calc/kva";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import type { DemandResult, Missing } from "@/lib/notify/assessment";
import type { JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { demandAfter, type After } from "./demand/after";
import { currentCheck } from "./demand/counted-current";
import { evidenceCheck } from "./demand/evidence";
import { countedLimitA, limitCheck } from "./demand/load-limit";
import { replacedCheck } from "./demand/replaced";
import { otherEquipmentRule, perPhaseRule } from "./demand/rules";
import { unsettled } from "./demand/added";
import { cannotTell, inForce, judge, met, notApplicable, outOfForce } from "./rule";

export type DemandAssessment = {
  result: DemandResult;
  checks: Reason[];
  /** Whether the method is good enough to rest a notice on; also among `checks`. */
  evidence: Reason;
  /** Worst phase after the work, amps, unrounded; the worst case where a phase is not told; null without a bound. */
  worstAfterA: number | null;
  /** The least the worst phase can be, amps: above a limit it proves the limit passed, whatever is missing. */
  leastWorstAfterA: number | null;
  /** True when every figure, phase and piece of equipment behind the demand is told. */
  everyPhaseKnown: boolean;
  /** Most the worst phase can be at rated currents and without any load limit, amps: for electrodes. */
  unlimitedWorstA: number | null;
  /** Facts without which the demand cannot be told. */
  missing: Missing[];
};

/** Demand before and after the work, per phase, with its checks. `on` is the day whose wiring standard applies. */
export function assessDemand(job: JobFacts, on: IsoDate): DemandAssessment {
  const after = demandAfter(job, on);
  const evidence = evidenceCheck(job, on);
  const worstAfterA = after.afterA ? Math.max(...after.afterA) : after.mostA;
  return {
    result: resultOf(job, after, on),
    checks: [
      evidence,
      perPhaseCheck(job, after, on),
      ...job.chargepoints.map((unit) => currentCheck(job, unit, on)),
      limitCheck(job, on),
      otherEquipmentCheck(job, on),
      ...job.chargepoints.map((unit) => replacedCheck(job, unit, on)),
    ],
    evidence,
    worstAfterA,
    leastWorstAfterA: after.afterA ? worstAfterA : after.leastA,
    everyPhaseKnown: after.afterA !== null && after.missing.length === 0,
    unlimitedWorstA: after.unlimitedA,
    missing: after.missing,
  };
}

function resultOf(job: JobFacts, after: After, on: IsoDate): DemandResult {
  const { afterA } = after;
  const nominalV = inForce(() => valueAt(nominalVoltageV, on));
  const afterKva = afterA && nominalV !== null ? tidy(kvaOf(afterA, nominalV)) : null;
  const kvaLines =
    afterA && nominalV !== null
      ? [`${plain(nominalV / 1000)} kV × ${sumText(afterA)} = ${plain(kvaOf(afterA, nominalV))} kVA`]
      : [];
  return {
    existingA: after.existing.perPhaseA?.map(tidy) ?? null,
    afterA: afterA?.map(tidy) ?? null,
    afterKva,
    limitCounted: countedLimitA(job) !== null,
    withLimitA: after.withLimitA?.map(tidy) ?? null,
    workings: [...after.workings, ...kvaLines, ...(nominalV === null ? [outOfForce(on)] : [])],
  };
}

const sumText = (perPhaseA: readonly number[]) =>
  perPhaseA.length === 1 ? `${perPhaseA.map(plain).join("")} A` : `(${perPhaseA.map(plain).join(" + ")}) A`;

const perPhaseCheck = (job: JobFacts, after: After, on: IsoDate): Reason =>
  judge(perPhaseRule, null, on, () => {
    const used = {
      existingA: after.existing.perPhaseA?.map(tidy) ?? null,
      afterA: after.afterA?.map(tidy) ?? null,
      leastA: after.leastA,
      worstCaseA: after.mostA,
    };
    if (after.afterA === null || after.missing.length > 0)
      return cannotTell(`${perPhaseGap(after)}${worstCase(after)}`, { used, workings: after.workings });
    const figures = after.afterA.map(plain).join(", ");
    return met(`Demand after the work: ${figures} A${job.supply.phases === 1 ? "" : ", phase by phase"}.`, {
      used,
      recorded: `${figures} A`,
      workings: after.workings,
    });
  });

const perPhaseGap = ({ missing }: After) =>
  missing.length > 0
    ? `The demand after the work cannot be told. Needed: ${missing.map(({ needed }) => lowerFirst(needed)).join("; ")}.`
    : "The demand after the work cannot be told on this day.";

const worstCase = ({ afterA, mostA }: After) =>
  afterA === null && mostA !== null ? ` At worst one phase carries ${plain(mostA)} A.` : "";

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);

const otherEquipmentCheck = (job: JobFacts, on: IsoDate): Reason =>
  judge(otherEquipmentRule, null, on, () => {
    const listed = job.demand.otherEquipment;
    if (listed === null) return cannotTell("Whether other large equipment is on the supply is not recorded.");
    const used = { listed: listed.map(({ kind }) => kind), included: listed.map((item) => item.inExistingDemand) };
    if (listed.length === 0) return notApplicable("No other large equipment was found on the supply.", { used });
    const open = unsettled(job).length;
    if (open > 0)
      return cannotTell(
        `For ${open} of ${listed.length} items it is not recorded whether the demand before the work includes them.`,
        { used },
      );
    return met("Each item is in the demand before the work, is added to it, or draws nothing.", { used });
  });
