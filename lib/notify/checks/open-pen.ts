import { tidy } from "@/lib/calc/exact";
import type { IsoDate } from "@/lib/calc/parameter";
import type { OpenPenResult } from "@/lib/notify/assessment";
import type { JobFacts } from "@/lib/notify/job";
import { gravity, type Reason } from "@/lib/notify/result";
import { assessDemand } from "./demand";
import { threePhaseBalance } from "./open-pen/balance";
import { earthDevice, equivalentDevice, windowDevice } from "./open-pen/device";
import { installationElectrode } from "./open-pen/electrode";
import {
  methodName,
  type Finding,
  type Method,
  type MethodRule,
  type OpenPenCase,
  type OpenPenRules,
} from "./open-pen/finding";
import { indoorUse, privateTnS, separation } from "./open-pen/outside-the-rule";
import { caravanRule, highwayRule, methodRule, placeChecks, separationPhotoRule } from "./open-pen/places";
import { ttEarth } from "./open-pen/tt";
import { cannotTell, inForce, judge, met, outOfForce } from "./rule";

const methods: Record<Method, MethodRule> = {
  "three-phase-balance": threePhaseBalance,
  "installation-electrode": installationElectrode,
  "cpc-earth-70V-device": earthDevice,
  "line-neutral-window-device": windowDevice,
  "equivalent-device": equivalentDevice,
  tt: ttEarth,
  separation,
  indoor: indoorUse,
  "private-tn-s": privateTnS,
};

export const openPenRules = [
  methodRule,
  ...Object.values(methods).map(({ about }) => about),
  caravanRule,
  highwayRule,
  separationPhotoRule,
];

/**
 * The open-PEN measure of each chargepoint. `rules` carries the operator's own distance between buried metalwork,
 * null when the firm has not set it. `on` is the day whose wiring standard applies. Results: the worst outcome first.
 */
export function assessOpenPen(
  job: JobFacts,
  on: IsoDate,
  rules: OpenPenRules,
): { results: OpenPenResult[]; checks: Reason[] } {
  let unlimited: { amps: number | null } | null = null;
  const unlimitedA = () => (unlimited ??= { amps: assessDemand(job, on).unlimitedWorstA }).amps;
  const judged = job.chargepoints.map((unit) => judgeUnit({ job, unit, on, rules, unlimitedA }));
  const results = judged.map(({ result }) => result).sort((a, b) => gravity(a.outcome) - gravity(b.outcome));
  return { results, checks: judged.flatMap(({ checks }) => checks) };
}

function judgeUnit(given: OpenPenCase): { result: OpenPenResult; checks: Reason[] } {
  const { job, unit, on } = given;
  const { method } = unit.openPen;
  const places = placeChecks(job, unit, on);
  if (method === null) {
    const reason = judge(methodRule, unit.id, on, () =>
      cannotTell("No measure against an open PEN is recorded for this unit."),
    );
    return { result: resultOf(unit.id, null, reason, {}, places), checks: [reason, ...places] };
  }
  const chosen = methods[method];
  const finding: Finding = inForce(() => chosen.find(given)) ?? { answer: cannotTell(outOfForce(on)) };
  const named = judge(methodRule, unit.id, on, () =>
    met(`The measure recorded is ${methodName[method]}.`, { used: { method }, recorded: methodName[method] }),
  );
  const reason = judge(chosen.about, unit.id, on, () => finding.answer);
  return { result: resultOf(unit.id, method, reason, finding, places), checks: [named, reason, ...places] };
}

const tidyOrNull = (value: number | null | undefined) => (value === null || value === undefined ? null : tidy(value));

/** The method's own answer, held back by what the place says. */
function resultOf(
  chargepoint: string,
  method: Method | null,
  reason: Reason,
  finding: Omit<Finding, "answer">,
  places: readonly Reason[],
): OpenPenResult {
  const barred = places.find(({ rule, outcome }) => rule === caravanRule.id && outcome !== "met");
  const held = reason.outcome === "met" ? places.find(({ rule }) => rule === highwayRule.id) : undefined;
  const deciding = barred ?? held ?? reason;
  return {
    chargepoint,
    outcome: deciding.outcome,
    method,
    because: deciding.because,
    touchVoltageV: tidyOrNull(finding.touchVoltageV),
    electrodeMaxOhm: tidyOrNull(finding.electrodeMaxOhm),
    imbalanceA: tidyOrNull(finding.imbalanceA),
    residualRisk: finding.residualRisk ?? null,
    workings: [...reason.workings],
    sources: [...deciding.sources],
  };
}
