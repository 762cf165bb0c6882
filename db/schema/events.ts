import { sql } from "drizzle-orm";
import { bigint, index, jsonb, pgTable, primaryKey, text, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import { firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";

/**
 * What happened in a firm, in order. Appended, never changed. A trigger numbers each row and chains it to the
 * one before: `hash` is the SHA-256 of the previous hash and this row's words.
 */
export const events = pgTable(
  "events",
  {
    firmId: firmColumn().references(() => firms.id),
    id: uuid("id").notNull(),
    /** 1, 2, 3 … in each firm; given by the trigger. */
    seq: bigint("seq", { mode: "number" }).notNull().default(0),
    at: instantColumn("at")
      .notNull()
      .default(sql`now()`),
    /** Null when the program itself acted. */
    actorId: uuid("actor_id"),
    actorName: text("actor_name").notNull(),
    type: text("type").notNull(),
    jobId: uuid("job_id"),
    payload: jsonb("payload").$type<Record<string, unknown>>().notNull(),
    previousHash: text("previous_hash").notNull().default(""),
    hash: text("hash").notNull().default(""),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("events_in_order").on(t.firmId, t.seq),
    index("events_of_job").on(t.firmId, t.jobId, t.seq),
    firmPolicy("events"),
  ],
).enableRLS();
