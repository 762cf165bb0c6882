import { Check } from "@/components/job/check";
import { listPacks } from "@/db/queries/packs";
import { photosNeeded } from "@/lib/notify/photos-needed";
import { may } from "@/lib/notify/permissions";
import { valueOf } from "@/app/(firm)/value-of";
import { sealAct } from "../actions";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/check">) => jobTitle("Check answers", params);

/** Every answer by subject, what blocks sealing, the declaration, and the seal. */
export default async function CheckPage({ params }: PageProps<"/jobs/[jobId]/check">) {
  const { viewer, job, summary, assessment, today } = await loadJob(params);
  const packs = valueOf(await listPacks(viewer, { jobId: job.id }));
  return (
    <Check
      job={job}
      userId={viewer.userId}
      today={today}
      summary={summary}
      operatorName={assessment && assessment.body.operator.kind !== "unknown" ? assessment.body.operator.name : null}
      nextVersion={(packs[0]?.version ?? 0) + 1}
      building={packs[0]?.status === "building"}
      neededPhotos={assessment ? photosNeeded(job.record, assessment.body) : []}
      mayWrite={may(viewer.roles, "jobs.write")}
      maySeal={viewer.roles.includes("installer")}
      seal={sealAct}
    />
  );
}
