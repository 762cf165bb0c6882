import { sql } from "drizzle-orm";
import { integer, pgPolicy, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { createdAt, currentFirm } from "./columns";

/** A firm of electricians: the tenant. Its facts are copied into each job it opens. */
export const firms = pgTable(
  "firms",
  {
    id: uuid("id").primaryKey(),
    name: text("name").notNull(),
    contactName: text("contact_name"),
    phone: text("phone"),
    email: text("email"),
    address: text("address").array().notNull().default([]),
    registration: text("registration"),
    numberPrefix: text("number_prefix").notNull(),
    nextNumber: integer("next_number").notNull().default(1),
    version: integer("version").notNull().default(1),
    createdAt: createdAt(),
  },
  () => [
    pgPolicy("firms_of_firm", {
      for: "all",
      using: sql`id = ${currentFirm}`,
      withCheck: sql`id = ${currentFirm}`,
    }),
  ],
).enableRLS();
