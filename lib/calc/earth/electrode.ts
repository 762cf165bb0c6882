/** Resistance of one vertical rod in even soil, ohms, valid where the rod is long against its diameter. */
export const rodOhm = (soilOhmM: number, lengthM: number, diameterM: number): number =>
  (soilOhmM / (2 * Math.PI * lengthM)) * (Math.log((8 * lengthM) / diameterM) - 1);

/** Potential of the ground at a distance from a rod, as a share of the rod's own. */
export const surfacePotentialShare = (lengthM: number, diameterM: number, distanceM: number): number =>
  Math.log((lengthM + Math.hypot(lengthM, distanceM)) / distanceM) / (Math.log((8 * lengthM) / diameterM) - 1);
