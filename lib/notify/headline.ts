import type { IsoDate } from "@/lib/calc/parameter";
import type { Assessment, Deadline } from "./assessment";
import { daysBetween, longDate, weekdayDate } from "./calendar";
import type { AssessmentSummary } from "./views";

export type Headline = {
  /** The decision as one sentence, without a full stop. */
  title: string;
  /** What it means for the person, one or two sentences. */
  also: string;
  /** Where the day and the rules come from. */
  basis: string;
};

const operatorIn = ({ operator }: Assessment) => (operator.kind === "unknown" ? "the network operator" : operator.name);

const count = (number: number, one: string) => `${number} ${one}${number === 1 ? "" : "s"}`;

const deadlineOf = ({ deadlines }: Assessment, what: Deadline["what"]) => deadlines.find((each) => each.what === what);

/** The day that matters first for the operator, if any. Building control has its own line and never this one. */
export const firstDeadline = ({ deadlines }: Assessment): Deadline | null =>
  deadlines.filter(({ what }) => what !== "building-control").sort((a, b) => a.lastDay.localeCompare(b.lastDay))[0] ??
  null;

function withTwoWay(assessment: Assessment, words: string): string {
  const { generation } = assessment.route;
  if (generation === "none") return words;
  if (generation === "more-facts-needed") return `${words} What the unit may discharge is not settled yet.`;
  if (generation === "g98" || generation === "sgi-1") return `${words} A generation notice goes as well.`;
  return `${words} A generation application goes first; do not energise before it is accepted.`;
}

/** The decision of an assessment in words, for the top of a page and of a document. */
export function headline(assessment: Assessment): Headline {
  const { asAt, ruleset, route } = assessment;
  const { title, also } = decision(assessment);
  const rules = `Rule set ${ruleset}, as at ${longDate(asAt)}.`;
  const basis = firstDeadline(assessment)?.basis;
  return {
    title,
    also: route.demand === "stop" ? also : withTwoWay(assessment, also),
    basis: basis ? `${basis} ${rules}` : rules,
  };
}

function decision(assessment: Assessment): { title: string; also: string } {
  const operator = operatorIn(assessment);
  switch (assessment.route.demand) {
    case "stop":
      return {
        title: `Stop. ${stopWords(assessment)}`,
        also: "No notice and no application leaves this job. One safety report does.",
      };
    case "more-facts-needed":
      return {
        title: "The route cannot be told yet",
        also: `${count(assessment.missing.length, "fact")} must be recorded before anything goes to ${operator}.`,
      };
    case "late-application":
      return {
        title: `Apply to ${operator} now, after the fact`,
        also: "This should have been applied for before installing, and no approval held before it is recorded.",
      };
    case "apply":
      return applying(assessment, operator);
    case "notify":
      return notifying(assessment, operator);
  }
}

function stopWords({ route }: Assessment): string {
  const danger = route.reasons.find(({ used }) => used.leadsTo === "stop");
  return danger?.title ?? "Danger recorded";
}

function applying(assessment: Assessment, operator: string) {
  const due = deadlineOf(assessment, "completion-notice");
  if (due)
    return {
      title: `Send ${operator} the completion notice by ${weekdayDate(due.lastDay, assessment.asAt)}`,
      also: "The work was approved before installing.",
    };
  if (assessment.route.approval === "held")
    return {
      title: `${operator} has approved the work`,
      also: "Fit what was approved, then send the completion notice.",
    };
  return {
    title: `Apply to ${operator} before installing`,
    also: `Fit nothing until ${operator} has answered in writing. Silence is not consent.`,
  };
}

function notifying(assessment: Assessment, operator: string) {
  const due = deadlineOf(assessment, "demand-notice");
  if (!due) return { title: `Notify ${operator}`, also: "No application is needed before installing." };
  const when = weekdayDate(due.lastDay, assessment.asAt);
  const late = due.lastDay < assessment.asAt;
  return {
    title: late ? `Notify ${operator} now; it was due by ${when}` : `Notify ${operator} by ${when}`,
    also: "No application was needed before installing.",
  };
}

/** What the lists and the foot of the form show of an assessment. `asAt` is today, for the days left. */
export function summaryOf(assessment: Assessment, asAt: IsoDate): AssessmentSummary {
  const due = firstDeadline(assessment);
  return {
    route: assessment.route.demand,
    headline: headline(assessment).title,
    missing: assessment.missing,
    lastDay: due?.lastDay ?? null,
    daysLeft: due ? daysBetween(asAt, due.lastDay) : null,
    fields: [],
  };
}
