import type { IsoDate } from "@/lib/calc/parameter";
import { bankHolidays, holidayCalendar, type Division } from "./bank-holidays";
import { addDays, daysBetween, isWeekend } from "./calendar";

/** Whether the published list of bank holidays covers the day. */
export const isInHolidayCalendar = (day: IsoDate): boolean => holidayCalendar.from <= day && day <= holidayCalendar.to;

/**
 * Monday to Friday and no bank holiday of the division. Outside the published list only weekends are known,
 * which is why every caller that prints a day also prints `calendarLimit`.
 */
export const isWorkingDay = (day: IsoDate, division: Division): boolean =>
  !isWeekend(day) && !bankHolidays[division].has(day);

/** A sentence when a day lies outside the published bank holidays, null when it lies inside. */
export const calendarLimit = (day: IsoDate): string | null =>
  isInHolidayCalendar(day)
    ? null
    : `The bank-holiday list covers ${holidayCalendar.from} to ${holidayCalendar.to}; check ${day} against the published list.`;

/** The working day a number of working days after `day`; `day` itself is not counted. `count` is whole, 0 or more. */
export function addWorkingDays(day: IsoDate, count: number, division: Division): IsoDate {
  let reached = day;
  for (let left = count; left > 0;) {
    reached = addDays(reached, 1);
    if (isWorkingDay(reached, division)) left -= 1;
  }
  return reached;
}

/** Working days after `from` up to and including `to`; 0 when `to` is not later. */
export function workingDaysBetween(from: IsoDate, to: IsoDate, division: Division): number {
  let count = 0;
  for (let offset = 1; offset <= daysBetween(from, to); offset += 1)
    if (isWorkingDay(addDays(from, offset), division)) count += 1;
  return count;
}

/** The day itself when it is a working day, else the last one before it. */
export function lastWorkingDayOnOrBefore(day: IsoDate, division: Division): IsoDate {
  let reached = day;
  while (!isWorkingDay(reached, division)) reached = addDays(reached, -1);
  return reached;
}
