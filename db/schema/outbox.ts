import { foreignKey, index, integer, jsonb, pgTable, primaryKey, text, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";
import { submissions } from "./submissions";

export type OutboxKind = "submission" | "invitation" | "password-reset";
/** `ambiguous`: handed over, and the answer never came; it may have gone. */
export type OutboxStatus = "waiting" | "sent" | "ambiguous" | "failed";
export type OutboxAttachment = { fileName: string; storageKey: string; contentType: string };

/** Mail to be sent. Written in the transaction of the act it tells of, relayed afterwards, at least once. */
export const outbox = pgTable(
  "outbox",
  {
    firmId: firmColumn().references(() => firms.id),
    id: uuid("id").notNull(),
    /** The same at every attempt, so that a mail that went twice can be known as one. */
    messageId: text("message_id").notNull(),
    kind: text("kind").$type<OutboxKind>().notNull(),
    to: text("to").notNull(),
    replyTo: text("reply_to"),
    subject: text("subject").notNull(),
    body: text("body").notNull(),
    attachments: jsonb("attachments").$type<OutboxAttachment[]>().notNull().default([]),
    status: text("status").$type<OutboxStatus>().notNull().default("waiting"),
    attempts: integer("attempts").notNull().default(0),
    lastError: text("last_error"),
    submissionId: uuid("submission_id"),
    createdAt: createdAt(),
    sentAt: instantColumn("sent_at"),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("outbox_message").on(t.messageId),
    index("outbox_by_status").on(t.firmId, t.status, t.createdAt),
    foreignKey({ columns: [t.firmId, t.submissionId], foreignColumns: [submissions.firmId, submissions.id] }),
    firmPolicy("outbox"),
  ],
).enableRLS();
