/** Rated apparent power of equipment, kVA: on one phase, between two lines, or on three phases. */
export function equipmentKva(currentA: number, phases: 1 | 2 | 3, nominalV: number, lineVoltageV: number): number {
  const volts = { 1: nominalV, 2: lineVoltageV, 3: Math.sqrt(3) * lineVoltageV }[phases];
  return (currentA * volts) / 1000;
}

/** Least three-phase short-circuit power of the supply, kVA, for a short-circuit ratio. */
export const leastShortCircuitKva = (equipmentPowerKva: number, ratio: number, multiple: number): number =>
  equipmentPowerKva * ratio * multiple;

/** Three-phase short-circuit power of a supply, kVA, from the impedance of one phase. */
export const shortCircuitKva = (lineVoltageV: number, impedanceOhm: number): number =>
  lineVoltageV ** 2 / impedanceOhm / 1000;

/** Largest impedance, ohms, that gives a three-phase short-circuit power. */
export const impedanceForKvaOhm = (lineVoltageV: number, kva: number): number => lineVoltageV ** 2 / (kva * 1000);

/** Steady voltage change of a load switched in one step, as a share of nominal. */
export const voltageChangeShare = (currentA: number, resistanceOhm: number, nominalV: number): number =>
  (currentA * resistanceOhm) / nominalV;
