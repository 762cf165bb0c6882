import { britishClockMs } from "./local-time";

export type HalfHour = { start: string; kwh: number };

export type HalfHourlySeries = {
  /** Distinct half hours present. */
  count: number;
  firstMs: number;
  /** End of the last half hour. */
  endMs: number;
  days: number;
  /** Share of the half hours between first and end that are present. */
  coverage: number;
  /** The winter, named by the year of its January, whose November to February the series spans; null when none. */
  wholeWinter: number | null;
  /** Share of that winter's half hours present; null without one. */
  winterCoverage: number | null;
  peakKwh: number;
  peakStartMs: number;
};

const STEP_MS = 1_800_000;
const DAY_MS = 86_400_000;

/** Current of a half hour's energy at one voltage: the half-hour average, amps, all of it on one phase. */
export const ampsOfHalfHour = (kwh: number, nominalV: number): number => (kwh * 2 * 1000) / nominalV;

const winterOf = (year: number) => ({ fromMs: Date.UTC(year - 1, 10, 1), toMs: Date.UTC(year, 2, 1) });

/** A year is 17,520 readings and several rules ask for the same ones: each list is read once. */
const alreadyRead = new WeakMap<readonly HalfHour[], HalfHourlySeries>();

/**
 * Reads a series in any order; a half hour given twice counts once, at its higher figure. Null when it is empty.
 * The list must not be changed afterwards.
 */
export function readHalfHours(series: readonly HalfHour[]): HalfHourlySeries | null {
  const read = alreadyRead.get(series) ?? summarise(series);
  if (read !== null) alreadyRead.set(series, read);
  return read;
}

function summarise(series: readonly HalfHour[]): HalfHourlySeries | null {
  const byStart = new Map<number, number>();
  for (const { start, kwh } of series) {
    const startMs = Date.parse(start);
    byStart.set(startMs, Math.max(kwh, byStart.get(startMs) ?? 0));
  }
  let [firstMs, endMs, peakKwh, peakStartMs] = [Infinity, -Infinity, -1, 0];
  for (const [startMs, kwh] of byStart) {
    firstMs = Math.min(firstMs, startMs);
    endMs = Math.max(endMs, startMs + STEP_MS);
    if (kwh > peakKwh || (kwh === peakKwh && startMs < peakStartMs)) [peakKwh, peakStartMs] = [kwh, startMs];
  }
  if (byStart.size === 0) return null;
  const wholeWinter = winterWithin(firstMs, endMs);
  return {
    count: byStart.size,
    firstMs,
    endMs,
    days: (endMs - firstMs) / DAY_MS,
    coverage: (byStart.size * STEP_MS) / (endMs - firstMs),
    wholeWinter,
    winterCoverage: wholeWinter === null ? null : coverageOf(winterOf(wholeWinter), byStart),
    peakKwh,
    peakStartMs,
  };
}

/** November to February whole, by the clock of those months, which is UTC; the latest such winter. */
function winterWithin(firstMs: number, endMs: number): number | null {
  const lastYear = new Date(endMs).getUTCFullYear();
  for (let year = lastYear; year > new Date(firstMs).getUTCFullYear(); year -= 1) {
    const winter = winterOf(year);
    if (firstMs <= winter.fromMs && endMs >= winter.toMs) return year;
  }
  return null;
}

function coverageOf(period: { fromMs: number; toMs: number }, byStart: ReadonlyMap<number, number>): number {
  const present = [...byStart.keys()].filter((startMs) => startMs >= period.fromMs && startMs < period.toMs).length;
  return (present * STEP_MS) / (period.toMs - period.fromMs);
}

/**
 * The highest average current in each of the 48 half hours of the British day, amps, for a chart; null where no
 * half hour of that time was given.
 */
export function dayProfileA(series: readonly HalfHour[], nominalV: number): (number | null)[] {
  const profile = Array<number | null>(48).fill(null);
  for (const { start, kwh } of series) {
    const clockMs = britishClockMs(Date.parse(start));
    const slot = Math.floor((clockMs % DAY_MS) / STEP_MS);
    profile[slot] = Math.max(profile[slot] ?? 0, ampsOfHalfHour(kwh, nominalV));
  }
  return profile;
}
