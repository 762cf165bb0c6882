import { and, asc, desc, eq, sql, type SQL } from "drizzle-orm";
import { londonDay, today } from "../clock";
import type { Tx } from "../client";
import { isInstant, pageOf, pageSize, readCursor } from "../keyset";
import { isRowId, notFound, refusal } from "../permission";
import { jobs, packs, reviews, users } from "../schema";
import { threadInput } from "../standing";
import { asFirm } from "../tenant";
import { photosOf } from "./photo-views";
import type { Job } from "@/lib/notify/job";
import { divisionOf } from "@/lib/notify/operators";
import { ok, type Result } from "@/lib/notify/result";
import type { ReviewState } from "@/lib/notify/review";
import { threadOf } from "@/lib/notify/thread";
import type { Page, ReviewRow, ReviewView } from "@/lib/notify/views";
import { workingDaysBetween } from "@/lib/notify/working-days";
import type { Viewer } from "@/lib/server/auth/viewer";

export { approveReview, returnReview } from "./review-decisions";

const rowColumns = {
  id: reviews.id,
  jobId: reviews.jobId,
  jobNumber: jobs.number,
  site: jobs.site,
  unit: jobs.unit,
  state: reviews.state,
  tally: reviews.tally,
  createdAt: reviews.createdAt,
  operatorId: jobs.operatorId,
  territory: sql<Job["site"]["territory"]>`${jobs.record} -> 'site' ->> 'territory'`,
};

const reviewRows = (tx: Tx, where: SQL | undefined) =>
  tx
    .select(rowColumns)
    .from(reviews)
    .innerJoin(jobs, and(eq(jobs.firmId, reviews.firmId), eq(jobs.id, reviews.jobId)))
    .where(where)
    .$dynamic();

function toRow({
  createdAt,
  operatorId,
  territory,
  ...row
}: Awaited<ReturnType<typeof reviewRows>>[number]): ReviewRow {
  const division = divisionOf(operatorId, territory);
  return { ...row, waitingWorkingDays: workingDaysBetween(londonDay(createdAt), today(), division) };
}

/** The reviews in one state, longest waiting first. Two statements whatever the rows. */
export async function listReviews(
  viewer: Viewer,
  { state, after }: { state: ReviewState; after: string | null },
): Promise<Result<Page<ReviewRow>>> {
  const refused = refusal(viewer, "reviews.read");
  if (refused) return refused;
  const cursor = readCursor(after);
  const usable = cursor && isRowId(cursor.id) && isInstant(cursor.key);
  return asFirm(viewer, async (tx) => {
    const where = and(eq(reviews.firmId, viewer.firmId), eq(reviews.state, state));
    const beyond = usable
      ? sql`(${reviews.createdAt}, ${reviews.id}) > (${cursor.key}::timestamptz, ${cursor.id}::uuid)`
      : undefined;
    const rows = await reviewRows(tx, and(where, beyond))
      .orderBy(asc(reviews.createdAt), asc(reviews.id))
      .limit(pageSize + 1);
    const total = await tx.$count(reviews, where);
    const page = pageOf(rows, (row) => ({ key: row.createdAt, id: row.id }));
    return ok({ rows: page.rows.map(toRow), next: page.next, total });
  });
}

async function viewOf(tx: Tx, firmId: string, which: SQL): Promise<ReviewView | null> {
  const [row] = await reviewRows(tx, and(eq(reviews.firmId, firmId), which))
    .orderBy(desc(reviews.createdAt))
    .limit(1);
  if (!row) return null;
  const [more] = await tx
    .select({
      version: reviews.version,
      packId: reviews.packId,
      packHash: packs.sha256,
      job: packs.record,
      assessment: packs.assessment,
      decidedBy: users.name,
      decidedAt: reviews.decidedAt,
      reason: reviews.reason,
      recordedBy: sql<string | null>`(select name from users where id = ${packs.sealedBy})`,
    })
    .from(reviews)
    .innerJoin(packs, and(eq(packs.firmId, reviews.firmId), eq(packs.id, reviews.packId)))
    .leftJoin(users, eq(users.id, reviews.decidedBy))
    .where(and(eq(reviews.firmId, firmId), eq(reviews.id, row.id)));
  const thread = await threadInput(tx, firmId, row.jobId);
  if (!more || !thread) return null;
  const { packHash, ...rest } = more;
  const photos = await photosOf(tx, firmId, row.jobId);
  return { ...toRow(row), ...rest, packHash8: packHash?.slice(0, 8) ?? null, photos, thread: threadOf(thread) };
}

/** One review whole: the record and assessment as they were sealed, and the photos. */
export async function getReview(viewer: Viewer, { reviewId }: { reviewId: string }): Promise<Result<ReviewView>> {
  const refused = refusal(viewer, "reviews.read");
  if (refused) return refused;
  if (!isRowId(reviewId)) return notFound("review");
  return asFirm(viewer, async (tx) => {
    const view = await viewOf(tx, viewer.firmId, eq(reviews.id, reviewId));
    return view ? ok(view) : notFound("review");
  });
}

/** The newest review of a job; null while it has none. */
export async function reviewOfJob(viewer: Viewer, { jobId }: { jobId: string }): Promise<Result<ReviewView | null>> {
  const refused = refusal(viewer, "reviews.read");
  if (refused) return refused;
  if (!isRowId(jobId)) return notFound("job");
  return asFirm(viewer, async (tx) => {
    const job = await tx
      .select({ id: jobs.id })
      .from(jobs)
      .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, jobId)));
    return job.length ? ok(await viewOf(tx, viewer.firmId, eq(reviews.jobId, jobId))) : notFound("job");
  });
}
