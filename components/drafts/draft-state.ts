import type { Job } from "@/lib/notify/job";
import type { FieldError } from "@/lib/notify/result";
import type { AssessmentSummary, Change, Conflict } from "@/lib/notify/views";
import { factAt, liesWithin, sameFact, withChanges, withFact } from "./facts-at";

/** What was typed but cannot be stored as it stands, with the sentence that says why. */
export type Held = { typed: unknown; message: string };

export type Batch = { saveId: string; baseVersion: number; changes: Change[] };

/** One job on this device: the record as the server last gave it, and what has been typed since. */
export type DraftState = {
  base: Job;
  version: number;
  /** On its way. Kept whole, with its id, until there is an answer, so that a replay changes nothing. */
  sending: Batch | null;
  pending: Change[];
  held: Record<string, Held>;
  conflicts: Conflict[];
  changedBy: string | null;
  /** When the oldest unsent change was made, milliseconds; null when nothing waits. */
  since: number | null;
  summary: AssessmentSummary | null;
};

export const newDraft = (base: Job, version: number, summary: AssessmentSummary | null = null): DraftState => ({
  base,
  version,
  sending: null,
  pending: [],
  held: {},
  conflicts: [],
  changedBy: null,
  since: null,
  summary,
});

/** What the server will hold once the batch on its way has arrived. */
const expected = ({ base, sending }: DraftState) => (sending ? withChanges(base, sending.changes) : base);

/** The record as the person sees it. */
export const currentRecord = (state: DraftState): Job => withChanges(expected(state), state.pending);

export const unsentCount = ({ sending, pending, conflicts, held }: DraftState) =>
  (sending?.changes.length ?? 0) + pending.length + conflicts.length + Object.keys(held).length;

const without = (held: DraftState["held"], path: string) =>
  Object.fromEntries(Object.entries(held).filter(([key]) => key !== path && !liesWithin(key, path)));

/**
 * A fact changed by the person. Changes never overlap: one inside a list that is itself waiting is folded into the
 * list, and one of a whole list takes in what waited below it.
 */
export function edited(state: DraftState, path: string, value: unknown, now: number): DraftState {
  const outer = state.pending.find((change) => liesWithin(path, change.path));
  if (outer) {
    const inner = path.slice(outer.path.length).replace(/^\./, "");
    const whole = withFact(outer.value, inner, value);
    return {
      ...state,
      held: without(state.held, path),
      pending: state.pending.map((change) => (change === outer ? { ...change, value: whole } : change)),
    };
  }
  const was = factAt(expected(state), path);
  const others = state.pending.filter((change) => change.path !== path && !liesWithin(change.path, path));
  const pending = sameFact(was, value) ? others : [...others, { path, was, value: value ?? null }];
  const held = without(state.held, path);
  const conflicts = state.conflicts.filter((conflict) => conflict.path !== path);
  return { ...state, pending, held, conflicts, since: pending.length ? (state.since ?? now) : state.since };
}

/** Something typed that cannot be stored: kept here, shown with its sentence, not sent. */
export function held(state: DraftState, path: string, typed: unknown, message: string): DraftState {
  const pending = state.pending.filter((change) => change.path !== path);
  return { ...state, pending, held: { ...state.held, [path]: { typed, message } } };
}

/** The batch to send next: the one on its way if its answer never came, else all that waits. */
export function withBatch(state: DraftState, saveId: string): DraftState {
  if (state.sending || state.pending.length === 0) return state;
  return { ...state, sending: { saveId, baseVersion: state.version, changes: state.pending }, pending: [] };
}

export function saved(state: DraftState, version: number, summary: AssessmentSummary): DraftState {
  const next = { ...state, base: expected(state), version, sending: null, summary };
  return { ...next, since: unsentCount(next) ? state.since : null };
}

/** Puts the batch back in front of what was typed meanwhile; a later change of the same fact wins. */
function unsent(state: DraftState): Change[] {
  const later = state.pending;
  const earlier = (state.sending?.changes ?? []).filter(
    ({ path }) => !later.some((change) => change.path === path || liesWithin(path, change.path)),
  );
  const merged = later.map((change) => {
    const before = state.sending?.changes.find(({ path }) => path === change.path);
    return before ? { ...change, was: before.was } : change;
  });
  return [...earlier, ...merged];
}

/** Fields the server would not take: held with their sentences, the rest waits for the next batch. */
export function refused(state: DraftState, fields: readonly FieldError[]): DraftState {
  const waiting = unsent(state);
  const wrong = (path: string) =>
    fields.find((field) => field.path === path || liesWithin(field.path, path) || liesWithin(path, field.path));
  const heldNow = waiting.flatMap(({ path, value }) => {
    const field = wrong(path);
    return field ? [[path, { typed: value, message: field.message }] as const] : [];
  });
  return {
    ...state,
    sending: null,
    pending: waiting.filter(({ path }) => !wrong(path)),
    held: { ...state.held, ...Object.fromEntries(heldNow) },
  };
}

/** Somebody else changed the same facts: both values are kept until the person has chosen. */
export function inConflict(
  state: DraftState,
  answer: { version: number; conflicts: Conflict[]; changedBy: string | null },
): DraftState {
  const disputed = (path: string) => answer.conflicts.some((conflict) => conflict.path === path);
  const theirs = answer.conflicts.map(({ path, was, theirs: value }) => ({ path, was, value }));
  return {
    ...state,
    base: withChanges(state.base, theirs),
    version: answer.version,
    sending: null,
    pending: unsent(state).filter(({ path }) => !disputed(path)),
    conflicts: [...state.conflicts.filter(({ path }) => !disputed(path)), ...answer.conflicts],
    changedBy: answer.changedBy,
  };
}

/** The person's choice between the two values of one fact. */
export function chosen(state: DraftState, path: string, whose: "yours" | "theirs", now: number): DraftState {
  const conflict = state.conflicts.find((item) => item.path === path);
  if (!conflict) return state;
  const rest = { ...state, conflicts: state.conflicts.filter((item) => item !== conflict) };
  if (whose === "yours") return edited(rest, path, conflict.yours, now);
  return { ...rest, since: unsentCount(rest) ? rest.since : null };
}

/** A newer record from the server. What waits here stays; nothing on its way may be passed over. */
export function absorbed(state: DraftState, base: Job, version: number): DraftState {
  return version > state.version && !state.sending ? { ...state, base, version } : state;
}
