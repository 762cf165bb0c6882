import PgBoss from "pg-boss";
import { jobSchemas, tryLimitSeconds, type JobData, type JobName } from "./jobs";
import type { Tx } from "@/db/client";
import { queueSchema } from "@/db/migrate";

type Statement = (text: string, values: unknown[]) => Promise<{ rows: unknown[] }>;

/**
 * The connection behind a Drizzle transaction. Drizzle keeps it private and offers no way to run a statement
 * that is already text and values; tests/server/queue.test.ts holds that a rollback takes the job with it.
 */
function statementOf(tx: Tx): Statement {
  const { session } = tx as unknown as { session?: { client?: { query?: Statement } } };
  const client = session?.client;
  if (!client?.query) throw new Error("the transaction has no connection: drizzle-orm has changed inside");
  return (text, values) => client.query!(text, values);
}

/**
 * Put a piece of work in the queue as part of a transaction: it exists when the transaction commits, and never
 * did when it rolls back. `startAfterSeconds` delays it. Returns the id of the queued job.
 */
export async function enqueue<N extends JobName>(
  tx: Tx,
  name: N,
  data: JobData<N>,
  options: { startAfterSeconds?: number } = {},
): Promise<string> {
  const boss = new PgBoss({ db: { executeSql: statementOf(tx) as PgBoss.Db["executeSql"] }, schema: queueSchema });
  const id = await boss.send(name, jobSchemas[name].parse(data), {
    startAfter: options.startAfterSeconds ?? 0,
    expireInSeconds: tryLimitSeconds[name],
  });
  if (!id) throw new Error(`the queue did not take a ${name} job`);
  return id;
}
