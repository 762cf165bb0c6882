import { expect, it } from "vitest";
import { connected, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { getPack } from "@/db/queries/packs";
import { listEvents, verifyChain } from "@/db/queries/events";

/** Our own bar: the audit trail is append-only, chained per firm, and the check names the first bad row. */
it("chains a firm's events and finds them intact", async () => {
  const viewer = await soleTrader();
  const jobId = await openJob(viewer);
  const packId = await sealAndBuild(viewer, jobId);
  const check = value(await verifyChain(viewer));
  expect(check).toMatchObject({ intact: true, firstBad: null });
  const listed = value(await listEvents(viewer, { after: null, jobId }));
  expect(listed.total).toBe(check.count);
  expect(listed.rows[0]?.sentence).toContain(value(await getPack(viewer, { packId })).sha256?.slice(0, 8));
  expect(listed.rows.at(-1)?.sentence).toMatch(/^Opened job/);
});

it("has no gap and no fork when many write at once", async () => {
  const viewer = await soleTrader();
  await Promise.all(Array.from({ length: 12 }, () => openJob(viewer)));
  expect(value(await verifyChain(viewer))).toMatchObject({ intact: true, count: 12 });
});

it.each([
  ["a changed word", `update events set payload = payload || '{"jobNumber":"X"}' where firm_id = $1 and seq = 2`, 2],
  ["a changed actor", `update events set actor_name = 'Nobody' where firm_id = $1 and seq = 3`, 3],
  ["a row taken out", `delete from events where firm_id = $1 and seq = 2`, 3],
  [
    "a row that was changed with its own hash",
    `update events e set actor_name = 'Nobody', hash = event_hash(previous_hash, row(e.firm_id, e.id, e.seq, e.at,
       e.actor_id, 'Nobody', e.type, e.job_id, e.payload, e.previous_hash, e.hash)::events)
     where firm_id = $1 and seq = 2`,
    3,
  ],
])("names the first bad row after %s", async (_what, tamper, number) => {
  const viewer = await soleTrader();
  for (let count = 0; count < 4; count += 1) await openJob(viewer);
  await connected("admin", async (client) => {
    await client.query("begin");
    await client.query("alter table events disable trigger events_append_only");
    await client.query(tamper, [viewer.firmId]);
    await client.query("alter table events enable trigger events_append_only");
    await client.query("commit");
  });
  expect(value(await verifyChain(viewer))).toMatchObject({ intact: false, firstBad: { number } });
});

it("cannot be changed even by the superuser while the trigger stands", async () => {
  const viewer = await soleTrader();
  await openJob(viewer);
  const change = connected("admin", (client) =>
    client.query("update events set actor_name = 'x' where firm_id = $1", [viewer.firmId]),
  );
  await expect(change).rejects.toMatchObject({ code: "42501" });
});
