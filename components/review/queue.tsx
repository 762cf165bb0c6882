import Link from "next/link";
import { workingDaysInWords } from "@/components/ui/dates";
import { Tally } from "@/components/ui/mark";
import { withQuery } from "@/components/ui/query-link";
import { reviewStateName, reviewStates, type ReviewState } from "@/lib/notify/review";
import type { Page, ReviewRow } from "@/lib/notify/views";

type Props = {
  page: Page<ReviewRow>;
  state: ReviewState;
  openId: string | null;
  /** The job shown beside the queue on a desk. */ shownId?: string | null;
};

/** The compliance lead's queue: the longest waiting first. */
export function Queue({ page, state, openId, shownId = openId }: Props) {
  return (
    <nav className="queue" aria-label="Reviews">
      {openId ? <h2 className="queue__title">Reviews</h2> : <h1>Reviews</h1>}
      <p>{inWords(page, state)}</p>
      <ul className="queue__states">
        {reviewStates.map((each) => (
          <li key={each}>
            <Link
              href={withQuery("/reviews", { state: each === "waiting" ? null : each })}
              aria-current={each === state ? "true" : undefined}
            >
              {reviewStateName[each]}
            </Link>
          </li>
        ))}
      </ul>
      <ul className="queue__rows">
        {page.rows.map((row) => (
          <li key={row.id}>
            <Link
              href={withQuery(`/reviews/${row.id}`, { state: state === "waiting" ? null : state })}
              aria-current={row.id === shownId ? "page" : undefined}
            >
              <b>{row.site}</b>
              <span>{state === "waiting" ? days(row.waitingWorkingDays) : row.jobNumber}</span>
              <span>{row.unit}</span>
              <Tally counts={row.tally} />
            </Link>
          </li>
        ))}
      </ul>
      {page.next && (
        <p className="queue__more">
          <Link href={withQuery("/reviews", { state: state === "waiting" ? null : state, after: page.next })}>
            Next page
          </Link>
        </p>
      )}
    </nav>
  );
}

const days = (count: number) => (count === 0 ? "today" : count === 1 ? "1 day" : `${count} days`);

function inWords({ rows, total }: Page<ReviewRow>, state: ReviewState) {
  if (total === 0) return state === "waiting" ? "None waiting." : "None.";
  if (state !== "waiting") return `${total} ${reviewStateName[state].toLowerCase()}`;
  const oldest = Math.max(0, ...rows.map(({ waitingWorkingDays }) => waitingWorkingDays));
  return `${total} waiting, oldest ${workingDaysInWords(oldest)}`;
}
