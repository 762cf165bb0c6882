import { sql } from "drizzle-orm";
import { doublePrecision, integer, jsonb, pgTable, primaryKey, text } from "drizzle-orm/pg-core";
import { firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";
import type { Grounds } from "@/lib/notify/firm-rules";

/** What a firm has learned of an operator: where to send, and figures of its own in place of the register's. */
export const operatorSettings = pgTable(
  "operator_settings",
  {
    firmId: firmColumn().references(() => firms.id),
    operatorId: text("operator_id").notNull(),
    noticeEmail: text("notice_email"),
    applicationEmail: text("application_email"),
    phone: text("phone"),
    page: text("page"),
    noticeDays: integer("notice_days"),
    buriedSeparationM: doublePrecision("buried_separation_m"),
    asksFirstAboveA: doublePrecision("asks_first_above_a"),
    assumesFuseA: doublePrecision("assumes_fuse_a"),
    /** By figure: the day it holds from, its source, the day it was set. */
    grounds: jsonb("grounds").$type<Grounds>().notNull().default({}),
    note: text("note"),
    updatedAt: instantColumn("updated_at")
      .notNull()
      .default(sql`now()`),
  },
  (t) => [primaryKey({ columns: [t.firmId, t.operatorId] }), firmPolicy("operator_settings")],
).enableRLS();
