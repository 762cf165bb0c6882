import type { IsoDate } from "@/lib/calc/parameter";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import type { Reason } from "@/lib/notify/result";
import { cannotTell, judge, met, notApplicable } from "../rule";
import { addAt, phaseIndex, phasesOf, zeros } from "./phases";
import { replacedRule } from "./rules";
import { takenAway } from "./taken-away";

type Subtraction = { amps: number; indexes: number[] } | { refused: string };

/**
 * A replaced unit comes off only with its day of removal and when the figure before the work included it, at the
 * lesser of the two currents recorded for it.
 */
function subtraction(job: JobFacts, unit: Chargepoint, phases: number | null): Subtraction {
  const { replaces } = unit;
  const replacedA = knownNumber(replaces?.ratedA);
  if (replacedA === null) return { refused: "its rated current is not known" };
  if (!replaces?.removedOn) return { refused: "the day it was removed is not recorded" };
  const listed = takenAway(job).find((taken) => taken.unit === unit)?.equipment;
  if (listed?.inExistingDemand !== "yes")
    return { refused: "it is not recorded as part of the figure before the work" };
  if (phases === null) return { refused: "the phases of the supply are not recorded" };
  const index = phaseIndex(phases, listed.phase);
  const indexes = index === null ? phasesOf(unit, phases) : [index];
  const amps = Math.min(replacedA, knownNumber(listed.ratedA) ?? replacedA);
  return indexes === null ? { refused: "the phase it was on is not told" } : { amps, indexes };
}

/** Current that replaced units take off the figure before the work, amps a phase. */
export function takenOffA(job: JobFacts, phases: number): number[] {
  return job.chargepoints
    .filter((unit) => unit.replaces !== null)
    .map((unit) => subtraction(job, unit, phases))
    .reduce((off, one) => ("refused" in one ? off : addAt(off, one.indexes, one.amps)), zeros(phases));
}

/** Says whether the replaced unit came off the demand, and why not. */
export const replacedCheck = (job: JobFacts, unit: Chargepoint, on: IsoDate): Reason =>
  judge(replacedRule, unit.id, on, () => {
    if (unit.replaces === null) return notApplicable("No replaced unit is recorded.");
    const used = { replacedA: knownNumber(unit.replaces.ratedA), removedOn: unit.replaces.removedOn };
    const result = subtraction(job, unit, job.supply.phases);
    if ("refused" in result)
      return cannotTell(`The replaced unit is not taken out of the demand: ${result.refused}.`, { used });
    return met(`The replaced unit's ${result.amps} A is taken out: removed on ${unit.replaces.removedOn}.`, {
      used,
      recorded: `${result.amps} A`,
    });
  });
