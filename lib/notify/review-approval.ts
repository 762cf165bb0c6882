import type { Outcome } from "./result";

/** Shortest note, in characters, that can say how an outcome nobody can tell was judged. Our practice, no source. */
const noteLength = 10;

/**
 * What an approval still waits for, as a sentence; null when nothing does. What is not met goes back to the
 * installer. What cannot be told is for the compliance lead to judge, and the judgement is written down.
 */
export function approvalWaits(tally: Record<Outcome, number>, note: string | null): string | null {
  if (tally["not-met"] > 0) return `Approve waits for ${tally["not-met"]} not met.`;
  const untold = tally["cannot-tell"];
  if (untold > 0 && (note ?? "").trim().length < noteLength)
    return `${untold} outcome${untold === 1 ? "" : "s"} cannot be told: write how you judged.`;
  return null;
}
