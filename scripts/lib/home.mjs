import { createHash } from "node:crypto";
import { homedir } from "node:os";
import { basename, join } from "node:path";
import { fileURLToPath } from "node:url";

/** Root of the project. */
export const root = fileURLToPath(new URL("../../", import.meta.url)).replace(/\/$/, "");

export const isRoot = process.getuid?.() === 0;

/**
 * Where this checkout keeps its database, files and caught mail: outside the working tree, so that neither
 * the build nor a clean-up of the tree touches it. SEALWIRE_HOME overrides it.
 */
export function home() {
  if (process.env.SEALWIRE_HOME) return process.env.SEALWIRE_HOME;
  const base = isRoot ? "/var/lib/sealwire" : join(homedir(), ".local", "share", "sealwire");
  return join(base, `${basename(root)}-${createHash("sha256").update(root).digest("hex").slice(0, 8)}`);
}
