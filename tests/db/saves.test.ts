import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, colleague, connected, exampleRecord, openJob, soleTrader, value } from "./fixture";
import { createJob, getJob, saveJob } from "@/db/queries/jobs";
import type { Change } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

const save = (who: Viewer, jobId: string, baseVersion: number, changes: Change[], saveId: string = randomUUID()) =>
  saveJob(who, { jobId, saveId, baseVersion, changes });

const rating = (was: unknown, to: unknown): Change => ({ path: "supply.cutOutRatingA", was, value: to });

describe("saving a job", () => {
  it("stores the fact, counts the version up and answers with what is missing now", async () => {
    const jobId = await openJob(viewer);
    const reply = value(await save(viewer, jobId, 1, [{ path: "customer.phone", was: "07700 900417", value: null }]));
    expect(reply).toMatchObject({ saved: true, version: 2 });
    const missing = reply.saved ? reply.assessment.missing.map(({ path }) => path) : [];
    expect(missing).toContain("customer.phone");
    expect(value(await getJob(viewer, { jobId })).record.customer.phone).toBeNull();
  });

  it("keeps both people's work when they changed different facts", async () => {
    const jobId = await openJob(viewer);
    const other = await colleague(viewer, ["installer"]);
    value(await save(other, jobId, 1, [rating(100, 80)]));
    const late = value(await save(viewer, jobId, 1, [{ path: "notes", was: "", value: "Gate code with the owner" }]));
    expect(late).toMatchObject({ saved: true, version: 3 });
    const { record } = value(await getJob(viewer, { jobId }));
    expect([record.supply.cutOutRatingA, record.notes]).toEqual([80, "Gate code with the owner"]);
  });

  it("saves nothing of a conflict and shows both values and whose the other is", async () => {
    const jobId = await openJob(viewer);
    const other = await colleague(viewer, ["installer"]);
    value(await save(other, jobId, 1, [rating(100, 80)]));
    const changes = [rating(100, 60), { path: "notes", was: "", value: "kept back" }];
    expect(value(await save(viewer, jobId, 1, changes))).toEqual({
      saved: false,
      reason: "conflict",
      version: 2,
      conflicts: [{ path: "supply.cutOutRatingA", was: 100, yours: 60, theirs: 80 }],
      changedBy: other.name,
    });
    expect(value(await getJob(viewer, { jobId })).record.notes).toBeNull();
  });

  it("treats a place in a list as a conflict when the list was changed meanwhile", async () => {
    const jobId = await openJob(viewer);
    const { record } = value(await getJob(viewer, { jobId }));
    const [main] = record.circuits;
    const two = [{ ...main, id: "garage" }, main];
    value(await save(viewer, jobId, 1, [{ path: "circuits", was: record.circuits, value: two }]));
    const stale = await save(viewer, jobId, 1, [{ path: "circuits[0].cable.lengthM", was: 18, value: 30 }]);
    expect(value(stale)).toMatchObject({ saved: false, reason: "conflict" });
  });

  it.each([
    ["a number out of its range", rating(100, 9000), "supply.cutOutRatingA"],
    ["a word that is none of the list", { path: "supply.looped", was: "no", value: "perhaps" }, "supply.looped"],
    ["a fact the record does not have", { path: "supply.colour", was: null, value: "red" }, "supply.colour"],
  ])("refuses %s, by its field, and stores nothing", async (_what, change, path) => {
    const jobId = await openJob(viewer);
    const refused = await save(viewer, jobId, 1, [change, { path: "notes", was: "", value: "not kept" }]);
    expect(refused).toMatchObject({ ok: false, error: { code: "invalid", fields: [{ path }] } });
    expect(value(await getJob(viewer, { jobId }))).toMatchObject({ version: 1, record: { notes: null } });
  });

  it("stores a record that contradicts itself and says how, for a draft may", async () => {
    const jobId = await openJob(viewer);
    const reply = value(await save(viewer, jobId, 1, [{ path: "dates.installed", was: "2026-11-20", value: null }]));
    expect(reply).toMatchObject({ saved: true, assessment: { route: null, fields: [{ path: "dates.installed" }] } });
  });
});

/** The behaviour asked of Idempotency-Key: the IETF httpapi draft "The Idempotency-Key HTTP Header Field". */
describe("a save sent again", () => {
  it("gets the first answer and writes nothing", async () => {
    const jobId = await openJob(viewer);
    const saveId = randomUUID();
    const first = value(await save(viewer, jobId, 1, [rating(100, 80)], saveId));
    value(await save(viewer, jobId, 2, [rating(80, 60)]));
    expect(value(await save(viewer, jobId, 1, [rating(100, 80)], saveId))).toEqual(first);
    expect(value(await getJob(viewer, { jobId }))).toMatchObject({
      version: 3,
      record: { supply: { cutOutRatingA: 60 } },
    });
  });

  it("is refused when it says something else under the same key", async () => {
    const jobId = await openJob(viewer);
    const saveId = randomUUID();
    value(await save(viewer, jobId, 1, [rating(100, 80)], saveId));
    expect(codeOf(await save(viewer, jobId, 1, [rating(100, 60)], saveId))).toBe("key-reused");
  });

  it("may use its key again after it was refused", async () => {
    const jobId = await openJob(viewer);
    const saveId = randomUUID();
    expect(codeOf(await save(viewer, jobId, 1, [rating(100, -1)], saveId))).toBe("invalid");
    expect(value(await save(viewer, jobId, 1, [rating(100, 80)], saveId))).toMatchObject({ saved: true });
  });

  it("sent ten times at once is stored once", async () => {
    const jobId = await openJob(viewer);
    const saveId = randomUUID();
    const replies = await Promise.all(
      Array.from({ length: 10 }, () => save(viewer, jobId, 1, [rating(100, 80)], saveId)),
    );
    const [first, ...others] = replies.map(value);
    for (const other of others) expect(other).toEqual(first);
    expect(value(await getJob(viewer, { jobId })).version).toBe(2);
  });
});

/** The bar of our own quality list: one winner of each racing pair, the loser is told and sees both values. */
it("gives each of 200 racing pairs one winner", async () => {
  const jobId = await openJob(viewer);
  let was: unknown = 100;
  for (let round = 0; round < 200; round += 1) {
    const base = round + 1;
    const [one, other] = [60 + (round % 40), 61 + (round % 40)].map((to) => (to === was ? to + 100 : to));
    const replies = await Promise.all([one, other].map((to) => save(viewer, jobId, base, [rating(was, to)])));
    const outcomes = replies.map((reply) => value(reply));
    const winner = outcomes.findIndex(({ saved }) => saved);
    const loser = outcomes[1 - winner];
    expect(outcomes.filter(({ saved }) => saved)).toHaveLength(1);
    const won = winner === 0 ? one : other;
    expect(loser).toMatchObject({ saved: false, conflicts: [{ theirs: won, yours: winner === 0 ? other : one }] });
    was = won;
  }
});

describe("opening a job", () => {
  it("takes the firm's next number, its facts and the competent person", async () => {
    const record = exampleRecord((draft) => {
      Object.assign(draft.competentPerson, { name: null, registration: null });
    });
    const [one, two] = [await openJob(viewer, record), await openJob(viewer, record)];
    const jobs = [value(await getJob(viewer, { jobId: one })), value(await getJob(viewer, { jobId: two }))];
    const numbers = jobs.map(({ number }) => Number(number.split("-")[1]));
    expect(numbers[1]).toBe((numbers[0] ?? 0) + 1);
    expect(jobs[0]?.record).toMatchObject({
      jobNumber: jobs[0]?.number,
      firm: { name: viewer.firmName },
      competentPerson: { name: viewer.name, registration: "REG-1" },
    });
  });

  it("opens one job when it is asked twice at once", async () => {
    const input = { id: randomUUID(), saveId: randomUUID(), record: { stage: "planned" } };
    const both = await Promise.all([createJob(viewer, input), createJob(viewer, input)]);
    expect(both.map(value)[0]).toEqual(both.map(value)[1]);
  });

  it("takes no number for a record that cannot be read", async () => {
    const before = await connected("admin", (client) =>
      client.query("select next_number from firms where id = $1", [viewer.firmId]),
    );
    const refused = await createJob(viewer, { id: randomUUID(), saveId: randomUUID(), record: { stage: "sometime" } });
    expect(refused).toMatchObject({ ok: false, error: { code: "invalid", fields: [{ path: "stage" }] } });
    const after = await connected("admin", (client) =>
      client.query("select next_number from firms where id = $1", [viewer.firmId]),
    );
    expect(after.rows).toEqual(before.rows);
  });

  it("names another job with the same supply number and serial", async () => {
    const record = exampleRecord((draft) => {
      for (const unit of draft.chargepoints) unit.serial = "KD7-000999";
    });
    const one = await openJob(viewer, record);
    const two = await openJob(viewer, record);
    expect(value(await getJob(viewer, { jobId: two })).duplicateOf).toMatchObject({ id: one });
  });

  it("is refused to somebody whose roles do not include it", async () => {
    const reviewer = await colleague(viewer, ["compliance"]);
    expect(
      codeOf(await createJob(reviewer, { id: randomUUID(), saveId: randomUUID(), record: { stage: "planned" } })),
    ).toBe("forbidden");
  });
});
