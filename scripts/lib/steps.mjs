import { spawn } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { root } from "./home.mjs";

const node = process.execPath;
export const bin = {
  next: join(root, "node_modules/next/dist/bin/next"),
  tsc: join(root, "node_modules/typescript/bin/tsc"),
  eslint: join(root, "node_modules/eslint/bin/eslint.js"),
  prettier: join(root, "node_modules/prettier/bin/prettier.cjs"),
  vitest: join(root, "node_modules/vitest/vitest.mjs"),
  tsx: join(root, "node_modules/tsx/dist/cli.mjs"),
};

/** @typedef {{ name: string, passed: number, failed: number }} Tally */

/** Run a Node program with its output on this terminal; the exit code, or 1 when it had to be stopped. */
export const show = (args, { env = {}, timeoutMs = 15 * 60_000 } = {}) =>
  new Promise((resolve, reject) => {
    const child = spawn(node, args, {
      cwd: root,
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", ...env },
      stdio: "inherit",
      timeout: timeoutMs,
      killSignal: "SIGKILL",
    });
    child.on("error", reject);
    child.on("close", (code) => resolve(code ?? 1));
  });

/**
 * A check that either holds or does not: counts as one.
 * @param {string} name
 * @param {string[]} args
 * @returns {Promise<Tally>}
 */
export async function check(name, args) {
  console.log(`\n== ${name}`);
  const code = await show(args);
  return { name, passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
}

/**
 * The vitest projects named, counted from its own report. A run that found no test, or broke outside a test,
 * is a failure.
 * @param {string} name
 * @param {string[]} projects
 * @returns {Promise<Tally>}
 */
export async function vitest(name, projects, extra = []) {
  console.log(`\n== ${name}`);
  const folder = mkdtempSync(join(tmpdir(), "sealwire-report-"));
  const report = join(folder, "report.json");
  try {
    const chosen = projects.flatMap((project) => ["--project", project]);
    const reporters = ["--reporter=dot", "--reporter=json", `--outputFile.json=${report}`];
    const code = await show([bin.vitest, "run", ...chosen, ...reporters, ...extra]);
    const seen = JSON.parse(readFileSync(report, "utf8"));
    const broken = code !== 0 && seen.numFailedTests === 0 ? 1 : 0;
    const none = seen.numPassedTests + seen.numFailedTests === 0 && !broken ? 1 : 0;
    return { name, passed: seen.numPassedTests, failed: seen.numFailedTests + broken + none };
  } catch (error) {
    console.error(`${name}: no report (${error instanceof Error ? error.message : error})`);
    return { name, passed: 0, failed: 1 };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/**
 * Print the sums, what to do next, and the line that machines read, as the very last.
 * @param {Tally[]} tallies
 * @param {string} whenRight
 */
export function conclude(tallies, whenRight) {
  const sum = (field) => tallies.reduce((total, tally) => total + tally[field], 0);
  console.log("");
  for (const { name, passed, failed } of tallies)
    console.log(`  ${name.padEnd(24)} ${passed} passed, ${failed} failed`);
  const [passed, failed] = [sum("passed"), sum("failed")];
  const wrong = tallies.filter((tally) => tally.failed > 0).map((tally) => tally.name);
  const right = wrong.length === 0 && passed > 0;
  console.log(
    `\n${right ? whenRight : `Next: put right ${wrong.join(", ") || "the run: it held no test"}; what failed is printed above.`}`,
  );
  console.log(`${passed} passed, ${failed} failed`);
  process.exitCode = right ? 0 : 1;
}
