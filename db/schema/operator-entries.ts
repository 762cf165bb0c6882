import { sql } from "drizzle-orm";
import { check, date, pgTable, primaryKey, text } from "drizzle-orm/pg-core";
import { firmColumn, firmPolicy, instantColumn } from "./columns";
import { firms } from "./firms";
import type { Division } from "@/lib/notify/bank-holidays";

/** Distributor ids that the register lacks, as a firm has entered them. */
export const operatorEntries = pgTable(
  "operator_entries",
  {
    firmId: firmColumn().references(() => firms.id),
    operatorId: text("operator_id").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: ["dno", "idno"] }).notNull(),
    division: text("division").$type<Division>(),
    fromDay: date("from_day").notNull(),
    source: text("source").notNull(),
    setAt: instantColumn("set_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.firmId, t.operatorId] }),
    check("operator_entries_two_digits", sql`${t.operatorId} ~ '^[0-9]{2}$' and ${t.operatorId} <> '00'`),
    firmPolicy("operator_entries"),
  ],
).enableRLS();
