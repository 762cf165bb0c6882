import { DrizzlePostgreSQLAdapter } from "@lucia-auth/adapter-drizzle";
import { Lucia, TimeSpan } from "lucia";
import { newToken, tokenHash } from "./tokens";
import { db } from "@/db/client";
import { sessions, users } from "@/db/schema";

/**
 * The session library, kept to this file so that it can be replaced. It stores whatever id it is given and
 * looks it up as is, so it is only ever given the SHA-256 of the token: the token lives in the cookie alone.
 */
const lucia = new Lucia(new DrizzlePostgreSQLAdapter(db, sessions, users), {
  sessionExpiresIn: new TimeSpan(14, "d"),
  getSessionAttributes: (row) => ({ lastSeenAt: row.lastSeenAt, device: row.device, createdAt: row.createdAt }),
  getUserAttributes: (row) => ({ name: row.name, email: row.email }),
});

declare module "lucia" {
  interface Register {
    Lucia: typeof lucia;
    DatabaseSessionAttributes: { device: string; lastSeenAt?: string | null; createdAt?: string };
    DatabaseUserAttributes: { name: string; email: string };
  }
}

/** However much it is used, a session ends (ASVS 5.0 7.3.2 asks for such a limit; the figure is the project's own). */
const longestMs = 90 * 24 * 60 * 60 * 1000;

export type LiveSession = {
  /** Hash of the token. */
  id: string;
  userId: string;
  name: string;
  email: string;
  lastSeenAt: string | null;
};

/** Start a session and return the token for the cookie. `device` is a short description for the person's own list. */
export async function startSession(userId: string, device: string): Promise<string> {
  const token = newToken();
  await lucia.createSession(userId, { device }, { sessionId: tokenHash(token) });
  return token;
}

/**
 * The session of a token, or null when there is none or it has run out. Use extends it to 14
 * days from the last visit, and to no more than 90 days in all.
 */
export async function liveSession(token: string): Promise<LiveSession | null> {
  const { session, user } = await lucia.validateSession(tokenHash(token));
  if (!session) return null;
  if (Date.now() - Date.parse(session.createdAt ?? "") > longestMs) {
    await lucia.invalidateSession(session.id);
    return null;
  }
  return {
    id: session.id,
    userId: user.id,
    name: user.name,
    email: user.email,
    lastSeenAt: session.lastSeenAt ?? null,
  };
}

export const endSessionOfToken = (token: string): Promise<void> => lucia.invalidateSession(tokenHash(token));

export const endSessionsOfUser = (userId: string): Promise<void> => lucia.invalidateUserSessions(userId);

export const deleteExpiredSessions = (): Promise<void> => lucia.deleteExpiredSessions();
