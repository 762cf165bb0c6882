import { NextResponse, type NextRequest } from "next/server";
import { sessionCookieName } from "./lib/server/auth/session-cookie";
import { env } from "./lib/server/env";
import { commonHeaders, dataHeaders, newNonce, pagePolicy } from "./lib/server/security-headers";

/** Pages that need no session. */
const openPages = ["/sign-in", "/forgotten", "/reset", "/invitation", "/verify", "/demo"];

const isOpen = (path: string) => openPages.some((page) => path === page || path.startsWith(`${page}/`));

/** Files made at build time: the same for everybody, with no session to look for and nothing in them to run. */
const isBuilt = (path: string) => path.startsWith("/_next/static/") || path === "/icon.svg";

/**
 * Headers for every answer, and a first look at the cookie so that somebody signed out lands on sign-in with a
 * real redirect. This is a convenience, not the defence: pages, actions and handlers each ask who is there.
 */
export function proxy(request: NextRequest): NextResponse {
  const { https, NODE_ENV } = env();
  const path = request.nextUrl.pathname;
  if (isBuilt(path)) return NextResponse.next({ headers: commonHeaders(https) });
  if (path.startsWith("/api/")) return NextResponse.next({ headers: dataHeaders(https) });

  const signedOut = !request.cookies.has(sessionCookieName());
  if (signedOut && !isOpen(path) && request.method === "GET") {
    return NextResponse.redirect(new URL("/sign-in", request.url), { headers: commonHeaders(https) });
  }

  const nonce = newNonce();
  const policy = pagePolicy(nonce, { development: NODE_ENV === "development", https });
  const forward = new Headers(request.headers);
  forward.set("x-nonce", nonce);
  // Next reads the nonce for its own scripts out of this request header.
  forward.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers: forward } });
  for (const [name, value] of Object.entries(commonHeaders(https))) response.headers.set(name, value);
  response.headers.set("content-security-policy", policy);
  response.headers.set("cache-control", "no-store");
  return response;
}

export const config = {
  // Everything passes here; even a built file must not be taken for another kind than it says it is.
  matcher: ["/(.*)"],
};
