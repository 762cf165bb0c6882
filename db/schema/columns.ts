import { sql } from "drizzle-orm";
import { customType, pgPolicy, uuid } from "drizzle-orm/pg-core";

const instant = customType<{ data: string; driverData: string }>({
  dataType: () => "timestamp(3) with time zone",
  fromDriver: (value) => new Date(value).toISOString(),
});

/** An instant as UTC ISO text, to the millisecond, so that it survives a round trip unchanged. */
export const instantColumn = (name: string) => instant(name);

export const createdAt = () =>
  instant("created_at")
    .notNull()
    .default(sql`now()`);

export const firmColumn = () => uuid("firm_id").notNull();

/**
 * The firm of this transaction. The setting is NULL on a fresh connection and '' after a transaction that
 * set it has ended, so both must read as "no firm".
 */
export const currentFirm = sql`nullif(current_setting('app.firm_id', true), '')::uuid`;

/** Rows of the firm in hand and no others, for reading and for writing. */
export const firmPolicy = (table: string) =>
  pgPolicy(`${table}_of_firm`, {
    for: "all",
    using: sql`firm_id = ${currentFirm}`,
    withCheck: sql`firm_id = ${currentFirm}`,
  });
