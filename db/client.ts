import { drizzle, type NodePgDatabase } from "drizzle-orm/node-postgres";
import { Pool } from "pg";
import * as schema from "./schema";

/** One pool a process, kept across reloads in development. */
const kept = globalThis as typeof globalThis & { sealwirePool?: Pool };

function makePool(): Pool {
  const pool = new Pool({
    connectionString: process.env.DATABASE_URL,
    max: Number(process.env.DATABASE_POOL ?? 10),
    connectionTimeoutMillis: 5_000,
    idle_in_transaction_session_timeout: 30_000,
    statement_timeout: 30_000,
  });
  // A lost idle connection is not an answer to anybody's question; the next query opens another.
  pool.on("error", (error) => process.stderr.write(`database connection lost: ${error.message}\n`));
  return pool;
}

export const pool: Pool = (kept.sealwirePool ??= makePool());

/** For tables without a firm: people, sessions, resets, attempts. Everything else goes through `db/tenant.ts`. */
export const db: NodePgDatabase<typeof schema> = drizzle(pool, { schema });

export type Tx = Parameters<Parameters<typeof db.transaction>[0]>[0];
