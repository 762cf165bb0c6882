import "server-only";
import { cookies } from "next/headers";
import { redirect } from "next/navigation";
import { cache } from "react";
import { sessionCookieName, tokenInHeader } from "./session-cookie";
import { looksLikeToken } from "./tokens";
import { viewerOfToken, type Viewer } from "./viewer-of-session";

export type { Viewer };

/** The session of this page or action, read once a request; null when nobody is signed in. */
export const currentSession = cache(async (): Promise<{ viewer: Viewer; sessionId: string } | null> => {
  const token = (await cookies()).get(sessionCookieName())?.value ?? "";
  return looksLikeToken(token) ? viewerOfToken(token) : null;
});

/** Who is asking, for pages and actions. Nobody signed in: off to /sign-in. */
export async function requireViewer(): Promise<Viewer> {
  const session = await currentSession();
  if (!session) redirect("/sign-in");
  return session.viewer;
}

/** Who is asking, for route handlers: null when nobody is signed in, and the handler answers 401. */
export async function viewerOf(request: Request): Promise<Viewer | null> {
  const token = tokenInHeader(request.headers.get("cookie"));
  return token ? ((await viewerOfToken(token))?.viewer ?? null) : null;
}
