import Link from "next/link";
import { ThreadMini } from "@/components/thread/thread";
import { longDate, longMoment } from "@/components/ui/dates";
import { withQuery } from "@/components/ui/query-link";
import { reviewStateName } from "@/lib/notify/review";
import type { Outcome } from "@/lib/notify/result";
import type { ReviewView } from "@/lib/notify/views";
import type { ReviewActs } from "./acts";
import { Requirements } from "./requirements";
import { Verdict } from "./verdict";
import { WeekSection } from "./week-section";

type Props = {
  review: ReviewView;
  acts: ReviewActs | null;
  /** The heading's level: 1 on a page of its own, 2 beside the queue's. */ level?: 1 | 2;
};

/** The settings of one sealed pack beside their evidence, and the verdict. `acts` is null for who may not decide. */
export function ReviewSheet({ review, acts, level = 1 }: Props) {
  const { job, assessment } = review;
  const Heading = level === 1 ? "h1" : "h2";
  // Beside the queue the page's own heading stands one level up, so everything here moves down by one.
  const UnitHeading = level === 1 ? "h2" : "h3";
  const one = job.chargepoints.length === 1;
  const weekLevel = one ? UnitHeading : level === 1 ? "h3" : "h4";
  return (
    <div className="review">
      <header className="review__head">
        <div className="review__title">
          <Heading>{review.site}</Heading>
          <p className="review__thread">
            <ThreadMini thread={review.thread} />
            {review.packHash8 && <span className="mono">{review.packHash8}</span>}
          </p>
        </div>
        <p className="job-head__facts">
          <Link className="mono" href={withQuery(`/jobs/${review.jobId}`)}>
            {review.jobNumber}
          </Link>
          <span>{review.unit}</span>
          {one && job.chargepoints[0]?.smartCharging.users && (
            <span>{job.chargepoints[0].smartCharging.users} use</span>
          )}
          {one && job.chargepoints[0]?.smartCharging.firmware && (
            <span>
              Firmware <b className="mono">{job.chargepoints[0].smartCharging.firmware}</b>
            </span>
          )}
          {job.dates.sold && (
            <span>
              Sold <b>{longDate(job.dates.sold)}</b>
            </span>
          )}
          {review.recordedBy && (
            <span>
              Recorded by <b>{review.recordedBy}</b>
            </span>
          )}
        </p>
        <Decision review={review} />
      </header>
      <div className="review__main">
        {job.chargepoints.map((chargepoint) => {
          const results = assessment.smartCharging.filter((result) => result.chargepoint === chargepoint.id);
          return (
            <section key={chargepoint.id} aria-label={nameOf(chargepoint)}>
              {!one && <UnitHeading className="review__unit">{nameOf(chargepoint)}</UnitHeading>}
              <WeekSection level={weekLevel} chargepoint={chargepoint} on={assessment.asAt} results={results} />
              <Requirements results={results} photos={review.photos} />
            </section>
          );
        })}
        {job.chargepoints.length === 0 && <p className="none">No chargepoint is recorded on this job.</p>}
      </div>
      {acts && review.state === "waiting" && (
        <Verdict
          key={review.id}
          reviewId={review.id}
          version={review.version}
          tally={tallyOf(assessment.smartCharging)}
          recordedBy={review.recordedBy}
          acts={acts}
        />
      )}
    </div>
  );
}

type Unit = ReviewView["job"]["chargepoints"][number];

const nameOf = ({ make, model, serial, id }: Unit) =>
  [[make, model].filter(Boolean).join(" ") || id, serial].filter(Boolean).join(", ");

function Decision({ review }: { review: ReviewView }) {
  if (review.state === "waiting") return null;
  return (
    <p className="review__decided">
      <b className="strong">{reviewStateName[review.state]}</b>
      {review.decidedBy && `, ${review.decidedBy}`}
      {review.decidedAt && `, ${longMoment(review.decidedAt)}`}.{review.reason && ` ${review.reason}`}
    </p>
  );
}

export function tallyOf(results: readonly { outcome: Outcome }[]): Record<Outcome, number> {
  const tally: Record<Outcome, number> = { met: 0, "not-met": 0, "cannot-tell": 0, "not-applicable": 0 };
  for (const { outcome } of results) tally[outcome] += 1;
  return tally;
}
