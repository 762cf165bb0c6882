import { createHash, randomBytes } from "node:crypto";

/** A new bearer secret: 256 random bits, safe in a cookie and a URL. */
export const newToken = (): string => randomBytes(32).toString("base64url");

/** What is stored of a secret: SHA-256 in hex. A read of the table gives nobody a way in. */
export const tokenHash = (token: string): string => createHash("sha256").update(token).digest("hex");

/** Could this text be one of our tokens? Anything else is not worth a query. */
export const looksLikeToken = (text: string): boolean => /^[A-Za-z0-9_-]{43}$/.test(text);
