const reading = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Do these headers name one of our own pages as where the request came from? The Origin must be the public address,
 * or the host the request was sent to, never by a plainer scheme than the public one; browsers send it with every
 * changing request, so a missing one is refused too.
 */
export function isOwnOrigin(headers: Pick<Headers, "get">, publicOrigin: string): boolean {
  const site = headers.get("sec-fetch-site");
  if (site && site !== "same-origin") return false;
  const origin = headers.get("origin");
  if (!origin || !URL.canParse(origin)) return false;
  if (origin === publicOrigin) return true;
  const { host, protocol } = new URL(origin);
  return host === headers.get("host") && (protocol === "https:" || publicOrigin.startsWith("http:"));
}

/** Did this request come from one of our own pages? Reading methods always pass. */
export const isSameOrigin = (request: Request, publicOrigin: string): boolean =>
  reading.has(request.method) || isOwnOrigin(request.headers, publicOrigin);
