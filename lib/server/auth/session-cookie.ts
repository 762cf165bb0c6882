import { env } from "../env";
import { looksLikeToken } from "./tokens";

/** Chromium keeps a cookie for 400 days at most (RFC 6265bis). The database decides when a session ends. */
const maxAgeSeconds = 400 * 24 * 60 * 60;

/** `__Host-` binds the cookie to this host and to https; over plain http browsers refuse that prefix. */
export const sessionCookieName = (): string => (env().https ? "__Host-sealwire" : "sealwire");

export const sessionCookieOptions = () =>
  ({ httpOnly: true, sameSite: "lax", secure: env().https, path: "/", maxAge: maxAgeSeconds }) as const;

/** The session token in a Cookie header, or null. Used where there is a plain Request. */
export function tokenInHeader(header: string | null): string | null {
  const prefix = `${sessionCookieName()}=`;
  const pair = (header ?? "").split(/;\s*/).find((part) => part.startsWith(prefix));
  const token = pair?.slice(prefix.length) ?? "";
  return looksLikeToken(token) ? token : null;
}
