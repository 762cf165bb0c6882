import { existsSync, mkdirSync, readdirSync, writeFileSync } from "node:fs";
import { isRoot } from "./home.mjs";
import { must } from "./run.mjs";

/** Newest PostgreSQL server on this machine, or null. */
export function postgresBin() {
  const versions = "/usr/lib/postgresql";
  if (!existsSync(versions)) return null;
  const newest = readdirSync(versions)
    .filter((version) => existsSync(`${versions}/${version}/bin/initdb`))
    .sort((a, b) => Number(b) - Number(a))[0];
  return newest ? `${versions}/${newest}/bin` : null;
}

/** What the tests need beside Node: the Debian package, and how to see that it is there. */
const wanted = [
  { name: "postgresql", present: () => postgresBin() !== null },
  { name: "chromium", present: () => existsSync("/usr/bin/chromium") },
  { name: "libreoffice-writer-nogui", present: () => existsSync("/usr/bin/soffice") },
  { name: "poppler-utils", present: () => existsSync("/usr/bin/pdftoppm") },
  { name: "fonts-liberation", present: () => existsSync("/usr/share/fonts/truetype/liberation") },
];

/**
 * Install the named Debian packages that are missing. Needs root; an ordinary user gets the one command to run.
 * @param {string[]} names
 */
export async function ensurePackages(names) {
  const missing = wanted.filter((one) => names.includes(one.name) && !one.present()).map((one) => one.name);
  if (missing.length === 0) return;
  const command = `apt-get install -y --no-install-recommends ${missing.join(" ")}`;
  if (!isRoot || !existsSync("/usr/bin/apt-get")) {
    throw new Error(
      `Missing on this machine: ${missing.join(", ")}. Run this once, then try again:\n  sudo ${command}`,
    );
  }
  console.log(`Installing from Debian: ${missing.join(", ")}`);
  if (missing.includes("postgresql")) {
    // Otherwise the package makes and starts a cluster of its own on port 5432.
    mkdirSync("/etc/postgresql-common/createcluster.d", { recursive: true });
    writeFileSync("/etc/postgresql-common/createcluster.d/50-sealwire.conf", "create_main_cluster = false\n");
  }
  const env = { DEBIAN_FRONTEND: "noninteractive" };
  await must("apt-get", ["update", "-qq"], { env });
  await must("apt-get", command.split(" ").slice(1), { env });
}
