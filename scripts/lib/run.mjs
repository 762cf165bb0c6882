import { spawn } from "node:child_process";
import { root } from "./home.mjs";

/** Programs that run now, so that a script told to end can end them first. */
const children = new Set();

/** End every program that `run` has started and that has not ended. */
export const endChildren = () => {
  for (const child of children) child.kill("SIGTERM");
};

/**
 * Run a program to its end.
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: Record<string, string | undefined>, show?: boolean, input?: string, cwd?: string, timeoutMs?: number }} [options]
 * @returns {Promise<{ code: number, out: string }>} code and everything it printed; never rejects on a non-zero code
 */
export function run(program, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd: options.cwd ?? root,
      env: { ...process.env, ...options.env },
      stdio: [options.input === undefined ? "ignore" : "pipe", "pipe", "pipe"],
      timeout: options.timeoutMs,
      killSignal: "SIGKILL",
    });
    children.add(child);
    let out = "";
    for (const stream of [child.stdout, child.stderr]) {
      stream.on("data", (chunk) => {
        out += chunk;
        if (options.show) process.stdout.write(chunk);
      });
    }
    child.on("error", reject);
    child.on("close", (code) => {
      children.delete(child);
      resolve({ code: code ?? 1, out });
    });
    if (options.input !== undefined) child.stdin?.end(options.input);
  });
}

/**
 * Run a program and throw with the end of what it printed when it fails.
 * @param {string} program
 * @param {string[]} args
 * @param {Parameters<typeof run>[2]} [options]
 */
export async function must(program, args, options = {}) {
  const done = await run(program, args, options);
  if (done.code === 0) return done.out;
  const tail = options.show ? "" : `\n${done.out.trim().split("\n").slice(-20).join("\n")}`;
  throw new Error(`${program} ${args.join(" ")} ended with ${done.code}${tail}`);
}
