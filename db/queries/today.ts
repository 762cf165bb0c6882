import { and, asc, desc, eq, inArray, sql, type SQL } from "drizzle-orm";
import { today as dayToday } from "../clock";
import type { Tx } from "../client";
import { refusal } from "../permission";
import { jobs, reviews, submissions, users } from "../schema";
import { asFirm } from "../tenant";
import { jobRowColumns, toJobRow } from "./job-rows";
import { listReviews } from "./reviews";
import { submissionRows, toSubmissionRow } from "./submission-rows";
import { tabWhere } from "./submission-tabs";
import { ok, type Result } from "@/lib/notify/result";
import type { SubmissionRow, TodayView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

const most = 12;

/**
 * What an installer has in hand: their jobs not yet sealed and what came back. First the work of today, then what was
 * fitted and still waits for its papers by its last day, then what is planned.
 */
async function forInstaller(tx: Tx, viewer: Viewer): Promise<TodayView["installer"]> {
  const inHand = sql`case when coalesce(${jobs.installedOn}, ${jobs.plannedOn}) = ${dayToday()}::date then 0
    when ${jobs.stage} = 'installed' then 1 else 2 end`;
  const mine = and(eq(jobs.firmId, viewer.firmId), eq(jobs.installerId, viewer.userId));
  const rows = await tx
    .select(jobRowColumns)
    .from(jobs)
    .leftJoin(users, eq(users.id, jobs.installerId))
    .where(and(mine, inArray(jobs.standing, ["recording", "ready-to-seal", "sealing", "stopped"])))
    .orderBy(inHand, sql`coalesce(${jobs.plannedOn}, ${jobs.lastDayKey})`, desc(jobs.updatedAt))
    .limit(most);
  const returned = await tx
    .select({
      jobId: jobs.id,
      jobNumber: jobs.number,
      site: jobs.site,
      reason: reviews.reason,
      by: users.name,
      at: reviews.decidedAt,
    })
    .from(jobs)
    .innerJoin(reviews, and(eq(reviews.firmId, jobs.firmId), eq(reviews.jobId, jobs.id), eq(reviews.state, "returned")))
    .innerJoin(users, eq(users.id, reviews.decidedBy))
    .where(and(mine, eq(jobs.standing, "returned")))
    .orderBy(desc(reviews.decidedAt))
    .limit(most);
  const newest = new Map(returned.toReversed().map((row) => [row.jobId, row]));
  return {
    jobs: rows.map(toJobRow),
    returned: [...newest.values()].map((row) => ({ ...row, reason: row.reason ?? "", at: row.at ?? "" })),
  };
}

async function papers(tx: Tx, viewer: Viewer, where: SQL | undefined): Promise<SubmissionRow[]> {
  const rows = await submissionRows(tx, and(eq(submissions.firmId, viewer.firmId), where))
    .orderBy(asc(submissions.dueKey), asc(submissions.id))
    .limit(most);
  return rows.map((row) => toSubmissionRow(row));
}

async function forAdmin(tx: Tx, viewer: Viewer): Promise<TodayView["admin"]> {
  const on = dayToday();
  const tabs = tabWhere(on);
  const unanswered = sql`(${tabs["no-acknowledgement"]} or ${tabs.question} or ${tabs["chase-due"]})`;
  return {
    unsent: await papers(tx, viewer, and(tabs["not-sent"], sql`not coalesce(${submissions.lastDay} < ${on}, false)`)),
    late: await papers(tx, viewer, tabs["past-last-day"]),
    unanswered: await papers(tx, viewer, unanswered),
  };
}

/** What each of a person's roles has to do today, null for a role they do not hold. */
export async function today(viewer: Viewer): Promise<Result<TodayView>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  const has = (role: "installer" | "admin" | "compliance") => viewer.roles.includes(role);
  const view = await asFirm(viewer, async (tx) => ({
    installer: has("installer") ? await forInstaller(tx, viewer) : null,
    admin: has("admin") ? await forAdmin(tx, viewer) : null,
  }));
  const waiting = has("compliance") ? await listReviews(viewer, { state: "waiting", after: null }) : null;
  if (waiting && !waiting.ok) return waiting;
  return ok({ ...view, compliance: waiting ? { waiting: waiting.value.rows.slice(0, most) } : null });
}
