import { date, foreignKey, index, integer, jsonb, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import type { Assessment } from "@/lib/notify/assessment";
import { createdAt, firmColumn, firmPolicy } from "./columns";
import { jobs } from "./jobs";

/** What the rules said of one version of a job on one day. Appended, never changed. */
export const assessments = pgTable(
  "assessments",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    jobId: uuid("job_id").notNull(),
    jobVersion: integer("job_version").notNull(),
    asAt: date("as_at").notNull(),
    ruleset: text("ruleset").notNull(),
    body: jsonb("body").$type<Assessment>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    index("assessments_of_job").on(t.firmId, t.jobId, t.jobVersion.desc(), t.createdAt.desc()),
    foreignKey({ columns: [t.firmId, t.jobId], foreignColumns: [jobs.firmId, jobs.id] }),
    firmPolicy("assessments"),
  ],
).enableRLS();
