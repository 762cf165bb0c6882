import {
  bigint,
  foreignKey,
  index,
  integer,
  json,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from "drizzle-orm/pg-core";
import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import type { PackStatus } from "@/lib/notify/views";
import { assessments } from "./assessments";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { jobs } from "./jobs";
import { members } from "./people";

/** A photo as it was when the pack was sealed, with where its bytes are kept. */
export type FrozenPhoto = {
  file: string;
  subject: EvidenceSubject;
  caption: string | null;
  takenAt: string | null;
  number: number;
  storageKey: string;
};
export type PackChange = { path: string; was: unknown; now: unknown };
export type PackFile = { name: string; bytes: number; sha256: string };

/** A numbered version of a job's papers. Everything it is built from is frozen here; once sealed no column changes. */
export const packs = pgTable(
  "packs",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    jobId: uuid("job_id").notNull(),
    version: integer("version").notNull(),
    jobVersion: integer("job_version").notNull(),
    status: text("status").$type<PackStatus>().notNull().default("building"),
    progress: integer("progress").notNull().default(0),
    step: text("step").notNull().default("Waiting to be built"),
    /** `json`, not `jsonb`: the text is kept as it was written, so that a rebuild gives the same bytes. */
    record: json("record").$type<Job>().notNull(),
    assessmentId: uuid("assessment_id").notNull(),
    assessment: json("assessment").$type<Assessment>().notNull(),
    photos: jsonb("photos").$type<FrozenPhoto[]>().notNull(),
    changes: jsonb("changes").$type<PackChange[]>().notNull(),
    ruleset: text("ruleset").notNull(),
    /** Hash of the firm's newest event when the pack was frozen; printed in its manifest. */
    chainHead: text("chain_head"),
    gapsReason: text("gaps_reason"),
    declarationName: text("declaration_name").notNull(),
    declarationStatement: text("declaration_statement").notNull(),
    sealedBy: uuid("sealed_by").notNull(),
    issuedAt: instantColumn("issued_at").notNull(),
    sha256: text("sha256"),
    bytes: bigint("bytes", { mode: "number" }),
    storageKey: text("storage_key"),
    files: jsonb("files").$type<PackFile[]>(),
    sealedAt: instantColumn("sealed_at"),
    error: text("error"),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("packs_version").on(t.firmId, t.jobId, t.version),
    index("packs_by_status").on(t.firmId, t.status),
    foreignKey({ columns: [t.firmId, t.jobId], foreignColumns: [jobs.firmId, jobs.id] }),
    foreignKey({ columns: [t.firmId, t.assessmentId], foreignColumns: [assessments.firmId, assessments.id] }),
    foreignKey({ columns: [t.firmId, t.sealedBy], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("packs"),
  ],
).enableRLS();
