import type { Job } from "@/lib/notify/job";
import type { Change } from "@/lib/notify/views";

type Step = string | number;

const stepsOf = (path: string): Step[] =>
  [...path.matchAll(/([A-Za-z][A-Za-z0-9]*)|\[(\d+)\]/g)].map((part) => part[1] ?? Number(part[2]));

/** The fact at a path of the record, such as `circuits[0].cable.lengthM`; null where there is none. */
export function factAt(record: unknown, path: string): unknown {
  return (
    stepsOf(path).reduce<unknown>(
      (whole, step) => (whole !== null && typeof whole === "object" ? (whole as Record<Step, unknown>)[step] : null),
      record,
    ) ?? null
  );
}

function put(whole: unknown, [step, ...rest]: Step[], value: unknown): unknown {
  if (step === undefined) return value;
  const inner = whole !== null && typeof whole === "object" ? (whole as Record<Step, unknown>)[step] : null;
  if (typeof step === "number") {
    const list = Array.isArray(whole) ? [...whole] : [];
    list[step] = put(inner, rest, value);
    return list;
  }
  return { ...(whole !== null && typeof whole === "object" ? whole : {}), [step]: put(inner, rest, value) };
}

/** A copy of the record with one fact changed. */
export const withFact = <T>(record: T, path: string, value: unknown): T => put(record, stepsOf(path), value) as T;

export const withChanges = (record: Job, changes: readonly Change[]): Job =>
  changes.reduce((whole, { path, value }) => withFact(whole, path, value), record);

/** Whether one path lies inside another: `chargepoints[0].make` inside `chargepoints`. */
export const liesWithin = (inner: string, outer: string) =>
  inner.startsWith(`${outer}.`) || inner.startsWith(`${outer}[`);

const plain = (value: unknown): unknown => (typeof value === "string" ? value.trim() || null : (value ?? null));

/** Blank, absent and null are the same answer: not asked yet. */
export function sameFact(one: unknown, other: unknown): boolean {
  const [a, b] = [plain(one), plain(other)];
  if (a === b) return true;
  if (a === null || b === null || typeof a !== "object" || typeof b !== "object") return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
  if (Array.isArray(a) && Array.isArray(b) && a.length !== b.length) return false;
  return [...keys].every((key) => sameFact((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]));
}
