import { readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { assess } from "@/lib/notify/assess";
import { dayInLondon } from "@/lib/notify/calendar";
import { parseJob } from "@/lib/notify/job";
import { isoDate } from "@/lib/notify/job/facts";

const usage = "usage: npm run --silent assess -- FILE.json [--as-at YYYY-MM-DD]";

/** One line a fault on standard error, then the exit code for a record or a call that cannot be assessed. */
function refuse(lines: readonly string[]): never {
  for (const line of lines) process.stderr.write(`${line}\n`);
  process.exit(2);
}

function argumentsGiven(): { file: string; asAt: string } {
  try {
    const { values, positionals } = parseArgs({ options: { "as-at": { type: "string" } }, allowPositionals: true });
    const [file, ...rest] = positionals;
    if (!file || rest.length) return refuse([usage]);
    const asAt = isoDate.safeParse(values["as-at"] ?? dayInLondon(new Date()));
    return asAt.success ? { file, asAt: asAt.data } : refuse([`--as-at: ${asAt.error.issues[0]?.message}`]);
  } catch (error) {
    if (error instanceof TypeError) return refuse([error.message, usage]);
    throw error;
  }
}

function readJson(file: string): unknown {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch (error) {
    if (error instanceof SyntaxError) return refuse([`${file}: is not JSON; ${error.message}`]);
    return refuse([`${file}: cannot be read; ${error instanceof Error ? error.message : String(error)}`]);
  }
}

const { file, asAt } = argumentsGiven();
const parsed = parseJob(readJson(file));
if (!parsed.ok) refuse(parsed.fields.map(({ path, message }) => `${path}: ${message}`));
for (const path of parsed.unread) process.stderr.write(`${path}: is not a field of the job record and was not read\n`);
process.stdout.write(`${JSON.stringify(assess(parsed.value, asAt), null, 2)}\n`);
