import { and, eq } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { firmRules } from "../firm-rules";
import { once } from "../idempotency";
import { derive } from "../job-columns";
import { movedOn, notFound, refusal } from "../permission";
import { applyChanges, listsDiffer } from "../record-changes";
import { recordEvent } from "../record-event";
import { jobs, users } from "../schema";
import { refreshStanding } from "../standing";
import { asFirm } from "../tenant";
import { parseDraft, type Job } from "@/lib/notify/job";
import { failed, ok, type FieldError, type Result } from "@/lib/notify/result";
import type { SaveReply, SaveRequest } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

export type LockedJob = {
  id: string;
  number: string;
  version: number;
  listsVersion: number;
  record: Job;
  updatedBy: string;
};

/** The job with its row held until the transaction ends: writers of one job pass one after the other. */
export async function lockJob(tx: Tx, firmId: string, jobId: string): Promise<LockedJob | null> {
  const [job] = await tx
    .select({
      id: jobs.id,
      number: jobs.number,
      version: jobs.version,
      listsVersion: jobs.listsVersion,
      record: jobs.record,
      updatedBy: jobs.updatedBy,
    })
    .from(jobs)
    .where(and(eq(jobs.firmId, firmId), eq(jobs.id, jobId)))
    .for("update");
  return job ?? null;
}

const unreadFields = (paths: readonly string[]): FieldError[] =>
  paths.map((path) => ({ path, message: "is not a fact of the job record; check the spelling" }));

/** Reads a record for storing: what is malformed or not part of the record is refused, field by field. */
export function readRecord(record: unknown): Result<Job> {
  const parsed = parseDraft(record);
  const fields = parsed.ok ? unreadFields(parsed.unread) : parsed.fields;
  if (parsed.ok && fields.length === 0) return ok(parsed.value);
  return failed("invalid", "Some facts cannot be stored as they stand. Nothing was saved.", fields);
}

/**
 * Stores a new record of a locked job as its next version, with everything the lists show worked out again.
 * Returns null when the version moved on, which the lock should have made impossible.
 */
export async function storeRecord(tx: Tx, viewer: Viewer, before: LockedJob, record: Job) {
  const on = today();
  const derived = derive(record, on, await firmRules(tx, viewer.firmId));
  const version = before.version + 1;
  const savedAt = nowInstant();
  const stored = await tx
    .update(jobs)
    .set({
      ...derived.columns,
      record,
      version,
      listsVersion: listsDiffer(before.record, record) ? version : before.listsVersion,
      updatedBy: viewer.userId,
      updatedAt: savedAt,
    })
    .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, before.id), eq(jobs.version, before.version)))
    .returning({ id: jobs.id });
  if (stored.length === 0) return null;
  await refreshStanding(tx, viewer.firmId, before.id);
  return { version, savedAt, summary: derived.summary };
}

async function personName(tx: Tx, userId: string): Promise<string | null> {
  const [person] = await tx.select({ name: users.name }).from(users).where(eq(users.id, userId));
  return person?.name ?? null;
}

async function save(tx: Tx, viewer: Viewer, job: LockedJob, input: SaveRequest): Promise<Result<SaveReply>> {
  if (input.baseVersion > job.version)
    return failed("invalid", "The save speaks of a version that does not exist yet. Load the job again.");
  const applied = applyChanges(job.record, input.changes, {
    stale: input.baseVersion !== job.version,
    listsMoved: input.baseVersion < job.listsVersion,
  });
  if (applied.kind === "invalid")
    return failed("invalid", "Some facts cannot be stored as they stand. Nothing was saved.", applied.fields);
  const about = { version: 1, jobId: job.id, jobNumber: job.number } as const;
  if (applied.kind === "conflict") {
    const { conflicts } = applied;
    const paths = conflicts.map(({ path }) => path);
    await recordEvent(tx, viewer, { type: "job.conflict", ...about, jobVersion: job.version, paths });
    const changedBy = await personName(tx, job.updatedBy);
    return ok({ saved: false, reason: "conflict", version: job.version, conflicts, changedBy });
  }
  if (applied.paths.length === 0) {
    const { summary } = derive(job.record, today(), await firmRules(tx, viewer.firmId));
    return ok({ saved: true, version: job.version, savedAt: nowInstant(), assessment: summary });
  }
  const record = readRecord(applied.record);
  if (!record.ok) return record;
  const stored = await storeRecord(tx, viewer, job, record.value);
  if (!stored) return movedOn("job");
  await recordEvent(tx, viewer, { type: "job.saved", ...about, jobVersion: stored.version, paths: applied.paths });
  return ok({ saved: true, version: stored.version, savedAt: stored.savedAt, assessment: stored.summary });
}

/**
 * Puts changes into a job, fact by fact. Two people on one job both keep their work unless they changed the same
 * fact: then nothing is saved and the answer holds both values. A malformed fact: `invalid`, nothing saved. The
 * same `saveId` sent again gets the first answer; with other changes, `key-reused`.
 */
export async function saveJob(viewer: Viewer, input: SaveRequest & { jobId: string }): Promise<Result<SaveReply>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  const { jobId, saveId, baseVersion, changes } = input;
  return asFirm(viewer, async (tx) => {
    const job = await lockJob(tx, viewer.firmId, jobId);
    if (!job) return notFound("job");
    const request = { jobId, baseVersion, changes };
    const keep = (reply: SaveReply) => reply.saved;
    return once(tx, viewer.firmId, { key: saveId, act: "job.save", request, keep }, () => save(tx, viewer, job, input));
  });
}
