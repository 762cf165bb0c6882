import type { IsoDate } from "@/lib/calc/parameter";
import type { Chargepoint, JobFacts } from "../job";
import type { EvidenceSubject } from "../job/papers";
import type { Detail } from "../rule";
import { ruleDay } from "../rule-day";
import { smartChargingFrom } from "../parameters/legislation";
import { valueAt } from "@/lib/calc/parameter";

/** A: the seller's or maker's statement. B: seen and recorded on this job. C: supporting paper only. */
export type Grade = "A" | "B" | "C" | null;

/** What the rules read of one chargepoint. */
export type UnitFacts = {
  job: JobFacts;
  unit: Chargepoint;
  settings: Chargepoint["smartCharging"];
  isPlanned: boolean;
  /** Day whose law is applied: that of the sale; while it is not known, the day of the work. */
  on: IsoDate;
};

export function unitFacts(job: JobFacts, unit: Chargepoint): UnitFacts {
  const day = job.dates.sold ?? ruleDay(job.dates);
  const first = valueAt(smartChargingFrom, day);
  return {
    job,
    unit,
    settings: unit.smartCharging,
    isPlanned: job.stage === "planned",
    on: day < first ? first : day,
  };
}

/** Whether a statement of compliance carries weight: it names the model and is not dated after the sale. */
export function statementStands({ settings, job }: UnitFacts): boolean {
  const { date, namesModel } = settings.statementOfCompliance;
  return namesModel === true && date !== null && job.dates.sold !== null && date <= job.dates.sold;
}

/** Whether such a statement covers a regulation, given as "5" to "14". */
export const statementCovers = (facts: UnitFacts, regulation: string): boolean =>
  statementStands(facts) &&
  (facts.settings.statementOfCompliance.coversRegulations ?? []).some(
    (covered) => covered.replace(/\D/g, "") === regulation,
  );

/** The photo of a subject on this unit, if there is one; one without a unit counts when there is only one unit. */
export const photoOf = ({ job, unit }: UnitFacts, subject: EvidenceSubject): string | null =>
  job.evidence.find(
    (photo) =>
      photo.subject === subject && (photo.of === unit.id || (photo.of === null && job.chargepoints.length === 1)),
  )?.file ?? null;

export const detailOf = (
  { unit }: UnitFacts,
  grade: Grade,
  used: NonNullable<Detail["used"]> = {},
  rest: Omit<Detail, "used" | "of"> = {},
): Detail => ({ of: unit.id, used: { ...used, grade }, ...rest });
