import { and, eq, inArray, sql } from "drizzle-orm";
import { nowInstant, today } from "../clock";
import type { Tx } from "../client";
import { recordEvent } from "../record-event";
import { outbox } from "../schema";
import { refreshStanding } from "../standing";
import { asFirmId } from "../tenant";
import { addEntry, holdPaper, movePaper, type HeldPaper } from "./submission-moves";

export type OutboxMail = typeof outbox.$inferSelect;

const mine = (firmId: string, outboxId: string) => and(eq(outbox.firmId, firmId), eq(outbox.id, outboxId));

const program = (firmId: string) => ({ firmId, userId: null, name: "Sealwire" });

const about = (paper: HeldPaper) =>
  ({
    version: 1,
    jobId: paper.jobId,
    jobNumber: paper.job.number,
    submissionId: paper.id,
    purpose: paper.purpose,
  }) as const;

/** A history line needs a person: what the relay did stands to the name of whoever sent the mail. */
const byWhom = async (tx: Tx, firmId: string, paper: HeldPaper): Promise<string> => {
  const { rows } = await tx.execute<{ by: string }>(sql`
    select "by" from submission_entries where firm_id = ${firmId} and submission_id = ${paper.id} order by at desc limit 1`);
  const by = rows[0]?.by;
  if (!by) throw new Error(`submission ${paper.id} has a mail and no history`);
  return by;
};

async function paperOf(tx: Tx, firmId: string, mail: OutboxMail): Promise<HeldPaper | null> {
  return mail.submissionId ? holdPaper(tx, firmId, mail.submissionId) : null;
}

/** The mail server has taken the mail. A paper that was leaving is now submitted. Said twice, it changes nothing more. */
export async function mailSent(firmId: string, outboxId: string): Promise<void> {
  await asFirmId(firmId, async (tx) => {
    const [mail] = await tx.select().from(outbox).where(mine(firmId, outboxId));
    const paper = mail ? await paperOf(tx, firmId, mail) : null;
    const [sent] = await tx
      .update(outbox)
      .set({ status: "sent", sentAt: nowInstant(), lastError: null })
      .where(and(mine(firmId, outboxId), inArray(outbox.status, ["waiting", "ambiguous"])))
      .returning({ to: outbox.to });
    if (!sent || !paper || paper.state !== "queued") return;
    const sentOn = today();
    await movePaper(tx, paper, { to: "submitted", version: paper.version, set: { sentOn, channel: "e-mail" } });
    const text = `Left by e-mail to ${sent.to}, message ${mail?.messageId ?? ""}.`;
    await addEntry(tx, paper, { kind: "sent", text, state: "submitted", by: await byWhom(tx, firmId, paper) });
    await refreshStanding(tx, firmId, paper.jobId);
    const how = { channel: "e-mail", sentTo: sent.to, sentOn, packId: paper.packId } as const;
    await recordEvent(tx, program(firmId), { type: "submission.sent", ...about(paper), ...how });
  });
}

/** The mail was refused for good, or every try failed. A paper that was leaving comes back as bounced. */
export async function mailFailed(firmId: string, outboxId: string, error: string): Promise<void> {
  await asFirmId(firmId, async (tx) => {
    const [mail] = await tx.select().from(outbox).where(mine(firmId, outboxId));
    const paper = mail ? await paperOf(tx, firmId, mail) : null;
    const [failed] = await tx
      .update(outbox)
      .set({ status: "failed", lastError: error.slice(0, 500) })
      .where(and(mine(firmId, outboxId), inArray(outbox.status, ["waiting", "ambiguous"])))
      .returning({ to: outbox.to });
    if (!failed || !paper || paper.state !== "queued") return;
    await movePaper(tx, paper, { to: "bounced", version: paper.version });
    const text = `The e-mail to ${failed.to} was not taken. Correct the address and send again.`;
    await addEntry(tx, paper, { kind: "reply", text, state: "bounced", by: await byWhom(tx, firmId, paper) });
    await refreshStanding(tx, firmId, paper.jobId);
    const moves = { from: paper.state, to: "bounced", reference: null, on: today() } as const;
    await recordEvent(tx, program(firmId), { type: "submission.moved", ...about(paper), ...moves });
  });
}
