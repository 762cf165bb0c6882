import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, exampleRecord, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { atTime } from "@/db/clock";
import { getJob } from "@/db/queries/jobs";
import { mailFailed, mailSent } from "@/db/queries/mail-relay";
import {
  exportSubmissions,
  getSubmission,
  listSubmissions,
  recordMove,
  recordNote,
  recordSent,
  sendByEmail,
  submissionsOfJob,
} from "@/db/queries/submissions";
import { outbox } from "@/db/schema";
import { asFirm } from "@/db/tenant";
import type { SubmissionState } from "@/lib/notify/submission";
import type { SubmissionRow } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

async function paper(record: unknown = exampleRecord()): Promise<SubmissionRow> {
  const jobId = await openJob(viewer, record);
  await sealAndBuild(viewer, jobId);
  return current(jobId);
}

async function current(jobId: string): Promise<SubmissionRow> {
  const [row] = value(await submissionsOfJob(viewer, { jobId }));
  if (!row) throw new Error("the job has no paper");
  return row;
}

const packOf = ({ packId }: SubmissionRow) => packId ?? "";

const sent = (row: SubmissionRow, version = row.version) =>
  recordSent(viewer, {
    submissionId: row.id,
    version,
    packId: packOf(row),
    channel: "operator-page",
    sentOn: "2026-12-01",
    sentTo: null,
    note: null,
  });

const move = (row: SubmissionRow, to: SubmissionState, more: Partial<Parameters<typeof recordMove>[1]> = {}) =>
  recordMove(viewer, {
    submissionId: row.id,
    version: row.version,
    to,
    on: "2026-12-01",
    reference: null,
    limitA: null,
    expires: null,
    note: null,
    spokeTo: null,
    ...more,
  });

const mailOf = async ({ id }: SubmissionRow) => {
  const rows = await asFirm(viewer, (tx) =>
    tx
      .select()
      .from(outbox)
      .where(and(eq(outbox.firmId, viewer.firmId), eq(outbox.submissionId, id))),
  );
  return rows;
};

const email = (row: SubmissionRow, version = row.version) =>
  sendByEmail(viewer, {
    submissionId: row.id,
    version,
    packId: packOf(row),
    to: "notices@npg.example.com",
    subject: "Notice",
    body: "Enclosed.",
  });

describe("a paper sent by e-mail", () => {
  it("leaves through the outbox, with the pack, and is submitted once the mail has gone", async () => {
    const row = await paper();
    value(await email(row));
    expect(await current(row.jobId)).toMatchObject({ state: "queued", channel: "e-mail", sentOn: null });
    const [mail] = await mailOf(row);
    expect(mail).toMatchObject({ status: "waiting", to: "notices@npg.example.com", replyTo: viewer.email });
    expect(mail?.attachments).toMatchObject([{ contentType: "application/zip" }]);
    await mailSent(viewer.firmId, mail?.id ?? "");
    await mailSent(viewer.firmId, mail?.id ?? "");
    const after = value(await getSubmission(viewer, { submissionId: row.id }));
    expect(after).toMatchObject({ state: "submitted", workingDaysSinceSent: 0 });
    expect(after.history.map(({ kind }) => kind)).toEqual(["move", "sent"]);
  });

  it("comes back as bounced when the mail is refused, and can be sent again", async () => {
    const row = await paper();
    value(await email(row));
    const [mail] = await mailOf(row);
    await mailFailed(viewer.firmId, mail?.id ?? "", "550 no such mailbox");
    const bounced = await current(row.jobId);
    expect(bounced.state).toBe("bounced");
    expect(codeOf(await email(bounced))).toBe("ok");
  });

  it("writes one mail when two people press send at once", async () => {
    const row = await paper();
    const codes = (await Promise.all([email(row), email(row), email(row)])).map(codeOf);
    expect(codes.toSorted()).toEqual(["conflict", "conflict", "ok"]);
    expect(await mailOf(row)).toHaveLength(1);
  });

  it("already with the operator is chased: the mail goes, the state stays", async () => {
    const row = await paper();
    value(await sent(row));
    const submitted = await current(row.jobId);
    value(await email(submitted));
    expect(await current(row.jobId)).toMatchObject({ state: "submitted", sentOn: "2026-12-01" });
    expect(await mailOf(row)).toHaveLength(1);
  });
});

describe("a paper recorded as sent", () => {
  it("cannot be recorded twice, nor from a screen that is behind", async () => {
    const row = await paper();
    expect((await Promise.all([sent(row), sent(row)])).map(codeOf).toSorted()).toEqual(["conflict", "ok"]);
    expect(codeOf(await sent(row, row.version + 1))).toBe("conflict");
  });

  it("is not sent on a day that lies ahead, nor with a pack of another job", async () => {
    const [row, other] = [await paper(), await paper()];
    const input = { submissionId: row.id, version: row.version, channel: "post", sentTo: null, note: null } as const;
    expect(codeOf(await recordSent(viewer, { ...input, packId: packOf(row), sentOn: "2049-01-01" }))).toBe("invalid");
    expect(codeOf(await recordSent(viewer, { ...input, packId: packOf(other), sentOn: "2026-12-01" }))).toBe("invalid");
  });
});

describe("an operator's answer", () => {
  it("needs what the move needs, field by field", async () => {
    const row = await paper();
    value(await sent(row));
    const submitted = await current(row.jobId);
    expect(await move(submitted, "acknowledged")).toMatchObject({
      ok: false,
      error: { code: "invalid", fields: [{ path: "reference" }] },
    });
    value(await move(submitted, "acknowledged", { reference: "NPG-1" }));
    expect(await current(row.jobId)).toMatchObject({ state: "acknowledged", reference: "NPG-1" });
  });

  it("is refused when the paper's state does not lead there: silence approves nothing", async () => {
    const row = await paper();
    value(await sent(row));
    const submitted = await current(row.jobId);
    const approval = { reference: "X", note: "n" };
    expect(codeOf(await move(submitted, "approved", approval))).toBe("conflict"); // a notice is never approved
    expect(codeOf(await move({ ...submitted, version: 1 }, "acknowledged", approval))).toBe("conflict");
  });

  it("becomes a fact of the job, so that the rules see the decision", async () => {
    const record = exampleRecord((draft) => {
      draft.stage = "planned";
      Object.assign(draft.dates, { installed: null, commissioned: null, planned: "2026-12-20" });
      draft.demand.existingA = [40];
    });
    const row = await paper(record);
    expect(row.purpose).toBe("application");
    value(await sent(row));
    value(await move(await current(row.jobId), "approved-with-limit", { reference: "NPG-7", limitA: 24 }));
    const { record: after } = value(await getJob(viewer, { jobId: row.jobId }));
    expect(after.operatorRecords).toMatchObject([
      { purpose: "application", decision: "approved-with-limit", limitA: 24, reference: "NPG-7" },
    ]);
  });

  it("is waited for with a day: a call puts the next step off", async () => {
    const row = await paper();
    value(await sent(row));
    const { dueOn } = await current(row.jobId);
    const later = "2026-12-08T10:00:00.000Z";
    const call = { submissionId: row.id, kind: "call", text: "With the planner.", spokeTo: "the desk" } as const;
    value(await atTime(later, () => recordNote(viewer, call)));
    const after = await atTime(later, () => current(row.jobId));
    expect(dueOn && after.dueOn && after.dueOn > dueOn).toBe(true);
    expect(after.state).toBe("submitted");
  });
});

it("holds everything but the safety report back while the route is stop", async () => {
  const jobId = await openJob(viewer);
  await sealAndBuild(viewer, jobId);
  const notice = await current(jobId);
  const { version } = value(await getJob(viewer, { jobId }));
  const { saveJob } = await import("@/db/queries/jobs");
  const changes = [{ path: "supply.serviceConditions", was: ["sound"], value: ["exposed-live"] }];
  value(await saveJob(viewer, { jobId, saveId: crypto.randomUUID(), baseVersion: version, changes }));
  expect(codeOf(await sent(notice))).toBe("held-back");
  await sealAndBuild(viewer, jobId);
  const papers = value(await submissionsOfJob(viewer, { jobId }));
  const report = papers.find(({ purpose }) => purpose === "safety-report");
  expect(report && codeOf(await sent(report))).toBe("ok");
});

describe("the desk", () => {
  it("counts every paper in each tab it belongs to, and never one both as waiting and as needing somebody", async () => {
    const filter = { q: null, operatorId: null, purpose: null, after: null };
    const all = value(await listSubmissions(viewer, { ...filter, tab: "all" }));
    expect(all.tabs["needs-someone"] + all.tabs.waiting + all.tabs.closed).toBe(all.tabs.all);
    for (const tab of Object.keys(all.tabs) as (keyof typeof all.tabs)[]) {
      const page = value(await listSubmissions(viewer, { ...filter, tab }));
      expect(page.total, tab).toBe(all.tabs[tab]);
      expect(value(await exportSubmissions(viewer, { ...filter, tab })).length, tab).toBe(all.tabs[tab]);
    }
  });

  it("shows a paper past its last day as such on the day after", async () => {
    const row = await paper();
    const filter = { q: row.jobNumber, operatorId: null, purpose: null, after: null, tab: "past-last-day" } as const;
    const on = (day: string) => atTime(`${day}T09:00:00.000Z`, () => listSubmissions(viewer, filter));
    expect(value(await on("2026-12-18")).total).toBe(0);
    expect(value(await on("2026-12-19")).rows).toMatchObject([{ daysLeft: -1 }]);
  });

  it("drafts a mail that names the site, the number and the pack, and where it goes", async () => {
    const row = await paper();
    const view = value(await getSubmission(viewer, { submissionId: row.id }));
    expect(view.draft.subject).toContain(row.jobNumber);
    expect(view.draft.body).toContain("4 Ropewalk Lane, Oxcombe");
    expect(view.draft.body).toContain("2399232323236");
    expect(`${view.draft.subject}${view.draft.body}`).not.toMatch(/undefined|null|NaN|\[object/);
    expect(view.sendTo.email).toMatch(/example\.com$/);
    expect(view.moves.every(({ to }) => to !== "queued")).toBe(true);
  });
});
