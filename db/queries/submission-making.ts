import { randomUUID } from "node:crypto";
import { and, eq, ne, inArray } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { recordEvent, type Actor } from "../record-event";
import { reviews, submissions } from "../schema";
import type { Assessment } from "@/lib/notify/assessment";
import { nextStep } from "@/lib/notify/chase";
import type { FirmEvent } from "@/lib/notify/events";
import type { Job } from "@/lib/notify/job";
import { divisionOf } from "@/lib/notify/operators";
import { papersDue } from "@/lib/notify/papers-due";
import { isOver, submissionStates, type SubmissionPurpose } from "@/lib/notify/submission";

export type SealedPack = {
  id: string;
  version: number;
  job: { id: string; number: string };
  record: Job;
  assessment: Assessment;
};

const open = submissionStates.filter((state) => !isOver(state) && state !== "refused");

/** A notice tells of work that is done: none is made ready while the work is planned. */
const isDueNow =
  ({ stage }: Job) =>
  ({ purpose }: { purpose: SubmissionPurpose }) =>
    stage === "installed" || !purpose.endsWith("-notice");

/**
 * Makes a paper ready for each that a freshly sealed pack calls for. A paper of the same kind that has not left
 * yet takes the new pack; one that the operator already holds is left as it is. Returns the events to record.
 */
async function readyPapers(tx: Tx, firmId: string, pack: SealedPack): Promise<FirmEvent[]> {
  const operatorId = pack.assessment.operator.id;
  const division = divisionOf(operatorId, pack.record.site.territory);
  const made: FirmEvent[] = [];
  for (const { purpose, lastDay } of papersDue(pack.assessment).filter(isDueNow(pack.record))) {
    const [present] = await tx
      .select({ id: submissions.id, state: submissions.state })
      .from(submissions)
      .where(
        and(
          eq(submissions.firmId, firmId),
          eq(submissions.jobId, pack.job.id),
          eq(submissions.purpose, purpose),
          inArray(submissions.state, open),
        ),
      )
      .limit(1);
    const dueOn = nextStep({
      purpose,
      state: "draft",
      division,
      asAt: today(),
      lastDay,
      sentOn: null,
      lastHeardOn: null,
      expires: null,
    }).dueOn;
    if (present && (present.state === "draft" || present.state === "bounced"))
      await tx
        .update(submissions)
        .set({ packId: pack.id, operatorId, lastDay, dueOn, updatedAt: nowInstant() })
        .where(and(eq(submissions.firmId, firmId), eq(submissions.id, present.id)));
    if (present) continue;
    const id = randomUUID();
    const at = nowInstant();
    await tx.insert(submissions).values({
      firmId,
      id,
      jobId: pack.job.id,
      purpose,
      operatorId,
      packId: pack.id,
      lastDay,
      dueOn,
      createdAt: at,
      updatedAt: at,
    });
    const about = { version: 1, jobId: pack.job.id, jobNumber: pack.job.number, submissionId: id } as const;
    made.push({ type: "submission.drafted", ...about, purpose, packId: pack.id });
  }
  return made;
}

const outcomes = ["met", "not-met", "cannot-tell", "not-applicable"] as const;

/** How the smart-charging rules answered, counted, for the queue's row. */
const tallyOf = ({ smartCharging }: Assessment) =>
  Object.fromEntries(
    outcomes.map((outcome) => [outcome, smartCharging.filter((result) => result.outcome === outcome).length]),
  ) as Record<(typeof outcomes)[number], number>;

/** Opens the review of a sealed pack of installed work and supersedes an older one that still waits. */
async function openReview(tx: Tx, firmId: string, pack: SealedPack): Promise<FirmEvent[]> {
  if (pack.record.stage !== "installed") return [];
  const about = { version: 1, jobId: pack.job.id, jobNumber: pack.job.number } as const;
  const older = await tx
    .update(reviews)
    .set({ state: "superseded" })
    .where(
      and(
        eq(reviews.firmId, firmId),
        eq(reviews.jobId, pack.job.id),
        eq(reviews.state, "waiting"),
        ne(reviews.packId, pack.id),
      ),
    )
    .returning({ id: reviews.id });
  const id = randomUUID();
  await tx.insert(reviews).values({
    firmId,
    id,
    jobId: pack.job.id,
    packId: pack.id,
    tally: tallyOf(pack.assessment),
    createdAt: nowInstant(),
  });
  return [
    ...older.map(({ id: reviewId }): FirmEvent => ({
      type: "review.superseded",
      ...about,
      reviewId,
      byPackVersion: pack.version,
    })),
    { type: "review.opened", ...about, reviewId: id, packId: pack.id },
  ];
}

/** What a sealed pack sets going: papers made ready, a review opened, each with its event. In the sealing transaction. */
export async function openSealed(tx: Tx, actor: Actor, pack: SealedPack): Promise<void> {
  const happened = [...(await readyPapers(tx, actor.firmId, pack)), ...(await openReview(tx, actor.firmId, pack))];
  for (const each of happened) await recordEvent(tx, actor, each);
}
