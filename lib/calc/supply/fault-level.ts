/** Prospective fault current of a loop, kiloamps. */
export const faultKa = (nominalV: number, loopOhm: number): number => nominalV / loopOhm / 1000;
