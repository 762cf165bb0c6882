/** The quick part of the tests, for while you work: `npm run check`. Needs no database and no browser. */
import { ensureModules } from "./lib/packages.mjs";
import { bin, check, conclude, vitest } from "./lib/steps.mjs";

await ensureModules();
const generated = await check("route types", [bin.next, "typegen"]);
// Two cores: the type check takes one, the linter the other.
const both = await Promise.all([
  check("types", [bin.tsc, "--noEmit"]),
  check("lint", [bin.eslint, ".", "--max-warnings", "0"]),
]);
const format = await check("format", [bin.prettier, "--check", "--log-level", "warn", "."]);
const tests = await vitest("unit and components", ["unit", "components"]);
conclude([generated, ...both, format, tests], "Next: npm test runs the rest (database, documents, browser).");
