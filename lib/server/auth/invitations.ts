import { randomUUID } from "node:crypto";
import { and, eq, gt, isNull, ne, sql } from "drizzle-orm";
import { accountByEmail, checkCredentials } from "./credentials";
import { acceptablePassword, hashPassword } from "./passwords";
import { looksLikeToken, tokenHash } from "./tokens";
import type { Tx } from "@/db/client";
import { recordEvent } from "@/db/record-event";
import { asTokenHolder, asUser, enterFirm } from "@/db/tenant";
import { firms, invitations, members, users } from "@/db/schema";
import type { Role } from "@/lib/notify/roles";
import { failed, ok, type Result } from "@/lib/notify/result";

/** How long an invitation can be taken up. */
export const invitationDays = 7;

export type NewMember = { name: string; password: string };
export type OpenInvitation = { firmId: string; firmName: string; email: string; roles: Role[]; hasAccount: boolean };

const gone = failed("not-found", "This invitation has been used, withdrawn, or has run out. Ask the firm for another.");

const open = (token: string) =>
  and(
    eq(invitations.tokenHash, tokenHash(token)),
    isNull(invitations.acceptedAt),
    isNull(invitations.withdrawnAt),
    gt(invitations.expiresAt, sql`now()`),
  );

/** What the invitation page shows. Failure: `not-found` (unknown, used, withdrawn or run out). */
export async function lookUpInvitation(token: string): Promise<Result<OpenInvitation>> {
  if (!looksLikeToken(token)) return gone;
  const found = await asTokenHolder(tokenHash(token), async (tx) => {
    const [invitation] = await tx
      .select({ firmId: invitations.firmId, email: invitations.email, roles: invitations.roles })
      .from(invitations)
      .where(open(token));
    if (!invitation) return null;
    await enterFirm(tx, invitation.firmId);
    const [firm] = await tx.select({ name: firms.name }).from(firms).where(eq(firms.id, invitation.firmId));
    return firm ? { ...invitation, firmName: firm.name } : null;
  });
  if (!found) return gone;
  const account = await accountByEmail(found.email);
  return ok({ ...found, hasAccount: Boolean(account?.passwordHash) });
}

/** A person works for one firm here; a place in another one must end first. */
const hasPlaceElsewhere = (userId: string, firmId: string): Promise<boolean> =>
  asUser(userId, async (tx) => {
    const places = await tx
      .select({ firmId: members.firmId })
      .from(members)
      .where(and(eq(members.userId, userId), ne(members.firmId, firmId), eq(members.status, "active")));
    return places.length > 0;
  });

/** Spend the invitation, if it is still open: the guard against two taking it up at once. */
async function spend(tx: Tx, token: string): Promise<boolean> {
  const spent = await tx
    .update(invitations)
    .set({ acceptedAt: sql`now()` })
    .where(open(token))
    .returning({ id: invitations.id });
  return spent.length === 1;
}

/**
 * Take up an invitation: makes the person where the address is new, gives them their place in the firm and
 * spends the invitation, in one transaction. Failures as for `acceptInvitation`.
 */
export async function takeInvitation(token: string, input: NewMember): Promise<Result<{ userId: string }>> {
  const found = await lookUpInvitation(token);
  if (!found.ok) return found;
  const invitation = found.value;
  const account = await accountByEmail(invitation.email);
  if (account && (await hasPlaceElsewhere(account.id, invitation.firmId))) {
    return failed("elsewhere", "This address belongs to another firm here. Ask for the invitation at another address.");
  }
  const known = Boolean(account?.passwordHash);
  if (known) {
    const checked = await checkCredentials(invitation.email, input.password);
    if (!checked.ok) return checked;
  } else {
    const acceptable = acceptablePassword(input.password, invitation.email, input.name);
    if (!acceptable.ok) return acceptable;
  }
  const passwordHash = known ? null : await hashPassword(input.password);
  const userId = account?.id ?? randomUUID();
  return asTokenHolder(tokenHash(token), async (tx) => {
    await enterFirm(tx, invitation.firmId);
    if (!(await spend(tx, token))) return gone;
    if (!account)
      await tx.insert(users).values({ id: userId, email: invitation.email, name: input.name, passwordHash });
    else if (passwordHash) await tx.update(users).set({ name: input.name, passwordHash }).where(eq(users.id, userId));
    const place = { roles: invitation.roles, status: "active" as const };
    await tx
      .insert(members)
      .values({ firmId: invitation.firmId, userId, ...place })
      .onConflictDoUpdate({ target: [members.firmId, members.userId], set: place });
    const name = known ? (account?.name ?? input.name) : input.name;
    const actor = { firmId: invitation.firmId, userId, name };
    await recordEvent(tx, actor, { type: "member.joined", version: 1, userId, name, roles: invitation.roles });
    return ok({ userId });
  });
}
