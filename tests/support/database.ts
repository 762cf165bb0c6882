import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { destroyCluster, startCluster, sweepTestClusters } from "../../scripts/lib/cluster.mjs";

/**
 * A PostgreSQL cluster for this test run alone, migrated, with the settings of the program pointed at it.
 * Durability is off, speed matters here and nothing else does. Gone afterwards.
 */
export default async function setup(): Promise<() => Promise<void>> {
  await sweepTestClusters();
  const name = `test-${process.pid}`;
  const settings = ["-c fsync=off", "-c synchronous_commit=off", "-c full_page_writes=off", "-c max_connections=60"];
  const cluster = await startCluster({ name, settings });
  const files = mkdtempSync(join(tmpdir(), "sealwire-test-"));
  Object.assign(process.env, {
    DATABASE_URL: cluster.url,
    DATABASE_OWNER_URL: cluster.ownerUrl,
    DATABASE_ADMIN_URL: cluster.adminUrl.replace(/\/postgres$/, "/sealwire"),
    STORAGE_DIR: join(files, "files"),
    MAIL_DIR: join(files, "mail"),
    SEALWIRE_DEMO: "on",
    LOG_LEVEL: process.env["LOG_LEVEL"] ?? "silent",
  });
  const teardown = async () => {
    await destroyCluster({ name });
    rmSync(files, { recursive: true, force: true });
  };
  try {
    const { migrate } = await import("@/db/migrate");
    await migrate(cluster.ownerUrl);
  } catch (error) {
    await teardown();
    throw error;
  }
  return teardown;
}
