import { and, eq } from "drizzle-orm";
import { smtpAddress } from "./smtp-address";
import { handOver, type Handover, type Mail } from "./transport";
import { env } from "../env";
import { readAll, storage } from "../storage/storage";
import { mailFailed, mailSent } from "@/db/queries/mail-relay";
import { asFirmId } from "@/db/tenant";
import { outbox } from "@/db/schema";

type Row = typeof outbox.$inferSelect;
type Key = { firmId: string; outboxId: string };
const rowOf = ({ firmId, outboxId }: Key) => and(eq(outbox.firmId, firmId), eq(outbox.id, outboxId));

/**
 * Take the row in hand, or null when it needs nothing more. From here until an answer comes back it counts as
 * ambiguous, so that a process killed in between leaves the truth behind.
 */
const takeInHand = (key: Key): Promise<Row | null> =>
  asFirmId(key.firmId, async (tx) => {
    const [row] = await tx.select().from(outbox).where(rowOf(key)).for("update");
    if (!row || row.status === "sent" || row.status === "failed") return null;
    await tx
      .update(outbox)
      .set({ status: "ambiguous", attempts: row.attempts + 1, lastError: "Handed to the mail server, no answer yet." })
      .where(rowOf(key));
    return row;
  });

async function mailOf(row: Row): Promise<Mail> {
  const attachments = await Promise.all(
    row.attachments.map(async ({ fileName, storageKey, contentType }) => {
      const bytes = await readAll(storage(), storageKey);
      if (!bytes) throw new Error(`the attachment ${fileName} is not in storage`);
      return { fileName, contentType, bytes };
    }),
  );
  const { messageId, to, replyTo, subject, body } = row;
  return { messageId, from: env().MAIL_FROM, to, replyTo, subject, body, attachments };
}

async function send(row: Row): Promise<Handover> {
  try {
    return await handOver(await smtpAddress(), await mailOf(row));
  } catch (error) {
    // Before anything was handed over: no address, or an attachment that cannot be read.
    return { outcome: "later", because: error instanceof Error ? error.message : "unknown" };
  }
}

/** A mail that should be tried again; the queue waits longer each time. */
export class MailNotTaken extends Error {}

/**
 * Send one mail of the outbox: at least once, always under the same Message-ID. Throws `MailNotTaken` when it
 * should be tried again. A mail that has been ambiguous once stays marked so until a server says it took it.
 */
export async function relayMail(key: Key): Promise<void> {
  const row = await takeInHand(key);
  if (!row) return;
  const done = await send(row);
  if (done.outcome === "sent") return mailSent(key.firmId, key.outboxId);
  if (done.outcome === "refused") return mailFailed(key.firmId, key.outboxId, done.because);
  const mayHaveGone = done.outcome === "ambiguous" || row.status === "ambiguous";
  await asFirmId(key.firmId, (tx) =>
    tx
      .update(outbox)
      .set({ status: mayHaveGone ? "ambiguous" : "waiting", lastError: done.because })
      .where(rowOf(key)),
  );
  throw new MailNotTaken(done.because);
}

/** The queue has given up. What never went is failed; what may have gone stays ambiguous, for a person to judge. */
export async function giveUpMail(key: Key): Promise<void> {
  const [row] = await asFirmId(key.firmId, (tx) => tx.select().from(outbox).where(rowOf(key)));
  if (row?.status === "waiting") await mailFailed(key.firmId, key.outboxId, row.lastError ?? "It was never taken.");
}
