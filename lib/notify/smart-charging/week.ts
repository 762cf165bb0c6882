import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { weekdays, type ChargingWindow } from "../job/chargepoint";
import { peakHours } from "../parameters/legislation";

/** A stretch of one day of a local week: day 0 is Monday, minutes from local midnight, the end not included. */
export type Span = { day: number; from: number; to: number };
export type Season = "winter" | "summer";
export type UnitClock = "local" | "utc";

export type ChargingWeek = { charging: Span[]; inPeak: Span[]; minutesInPeak: number };

const minutesInDay = 1440;
const minutesInWeek = 7 * minutesInDay;
const workDays = [0, 1, 2, 3, 4];
/** Local time runs this far ahead of UTC while summer time is kept (Summer Time Act 1972). */
const summerTimeMinutes = 60;

type Stretch = { from: number; to: number };

export function minutesOf(clock: string): number {
  const [hours, minutes] = clock.split(":").map(Number) as [number, number];
  return hours * 60 + minutes;
}

/** Minutes of the local week that a window covers; the day is the one it starts on, equal ends mean 24 hours. */
function stretchesOf(window: ChargingWindow, shift: number): Stretch[] {
  const from = minutesOf(window.from);
  const to = minutesOf(window.to);
  const length = to > from ? to - from : to - from + minutesInDay;
  return window.days.flatMap((day) => {
    const start = (weekdays.indexOf(day) * minutesInDay + from + shift) % minutesInWeek;
    const end = start + length;
    return end <= minutesInWeek
      ? [{ from: start, to: end }]
      : [
          { from: start, to: minutesInWeek },
          { from: 0, to: end - minutesInWeek },
        ];
  });
}

/** Overlapping and touching stretches joined, so that no minute is counted twice. */
function joined(stretches: readonly Stretch[]): Stretch[] {
  const sorted = [...stretches].sort((a, b) => a.from - b.from);
  return sorted.reduce<Stretch[]>((all, next) => {
    const last = all.at(-1);
    if (last && next.from <= last.to) last.to = Math.max(last.to, next.to);
    else all.push({ ...next });
    return all;
  }, []);
}

const byDay = (stretches: readonly Stretch[]): Span[] =>
  stretches.flatMap(({ from, to }) => {
    const spans: Span[] = [];
    for (let start = from; start < to;) {
      const day = Math.floor(start / minutesInDay);
      const end = Math.min(to, (day + 1) * minutesInDay);
      spans.push({ day, from: start - day * minutesInDay, to: end - day * minutesInDay });
      start = end;
    }
    return spans;
  });

/** Peak hours of the Regulations as spans of a week, Monday to Friday. */
export const peakWeek = (on: IsoDate): Span[] =>
  workDays.flatMap((day) =>
    valueAt(peakHours, on).map((band) => ({ day, from: minutesOf(band.from), to: minutesOf(band.to) })),
  );

/**
 * The local week in which a unit charges by its default hours, and what of it lies in peak hours.
 * A unit that keeps UTC charges an hour later by the wall clock while summer time is kept.
 */
export function chargingWeek(
  windows: readonly ChargingWindow[],
  clock: UnitClock,
  season: Season,
  on: IsoDate,
): ChargingWeek {
  const shift = clock === "utc" && season === "summer" ? summerTimeMinutes : 0;
  const charging = byDay(joined(windows.flatMap((window) => stretchesOf(window, shift))));
  const peaks = peakWeek(on);
  const inPeak = charging.flatMap((span) =>
    peaks.flatMap((peak) => {
      const from = Math.max(span.from, peak.from);
      const to = Math.min(span.to, peak.to);
      return span.day === peak.day && from < to ? [{ day: span.day, from, to }] : [];
    }),
  );
  return { charging, inPeak, minutesInPeak: inPeak.reduce((total, { from, to }) => total + to - from, 0) };
}

const clockText = (minutes: number) =>
  `${String(Math.floor(minutes / 60)).padStart(2, "0")}:${String(minutes % 60).padStart(2, "0")}`;

const dayWords = ["Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun"];

/** "22:00 to 08:00 daily", "Mon Tue 00:00 to 07:00; …", "none". */
export function windowsText(windows: readonly ChargingWindow[]): string {
  if (windows.length === 0) return "none";
  return windows
    .map(({ days, from, to }) => {
      const all = new Set(days).size === weekdays.length;
      return `${from} to ${to} ${all ? "daily" : days.map((day) => dayWords[weekdays.indexOf(day)]).join(" ")}`;
    })
    .join("; ");
}

/** The first stretch inside peak hours in words, for a sentence: "08:00 to 09:00". */
export const spanText = ({ from, to }: Span): string => `${clockText(from)} to ${clockText(to)}`;
