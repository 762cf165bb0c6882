import type { Route } from "next";
import { DocumentView } from "@/components/document-view/document-view";
import { Contradicted } from "@/components/assessment/contradicted";
import { JobPage } from "@/components/job/job-page";
import { BuildProgress } from "@/components/pack/build-progress";
import { DocumentList } from "@/components/pack/document-list";
import { SealAside } from "@/components/pack/seal-aside";
import { bytesInWords } from "@/components/pack/bytes";
import { ButtonLink } from "@/components/ui/button";
import { oneOf } from "@/components/ui/query-link";
import { nowInstant } from "@/db/clock";
import { listPacks } from "@/db/queries/packs";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { may } from "@/lib/notify/permissions";
import type { JobView, PackView } from "@/lib/notify/views";
import { documentsFor } from "@/templates/documents";
import type { Issue } from "@/templates/issue";
import { valueOf } from "@/app/(firm)/value-of";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/pack">) => jobTitle("Pack", params);

/** What a version says of itself: the sealed one's own words, or those the next one will carry. */
function issueOf(job: JobView, packs: PackView[], viewerName: string): { issue: Issue; isSealed: boolean } {
  const photos = job.photos
    .filter(({ inPack }) => inPack)
    .map(({ file, subject, caption, takenAt }, index) => ({
      file,
      subject: subject as EvidenceSubject,
      caption,
      takenAt,
      number: index + 1,
    }));
  const [newest] = packs;
  if (newest && newest.status !== "failed" && job.updatedAt <= newest.issuedAt) {
    const { version, issuedAt, sealedBy, gapsReason, changes } = newest;
    return { isSealed: true, issue: { version, issuedAt, sealedBy, gapsReason, changes, photos } };
  }
  const version = (newest?.version ?? 0) + 1;
  const next = { version, issuedAt: nowInstant(), sealedBy: viewerName, gapsReason: null, changes: [], photos };
  return { isSealed: false, issue: next };
}

/** The third eyelet: the documents as they will print, the seal, and every version. */
export default async function PackPage({ params, searchParams }: PageProps<"/jobs/[jobId]/pack">) {
  const { viewer, job, assessment, summary } = await loadJob(params);
  const packs = valueOf(await listPacks(viewer, { jobId: job.id }));
  const newest = packs[0] ?? null;
  const sealed = packs.find(({ status }) => status === "sealed") ?? null;
  const { issue, isSealed } = issueOf(job, packs, viewer.name);
  const documents = assessment ? documentsFor(job.record, assessment.body, issue) : [];
  const asked = oneOf((await searchParams).doc);
  const shown = documents.find(({ slug }) => slug === asked) ?? documents[0] ?? null;
  const acts = (
    <PackActs jobId={job.id} sealed={sealed} isCurrent={isSealed} mayWrite={may(viewer.roles, "packs.seal")} />
  );
  return (
    <JobPage job={job} current="pack" acts={acts}>
      {newest && newest.status !== "sealed" && <BuildProgress pack={newest} />}
      {!shown ? (
        <Contradicted fields={summary.fields} record={job.record} jobId={job.id} />
      ) : (
        <div className="pack">
          <DocumentList jobId={job.id} documents={documents} shown={shown.slug} pack={isSealed ? sealed : null} />
          <section aria-labelledby="preview" className="pack__preview">
            <div className="pack__bar">
              <h2 id="preview">{shown.title}</h2>
              <span className="quiet">
                {isSealed ? `Version ${issue.version}` : `Preview of version ${issue.version}`}
              </span>
            </div>
            <div className="a4-scroll" tabIndex={0} role="region" aria-label={`${shown.title}, as it prints`}>
              <DocumentView document={shown} />
            </div>
          </section>
          <SealAside
            packs={packs}
            sealed={sealed}
            record={job.record}
            missing={summary.missing.length}
            isCurrent={isSealed}
          />
        </div>
      )}
    </JobPage>
  );
}

type ActsProps = { jobId: string; sealed: PackView | null; isCurrent: boolean; mayWrite: boolean };

function PackActs({ jobId, sealed, isCurrent, mayWrite }: ActsProps) {
  const check = `/jobs/${jobId}/check` as Route;
  const wantsSeal = mayWrite && !isCurrent;
  return (
    <>
      {mayWrite && sealed && (
        <ButtonLink kind={wantsSeal ? "act" : "outline"} href={check}>
          New version
        </ButtonLink>
      )}
      {mayWrite && !sealed && !isCurrent && (
        <ButtonLink kind="act" href={check}>
          Check and seal
        </ButtonLink>
      )}
      {sealed && (
        <a className={wantsSeal ? "btn" : "btn btn--act"} href={`/api/v1/packs/${sealed.id}/download`} download>
          Download {wantsSeal ? `version ${sealed.version}` : "pack"}
          {sealed.bytes !== null && `, ${bytesInWords(sealed.bytes)}`}
        </a>
      )}
    </>
  );
}
