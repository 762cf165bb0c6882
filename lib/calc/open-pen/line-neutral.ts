/** Whether a line-neutral window device opens. On either threshold exactly it holds. */
export const windowOpens = (lineNeutralV: number, lowV: number, highV: number): boolean =>
  lineNeutralV < lowV || lineNeutralV > highV;

/** Touch voltage that a single-phase installation standing alone can have before the window acts, volts. */
export const unseenTouchV = (sourceV: number, lowV: number): number => Math.max(0, sourceV - lowV);

/**
 * Largest shift of a shared three-phase network's star point, volts, that leaves one watched line inside the
 * window: with resistive loads the star point stays in the triangle of the phases, and the extreme lies where the
 * circle of the upper threshold meets an edge that does not touch the watched line's own corner.
 */
export function largestUnseenShiftV(nominalV: number, highV: number): number {
  const halfEdgeBack = nominalV / 2;
  const towardsFarEdge = (nominalV * Math.sqrt(3)) / 2;
  const alongEdge = highV - towardsFarEdge;
  return Math.hypot(halfEdgeBack, alongEdge);
}
