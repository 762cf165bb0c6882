import type { Route } from "next";
import Link from "next/link";
import { leftInWords, shortDate } from "@/components/ui/dates";
import { submissionPurposeName } from "@/lib/notify/submission";
import type { SubmissionRow, TodayView } from "@/lib/notify/views";

type Admin = NonNullable<TodayView["admin"]>;

/** What the office must send, chase or put right, the earliest due first. */
export function WaitingPapers({ admin, today }: { admin: Admin; today: string }) {
  return (
    <>
      <Papers title="Past the last day" tab="past-last-day" rows={admin.late} today={today} />
      <Papers title="Not sent" tab="not-sent" rows={admin.unsent} today={today} />
      <Papers title="No answer yet" tab="no-acknowledgement" rows={admin.unanswered} today={today} />
    </>
  );
}

function Papers({ title, tab, rows, today }: { title: string; tab: string; rows: SubmissionRow[]; today: string }) {
  if (rows.length === 0) return null;
  return (
    <section className="section" aria-labelledby={tab}>
      <div className="section__head">
        <h2 id={tab}>{title}</h2>
        <Link href={`/submissions?tab=${tab}` as Route}>All in this pile</Link>
      </div>
      <ul className="day">
        {rows.map((row) => (
          <li key={row.id}>
            <Link className="day-row" href={`/submissions?tab=all&open=${row.id}` as Route}>
              <b>{row.site}</b>
              <span className={`day-row__when${(row.daysLeft ?? 0) < 0 ? " is-late" : ""}`}>
                {row.dueOn ? `${shortDate(row.dueOn, today)}, ${leftInWords(row.daysLeft ?? 0)}` : "no day set"}
              </span>
              <span className="day-row__need">
                {submissionPurposeName[row.purpose]} to {row.operatorName}
              </span>
              <span className="day-row__need day-row__left">{row.nextStep}</span>
            </Link>
          </li>
        ))}
      </ul>
    </section>
  );
}
