import type { ChargingWindow, weekdays } from "@/lib/notify/job/chargepoint";
import { weekdayWords } from "../words/vocabulary";
import { daysWords, windowsWords } from "../words/windows";
import { box, hatch, inksOf, label, line, picture, type Drawing, type Surface } from "./svg";

type Weekday = (typeof weekdays)[number];
/** A stretch of one day, minutes from midnight. */
export type Stretch = { day: Weekday; fromMin: number; toMin: number };
type Peak = { from: string; to: string; days: readonly Weekday[] };

export type WeekChart = {
  /** Hours in which the unit charges by default, on the clock the unit keeps. */
  windows: readonly ChargingWindow[];
  /** Peak hours on the wall clock. */
  peak: readonly Peak[];
  /** Minutes by which the wall clock is ahead of the unit's own: 60 for a unit that keeps UTC, in summer. */
  aheadMin: number;
};

const order: readonly Weekday[] = ["mon", "tue", "wed", "thu", "fri", "sat", "sun"];
const dayMin = 1440;
const weekMin = 7 * dayMin;

const minutes = (clock: string): number => Number(clock.slice(0, 2)) * 60 + Number(clock.slice(3));

/** Windows as stretches of wall-clock days: those that run past midnight or over the week's end are parted. */
export function stretchesOf({ windows, aheadMin }: Pick<WeekChart, "windows" | "aheadMin">): Stretch[] {
  return windows.flatMap(({ days, from, to }) =>
    days.flatMap((day) => {
      const start = order.indexOf(day) * dayMin + minutes(from) + aheadMin;
      const long = (minutes(to) - minutes(from) + dayMin) % dayMin || dayMin;
      return partedByDay(start, start + long);
    }),
  );
}

function partedByDay(start: number, end: number): Stretch[] {
  const parts: Stretch[] = [];
  for (let at = start; at < end;) {
    const midnight = (Math.floor(at / dayMin) + 1) * dayMin;
    const until = Math.min(end, midnight);
    const dayStart = Math.floor(at / dayMin) * dayMin;
    const day = order[(((dayStart % weekMin) + weekMin) % weekMin) / dayMin];
    if (day) parts.push({ day, fromMin: at - dayStart, toMin: until - dayStart });
    at = until;
  }
  return parts;
}

const peakStretches = (peak: readonly Peak[]): Stretch[] =>
  peak.flatMap(({ days, from, to }) => days.map((day) => ({ day, fromMin: minutes(from), toMin: minutes(to) })));

const overlaps = (stretches: readonly Stretch[], peaks: readonly Stretch[]): Stretch[] =>
  stretches.flatMap((stretch) =>
    peaks
      .filter(({ day }) => day === stretch.day)
      .map(({ day, fromMin, toMin }) => ({
        day,
        fromMin: Math.max(fromMin, stretch.fromMin),
        toMin: Math.min(toMin, stretch.toMin),
      }))
      .filter(({ fromMin, toMin }) => fromMin < toMin),
  );

const left = 78;
const top = 22;
const hour = 24;
const row = 24;
const right = left + 24 * hour;
const bottom = top + 7 * row;

const xOf = (atMin: number) => left + (atMin / 60) * hour;
const yOf = (day: Weekday) => top + order.indexOf(day) * row;

function wordsOf({ windows, aheadMin }: WeekChart, inside: readonly Stretch[]): string {
  const clock = aheadMin ? `, shown ${aheadMin} minutes later, on the wall clock of summer` : "";
  const times = [...new Set(inside.map(({ fromMin, toMin }) => `${clockOf(fromMin)} to ${clockOf(toMin)}`))];
  const overlap = times.map((time) => {
    const days = inside.filter(({ fromMin, toMin }) => `${clockOf(fromMin)} to ${clockOf(toMin)}` === time);
    return `${time} ${daysWords(days.map(({ day }) => day))}`;
  });
  return `Week of default charging hours: ${windowsWords(windows)}${clock}. ${
    overlap.length ? `Inside peak hours: ${overlap.join("; ")}.` : "None of them is inside peak hours."
  }`;
}

const clockOf = (atMin: number) =>
  `${String(Math.floor(atMin / 60)).padStart(2, "0")}:${String(atMin % 60).padStart(2, "0")}`;

/** Seven days by twenty-four hours: peak hours hatched, charging a bar, charging inside peak hours cross-hatched. */
export function weekChart(chart: WeekChart, surface: Surface = "paper"): Drawing {
  const inks = inksOf[surface];
  const charging = stretchesOf(chart);
  const peaks = peakStretches(chart.peak);
  const inside = overlaps(charging, peaks);
  const grid = Array.from({ length: 25 }, (_, hours) =>
    line(xOf(hours * 60), top, xOf(hours * 60), bottom, {
      colour: hours % 6 === 0 ? inks.quiet : inks.rule,
      width: hours % 6 === 0 ? 1 : 0.7,
    }),
  ).join("");
  const hours = Array.from({ length: 13 }, (_, step) =>
    label(xOf(step * 120), top - 7, String(step * 2).padStart(2, "0"), {
      anchor: "middle",
      size: 11,
      colour: inks.quiet,
    }),
  ).join("");
  const days = order
    .map(
      (day, index) =>
        label(0, yOf(day) + 16, weekdayWords[day], { size: 11.5, colour: inks.ink }) +
        line(left, yOf(day), right, yOf(day), {
          colour: index === 0 || index === 5 ? inks.ink : inks.rule,
          width: index === 0 || index === 5 ? 1.2 : 0.7,
        }),
    )
    .join("");
  const cell = ({ day, fromMin, toMin }: Stretch, inset: number, fill: string, stroke?: string) =>
    box(xOf(fromMin), yOf(day) + inset, xOf(toMin) - xOf(fromMin), row - 2 * inset, {
      fill,
      colour: stroke ?? "none",
      width: stroke ? 1.4 : 0,
    });
  const marks =
    grid +
    peaks.map((stretch) => cell(stretch, 0, "url(#peak)")).join("") +
    charging.map((stretch) => cell(stretch, 5, inks.charging)).join("") +
    inside
      .map((stretch) => cell(stretch, 2, inks.paper, inks.wrong) + cell(stretch, 2, "url(#inside)", inks.wrong))
      .join("") +
    hours +
    days +
    line(left, bottom, right, bottom, { colour: inks.ink, width: 1.2 }) +
    keys(bottom + 22, inks);
  const defs = hatch("peak", 45, 6, inks.quiet, 0.9) + hatch("inside", -45, 5, inks.wrong, 2.2);
  return picture(right + 14, bottom + 34, 150, wordsOf(chart, inside), marks, defs);
}

function keys(y: number, inks: (typeof inksOf)[Surface]): string {
  const entry = (x: number, fill: string, words: string, stroke = inks.quiet) =>
    box(x, y - 9, 24, 11, { fill, colour: stroke, width: 1 }) +
    label(x + 31, y, words, { size: 11.5, colour: inks.ink });
  return (
    entry(left, inks.charging, "charging by default", inks.charging) +
    entry(left + 180, "url(#peak)", "peak hours") +
    entry(left + 310, "url(#inside)", "charging inside peak hours", inks.wrong)
  );
}
