import { createHash } from "node:crypto";
import { readFileSync, readdirSync, statSync } from "node:fs";
import { join } from "node:path";
import { root } from "./home.mjs";

/** What a build is made of; tests and scripts are not in it. */
const ofTheBuild = [
  "app",
  "components",
  "db",
  "lib",
  "public",
  "templates",
  "instrumentation.ts",
  "next.config.ts",
  "package-lock.json",
  "postcss.config.mjs",
  "proxy.ts",
  "tsconfig.json",
];

/** The files at or under a path, in order; none when it is not there. */
function* filesUnder(path) {
  const found = statSync(join(root, path), { throwIfNoEntry: false });
  if (found?.isFile()) yield path;
  if (!found?.isDirectory()) return;
  for (const name of readdirSync(join(root, path)).sort()) yield* filesUnder(`${path}/${name}`);
}

/** SHA-256 over the names and bytes of everything at or under these paths; a build is made of the default. */
export function sourcesHash(paths = ofTheBuild) {
  const hash = createHash("sha256");
  for (const path of paths.flatMap((one) => [...filesUnder(one)])) {
    const bytes = readFileSync(join(root, path));
    hash.update(`${path}\0${bytes.length}\0`).update(bytes);
  }
  return hash.digest("hex");
}
