import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { randomUUID } from "node:crypto";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, colleague, connected, exampleRecord, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { addPhoto } from "@/db/queries/photos";
import { inviteMember } from "@/db/queries/team";
import { reviewOfJob } from "@/db/queries/reviews";
import { submissionsOfJob } from "@/db/queries/submissions";
import type { Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

/**
 * Every query is run as somebody of another firm with the ids of the first. The list of queries is read from the
 * modules themselves, so that a new one is tested the day it is written (OWASP ASVS 5.0, 8.2.2: no direct object
 * reference across tenants).
 */
const folder = join(import.meta.dirname, "../../db/queries");
const modules = readdirSync(folder).filter((name) => name.endsWith(".ts"));

/** What the worker and other queries call inside a firm they were given; no person's request reaches these. */
const inner: Record<string, string[]> = {
  "health.ts": ["databaseAnswers"],
  "mail-relay.ts": ["mailSent", "mailFailed"],
  "pack-build.ts": ["buildPack", "failPack"],
};

type Query = (viewer: Viewer, input: unknown) => Promise<Result<unknown>>;
type Found = { module: string; name: string };

/** Exported functions that reach the database, by their first parameter, as the source declares it. */
function declared(first: RegExp): Found[] {
  return modules.flatMap((module) => {
    const source = readFileSync(join(folder, module), "utf8");
    return [...source.matchAll(/^export async function (\w+)(?:<\w+>)?\(\s*([^)]*)/gm)]
      .filter(([, , parameters]) => first.test(parameters ?? ""))
      .map(([, name]) => ({ module, name: name ?? "" }));
  });
}

const queries = declared(/^viewer: Viewer/);

/** A person's own sessions are theirs whatever their roles. */
const needNoRole = ["listSessions", "endSession"];

let owner: Viewer;
let nobody: Viewer;
let stranger: Viewer;
let ids: Record<string, string>;
let secrets: string[];

beforeAll(async () => {
  owner = await soleTrader("Oxcombe Wiring Ltd");
  stranger = await soleTrader("Saltmere Wiring Ltd");
  nobody = await colleague(owner, []);
  const record = exampleRecord((draft) => {
    draft.site.address = ["77 Secret Lane", "Oxcombe"];
    draft.customer.name = "Secret Customer";
  });
  const jobId = await openJob(owner, record);
  const packId = await sealAndBuild(owner, jobId);
  const bytes = await sharp({ create: { width: 20, height: 20, channels: 3, background: "#446" } })
    .png()
    .toBuffer();
  const photo = { jobId, subject: "cut-out", of: null, caption: "Secret caption" } as const;
  const { id: photoId } = value(
    await addPhoto(owner, { ...photo, photoId: randomUUID(), bytes: new Uint8Array(bytes) }),
  );
  const submissionId = value(await submissionsOfJob(owner, { jobId }))[0]?.id ?? "";
  const reviewId = value(await reviewOfJob(owner, { jobId }))?.id ?? "";
  const { id } = value(await inviteMember(owner, { email: "secret@thrale.example.com", roles: ["admin"] }));
  ids = { jobId, packId, photoId, submissionId, reviewId, id, userId: owner.userId };
  secrets = [...Object.values(ids), "Secret", "Oxcombe Wiring", "secret@"];
}, 120_000);

/** One input with every name a query may read, all ids the first firm's. */
const everything = () => ({
  ...ids,
  operatorId: "17",
  saveId: randomUUID(),
  version: 1,
  baseVersion: 1,
  expectedVersion: 1,
  changes: [{ path: "notes", was: null, value: "written by a stranger" }],
  record: { stage: "planned" },
  declaration: { name: "Nobody", statement: "Nothing." },
  gapsReason: "Because.",
  channel: "post",
  sentOn: "2026-12-01",
  sentTo: null,
  to: "acknowledged",
  on: "2026-12-01",
  reference: "R-1",
  limitA: null,
  expires: null,
  note: null,
  spokeTo: null,
  kind: "note",
  text: "Nothing.",
  subject: "cut-out",
  body: "Nothing.",
  caption: null,
  of: null,
  inPack: true,
  bytes: new Uint8Array(),
  reason: "Because.",
  email: "new@thrale.example.com",
  roles: ["admin"],
  status: "suspended",
  state: "waiting",
  tab: "all",
  q: null,
  purpose: null,
  stage: null,
  standing: null,
  route: null,
  installerId: null,
  sort: "last-day",
  after: null,
  currentId: null,
  name: "Renamed Ltd",
  contactName: null,
  phone: null,
  address: [],
  registration: null,
  noticeEmail: null,
  applicationEmail: null,
  page: null,
  noticeDays: null,
  buriedSeparationM: null,
});

/** Every row of the first firm, as the superuser sees it. */
const rowsOfOwner = () =>
  connected("admin", async (client) => {
    const { rows: tables } = await client.query<{ name: string }>(
      `select table_name as name from information_schema.columns
       where table_schema = 'public' and column_name = 'firm_id' order by 1`,
    );
    const all: Record<string, unknown> = {};
    for (const { name } of tables)
      all[name] = (
        await client.query(`select t::text as row from ${name} t where firm_id = $1 order by 1`, [owner.firmId])
      ).rows;
    return all;
  });

describe("every query of the data layer", () => {
  it("is either a person's, tested below, or on the short list of inner ones", () => {
    const known = Object.entries(inner).flatMap(([module, names]) => names.map((name) => ({ module, name })));
    expect(declared(/^(?!viewer: Viewer|tx: Tx)/)).toEqual(known);
    expect(queries.length).toBeGreaterThan(30);
  });

  it.each(queries)("$module $name shows and changes nothing of another firm", async ({ module, name }) => {
    const before = await rowsOfOwner();
    const run = ((await import(join(folder, module))) as Record<string, Query>)[name];
    if (!run) throw new Error(`${name} is not exported`);
    // A job's own id is the client's to make; every other id is the first firm's.
    const input = { ...everything(), ...(/^(create|copy)Job$/.test(name) ? { id: randomUUID() } : {}) };
    const result = await run(stranger, input);
    const told = JSON.stringify(result.ok ? result.value : result.error);
    for (const secret of secrets) expect(told, name).not.toContain(secret);
    if (!result.ok)
      expect(["not-found", "invalid", "conflict", "key-reused", "unsupported"]).toContain(result.error.code);
    expect(await rowsOfOwner(), name).toEqual(before);
  });

  it.each(queries.filter(({ name }) => !needNoRole.includes(name)))(
    "$module $name is refused to a member of the firm who holds no role",
    async ({ module, name }) => {
      const run = ((await import(join(folder, module))) as Record<string, Query>)[name];
      expect(run && codeOf(await run(nobody, everything())), name).toBe("forbidden");
    },
  );
});
