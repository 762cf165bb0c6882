import { and, eq, sql } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { firmRules } from "../firm-rules";
import { once } from "../idempotency";
import { derive } from "../job-columns";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { copyForAnotherSite } from "../record-copy";
import { firms, jobs, members, users } from "../schema";
import { asFirm } from "../tenant";
import { readRecord } from "./job-saves";
import { failed, ok, type Result } from "@/lib/notify/result";
import { standingOf } from "@/lib/notify/thread";
import type { Viewer } from "@/lib/server/auth/viewer";

export type NewJob = {
  /** Made by the client, so that a job begun without a signal keeps its id. */
  id: string;
  saveId: string;
  /** A draft of the record; `stage` is the one fact that must be there. */
  record: unknown;
  /** Who will do it; left out, the person who opens it when they are an installer. */
  installerId?: string | null;
};
export type OpenedJob = { id: string; number: string };

/** The firm's facts as the record holds them, and the next number of its ledger, taken. */
async function takeNumber(tx: Tx, firmId: string) {
  const [firm] = await tx
    .update(firms)
    .set({ nextNumber: sql`${firms.nextNumber} + 1` })
    .where(eq(firms.id, firmId))
    .returning();
  if (!firm) throw new Error(`firm ${firmId} has no row`);
  const { name, contactName, phone, email, address, registration } = firm;
  const number = `${firm.numberPrefix}-${String(firm.nextNumber - 1).padStart(4, "0")}`;
  return { number, facts: { name, contactName, phone, email, address, registration } };
}

async function installerOf(tx: Tx, firmId: string, userId: string) {
  const [person] = await tx
    .select({ userId: users.id, name: users.name, registration: members.registration, roles: members.roles })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.firmId, firmId), eq(members.userId, userId), eq(members.status, "active")));
  return person?.roles.includes("installer") ? person : null;
}

/** Inserts a job under the firm's next number. The record must already read as a draft, apart from its number. */
async function open(tx: Tx, viewer: Viewer, input: NewJob, copiedFrom: string | null): Promise<Result<OpenedJob>> {
  const { firmId } = viewer;
  const given =
    input.record !== null && typeof input.record === "object" ? (input.record as Record<string, unknown>) : {};
  // Read once under a number that stands in, so that a refused record takes no number from the ledger.
  const trial = readRecord({ format: "sealwire.job/1", ...given, jobNumber: "NEW" });
  if (!trial.ok) return trial;
  if (trial.value.evidence.length > 0)
    return failed("invalid", "A job opens without photos; add each one once it is open.", [
      { path: "evidence", message: "is written by adding photos" },
    ]);
  const installer = await installerOf(tx, firmId, input.installerId ?? viewer.userId);
  if (input.installerId && !installer)
    return failed("invalid", "Choose an installer of this firm.", [
      { path: "installerId", message: "is not an active installer of this firm" },
    ]);
  const { number, facts } = await takeNumber(tx, firmId);
  const competentPerson =
    trial.value.competentPerson.name === null && installer
      ? { name: installer.name, registration: installer.registration }
      : trial.value.competentPerson;
  const record = { ...trial.value, jobNumber: number, firm: facts, competentPerson };
  const derived = derive(record, today(), await firmRules(tx, firmId));
  const at = nowInstant();
  const made = await tx
    .insert(jobs)
    .values({
      ...derived.columns,
      firmId,
      id: input.id,
      number,
      format: record.format,
      record,
      standing: standingOf({
        stage: record.stage,
        factCount: null,
        route: derived.summary.route,
        missingCount: derived.columns.missingCount,
        pack: null,
        submissions: [],
        review: null,
      }),
      installerId: installer?.userId ?? null,
      createdBy: viewer.userId,
      updatedBy: viewer.userId,
      createdAt: at,
      updatedAt: at,
    })
    .onConflictDoNothing({ target: [jobs.firmId, jobs.id] })
    .returning({ id: jobs.id });
  if (made.length === 0) return failed("conflict", "A job with this id was opened before, by another request.");
  await recordEvent(tx, viewer, { type: "job.created", version: 1, jobId: input.id, jobNumber: number, copiedFrom });
  return ok({ id: input.id, number });
}

/**
 * Opens a job: next number of the firm, the firm's facts and the competent person copied into the record.
 * Failures: `invalid` field by field, `key-reused`. The same `saveId` again gets the first answer.
 */
export async function createJob(viewer: Viewer, input: NewJob): Promise<Result<OpenedJob>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  const { saveId: key, ...request } = input;
  return asFirm(viewer, (tx) =>
    once(tx, viewer.firmId, { key, act: "job.create", request, keep: () => true }, () => open(tx, viewer, input, null)),
  );
}

/** Opens a job like an earlier one, for another site: see `copyForAnotherSite` for what is taken over. */
export async function copyJob(viewer: Viewer, input: { jobId: string; id: string }): Promise<Result<OpenedJob>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const [job] = await tx
      .select({ number: jobs.number, record: jobs.record })
      .from(jobs)
      .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, input.jobId)));
    if (!job) return notFound("job");
    const record = copyForAnotherSite(job.record);
    const asked = { key: input.id, act: "job.copy", request: input, keep: () => true };
    return once(tx, viewer.firmId, asked, () =>
      open(tx, viewer, { id: input.id, saveId: input.id, record }, job.number),
    );
  });
}
