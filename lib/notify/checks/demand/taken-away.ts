import type { Chargepoint, Job, JobFacts } from "@/lib/notify/job";

export type Equipment = NonNullable<Job["demand"]["otherEquipment"]>[number];

/** A listed chargepoint that one of the job's units replaced. */
export type TakenAway = { unit: Chargepoint; equipment: Equipment; index: number };

/** Whether listed equipment may be the unit replaced; a model that is not recorded fits either way. */
const isSameUnit = ({ replaces }: Chargepoint, { kind, model }: Equipment): boolean =>
  kind === "chargepoint" && (!replaces?.model || model === null || replaces.model === model);

/** Listed chargepoints that this job took away: only with the day of removal, and one item for one unit. */
export function takenAway(job: JobFacts): TakenAway[] {
  const left = (job.demand.otherEquipment ?? []).map((equipment, index) => ({ equipment, index }));
  return job.chargepoints.flatMap((unit) => {
    if (!unit.replaces?.removedOn) return [];
    const at = left.findIndex(({ equipment }) => isSameUnit(unit, equipment));
    return at < 0 ? [] : left.splice(at, 1).map((item) => ({ ...item, unit }));
  });
}
