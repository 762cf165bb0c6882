import { boolean, foreignKey, index, integer, pgTable, primaryKey, text, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { jobs } from "./jobs";
import { members } from "./people";

/** A photo of a job, re-encoded and without its place. Taken out of a job it is only marked: packs may hold it. */
export const photos = pgTable(
  "photos",
  {
    firmId: firmColumn(),
    id: uuid("id").notNull(),
    jobId: uuid("job_id").notNull(),
    /** Plain name, unique in its job; the record's evidence speaks of the photo by it. */
    file: text("file").notNull(),
    subject: text("subject").$type<EvidenceSubject>().notNull(),
    of: text("of"),
    caption: text("caption"),
    takenAt: instantColumn("taken_at"),
    widthPx: integer("width_px").notNull(),
    heightPx: integer("height_px").notNull(),
    bytes: integer("bytes").notNull(),
    sha256: text("sha256").notNull(),
    storageKey: text("storage_key").notNull(),
    /** Hash of the file as it was sent: the same upload repeated is answered, not stored twice. */
    sentSha256: text("sent_sha256").notNull(),
    inPack: boolean("in_pack").notNull().default(true),
    addedBy: uuid("added_by").notNull(),
    createdAt: createdAt(),
    removedAt: instantColumn("removed_at"),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("photos_file").on(t.firmId, t.jobId, t.file),
    index("photos_of_job").on(t.firmId, t.jobId, t.createdAt),
    foreignKey({ columns: [t.firmId, t.jobId], foreignColumns: [jobs.firmId, jobs.id] }),
    foreignKey({ columns: [t.firmId, t.addedBy], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("photos"),
  ],
).enableRLS();
