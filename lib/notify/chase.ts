import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import type { Division } from "./bank-holidays";
import { daysBetween } from "./calendar";
import {
  answerWorkingDays,
  bounceCheckWorkingDays,
  complaintWorkingDays,
  formalChaseWorkingDays,
  phoneWorkingDays,
} from "./parameters/practice";
import { isOver, isSent, type SubmissionPurpose, type SubmissionState } from "./submission";
import { addWorkingDays, workingDaysBetween } from "./working-days";

export type ChaseInput = {
  purpose: SubmissionPurpose;
  state: SubmissionState;
  division: Division;
  asAt: IsoDate;
  /** Last day to send, when the paper has one. */
  lastDay: IsoDate | null;
  sentOn: IsoDate | null;
  /** Day of the last move, call or note: a step already taken is not asked for again. */
  lastHeardOn: IsoDate | null;
  /** Last day of an open offer. */
  expires: IsoDate | null;
};

export type NextStep = {
  text: string;
  /** The day the step falls, null when nothing waits. */
  dueOn: IsoDate | null;
  /** Days from `asAt` to that day, negative when late. */
  daysLeft: number | null;
  late: boolean;
};

type Step = { text: string; dueOn: IsoDate | null };

const decisions: Partial<Record<SubmissionState, string>> = {
  recorded: "Close",
  approved: "Fit as applied for, then send the completion notice",
  "approved-with-limit": "Set the limit, photograph it, then send the completion notice",
  "approved-works-to-follow": "Wait for the operator’s works, then close",
  "works-required": "Book the works",
  refused: "Change the job and apply again",
};

/** What to do next with one paper, and by when: chase practice in working days of the operator's division. */
export function nextStep(input: ChaseInput): NextStep {
  const { text, dueOn } = stepOf(input);
  const daysLeft = dueOn === null ? null : daysBetween(input.asAt, dueOn);
  return { text, dueOn, daysLeft, late: daysLeft !== null && daysLeft < 0 };
}

function stepOf(input: ChaseInput): Step {
  const { state, lastDay, expires } = input;
  if (isOver(state)) return { text: "Nothing", dueOn: null };
  if (state === "queued") return { text: "Leaving by e-mail", dueOn: lastDay };
  if (state === "bounced") return { text: "Correct the address, send again", dueOn: lastDay };
  if (!isSent(state)) return { text: unsent(input), dueOn: lastDay };
  if (state === "offer-open") return { text: "Accept the offer, or let it lapse", dueOn: expires };
  if (state === "question")
    return {
      text: "Answer the operator’s question",
      dueOn: days(input.lastHeardOn ?? input.asAt, valueAt(answerWorkingDays, input.asAt), input.division),
    };
  const decision = decisions[state];
  return decision ? { text: decision, dueOn: null } : chase(input);
}

function unsent({ purpose, lastDay, asAt }: ChaseInput): string {
  if (purpose === "safety-report") return "Telephone the operator, then send the report";
  if (lastDay === null) return "Send";
  if (lastDay < asAt) return "Send now; the last day has passed";
  return lastDay === asAt ? "Send today, the last day" : "Send";
}

const days = (from: IsoDate, count: number, division: Division): IsoDate => addWorkingDays(from, count, division);

type ChaseStage = { after: number; text: string };

function stages({ state, purpose, asAt }: ChaseInput): ChaseStage[] {
  const decides = purpose === "application" || purpose === "generation-application";
  const phone = { after: valueAt(phoneWorkingDays, asAt), text: "Telephone, note the name and what was said" };
  const later = [
    { after: valueAt(formalChaseWorkingDays, asAt), text: "Chase formally, quoting the reference" },
    { after: valueAt(complaintWorkingDays, asAt), text: "Use the operator’s complaint route" },
  ];
  if (state === "submitted")
    return [
      { after: valueAt(bounceCheckWorkingDays, asAt), text: "No acknowledgement: look for a bounce" },
      phone,
      ...later,
    ];
  return decides ? [phone, ...later] : [{ ...(later[0] as ChaseStage), text: "Ask whether the notice was recorded" }];
}

/**
 * The first stage that no call, note or move has yet answered. Counted from sending; a stage counts as answered
 * when something was recorded on or after the day it fell.
 */
function chase(input: ChaseInput): Step {
  const from = input.sentOn ?? input.asAt;
  const heardAfter = input.lastHeardOn === null ? 0 : workingDaysBetween(from, input.lastHeardOn, input.division);
  const plan = stages(input);
  const stage = plan.find(({ after }) => after > heardAfter) ?? (plan.at(-1) as ChaseStage);
  return { text: stage.text, dueOn: days(from, stage.after, input.division) };
}
