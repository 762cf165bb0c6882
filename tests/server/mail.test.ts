import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { eq } from "drizzle-orm";
import { afterEach, describe, expect, it, vi } from "vitest";
import { makeFirm } from "../support/people";
import { fakeSmtp, type SmtpMode } from "../support/smtp";
import { asFirmId } from "@/db/tenant";
import { outbox } from "@/db/schema";
import { caughtMail, caughtMails, startCatcher } from "@/lib/server/mail/catcher";
import { post } from "@/lib/server/mail/post";
import { giveUpMail, relayMail } from "@/lib/server/mail/relay";
import { handOver, type Mail } from "@/lib/server/mail/transport";
import * as address from "@/lib/server/mail/smtp-address";
import { storage } from "@/lib/server/storage/storage";

const mail: Mail = {
  messageId: "<5f0c@sealwire.example.com>",
  from: "Sealwire <sealwire@example.com>",
  to: "notices@operator.example.com",
  replyTo: "nia@fenwold.example.com",
  subject: "Notice FEN-0147, 4 Ropewalk Lane: Ω ≤ 200",
  body: "Dear colleague,\n\nThe notice is attached.",
  attachments: [],
};

const withServer = async <T>(mode: SmtpMode, act: (server: Awaited<ReturnType<typeof fakeSmtp>>) => Promise<T>) => {
  const server = await fakeSmtp(mode);
  try {
    return await act(server);
  } finally {
    await server.close();
  }
};

describe("handing a mail over (RFC 5321 sections 4.2, 4.5.3.2)", () => {
  it.each<[SmtpMode, string]>([
    ["takes", "sent"],
    ["refuses", "refused"],
    ["busy", "later"],
    ["silent", "later"],
    ["rubbish", "later"],
    ["cut", "ambiguous"],
    ["hangs-after-data", "ambiguous"],
  ])("a server that %s: %s", async (mode, outcome) => {
    await withServer(mode, async (server) => {
      expect((await handOver(server.url, mail, 300)).outcome).toBe(outcome);
    });
  });

  it("no server at all: later", async () => {
    const server = await fakeSmtp("takes");
    await server.close();
    expect((await handOver(server.url, mail, 300)).outcome).toBe("later");
  });

  it("sends the Message-ID that it is given", async () => {
    await withServer("takes", async (server) => {
      await handOver(server.url, mail);
      expect(server.mails[0]).toContain("Message-ID: <5f0c@sealwire.example.com>");
    });
  });
});

describe("outbox relay", () => {
  afterEach(() => vi.restoreAllMocks());

  const make = async (attachments: { fileName: string; storageKey: string; contentType: string }[] = []) => {
    const firmId = await makeFirm();
    const { outboxId, messageId } = await asFirmId(firmId, (tx) =>
      post(tx, { firmId, kind: "submission", to: mail.to, subject: mail.subject, body: mail.body, attachments }),
    );
    const row = async () =>
      (await asFirmId(firmId, (tx) => tx.select().from(outbox).where(eq(outbox.id, outboxId))))[0];
    return { key: { firmId, outboxId }, messageId, row };
  };
  const toServer = (url: string) => vi.spyOn(address, "smtpAddress").mockResolvedValue(url);

  it("sends once, and a second run of the same work sends nothing", async () => {
    await withServer("takes", async (server) => {
      toServer(server.url);
      const { key, row } = await make();
      await relayMail(key);
      await relayMail(key);
      expect(server.mails).toHaveLength(1);
      expect(await row()).toMatchObject({ status: "sent", attempts: 1, lastError: null });
    });
  });

  it("keeps an ambiguous send marked so, tries again under the same Message-ID, and settles when it is taken", async () => {
    const { key, row, messageId } = await make();
    const first = await withServer("cut", async (server) => {
      toServer(server.url);
      await expect(relayMail(key)).rejects.toThrow();
      return server.mails[0] ?? "";
    });
    expect(await row()).toMatchObject({ status: "ambiguous", attempts: 1 });
    await withServer("busy", async (server) => {
      toServer(server.url);
      await expect(relayMail(key)).rejects.toThrow();
    });
    expect(await row()).toMatchObject({ status: "ambiguous", attempts: 2 });
    await giveUpMail(key);
    expect((await row())?.status).toBe("ambiguous");
    await withServer("takes", async (server) => {
      toServer(server.url);
      await relayMail(key);
      for (const sent of [first, server.mails[0]]) expect(sent).toContain(`Message-ID: ${messageId}`);
    });
    expect(await row()).toMatchObject({ status: "sent", attempts: 3 });
  });

  it("does not try a refused mail again, and marks one that never went as failed when the queue gives up", async () => {
    const refused = await make();
    await withServer("refuses", async (server) => {
      toServer(server.url);
      await relayMail(refused.key);
    });
    expect(await refused.row()).toMatchObject({
      status: "failed",
      lastError: expect.stringContaining("no such mailbox"),
    });
    const busy = await make();
    await withServer("busy", async (server) => {
      toServer(server.url);
      await expect(relayMail(busy.key)).rejects.toThrow("try later");
    });
    expect((await busy.row())?.status).toBe("waiting");
    await giveUpMail(busy.key);
    expect((await busy.row())?.status).toBe("failed");
  });

  it("a process killed between hand-over and answer leaves an ambiguous row", async () => {
    const { key, row } = await make();
    let during: string | undefined;
    vi.spyOn(address, "smtpAddress").mockImplementation(async () => {
      during = (await row())?.status;
      throw new Error("stop here");
    });
    await expect(relayMail(key)).rejects.toThrow("stop here");
    expect(during).toBe("ambiguous");
  });

  it("sends the pack out of storage, and waits when it is not there", async () => {
    const bytes = new Uint8Array([0x50, 0x4b, 3, 4, 9]);
    await storage().put("packs/test.zip", bytes);
    const folder = mkdtempSync(join(tmpdir(), "sealwire-mail-"));
    const catcher = await startCatcher(folder);
    toServer(catcher.url);
    const here = await make([
      { fileName: "FEN-0147-v1.zip", storageKey: "packs/test.zip", contentType: "application/zip" },
    ]);
    await relayMail(here.key);
    const gone = await make([{ fileName: "x.zip", storageKey: "packs/gone.zip", contentType: "application/zip" }]);
    await expect(relayMail(gone.key)).rejects.toThrow("not in storage");
    const [caught, ...more] = await caughtMails(folder);
    expect(more).toEqual([]);
    expect(caught).toMatchObject({
      to: mail.to,
      subject: mail.subject,
      attachments: [{ fileName: "FEN-0147-v1.zip", bytes: 5 }],
    });
    expect(caught?.text).toContain("The notice is attached.");
    expect(await caughtMail(folder, caught?.id ?? "")).toEqual(caught);
    expect(await caughtMail(folder, "../../etc/passwd")).toBeNull();
    await catcher.stop();
    rmSync(folder, { recursive: true });
  });
});
