import { and, desc, eq, ne, sql } from "drizzle-orm";
import type { Tx } from "./client";
import { jobs, packs, reviews, submissions } from "./schema";
import type { Job } from "@/lib/notify/job";
import { isSent } from "@/lib/notify/submission";
import { standingOf, type ThreadInput } from "@/lib/notify/thread";

/** How many facts a record holds, "unknown" included: somebody looked. The firm's own facts do not count. */
export function factCount({ firm: _firm, format: _format, jobNumber: _number, ...facts }: Job): number {
  const count = (value: unknown): number => {
    if (value === null || value === undefined) return 0;
    if (Array.isArray(value)) return value.length === 0 ? 1 : value.reduce<number>((sum, item) => sum + count(item), 0);
    if (typeof value === "object") return Object.values(value).reduce<number>((sum, item) => sum + count(item), 0);
    return 1;
  };
  return count(facts);
}

/** What a job's thread is drawn from. Four statements; null when the firm has no such job. */
export async function threadInput(tx: Tx, firmId: string, jobId: string): Promise<ThreadInput | null> {
  const [job] = await tx
    .select({
      stage: jobs.stage,
      route: jobs.route,
      contradicts: jobs.contradicts,
      missingCount: jobs.missingCount,
      record: jobs.record,
    })
    .from(jobs)
    .where(and(eq(jobs.firmId, firmId), eq(jobs.id, jobId)));
  if (!job) return null;
  const [pack] = await tx
    .select({ version: packs.version, status: packs.status, sha256: packs.sha256 })
    .from(packs)
    .where(and(eq(packs.firmId, firmId), eq(packs.jobId, jobId)))
    .orderBy(desc(packs.version))
    .limit(1);
  const [review] = await tx
    .select({ state: reviews.state })
    .from(reviews)
    .where(and(eq(reviews.firmId, firmId), eq(reviews.jobId, jobId), ne(reviews.state, "superseded")))
    .orderBy(desc(reviews.createdAt))
    .limit(1);
  const papers = await tx
    .select({ purpose: submissions.purpose, state: submissions.state, reference: submissions.reference })
    .from(submissions)
    .where(and(eq(submissions.firmId, firmId), eq(submissions.jobId, jobId), ne(submissions.state, "withdrawn")))
    .orderBy(submissions.createdAt, submissions.id);
  return {
    stage: job.stage,
    factCount: factCount(job.record),
    route: job.contradicts ? null : job.route,
    missingCount: job.missingCount,
    pack: pack ?? null,
    submissions: papers,
    review: review ?? null,
  };
}

/**
 * Writes anew where a job stands, after its record, pack, papers or review moved; in the transaction of the move.
 * Once every paper has gone there is no day left to miss, so the last day leaves the list.
 */
export async function refreshStanding(tx: Tx, firmId: string, jobId: string): Promise<void> {
  const thread = await threadInput(tx, firmId, jobId);
  if (!thread) return;
  const allSent = thread.submissions.length > 0 && thread.submissions.every(({ state }) => isSent(state));
  await tx
    .update(jobs)
    .set({ standing: standingOf(thread), ...(allSent ? { lastDay: sql`null` } : {}) })
    .where(and(eq(jobs.firmId, firmId), eq(jobs.id, jobId)));
}
