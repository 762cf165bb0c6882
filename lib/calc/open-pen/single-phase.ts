/**
 * An open PEN with an installation electrode, one phase. The whole load current returns through the electrode:
 * a divider of the electrode and the load's resistance, U0 ÷ I, under the highest supply voltage.
 */
type Supply = { sourceV: number; nominalV: number };

/** Voltage from the main earthing terminal to Earth, volts. With no electrode at all it is the source. */
export const electrodeTouchV = ({ sourceV, nominalV }: Supply, currentA: number, electrodeOhm: number): number =>
  currentA === 0 ? 0 : (sourceV * electrodeOhm) / (electrodeOhm + nominalV / currentA);

/** Largest electrode resistance that keeps the touch voltage at the limit, ohms, for a load of fixed resistance. */
export const electrodeMaxOhm = ({ sourceV, nominalV }: Supply, currentA: number, limitV: number): number =>
  (limitV * nominalV) / (currentA * (sourceV - limitV));

/** The same when the load holds its current, as a vehicle charger nearly does. Stricter. */
export const electrodeMaxConstantCurrentOhm = (currentA: number, limitV: number): number => limitV / currentA;

/** The same when the load holds its power. Stricter still. */
export const electrodeMaxConstantPowerOhm = (sourceV: number, powerW: number, limitV: number): number =>
  (limitV * (sourceV - limitV)) / powerW;
