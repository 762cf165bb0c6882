import { spawn } from "node:child_process";
import { join } from "node:path";
import { expect, it } from "vitest";

const root = join(import.meta.dirname, "../..");

/** Start the process, send the signals once it is up, and say how it ended. */
function end(workMs: number, limitMs: number, signals: NodeJS.Signals[]) {
  const child = spawn(
    process.execPath,
    ["--import", "tsx", "tests/support/drain-child.ts", String(workMs), String(limitMs)],
    { cwd: root, env: { ...process.env, LOG_LEVEL: "silent" }, stdio: ["ignore", "pipe", "inherit"] },
  );
  let out = "";
  let signalled = 0;
  child.stdout.on("data", (chunk) => {
    out += chunk;
    if (!out.includes("up\n") || signalled) return;
    signalled = performance.now();
    signals.forEach((signal, turn) => setTimeout(() => child.kill(signal), turn * 100));
  });
  return new Promise<{ code: number | null; out: string; tookMs: number }>((resolve) =>
    child.on("exit", (code) => resolve({ code, out, tookMs: performance.now() - signalled })),
  );
}

it("finishes the work in hand before the process ends (quality bar: SIGTERM drains within 30 s)", async () => {
  const ended = await end(400, 5_000, ["SIGTERM"]);
  expect([ended.code, ended.out]).toEqual([143, "up\nwork done\n"]);
});

it("waits no longer than its limit", async () => {
  const ended = await end(20_000, 300, ["SIGTERM"]);
  expect([ended.code, ended.out]).toEqual([143, "up\n"]);
  expect(ended.tookMs).toBeLessThan(3_000);
});
