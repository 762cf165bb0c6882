import type { IsoDate } from "@/lib/calc/parameter";
import type { JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { cannotTell, judge, met, notApplicable, notMet } from "../rule";
import { limitRule } from "./rules";

/** The limit the record states, amps a phase; null without one. */
export function statedLimitA({ demand }: JobFacts): number | null {
  const { kind, limitA } = demand.loadLimit;
  return kind === null || kind === "none" ? null : limitA;
}

/** The limit that counts: under an operator's agreement or the operator's own scheme. Null otherwise. */
export function countedLimitA(job: JobFacts): number | null {
  const { kind, operatorAgreement } = job.demand.loadLimit;
  return kind === "operator-scheme" || operatorAgreement !== null ? statedLimitA(job) : null;
}

/** Says whether a load limit counts, and why. */
export const limitCheck = (job: JobFacts, on: IsoDate): Reason =>
  judge(limitRule, null, on, () => {
    const { kind, limitA, operatorAgreement } = job.demand.loadLimit;
    const used = { kind, limitA, operatorAgreement };
    if (kind === null) return cannotTell("Whether a load limit is set is not recorded; none is counted.", { used });
    if (kind === "none") return notApplicable("No load limit is set.", { used });
    if (limitA === null) return cannotTell("A load limit is set but its figure is not recorded.", { used });
    const rest = { used, recorded: `${limitA} A` };
    if (countedLimitA(job) !== null)
      return met(
        kind === "operator-scheme"
          ? `The limit of ${limitA} A counts: it is the operator's own scheme.`
          : `The limit of ${limitA} A counts: the operator has agreed to it.`,
        rest,
      );
    return notMet(`The limit of ${limitA} A is not counted: no agreement of the operator is recorded.`, rest);
  });
