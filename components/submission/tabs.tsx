import Link from "next/link";
import { withQuery, type Query } from "@/components/ui/query-link";
import type { SubmissionFilter } from "@/lib/notify/views";

export type DeskTab = SubmissionFilter["tab"];

const tabName: Record<DeskTab, string> = {
  "needs-someone": "Needs someone",
  "past-last-day": "Past last day",
  "not-sent": "Not sent",
  "no-acknowledgement": "No acknowledgement",
  question: "Question",
  "chase-due": "Chase due",
  "offer-open": "Offer open",
  waiting: "Waiting",
  closed: "Closed",
  all: "All",
};
export const deskTabs = Object.keys(tabName) as DeskTab[];

/** The piles of the desk with their counts. */
export function DeskTabs({
  current,
  counts,
  query,
}: {
  current: DeskTab;
  counts: Record<DeskTab, number>;
  query: Query;
}) {
  return (
    <nav className="tabs" aria-label="Standing">
      {deskTabs.map((tab) => (
        <Link
          key={tab}
          href={withQuery("/submissions", query, { tab: tab === "needs-someone" ? null : tab })}
          aria-current={tab === current ? "page" : undefined}
          className={tab === "past-last-day" && counts[tab] > 0 ? "is-late" : undefined}
        >
          {tabName[tab]} <b>{counts[tab].toLocaleString("en-GB")}</b>
        </Link>
      ))}
    </nav>
  );
}
