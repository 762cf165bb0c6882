import { and, arrayOverlaps, count, eq, gt, inArray, isNull, ne, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { nowInstant, today as dayToday } from "../clock";
import type { Tx } from "../client";
import { notFound, refusal } from "../permission";
import { invitations, jobs, members, reviews, submissions, users } from "../schema";
import { threadInput } from "../standing";
import { asFirm } from "../tenant";
import { jobPage } from "./job-rows";
import { photosOf } from "./photo-views";
import { needsSomeone } from "./submission-tabs";
import { ok, type Result } from "@/lib/notify/result";
import { threadOf } from "@/lib/notify/thread";
import type { Counts, JobFilter, JobRow, JobView, Page } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

export { copyJob, createJob } from "./job-creation";
export { saveJob } from "./job-saves";

/** One page of the firm's jobs, 25 rows, with the cursor of the next. */
export async function listJobs(viewer: Viewer, filter: JobFilter): Promise<Result<Page<JobRow>>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  return ok(await asFirm(viewer, (tx) => jobPage(tx, viewer.firmId, filter)));
}

/** Another job of the firm for the same supply with a chargepoint of the same serial: perhaps the same work twice. */
async function duplicateOf(tx: Tx, firmId: string, job: { id: string; supplyCore: string | null; serials: string[] }) {
  if (!job.supplyCore || job.serials.length === 0) return null;
  const [other] = await tx
    .select({ id: jobs.id, number: jobs.number })
    .from(jobs)
    .where(
      and(
        eq(jobs.firmId, firmId),
        ne(jobs.id, job.id),
        eq(jobs.supplyCore, job.supplyCore),
        arrayOverlaps(jobs.serials, job.serials),
      ),
    )
    .orderBy(jobs.number)
    .limit(1);
  return other ?? null;
}

/** One job whole: its record, its thread and its photos. */
export async function getJob(viewer: Viewer, { jobId }: { jobId: string }): Promise<Result<JobView>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const installer = alias(users, "installer");
    const editor = alias(users, "editor");
    const [job] = await tx
      .select({
        id: jobs.id,
        number: jobs.number,
        version: jobs.version,
        record: jobs.record,
        installerId: jobs.installerId,
        installerName: installer.name,
        createdAt: jobs.createdAt,
        updatedAt: jobs.updatedAt,
        updatedBy: editor.name,
        supplyCore: jobs.supplyCore,
        serials: jobs.serials,
      })
      .from(jobs)
      .leftJoin(installer, eq(installer.id, jobs.installerId))
      .leftJoin(editor, eq(editor.id, jobs.updatedBy))
      .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, jobId)));
    const thread = job ? await threadInput(tx, viewer.firmId, jobId) : null;
    if (!job || !thread) return notFound("job");
    const { supplyCore, serials, ...view } = job;
    return ok({
      ...view,
      thread: threadOf(thread),
      photos: await photosOf(tx, viewer.firmId, jobId),
      duplicateOf: await duplicateOf(tx, viewer.firmId, { id: job.id, supplyCore, serials }),
    });
  });
}

/** What each place of the contents list holds for this person. */
export async function counts(viewer: Viewer): Promise<Result<Counts>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  const { firmId } = viewer;
  return asFirm(viewer, async (tx) => {
    const on = dayToday();
    const [work] = await tx
      .select({
        jobs: count(),
        mine: sql<number>`count(*) filter (where ${and(
          eq(jobs.installerId, viewer.userId),
          inArray(jobs.standing, ["recording", "ready-to-seal", "returned", "stopped"]),
        )})`.mapWith(Number),
      })
      .from(jobs)
      .where(eq(jobs.firmId, firmId));
    const [papers] = await tx
      .select({ open: count(), operators: sql<number>`count(distinct ${submissions.operatorId})`.mapWith(Number) })
      .from(submissions)
      .where(and(eq(submissions.firmId, firmId), needsSomeone(on)));
    const [waiting] = await tx
      .select({ reviews: count() })
      .from(reviews)
      .where(and(eq(reviews.firmId, firmId), eq(reviews.state, "waiting")));
    const [team] = await tx
      .select({ people: count() })
      .from(members)
      .where(and(eq(members.firmId, firmId), eq(members.status, "active")));
    const [invited] = await tx
      .select({ open: count() })
      .from(invitations)
      .where(
        and(
          eq(invitations.firmId, firmId),
          isNull(invitations.acceptedAt),
          isNull(invitations.withdrawnAt),
          gt(invitations.expiresAt, nowInstant()),
        ),
      );
    const forAdmin = viewer.roles.includes("admin") ? (papers?.open ?? 0) : 0;
    const forCompliance = viewer.roles.includes("compliance") ? (waiting?.reviews ?? 0) : 0;
    const forInstaller = viewer.roles.includes("installer") ? (work?.mine ?? 0) : 0;
    return ok({
      today: forAdmin + forCompliance + forInstaller,
      jobs: work?.jobs ?? 0,
      submissions: papers?.open ?? 0,
      reviews: waiting?.reviews ?? 0,
      operators: papers?.operators ?? 0,
      team: (team?.people ?? 0) + (invited?.open ?? 0),
    });
  });
}
