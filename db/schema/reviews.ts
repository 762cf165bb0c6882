import { foreignKey, index, integer, jsonb, pgTable, primaryKey, text, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import type { Outcome } from "@/lib/notify/result";
import type { ReviewState } from "@/lib/notify/review";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { jobs } from "./jobs";
import { packs } from "./packs";
import { members } from "./people";

/** The compliance lead's judgement on the settings in one sealed pack. */
export const reviews = pgTable(
  "reviews",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    jobId: uuid("job_id").notNull(),
    packId: uuid("pack_id").notNull(),
    state: text("state").$type<ReviewState>().notNull().default("waiting"),
    /** How the smart-charging rules answered in this pack, counted. */
    tally: jsonb("tally").$type<Record<Outcome, number>>().notNull(),
    version: integer("version").notNull().default(1),
    decidedBy: uuid("decided_by"),
    decidedAt: instantColumn("decided_at"),
    reason: text("reason"),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("reviews_of_pack").on(t.firmId, t.packId),
    index("reviews_of_job").on(t.firmId, t.jobId, t.createdAt),
    index("reviews_by_state").on(t.firmId, t.state, t.createdAt, t.id),
    foreignKey({ columns: [t.firmId, t.jobId], foreignColumns: [jobs.firmId, jobs.id] }),
    foreignKey({ columns: [t.firmId, t.packId], foreignColumns: [packs.firmId, packs.id] }),
    foreignKey({ columns: [t.firmId, t.decidedBy], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("reviews"),
  ],
).enableRLS();
