import { today } from "../clock";
import type { Tx } from "../client";
import { movedOn, notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { refreshStanding } from "../standing";
import { asFirm } from "../tenant";
import { lockJob, storeRecord } from "./job-saves";
import { addEntry, holdPaper, movePaper, type HeldPaper } from "./submission-moves";
import type { Moved } from "./submission-sending";
import { longDate } from "@/lib/notify/calendar";
import type { Job } from "@/lib/notify/job";
import { failed, ok, type FieldError, type Result } from "@/lib/notify/result";
import { submissionMoves, type SubmissionMove, type SubmissionState } from "@/lib/notify/submission";
import type { Viewer } from "@/lib/server/auth/viewer";

export type MoveInput = {
  submissionId: string;
  version: number;
  to: SubmissionState;
  /** The day it happened: of the reply, of the decision. */
  on: string;
  reference: string | null;
  limitA: number | null;
  expires: string | null;
  note: string | null;
  spokeTo: string | null;
};

const remedies: Record<SubmissionMove["needs"][number], { path: keyof MoveInput; message: string }> = {
  reference: { path: "reference", message: "give the operator’s reference" },
  "decision-day": { path: "on", message: "give the day of the decision" },
  limit: { path: "limitA", message: "give the limit in amps" },
  note: { path: "note", message: "say what was asked, answered or decided" },
  expires: { path: "expires", message: "give the last day of the offer" },
};

/** Fields that this move needs and the person has not given. */
function lacking(input: MoveInput, move: SubmissionMove): FieldError[] {
  const ahead = input.on > today() ? [{ path: "on", message: "is after today; record it once it has happened" }] : [];
  const empty = move.needs
    .map((need) => remedies[need])
    .filter(({ path }) => input[path] === null || input[path] === "");
  return [...ahead, ...empty];
}

type Decision = Job["operatorRecords"][number]["decision"];
const decisionOf: Partial<Record<SubmissionState, Decision>> = {
  approved: "approved",
  "approved-with-limit": "approved-with-limit",
  "approved-works-to-follow": "approved-works-to-follow",
  refused: "refused",
};

/** An operator's decision becomes a fact of the job, so that the rules see it and nobody types it twice. */
async function noteDecision(tx: Tx, viewer: Viewer, paper: HeldPaper, input: MoveInput): Promise<void> {
  const decision = decisionOf[input.to];
  const job = decision ? await lockJob(tx, viewer.firmId, paper.jobId) : null;
  if (!decision || !job) return;
  const [only, ...others] = job.record.chargepoints;
  const entry = {
    purpose: paper.purpose,
    reference: input.reference ?? paper.reference,
    decision,
    decidedOn: input.on,
    expires: input.expires,
    limitA: input.limitA,
    model: only && others.length === 0 ? [only.make, only.model].filter(Boolean).join(" ") || null : null,
    conditions: input.note,
    sentOn: paper.sentOn,
    sentTo: paper.sentTo,
  };
  const record = { ...job.record, operatorRecords: [...job.record.operatorRecords, entry] };
  const stored = await storeRecord(tx, viewer, job, record);
  if (!stored) throw new Error(`job ${job.id} moved on while it was held`);
  await recordEvent(tx, viewer, {
    type: "job.saved",
    version: 1,
    jobId: job.id,
    jobNumber: job.number,
    jobVersion: stored.version,
    paths: [`operatorRecords[${job.record.operatorRecords.length}]`],
  });
}

function wordsOf(input: MoveInput, move: SubmissionMove): string {
  const parts = [
    `${move.label}, ${longDate(input.on)}.`,
    input.limitA === null ? "" : `Limit ${input.limitA} A.`,
    input.expires === null ? "" : `Open until ${longDate(input.expires)}.`,
    input.spokeTo ? `Spoke to ${input.spokeTo}.` : "",
    input.note ?? "",
  ];
  return parts.filter(Boolean).join(" ");
}

/**
 * Records what the operator answered, or what the firm did about it. Only a move that the paper's state allows,
 * with what that move needs. Failures: `conflict` when the paper has moved on, `invalid` field by field.
 */
export async function recordMove(viewer: Viewer, input: MoveInput): Promise<Result<Moved>> {
  const refused = refusal(viewer, "submissions.write");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const paper = await holdPaper(tx, viewer.firmId, input.submissionId);
    if (!paper) return notFound("submission");
    if (paper.version !== input.version) return movedOn("submission");
    const move = submissionMoves(paper.state, paper.purpose).find(({ to, by }) => to === input.to && by !== "send");
    if (!move) return movedOn("submission");
    const fields = lacking(input, move);
    if (fields.length) return failed("invalid", "Some answers need another look.", fields);
    const set = {
      reference: input.reference ?? paper.reference,
      limitA: input.limitA ?? paper.limitA,
      expiresOn: input.expires ?? paper.expiresOn,
      decidedOn: move.needs.includes("decision-day") ? input.on : paper.decidedOn,
    };
    const moved = await movePaper(tx, paper, { to: input.to, version: input.version, set, heardOn: input.on });
    if (!moved) return movedOn("submission");
    const kind = move.by === "reply" ? "reply" : "move";
    const words = { text: wordsOf(input, move), reference: input.reference, state: input.to, by: viewer.userId };
    await addEntry(tx, paper, { kind, ...words });
    await noteDecision(tx, viewer, paper, input);
    await refreshStanding(tx, viewer.firmId, paper.jobId);
    await recordEvent(tx, viewer, {
      type: "submission.moved",
      version: 1,
      jobId: paper.jobId,
      jobNumber: paper.job.number,
      submissionId: paper.id,
      purpose: paper.purpose,
      from: paper.state,
      to: input.to,
      reference: input.reference,
      on: input.on,
    });
    return ok({ submissionId: paper.id, version: input.version + 1 });
  });
}

export type NoteInput = { submissionId: string; kind: "call" | "note"; text: string; spokeTo: string | null };

/** Adds a call or a note to a paper's history. It answers a chase that was due; the state stays. */
export async function recordNote(viewer: Viewer, input: NoteInput): Promise<Result<Moved>> {
  const refused = refusal(viewer, "submissions.write");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const paper = await holdPaper(tx, viewer.firmId, input.submissionId);
    if (!paper) return notFound("submission");
    const { version, state } = paper;
    if (!(await movePaper(tx, paper, { to: state, version }))) return movedOn("submission");
    const text = input.spokeTo ? `Spoke to ${input.spokeTo}. ${input.text}` : input.text;
    await addEntry(tx, paper, { kind: input.kind, text, state, by: viewer.userId });
    await recordEvent(tx, viewer, {
      type: "submission.noted",
      version: 1,
      jobId: paper.jobId,
      jobNumber: paper.job.number,
      submissionId: paper.id,
      purpose: paper.purpose,
      kind: input.kind,
      spokeTo: input.spokeTo,
    });
    return ok({ submissionId: paper.id, version: version + 1 });
  });
}
