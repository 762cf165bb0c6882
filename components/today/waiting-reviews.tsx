import type { Route } from "next";
import Link from "next/link";
import { workingDaysInWords } from "@/components/ui/dates";
import { Tally } from "@/components/ui/mark";
import type { ReviewRow } from "@/lib/notify/views";

/** Sealed packs whose settings nobody has judged yet. */
export function WaitingReviews({ waiting }: { waiting: ReviewRow[] }) {
  return (
    <section className="section" aria-labelledby="waiting">
      <div className="section__head">
        <h2 id="waiting">Settings to review</h2>
        <Link href={"/reviews" as Route}>The whole queue</Link>
      </div>
      <ul className="day">
        {waiting.map((row) => (
          <li key={row.id}>
            <Link className="day-row" href={`/reviews/${row.id}` as Route}>
              <b>{row.site}</b>
              <span className="day-row__when">{workingDaysInWords(row.waitingWorkingDays)}</span>
              <span className="day-row__need">{row.unit}</span>
              <span className="day-row__need">
                <Tally counts={row.tally} all />
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </section>
  );
}
