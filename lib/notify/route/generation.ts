import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import type { GenerationRoute, Missing } from "../assessment";
import type { JobFacts } from "../job";
import {
  combinedFormKw,
  generationPaths,
  kvaPerAmpere,
  phaseImbalanceA,
  type GenerationPath,
} from "../parameters/network";
import type { Reason } from "../result";
import { rule } from "../rule";
import { need } from "./finding";
import { generatingUnits, registeredPerPhaseA, type GeneratingUnit } from "./generating-units";

export type Generation = { route: GenerationRoute; reasons: Reason[]; missing: Missing[] };

export const dischargeKnown = rule({
  id: "generation.discharge",
  group: "generation",
  title: "What the chargepoint may discharge",
  reads: ["chargepoints[].discharge.kind", "evidence"],
  sources: ["ena-v2g-guidance", "EREC G99", "SI 2002/2665 reg 21"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

export const generationPath = rule({
  id: "generation.path",
  group: "generation",
  title: "Path for the generation",
  reads: ["chargepoints[].discharge", "demand.otherEquipment", "supply.phases", "site.territory"],
  sources: ["EREC G99 section 6.2.2", "EREC G98", "EREC G100"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const exportLimit = rule({
  id: "generation.export-limit",
  group: "generation",
  title: "Export limit of the path",
  reads: ["chargepoints[].discharge.exportLimitA", "demand.otherEquipment"],
  sources: ["EREC G99 section 6.2.2", "EREC G100"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

export const combinedForm = rule({
  id: "generation.combined-form",
  group: "generation",
  title: "Generation that may stand on the combined form",
  reads: ["chargepoints[].discharge.registeredA", "demand.otherEquipment", "supply.phases"],
  sources: ["ena-v2g-guidance"],
  outcomes: ["met", "not-met"],
});

export const imbalance = rule({
  id: "generation.phase-imbalance",
  group: "generation",
  title: "Generation balanced between phases",
  reads: ["chargepoints[].discharge.registeredA", "chargepoints[].phase", "demand.otherEquipment", "supply.phases"],
  sources: ["EREC G99 section 7.5"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** Each unit's discharge, in words; a bidirectional unit is never taken as load by default. */
function dischargeReasons(job: JobFacts): { reasons: Reason[]; missing: Missing[] } {
  const missing: Missing[] = [];
  const reasons = job.chargepoints.map((unit, index) => {
    const { kind } = unit.discharge;
    const detail = { of: unit.id, used: { discharge: kind } };
    const path = `chargepoints[${index}].discharge.kind`;
    if (kind === null || kind === "unknown") {
      missing.push(need(path, "whether the unit can discharge, and how"));
      return dischargeKnown.says("cannot-tell", `What chargepoint ${unit.id} may discharge is not known.`, detail);
    }
    if (kind === "none")
      return dischargeKnown.says("not-applicable", `Chargepoint ${unit.id} cannot discharge.`, detail);
    if (kind === "disabled") return disabled(job, unit.id, detail, missing);
    if (kind === "islanded")
      return dischargeKnown.says(
        "met",
        `Chargepoint ${unit.id} discharges only apart from the network: a switched alternative source, with its own earth and neutral link.`,
        detail,
      );
    return dischargeKnown.says(
      "met",
      `Chargepoint ${unit.id} may run in parallel with the network, so it is generation whether it exports or not.`,
      detail,
    );
  });
  return { reasons, missing };
}

function disabled(job: JobFacts, id: string, detail: { of: string; used: Reason["used"] }, missing: Missing[]): Reason {
  const shown = job.evidence.some(
    ({ subject, of }) =>
      subject === "discharge-setting" && (of === id || (of === null && job.chargepoints.length === 1)),
  );
  if (shown)
    return dischargeKnown.says(
      "met",
      `Chargepoint ${id} is set so that it cannot discharge, with a photo of the setting: load only.`,
      detail,
    );
  missing.push(need("evidence", `a photo of the setting that keeps chargepoint ${id} from discharging`));
  return dischargeKnown.says(
    "cannot-tell",
    `Chargepoint ${id} is recorded as kept from discharging, without a photo of the setting.`,
    detail,
  );
}

/** Decides the generation path of a job, with its reasons and what is missing for it. */
export function generationOf(job: JobFacts, on: IsoDate): Generation {
  const discharge = dischargeReasons(job);
  const units = generatingUnits(job);
  const isNewGeneration = units.some(({ isNew }) => isNew);
  if (discharge.missing.length && !isNewGeneration)
    return {
      route: "more-facts-needed",
      missing: discharge.missing,
      reasons: [
        ...discharge.reasons,
        generationPath.says(
          "cannot-tell",
          "Whether a generation paper is due cannot be told until the discharge is known.",
        ),
      ],
    };
  if (!isNewGeneration)
    return {
      route: "none",
      missing: [],
      reasons: [
        ...discharge.reasons,
        generationPath.says(
          "not-applicable",
          "No chargepoint runs in parallel with the network, so no generation paper is due.",
        ),
      ],
    };
  const path = pathOf(job, units, on);
  return {
    route: path.route,
    missing: [...discharge.missing, ...path.missing],
    reasons: [...discharge.reasons, ...path.reasons, ...sizeReasons(job, units, on)],
  };
}

function pathOf(job: JobFacts, units: readonly GeneratingUnit[], on: IsoDate): Generation {
  const phases = job.supply.phases ?? 1;
  const sumA = Math.max(...registeredPerPhaseA(units, phases));
  const used = {
    sumA,
    designA: units.map(({ designA }) => designA),
    registeredA: units.map(({ registeredA }) => registeredA),
    exportLimitA: units.map(({ exportLimitA }) => exportLimitA),
  };
  const detail = { used, recorded: `${sumA} A a phase registered`, workings: [sumLine(units, sumA)] };
  const fits = valueAt(generationPaths, on).filter((path) => isWithin(path, units, sumA));
  if (fits.length === 0)
    return full(
      `${sumA} A a phase registered, or a unit above the bounds, is beyond the fast paths: the full standard application.`,
      detail,
    );
  const missing = gaps(job, units);
  if (missing.length)
    return {
      route: "more-facts-needed",
      missing,
      reasons: [
        generationPath.says(
          "cannot-tell",
          "The path cannot be told until each unit’s capacity and type test are known.",
          detail,
        ),
      ],
    };
  if (job.site.territory === "northern-ireland" && fits[0]?.path !== "g98")
    return full(
      "Above 16 A a phase in Northern Ireland the full application of its own recommendation is made.",
      detail,
    );
  return choose(fits, units, sumA, detail);
}

type Detail = { used: Reason["used"]; recorded: string; workings: string[] };

const full = (because: string, detail: Detail): Generation => ({
  route: "full-application",
  missing: [],
  reasons: [generationPath.says("not-met", because, detail)],
});

const sumLine = (units: readonly GeneratingUnit[], sumA: number) =>
  `${units.map(({ id, registeredA }) => `${id} ${registeredA ?? "not known"}`).join(" + ")} = ${sumA} A on the fullest phase`;

/** Whether what is known stays inside the bounds; an unknown capacity does not yet break one. */
const isWithin = (path: GenerationPath, units: readonly GeneratingUnit[], sumA: number) =>
  units.every(
    ({ designA, registeredA }) =>
      (designA === null || designA <= path.unitDesignA) &&
      (registeredA === null || registeredA <= path.unitRegisteredA),
  ) && (path.sumIncluded ? sumA <= path.sumA : sumA < path.sumA);

function gaps(job: JobFacts, units: readonly GeneratingUnit[]): Missing[] {
  const missing: Missing[] = [];
  if (job.supply.phases === null) missing.push(need("supply.phases", "the number of phases of the supply"));
  for (const unit of units) {
    if (unit.registeredA === null)
      missing.push(need(`${unit.path}.registeredA`, `the registered capacity of ${unit.id}, A a phase`));
    if (unit.designA === null)
      missing.push(need(`${unit.path}.designA`, `the design capacity of ${unit.id}, A a phase`));
    if (unit.typeTest === null)
      missing.push(
        unit.isNew
          ? need(`${unit.path}.typeTestReference`, `the type-test reference of ${unit.id}`)
          : need(`${unit.path}.acceptance`, `the operator’s acceptance of the existing ${unit.id}`),
      );
  }
  return missing;
}

const waived = (path: GenerationPath, sumA: number) =>
  path.exportLimitA === null || (path.limitWaivedUpToA !== null && sumA <= path.limitWaivedUpToA);

/** The smallest export limit recorded on any unit, A; null when there is none. */
function limitOf(units: readonly GeneratingUnit[]): number | null {
  const limits = units.flatMap(({ exportLimitA }) => exportLimitA ?? []);
  return limits.length ? Math.min(...limits) : null;
}

function choose(
  fits: readonly GenerationPath[],
  units: readonly GeneratingUnit[],
  sumA: number,
  detail: Detail,
): Generation {
  const limitA = limitOf(units);
  const ready = fits.find((path) => waived(path, sumA) || (limitA !== null && limitA <= Number(path.exportLimitA)));
  const path = ready ?? (fits.at(-1) as GenerationPath);
  if (!ready && limitA !== null)
    return full(
      `An export limit of ${limitA} A is above the ${path.exportLimitA} A of the path: the full standard application.`,
      detail,
    );
  return {
    route: path.path,
    missing: ready
      ? []
      : [
          need(
            `${units[0]?.path}.exportLimitA`,
            `an export limit of at most ${path.exportLimitA} A, with its settings`,
          ),
        ],
    reasons: [generationPath.says("met", pathWords[path.path](sumA), detail), limitReason(path, sumA, limitA)],
  };
}

const pathWords: Record<GenerationPath["path"], (sumA: number) => string> = {
  g98: (sumA) => `${sumA} A a phase registered is within 16 A: fit, then send the installation form.`,
  "sgi-1": (sumA) =>
    `${sumA} A a phase registered, with hardware of up to 32 A: fit and commission, then send the notice.`,
  "sgi-2": (sumA) =>
    `${sumA} A a phase registered under an export limit of 16 A: apply, and install nothing before the answer.`,
  "sgi-3": (sumA) => `${sumA} A a phase registered: apply, and install nothing before the answer.`,
};

function limitReason(path: GenerationPath, sumA: number, limitA: number | null): Reason {
  const used = { exportLimitA: limitA, sumA };
  if (path.exportLimitA === null)
    return exportLimit.says("not-applicable", "The path needs no export limit.", { used });
  const limit = `≤ ${path.exportLimitA} A`;
  if (waived(path, sumA))
    return exportLimit.says(
      "not-applicable",
      `${sumA} A registered is not above ${path.limitWaivedUpToA} A, so no export limit is needed.`,
      { used },
    );
  return limitA === null
    ? exportLimit.says(
        "cannot-tell",
        `The path needs an export limit of ${path.exportLimitA} A and none is recorded.`,
        { used, limit },
      )
    : exportLimit.says("met", `An export limit of ${limitA} A is recorded.`, { used, recorded: `${limitA} A`, limit });
}

function sizeReasons(job: JobFacts, units: readonly GeneratingUnit[], on: IsoDate): Reason[] {
  const phases = job.supply.phases ?? 1;
  const perPhaseA = registeredPerPhaseA(units, phases);
  const kw = perPhaseA.reduce((total, each) => total + each, 0) * valueAt(kvaPerAmpere, on);
  const bounds = valueAt(combinedFormKw, on);
  const boundKw = { 1: bounds.singlePhase, 2: bounds.splitPhase, 3: bounds.threePhase }[phases];
  const detail = { used: { kw: Number(kw.toFixed(3)) }, recorded: `${kw.toFixed(2)} kW`, limit: `≤ ${boundKw} kW` };
  const form =
    kw <= boundKw
      ? combinedForm.says(
          "met",
          `${kw.toFixed(2)} kW of generation at the premises may stand on the combined form.`,
          detail,
        )
      : combinedForm.says(
          "not-met",
          `${kw.toFixed(2)} kW of generation at the premises is above ${boundKw} kW: the combined form does not serve.`,
          detail,
        );
  return [form, balance(units, perPhaseA, valueAt(phaseImbalanceA, on))];
}

function balance(units: readonly GeneratingUnit[], perPhaseA: readonly number[], boundA: number): Reason {
  if (perPhaseA.length < 3)
    return imbalance.says("not-applicable", "The supply is not three-phase.", { used: { phases: perPhaseA.length } });
  if (units.some(({ phases, phase }) => phases === 1 && phase === null))
    return imbalance.says("cannot-tell", "The phase of a single-phase unit is not recorded.", { used: { perPhaseA } });
  const spreadA = Math.max(...perPhaseA) - Math.min(...perPhaseA);
  const detail = { used: { perPhaseA, spreadA }, recorded: `${spreadA} A`, limit: `≤ ${boundA} A` };
  return spreadA <= boundA
    ? imbalance.says("met", `${spreadA} A between the highest and the lowest phase.`, detail)
    : imbalance.says("not-met", `${spreadA} A between the highest and the lowest phase is above ${boundA} A.`, detail);
}
