import type { Assessment } from "./assessment";
import { operatorNoticeDays } from "./register-figures";
import type { Job } from "./job";
import { papersDue } from "./papers-due";
import { ruleDay } from "./rule-day";

export type DocumentSlug =
  | "00-cover"
  | "01-network-notification"
  | "02-earthing-and-open-pen"
  | "03-smart-charging-settings"
  | "04-demand-and-circuit"
  | "05-handover";

/** What the network document of a pack says; `not-ready` when open facts leave no paper to send. */
export type NotificationVariant =
  | "notice"
  | "notice-by-the-day"
  | "application"
  | "late-application"
  | "completion-notice"
  | "safety-report"
  | "not-ready";

/** Which network document the route calls for. Generation papers go inside it, as a section of their own. */
export function notificationVariant(job: Job, assessment: Assessment): NotificationVariant {
  const { demand, approval } = assessment.route;
  switch (demand) {
    case "stop":
      return "safety-report";
    case "more-facts-needed":
      return "not-ready";
    case "late-application":
      return "late-application";
    case "apply":
      return approval === "held" && job.stage === "installed" ? "completion-notice" : "application";
    case "notify":
      return operatorNoticeDays(assessment.operator.id, ruleDay(job.dates)) === 0 ? "notice-by-the-day" : "notice";
  }
}

/**
 * The documents of a pack in their order. A stopped job seals a cover and its safety report and nothing else;
 * a removal has no settings, design or handover to speak of; a job without chargepoints has neither.
 */
export function documentsIn(job: Job, assessment: Assessment): DocumentSlug[] {
  if (assessment.route.demand === "stop") return ["00-cover", "01-network-notification"];
  if (job.kind === "removal" || job.chargepoints.length === 0) return ["00-cover", "01-network-notification"];
  const all: DocumentSlug[] = [
    "00-cover",
    "01-network-notification",
    "02-earthing-and-open-pen",
    "03-smart-charging-settings",
    "04-demand-and-circuit",
  ];
  return job.stage === "installed" ? [...all, "05-handover"] : all;
}

/** Whether the pack carries a generation paper beside that for demand. */
export const hasGenerationPaper = (assessment: Assessment): boolean =>
  papersDue(assessment).some(({ purpose }) => purpose === "generation-notice" || purpose === "generation-application");
