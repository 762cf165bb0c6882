import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { listEvents } from "@/db/queries/events";
import { approveReview, getReview, returnReview, reviewOfJob } from "@/db/queries/reviews";
import { getSubmission, recordNote, submissionsOfJob } from "@/db/queries/submissions";
import { withdrawInvitation } from "@/db/queries/team";
import { reviews } from "@/db/schema";
import { asFirm } from "@/db/tenant";
import type { Viewer } from "@/lib/server/auth/viewer";

// Our own practice, no source: what is not met is never signed off, and what cannot be told only with a written
// judgement. The screen says so; here the record itself must refuse, whoever asks.

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

/** A waiting review whose sealed settings came out as told. */
async function waiting(notMet: number, cannotTell: number) {
  const jobId = await openJob(viewer);
  await sealAndBuild(viewer, jobId);
  const review = value(await reviewOfJob(viewer, { jobId }));
  if (!review) throw new Error("the pack has no review");
  const tally = { met: 20, "not-met": notMet, "cannot-tell": cannotTell, "not-applicable": 4 };
  await asFirm(viewer, (tx) => tx.update(reviews).set({ tally }).where(eq(reviews.id, review.id)));
  return { reviewId: review.id, version: review.version };
}

describe("approval of settings", () => {
  it("is refused while a requirement is not met, whatever the note, and the review keeps waiting", async () => {
    const review = await waiting(1, 0);
    const refused = await approveReview(viewer, { ...review, note: "Seen working with the owner on the day." });
    expect(refused).toMatchObject({ ok: false, error: { code: "not-met", message: "Approve waits for 1 not met." } });
    expect(value(await getReview(viewer, review))).toMatchObject({ state: "waiting", version: review.version });
    expect(codeOf(await returnReview(viewer, { ...review, reason: "Set the clock to local time." }))).toBe("ok");
  });

  it("is refused without a note while an outcome cannot be told, and goes through with one", async () => {
    const review = await waiting(0, 2);
    for (const note of [null, "", "   ", "ok"])
      expect(await approveReview(viewer, { ...review, note })).toMatchObject({
        ok: false,
        error: { code: "not-met", fields: [{ path: "note" }] },
      });
    const note = "The maker’s statement of 1 June covers both.";
    expect(codeOf(await approveReview(viewer, { ...review, note }))).toBe("ok");
    expect(value(await getReview(viewer, review))).toMatchObject({ state: "approved", reason: note });
  });

  it("needs no note when every outcome is met or not applicable", async () => {
    expect(codeOf(await approveReview(viewer, { ...(await waiting(0, 0)), note: null }))).toBe("ok");
  });
});

describe("an id that can be no row’s", () => {
  const bad = ["x", "", "00000000-0000-0000-0000-00000000000g", "'; select 1"];
  it.each(bad)("%j is not found, in every question that takes one", async (id) => {
    const note = { kind: "note", text: "Nobody answered.", spokeTo: null } as const;
    const asked = await Promise.all([
      getReview(viewer, { reviewId: id }),
      reviewOfJob(viewer, { jobId: id }),
      approveReview(viewer, { reviewId: id, version: 1, note: null }),
      returnReview(viewer, { reviewId: id, version: 1, reason: "Photograph it again." }),
      getSubmission(viewer, { submissionId: id }),
      submissionsOfJob(viewer, { jobId: id }),
      recordNote(viewer, { submissionId: id, ...note }),
      withdrawInvitation(viewer, { id }),
      listEvents(viewer, { after: null, jobId: id }),
    ]);
    expect(asked.map(codeOf)).toEqual(asked.map(() => "not-found"));
  });
});
