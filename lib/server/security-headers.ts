/**
 * Headers that every answer carries, and the two content policies: one for pages, one for everything else.
 * Browsers' behaviour: W3C CSP Level 3; values: OWASP ASVS 5.0 chapter 3.
 */

/** 128 random bits, base64, as CSP Level 3 section 7.1 asks of a nonce. */
export const newNonce = (): string => {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return btoa(String.fromCharCode(...bytes));
};

/**
 * Policy of a page. Scripts run only with the nonce of this answer; nothing is loaded from another origin;
 * no page of ours can be framed. `development` allows what hot reload needs.
 */
export function pagePolicy(nonce: string, options: { development: boolean; https: boolean }): string {
  const script = [`'self'`, `'nonce-${nonce}'`, `'strict-dynamic'`];
  const style = [`'self'`, options.development ? `'unsafe-inline'` : `'nonce-${nonce}'`];
  if (options.development) script.push(`'unsafe-eval'`);
  return [
    "default-src 'self'",
    `script-src ${script.join(" ")}`,
    `style-src ${style.join(" ")}`,
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "manifest-src 'self'",
    "frame-src 'none'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    ...(options.https ? ["upgrade-insecure-requests"] : []),
  ].join("; ");
}

/** Policy of data and files: nothing in them may ever run, even when opened in a tab. */
export const dataPolicy = "default-src 'none'; sandbox; frame-ancestors 'none'; base-uri 'none'";

/** Headers for every answer of a site; `https` adds strict transport security, one year. */
export const commonHeaders = (https: boolean): Record<string, string> => ({
  "x-content-type-options": "nosniff",
  // Not `no-referrer`: browsers then send `Origin: null` with a posted form, and the form would be refused.
  "referrer-policy": "same-origin",
  "permissions-policy": "camera=(self), geolocation=(), microphone=(), payment=(), usb=(), browsing-topics=()",
  "cross-origin-opener-policy": "same-origin",
  "cross-origin-resource-policy": "same-origin",
  ...(https ? { "strict-transport-security": "max-age=31536000; includeSubDomains" } : {}),
});

/** Headers of an API answer or a file. Never stored by a shared cache: what a person may see can change. */
export const dataHeaders = (https: boolean): Record<string, string> => ({
  ...commonHeaders(https),
  "content-security-policy": dataPolicy,
  "cache-control": "no-store",
});
