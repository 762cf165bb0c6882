import type { IsoDate } from "@/lib/calc/parameter";
import { ownFigure, type OperatorRules } from "../firm-rules";
import { knownNumber } from "../job/facts";
import type { JobFacts } from "../job";
import { registerFigure } from "../register-figures";
import type { FactLog } from "../result";
import { rule } from "../rule";
import { finding, need, type Finding } from "./finding";

/** R1: the rating of the cut-out, and what it is known from. */
export const cutOutKnown = rule({
  id: "route.cut-out-known",
  group: "route",
  title: "Cut-out rating known, with its evidence",
  reads: ["supply.cutOutRatingA", "supply.cutOutEvidence", "supply.cutOutSeenUnder", "site.supplyNumber"],
  sources: ["ena-guidance", "npg-lct", "nged-fusing", "SI 2002/2665 reg 28"],
  outcomes: ["met", "cannot-tell"],
});

const askStatement =
  "Ask the operator for its written statement of the protective device; do not draw the fuse to look.";

const evidenceWords = {
  "operator-statement": "the operator’s statement",
  "fuse-seen": "the fuse link, seen under authority",
  "carrier-label": "the label on the carrier",
} as const;

/** The fuse this operator is known to refit cut-outs with, by the firm's word or the register's; null where labels count. */
function refitted(operatorId: string, rules: OperatorRules, on: IsoDate): { words: string; used: FactLog } | null {
  const own = ownFigure(rules, "assumesFuseA");
  const register = registerFigure("assumesFuseA", operatorId, on);
  if (own)
    return {
      words: `${own.value} A fuses, ${own.said} where the register has ${register.words}`,
      used: { registerFuseA: register.value, firmFuseA: own.value },
    };
  return register.value === null ? null : { words: `${register.words} fuses`, used: {} };
}

export function cutOutFinding({ supply }: JobFacts, operatorId: string, rules: OperatorRules, on: IsoDate): Finding {
  const { cutOutRatingA, cutOutEvidence, cutOutSeenUnder } = supply;
  const ratingA = knownNumber(cutOutRatingA);
  const doubt = cutOutEvidence === "carrier-label" ? refitted(operatorId, rules, on) : null;
  const used: FactLog = { cutOutRatingA, cutOutEvidence, ...doubt?.used };
  const tell = (because: string, effect: "apply" | "hold", path: string, needed: string) =>
    finding(cutOutKnown.says("cannot-tell", because, { used }), effect, [need(path, needed)]);
  const rating = "the rating of the cut-out, with how it is known";
  if (cutOutRatingA === null)
    return tell("The rating of the cut-out is not recorded.", "hold", "supply.cutOutRatingA", rating);
  if (ratingA === null)
    return tell(
      `The rating of the cut-out is not known, so the operator is asked first. ${askStatement}`,
      "apply",
      "supply.cutOutRatingA",
      rating,
    );
  if (cutOutEvidence === null || cutOutEvidence === "assumed" || cutOutEvidence === "unreadable")
    return tell(
      `${ratingA} A is recorded ${cutOutEvidence === "assumed" ? "as an assumption" : "without evidence"}, which counts as not known. ${askStatement}`,
      "apply",
      "supply.cutOutEvidence",
      "how the rating is known",
    );
  if (cutOutEvidence === "fuse-seen" && !(cutOutSeenUnder.authority && cutOutSeenUnder.on))
    return tell(
      `${ratingA} A is recorded as seen on the fuse, which counts only with the authority it was seen under and the day.`,
      "hold",
      cutOutSeenUnder.authority ? "supply.cutOutSeenUnder.on" : "supply.cutOutSeenUnder.authority",
      "the operator’s authority to see the fuse link, and the day",
    );
  if (doubt)
    return tell(
      `A label of ${ratingA} A says only what the carrier takes, and this operator is refitting cut-outs with ${doubt.words}. ${askStatement}`,
      "hold",
      "supply.cutOutEvidence",
      "the operator’s statement of the fuse fitted",
    );
  return finding(
    cutOutKnown.says("met", `${ratingA} A, known from ${evidenceWords[cutOutEvidence]}.`, {
      used,
      recorded: `${ratingA} A`,
    }),
    "none",
  );
}
