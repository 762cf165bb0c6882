import { randomUUID } from "node:crypto";
import { enqueue } from "../queue/enqueue";
import type { Tx } from "@/db/client";
import { outbox, type OutboxAttachment, type OutboxKind } from "@/db/schema";

export type Post = {
  firmId: string;
  kind: OutboxKind;
  to: string;
  replyTo?: string | null;
  subject: string;
  body: string;
  attachments?: OutboxAttachment[];
  submissionId?: string | null;
};

/**
 * Put a mail in the outbox and its relay in the queue, in the transaction of the act it tells of: if that is
 * rolled back no mail goes, if it commits the mail goes at least once. `tx` must be in the firm's scope.
 */
export async function post(tx: Tx, mail: Post): Promise<{ outboxId: string; messageId: string }> {
  const id = randomUUID();
  const messageId = `<${id}@sealwire.example.com>`;
  await tx.insert(outbox).values({
    ...mail,
    id,
    messageId,
    replyTo: mail.replyTo ?? null,
    attachments: mail.attachments ?? [],
    submissionId: mail.submissionId ?? null,
  });
  await enqueue(tx, "relay-mail", { firmId: mail.firmId, outboxId: id });
  return { outboxId: id, messageId };
}
