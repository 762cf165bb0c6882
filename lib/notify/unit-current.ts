import { countedA } from "./checks/demand/counted-current";
import { takenAway, type Equipment } from "./checks/demand/taken-away";
import type { JobFacts } from "./job";
import { knownNumber } from "./job/facts";

/**
 * Current of all chargepoints on the most loaded phase, A, earlier ones that stay included, see `chargepointsKept`.
 * A single-phase unit whose phase is not recorded is added to every phase, the worst case. Null when a current is missing.
 */
export function chargepointCurrentA(job: JobFacts): number | null {
  const phases = ["L1", "L2", "L3"];
  const loads = [
    ...job.chargepoints.map((unit) => ({
      amperes: countedA(job, unit),
      phase: unit.phases === 1 ? unit.phase : null,
    })),
    ...chargepointsKept(job).map(({ ratedA, phase }) => ({ amperes: knownNumber(ratedA), phase })),
  ];
  if (loads.some(({ amperes }) => amperes === null)) return null;
  const on = (name: string) => loads.filter(({ phase }) => phase === null || phase === name);
  return Math.max(...phases.map((name) => on(name).reduce((total, { amperes }) => total + Number(amperes), 0)));
}

/** Earlier chargepoints on the supply, without those this job took away with the day recorded. */
export function chargepointsKept(job: JobFacts): Equipment[] {
  const gone = takenAway(job).map(({ index }) => index);
  return (job.demand.otherEquipment ?? []).filter(({ kind }, index) => kind === "chargepoint" && !gone.includes(index));
}
