"use server";

import { redirect } from "next/navigation";
import { z } from "zod";
import { endSession, listSessions } from "@/db/queries/account";
import { ok, type Result } from "@/lib/notify/result";
import { viewerAction } from "@/lib/server/actions";
import { currentSession } from "@/lib/server/auth/viewer";
import { signOut } from "@/lib/server/auth/sign-in";

/** Ends one session of one's own. */
export const endSessionAct = viewerAction(z.object({ id: z.string().min(1).max(128) }), endSession);

/** Ends every session of one's own, this one last. */
export const signOutEverywhereAct = viewerAction(z.object({}), async (viewer): Promise<Result<null>> => {
  const listed = await listSessions(viewer, { currentId: (await currentSession())?.sessionId ?? null });
  if (!listed.ok) return listed;
  for (const { id, current } of listed.value) {
    if (current) continue;
    const ended = await endSession(viewer, { id });
    if (!ended.ok && ended.error.code !== "not-found") return ended;
  }
  await signOut();
  redirect("/sign-in");
  return ok(null);
});
