import { longDate } from "@/lib/notify/calendar";

const london = new Intl.DateTimeFormat("en-GB", {
  timeZone: "Europe/London",
  year: "numeric",
  month: "2-digit",
  day: "2-digit",
  hour: "2-digit",
  minute: "2-digit",
  hourCycle: "h23",
});

/** "1 December 2026, 09:00" on the wall clock of Europe/London, from a UTC instant. */
export function clockDate(instant: string): string {
  const part = Object.fromEntries(london.formatToParts(new Date(instant)).map(({ type, value }) => [type, value]));
  return `${longDate(`${part.year}-${part.month}-${part.day}`)}, ${part.hour}:${part.minute}`;
}
