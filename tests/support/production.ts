import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdtempSync, rmSync } from "node:fs";
import { createServer, type AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { TestProject } from "vitest/node";

declare module "vitest" {
  export interface ProvidedContext {
    /** Where the production build answers, `http://127.0.0.1:PORT`. */
    origin: string;
  }
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, "close");
  return port;
}

/**
 * Starts the production build the way a person does, `scripts/start.mjs`, on its own database, seeded with the
 * demo, and stops all of it afterwards. SEALWIRE_ORIGIN names a server that runs already and is left alone.
 */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (process.env.SEALWIRE_ORIGIN) {
    project.provide("origin", process.env.SEALWIRE_ORIGIN);
    return async () => undefined;
  }
  const home = mkdtempSync(join(tmpdir(), "sealwire-browser-"));
  const port = await freePort();
  const { DATABASE_URL: _given, DATABASE_OWNER_URL: _owner, ...inherited } = process.env;
  const started = spawn(process.execPath, ["scripts/start.mjs"], {
    env: { ...inherited, NODE_ENV: "production", SEALWIRE_HOME: home, PORT: String(port) },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let said = "";
  const ready = new Promise<void>((resolve, reject) => {
    const listen = (chunk: Buffer) => {
      said += chunk.toString();
      if (said.includes("Sealwire is ready")) resolve();
    };
    started.stdout.on("data", listen);
    started.stderr.on("data", listen);
    started.on("exit", (code) =>
      reject(new Error(`scripts/start.mjs ended with ${code} before it was ready:\n${said}`)),
    );
  });
  await ready;
  project.provide("origin", `http://127.0.0.1:${port}`);
  return async () => {
    started.kill("SIGTERM");
    if (started.exitCode === null) await once(started, "exit");
    rmSync(home, { recursive: true, force: true });
  };
}
