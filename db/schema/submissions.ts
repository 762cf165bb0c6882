import { sql } from "drizzle-orm";
import {
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  pgTable,
  primaryKey,
  text,
  uuid,
} from "drizzle-orm/pg-core";
import type { SubmissionChannel, SubmissionPurpose, SubmissionState } from "@/lib/notify/submission";
import type { SubmissionEntry } from "@/lib/notify/views";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { jobs } from "./jobs";
import { packs } from "./packs";
import { members } from "./people";

/** One paper to one operator and where it stands. */
export const submissions = pgTable(
  "submissions",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    jobId: uuid("job_id").notNull(),
    purpose: text("purpose").$type<SubmissionPurpose>().notNull(),
    operatorId: text("operator_id").notNull(),
    state: text("state").$type<SubmissionState>().notNull().default("draft"),
    channel: text("channel").$type<SubmissionChannel>(),
    packId: uuid("pack_id").notNull(),
    sentOn: date("sent_on"),
    sentTo: text("sent_to"),
    reference: text("reference"),
    decidedOn: date("decided_on"),
    limitA: doublePrecision("limit_a"),
    expiresOn: date("expires_on"),
    /** Last day to send it, where there is one. */
    lastDay: date("last_day"),
    /** The day of the last move, call or note; null while nothing has happened. */
    heardOn: date("heard_on"),
    /** The day the next step falls, worked out at each move; null when nothing is awaited. */
    dueOn: date("due_on"),
    /** What the desk is sorted by; see `jobs.lastDayKey`. */
    dueKey: date("due_key")
      .notNull()
      .generatedAlwaysAs(sql`coalesce(due_on, 'infinity'::date)`),
    version: integer("version").notNull().default(1),
    createdAt: createdAt(),
    updatedAt: instantColumn("updated_at")
      .notNull()
      .default(sql`now()`),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    index("submissions_of_job").on(t.firmId, t.jobId),
    index("submissions_by_due").on(t.firmId, t.dueKey, t.id),
    index("submissions_by_state").on(t.firmId, t.state, t.dueOn),
    foreignKey({ columns: [t.firmId, t.jobId], foreignColumns: [jobs.firmId, jobs.id] }),
    foreignKey({ columns: [t.firmId, t.packId], foreignColumns: [packs.firmId, packs.id] }),
    firmPolicy("submissions"),
  ],
).enableRLS();

/** What was sent, said and answered. Appended, never changed. */
export const submissionEntries = pgTable(
  "submission_entries",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    submissionId: uuid("submission_id").notNull(),
    at: instantColumn("at")
      .notNull()
      .default(sql`now()`),
    kind: text("kind").$type<SubmissionEntry["kind"]>().notNull(),
    text: text("text").notNull(),
    reference: text("reference"),
    state: text("state").$type<SubmissionState>().notNull(),
    by: uuid("by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    index("submission_entries_of").on(t.firmId, t.submissionId, t.at),
    foreignKey({ columns: [t.firmId, t.submissionId], foreignColumns: [submissions.firmId, submissions.id] }),
    foreignKey({ columns: [t.firmId, t.by], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("submission_entries"),
  ],
).enableRLS();
