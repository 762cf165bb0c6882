/**
 * Every test: `npm test`. Installs what is missing (Debian packages as root, npm packages always), runs lint, types,
 * unit, component, database, document and browser tests, and ends with one line, `N passed, N failed`.
 */
import { ensurePackages } from "./lib/debian.mjs";
import { ensureModules } from "./lib/packages.mjs";
import { bin, check, conclude, vitest } from "./lib/steps.mjs";

async function all() {
  await ensurePackages(["postgresql", "chromium", "libreoffice-writer-nogui", "poppler-utils", "fonts-liberation"]);
  await ensureModules();
  const done = [
    await check("route types", [bin.next, "typegen"]),
    ...(await Promise.all([
      check("types", [bin.tsc, "--noEmit"]),
      check("lint", [bin.eslint, ".", "--max-warnings", "0"]),
    ])),
    await check("format", [bin.prettier, "--check", "--log-level", "warn", "."]),
    await vitest("unit and components", ["unit", "components"]),
    await vitest("database and server", ["database"]),
    await vitest("documents", ["documents"]),
    await vitest("browser", ["browser"]),
  ];
  return done;
}

try {
  conclude(await all(), "Next: npm start serves what was tested.");
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  conclude([{ name: "the test run itself", passed: 0, failed: 1 }], "");
}
