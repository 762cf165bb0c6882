/**
 * Decimal arithmetic where binary floating point would decide a tie wrongly: 218.5 ÷ 100 must round to 2.19
 * and 0.8 × 0.55 must not lose a hundredth. All values are zero or more.
 */
export type Rounding = "half-up" | "down" | "up";

type Decimal = { digits: bigint; places: number };

/** The decimal a person would read: the shortest text that stands for the number. */
function decimal(value: number): Decimal {
  const [mantissa = "", exponent = "0"] = value.toString().split("e");
  const [whole = "", fraction = ""] = mantissa.split(".");
  const places = fraction.length - Number(exponent);
  const digits = BigInt(whole + fraction);
  return places < 0 ? { digits: digits * 10n ** BigInt(-places), places: 0 } : { digits, places };
}

const product = (factors: readonly number[]): Decimal =>
  factors.map(decimal).reduce((all, one) => ({ digits: all.digits * one.digits, places: all.places + one.places }), {
    digits: 1n,
    places: 0,
  });

/** How close to a tie, in the last place, floating point is no longer trusted. */
const DOUBTFUL = 1e-6;
/** Above this many last places a double no longer resolves a doubtful tie. */
const TRUSTED_UP_TO = 1e9;

/** The rounded count of last places where floating point is beyond doubt; null near a tie or for large values. */
function withoutDoubt(lastPlaces: number, rounding: Rounding): number | null {
  const fraction = lastPlaces - Math.floor(lastPlaces);
  const fromTie = rounding === "half-up" ? Math.abs(fraction - 0.5) : Math.min(fraction, 1 - fraction);
  if (lastPlaces > TRUSTED_UP_TO || fromTie < DOUBTFUL) return null;
  if (rounding === "half-up") return Math.round(lastPlaces);
  return rounding === "down" ? Math.floor(lastPlaces) : Math.ceil(lastPlaces);
}

const multiplied = (factors: readonly number[]) => factors.reduce((all, one) => all * one, 1);

/** The product of `over` divided by the product of `under`, rounded to `places` decimals as if it were exact. */
export function exactQuotient(
  over: readonly number[],
  under: readonly number[],
  places: number,
  rounding: Rounding,
): number {
  const scale = 10 ** places;
  const quick = withoutDoubt((multiplied(over) / multiplied(under)) * scale, rounding);
  return (quick ?? exactly(over, under, places, rounding)) / scale;
}

function exactly(over: readonly number[], under: readonly number[], places: number, rounding: Rounding): number {
  const top = product(over);
  const bottom = product(under);
  const numerator = top.digits * 10n ** BigInt(bottom.places + places);
  const denominator = bottom.digits * 10n ** BigInt(top.places);
  const add = { "half-up": denominator, down: 0n, up: 2n * denominator - 1n }[rounding];
  return Number((2n * numerator + add) / (2n * denominator));
}

/** A number rounded as the decimal it reads as. */
export const roundTo = (value: number, places: number, rounding: Rounding = "half-up"): number =>
  exactQuotient([value], [1], places, rounding);

/** For stored results: three decimals, so that no float dust is carried or printed. */
export const tidy = (value: number): number => roundTo(value, 3);

/** Text with a fixed number of decimals: `4.20`. */
export const fixed = (value: number, places: number): string => roundTo(value, places).toFixed(places);

/** Text without trailing zeros, at most three decimals: `56.8`, `32`. */
export const plain = (value: number): string => String(tidy(value));
