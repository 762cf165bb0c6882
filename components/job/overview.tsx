"use client";

import type { Route } from "next";
import Link from "next/link";
import { useDraft } from "@/components/drafts/use-draft";
import { useSummary } from "@/components/drafts/use-summary";
import { ButtonLink } from "@/components/ui/button";
import { longMoment } from "@/components/ui/dates";
import type { AssessmentSummary, JobView } from "@/lib/notify/views";
import { ConflictPanel } from "./conflict-panel";
import { JobPage } from "./job-page";
import { MissingList } from "./missing-list";
import { recordAddress } from "./questions/screens";
import { SavedLine } from "./saved-line";
import { SubjectList } from "./subject-list";
import { standingOfSubject } from "./stops";
import { subjects } from "./questions/model";

type Props = {
  job: JobView;
  userId: string;
  today: string;
  summary: AssessmentSummary;
  mayWrite: boolean;
  /** The compliance lead's reason, while the review stands returned. */
  sentBack: { reason: string; by: string } | null;
};

/** The job itself: the decision so far, the eight subjects, what is missing, who touched it last. */
export function Overview({ job, userId, today, summary: atFirst, mayWrite, sentBack }: Props) {
  const draft = useDraft(job, userId, atFirst);
  const summary = useSummary(draft, atFirst, today);
  const { record } = draft;
  const start = subjects.find((subject) => {
    const { asked, answered, missing } = standingOfSubject(subject, record, summary.missing);
    return missing > 0 || answered < asked || (subject === "chargepoint" && asked === 0);
  });
  const done = summary.missing.length === 0 && summary.route !== null;
  return (
    <JobPage
      job={job}
      current="job"
      isOverview
      acts={
        <>
          {mayWrite && (
            <>
              <SavedLine draft={draft} />
              <ButtonLink href={`/jobs/new?copy=${job.id}` as Route}>Copy for another site</ButtonLink>
              <ButtonLink
                kind="act"
                href={(done ? `/jobs/${job.id}/check` : recordAddress(job.id, start ?? "intake")) as Route}
              >
                {done ? "Check and seal" : "Record facts"}
              </ButtonLink>
            </>
          )}
        </>
      }
    >
      <div className="split">
        <div className="stack">
          <ConflictPanel draft={draft} />
          {sentBack && (
            <section className="sent-back" aria-labelledby="sent-back">
              <h2 id="sent-back">Sent back by {sentBack.by}</h2>
              <p>{sentBack.reason}</p>
            </section>
          )}
          {job.duplicateOf && (
            <p className="sent-back">
              The same supply number and serial number stand in{" "}
              <Link href={`/jobs/${job.duplicateOf.id}` as Route}>{job.duplicateOf.number}</Link>. Check that this is
              not the same work twice.
            </p>
          )}
          <section aria-labelledby="subjects">
            <div className="section section__head">
              <h2 id="subjects">The walk</h2>
              <Link href={`/jobs/${job.id}/check` as Route}>{mayWrite ? "Check answers" : "Read all answers"}</Link>
            </div>
            <SubjectList
              jobId={job.id}
              record={record}
              missing={summary.missing}
              photos={{ taken: job.photos.length }}
            />
          </section>
        </div>
        <div className="stack">
          <section aria-labelledby="so-far">
            <div className="section section__head">
              <h2 id="so-far">So far</h2>
              <Link href={`/jobs/${job.id}/assessment` as Route}>Assessment</Link>
            </div>
            <p className="so-far">{summary.headline}.</p>
            {summary.fields.map(({ path, message }) => (
              <p key={path} className="quiet">
                {message}
              </p>
            ))}
          </section>
          <section aria-labelledby="missing">
            <div className="section section__head">
              <h2 id="missing">Missing</h2>
              <span>{summary.missing.length}</span>
            </div>
            <MissingList missing={summary.missing} record={record} jobId={job.id} />
          </section>
          <p className="quiet">
            {job.installerName ? `Installer: ${job.installerName}. ` : ""}
            Last saved {longMoment(job.updatedAt)}
            {job.updatedBy ? ` by ${job.updatedBy}` : ""}.
          </p>
        </div>
      </div>
    </JobPage>
  );
}
