import { and, inArray, isNull, gt, lte, lt, or, type SQL } from "drizzle-orm";
import { submissions } from "../schema";
import { submissionStates, isOver, isSent, type SubmissionState } from "@/lib/notify/submission";
import type { SubmissionFilter } from "@/lib/notify/views";

export type Tab = SubmissionFilter["tab"];

const over = submissionStates.filter(isOver);
const unsent = submissionStates.filter((state) => !isSent(state) && !isOver(state));
const chased: SubmissionState[] = ["submitted", "acknowledged"];
const asking: SubmissionState[] = ["question", "works-required", "refused", "offer-open"];
const settled = submissionStates.filter(
  (state) => isSent(state) && !isOver(state) && ![...chased, ...asking].includes(state),
);

const inStates = (states: readonly SubmissionState[]) => inArray(submissions.state, [...states]);

/** Papers somebody of the firm must act on: unsent, asked, or due for a chase by `on`. */
export const needsSomeone = (on: string): SQL | undefined =>
  or(inStates(unsent), inStates(asking), and(inStates(chased), lte(submissions.dueOn, on)));

/** What each tab of the submissions desk holds on the day `on`. Waiting and needs-someone have no row in common. */
export const tabWhere = (on: string): Record<Tab, SQL | undefined> => ({
  "needs-someone": needsSomeone(on),
  "past-last-day": and(inStates(unsent), lt(submissions.lastDay, on)),
  "not-sent": inStates(unsent),
  "no-acknowledgement": and(inStates(["submitted"]), lte(submissions.dueOn, on)),
  question: inStates(["question"]),
  "chase-due": and(inStates(["acknowledged"]), lte(submissions.dueOn, on)),
  "offer-open": inStates(["offer-open"]),
  waiting: or(inStates(settled), and(inStates(chased), or(isNull(submissions.dueOn), gt(submissions.dueOn, on)))),
  closed: inStates(over),
  all: undefined,
});

export const tabNames = Object.keys(tabWhere("2000-01-01")) as Tab[];
