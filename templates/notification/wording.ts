import type { Job } from "@/lib/notify/job";
import type { NotificationVariant } from "@/lib/notify/pack";
import { operatorName, type Papers } from "../issue";
import { dayOf } from "../words/facts";

export type Wording = {
  title: string;
  /** After "To the operator.": what kind of paper this is, in a sentence or two. */
  subtitle: string;
  /** Heading over the reasons. */
  why: string;
};

const numbers = ["no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine"];

/** "one electric vehicle chargepoint", "12 electric vehicle chargepoints". */
function unitsOf({ chargepoints }: Job): string {
  const count = chargepoints.length;
  return `${numbers[count] ?? count} electric vehicle chargepoint${count === 1 ? "" : "s"}`;
}

const work = (job: Job): string =>
  job.kind === "removal"
    ? `removing ${unitsOf(job)}`
    : job.kind === "replacement"
      ? `replacing ${unitsOf(job)}`
      : job.kind === "change-after-commissioning"
        ? `changing ${unitsOf(job)}`
        : `installing ${unitsOf(job)}`;

const noticeSubtitle = (job: Job) =>
  job.stage === "planned"
    ? `Notice before ${work(job)}, planned for ${dayOf(job.dates.planned)}. The day will be confirmed afterwards.`
    : `Notice after ${work(job)}. No application was needed before installing.`;

const wordings: Readonly<Record<NotificationVariant, (job: Job) => Wording>> = {
  notice: (job) => ({
    title: "Network notification",
    subtitle: noticeSubtitle(job),
    why: "Why this is a notice",
  }),
  "notice-by-the-day": (job) => ({
    title: "Network notification",
    subtitle: `${noticeSubtitle(job)} The operator asks for it by the day of installing.`,
    why: "Why this is a notice",
  }),
  application: (job) => ({
    title: "Application to connect",
    subtitle:
      job.stage === "planned"
        ? `Application before ${work(job)}. Nothing is fitted until the operator has answered in writing.`
        : `Application for ${work(job)}.`,
    why: "Why the operator is asked first",
  }),
  "late-application": (job) => ({
    title: "Late application to connect",
    subtitle: `Application made after ${work(job)}. It should have been made before.`,
    why: "Why an application was needed",
  }),
  "completion-notice": (job) => ({
    title: "Completion notice",
    subtitle: `Notice that ${work(job)} is done, under the operator's approval.`,
    why: "How what was fitted compares with what was approved",
  }),
  "safety-report": () => ({
    title: "Safety report",
    subtitle:
      "Something was found at the service equipment that needs the operator. This is no notice and no application.",
    why: "What was found",
  }),
  "not-ready": (job) => ({
    title: "Network paper, not ready to send",
    subtitle: `Facts are missing, so it cannot be told whether ${work(job)} is notified or applied for.`,
    why: "What stands open",
  }),
};

/** Title, subtitle and headings of the network document, by what the route calls for. */
export function wordingOf(variant: NotificationVariant, { job, assessment }: Papers): Wording {
  const wording = wordings[variant](job);
  return { ...wording, subtitle: `To ${operatorName(assessment)}. ${wording.subtitle}` };
}
