import { and, asc, desc, eq } from "drizzle-orm";
import { today } from "../clock";
import type { Tx } from "../client";
import { isRowId, notFound, refusal } from "../permission";
import { firms, jobs, operatorSettings, packs, submissionEntries, submissions, users } from "../schema";
import { submissionLetter } from "../submission-letter";
import { asFirm } from "../tenant";
import {
  allSubmissions,
  submissionPage,
  submissionRows,
  toSubmissionRow,
  type SubmissionPage,
} from "./submission-rows";
import { mailboxesOf } from "@/lib/notify/operators";
import { ok, type Result } from "@/lib/notify/result";
import { submissionMoves, type SubmissionPurpose } from "@/lib/notify/submission";
import type { SubmissionFilter, SubmissionRow, SubmissionView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

export { recordMove, recordNote } from "./submission-replies";
export { recordSent, sendByEmail } from "./submission-sending";

/** One page of the submissions desk, with how many rows each tab holds. */
export async function listSubmissions(viewer: Viewer, filter: SubmissionFilter): Promise<Result<SubmissionPage>> {
  const refused = refusal(viewer, "submissions.read");
  if (refused) return refused;
  return ok(await asFirm(viewer, (tx) => submissionPage(tx, viewer.firmId, filter)));
}

/** Every row the filter holds, without pages, for the export. */
export async function exportSubmissions(viewer: Viewer, filter: SubmissionFilter): Promise<Result<SubmissionRow[]>> {
  const refused = refusal(viewer, "submissions.read");
  if (refused) return refused;
  return ok(await asFirm(viewer, (tx) => allSubmissions(tx, viewer.firmId, filter)));
}

/** The papers of one job, oldest first. */
export async function submissionsOfJob(viewer: Viewer, { jobId }: { jobId: string }): Promise<Result<SubmissionRow[]>> {
  const refused = refusal(viewer, "submissions.read");
  if (refused) return refused;
  if (!isRowId(jobId)) return notFound("job");
  return asFirm(viewer, async (tx) => {
    const where = and(eq(submissions.firmId, viewer.firmId), eq(submissions.jobId, jobId));
    const rows = await submissionRows(tx, where).orderBy(asc(submissions.createdAt), asc(submissions.id));
    if (rows.length > 0) return ok(rows.map((row) => toSubmissionRow(row)));
    const job = await tx
      .select({ id: jobs.id })
      .from(jobs)
      .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, jobId)));
    return job.length ? ok([]) : notFound("job");
  });
}

const mailboxOf: Record<SubmissionPurpose, "notice" | "application" | "safety"> = {
  "demand-notice": "notice",
  "completion-notice": "notice",
  "generation-notice": "notice",
  application: "application",
  "generation-application": "application",
  "safety-report": "safety",
};

/** Where this paper goes: what the firm has set for the operator, else the register's mailbox. */
async function sendToOf(tx: Tx, firmId: string, row: SubmissionRow): Promise<SubmissionView["sendTo"]> {
  const [set] = await tx
    .select({
      notice: operatorSettings.noticeEmail,
      application: operatorSettings.applicationEmail,
      page: operatorSettings.page,
    })
    .from(operatorSettings)
    .where(and(eq(operatorSettings.firmId, firmId), eq(operatorSettings.operatorId, row.operatorId)));
  const box = mailboxOf[row.purpose];
  const own = box === "application" ? set?.application : set?.notice;
  return { email: own ?? mailboxesOf(row.operatorId)?.[box] ?? null, page: set?.page ?? null };
}

/** The operator's last question in their words, without the day and the name that stand before it in the history. */
async function questionOf(tx: Tx, firmId: string, submissionId: string): Promise<string | null> {
  const mine = and(eq(submissionEntries.firmId, firmId), eq(submissionEntries.submissionId, submissionId));
  const [asked] = await tx
    .select({ text: submissionEntries.text })
    .from(submissionEntries)
    .where(and(mine, eq(submissionEntries.state, "question"), eq(submissionEntries.kind, "reply")))
    .orderBy(desc(submissionEntries.at))
    .limit(1);
  return asked?.text.replace(/^.*?\d{4}\. (Spoke to [^.]*\. )?/s, "") || null;
}

async function letterOf(tx: Tx, viewer: Viewer, row: SubmissionRow) {
  const [job] = await tx
    .select({
      postcode: jobs.postcode,
      supplyCore: jobs.supplyCore,
      unit: jobs.unit,
      installedOn: jobs.installedOn,
      plannedOn: jobs.plannedOn,
      phone: firms.phone,
    })
    .from(jobs)
    .innerJoin(firms, eq(firms.id, jobs.firmId))
    .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, row.jobId)));
  if (!job) throw new Error(`the job of submission ${row.id} is not there`);
  const question = row.state === "question" ? await questionOf(tx, viewer.firmId, row.id) : null;
  return submissionLetter({ ...row, ...job, question, firmName: viewer.firmName, sender: viewer.name });
}

async function historyOf(tx: Tx, firmId: string, submissionId: string): Promise<SubmissionView["history"]> {
  return tx
    .select({
      id: submissionEntries.id,
      at: submissionEntries.at,
      kind: submissionEntries.kind,
      text: submissionEntries.text,
      reference: submissionEntries.reference,
      by: users.name,
      state: submissionEntries.state,
    })
    .from(submissionEntries)
    .innerJoin(users, eq(users.id, submissionEntries.by))
    .where(and(eq(submissionEntries.firmId, firmId), eq(submissionEntries.submissionId, submissionId)))
    .orderBy(asc(submissionEntries.at), asc(submissionEntries.id));
}

async function packsOf(tx: Tx, firmId: string, jobId: string): Promise<SubmissionView["packs"]> {
  const rows = await tx
    .select({ id: packs.id, version: packs.version, sha256: packs.sha256 })
    .from(packs)
    .where(and(eq(packs.firmId, firmId), eq(packs.jobId, jobId), eq(packs.status, "sealed")))
    .orderBy(desc(packs.version));
  return rows.map(({ id, version, sha256 }) => ({ id, version, hash8: sha256?.slice(0, 8) ?? "" }));
}

/** One paper whole: history, the moves open to it, where it goes, and a drafted mail. */
export async function getSubmission(
  viewer: Viewer,
  { submissionId }: { submissionId: string },
): Promise<Result<SubmissionView>> {
  const refused = refusal(viewer, "submissions.read");
  if (refused) return refused;
  if (!isRowId(submissionId)) return notFound("submission");
  return asFirm(viewer, async (tx) => {
    const { firmId } = viewer;
    const [record] = await submissionRows(tx, and(eq(submissions.firmId, firmId), eq(submissions.id, submissionId)));
    if (!record) return notFound("submission");
    const row = toSubmissionRow(record, today());
    return ok({
      ...row,
      history: await historyOf(tx, firmId, submissionId),
      packs: await packsOf(tx, firmId, row.jobId),
      moves: submissionMoves(row.state, row.purpose)
        .filter(({ by }) => by !== "send")
        .map(({ to, label, needs }) => ({ to, label, needs })),
      sendTo: await sendToOf(tx, firmId, row),
      draft: await letterOf(tx, viewer, row),
    });
  });
}
