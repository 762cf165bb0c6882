import { eq, sql } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { makeFirm, makeViewer, testPassword } from "../support/people";
import { db } from "@/db/client";
import { asFirmId } from "@/db/tenant";
import { invitations, members, outbox, passwordResets, sessions, signInAttempts } from "@/db/schema";
import { checkCredentials } from "@/lib/server/auth/credentials";
import { lookUpInvitation, takeInvitation } from "@/lib/server/auth/invitations";
import { startSession } from "@/lib/server/auth/lucia";
import { requestReset, resetIsOpen, resetPassword } from "@/lib/server/auth/password-resets";
import { newToken, tokenHash } from "@/lib/server/auth/tokens";
import { viewerOfToken } from "@/lib/server/auth/viewer-of-session";

const codeOf = (result: { ok: boolean; error?: { code: string } }) => (result.ok ? "ok" : result.error?.code);
const tokenIn = (body: string) => /\/reset\/([A-Za-z0-9_-]{43})/.exec(body)?.[1] ?? "";

describe("sessions", () => {
  it("keeps only the SHA-256 of the token (ASVS 5.0 7.2, stack W2)", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const token = await startSession(viewer.userId, "Chrome on Android");
    const rows = await db.select().from(sessions).where(eq(sessions.userId, viewer.userId));
    expect(rows.map((row) => row.id)).toEqual([tokenHash(token)]);
    expect(JSON.stringify(rows)).not.toContain(token);
    // Whoever reads the table cannot use what they read.
    expect(await viewerOfToken(tokenHash(token))).toBeNull();
    expect((await viewerOfToken(token))?.viewer.userId).toBe(viewer.userId);
  });

  it("takes a change of roles and a suspension at the next request", async () => {
    const firmId = await makeFirm();
    const viewer = await makeViewer(firmId, ["installer"]);
    const token = await startSession(viewer.userId, "");
    const change = (set: { roles?: ["admin"]; status?: "suspended" }) =>
      asFirmId(firmId, (tx) => tx.update(members).set(set).where(eq(members.userId, viewer.userId)));
    await change({ roles: ["admin"] });
    expect((await viewerOfToken(token))?.viewer.roles).toEqual(["admin"]);
    await change({ status: "suspended" });
    expect(await viewerOfToken(token)).toBeNull();
    expect(await db.select().from(sessions).where(eq(sessions.userId, viewer.userId))).toEqual([]);
  });

  it("refuses a session that has run out and deletes it", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const token = await startSession(viewer.userId, "");
    await db
      .update(sessions)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(eq(sessions.id, tokenHash(token)));
    expect(await viewerOfToken(token)).toBeNull();
    expect(await db.select().from(sessions).where(eq(sessions.userId, viewer.userId))).toEqual([]);
  });
});

describe("a session in use", () => {
  it("is extended once half its time is gone, and ends for good after 90 days", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const token = await startSession(viewer.userId, "");
    const day = 86_400_000;
    const mine = eq(sessions.id, tokenHash(token));
    await db
      .update(sessions)
      .set({ expiresAt: new Date(Date.now() + 2 * day) })
      .where(mine);
    expect(await viewerOfToken(token)).not.toBeNull();
    const [extended] = await db.select().from(sessions).where(mine);
    expect(extended?.expiresAt.getTime()).toBeGreaterThan(Date.now() + 13 * day);
    await db
      .update(sessions)
      .set({ createdAt: new Date(Date.now() - 91 * day).toISOString() })
      .where(mine);
    expect(await viewerOfToken(token)).toBeNull();
    expect(await db.select().from(sessions).where(mine)).toEqual([]);
  });
});

describe("throttle (quality bar: 10 guesses in 5 minutes for an account)", () => {
  it("refuses the eleventh guess, even with the right password, and says how long to wait", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const guesses = await Promise.all(
      Array.from({ length: 10 }, () => checkCredentials(viewer.email, "not-this-one-9")),
    );
    expect(new Set(guesses.map(codeOf))).toEqual(new Set(["wrong"]));
    const eleventh = await checkCredentials(viewer.email.toUpperCase(), testPassword);
    expect(codeOf(eleventh)).toBe("throttled");
    expect(!eleventh.ok && eleventh.error.message).toMatch(/Wait [1-5] minutes?/);
    await db.update(signInAttempts).set({ at: sql`now() - interval '6 minutes'` });
    expect(codeOf(await checkCredentials(viewer.email, testPassword))).toBe("ok");
  });

  it("counts guesses sent at once", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const codes = (
      await Promise.all(Array.from({ length: 14 }, () => checkCredentials(viewer.email, "x".repeat(12))))
    ).map(codeOf);
    expect(codes.filter((code) => code === "wrong")).toHaveLength(10);
    expect(codes.filter((code) => code === "throttled")).toHaveLength(4);
  });

  it("says the same for an unknown address, and throttles it the same", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const known = await checkCredentials(viewer.email, "not-this-one-9");
    const unknown = await checkCredentials("nobody-here@example.com", "not-this-one-9");
    expect(unknown).toEqual(known);
    for (let guess = 0; guess < 9; guess += 1) await checkCredentials("nobody-here@example.com", "not-this-one-9");
    expect(codeOf(await checkCredentials("nobody-here@example.com", "not-this-one-9"))).toBe("throttled");
  });

  it("takes as long for an unknown address as for a known one, within a half", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const timed = async (email: string) => {
      const times: number[] = [];
      for (let turn = 0; turn < 5; turn += 1) {
        const start = performance.now();
        await checkCredentials(email, "not-this-one-9");
        times.push(performance.now() - start);
      }
      return times.sort((a, b) => a - b)[2] ?? 0;
    };
    const ratio = (await timed("nobody-at-all@example.com")) / (await timed(viewer.email));
    expect(ratio).toBeGreaterThan(0.5);
    expect(ratio).toBeLessThan(2);
  });

  it("does not count tries that were right", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    for (let turn = 0; turn < 12; turn += 1)
      expect(codeOf(await checkCredentials(viewer.email, testPassword))).toBe("ok");
  });
});

describe("password reset", () => {
  it("sends a link that works once, ends every session, and is stored as a hash", async () => {
    const firmId = await makeFirm();
    const viewer = await makeViewer(firmId, ["installer"]);
    const session = await startSession(viewer.userId, "");
    expect(codeOf(await requestReset(` ${viewer.email.toUpperCase()} `))).toBe("ok");
    const [mail] = await asFirmId(firmId, (tx) => tx.select().from(outbox));
    const token = tokenIn(mail?.body ?? "");
    const [stored] = await db.select().from(passwordResets).where(eq(passwordResets.userId, viewer.userId));
    expect(stored?.tokenHash).toBe(tokenHash(token));
    expect(await resetIsOpen(token)).toBe(true);
    expect(codeOf(await resetPassword(token, "too short"))).toBe("invalid");
    const both = await Promise.all([
      resetPassword(token, "plum kettle orbit"),
      resetPassword(token, "plum kettle orbit"),
    ]);
    expect(both.map(codeOf).sort()).toEqual(["not-found", "ok"]);
    expect(await viewerOfToken(session)).toBeNull();
    expect(codeOf(await checkCredentials(viewer.email, "plum kettle orbit"))).toBe("ok");
    expect(await resetIsOpen(token)).toBe(false);
  });

  it("answers the same for an address nobody has, and takes as long", async () => {
    const start = performance.now();
    expect(await requestReset("stranger@example.com")).toEqual({ ok: true, value: { sent: true } });
    expect(performance.now() - start).toBeGreaterThanOrEqual(395);
  });

  it("refuses a link that has run out, and one that never was", async () => {
    const viewer = await makeViewer(await makeFirm(), ["installer"]);
    const token = newToken();
    const expiresAt = new Date(Date.now() - 1000).toISOString();
    await db
      .insert(passwordResets)
      .values({ id: crypto.randomUUID(), userId: viewer.userId, tokenHash: tokenHash(token), expiresAt });
    expect(codeOf(await resetPassword(token, "plum kettle orbit"))).toBe("not-found");
    expect(codeOf(await resetPassword("x", "plum kettle orbit"))).toBe("not-found");
  });
});

describe("invitations", () => {
  const invite = async (firmId: string, invitedBy: string, email: string, days = 7) => {
    const token = newToken();
    const expiresAt = new Date(Date.now() + days * 86_400_000).toISOString();
    await asFirmId(firmId, (tx) =>
      tx.insert(invitations).values({
        firmId,
        id: crypto.randomUUID(),
        email,
        roles: ["installer"],
        tokenHash: tokenHash(token),
        invitedBy,
        expiresAt,
      }),
    );
    return token;
  };

  it("makes the person and their place once, whoever else opens the link", async () => {
    const firmId = await makeFirm();
    const admin = await makeViewer(firmId, ["admin"]);
    const token = await invite(firmId, admin.userId, "new.hand@thrale.example.com");
    const shown = await lookUpInvitation(token);
    expect(shown.ok && shown.value).toMatchObject({
      firmName: "Thrale Wiring Ltd",
      roles: ["installer"],
      hasAccount: false,
    });
    expect(codeOf(await takeInvitation(token, { name: "Isla Renn", password: "password1234" }))).toBe("invalid");
    const both = await Promise.allSettled(
      [1, 2].map(() => takeInvitation(token, { name: "Isla Renn", password: "plum kettle orbit" })),
    );
    const codes = both.map((one) => (one.status === "fulfilled" ? codeOf(one.value) : "threw"));
    expect(codes.sort()).toEqual(["not-found", "ok"]);
    expect(codeOf(await lookUpInvitation(token))).toBe("not-found");
  });

  it("does not let an invitation take over an account: the account's own password is asked", async () => {
    const first = await makeFirm();
    const member = await makeViewer(first, ["installer"]);
    await asFirmId(first, (tx) =>
      tx.update(members).set({ status: "suspended" }).where(eq(members.userId, member.userId)),
    );
    const second = await makeFirm("Oxcombe Electric Ltd");
    const admin = await makeViewer(second, ["admin"]);
    const token = await invite(second, admin.userId, member.email);
    expect(codeOf(await takeInvitation(token, { name: "Someone Else", password: "plum kettle orbit" }))).toBe("wrong");
    expect(codeOf(await takeInvitation(token, { name: "Someone Else", password: testPassword }))).toBe("ok");
  });

  it("refuses somebody with a place in another firm, and a link that has run out", async () => {
    const member = await makeViewer(await makeFirm(), ["installer"]);
    const firmId = await makeFirm("Oxcombe Electric Ltd");
    const admin = await makeViewer(firmId, ["admin"]);
    const token = await invite(firmId, admin.userId, member.email);
    expect(codeOf(await takeInvitation(token, { name: "x", password: testPassword }))).toBe("elsewhere");
    const old = await invite(firmId, admin.userId, "late@thrale.example.com", -1);
    expect(codeOf(await takeInvitation(old, { name: "x", password: "plum kettle orbit" }))).toBe("not-found");
  });
});
