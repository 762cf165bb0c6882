import { randomUUID } from "node:crypto";
import { setTimeout as wait } from "node:timers/promises";
import { eq, sql } from "drizzle-orm";
import { afterAll, beforeAll, expect, it, vi } from "vitest";
import { makeFirm, makeViewer } from "../support/people";
import { fakeSmtp } from "../support/smtp";
import { db } from "@/db/client";
import { asFirmId } from "@/db/tenant";
import { outbox } from "@/db/schema";
import { post } from "@/lib/server/mail/post";
import * as address from "@/lib/server/mail/smtp-address";
import { stopBoss } from "@/lib/server/queue/boss";
import { deadLettersOf } from "@/lib/server/queue/dead-letters";
import { enqueue } from "@/lib/server/queue/enqueue";
import { startWorker } from "@/lib/server/queue/worker";

beforeAll(async () => {
  // Work that other tests put down is not this one's to do.
  await db.execute(sql`delete from pgboss.job where state in ('created', 'retry')`);
  await startWorker();
});
afterAll(() => stopBoss(5_000));

/** Wait until it is so, at most fifteen seconds. */
async function until<T>(look: () => Promise<T | null | undefined | false>): Promise<T> {
  for (let tries = 0; tries < 150; tries += 1) {
    const seen = await look();
    if (seen) return seen;
    await wait(100);
  }
  throw new Error("it never came about");
}

const sendVia = async (mode: "takes" | "busy", tries: number) => {
  const server = await fakeSmtp(mode);
  vi.spyOn(address, "smtpAddress").mockResolvedValue(server.url);
  const firmId = await makeFirm();
  const { outboxId } = await asFirmId(firmId, async (tx) => {
    const made = await post(tx, { firmId, kind: "invitation", to: "isla@example.com", subject: "Join", body: "Hello" });
    await tx.execute(
      sql`update pgboss.job set retry_limit = ${tries - 1} where data ->> 'outboxId' = ${made.outboxId}`,
    );
    return made;
  });
  const status = async () =>
    (await asFirmId(firmId, (tx) => tx.select().from(outbox).where(eq(outbox.id, outboxId))))[0]?.status;
  return { firmId, server, status };
};

it("relays what a committed act put in the outbox", async () => {
  const { server, status } = await sendVia("takes", 1);
  await until(async () => (await status()) === "sent");
  expect(server.mails).toHaveLength(1);
  await server.close();
});

it("marks a mail failed after its last try and shows it to the firm's admin as work that failed for good", async () => {
  const { firmId, server, status } = await sendVia("busy", 1);
  await until(async () => (await status()) === "failed");
  expect(await deadLettersOf(await makeViewer(firmId, ["admin"]))).toMatchObject([{ work: "relay-mail" }]);
  await server.close();
});

it("goes on with other work when a pack cannot be built", async () => {
  const firmId = await makeFirm();
  await db.transaction(async (tx) => {
    const id = await enqueue(tx, "build-pack", { firmId, packId: randomUUID() });
    await tx.execute(sql`update pgboss.job set retry_limit = 0 where id = ${id}`);
  });
  const admin = await makeViewer(firmId, ["admin"]);
  await until(async () => (await deadLettersOf(admin)).length === 1);
  const { server, status } = await sendVia("takes", 1);
  await until(async () => (await status()) === "sent");
  await server.close();
});
