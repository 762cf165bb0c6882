import type { IsoDate } from "@/lib/calc/parameter";

/** Day arithmetic on calendar days. Days are numbers since 1 January 1970, so that no clock change can shift one. */
const millisecondsPerDay = 86_400_000;
const dayNames = ["Sunday", "Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday"] as const;
const monthNames = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
] as const;

export type DayName = (typeof dayNames)[number];

const dayNumber = (day: IsoDate) => Date.parse(`${day}T00:00:00Z`) / millisecondsPerDay;

const dayOf = (number: number): IsoDate => new Date(number * millisecondsPerDay).toISOString().slice(0, 10);

/** The calendar day a number of days after `day` (before it, when negative). */
export const addDays = (day: IsoDate, days: number): IsoDate => dayOf(dayNumber(day) + days);

/** Calendar days from one day to another; negative when `to` lies before `from`. */
export const daysBetween = (from: IsoDate, to: IsoDate): number => dayNumber(to) - dayNumber(from);

export const dayName = (day: IsoDate): DayName => dayNames[new Date(`${day}T00:00:00Z`).getUTCDay()] as DayName;

export const isWeekend = (day: IsoDate): boolean => dayName(day) === "Saturday" || dayName(day) === "Sunday";

/** "1 December 2026". */
export function longDate(day: IsoDate): string {
  const [year, month, date] = day.split("-").map(Number) as [number, number, number];
  return `${date} ${monthNames[month - 1]} ${year}`;
}

/** "Friday 18 December", with the year when it differs from the year of `asAt`. */
export function weekdayDate(day: IsoDate, asAt: IsoDate): string {
  const whole = longDate(day);
  const sameYear = day.slice(0, 4) === asAt.slice(0, 4);
  return `${dayName(day)} ${sameYear ? whole.slice(0, -" 2026".length) : whole}`;
}

/** The calendar day in Europe/London at an instant. */
export function dayInLondon(instant: Date): IsoDate {
  const parts = new Intl.DateTimeFormat("en-GB", {
    timeZone: "Europe/London",
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
  }).formatToParts(instant);
  const part = (type: string) => parts.find((entry) => entry.type === type)?.value;
  return `${part("year")}-${part("month")}-${part("day")}`;
}
