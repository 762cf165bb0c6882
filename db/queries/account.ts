import { and, desc, eq, gt } from "drizzle-orm";
import { db } from "../client";
import { notFound } from "../permission";
import { recordEvent } from "../record-event";
import { sessions } from "../schema";
import { asFirm } from "../tenant";
import { ok, type Result } from "@/lib/notify/result";
import type { SessionView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

/** A person's own live sessions, newest first. `currentId` is the one that asks, so that it can be marked. */
export async function listSessions(
  viewer: Viewer,
  { currentId }: { currentId: string | null },
): Promise<Result<SessionView[]>> {
  const rows = await db
    .select({
      id: sessions.id,
      createdAt: sessions.createdAt,
      lastSeenAt: sessions.lastSeenAt,
      device: sessions.device,
    })
    .from(sessions)
    .where(and(eq(sessions.userId, viewer.userId), gt(sessions.expiresAt, new Date())))
    .orderBy(desc(sessions.createdAt));
  return ok(
    rows.map((row) => ({ ...row, lastSeenAt: row.lastSeenAt ?? row.createdAt, current: row.id === currentId })),
  );
}

/** Ends one of a person's own sessions; it counts at that device's next request. */
export async function endSession(viewer: Viewer, { id }: { id: string }): Promise<Result<{ id: string }>> {
  return asFirm(viewer, async (tx) => {
    const ended = await tx
      .delete(sessions)
      .where(and(eq(sessions.userId, viewer.userId), eq(sessions.id, id)))
      .returning({ id: sessions.id });
    if (ended.length === 0) return notFound("session");
    // The whole id would name the session to a reader of the record; its beginning is enough to tell two apart.
    const sessionId = id.slice(0, 8);
    await recordEvent(tx, viewer, { type: "account.session-ended", version: 1, userId: viewer.userId, sessionId });
    return ok({ id });
  });
}
