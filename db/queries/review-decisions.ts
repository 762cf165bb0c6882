import { and, eq } from "drizzle-orm";
import { nowInstant } from "../clock";
import { isRowId, movedOn, notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { jobs, reviews } from "../schema";
import { refreshStanding } from "../standing";
import { asFirm } from "../tenant";
import { approvalWaits } from "@/lib/notify/review-approval";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

export type Decided = { reviewId: string; version: number };
type Decision = { reviewId: string; version: number; to: "approved" | "returned"; reason: string | null };

async function decide(viewer: Viewer, { reviewId, version, to, reason }: Decision): Promise<Result<Decided>> {
  if (!isRowId(reviewId)) return notFound("review");
  const { firmId } = viewer;
  return asFirm(viewer, async (tx) => {
    const [held] = await tx
      .select({ jobId: jobs.id, jobNumber: jobs.number, tally: reviews.tally })
      .from(jobs)
      .innerJoin(reviews, and(eq(reviews.firmId, jobs.firmId), eq(reviews.jobId, jobs.id)))
      .where(and(eq(jobs.firmId, firmId), eq(reviews.id, reviewId)))
      .for("update", { of: jobs });
    if (!held) return notFound("review");
    const { tally, ...found } = held;
    const waits = to === "approved" ? approvalWaits(tally, reason) : null;
    if (waits) return failed("not-met", waits, tally["not-met"] > 0 ? [] : [{ path: "note", message: waits }]);
    const [moved] = await tx
      .update(reviews)
      .set({ state: to, reason, decidedBy: viewer.userId, decidedAt: nowInstant(), version: version + 1 })
      .where(
        and(
          eq(reviews.firmId, firmId),
          eq(reviews.id, reviewId),
          eq(reviews.version, version),
          eq(reviews.state, "waiting"),
        ),
      )
      .returning({ packId: reviews.packId });
    if (!moved) return movedOn("review");
    await refreshStanding(tx, firmId, found.jobId);
    const about = { version: 1, ...found, reviewId, packId: moved.packId } as const;
    if (to === "approved") await recordEvent(tx, viewer, { type: "review.approved", ...about });
    else await recordEvent(tx, viewer, { type: "review.returned", ...about, reason: reason ?? "" });
    return ok({ reviewId, version: version + 1 });
  });
}

/**
 * Signs the settings off. Failures: `not-met` while a requirement is not met, or cannot be told and no note says how
 * it was judged; `conflict` when the review has been decided or superseded since.
 */
export async function approveReview(
  viewer: Viewer,
  { reviewId, version, note }: { reviewId: string; version: number; note: string | null },
): Promise<Result<Decided>> {
  const refused = refusal(viewer, "reviews.decide");
  if (refused) return refused;
  return decide(viewer, { reviewId, version, to: "approved", reason: note?.trim() || null });
}

/** Sends the settings back to the installer, with the reason. Failures: `invalid` without one, `conflict`. */
export async function returnReview(
  viewer: Viewer,
  { reviewId, version, reason }: { reviewId: string; version: number; reason: string },
): Promise<Result<Decided>> {
  const refused = refusal(viewer, "reviews.decide");
  if (refused) return refused;
  if (!reason.trim())
    return failed("invalid", "Say what must be put right.", [
      { path: "reason", message: "say what must be put right, so that the installer can do it" },
    ]);
  return decide(viewer, { reviewId, version, to: "returned", reason: reason.trim() });
}
