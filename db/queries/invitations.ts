import { randomUUID } from "node:crypto";
import { and, eq, gt, isNull, sql } from "drizzle-orm";
import { nowInstant } from "../clock";
import { isRowId, notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { invitations, members, users } from "../schema";
import { asFirm } from "../tenant";
import { failed, ok, type Result } from "@/lib/notify/result";
import { roles as allRoles, type Role } from "@/lib/notify/roles";
import { invitationDays } from "@/lib/server/auth/invitations";
import { newToken, tokenHash } from "@/lib/server/auth/tokens";
import type { Viewer } from "@/lib/server/auth/viewer";
import { env } from "@/lib/server/env";
import { invitationLetter } from "@/lib/server/mail/letters";
import { post } from "@/lib/server/mail/post";

/** Invitations of a firm that can still be taken up. */
export const stillOpen = (firmId: string) =>
  and(
    eq(invitations.firmId, firmId),
    isNull(invitations.acceptedAt),
    isNull(invitations.withdrawnAt),
    gt(invitations.expiresAt, nowInstant()),
  );

export const invalid = (path: string, message: string) => failed("invalid", message, [{ path, message }]);
/** Roles in the one order they are shown in, each once. */
export const inOrder = (roles: readonly Role[]) => allRoles.filter((role) => roles.includes(role));

/**
 * Invites somebody by e-mail, with a link that works once. An older open invitation to the same address is
 * withdrawn. Failures: `invalid` (already in the firm, no role).
 */
export async function inviteMember(
  viewer: Viewer,
  input: { email: string; roles: Role[] },
): Promise<Result<{ id: string }>> {
  const refused = refusal(viewer, "team.manage");
  if (refused) return refused;
  const email = input.email.trim();
  const roles = inOrder(input.roles);
  if (roles.length === 0) return invalid("roles", "Choose at least one role.");
  return asFirm(viewer, async (tx) => {
    const sameAddress = sql`lower(${users.email}) = ${email.toLowerCase()}`;
    const present = await tx
      .select({ id: users.id })
      .from(members)
      .innerJoin(users, eq(users.id, members.userId))
      .where(and(eq(members.firmId, viewer.firmId), sameAddress));
    if (present.length) return invalid("email", "This person is in the firm already.");
    await tx
      .update(invitations)
      .set({ withdrawnAt: nowInstant() })
      .where(and(stillOpen(viewer.firmId), eq(sql`lower(${invitations.email})`, email.toLowerCase())));
    const id = randomUUID();
    const token = newToken();
    const expiresAt = new Date(Date.parse(nowInstant()) + invitationDays * 86_400_000).toISOString();
    const { firmId, userId: invitedBy } = viewer;
    await tx
      .insert(invitations)
      .values({ firmId, id, email, roles, tokenHash: tokenHash(token), invitedBy, expiresAt });
    const link = `${env().PUBLIC_ORIGIN}/invitation/${token}`;
    const words = { firmName: viewer.firmName, invitedBy: viewer.name, roles, link, days: invitationDays };
    await post(tx, { firmId, kind: "invitation", to: email, replyTo: viewer.email, ...invitationLetter(words) });
    await recordEvent(tx, viewer, { type: "member.invited", version: 1, invitationId: id, email, roles });
    return ok({ id });
  });
}

/** Takes an invitation back: its link no longer opens. */
export async function withdrawInvitation(viewer: Viewer, { id }: { id: string }): Promise<Result<{ id: string }>> {
  const refused = refusal(viewer, "team.manage");
  if (refused) return refused;
  if (!isRowId(id)) return notFound("invitation");
  return asFirm(viewer, async (tx) => {
    const [gone] = await tx
      .update(invitations)
      .set({ withdrawnAt: nowInstant() })
      .where(and(stillOpen(viewer.firmId), eq(invitations.id, id)))
      .returning({ email: invitations.email });
    if (!gone) return notFound("invitation");
    await recordEvent(tx, viewer, { type: "invitation.withdrawn", version: 1, invitationId: id, email: gone.email });
    return ok({ id });
  });
}
