import type { Route } from "next";
import Link from "next/link";
import { daysLeftInWords, shortDate } from "@/components/ui/dates";
import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import { addressOf } from "./questions/screens";

type Props = {
  summary: AssessmentSummary | null;
  /** What is missing of the subject on the screen. */
  here: AssessmentSummary["missing"];
  record: Job;
  jobId: string;
  today: string;
  /** Answers that are not stored as typed: two people's, or out of range. */
  open?: { conflicts: number; held: readonly string[] };
};

/** What is missing and the last day, at the edge of every screen of the walk. */
export function FootFacts({ summary, here, record, jobId, today, open }: Props) {
  const first = here[0] ?? summary?.missing[0];
  const total = summary?.missing.length ?? 0;
  return (
    <div className="site__facts">
      {open?.conflicts ? (
        <a href="#conflict">{open.conflicts} changed by two</a>
      ) : open?.held[0] ? (
        <Link href={addressOf(open.held[0], record, jobId) as Route}>{open.held.length} to put right</Link>
      ) : first ? (
        <Link href={addressOf(first.path, record, jobId) as Route}>
          {here.length ? `${here.length} missing here` : `${total} still missing`}
        </Link>
      ) : (
        <b className="strong">{summary?.fields.length ? "Facts contradict" : "Nothing missing"}</b>
      )}
      <span>{dayInWords(summary, today)}</span>
    </div>
  );
}

function dayInWords(summary: AssessmentSummary | null, today: string) {
  if (!summary?.route) return "Route not told yet";
  if (summary.lastDay && summary.daysLeft !== null)
    return (
      <>
        <b className="strong">{daysLeftInWords(summary.daysLeft)}</b>, to {shortDate(summary.lastDay, today)}
      </>
    );
  return routeInShort[summary.route];
}

const routeInShort: Record<NonNullable<AssessmentSummary["route"]>, string> = {
  notify: "A notice, no day yet",
  apply: "Apply first",
  "late-application": "Apply now, late",
  "more-facts-needed": "Route not told yet",
  stop: "Stop, see assessment",
};
