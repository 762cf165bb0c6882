import type { Assessment } from "./assessment";
import type { IsoDate } from "@/lib/calc/parameter";
import type { SubmissionPurpose } from "./submission";

/** A paper that this assessment calls for, with its last day where it has one. */
export type PaperDue = { purpose: SubmissionPurpose; lastDay: IsoDate | null };

const lastDayOf = ({ deadlines }: Assessment, what: string) =>
  deadlines.find((each) => each.what === what)?.lastDay ?? null;

/** Papers for the demand side: what the route calls for. */
function demandPapers(assessment: Assessment): PaperDue[] {
  const { demand, approval } = assessment.route;
  if (demand === "notify") return [{ purpose: "demand-notice", lastDay: lastDayOf(assessment, "demand-notice") }];
  if (demand === "late-application") return [{ purpose: "application", lastDay: null }];
  if (approval !== "held") return [{ purpose: "application", lastDay: null }];
  const completion = lastDayOf(assessment, "completion-notice");
  return completion ? [{ purpose: "completion-notice", lastDay: completion }] : [];
}

/** Papers for generation, beside those for demand: a bidirectional unit is never told by one paper alone. */
function generationPapers(assessment: Assessment): PaperDue[] {
  const { generation } = assessment.route;
  if (generation === "none" || generation === "more-facts-needed") return [];
  const lastDay = lastDayOf(assessment, "generation-notice");
  if (generation === "g98" || generation === "sgi-1" || lastDay) return [{ purpose: "generation-notice", lastDay }];
  return [{ purpose: "generation-application", lastDay: null }];
}

/**
 * The papers an assessment calls for, one submission each. When the route is stop only the safety report leaves;
 * while facts are open none does.
 */
export function papersDue(assessment: Assessment): PaperDue[] {
  const { demand } = assessment.route;
  if (demand === "stop") return [{ purpose: "safety-report", lastDay: null }];
  if (demand === "more-facts-needed") return [];
  return [...demandPapers(assessment), ...generationPapers(assessment)];
}
