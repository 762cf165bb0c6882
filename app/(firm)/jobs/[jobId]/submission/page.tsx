import type { Route } from "next";
import { recordMoveAct, recordNoteAct, recordSentAct, sendAct } from "@/app/(firm)/submissions/actions";
import { valueOf } from "@/app/(firm)/value-of";
import { CopySheet } from "@/components/job/copy-sheet";
import { JobPage } from "@/components/job/job-page";
import { Hand } from "@/components/submission/hand";
import { ButtonLink } from "@/components/ui/button";
import { shortDate } from "@/components/ui/dates";
import { getSubmission, submissionsOfJob } from "@/db/queries/submissions";
import { notificationData } from "@/lib/notify/notification";
import { may } from "@/lib/notify/permissions";
import { submissionPurposeName, submissionStateName } from "@/lib/notify/submission";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/submission">) => jobTitle("Submission", params);

const acts = { send: sendAct, recordSent: recordSentAct, recordMove: recordMoveAct, recordNote: recordNoteAct };

/** The fourth eyelet: each paper of this job, what was sent, what came back, and what falls next. */
export default async function SubmissionPage({ params }: PageProps<"/jobs/[jobId]/submission">) {
  const { viewer, job, assessment, today } = await loadJob(params);
  const rows = valueOf(await submissionsOfJob(viewer, { jobId: job.id }));
  const papers = await Promise.all(
    rows.map(async ({ id }) => valueOf(await getSubmission(viewer, { submissionId: id }))),
  );
  const mayWrite = may(viewer.roles, "submissions.write");
  return (
    <JobPage job={job} current="submission">
      <div className="page-body">
        {papers.length === 0 && (
          <section className="decision" aria-labelledby="none">
            <h2 id="none">Nothing to send yet</h2>
            <p className="decision__also">Papers are made when a pack is sealed, one for each that is due.</p>
            <p className="empty-act">
              <ButtonLink kind="act" href={`/jobs/${job.id}/pack` as Route}>
                Go to the pack
              </ButtonLink>
            </p>
          </section>
        )}
        {papers.length > 0 && assessment && mayWrite && (
          <CopySheet sections={notificationData(job.record, assessment.body)} />
        )}
        {papers.map((paper) => (
          <section key={paper.id} className="paper" aria-labelledby={`paper-${paper.id}`}>
            <div className="section section__head">
              <h2 id={`paper-${paper.id}`}>
                {submissionPurposeName[paper.purpose]} to {paper.operatorName}
              </h2>
              <span>
                {submissionStateName[paper.state]}
                {paper.dueOn && `, ${shortDate(paper.dueOn, today)}`}
              </span>
            </div>
            <Hand submission={paper} acts={mayWrite ? acts : null} today={today} />
          </section>
        ))}
      </div>
    </JobPage>
  );
}
