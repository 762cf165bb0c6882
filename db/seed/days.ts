import { addDays, daysBetween } from "@/lib/notify/calendar";

const day = /^\d{4}-\d{2}-\d{2}$/;
const instant = /^\d{4}-\d{2}-\d{2}T/;

const moved = (text: string, by: number): string =>
  day.test(text) ? addDays(text, by) : instant.test(text) ? addDays(text.slice(0, 10), by) + text.slice(10) : text;

/** A copy of a record with every day in it moved by whole days. */
export function moveDays<T>(value: T, by: number): T {
  if (typeof value === "string") return moved(value, by) as T;
  if (Array.isArray(value)) return value.map((item: unknown) => moveDays(item, by)) as T;
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(Object.entries(value).map(([key, item]) => [key, moveDays(item, by)])) as T;
}

export const daysFrom = (written: string, now: string): number => daysBetween(written, now);

/** An instant so many days before `today`, at a time of day in UTC. */
export const instantBefore = (today: string, days: number, time: string): string =>
  `${addDays(today, -days)}T${time}:00.000Z`;
