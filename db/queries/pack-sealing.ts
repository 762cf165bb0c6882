import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { nowInstant } from "../clock";
import type { Tx } from "../client";
import { movedOn, notFound, refusal } from "../permission";
import { differences } from "../record-changes";
import { recordEvent } from "../record-event";
import { events, members, packs, photos, type FrozenPhoto } from "../schema";
import { refreshStanding } from "../standing";
import { asFirm } from "../tenant";
import { assessLocked } from "./assessments";
import { lockJob, type LockedJob } from "./job-saves";
import type { Job } from "@/lib/notify/job";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { AssessmentView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";
import { enqueue } from "@/lib/server/queue/enqueue";

export type SealInput = {
  jobId: string;
  /** Made by the client: the same seal sent twice makes one pack. */
  packId: string;
  expectedVersion: number;
  declaration: { name: string; statement: string };
  /** Why it is sealed although facts are missing; null when none is. */
  gapsReason: string | null;
};
export type Sealed = { packId: string; version: number };

/** Only an installer with a registration may declare the work and seal it. */
async function isCompetent(tx: Tx, viewer: Viewer): Promise<boolean> {
  const [place] = await tx
    .select({ registration: members.registration })
    .from(members)
    .where(and(eq(members.firmId, viewer.firmId), eq(members.userId, viewer.userId)));
  return viewer.roles.includes("installer") && Boolean(place?.registration);
}

async function photosToSeal(tx: Tx, firmId: string, jobId: string): Promise<FrozenPhoto[]> {
  const rows = await tx
    .select({
      file: photos.file,
      subject: photos.subject,
      caption: photos.caption,
      takenAt: photos.takenAt,
      storageKey: photos.storageKey,
    })
    .from(photos)
    .where(and(eq(photos.firmId, firmId), eq(photos.jobId, jobId), isNull(photos.removedAt), eq(photos.inPack, true)))
    .orderBy(asc(photos.createdAt), asc(photos.id));
  return rows.map((row, index) => ({ ...row, number: index + 1 }));
}

/** The head of the firm's chain of events, so that each sealed pack vouches for everything before it. */
async function chainHead(tx: Tx, firmId: string): Promise<string | null> {
  const [newest] = await tx
    .select({ hash: events.hash })
    .from(events)
    .where(eq(events.firmId, firmId))
    .orderBy(desc(events.seq))
    .limit(1);
  return newest?.hash ?? null;
}

/** The record as it is sealed: with the declaration of the person who seals it, and no older one of that role. */
const withDeclaration = (record: Job, declaration: SealInput["declaration"], at: string): Job => ({
  ...record,
  declarations: [
    ...record.declarations.filter(({ role }) => role !== "competent-person"),
    { role: "competent-person", ...declaration, at },
  ],
});

const facts = ({ declarations: _declarations, ...record }: Job) => record;

async function freeze(
  tx: Tx,
  viewer: Viewer,
  job: LockedJob,
  input: SealInput,
  assessment: AssessmentView,
): Promise<Result<Sealed>> {
  const { firmId } = viewer;
  const [before] = await tx
    .select({ version: packs.version, status: packs.status, record: packs.record })
    .from(packs)
    .where(and(eq(packs.firmId, firmId), eq(packs.jobId, job.id)))
    .orderBy(desc(packs.version))
    .limit(1);
  if (before?.status === "building")
    return failed("conflict", `Version ${before.version} is still being built. Wait for it, then look again.`);
  const version = (before?.version ?? 0) + 1;
  const issuedAt = nowInstant();
  const record = withDeclaration(job.record, input.declaration, issuedAt);
  await tx.insert(packs).values({
    firmId,
    id: input.packId,
    jobId: job.id,
    version,
    jobVersion: job.version,
    record,
    assessmentId: assessment.id,
    assessment: assessment.body,
    photos: await photosToSeal(tx, firmId, job.id),
    changes: before ? differences(facts(before.record), facts(record)) : [],
    ruleset: assessment.body.ruleset,
    chainHead: await chainHead(tx, firmId),
    gapsReason: input.gapsReason,
    declarationName: input.declaration.name,
    declarationStatement: input.declaration.statement,
    sealedBy: viewer.userId,
    issuedAt,
    createdAt: issuedAt,
  });
  await refreshStanding(tx, firmId, job.id);
  await enqueue(tx, "build-pack", { firmId, packId: input.packId });
  const about = {
    version: 1,
    jobId: job.id,
    jobNumber: job.number,
    packId: input.packId,
    packVersion: version,
  } as const;
  await recordEvent(tx, viewer, { type: "pack.frozen", ...about, gapsReason: input.gapsReason });
  return ok({ packId: input.packId, version });
}

async function sealedBefore(tx: Tx, firmId: string, { packId, jobId }: SealInput): Promise<Result<Sealed> | null> {
  const [pack] = await tx
    .select({ jobId: packs.jobId, version: packs.version })
    .from(packs)
    .where(and(eq(packs.firmId, firmId), eq(packs.id, packId)));
  if (!pack) return null;
  if (pack.jobId !== jobId) return failed("key-reused", "This id was used before for the pack of another job.");
  return ok({ packId, version: pack.version });
}

/**
 * Seals a job's papers as its next version, in one transaction: record and assessment frozen as they stand, the
 * pack's row, its event, and the work of building put in the queue. Failures: `conflict` (the job moved on, or a
 * version is still being built), `not-competent`, `contradictory`, `gaps` (facts missing and no reason given).
 */
export async function sealPack(viewer: Viewer, input: SealInput): Promise<Result<Sealed>> {
  const refused = refusal(viewer, "packs.seal");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const job = await lockJob(tx, viewer.firmId, input.jobId);
    if (!job) return notFound("job");
    const before = await sealedBefore(tx, viewer.firmId, input);
    if (before) return before;
    if (job.version !== input.expectedVersion) return movedOn("job");
    if (!(await isCompetent(tx, viewer)))
      return failed("not-competent", "Only an installer with a registration may make the declaration and seal.");
    const assessment = await assessLocked(tx, viewer, job);
    if (!assessment.ok) return assessment;
    const { missing } = assessment.value.body;
    if (missing.length > 0 && !input.gapsReason?.trim())
      return failed(
        "gaps",
        "Facts are missing. Record them, or say why the pack is sealed without them.",
        missing.map(({ path, needed }) => ({ path, message: needed })),
      );
    const gapsReason = missing.length > 0 ? (input.gapsReason?.trim() ?? null) : null;
    return freeze(tx, viewer, job, { ...input, gapsReason }, assessment.value);
  });
}
