/** Dates and times in words. Days are `YYYY-MM-DD` in Europe/London; instants are UTC ISO text. */

const day = (options: Intl.DateTimeFormatOptions) => {
  const format = new Intl.DateTimeFormat("en-GB", { ...options, timeZone: "UTC" });
  return (isoDate: string) => format.format(new Date(`${isoDate.slice(0, 10)}T00:00:00Z`));
};
const moment = (options: Intl.DateTimeFormatOptions) => {
  const format = new Intl.DateTimeFormat("en-GB", { ...options, timeZone: "Europe/London" });
  return (instant: string) => format.format(new Date(instant));
};

/** "18 December 2026" */
export const longDate = day({ day: "numeric", month: "long", year: "numeric" });
/** "Friday 18 December" */
export const weekdayDate = (isoDate: string) =>
  day({ weekday: "long", day: "numeric", month: "long" })(isoDate).replace(",", "");
/** "18 Dec"; with the year when it is not the year of `today`. */
export const shortDate = (isoDate: string, today?: string) =>
  today && today.slice(0, 4) !== isoDate.slice(0, 4)
    ? day({ day: "numeric", month: "short", year: "numeric" })(isoDate)
    : day({ day: "numeric", month: "short" })(isoDate);

/** "14:20" */
export const clockTime = moment({ hour: "2-digit", minute: "2-digit", hourCycle: "h23" });
const momentDate = moment({ day: "numeric", month: "short" });
const momentLongDate = moment({ day: "numeric", month: "long", year: "numeric" });
/** "1 Dec, 14:20" */
export const shortMoment = (instant: string) => `${momentDate(instant)}, ${clockTime(instant)}`;
/** "1 December 2026, 14:20" */
export const longMoment = (instant: string) => `${momentLongDate(instant)}, ${clockTime(instant)}`;

const londonDay = new Intl.DateTimeFormat("en-CA", {
  timeZone: "Europe/London",
  year: "numeric",
  month: "2-digit",
  day: "2-digit",
});
/** The London day of an instant, `YYYY-MM-DD`. */
export const dayOf = (instant: string | Date) => londonDay.format(new Date(instant));

/** Whole days from one day to another; negative when `to` is earlier. */
export const daysBetween = (from: string, to: string) =>
  Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);

/** "17 days", "1 day", "today", "11 late" */
export const leftInWords = (days: number) =>
  days < 0 ? `${-days} late` : days === 0 ? "today" : days === 1 ? "1 day" : `${days} days`;

/** "28 days left", "last day today", "11 days late" */
export const daysLeftInWords = (days: number) =>
  days < 0
    ? `${-days} ${days === -1 ? "day" : "days"} late`
    : days === 0
      ? "last day today"
      : `${days} ${days === 1 ? "day" : "days"} left`;

/** "today", "1 working day", "6 working days" */
export const workingDaysInWords = (days: number) =>
  days === 0 ? "today" : `${days} working ${days === 1 ? "day" : "days"}`;
