import type { IsoDate } from "@/lib/calc/parameter";
import { assess } from "@/lib/notify/assess";
import { summaryOf } from "@/lib/notify/headline";
import { parseJob, type Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";

/**
 * The summary of a record by the rules, run on this device while the server cannot be reached. What the firm has set
 * for its operators is not kept here, so the day is the register's; the server's own summary takes its place once it
 * answers.
 */
export function summaryHere(record: Job, today: IsoDate): AssessmentSummary {
  const facts = parseJob(record);
  if (facts.ok) return summaryOf(assess(facts.value, today), today);
  return {
    route: null,
    headline: "The record contradicts itself",
    missing: [],
    lastDay: null,
    daysLeft: null,
    fields: facts.fields,
  };
}
