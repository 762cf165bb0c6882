import { setTimeout as wait } from "node:timers/promises";
import { drainOnSignal } from "@/lib/server/drain";

/** A process that ends at once on SIGTERM, as Next does when no request is open, with work in hand. */
const workMs = Number(process.argv[2]);
const limitMs = Number(process.argv[3]);

drainOnSignal(async () => {
  await wait(workMs);
  process.stdout.write("work done\n");
}, limitMs);
process.on("SIGTERM", () => process.exit(143));
setInterval(() => undefined, 1_000);
process.stdout.write("up\n");
