/** The four things a rule can say. A missing fact is `cannot-tell`, never a pass. */
export const outcomes = ["met", "not-met", "cannot-tell", "not-applicable"] as const;
export type Outcome = (typeof outcomes)[number];

const byGravity: readonly Outcome[] = ["not-met", "cannot-tell", "met", "not-applicable"];

/** Order in which outcomes are shown, the worst first: 0 for `not-met`, 3 for `not-applicable`. */
export const gravity = (outcome: Outcome): number => byGravity.indexOf(outcome);

export type Group =
  "route" | "generation" | "demand" | "supply" | "circuit" | "open-pen" | "power-quality" | "settings";

/** Figures and facts a rule read, by name with the unit in the name. */
export type FactLog = Readonly<Record<string, number | string | boolean | null | readonly (number | string | null)[]>>;

/** One rule's answer, complete enough to be printed and followed by hand. */
export type Reason = {
  /** Stable id, `family.name`, or a regulation id such as `R10-1`. */
  rule: string;
  group: Group;
  /** What was checked, as a heading: "Voltage drop to the chargepoint". */
  title: string;
  /** The circuit, board or chargepoint it speaks of; null for the site as a whole. */
  of: string | null;
  outcome: Outcome;
  /** One plain sentence with the figure in it. */
  because: string;
  used: FactLog;
  /** What was recorded, with its unit, for a table; null where a figure makes no sense. */
  recorded: string | null;
  /** The limit with its sign and unit, for a table. */
  limit: string | null;
  /** The sum, a line a step, figures substituted. Empty when there is no sum. */
  workings: readonly string[];
  /** References into the sources register: an id, then a clause if there is one. */
  sources: readonly string[];
};

/** An expected failure: a code for the program, a sentence for the person. */
export type Failure = { code: string; message: string; fields?: readonly FieldError[] };

/** One wrong field: its path in the record and the remedy. */
export type FieldError = { path: string; message: string };

export type Result<T> = { ok: true; value: T } | { ok: false; error: Failure };

export const ok = <T>(value: T): Result<T> => ({ ok: true, value });
export const failed = (code: string, message: string, fields?: readonly FieldError[]): Result<never> => ({
  ok: false,
  error: fields ? { code, message, fields } : { code, message },
});

/** What a form gets back from an act: nothing yet, done with a value, or the sentence and fields to show. */
export type ActionState<T = unknown> =
  | { status: "idle" }
  | { status: "done"; value: T; message?: string }
  | { status: "failed"; message: string; fields: readonly FieldError[] };
