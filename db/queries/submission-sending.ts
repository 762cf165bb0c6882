import { and, eq } from "drizzle-orm";
import { today } from "../clock";
import type { Tx } from "../client";
import { isRowId, movedOn, notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { packs } from "../schema";
import { refreshStanding } from "../standing";
import { asFirm } from "../tenant";
import { addEntry, holdPaper, movePaper, safetyReportState, type HeldPaper } from "./submission-moves";
import { longDate } from "@/lib/notify/calendar";
import { failed, ok, type Result } from "@/lib/notify/result";
import {
  heldBack,
  isOver,
  isSent,
  submissionChannelName,
  submissionMoves,
  type SubmissionChannel,
} from "@/lib/notify/submission";
import type { Viewer } from "@/lib/server/auth/viewer";
import { post } from "@/lib/server/mail/post";

export type Moved = { submissionId: string; version: number };

type Sealed = { version: number; sha256: string; storageKey: string };

/** The sealed pack of this job that is to go with the paper. */
async function sealedPack(tx: Tx, paper: HeldPaper, packId: string): Promise<Sealed | null> {
  if (!isRowId(packId)) return null;
  const [pack] = await tx
    .select({ version: packs.version, sha256: packs.sha256, storageKey: packs.storageKey })
    .from(packs)
    .where(and(eq(packs.firmId, paper.firmId), eq(packs.id, packId), eq(packs.jobId, paper.jobId)));
  return pack?.sha256 && pack.storageKey ? { ...pack, sha256: pack.sha256, storageKey: pack.storageKey } : null;
}

type ToSend = { paper: HeldPaper; pack: Sealed };

/** Holds a paper for sending: it must be as the person saw it, its pack sealed, and nothing holding it back. */
async function holdForSending(
  tx: Tx,
  viewer: Viewer,
  input: { submissionId: string; version: number; packId: string },
): Promise<Result<ToSend>> {
  const paper = await holdPaper(tx, viewer.firmId, input.submissionId);
  if (!paper) return notFound("submission");
  if (paper.version !== input.version || isOver(paper.state)) return movedOn("submission");
  const held = heldBack({
    purpose: paper.purpose,
    route: paper.job.contradicts ? null : paper.job.route,
    safetyReport: await safetyReportState(tx, viewer.firmId, paper.jobId),
  });
  if (held) return failed("held-back", held);
  const pack = await sealedPack(tx, paper, input.packId);
  return pack
    ? ok({ paper, pack })
    : failed("invalid", "Choose a sealed version of this job’s pack.", [
        { path: "packId", message: "is not a sealed version of this job's pack" },
      ]);
}

const mayMoveTo = (paper: HeldPaper, to: "queued" | "submitted") =>
  submissionMoves(paper.state, paper.purpose).some((move) => move.to === to && move.by === "send");

const about = (paper: HeldPaper) =>
  ({
    version: 1,
    jobId: paper.jobId,
    jobNumber: paper.job.number,
    submissionId: paper.id,
    purpose: paper.purpose,
  }) as const;

export type SendInput = {
  submissionId: string;
  version: number;
  packId: string;
  to: string;
  subject: string;
  body: string;
};

/**
 * Sends a paper with its pack by e-mail: the mail goes into the outbox in the same transaction, and the paper is
 * submitted once it has left. A paper the operator already holds is chased: the mail goes, the state stays. The
 * answer to a question makes it acknowledged again, waiting for the operator.
 * Failures: `conflict`, `held-back`, `invalid`.
 */
export async function sendByEmail(viewer: Viewer, input: SendInput): Promise<Result<Moved>> {
  const refused = refusal(viewer, "submissions.write");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const ready = await holdForSending(tx, viewer, input);
    if (!ready.ok) return ready;
    const { paper, pack } = ready.value;
    const answers = paper.state === "question";
    const chases = isSent(paper.state);
    const to = answers ? "acknowledged" : chases ? paper.state : "queued";
    if (!chases && !mayMoveTo(paper, "queued")) return movedOn("submission");
    const moved = await movePaper(tx, paper, {
      to,
      version: input.version,
      set: chases ? { packId: input.packId } : { packId: input.packId, channel: "e-mail", sentTo: input.to },
    });
    if (!moved) return movedOn("submission");
    const fileName = `${paper.job.number}-pack-v${pack.version}.zip`;
    await post(tx, {
      firmId: viewer.firmId,
      kind: "submission",
      to: input.to,
      replyTo: viewer.email,
      subject: input.subject,
      body: input.body,
      attachments: [{ fileName, storageKey: pack.storageKey, contentType: "application/zip" }],
      submissionId: paper.id,
    });
    const what = answers ? "Answer" : chases ? "Chase" : "E-mail";
    const words = `${what} to ${input.to} with pack version ${pack.version}, ${pack.sha256.slice(0, 8)}.`;
    await addEntry(tx, paper, { kind: "move", text: words, state: to, by: viewer.userId });
    await refreshStanding(tx, viewer.firmId, paper.jobId);
    const on = today();
    const moves = { from: paper.state, to, reference: paper.reference, on };
    const chased = { channel: "e-mail", sentTo: input.to, sentOn: on, packId: input.packId } as const;
    if (chases && !answers) await recordEvent(tx, viewer, { type: "submission.sent", ...about(paper), ...chased });
    else await recordEvent(tx, viewer, { type: "submission.moved", ...about(paper), ...moves });
    return ok({ submissionId: paper.id, version: input.version + 1 });
  });
}

export type SentInput = {
  submissionId: string;
  version: number;
  packId: string;
  channel: SubmissionChannel;
  sentOn: string;
  sentTo: string | null;
  note: string | null;
};

/** Records that a person sent a paper by their own road. Failures: `conflict`, `held-back`, `invalid`. */
export async function recordSent(viewer: Viewer, input: SentInput): Promise<Result<Moved>> {
  const refused = refusal(viewer, "submissions.write");
  if (refused) return refused;
  if (input.sentOn > today())
    return failed("invalid", "The day of sending lies ahead.", [
      { path: "sentOn", message: "is after today; record it once it has been sent" },
    ]);
  return asFirm(viewer, async (tx) => {
    const ready = await holdForSending(tx, viewer, input);
    if (!ready.ok) return ready;
    const { paper, pack } = ready.value;
    if (!mayMoveTo(paper, "submitted")) return movedOn("submission");
    const { channel, sentOn, sentTo, packId } = input;
    const set = { channel, sentOn, sentTo, packId };
    if (!(await movePaper(tx, paper, { to: "submitted", version: input.version, set, heardOn: sentOn })))
      return movedOn("submission");
    const where = sentTo ? `, ${sentTo}` : "";
    const note = input.note ? ` ${input.note}` : "";
    const text = `Sent ${longDate(sentOn)}: ${submissionChannelName[channel].toLowerCase()}${where}, pack version ${pack.version}, ${pack.sha256.slice(0, 8)}.${note}`;
    await addEntry(tx, paper, { kind: "sent", text, state: "submitted", by: viewer.userId });
    await refreshStanding(tx, viewer.firmId, paper.jobId);
    await recordEvent(tx, viewer, { type: "submission.sent", ...about(paper), channel, sentTo, sentOn, packId });
    return ok({ submissionId: paper.id, version: input.version + 1 });
  });
}
