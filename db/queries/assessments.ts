import { randomUUID } from "node:crypto";
import { isDeepStrictEqual } from "node:util";
import { and, desc, eq } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { firmRules } from "../firm-rules";
import { derive } from "../job-columns";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { assessments } from "../schema";
import { asFirm } from "../tenant";
import { lockJob, type LockedJob } from "./job-saves";
import type { Assessment } from "@/lib/notify/assessment";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { AssessmentView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

/** As it will come back from the database: numbers, text, lists and objects, nothing else. */
const plainJson = (assessment: Assessment) => JSON.parse(JSON.stringify(assessment)) as Assessment;

/**
 * Runs the rules over a locked job as it stands today. The newest assessment of this version is used again when
 * the rules say the same, word for word; otherwise a new one is appended. Failure: `contradictory`, with fields.
 */
export async function assessLocked(tx: Tx, viewer: Viewer, job: LockedJob): Promise<Result<AssessmentView>> {
  const on = today();
  const { assessment, summary } = derive(job.record, on, await firmRules(tx, viewer.firmId));
  if (!assessment)
    return failed("contradictory", "The record contradicts itself. Put the marked facts right first.", summary.fields);
  const body = plainJson(assessment);
  const [newest] = await tx
    .select({ id: assessments.id, body: assessments.body, createdAt: assessments.createdAt })
    .from(assessments)
    .where(
      and(
        eq(assessments.firmId, viewer.firmId),
        eq(assessments.jobId, job.id),
        eq(assessments.jobVersion, job.version),
        eq(assessments.asAt, on),
      ),
    )
    .orderBy(desc(assessments.createdAt))
    .limit(1);
  if (newest && isDeepStrictEqual(newest.body, body)) return ok({ ...newest, jobVersion: job.version });
  const id = randomUUID();
  const createdAt = nowInstant();
  const { ruleset, route } = body;
  await tx
    .insert(assessments)
    .values({ firmId: viewer.firmId, id, jobId: job.id, jobVersion: job.version, asAt: on, ruleset, body, createdAt });
  const about = { version: 1, jobId: job.id, jobNumber: job.number } as const;
  await recordEvent(tx, viewer, { type: "assessment.made", ...about, assessmentId: id, route: route.demand, ruleset });
  return ok({ id, jobVersion: job.version, createdAt, body });
}

/** The assessment of a job as it stands today, appended when it says something new. */
export async function assessJob(viewer: Viewer, { jobId }: { jobId: string }): Promise<Result<AssessmentView>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const job = await lockJob(tx, viewer.firmId, jobId);
    return job ? assessLocked(tx, viewer, job) : notFound("job");
  });
}
