import { and, asc, eq, sql } from "drizzle-orm";
import { endSessionOfToken, liveSession, type LiveSession } from "./lucia";
import { asFirm, asUser } from "@/db/tenant";
import { firms, members, sessions } from "@/db/schema";
import type { Role } from "@/lib/notify/roles";

declare const made: unique symbol;

/** Who is asking, for which firm. Only this file makes one, from a live session and an active place in a firm. */
export type Viewer = {
  readonly userId: string;
  readonly firmId: string;
  readonly name: string;
  readonly email: string;
  readonly firmName: string;
  readonly roles: Role[];
  readonly [made]: true;
};

/** "Last seen" is kept to five minutes, so that reading pages does not mean writing rows. */
const seenEveryMs = 5 * 60 * 1000;

/**
 * The person's active place in a firm as a Viewer, or null when there is none. Read anew at each request:
 * a suspension or a change of roles counts from the next one.
 */
export async function viewerOfUser(user: { userId: string; name: string; email: string }): Promise<Viewer | null> {
  const place = await asUser(user.userId, async (tx) => {
    const [member] = await tx
      .select({
        firmId: members.firmId,
        roles: members.roles,
        firm: sql`set_config('app.firm_id', ${members.firmId}::text, true)`,
      })
      .from(members)
      .where(and(eq(members.userId, user.userId), eq(members.status, "active")))
      .orderBy(asc(members.createdAt))
      .limit(1);
    if (!member) return null;
    const [firm] = await tx.select({ name: firms.name }).from(firms).where(eq(firms.id, member.firmId));
    return firm ? { firmId: member.firmId, roles: member.roles, firmName: firm.name } : null;
  });
  if (!place) return null;
  const { userId, name, email } = user;
  return { userId, name, email, ...place } as Viewer;
}

async function noteSeen(session: LiveSession, viewer: Viewer): Promise<void> {
  const seen = session.lastSeenAt ? Date.parse(session.lastSeenAt) : 0;
  if (Date.now() - seen < seenEveryMs) return;
  await asFirm(viewer, async (tx) => {
    await tx
      .update(sessions)
      .set({ lastSeenAt: sql`now()` })
      .where(eq(sessions.id, session.id));
    await tx
      .update(members)
      .set({ lastSeenAt: sql`now()` })
      .where(and(eq(members.firmId, viewer.firmId), eq(members.userId, viewer.userId)));
  });
}

/** A live session and whose it is, or null. Somebody without a place in any firm loses the session. */
export async function viewerOfToken(token: string): Promise<{ viewer: Viewer; sessionId: string } | null> {
  const session = await liveSession(token);
  if (!session) return null;
  const viewer = await viewerOfUser(session);
  if (!viewer) {
    await endSessionOfToken(token);
    return null;
  }
  await noteSeen(session, viewer);
  return { viewer, sessionId: session.id };
}
