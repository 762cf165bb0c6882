import PgBoss from "pg-boss";
import { env } from "../env";
import { log } from "../log";
import { queueSchema } from "@/db/migrate";

const kept = globalThis as typeof globalThis & { sealwireBoss?: Promise<PgBoss> };

async function start(): Promise<PgBoss> {
  // The owner makes schema and queues when migrating; this role may use them and nothing more.
  const boss = new PgBoss({
    connectionString: env().DATABASE_URL,
    schema: queueSchema,
    migrate: false,
    schedule: false,
    // How often work whose process was killed is looked for.
    maintenanceIntervalSeconds: 20,
    max: 3,
    application_name: "sealwire-queue",
  });
  boss.on("error", (error) => log.error({ err: error }, "queue"));
  return boss.start();
}

/** The queue of this process, started once. */
export const boss = (): Promise<PgBoss> => (kept.sealwireBoss ??= start());

/** Let running work finish, at most `timeoutMs`, then close. */
export async function stopBoss(timeoutMs: number): Promise<void> {
  const started = kept.sealwireBoss;
  kept.sealwireBoss = undefined;
  if (started) await (await started).stop({ graceful: true, wait: true, timeout: timeoutMs });
}
