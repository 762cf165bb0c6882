import { drainOnSignal } from "./drain";
import { env } from "./env";
import { startHousekeeping } from "./housekeeping";
import { log } from "./log";
import { smtpAddress, stopCatcher } from "./mail/smtp-address";
import { stopBoss } from "./queue/boss";

/** Ten seconds less than the thirty that a service manager commonly allows. */
const drainMs = 20_000;

const kept = globalThis as typeof globalThis & { sealwireBooted?: true };

/**
 * Start what a server process runs beside answering requests. Throws, with the names, when a setting is missing
 * or wrong. With SEALWIRE_WORKER=off it answers requests only, and another process works the queue.
 */
export async function boot(): Promise<void> {
  const settings = env();
  if (kept.sealwireBooted) return; // development reloads this file
  kept.sealwireBooted = true;
  const stopHousekeeping = startHousekeeping();
  drainOnSignal(async () => {
    stopHousekeeping();
    await stopBoss(drainMs);
    await stopCatcher();
  }, drainMs + 2_000);
  if (settings.SEALWIRE_WORKER === "off") return;
  if (settings.demo) await smtpAddress();
  // Loaded here, so that a process that only answers requests does not hold the document renderers.
  const { startWorker } = await import("./queue/worker");
  await startWorker();
  log.info({ origin: settings.PUBLIC_ORIGIN, demo: settings.demo, storage: settings.STORAGE_DRIVER }, "ready");
}
