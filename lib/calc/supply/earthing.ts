import type { BondingBounds, ProtectiveSteps, Steps } from "../parameters/supply";

/** The figure of a stepped table, mm². */
export function stepMm2(steps: Steps, mm2: number): number {
  const step = steps.find(({ upToMm2 }) => upToMm2 === null || mm2 <= upToMm2);
  if (!step) throw new Error("A stepped table must end with a step that has no upper end.");
  return step.mm2;
}

/** Protective or earthing conductor by the size of the line conductor, mm². */
export function protectiveMm2(steps: ProtectiveSteps, lineMm2: number): number {
  if (lineMm2 <= steps.sameUpToMm2) return lineMm2;
  return lineMm2 <= steps.flatUpToMm2 ? steps.flatMm2 : lineMm2 * steps.shareAbove;
}

/** Main bonding where the supply is not PME, mm², before it is rounded up to a size that is made. */
export const otherBondingMm2 = (bounds: BondingBounds, earthingMm2: number): number =>
  Math.min(bounds.mostMm2, Math.max(bounds.leastMm2, earthingMm2 * bounds.shareOfEarthing));

/** The next size that is made, mm²; the value itself above the largest. */
export const nextSizeMm2 = (sizes: readonly number[], mm2: number): number => sizes.find((size) => size >= mm2) ?? mm2;
