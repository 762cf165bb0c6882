import { randomUUID } from "node:crypto";
import { and, eq, inArray, sql } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { isRowId } from "../permission";
import { jobs, submissionEntries, submissions } from "../schema";
import { nextStep } from "@/lib/notify/chase";
import type { Job } from "@/lib/notify/job";
import { divisionOf } from "@/lib/notify/operators";
import { cameFrom, type SubmissionState } from "@/lib/notify/submission";
import type { SubmissionEntry } from "@/lib/notify/views";

export type HeldPaper = NonNullable<Awaited<ReturnType<typeof holdPaper>>>;

/**
 * A paper and its job with both rows held until the transaction ends, the job first as everywhere, so that two
 * writers never wait for each other crosswise.
 */
export async function holdPaper(tx: Tx, firmId: string, submissionId: string) {
  if (!isRowId(submissionId)) return null;
  const mine = and(eq(submissions.firmId, firmId), eq(submissions.id, submissionId));
  const [owner] = await tx.select({ jobId: submissions.jobId }).from(submissions).where(mine);
  if (!owner) return null;
  const [job] = await tx
    .select({ id: jobs.id, number: jobs.number, route: jobs.route, contradicts: jobs.contradicts, record: jobs.record })
    .from(jobs)
    .where(and(eq(jobs.firmId, firmId), eq(jobs.id, owner.jobId)))
    .for("update");
  const [paper] = await tx.select().from(submissions).where(mine).for("update");
  return paper && job ? { ...paper, job } : null;
}

/** State of the job's safety report, null when it has none: it goes before everything else. */
export async function safetyReportState(tx: Tx, firmId: string, jobId: string): Promise<SubmissionState | null> {
  const [report] = await tx
    .select({ state: submissions.state })
    .from(submissions)
    .where(and(eq(submissions.firmId, firmId), eq(submissions.jobId, jobId), eq(submissions.purpose, "safety-report")))
    .orderBy(submissions.createdAt)
    .limit(1);
  return report?.state ?? null;
}

type Columns = Partial<
  Pick<
    typeof submissions.$inferInsert,
    "channel" | "packId" | "sentOn" | "sentTo" | "reference" | "decidedOn" | "limitA" | "expiresOn"
  >
>;

/**
 * Moves a held paper to a state, if it still stands in one that leads there and is still at the version the person
 * saw. Works out the day of the next step anew. False when it has moved on.
 */
export async function movePaper(
  tx: Tx,
  paper: HeldPaper,
  move: { to: SubmissionState; version: number; set?: Columns; heardOn?: string },
): Promise<boolean> {
  const on = today();
  const next = { ...paper, ...move.set, state: move.to, heardOn: move.heardOn ?? on };
  const { dueOn } = nextStep({
    purpose: next.purpose,
    state: next.state,
    division: divisionOf(next.operatorId, territoryOf(paper.job.record)),
    asAt: on,
    lastDay: next.lastDay,
    sentOn: next.sentOn,
    lastHeardOn: next.heardOn,
    expires: next.expiresOn,
  });
  const moved = await tx
    .update(submissions)
    .set({
      ...move.set,
      state: move.to,
      heardOn: next.heardOn,
      dueOn,
      version: sql`${submissions.version} + 1`,
      updatedAt: nowInstant(),
    })
    .where(
      and(
        eq(submissions.firmId, paper.firmId),
        eq(submissions.id, paper.id),
        eq(submissions.version, move.version),
        inArray(submissions.state, [...cameFrom(move.to, paper.purpose), move.to]),
      ),
    )
    .returning({ id: submissions.id });
  return moved.length === 1;
}

const territoryOf = ({ site }: Job) => site.territory;

/** Adds a line to the paper's history; lines are never changed. */
export const addEntry = (
  tx: Tx,
  paper: HeldPaper,
  entry: { kind: SubmissionEntry["kind"]; text: string; reference?: string | null; state: SubmissionState; by: string },
) =>
  tx.insert(submissionEntries).values({
    firmId: paper.firmId,
    id: randomUUID(),
    submissionId: paper.id,
    at: nowInstant(),
    reference: null,
    ...entry,
  });
