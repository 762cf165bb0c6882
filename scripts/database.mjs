/**
 * The private database of this checkout.
 *   node scripts/database.mjs start [--name dev]    make it where missing, start it, print the address
 *   node scripts/database.mjs url [--name dev] [--owner]    print the address of the running one
 *   node scripts/database.mjs stop [--name dev]
 * With DATABASE_URL set there is nothing to start or stop, and `url` repeats it.
 */
import { findCluster, startCluster, stopCluster } from "./lib/cluster.mjs";

const [command, ...rest] = process.argv.slice(2);
const nameAt = rest.indexOf("--name");
const name = nameAt >= 0 ? rest[nameAt + 1] : "dev";
const owner = rest.includes("--owner");
const given = process.env.DATABASE_URL;

async function address() {
  if (given) return owner ? (process.env.DATABASE_OWNER_URL ?? given) : given;
  const cluster = command === "start" ? await startCluster({ name }) : await findCluster({ name });
  if (!cluster) throw new Error(`The database "${name}" is not running. Start it: node scripts/database.mjs start`);
  return owner ? cluster.ownerUrl : cluster.url;
}

try {
  if (command === "start" || command === "url") console.log(await address());
  else if (command === "stop") console.log((await stopCluster({ name })) ? "stopped" : "was not running");
  else throw new Error("Say start, stop or url");
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
