import { readFile, writeFile } from "node:fs/promises";
import { basename, join } from "node:path";
import { parseArgs } from "node:util";
import { assess } from "@/lib/notify/assess";
import { dayInLondon } from "@/lib/notify/calendar";
import { parseJob, type JobFacts } from "@/lib/notify/job";
import { instant } from "@/lib/notify/job/facts";
import { rasterise } from "@/lib/server/rasterise";
import { buildBundle } from "@/templates/bundle";
import type { Issue } from "@/templates/issue";

const usage =
  "usage: npm run --silent pack -- FILE.json --out FILE.zip --issued-at 2026-12-01T09:00:00Z [--photos DIR]";

/** Says what is wrong, one line each, and ends with the code for a record or a call that cannot be read. */
function refuse(lines: readonly string[]): never {
  process.stderr.write(`${lines.join("\n")}\n`);
  process.exit(2);
}

const reasonOf = (error: unknown) => (error instanceof Error ? error.message : String(error));

type Options = { file: string; out: string; issuedAt: string; photos: string | null };

function readOptions(): Options {
  const parsed = readArguments();
  const { out, "issued-at": issuedAt, photos } = parsed.values;
  const [file, ...others] = parsed.positionals;
  const wrong = [
    ...(file ? [] : ["FILE.json: name the job record"]),
    ...(others.length ? [`${others[0]}: only one record can be packed at a time`] : []),
    ...(out ? [] : ["--out: name the zip to write"]),
    ...(issuedAt ? [] : ["--issued-at: give the time of issue, for example 2026-12-01T09:00:00Z"]),
    ...(issuedAt && !instant.safeParse(issuedAt).success
      ? ["--issued-at: write the time as 2026-12-01T09:00:00Z"]
      : []),
  ];
  if (wrong.length || !file || !out || !issuedAt) refuse([...wrong, usage]);
  return { file, out, issuedAt, photos: photos ?? null };
}

function readArguments() {
  try {
    return parseArgs({
      allowPositionals: true,
      options: { out: { type: "string" }, "issued-at": { type: "string" }, photos: { type: "string" } },
    });
  } catch (error) {
    return refuse([reasonOf(error), usage]);
  }
}

async function readJob(file: string): Promise<JobFacts> {
  let input: unknown;
  try {
    input = JSON.parse(await readFile(file, "utf8"));
  } catch (error) {
    return refuse([`(file): ${file} could not be read as JSON: ${reasonOf(error)}`]);
  }
  const parsed = parseJob(input);
  if (!parsed.ok) refuse(parsed.fields.map(({ path, message }) => `${path}: ${message}`));
  for (const path of parsed.value ? parsed.unread : [])
    process.stderr.write(`${path}: is no field of the job record and was not read\n`);
  return parsed.value;
}

/** Every photo of the record, numbered in its order. */
const issueOf = (job: JobFacts, issuedAt: string): Issue => ({
  version: 1,
  issuedAt: new Date(issuedAt).toISOString(),
  sealedBy: job.competentPerson.name ?? job.firm.name ?? "not recorded",
  gapsReason: null,
  photos: job.evidence.map(({ file, subject, caption, takenAt }, index) => ({
    file,
    subject,
    caption,
    takenAt,
    number: index + 1,
  })),
  changes: [],
});

async function readPhoto(folder: string | null, file: string): Promise<Uint8Array | null> {
  if (folder === null) return null;
  try {
    return new Uint8Array(await readFile(join(folder, basename(file))));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === "ENOENT") return null;
    throw error;
  }
}

const { file, out, issuedAt, photos } = readOptions();
const job = await readJob(file);
const bundle = await buildBundle({
  job,
  assessment: assess(job, dayInLondon(new Date(issuedAt))),
  issue: issueOf(job, issuedAt),
  photoBytes: (name) => readPhoto(photos, name),
  rasterise,
});
await writeFile(out, bundle.zip);
for (const name of bundle.leftOut) process.stderr.write(`${name}: is named in the record and not in the pack\n`);
process.stdout.write(`${out} ${bundle.sha256}\n`);
