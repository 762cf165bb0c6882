import { readdirSync, readFileSync } from "node:fs";
import { assess } from "@/lib/notify/assess";
import { parseJob, type JobFacts } from "@/lib/notify/job";

const records = 10_000;
const day = "2026-12-01";
const folder = new URL("../tests/examples/", import.meta.url);

/** The worked records, each under job numbers of its own, as text: what a client would send. */
function texts(): string[] {
  const examples = readdirSync(folder)
    .filter((name) => name.startsWith("fen-"))
    .map((name) => JSON.parse(readFileSync(new URL(name, folder), "utf8")) as Record<string, unknown>);
  return Array.from({ length: records }, (_, index) =>
    JSON.stringify({ ...examples[index % examples.length], jobNumber: `BENCH-${index}` }),
  );
}

/** Milliseconds that `run` takes over all of `items`, the fastest of three rounds. */
function fastest<T>(items: readonly T[], run: (item: T) => unknown): number {
  const rounds = Array.from({ length: 3 }, () => {
    const start = performance.now();
    for (const item of items) run(item);
    return performance.now() - start;
  });
  return Math.min(...rounds);
}

const input = texts();
const jobs = input.map((text): JobFacts => {
  const parsed = parseJob(JSON.parse(text));
  if (!parsed.ok) throw new Error(parsed.fields.map(({ path, message }) => `${path}: ${message}`).join("\n"));
  return parsed.value;
});

const floorMs = fastest(input, (text) => JSON.parse(text));
const assessMs = fastest(jobs, (job) => assess(job, day));
const perRecordMs = assessMs / records;

const lines = [
  `assess, ${records} records: ${perRecordMs.toFixed(3)} ms each, ${(assessMs / floorMs).toFixed(1)} × a JSON parse of the same records`,
  `bar: under 5 ms each, warm: ${perRecordMs < 5 ? "kept" : "missed"}`,
];
process.stdout.write(`${lines.join("\n")}\n`);
process.exitCode = perRecordMs < 5 ? 0 : 1;
