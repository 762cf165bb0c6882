import { and, asc, eq, ne } from "drizzle-orm";
import type { Tx } from "../client";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { invitations, members, sessions, users } from "../schema";
import { asFirm } from "../tenant";
import { inOrder, invalid, stillOpen } from "./invitations";
import { ok, type Result } from "@/lib/notify/result";
import type { Role } from "@/lib/notify/roles";
import type { InvitationView, MemberView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

export { inviteMember, withdrawInvitation } from "./invitations";

export type TeamView = { members: MemberView[]; invitations: InvitationView[] };

/** Everybody of the firm, and the invitations not taken up yet. */
export async function listTeam(viewer: Viewer): Promise<Result<TeamView>> {
  const refused = refusal(viewer, "team.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const people = await tx
      .select({
        userId: users.id,
        name: users.name,
        email: users.email,
        roles: members.roles,
        registration: members.registration,
        status: members.status,
        lastSeenAt: members.lastSeenAt,
      })
      .from(members)
      .innerJoin(users, eq(users.id, members.userId))
      .where(eq(members.firmId, viewer.firmId))
      .orderBy(asc(users.name), asc(users.id));
    const invited = await tx
      .select({
        id: invitations.id,
        email: invitations.email,
        roles: invitations.roles,
        expiresAt: invitations.expiresAt,
        invitedBy: users.name,
      })
      .from(invitations)
      .innerJoin(users, eq(users.id, invitations.invitedBy))
      .where(stillOpen(viewer.firmId))
      .orderBy(asc(invitations.createdAt));
    return ok({ members: people, invitations: invited });
  });
}

/** Somebody's place in the firm with its row held, and whether another active admin would remain without them. */
async function holdMember(tx: Tx, firmId: string, userId: string) {
  const rows = await tx
    .select({ userId: members.userId, name: users.name, roles: members.roles, status: members.status })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(eq(members.firmId, firmId))
    .orderBy(members.userId)
    .for("update", { of: members });
  const member = rows.find((row) => row.userId === userId);
  const isAdmin = (row: (typeof rows)[number]) => row.status === "active" && row.roles.includes("admin");
  return member ? { ...member, anotherAdmin: rows.some((row) => row.userId !== userId && isAdmin(row)) } : null;
}

const lastAdmin = (path: string) =>
  invalid(path, "The firm needs at least one active admin. Make somebody else admin first.");

/** Sets what somebody may do; it counts from their next request. Failure: `invalid` for the last admin. */
export async function setRoles(
  viewer: Viewer,
  input: { userId: string; roles: Role[]; registration?: string | null },
): Promise<Result<{ userId: string }>> {
  const refused = refusal(viewer, "team.manage");
  if (refused) return refused;
  const roles = inOrder(input.roles);
  if (roles.length === 0) return invalid("roles", "Choose at least one role, or suspend the person.");
  return asFirm(viewer, async (tx) => {
    const member = await holdMember(tx, viewer.firmId, input.userId);
    if (!member) return notFound("member");
    if (!roles.includes("admin") && !member.anotherAdmin) return lastAdmin("roles");
    const registration = input.registration === undefined ? {} : { registration: input.registration?.trim() || null };
    await tx
      .update(members)
      .set({ roles, ...registration })
      .where(and(eq(members.firmId, viewer.firmId), eq(members.userId, input.userId)));
    const { name, userId } = member;
    await recordEvent(tx, viewer, {
      type: "member.roles-set",
      version: 1,
      userId,
      name,
      was: member.roles,
      now: roles,
    });
    return ok({ userId });
  });
}

/** Suspends somebody, which ends their sessions at once, or lets them back in. Failure: `invalid` for the last admin. */
export async function setStatus(
  viewer: Viewer,
  { userId, status }: { userId: string; status: "active" | "suspended" },
): Promise<Result<{ userId: string }>> {
  const refused = refusal(viewer, "team.manage");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const member = await holdMember(tx, viewer.firmId, userId);
    if (!member) return notFound("member");
    if (status === "suspended" && !member.anotherAdmin) return lastAdmin("status");
    const changed = await tx
      .update(members)
      .set({ status })
      .where(and(eq(members.firmId, viewer.firmId), eq(members.userId, userId), ne(members.status, status)))
      .returning({ userId: members.userId });
    if (changed.length === 0) return ok({ userId });
    if (status === "suspended") await tx.delete(sessions).where(eq(sessions.userId, userId));
    const type = status === "suspended" ? "member.suspended" : "member.reinstated";
    await recordEvent(tx, viewer, { type, version: 1, userId, name: member.name });
    return ok({ userId });
  });
}
