import type { FactLog, Group, Outcome, Reason } from "./result";

/** A rule as a reader of the rules list sees it: what it checks, what it reads, what it may answer, on whose word. */
export type RuleDefinition = {
  /** Stable id, never reused for another rule. */
  id: string;
  group: Group;
  title: string;
  /** Paths of the job record the rule reads; a leading `chargepoints.` means each chargepoint. */
  reads: readonly string[];
  sources: readonly [string, ...string[]];
  outcomes: readonly Outcome[];
};

export type Detail = {
  of?: string | null;
  used?: FactLog;
  recorded?: string | null;
  limit?: string | null;
  workings?: readonly string[];
  /** Replaces the rule's own sources when only one of them speaks to this answer. */
  sources?: readonly string[];
};

export type Rule<D extends RuleDefinition = RuleDefinition> = D & {
  /** Answers with one of the declared outcomes and a plain sentence. */
  says: (outcome: D["outcomes"][number], because: string, detail?: Detail) => Reason;
};

/** Declares a rule. The type lets it answer only with outcomes it declared, so that the rules list cannot lie. */
export const rule = <const D extends RuleDefinition>(definition: D): Rule<D> => ({
  ...definition,
  says: (outcome, because, detail = {}) => ({
    rule: definition.id,
    group: definition.group,
    title: definition.title,
    of: detail.of ?? null,
    outcome,
    because,
    used: detail.used ?? {},
    recorded: detail.recorded ?? null,
    limit: detail.limit ?? null,
    workings: detail.workings ?? [],
    sources: detail.sources ?? definition.sources,
  }),
});
