import type { Missing } from "@/lib/notify/assessment";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { addAt, phaseIndex, phasesOf, zeros } from "./phases";
import { takenAway } from "./taken-away";

/** Current that comes on top of the figure before the work, as far as it is known. */
export type Added = {
  /** On phases that are told, amps a phase. */
  placedA: number[];
  /** Single items whose phase is not told, amps each. */
  unplacedA: number[];
  missing: Missing[];
  workings: string[];
};

type Item = { path: string; phasePath: string; name: string; amps: number | null; indexes: number[] | null };

function collect(phases: number, items: readonly Item[]): Added {
  const added: Added = { placedA: zeros(phases), unplacedA: [], missing: [], workings: [] };
  for (const { path, phasePath, name, amps, indexes } of items) {
    if (amps === null) added.missing.push({ path: `${path}.ratedA`, needed: `The rated current of ${name}` });
    else if (indexes === null) added.unplacedA.push(amps);
    else added.placedA = addAt(added.placedA, indexes, amps);
    if (indexes === null) added.missing.push({ path: phasePath, needed: `The phase that ${name} is on` });
    if (amps !== null) added.workings.push(`${name}: ${amps} A${indexes === null ? ", phase not told" : ""}`);
  }
  return added;
}

/** The chargepoints of the job, each at the current `currentOf` gives it. A removal adds nothing. */
export function addedUnits(job: JobFacts, phases: number, currentOf: (unit: Chargepoint) => number | null): Added {
  if (job.kind === "removal") return collect(phases, []);
  const added = collect(
    phases,
    job.chargepoints.map((unit, index) => ({
      path: `chargepoints[${index}]`,
      phasePath: `chargepoints[${index}].${unit.phases === null ? "phases" : "phase"}`,
      name: `chargepoint ${unit.id}`,
      amps: currentOf(unit),
      indexes: phasesOf(unit, phases),
    })),
  );
  const none = { path: "chargepoints", needed: "The chargepoint" };
  return job.chargepoints.length === 0 ? { ...added, missing: [none] } : added;
}

const draws = ["chargepoint", "heat-pump", "battery", "other"];

/** Equipment already there that the figure before the work leaves out: it has to be added. */
export function leftOut(job: JobFacts, phases: number): Added {
  const listed = (job.demand.otherEquipment ?? []).map((equipment, index) => ({ equipment, index }));
  const gone = takenAway(job).map(({ index }) => index);
  return collect(
    phases,
    listed
      .filter(({ equipment }) => draws.includes(equipment.kind) && equipment.inExistingDemand === "no")
      .filter(({ index }) => !gone.includes(index))
      .map(({ equipment, index }) => ({
        path: `demand.otherEquipment[${index}]`,
        phasePath: `demand.otherEquipment[${index}].phase`,
        name: `${equipment.kind.replaceAll("-", " ")} not in the figure before the work`,
        amps: knownNumber(equipment.ratedA),
        indexes: asList(phaseIndex(phases, equipment.phase)),
      })),
  );
}

const asList = (index: number | null) => (index === null ? null : [index]);

/** Equipment that draws and of which it is not told whether the figure includes it. */
export const unsettled = (job: JobFacts): number[] =>
  (job.demand.otherEquipment ?? []).flatMap(({ kind, inExistingDemand }, index) =>
    draws.includes(kind) && inExistingDemand !== "yes" && inExistingDemand !== "no" ? [index] : [],
  );
