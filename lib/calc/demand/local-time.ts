const HOUR_MS = 3_600_000;

/** 01:00 UTC on the last Sunday of a month (0 to 11): when British clocks change. */
function clockChangeMs(year: number, month: number): number {
  const lastDay = new Date(Date.UTC(year, month + 1, 0, 1));
  return lastDay.getTime() - lastDay.getUTCDay() * 24 * HOUR_MS;
}

/** British clock time of an instant, as milliseconds that read as UTC. */
export function britishClockMs(utcMs: number): number {
  const year = new Date(utcMs).getUTCFullYear();
  const summer = utcMs >= clockChangeMs(year, 2) && utcMs < clockChangeMs(year, 9);
  return summer ? utcMs + HOUR_MS : utcMs;
}

/** `18:00 on 2026-01-05` by the British clock. */
export function britishTimeText(utcMs: number): string {
  const text = new Date(britishClockMs(utcMs)).toISOString();
  return `${text.slice(11, 16)} on ${text.slice(0, 10)}`;
}
