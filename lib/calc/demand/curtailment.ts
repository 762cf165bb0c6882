/**
 * Current a vehicle may be offered, whole amps, so that the premises stay within a limit.
 * Zero means charging pauses: less than `leastA` is left.
 */
export function offeredA(given: {
  limitA: number;
  marginA: number;
  houseA: number;
  mostA: number;
  leastA: number;
}): number {
  const left = Math.min(Math.floor(given.limitA - given.marginA - given.houseA), given.mostA);
  return left < given.leastA ? 0 : left;
}

/** Demand of one phase under a load limit that counts: never below what stood there before. */
export const demandUnderLimitA = (existingA: number, addedA: number, limitA: number): number =>
  Math.max(existingA, Math.min(existingA + addedA, limitA));
