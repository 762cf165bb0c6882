import { isDeepStrictEqual } from "node:util";
import type { Job } from "@/lib/notify/job";
import type { FieldError } from "@/lib/notify/result";
import type { Change, Conflict } from "@/lib/notify/views";

type Step = string | number;
const listNames = ["boards", "circuits", "chargepoints"] as const;

/**
 * What a change may not touch: the format and the number are the firm's ledger, not facts of the job, and the list
 * of evidence follows the photos that are really here.
 */
const fixed = new Set(["format", "jobNumber", "evidence"]);

/** `circuits[0].cable.lengthM` as steps, or null when it is not a path. */
export function stepsOf(path: string): Step[] | null {
  if (!/^[A-Za-z][A-Za-z0-9]*((\.[A-Za-z][A-Za-z0-9]*)|(\[\d{1,3}\]))*$/.test(path)) return null;
  const steps = [...path.matchAll(/([A-Za-z][A-Za-z0-9]*)|\[(\d+)\]/g)].map((part) => part[1] ?? Number(part[2]));
  return steps.some((step) => step === "constructor" || step === "prototype") ? null : steps;
}

const inside = (whole: unknown, step: Step): unknown =>
  whole !== null && typeof whole === "object" && Object.hasOwn(whole, step)
    ? (whole as Record<Step, unknown>)[step]
    : null;

/** The fact at a path; null where there is none. */
export const factAt = (record: unknown, steps: readonly Step[]): unknown => steps.reduce(inside, record) ?? null;

/** Blank text, undefined and null all read as "not asked yet", as the record's own reader has it. */
const plain = (value: unknown): unknown => (typeof value === "string" ? value.trim() || null : (value ?? null));
const same = (one: unknown, other: unknown) => isDeepStrictEqual(plain(one), plain(other));

function put(whole: unknown, steps: readonly Step[], value: unknown): unknown {
  const [step, ...rest] = steps;
  if (step === undefined) return value;
  if (typeof step === "number") {
    const list = Array.isArray(whole) ? [...whole] : [];
    if (step > list.length) return undefined;
    list[step] = put(list[step] ?? null, rest, value);
    return list;
  }
  const holder = whole !== null && typeof whole === "object" && !Array.isArray(whole) ? whole : {};
  return { ...holder, [step]: put(inside(holder, step), rest, value) };
}

const idsOf = (record: Job) => listNames.map((name) => record[name].map(({ id }) => id));

/** Whether circuits, boards or chargepoints were added, taken out or reordered between two records. */
export const listsDiffer = (one: Job, other: Job): boolean => !isDeepStrictEqual(idsOf(one), idsOf(other));

const pointsIntoList = (steps: readonly Step[]) =>
  listNames.some((name) => steps[0] === name) && typeof steps[1] === "number";

export type Applied =
  | { kind: "applied"; record: unknown; paths: string[] }
  | { kind: "conflict"; conflicts: Conflict[] }
  | { kind: "invalid"; fields: FieldError[] };

/**
 * Puts one person's changes into the record as it stands now. When others saved since (`stale`), a fact that is
 * no longer what this person saw is a conflict, unless both now say the same. When the lists themselves have
 * changed since (`listsMoved`), a place in a list may mean another item, and such a change is a conflict too.
 */
export function applyChanges(
  record: Job,
  changes: readonly Change[],
  since: { stale: boolean; listsMoved: boolean },
): Applied {
  const fields: FieldError[] = [];
  const conflicts: Conflict[] = [];
  const paths: string[] = [];
  let next: unknown = record;
  for (const { path, was, value } of changes) {
    const steps = stepsOf(path);
    if (!steps || fixed.has(String(steps[0]))) {
      fields.push({ path, message: steps ? "cannot be changed here" : "is not a fact of the job record" });
      continue;
    }
    const theirs = factAt(record, steps);
    if (same(theirs, value)) continue;
    const unlike = since.stale && !same(theirs, was);
    if (unlike || (since.listsMoved && pointsIntoList(steps))) {
      conflicts.push({ path, was: was ?? null, yours: value ?? null, theirs });
      continue;
    }
    const changed = put(next, steps, value ?? null);
    if (factAt(changed, steps) === null && plain(value) !== null) {
      fields.push({ path, message: "stands beyond the end of its list; add the item first" });
      continue;
    }
    next = changed;
    paths.push(path);
  }
  if (fields.length) return { kind: "invalid", fields };
  if (conflicts.length) return { kind: "conflict", conflicts };
  return { kind: "applied", record: next, paths };
}

/** Every fact that differs between two records, leaf by leaf, for "what changed since version n". */
export function differences(was: unknown, now: unknown, path = ""): { path: string; was: unknown; now: unknown }[] {
  if (same(was, now)) return [];
  const both = [was, now].every((side) => side !== null && typeof side === "object" && !Array.isArray(side));
  const lists = Array.isArray(was) && Array.isArray(now) && was.length === now.length;
  if (lists) return now.flatMap((item, index) => differences(was[index], item, `${path}[${index}]`));
  if (!both) return [{ path, was: was ?? null, now: now ?? null }];
  const keys = new Set([...Object.keys(was as object), ...Object.keys(now as object)]);
  return [...keys].flatMap((key) => differences(inside(was, key), inside(now, key), path ? `${path}.${key}` : key));
}
