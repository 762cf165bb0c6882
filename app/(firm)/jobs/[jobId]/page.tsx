import { Overview } from "@/components/job/overview";
import { may } from "@/lib/notify/permissions";
import { reviewOfJob } from "@/db/queries/reviews";
import { valueOf } from "@/app/(firm)/value-of";
import { jobTitle, loadJob } from "./load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]">) => jobTitle("Job", params);

/** The first eyelet: the eight subjects and how each stands. */
export default async function JobOverviewPage({ params }: PageProps<"/jobs/[jobId]">) {
  const { viewer, job, summary, today } = await loadJob(params);
  const review = valueOf(await reviewOfJob(viewer, { jobId: job.id }));
  const sentBack =
    review?.state === "returned" && review.reason
      ? { reason: review.reason, by: review.decidedBy ?? "Compliance" }
      : null;
  return (
    <Overview
      job={job}
      userId={viewer.userId}
      today={today}
      summary={summary}
      mayWrite={may(viewer.roles, "jobs.write")}
      sentBack={sentBack}
    />
  );
}
