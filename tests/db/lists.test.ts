import { Client } from "pg";
import { beforeAll, describe, expect, it } from "vitest";
import { connected, exampleRecord, openJob, soleTrader, value } from "./fixture";
import { listEvents } from "@/db/queries/events";
import { listJobs } from "@/db/queries/jobs";
import { listOperators } from "@/db/queries/operators";
import { listReviews } from "@/db/queries/reviews";
import { listSubmissions } from "@/db/queries/submissions";
import { listTeam } from "@/db/queries/team";
import type { JobFilter, JobRow } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

const jobCount = 63;
let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
  for (let index = 0; index < jobCount; index += 1)
    await openJob(
      viewer,
      exampleRecord((record) => {
        // Days repeat and some are missing, so that the cursor must break ties.
        const planned = index % 4 === 0;
        record.stage = planned ? "planned" : "installed";
        const day = `2026-11-${String(10 + (index % 5)).padStart(2, "0")}`;
        Object.assign(record.dates, { installed: planned ? null : day, commissioned: planned ? null : day });
        record.site.address = [`${index} Ropewalk Lane`, index % 2 ? "Oxcombe" : "Saltmere"];
        record.customer.name = index === 7 ? "50% Off_ Ltd" : "Ines Calloway";
      }),
    );
}, 120_000);

const filter: JobFilter = {
  q: null,
  stage: null,
  standing: null,
  operatorId: null,
  route: null,
  installerId: null,
  sort: "last-day",
  after: null,
};

async function everyPage(asked: JobFilter): Promise<JobRow[]> {
  const rows: JobRow[] = [];
  let after: string | null = null;
  do {
    const page: { rows: JobRow[]; next: string | null } = value(await listJobs(viewer, { ...asked, after }));
    rows.push(...page.rows);
    after = page.next;
  } while (after);
  return rows;
}

/** Statements that reach the database while `act` runs, the transaction's own included. */
async function statements(act: () => Promise<unknown>): Promise<string[]> {
  const seen: string[] = [];
  const query = Client.prototype.query;
  Client.prototype.query = function (this: Client, ...args: unknown[]) {
    const [first] = args;
    seen.push(typeof first === "string" ? first : ((first as { text?: string }).text ?? ""));
    return (query as (...all: unknown[]) => unknown).apply(this, args);
  } as typeof query;
  try {
    await act();
  } finally {
    Client.prototype.query = query;
  }
  return seen;
}

describe("pages of jobs", () => {
  it.each(["last-day", "updated", "number"] as const)("by %s hold every job once", async (sort) => {
    const rows = await everyPage({ ...filter, sort });
    expect(rows).toHaveLength(jobCount);
    expect(new Set(rows.map(({ id }) => id)).size).toBe(jobCount);
  });

  it("stand in their order over the page's edge", async () => {
    const days = (await everyPage(filter)).map(({ lastDay }) => lastDay ?? "9999");
    expect(days).toEqual(days.toSorted());
    const updated = (await everyPage({ ...filter, sort: "updated" })).map(({ updatedAt }) => updatedAt);
    expect(updated).toEqual(updated.toSorted().toReversed());
  });

  it("count the whole filter, not the page", async () => {
    const page = value(await listJobs(viewer, { ...filter, stage: "planned" }));
    expect(page.total).toBe(16);
    expect(page.rows.every(({ stage }) => stage === "planned")).toBe(true);
  });

  it("find words anywhere, and take % and _ as the letters they are", async () => {
    expect(await everyPage({ ...filter, q: "saltmere 2 ropewalk" })).not.toHaveLength(0);
    expect(await everyPage({ ...filter, q: "50% off_" })).toHaveLength(1);
    expect(await everyPage({ ...filter, q: "5_% x" })).toHaveLength(0);
    expect(await everyPage({ ...filter, q: "xa34ef" })).toHaveLength(jobCount);
  });

  it("start at the head for a cursor that is not ours", async () => {
    const head = value(await listJobs(viewer, filter)).rows.map(({ id }) => id);
    for (const after of ["x", "bm90IGpzb24", Buffer.from('["2026-13-45x","y"]').toString("base64url")])
      expect(value(await listJobs(viewer, { ...filter, after })).rows.map(({ id }) => id)).toEqual(head);
  });
});

/** Our own bar: at most six statements for a list, whatever the rows. */
describe("statements of a list", () => {
  const after = null;
  it.each([
    ["jobs", () => listJobs(viewer, filter)],
    ["submissions", () => listSubmissions(viewer, { tab: "all", q: null, operatorId: null, purpose: null, after })],
    ["reviews", () => listReviews(viewer, { state: "waiting", after })],
    ["events", () => listEvents(viewer, { after, jobId: null })],
    ["operators", () => listOperators(viewer)],
    ["team", () => listTeam(viewer)],
  ])("of %s are at most six", async (_name, list) => {
    const seen = await statements(list);
    expect(seen.length, seen.join("\n")).toBeGreaterThan(2);
    expect(seen.length, seen.join("\n")).toBeLessThanOrEqual(6);
  });
});

/** PostgreSQL 15 manual, 41.5: under row-level security only leakproof conditions reach an index; COALESCE is none. */
it.each([
  ["jobs", "(last_day_key, id) > ('2026-11-12'::date, gen_random_uuid())", "last_day_key, id"],
  ["jobs", "(updated_at, id) < ('2026-11-12T09:00:00Z'::timestamptz, gen_random_uuid())", "updated_at desc, id desc"],
  ["submissions", "(due_key, id) > ('2026-11-12'::date, gen_random_uuid())", "due_key, id"],
])("%s are sought by their cursor in the index, not read from the head", async (table, beyond, order) => {
  const plan = await connected("app", async (client) => {
    await client.query("set enable_seqscan = off; set enable_bitmapscan = off; set enable_sort = off");
    await client.query("select set_config('app.firm_id', $1, false)", [viewer.firmId]);
    const cursor = beyond.replace("gen_random_uuid()", `'${viewer.firmId}'::uuid`);
    const { rows } = await client.query<{ "QUERY PLAN": string }>(
      `explain select id from ${table} where firm_id = '${viewer.firmId}' and ${cursor} order by ${order} limit 26`,
    );
    return rows.map((row) => row["QUERY PLAN"]).join("\n");
  });
  expect(plan).toMatch(/Index Cond: .*ROW\(/);
});
