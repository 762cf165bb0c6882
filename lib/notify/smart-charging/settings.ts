import type { SmartChargingResult } from "../assessment";
import type { JobFacts } from "../job";
import { gravity, type Reason } from "../result";
import { defaultHoursCheck, firstUseCheck, overrideCheck, responseCheck } from "./default-hours";
import { designCheck } from "./design";
import { delayCheck, exceptionsCheck } from "./random-delay";
import { contentsCheck, registerCheck, saleCheck, statementCheck, technicalFileCheck } from "./sale-papers";
import { exclusionOf, scopeOf } from "./scope";
import { onSiteCheck, securityCheck } from "./security";
import { unitFacts, type UnitFacts } from "./unit-facts";

/** Duties in the order of the Regulations. */
const duties: readonly ((facts: UnitFacts) => Reason)[] = [
  (facts) => designCheck("R5-1", facts),
  (facts) => designCheck("R5-2", facts),
  (facts) => designCheck("R5-3", facts),
  (facts) => designCheck("R6-1", facts),
  (facts) => designCheck("R7-1", facts),
  (facts) => designCheck("R8-1", facts),
  (facts) => designCheck("R9-1", facts),
  (facts) => designCheck("R9-2", facts),
  (facts) => designCheck("R9-3", facts),
  (facts) => designCheck("R9-4", facts),
  defaultHoursCheck,
  firstUseCheck,
  (facts) => designCheck("R10-3", facts),
  overrideCheck,
  responseCheck,
  (facts) => designCheck("R11-1", facts),
  delayCheck,
  (facts) => designCheck("R11-3", facts),
  (facts) => designCheck("R11-4", facts),
  exceptionsCheck,
  (facts) => designCheck("R11-6", facts),
  securityCheck,
  onSiteCheck,
  statementCheck,
  technicalFileCheck,
  contentsCheck,
  registerCheck,
];

/**
 * Every rule of the Regulations for every chargepoint, the unit with the worst outcome first, the rules of a unit
 * in the order of the Regulations. An exclusion makes all of them not applicable, with the exclusion as the reason.
 */
export function assessSettings(job: JobFacts): SmartChargingResult[] {
  const units = job.chargepoints.map((unit) => ({ id: unit.id, reasons: settingsOf(unitFacts(job, unit)) }));
  const worst = (reasons: readonly Reason[]) => Math.min(...reasons.map(({ outcome }) => gravity(outcome)));
  return units
    .sort((a, b) => worst(a.reasons) - worst(b.reasons))
    .flatMap(({ id, reasons }) => reasons.map((reason) => ({ ...reason, chargepoint: id })));
}

function settingsOf(facts: UnitFacts): Reason[] {
  const exclusion = exclusionOf(facts);
  const judged = duties.map((duty) => duty(facts));
  const all = [scopeOf(facts), saleCheck(facts, judged), ...judged];
  if (exclusion === null) return all;
  return all.map((reason) => ({
    ...reason,
    outcome: "not-applicable",
    because: exclusion,
    used: { exclusion: true, grade: null },
    workings: [],
  }));
}
