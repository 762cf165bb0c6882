import { join } from "node:path";
import { drizzle } from "drizzle-orm/node-postgres";
import { migrate as runMigrations } from "drizzle-orm/node-postgres/migrator";
import { Client } from "pg";
import PgBoss from "pg-boss";

/** The role the program connects as. It owns nothing and may not pass row-level security by. */
export const appRole = "sealwire_app";
export const queueSchema = "pgboss";
/** Each queue with the queue that receives what failed for good. */
export const queues = { "build-pack": "build-pack-dead", "relay-mail": "relay-mail-dead" } as const;
export type QueueName = keyof typeof queues;

/** Any number, the same in every process: two starts at once migrate one after the other. */
const migrationLock = 5_710_418_231;

const appendOnly = ["events", "assessments", "submission_entries"];

async function queuesOf(ownerUrl: string) {
  const boss = new PgBoss({ connectionString: ownerUrl, schema: queueSchema, supervise: false, schedule: false });
  const troubles: Error[] = [];
  boss.on("error", (error) => troubles.push(error));
  await boss.start();
  try {
    for (const [name, deadLetter] of Object.entries(queues)) {
      if (!(await boss.getQueue(deadLetter))) await boss.createQueue(deadLetter);
      if (!(await boss.getQueue(name))) {
        await boss.createQueue(name, {
          name,
          deadLetter,
          retryLimit: 5,
          retryDelay: 2,
          retryBackoff: true,
          expireInSeconds: 300,
        });
      }
    }
  } finally {
    await boss.stop({ graceful: false });
  }
  if (troubles[0]) throw troubles[0];
}

async function grants(client: Client) {
  const { rows } = await client.query("select 1 from pg_roles where rolname = $1", [appRole]);
  if (rows.length === 0) return; // one role for everything: the policies and triggers still hold
  await client.query(`
    grant usage on schema public, ${queueSchema} to ${appRole};
    grant select, insert, update, delete on all tables in schema public to ${appRole};
    grant usage, select on all sequences in schema public to ${appRole};
    grant select, insert, update, delete on all tables in schema ${queueSchema} to ${appRole};
    grant usage, select on all sequences in schema ${queueSchema} to ${appRole};
    grant execute on all functions in schema ${queueSchema} to ${appRole};
    ${appendOnly.map((table) => `revoke update, delete, truncate on ${table} from ${appRole};`).join("\n")}
    revoke delete, truncate on packs, jobs, submissions, reviews, photos, outbox, firms, members from ${appRole};
  `);
}

/**
 * Brings the database to the present schema: tables, policies, triggers, queues, and what the program's role may
 * touch. Safe to run at every start and by two processes at once. `ownerUrl` is the role that owns the tables.
 */
export async function migrate(ownerUrl: string): Promise<void> {
  const client = new Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock($1)", [migrationLock]);
    await runMigrations(drizzle(client), { migrationsFolder: join(import.meta.dirname, "migrations") });
    await queuesOf(ownerUrl);
    await grants(client);
  } finally {
    await client.end();
  }
}
