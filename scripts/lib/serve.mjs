import { spawn } from "node:child_process";
import { join } from "node:path";
import { setTimeout as wait } from "node:timers/promises";
import { root } from "./home.mjs";

/** A server is given as long as a service manager commonly gives. */
const drainMs = 30_000;

/**
 * Start the built program. `ended` tells its exit code; `stop` lets it finish what it has in hand.
 * @param {Record<string, string>} env
 * @param {string} host
 * @param {number} port
 */
export function serve(env, host, port) {
  const next = join(root, "node_modules/next/dist/bin/next");
  const child = spawn(process.execPath, [next, "start", "-H", host, "-p", String(port)], {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ["ignore", "pipe", "inherit"],
    // Its own group: Ctrl-C reaches the script alone, which then stops things in order.
    detached: true,
  });
  child.stdout.on("data", (chunk) => process.env.VERBOSE && process.stdout.write(chunk));
  const ended = new Promise((resolve) => child.on("exit", (code) => resolve(code)));
  const stop = async () => {
    child.kill("SIGTERM");
    const late = await Promise.race([ended.then(() => false), wait(drainMs, true, { ref: false })]);
    if (late) child.kill("SIGKILL");
  };
  return { ended, stop };
}

/**
 * Wait until the server answers that it is well, for at most half a minute. Throws when it ends or never does.
 * @param {{ ended: Promise<unknown> }} served
 * @param {string} address
 * @param {AbortSignal} signal
 */
export async function healthy(served, address, signal) {
  let gone = false;
  served.ended.then(() => (gone = true));
  for (let tries = 0; tries < 300; tries += 1) {
    if (gone) throw new Error("Sealwire ended before it was ready; the lines above say why");
    const answer = await fetch(address, { signal: AbortSignal.timeout(5_000) }).catch(
      () => null, // not listening yet
    );
    if (answer?.ok) return;
    await wait(100, undefined, { signal });
  }
  throw new Error(`Sealwire did not become healthy: ${address}`);
}
