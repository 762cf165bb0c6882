import { offeredA } from "@/lib/calc/demand/curtailment";
import { plain } from "@/lib/calc/exact";
import { entryAt, type IsoDate } from "@/lib/calc/parameter";
import { leastChargingA } from "@/lib/calc/parameters/demand";
import type { JobFacts } from "@/lib/notify/job";
import { inForce, mark } from "../rule";
import { phaseLabel, sumByPhase } from "./phases";
import { takenOffA } from "./replaced";

/** One line a phase for units taken out. */
export const takenOffLines = (job: JobFacts, phases: number): string[] =>
  takenOffA(job, phases).flatMap((amps, index) =>
    amps > 0 ? [`${phaseLabel(phases, index)}replaced unit taken out = ${plain(amps)} A`] : [],
  );

/** One line a phase: before, added, after. */
export const sumLines = (beforeA: readonly number[], addedA: readonly number[]): string[] =>
  sumByPhase(beforeA, addedA).map(
    (sumA, index) =>
      `${phaseLabel(beforeA.length, index)}${plain(beforeA[index] as number)} + ${plain(addedA[index] as number)} = ${plain(sumA)} A`,
  );

/** One line a phase under a stated load limit. */
export const limitLines = (withLimitA: readonly number[], limitA: number | null, counts: boolean): string[] =>
  withLimitA.map(
    (amps, index) =>
      `${phaseLabel(withLimitA.length, index)}with the load limit of ${limitA} A, ${counts ? "counted" : "not counted"} = ${plain(amps)} A`,
  );

/** What a limit leaves for the vehicle at the highest demand before the work. */
export function offeredLines(
  limitA: number,
  beforeA: readonly number[] | null,
  addedA: readonly number[],
  on: IsoDate,
): string[] {
  const least = inForce(() => entryAt(leastChargingA, on));
  if (beforeA === null || least === null) return [];
  const houseA = Math.max(...beforeA);
  const leftA = offeredA({ limitA, marginA: 0, houseA, mostA: Math.max(...addedA), leastA: least.value });
  return [
    `At ${plain(houseA)} A before, a limit of ${limitA} A leaves ${leftA} A for charging; below ${least.value} A it pauses${mark(least)}`,
  ];
}
