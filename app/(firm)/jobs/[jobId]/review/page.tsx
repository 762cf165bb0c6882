import { approveAct, returnAct } from "@/app/(firm)/reviews/actions";
import { valueOf } from "@/app/(firm)/value-of";
import { JobPage } from "@/components/job/job-page";
import { Requirements } from "@/components/review/requirements";
import { tallyOf } from "@/components/review/review-sheet";
import { Verdict } from "@/components/review/verdict";
import { WeekSection } from "@/components/review/week-section";
import { longMoment } from "@/components/ui/dates";
import { reviewOfJob } from "@/db/queries/reviews";
import { may } from "@/lib/notify/permissions";
import { reviewStateName } from "@/lib/notify/review";
import type { ReviewView } from "@/lib/notify/views";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/review">) => jobTitle("Review", params);

/** The fifth eyelet: the settings of the sealed pack beside their evidence, and the verdict. */
export default async function ReviewEyeletPage({ params }: PageProps<"/jobs/[jobId]/review">) {
  const { viewer, job } = await loadJob(params);
  const review = valueOf(await reviewOfJob(viewer, { jobId: job.id }));
  return (
    <JobPage job={job} current="review">
      <div className="page-body">
        {review ? (
          <Judged review={review} mayDecide={may(viewer.roles, "reviews.decide")} />
        ) : (
          <section className="decision" aria-labelledby="none">
            <h2 id="none">Nothing to review yet</h2>
            <p className="decision__also">A review begins when a pack of an installed job is sealed.</p>
          </section>
        )}
      </div>
    </JobPage>
  );
}

function Judged({ review, mayDecide }: { review: ReviewView; mayDecide: boolean }) {
  const { job, assessment, photos } = review;
  return (
    <>
      <section className="decision" aria-labelledby="verdict">
        <h2 id="verdict">{reviewStateName[review.state]}</h2>
        <p className="decision__also">
          {review.decidedBy && review.decidedAt ? `${review.decidedBy}, ${longMoment(review.decidedAt)}.` : ""}
          {review.reason ? ` ${review.reason}` : ""}
        </p>
      </section>
      {job.chargepoints.map((unit) => {
        const results = assessment.smartCharging.filter(({ chargepoint }) => chargepoint === unit.id);
        return (
          <section
            key={unit.id}
            className="review-unit"
            aria-label={[unit.make, unit.model].filter(Boolean).join(" ") || unit.id}
          >
            <WeekSection chargepoint={unit} on={assessment.asAt} results={results} />
            <Requirements results={results} photos={photos} />
          </section>
        );
      })}
      {mayDecide && review.state === "waiting" && (
        <Verdict
          reviewId={review.id}
          version={review.version}
          tally={tallyOf(assessment.smartCharging)}
          recordedBy={review.recordedBy}
          acts={{ approve: approveAct, giveBack: returnAct }}
        />
      )}
    </>
  );
}
