/** Apparent power of currents, one a phase, each at line-to-neutral voltage. 100 A on each of three phases is 69 kVA. */
export const kvaOf = (perPhaseA: readonly number[], nominalV: number): number =>
  (perPhaseA.reduce((sum, amps) => sum + amps, 0) * nominalV) / 1000;

/** Current a phase of a balanced apparent power. The inverse of `kvaOf` for equal currents. */
export const ampsOf = (kva: number, phases: number, nominalV: number): number => (kva * 1000) / (phases * nominalV);
