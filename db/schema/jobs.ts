import { sql } from "drizzle-orm";
import {
  boolean,
  date,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from "drizzle-orm/pg-core";
import type { DemandRoute } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import type { JobStanding } from "@/lib/notify/views";
import { createdAt, firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";
import { members } from "./people";

/**
 * A job: the record as it stands, and beside it what the lists sort and filter by. Those columns are worked
 * out again from the record and its assessment at every save; nobody types them.
 */
export const jobs = pgTable(
  "jobs",
  {
    firmId: firmColumn().references(() => firms.id),
    id: uuid("id").notNull(),
    number: text("number").notNull(),
    format: text("format").notNull(),
    record: jsonb("record").$type<Job>().notNull(),
    version: integer("version").notNull().default(1),
    /** The version that last added, removed or reordered a circuit, board or chargepoint. */
    listsVersion: integer("lists_version").notNull().default(1),
    stage: text("stage").$type<Job["stage"]>().notNull(),
    site: text("site").notNull(),
    postcode: text("postcode"),
    supplyCore: text("supply_core"),
    serials: text("serials").array().notNull().default([]),
    operatorId: text("operator_id").notNull(),
    unit: text("unit").notNull(),
    route: text("route").$type<DemandRoute>().notNull(),
    /** The record says two things that cannot both be true, so the rules were not run. */
    contradicts: boolean("contradicts").notNull().default(false),
    standing: text("standing").$type<JobStanding>().notNull(),
    installerId: uuid("installer_id"),
    installedOn: date("installed_on"),
    plannedOn: date("planned_on"),
    lastDay: date("last_day"),
    /** What the list is sorted by. A column and not an expression: under row-level security only a column is sought by index. */
    lastDayKey: date("last_day_key")
      .notNull()
      .generatedAlwaysAs(sql`coalesce(last_day, 'infinity'::date)`),
    missingCount: integer("missing_count").notNull().default(0),
    search: text("search").notNull().default(""),
    createdBy: uuid("created_by").notNull(),
    updatedBy: uuid("updated_by").notNull(),
    createdAt: createdAt(),
    updatedAt: instantColumn("updated_at")
      .notNull()
      .default(sql`now()`),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.id] }),
    uniqueIndex("jobs_number").on(t.firmId, t.number),
    index("jobs_by_last_day").on(t.firmId, t.lastDayKey, t.id),
    // Ascending, and read from its end: "desc nulls last", as the generator writes it, does not match "order by … desc".
    index("jobs_by_update").on(t.firmId, t.updatedAt, t.id),
    index("jobs_by_supply").on(t.firmId, t.supplyCore),
    index("jobs_by_installer").on(t.firmId, t.installerId),
    index("jobs_by_standing").on(t.firmId, t.standing),
    foreignKey({ columns: [t.firmId, t.installerId], foreignColumns: [members.firmId, members.userId] }),
    foreignKey({ columns: [t.firmId, t.createdBy], foreignColumns: [members.firmId, members.userId] }),
    foreignKey({ columns: [t.firmId, t.updatedBy], foreignColumns: [members.firmId, members.userId] }),
    firmPolicy("jobs"),
  ],
).enableRLS();

/** A write made with a key of the client's choosing: sent again it gets the stored answer. */
export const idempotencyKeys = pgTable(
  "idempotency_keys",
  {
    firmId: firmColumn().references(() => firms.id),
    key: text("key").notNull(),
    act: text("act").notNull(),
    requestHash: text("request_hash").notNull(),
    /** Null while the first request still runs. */
    reply: jsonb("reply").$type<unknown>(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.firmId, t.key] }), firmPolicy("idempotency_keys")],
).enableRLS();
