import "server-only";
import { cookies } from "next/headers";
import { checkCredentials } from "./credentials";
import { deviceName } from "./device";
import { takeInvitation, type NewMember } from "./invitations";
import { endSessionOfToken, startSession } from "./lucia";
import { sessionCookieName, sessionCookieOptions } from "./session-cookie";
import { looksLikeToken } from "./tokens";
import { viewerOfToken } from "./viewer-of-session";
import { recordEvent } from "@/db/record-event";
import { asFirm } from "@/db/tenant";
import { failed, ok, type Result } from "@/lib/notify/result";

export { requestReset, resetPassword, resetIsOpen } from "./password-resets";
export { lookUpInvitation } from "./invitations";

export type SignInMeta = { userAgent: string | null };

async function keepSession(userId: string, meta: SignInMeta): Promise<Result<{ userId: string }>> {
  const jar = await cookies();
  const old = jar.get(sessionCookieName())?.value ?? "";
  // A new sign-in never continues an older session (ASVS 5.0 7.2.4).
  if (looksLikeToken(old)) await endSessionOfToken(old);
  const token = await startSession(userId, deviceName(meta.userAgent));
  const session = await viewerOfToken(token);
  if (!session) {
    return failed("suspended", "Your place in the firm is suspended. Ask the person who runs your team page.");
  }
  await asFirm(session.viewer, (tx) =>
    recordEvent(tx, session.viewer, { type: "account.signed-in", version: 1, userId }),
  );
  jar.set(sessionCookieName(), token, sessionCookieOptions());
  return ok({ userId });
}

/**
 * Check a password and start a session: sets the cookie, so only for server actions and route handlers.
 * Failures: `wrong` (same words and time for an unknown address), `throttled`, `suspended`.
 */
export async function signIn(email: string, password: string, meta: SignInMeta): Promise<Result<{ userId: string }>> {
  const checked = await checkCredentials(email, password);
  return checked.ok ? keepSession(checked.value.userId, meta) : checked;
}

/** End the session of this browser and clear its cookie. */
export async function signOut(): Promise<void> {
  const jar = await cookies();
  const token = jar.get(sessionCookieName())?.value ?? "";
  if (looksLikeToken(token)) await endSessionOfToken(token);
  jar.set(sessionCookieName(), "", { ...sessionCookieOptions(), maxAge: 0 });
}

/**
 * Take up an invitation and sign in. Failures: `not-found` (unknown, used, withdrawn or run out),
 * `invalid` with fields, `wrong` or `throttled` when the address has an account already and the password is not its.
 */
export async function acceptInvitation(
  token: string,
  input: NewMember,
  meta: SignInMeta = { userAgent: null },
): Promise<Result<{ userId: string }>> {
  const taken = await takeInvitation(token, input);
  return taken.ok ? keepSession(taken.value.userId, meta) : taken;
}
