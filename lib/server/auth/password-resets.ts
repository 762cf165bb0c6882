import { randomUUID } from "node:crypto";
import { setTimeout as wait } from "node:timers/promises";
import { and, eq, gt, isNull, ne, sql } from "drizzle-orm";
import { accountByEmail, type Account } from "./credentials";
import { acceptablePassword, hashPassword } from "./passwords";
import { accountOf, countTry, resetRequests } from "./throttle";
import { looksLikeToken, newToken, tokenHash } from "./tokens";
import { env } from "../env";
import { resetLetter } from "../mail/letters";
import { post } from "../mail/post";
import { db } from "@/db/client";
import { recordEvent } from "@/db/record-event";
import { asUser, enterFirm } from "@/db/tenant";
import { members, passwordResets, sessions, users } from "@/db/schema";
import { failed, ok, type Result } from "@/lib/notify/result";

const minutes = 30;
const gone = failed("not-found", "This link has been used or has run out. Ask for another.");

async function writeReset(account: Account): Promise<void> {
  const token = newToken();
  const link = `${env().PUBLIC_ORIGIN}/reset/${token}`;
  await asUser(account.id, async (tx) => {
    const [place] = await tx
      .select({ firmId: members.firmId })
      .from(members)
      .where(and(eq(members.userId, account.id), eq(members.status, "active")))
      .limit(1);
    if (!place) return;
    await tx.insert(passwordResets).values({
      id: randomUUID(),
      userId: account.id,
      tokenHash: tokenHash(token),
      expiresAt: new Date(Date.now() + minutes * 60_000).toISOString(),
    });
    await enterFirm(tx, place.firmId);
    const letter = resetLetter({ name: account.name, link, minutes });
    await post(tx, { firmId: place.firmId, kind: "password-reset", to: account.email, ...letter });
  });
}

/** Long enough to cover the writing of a reset, so that the time taken does not tell whether there is an account. */
const answerAfterMs = 400;

/**
 * Send a reset link to the address if somebody active has it. The answer and the time it takes are the same
 * when nobody has. Failure: `throttled` (3 in an hour for an address, known or not).
 */
export async function requestReset(email: string): Promise<Result<{ sent: true }>> {
  const answerAt = wait(answerAfterMs);
  const counted = await countTry(accountOf(email, "reset"), resetRequests);
  if (counted.ok) {
    const account = await accountByEmail(email);
    if (account) await writeReset(account);
  }
  await answerAt;
  return counted.ok ? ok({ sent: true }) : counted;
}

const open = (token: string) =>
  and(
    eq(passwordResets.tokenHash, tokenHash(token)),
    isNull(passwordResets.usedAt),
    gt(passwordResets.expiresAt, sql`now()`),
  );

/** Is the link still good? For the page, before anything is typed. */
export async function resetIsOpen(token: string): Promise<boolean> {
  if (!looksLikeToken(token)) return false;
  const found = await db.select({ id: passwordResets.id }).from(passwordResets).where(open(token));
  return found.length === 1;
}

/**
 * Set a new password with a reset link. The link and every other open one of this person are spent, and all
 * their sessions end. Failures: `not-found` (unknown, used or run out), `invalid` with the field `password`.
 */
export async function resetPassword(token: string, password: string): Promise<Result<{ done: true }>> {
  if (!looksLikeToken(token)) return gone;
  const [person] = await db
    .select({ id: users.id, email: users.email, name: users.name })
    .from(passwordResets)
    .innerJoin(users, eq(users.id, passwordResets.userId))
    .where(open(token));
  if (!person) return gone;
  const acceptable = acceptablePassword(password, person.email, person.name);
  if (!acceptable.ok) return acceptable;
  const passwordHash = await hashPassword(password);
  return asUser(person.id, async (tx) => {
    const [spent] = await tx
      .update(passwordResets)
      .set({ usedAt: sql`now()` })
      .where(open(token))
      .returning({ id: passwordResets.id });
    if (!spent) return gone;
    await tx
      .update(passwordResets)
      .set({ usedAt: sql`now()` })
      .where(and(eq(passwordResets.userId, person.id), ne(passwordResets.id, spent.id), isNull(passwordResets.usedAt)));
    await tx.update(users).set({ passwordHash }).where(eq(users.id, person.id));
    await tx.delete(sessions).where(eq(sessions.userId, person.id));
    const places = await tx.select({ firmId: members.firmId }).from(members).where(eq(members.userId, person.id));
    for (const { firmId } of places) {
      await enterFirm(tx, firmId);
      const actor = { firmId, userId: person.id, name: person.name };
      await recordEvent(tx, actor, { type: "account.password-reset", version: 1, userId: person.id });
    }
    return ok({ done: true as const });
  });
}
