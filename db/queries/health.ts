import { sql } from "drizzle-orm";
import { db } from "../client";

/** Throws when the database does not answer. */
export async function databaseAnswers(): Promise<void> {
  await db.execute(sql`select 1`);
}
