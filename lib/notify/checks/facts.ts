import type { Board, Chargepoint, Circuit, JobFacts } from "@/lib/notify/job";
import { isNotKnown } from "@/lib/notify/job/facts";

/** Words for a fact that is not there: not asked, or looked at and not told. */
export const absent = (value: unknown): string => (isNotKnown(value) ? "could not be told" : "is not recorded");

/** Whether nothing is fitted yet, so that readings and settings are still to come. */
export const isPlanned = (job: JobFacts): boolean => job.stage === "planned";

/** The circuit a chargepoint is on, null when none is recorded. */
export const circuitOf = (job: JobFacts, unit: Chargepoint): Circuit | null =>
  job.circuits.find(({ id }) => id === unit.circuit) ?? null;

/** The distribution circuits before a circuit, nearest the supply last. The record is free of loops. */
export function circuitsBefore(job: JobFacts, circuit: Circuit): Circuit[] {
  const before = job.circuits.find(({ id }) => id === circuit.fedFrom);
  return before ? [before, ...circuitsBefore(job, before)] : [];
}

/** Chargepoints that a circuit feeds, directly or through the circuits after it. */
export function unitsFedBy(job: JobFacts, circuit: Circuit): Chargepoint[] {
  return job.chargepoints.filter((unit) => {
    const own = circuitOf(job, unit);
    return own !== null && [own, ...circuitsBefore(job, own)].some(({ id }) => id === circuit.id);
  });
}

/** Circuits that leave a board. */
export const circuitsOn = (job: JobFacts, board: Board): Circuit[] =>
  job.circuits.filter((circuit) => circuit.board === board.id);

/** Whether a photo of a subject stands for a chargepoint; one without a chargepoint's id only when there is one unit. */
export const hasPhoto = (job: JobFacts, subject: string, unit: Chargepoint): boolean =>
  job.evidence.some(
    (photo) =>
      photo.subject === subject && (photo.of === unit.id || (photo.of === null && job.chargepoints.length === 1)),
  );

export type Earthing = "TN-C-S" | "TN-S" | "TT";

/** Earthing of the supply, null when it is not told. */
export const supplyEarthing = (job: JobFacts): Earthing | null =>
  job.supply.earthing === "unknown" ? null : job.supply.earthing;

/** Earthing of a circuit: TT where a chargepoint on it is a TT island, else that of the supply. */
export const circuitEarthing = (job: JobFacts, circuit: Circuit): Earthing | null =>
  isTtIsland(job, circuit) ? "TT" : supplyEarthing(job);

/** Whether a chargepoint on the circuit has its own TT earth on a supply of another kind. */
export const isTtIsland = (job: JobFacts, circuit: Circuit): boolean =>
  job.supply.earthing !== "TT" &&
  job.chargepoints.some((unit) => unit.circuit === circuit.id && unit.openPen.method === "tt");
