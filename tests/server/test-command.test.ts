import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { expect, it } from "vitest";

const root = join(import.meta.dirname, "../..");

/** How the test command ends for these counts. */
function conclude(tallies: { name: string; passed: number; failed: number }[]) {
  const code = `import { conclude } from "./scripts/lib/steps.mjs"; conclude(${JSON.stringify(tallies)}, "Next: serve.")`;
  const ended = spawnSync(process.execPath, ["--input-type=module", "-e", code], { cwd: root, encoding: "utf8" });
  return { code: ended.status, lines: ended.stdout.trim().split("\n") };
}

it.each([
  [
    [
      { name: "unit", passed: 3, failed: 0 },
      { name: "browser", passed: 2, failed: 0 },
    ],
    0,
    "5 passed, 0 failed",
  ],
  [
    [
      { name: "unit", passed: 3, failed: 0 },
      { name: "browser", passed: 0, failed: 1 },
    ],
    1,
    "3 passed, 1 failed",
  ],
  [[], 1, "0 passed, 0 failed"],
])("the test command ends with its sums and a code that says the same", (tallies, code, last) => {
  const ended = conclude(tallies);
  expect([ended.code, ended.lines.at(-1)]).toEqual([code, last]);
  expect(ended.lines.at(-2)).toMatch(/^Next: /);
});
