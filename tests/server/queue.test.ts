import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { afterAll, describe, expect, it } from "vitest";
import { makeFirm, makeViewer } from "../support/people";
import { db } from "@/db/client";
import { boss, stopBoss } from "@/lib/server/queue/boss";
import { deadLettersOf } from "@/lib/server/queue/dead-letters";
import { enqueue } from "@/lib/server/queue/enqueue";

afterAll(() => stopBoss(1_000));

const queued = async (packId: string): Promise<number> => {
  const { rows } = await db.execute<{ n: string }>(
    sql`select count(*) as n from pgboss.job where name = 'build-pack' and data ->> 'packId' = ${packId}`,
  );
  return Number(rows[0]?.n);
};

describe("work put down in a transaction", () => {
  it("is there once the transaction commits", async () => {
    const packId = randomUUID();
    await db.transaction(async (tx) => {
      await enqueue(tx, "build-pack", { firmId: randomUUID(), packId });
      expect(await queued(packId)).toBe(0); // another connection does not see it yet
    });
    expect(await queued(packId)).toBe(1);
  });

  it("never was when the transaction rolls back", async () => {
    const packId = randomUUID();
    const act = db.transaction(async (tx) => {
      await enqueue(tx, "build-pack", { firmId: randomUUID(), packId });
      throw new Error("the seal did not hold");
    });
    await expect(act).rejects.toThrow("did not hold");
    expect(await queued(packId)).toBe(0);
  });

  it("carries ids and nothing else", async () => {
    const act = db.transaction((tx) => enqueue(tx, "build-pack", { firmId: randomUUID(), packId: "not an id" }));
    await expect(act).rejects.toThrow();
  });
});

describe("work whose process was killed", () => {
  it("is tried again once its time is up, under the program's own role", async () => {
    const queue = await boss();
    const data = { firmId: randomUUID(), outboxId: randomUUID() };
    const id = await db.transaction((tx) => enqueue(tx, "relay-mail", data));
    await queue.fetch("relay-mail", { batchSize: 1_000 }); // taken, and never heard of again
    await db.execute(sql`update pgboss.job set started_on = now() - interval '1 hour' where id = ${id}`);
    await queue.maintain();
    const { rows } = await db.execute(sql`select state from pgboss.job where id = ${id}`);
    expect(rows).toEqual([{ state: "retry" }]);
  });
});

describe("work that failed for good", () => {
  it("is shown to those of its own firm who may read activity, and to nobody else", async () => {
    const [ours, theirs] = [await makeFirm(), await makeFirm()];
    const data = { firmId: ours, packId: randomUUID() };
    await (await boss()).send("build-pack-dead", data);
    const shown = await deadLettersOf(await makeViewer(ours, ["admin"]));
    expect(shown).toMatchObject([{ work: "build-pack", data }]);
    expect(shown[0]?.at).toMatch(/^\d{4}-\d\d-\d\dT[\d:.]+Z$/);
    expect(await deadLettersOf(await makeViewer(ours, ["installer"]))).toEqual([]);
    expect(await deadLettersOf(await makeViewer(theirs, ["admin"]))).toEqual([]);
  });
});

describe("the program's role", () => {
  it("may use the queues but not make one", async () => {
    await expect((await boss()).createQueue("another")).rejects.toThrow(/permission denied/);
  });

  it("is no superuser, passes no policy by, owns nothing", async () => {
    const { rows } = await db.execute(sql`
      select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb,
        (select count(*)::int from pg_class where relowner = pg_roles.oid) as owned
      from pg_roles where rolname = current_user`);
    expect(rows).toEqual([
      { rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false, owned: 0 },
    ]);
  });
});
