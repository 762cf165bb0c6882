/** Least protective conductor for a fault, mm²: the square root of I²t over k. Valid from 0.1 s to 5 s. */
export const adiabaticMm2 = (faultA: number, seconds: number, heatFactor: number): number =>
  Math.sqrt(faultA ** 2 * seconds) / heatFactor;
