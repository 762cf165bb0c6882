import type { Job } from "@/lib/notify/job";

/** The eight subjects in the order a person walks the site. */
export const subjects = [
  "intake",
  "demand",
  "chargepoint",
  "circuit",
  "earthing",
  "settings",
  "photos",
  "people",
] as const;
export type Subject = (typeof subjects)[number];

/** What follows from an answer: the rule first, then what to do about it. */
export type Consequence = { rule: string; then: string };

export type Option = { value: string | number | boolean; word: string };

/** One cell of a row in a list question. */
export type Cell = {
  key: string;
  label: string;
  kind: "text" | "number" | "choice" | "date";
  unit?: string;
  options?: readonly Option[];
  notKnown?: true;
  /** A line without it is not sent yet. */
  required?: true;
};

type Asked = {
  /** Path in the record; relative to the item when the group repeats over a list. */
  path: string;
  label: string;
  /** The label in a list of answers, when shorter than the question. */
  short?: string;
  hint?: string;
  /** Whether the question makes sense for this job; asked when absent. */
  applies?: (job: Job, index: number) => boolean;
  /** Set where somebody may look and not be able to tell: what that leads to. */
  notKnown?: Consequence;
  /** The word stored for "not known"; `unknown` unless the record has another. */
  notKnownValue?: string;
  /** What follows from any other answer. */
  consequence?: (value: unknown, job: Job, index: number) => Consequence | null;
  optional?: true;
};

export type Question = Asked &
  (
    | { kind: "choice"; options: readonly Option[]; columns?: 1 | 2 | 3; asList?: true }
    | { kind: "number"; unit: string; usual?: readonly number[]; whole?: true }
    | { kind: "text"; mono?: true; input?: "text" | "tel" | "email"; lines?: number; complete?: string }
    | { kind: "date" }
    | { kind: "lines"; complete?: string }
    /** Any of several; `alone` are answers that stand by themselves. */
    | { kind: "several"; options: readonly Option[]; alone?: readonly string[] }
    /** One number a phase. */
    | { kind: "figures"; unit: string }
    | { kind: "windows"; absent: string; none: string }
    | { kind: "rows"; noun: string; none: string; cells: readonly Cell[] }
    /** Amps on L1, L2 and L3, a line a state. */
    | { kind: "triples" }
    | { kind: "half-hours" }
  );

export type Repeats = "chargepoints" | "circuits" | "boards";

/** Questions that belong together; cut into screens of at most seven. */
export type Group = {
  subject: Subject;
  title: string;
  lead?: string;
  /** The list whose items the group asks about, one after another. */
  each?: Repeats;
  /** Reached by a link, not by the walk, unless this job needs it. */
  more?: (job: Job, index: number) => boolean;
  questions: readonly Question[];
};
