import { AsyncLocalStorage } from "node:async_hooks";
import { dayInLondon } from "@/lib/notify/calendar";

const fixed = new AsyncLocalStorage<string>();

/** Runs an act at another time. For the demo's seed, which tells of past weeks, and for tests of days. */
export const atTime = <T>(instant: string, act: () => Promise<T>): Promise<T> => fixed.run(instant, act);

/** The time an act was set to, or null when the real clock runs. */
export const fixedTime = (): string | null => fixed.getStore() ?? null;

/** Now, as a UTC instant. */
export const nowInstant = (): string => fixedTime() ?? new Date().toISOString();

/** The calendar day of an instant in Europe/London, `YYYY-MM-DD`. */
export const londonDay = (instant: string): string => dayInLondon(new Date(instant));

/** Today in Europe/London. */
export const today = (): string => londonDay(nowInstant());
