import { NoValueInForce, type DatedValue, type IsoDate } from "@/lib/calc/parameter";
import { citedOn } from "@/lib/calc/parameters/wiring-edition";
import type { FactLog, Group, Outcome, Reason } from "@/lib/notify/result";

/** A wiring rule as the register of rules lists it. */
export type Rule = {
  /** Stable id, `family.name`. */
  id: string;
  group: Group;
  title: string;
  /** Paths of the record it reads; `[]` stands for every item of a list. */
  reads: readonly string[];
  /** References; `BS 7671 clause` takes the edition of the day. */
  sources: readonly string[];
  /** The outcomes it can give. */
  gives: readonly Outcome[];
};

/** What a rule says of one item. */
export type Answer = {
  outcome: Outcome;
  because: string;
  used?: FactLog;
  recorded?: string | null;
  limit?: string | null;
  workings?: readonly string[];
};

/** Declares a rule. The catalogue lists it, and a test holds every outcome to a case. */
export const rule = (declared: Rule): Rule => declared;

/**
 * Runs a rule for one item on the day whose wiring standard applies. A day that no edition covers gives
 * `cannot-tell` in a sentence; nothing else is caught.
 */
export function judge(about: Rule, of: string | null, on: IsoDate, run: () => Answer): Reason {
  const answer = inForce(run) ?? cannotTell(outOfForce(on));
  return {
    rule: about.id,
    group: about.group,
    title: about.title,
    of,
    outcome: answer.outcome,
    because: answer.because,
    used: answer.used ?? {},
    recorded: answer.recorded ?? null,
    limit: answer.limit ?? null,
    workings: answer.workings ?? [],
    sources: inForce(() => about.sources.map((reference) => citedOn(reference, on))) ?? about.sources,
  };
}

/** The sentence for a day before the first edition held here. */
export const outOfForce = (on: IsoDate): string =>
  `No figure held here was in force on ${on}, so this is not judged; the 18th edition is the earliest held.`;

/** `run` of a sum, or null on a day that no edition covers. */
export function inForce<T>(run: () => T): T | null {
  try {
    return run();
  } catch (error) {
    if (error instanceof NoValueInForce) return null;
    throw error;
  }
}

type Rest = Omit<Answer, "outcome" | "because">;

/** Answers: one sentence, and what a table and the workings need. */
export const met = (because: string, rest: Rest = {}): Answer => ({ outcome: "met", because, ...rest });
/** See `met`. */
export const notMet = (because: string, rest: Rest = {}): Answer => ({ outcome: "not-met", because, ...rest });
/** See `met`. */
export const cannotTell = (because: string, rest: Rest = {}): Answer => ({ outcome: "cannot-tell", because, ...rest });
/** See `met`. */
export const notApplicable = (because: string, rest: Rest = {}): Answer => ({
  outcome: "not-applicable",
  because,
  ...rest,
});

/** `met` or `not-met` by a comparison. */
export const metIf = (passes: boolean, because: string, rest: Rest = {}): Answer => ({
  outcome: passes ? "met" : "not-met",
  because,
  ...rest,
});

/** The answer on a planned job for what is measured, set or handed over. */
export const notYet = (what: string): Answer => notApplicable(`The job is planned: ${what} comes after fitting.`);

/** The mark a remembered figure keeps in workings until the firm's qualified person clears it. */
export const mark = (entry: Pick<DatedValue<unknown>, "certainty">): string =>
  entry.certainty === "from memory: verify" ? " (from memory: verify)" : "";
