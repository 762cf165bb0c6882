/** Voltage drop along a run, volts: line to neutral for two-core figures, line to line for three-core ones. */
export const voltDropV = (milliVoltPerAmpMetre: number, currentA: number, lengthM: number): number =>
  (milliVoltPerAmpMetre * currentA * lengthM) / 1000;

/** Longest run that stays within a limit, metres. */
export const longestByVoltDropM = (milliVoltPerAmpMetre: number, currentA: number, limitV: number): number =>
  (limitV * 1000) / (milliVoltPerAmpMetre * currentA);

/**
 * Temperature refinement Ct, a factor on the tabulated drop for conductors up to 16 mm²: a cable that carries less
 * than its rating runs cooler. `conductorC` is the highest temperature of the insulation.
 */
export function coolerRunningFactor(given: {
  conductorC: number;
  loadA: number;
  tabulatedA: number;
  ambientFactor: number;
  groupFactor: number;
}): number {
  const { conductorC, loadA, tabulatedA, ambientFactor, groupFactor } = given;
  const spare = ambientFactor ** 2 * groupFactor ** 2 - (loadA / tabulatedA) ** 2;
  return (230 + conductorC - spare * (conductorC - 30)) / (230 + conductorC);
}
