import { Photos } from "@/components/photos/photos";
import { oneOf } from "@/components/ui/query-link";
import { may } from "@/lib/notify/permissions";
import { photosNeeded } from "@/lib/notify/photos-needed";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/photos">) => jobTitle("Photos", params);

/** The photos of a job, as a checklist for its route. */
export default async function PhotosPage({ params, searchParams }: PageProps<"/jobs/[jobId]/photos">) {
  const { viewer, job, summary, assessment, today } = await loadJob(params);
  return (
    <Photos
      job={job}
      userId={viewer.userId}
      today={today}
      summary={summary}
      needed={assessment ? photosNeeded(job.record, assessment.body) : []}
      mayWrite={may(viewer.roles, "jobs.write")}
      fromCheck={oneOf((await searchParams).from) === "check"}
    />
  );
}
