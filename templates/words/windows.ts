import type { ChargingWindow, weekdays } from "@/lib/notify/job/chargepoint";
import { weekdayWords } from "./vocabulary";

type Weekday = (typeof weekdays)[number];

const week: readonly Weekday[] = ["mon", "tue", "wed", "thu", "fri", "sat", "sun"];

/** "every day", "Monday to Friday", or the days by name. */
export function daysWords(days: readonly Weekday[]): string {
  const at = week.filter((day) => days.includes(day));
  const first = at[0];
  const last = at.at(-1);
  if (first === undefined || last === undefined) return "no day";
  if (at.length === 7) return "every day";
  const joined = week.indexOf(last) - week.indexOf(first) === at.length - 1 && at.length > 2;
  return joined ? `${weekdayWords[first]} to ${weekdayWords[last]}` : at.map((day) => weekdayWords[day]).join(", ");
}

/** "22:00 to 08:00 every day; 12:00 to 14:00 Saturday, Sunday", or that there are none. */
export const windowsWords = (windows: readonly ChargingWindow[]): string =>
  windows.length
    ? windows
        .map(({ days, from, to }) => `${from} to ${from === to ? `${to} next day` : to} ${daysWords(days)}`)
        .join("; ")
    : "no default hours";
