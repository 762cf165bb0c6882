import type { IsoDate } from "@/lib/calc/parameter";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import type { Reason } from "@/lib/notify/result";
import { hasPhoto } from "../facts";
import { cannotTell, judge, met, notApplicable, notMet, type Answer } from "../rule";
import { currentRule } from "./rules";

const secured = ["key", "tool", "installer-code"];

/**
 * Current a phase that demand counts for a chargepoint, amps: the configured one only when it is secured and
 * photographed, else the rated one; a setting above the rating is counted as set. Null when it is not known.
 */
export function countedA(job: JobFacts, unit: Chargepoint): number | null {
  const ratedA = knownNumber(unit.ratedA);
  const configuredA = knownNumber(unit.configuredA);
  if (configuredA !== null && isSecured(job, unit)) return configuredA;
  return ratedA === null ? null : Math.max(ratedA, configuredA ?? 0);
}

const isSecured = (job: JobFacts, unit: Chargepoint) =>
  secured.includes(unit.configurationSecuredBy ?? "none") && hasPhoto(job, "limit-setting", unit);

/** Says which current was counted for a unit, and why. */
export const currentCheck = (job: JobFacts, unit: Chargepoint, on: IsoDate): Reason =>
  judge(currentRule, unit.id, on, () => answer(job, unit));

function answer(job: JobFacts, unit: Chargepoint): Answer {
  const ratedA = knownNumber(unit.ratedA);
  const configuredA = knownNumber(unit.configuredA);
  const used = { ratedA, configuredA, securedBy: unit.configurationSecuredBy };
  const recorded = configuredA === null ? null : `${configuredA} A`;
  const rest = { used, recorded, limit: ratedA === null ? null : `${ratedA} A rated` };
  if (ratedA === null && countedA(job, unit) === null)
    return cannotTell("The rated current of the unit is not known, so no current can be counted.", rest);
  if (configuredA === null || configuredA === ratedA)
    return notApplicable(`The rated ${ratedA} A is counted; no lower setting is recorded.`, rest);
  if (ratedA !== null && configuredA > ratedA)
    return cannotTell(`The setting of ${configuredA} A is above the rated ${ratedA} A; one of them is misread.`, rest);
  if (isSecured(job, unit))
    return met(`The setting of ${configuredA} A is secured and photographed, so it is counted.`, rest);
  if (unit.configurationSecuredBy === "none")
    return notMet(`The setting of ${configuredA} A is not secured, so the rated ${ratedA} A is counted.`, rest);
  const lacks = secured.includes(unit.configurationSecuredBy ?? "") ? "has no photo" : "is not known to be secured";
  return cannotTell(`The setting of ${configuredA} A ${lacks}, so the rated ${ratedA} A is counted.`, rest);
}
