/** Currents of the three lines, amps, in the order L1, L2, L3. */
export type LineCurrents = readonly [number, number, number];

/** Current and lag of one line; `lagDegrees` is positive for an inductive load. */
export type LinePhasor = { amps: number; lagDegrees: number };

const SIN60 = Math.sqrt(3) / 2;

/** Out-of-balance current at equal power factors, amps: the current the neutral would carry. */
export const unbalancedA = ([a, b, c]: LineCurrents): number => Math.hypot(a - 0.5 * (b + c), SIN60 * (b - c));

const total = ([a, b, c]: LineCurrents) => a + b + c;

/**
 * Voltage of the neutral to Earth with the PEN open, volts, at equal power factors (Millman).
 * `electrodeOhm` null means no electrode. No load at all leaves no voltage.
 */
export function openPenV(
  sourceV: number,
  nominalV: number,
  currents: LineCurrents,
  electrodeOhm: number | null,
): number {
  const sum = total(currents) + (electrodeOhm === null ? 0 : nominalV / electrodeOhm);
  return sum === 0 ? 0 : (sourceV * unbalancedA(currents)) / sum;
}

/** Largest electrode that keeps it at the limit, ohms; null when none is needed. */
export function openPenElectrodeMaxOhm(
  sourceV: number,
  nominalV: number,
  currents: LineCurrents,
  limitV: number,
): number | null {
  const excess = sourceV * unbalancedA(currents) - limitV * total(currents);
  return excess <= 0 ? null : (limitV * nominalV) / excess;
}

/** The same voltage for lines of unequal power factor, volts: the complex form, without an electrode. */
export function openPenComplexV(sourceV: number, lines: readonly [LinePhasor, LinePhasor, LinePhasor]): number {
  let [reAbove, imAbove, reBelow, imBelow] = [0, 0, 0, 0];
  lines.forEach(({ amps, lagDegrees }, index) => {
    const admittanceAngle = (-lagDegrees * Math.PI) / 180;
    const sourceAngle = (-index * 2 * Math.PI) / 3;
    reAbove += amps * Math.cos(admittanceAngle + sourceAngle);
    imAbove += amps * Math.sin(admittanceAngle + sourceAngle);
    reBelow += amps * Math.cos(admittanceAngle);
    imBelow += amps * Math.sin(admittanceAngle);
  });
  return (sourceV * Math.hypot(reAbove, imAbove)) / Math.hypot(reBelow, imBelow);
}

/** Least balanced current a phase beside a single-phase load of `currentA` that keeps the voltage at the limit, amps. */
export function leastBaseA(sourceV: number, currentA: number, limitV: number): number {
  const allowedShare = limitV / sourceV;
  return (currentA / allowedShare - currentA) / 3;
}

/** Shift of the star point from three measured line-to-neutral voltages of a balanced source, volts. */
export function shiftFromReadingsV(readings: readonly [number, number, number], nominalV: number): number {
  const meanSquare = readings.reduce((sum, volts) => sum + volts ** 2, 0) / 3;
  return Math.sqrt(Math.max(0, meanSquare - nominalV ** 2));
}
