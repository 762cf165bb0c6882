/**
 * One command from a fresh clone to a running Sealwire: `npm start`.
 *   PORT            where to serve, 3000 by default
 *   HOST            127.0.0.1 by default
 *   DATABASE_URL    use this database; DATABASE_OWNER_URL beside it for the role that migrates
 * Ctrl-C stops everything that this started.
 */
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { join } from "node:path";
import { startCluster, stopCluster } from "./lib/cluster.mjs";
import { home, root } from "./lib/home.mjs";
import { ensureModules } from "./lib/packages.mjs";
import { endChildren, must } from "./lib/run.mjs";
import { healthy, serve } from "./lib/serve.mjs";
import { sourcesHash } from "./lib/sources-hash.mjs";

const port = Number(process.env.PORT ?? 3000);
const host = process.env.HOST ?? "127.0.0.1";
const origin = process.env.PUBLIC_ORIGIN ?? `http://${host}:${port}`;
const node = process.execPath;
const tsx = join(root, "node_modules/tsx/dist/cli.mjs");
const next = join(root, "node_modules/next/dist/bin/next");

/** What has been started, the last first to be stopped. */
const running = [];
let stopping = false;
const ending = new AbortController();

async function stopAll() {
  if (stopping) return;
  stopping = true;
  ending.abort();
  endChildren();
  for (const one of running.reverse()) await one.stop();
}

function onSignal() {
  if (!stopping) console.log("\nStopping…");
  stopAll().then(
    () => process.exit(process.exitCode ?? 0),
    (error) => {
      console.error(error);
      process.exit(1);
    },
  );
}
process.on("SIGINT", onSignal);
process.on("SIGTERM", onSignal);

const portIsFree = () =>
  new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", () => resolve(false));
    probe.listen(port, host, () => probe.close(() => resolve(true)));
  });

/** The database to use; `marks` is the folder that goes when our own one goes, null for one that was given. */
async function database() {
  if (process.env.DATABASE_URL) {
    const url = process.env.DATABASE_URL;
    return { url, ownerUrl: process.env.DATABASE_OWNER_URL ?? url, marks: null };
  }
  const cluster = await startCluster({ name: "dev" });
  // One that ran before us is somebody else's to stop.
  if (cluster.started) running.push({ stop: () => stopCluster({ name: "dev" }) });
  return { ...cluster, marks: join(home(), "dev") };
}

/** Run a step unless it was done before with the same sources. `folder` null: always, the step itself knows. */
async function unlessDone(folder, name, hash, step) {
  const mark = folder && join(folder, `done-${name}`);
  if (mark && existsSync(mark) && readFileSync(mark, "utf8") === hash) return;
  await step();
  if (mark) writeFileSync(mark, hash);
}

async function build(env) {
  const folder = existsSync(join(root, ".next", "BUILD_ID")) ? join(root, ".next") : null;
  const hash = sourcesHash();
  await unlessDone(folder, "build", hash, async () => {
    console.log("Building, about half a minute");
    await must(node, [next, "build"], { env, show: Boolean(process.env.VERBOSE) });
    writeFileSync(join(root, ".next", "done-build"), hash);
  });
}

const signIns = [
  ["nia@fenwold.example.com", "admin"],
  ["tam@fenwold.example.com", "installer"],
  ["edda@fenwold.example.com", "compliance lead"],
  ["sole@fenwold.example.com", "all three roles"],
  ["pim@larkmoor.example.com", "all three roles in a second firm, which sees nothing of the first"],
];

try {
  await ensureModules();
  if (!(await portIsFree())) throw new Error(`Port ${port} is taken. Choose another: PORT=3001 npm start`);
  mkdirSync(home(), { recursive: true, mode: 0o755 });
  const demo = process.env.SEALWIRE_DEMO ?? (process.env.SMTP_URL ? "off" : "on");
  const { url, ownerUrl, marks } = await database();
  const env = {
    NODE_ENV: "production",
    NEXT_TELEMETRY_DISABLED: "1",
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true",
    DATABASE_URL: url,
    PUBLIC_ORIGIN: origin,
    SEALWIRE_DEMO: demo,
    SEALWIRE_HOME: home(),
    LOG_LEVEL: process.env.LOG_LEVEL ?? "warn",
  };
  await unlessDone(marks, "migrate", sourcesHash(["db/migrations", "db/migrate.ts"]), () =>
    must(node, [tsx, "scripts/migrate.ts"], { env: { ...env, DATABASE_OWNER_URL: ownerUrl } }),
  );
  await build(env);
  if (demo === "on") {
    await unlessDone(marks, "seed", "1", async () => {
      console.log("Filling the demo with jobs and sealed packs, once, about half a minute");
      await must(node, [tsx, "scripts/seed.ts"], { env, show: true });
    });
  }
  const served = serve(env, host, port);
  running.push(served);
  await healthy(served, `http://${host}:${port}/api/health`, ending.signal);

  console.log(`\nSealwire is ready at ${origin}\n`);
  if (demo === "on") {
    console.log("Demo sign-ins, all with the password copper-wire-seal-7:");
    for (const [email, role] of signIns) console.log(`  ${email.padEnd(28)} ${role}`);
    console.log(`\nMail goes nowhere; read it at ${origin}/demo/mail\n`);
  }
  console.log(`Next: open ${origin} and sign in. Ctrl-C here stops everything.`);
  const code = await served.ended;
  if (!stopping) {
    console.error(`Sealwire ended by itself (${code}).`);
    process.exitCode = 1;
  }
} catch (error) {
  if (!stopping) {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  }
}
if (!stopping) {
  await stopAll();
  process.exit(process.exitCode ?? 0);
}
