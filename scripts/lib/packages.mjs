import { createHash } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "./home.mjs";
import { run } from "./run.mjs";

/** Install the packages of the lock file when they are missing or the lock has changed since. */
export async function ensureModules() {
  const mark = join(root, "node_modules", ".sealwire-lock");
  const lock = createHash("sha256")
    .update(readFileSync(join(root, "package-lock.json")))
    .digest("hex");
  const installed = existsSync(join(root, "node_modules", ".package-lock.json"));
  if (installed && existsSync(mark) && readFileSync(mark, "utf8") === lock) return;
  if (installed && !existsSync(mark) && (await matchesLock())) return void writeFileSync(mark, lock);
  console.log("Installing packages (npm ci), about half a minute");
  const done = await run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund"]);
  // npm says what is wrong first and its manual afterwards.
  if (done.code !== 0) throw new Error(`npm ci failed:\n${done.out.split("\n").slice(0, 12).join("\n")}`);
  writeFileSync(mark, lock);
}

/** True when what `npm install` or `npm ci` left behind is what the lock file names. */
async function matchesLock() {
  const packagesIn = (file) => JSON.parse(readFileSync(join(root, file), "utf8")).packages ?? {};
  const wanted = packagesIn("package-lock.json");
  const present = packagesIn("node_modules/.package-lock.json");
  return Object.entries(wanted).every(
    ([path, { version, optional }]) => path === "" || optional || present[path]?.version === version,
  );
}
