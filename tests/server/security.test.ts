import { sql } from "drizzle-orm";
import { describe, expect, it, vi } from "vitest";
import { NextRequest } from "next/server";
import { z } from "zod";
import { makeFirm, makeViewer } from "../support/people";
import { db } from "@/db/client";
import { failed, ok } from "@/lib/notify/result";
import { startSession } from "@/lib/server/auth/lucia";
import { acceptablePassword, hashPassword, passwordMatches } from "@/lib/server/auth/passwords";
import { newToken, tokenHash } from "@/lib/server/auth/tokens";
import { parseEnv } from "@/lib/server/env";
import { handler, publicHandler } from "@/lib/server/handler";
import { makeLog } from "@/lib/server/log";
import { isSameOrigin } from "@/lib/server/same-origin";
import { commonHeaders, pagePolicy, newNonce } from "@/lib/server/security-headers";
import { proxy } from "@/proxy";

const origin = "http://127.0.0.1:3000";

describe("content policy of a page (CSP Level 3; ASVS 5.0 3.4)", () => {
  const visit = (path: string, cookie = true) =>
    proxy(new NextRequest(`${origin}${path}`, { headers: cookie ? { cookie: `sealwire=${newToken()}` } : {} }));
  const nonceOf = (response: Response) =>
    /'nonce-([^']+)'/.exec(response.headers.get("content-security-policy") ?? "")?.[1] ?? "";

  it("has a nonce of 128 random bits, another at each answer, passed on to the page", () => {
    const [one, two] = [visit("/jobs"), visit("/jobs")];
    expect(Buffer.from(nonceOf(one), "base64")).toHaveLength(16);
    expect(nonceOf(one)).not.toBe(nonceOf(two));
    expect(one.headers.get("x-middleware-request-x-nonce")).toBe(nonceOf(one));
  });

  it("lets nothing in from elsewhere and no inline script", () => {
    const policy = pagePolicy(newNonce(), { development: false, https: true });
    for (const part of [
      "base-uri 'none'",
      "object-src 'none'",
      "frame-ancestors 'none'",
      "connect-src 'self'",
      "form-action 'self'",
    ]) {
      expect(policy).toContain(part);
    }
    expect(policy).not.toMatch(/unsafe-inline|unsafe-eval|https?:|\*/);
  });

  it("is the closed one for data and files, with the other headers", () => {
    const { headers } = visit("/api/v1/jobs");
    expect(headers.get("content-security-policy")).toMatch(/^default-src 'none'; sandbox/);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("cache-control")).toBe("no-store");
    expect(headers.get("strict-transport-security")).toBeNull();
  });

  it("lets a built file through to anybody, as the kind it says it is", () => {
    const { status, headers } = visit("/_next/static/chunks/a.js", false);
    expect([status, headers.get("x-content-type-options"), headers.get("cache-control")]).toEqual([
      200,
      "nosniff",
      null,
    ]);
  });

  it("sends somebody without a cookie to sign-in, and leaves open pages alone", () => {
    const sent = visit("/jobs", false);
    expect([sent.status, new URL(sent.headers.get("location") ?? "", origin).pathname]).toEqual([307, "/sign-in"]);
    for (const path of ["/sign-in", `/reset/${newToken()}`, `/invitation/${newToken()}`, "/demo/mail"]) {
      expect(visit(path, false).status).toBe(200);
    }
    expect(visit("/sign-inside", false).status).toBe(307);
  });
});

describe("origin of a changing request (OWASP CSRF Prevention: verifying origin)", () => {
  const post = (headers: Record<string, string>, method = "POST") =>
    isSameOrigin(
      new Request(`${origin}/api/v1/jobs`, { method, headers: { host: "127.0.0.1:3000", ...headers } }),
      origin,
    );
  it.each<[string, Record<string, string>, boolean]>([
    ["our own page", { origin }, true],
    ["the same host by another scheme's proxy", { origin: "https://127.0.0.1:3000" }, true],
    ["another site", { origin: "https://elsewhere.example.com" }, false],
    ["another port", { origin: "http://127.0.0.1:4000" }, false],
    ["no origin", {}, false],
    ["a null origin", { origin: "null" }, false],
    ["a site that claims ours", { origin, "sec-fetch-site": "cross-site" }, false],
    ["a sibling host", { origin, "sec-fetch-site": "same-site" }, false],
  ])("%s", (_, headers, allowed) => {
    expect(post(headers)).toBe(allowed);
  });
  it("reading needs none", () => expect(post({}, "GET")).toBe(true));
});

describe("the door of the route handlers", () => {
  const asSomebody = async (roles: ("installer" | "admin" | "compliance")[] = ["installer"]) => {
    const viewer = await makeViewer(await makeFirm(), roles);
    return { viewer, cookie: `sealwire=${await startSession(viewer.userId, "")}` };
  };
  const send = (cookie: string | null, body: unknown, headers: Record<string, string> = {}) =>
    new Request(`${origin}/api/v1/things`, {
      method: "POST",
      headers: { origin, "content-type": "application/json", ...(cookie ? { cookie } : {}), ...headers },
      body: typeof body === "string" ? body : JSON.stringify(body),
    });
  const spec = { body: z.object({ name: z.string().min(2, "give two letters"), size: z.number("give a number") }) };
  const echo = handler(spec, async ({ viewer, body }) => ok({ firm: viewer.firmId, name: body.name }));

  it("401 signed out, 403 from elsewhere, 200 for a person with a good body", async () => {
    const { cookie, viewer } = await asSomebody();
    expect((await echo(send(null, {}))).status).toBe(401);
    expect((await echo(send(`sealwire=${newToken()}`, {}))).status).toBe(401);
    expect((await echo(send(cookie, {}, { origin: "https://elsewhere.example.com" }))).status).toBe(403);
    const answer = await echo(send(cookie, { name: "cut-out", size: 1 }));
    expect([answer.status, await answer.json()]).toEqual([200, { firm: viewer.firmId, name: "cut-out" }]);
    expect(answer.headers.get("content-security-policy")).toMatch(/^default-src 'none'; sandbox/);
    expect(answer.headers.get("cache-control")).toBe("no-store");
  });

  it("names every wrong field, and tells bodies apart that are no JSON, too large or another type", async () => {
    const { cookie } = await asSomebody();
    const wrong = await echo(send(cookie, { name: "x" }));
    expect(wrong.status).toBe(422);
    expect((await wrong.json()).error.fields).toEqual([
      { path: "name", message: "give two letters" },
      { path: "size", message: "give a number" },
    ]);
    expect((await echo(send(cookie, "{"))).status).toBe(422);
    expect((await echo(send(cookie, "x=1", { "content-type": "application/x-www-form-urlencoded" }))).status).toBe(415);
    expect((await echo(send(cookie, `"${"x".repeat(2 * 1024 * 1024)}"`))).status).toBe(413);
  });

  it("turns codes into statuses, and hides what a role may not see behind not found", async () => {
    const { cookie } = await asSomebody(["installer"]);
    const answers = async (code: string) =>
      (await handler({}, async () => failed(code, "no"))(send(cookie, {}))).status;
    expect(
      await Promise.all(["not-found", "conflict", "forbidden", "throttled", "contradictory"].map(answers)),
    ).toEqual([404, 409, 403, 429, 422]);
    const params = z.object({ id: z.uuid() });
    const context = (id: string) => ({ params: Promise.resolve({ id }) });
    const one = handler({ params, permission: "team.manage" }, async () => ok(1));
    expect((await one(send(cookie, {}), context(crypto.randomUUID()))).status).toBe(404);
    const many = handler({ permission: "team.manage" }, async () => ok(1));
    expect((await many(send(cookie, {}))).status).toBe(403);
    const named = handler({ params }, async () => failed("forbidden", "secret reason"));
    const hidden = await named(send(cookie, {}), context(crypto.randomUUID()));
    expect([hidden.status, JSON.stringify(await hidden.json())]).toEqual([404, expect.not.stringContaining("secret")]);
    expect((await named(send(cookie, {}), context("not-an-id"))).status).toBe(404);
  });

  it("answers a surprise with a fixed sentence and an id, and nothing of the error", async () => {
    const broken = publicHandler({}, async () => {
      throw new Error("password=hunter2 at 10.0.0.7");
    });
    const answer = await broken(new Request(origin));
    expect(answer.status).toBe(500);
    expect((await answer.json()).error.message).toMatch(/^Something went wrong here\. Quote [0-9a-f]{8}\.$/);
  });
});

describe("passwords (OWASP Password Storage: Argon2id m=19456 t=2 p=1; NIST SP 800-63B 5.1.1.2)", () => {
  const good = (password: string) => acceptablePassword(password, "tam@fenwold.example.com", "Tam Orrell").ok;
  it("are hashed with those parameters and compared", async () => {
    const stored = await hashPassword("copper-wire-seal-7");
    expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await passwordMatches(stored, "copper-wire-seal-7")).toBe(true);
    expect(await passwordMatches(stored, "copper-wire-seal-8")).toBe(false);
    expect(await passwordMatches(null, "copper-wire-seal-7")).toBe(false);
  });
  it("need 12 to 128 characters, no more rules, and not a common one or one's own name", () => {
    for (const password of ["copper-wire-seal-7", "plum kettle orbit", "ŵylan dros y môr", "x7q$kd2z".repeat(16)])
      expect(good(password)).toBe(true);
    for (const password of [
      "plum kettle",
      `${"x7q$kd2z".repeat(16)}.`,
      "password1234",
      "Password1234!",
      "qwertyuiop123",
      "aaaaaaaaaaaaaa",
      "123456789012",
      "tamorrell-2026",
      "Liverpool2026!",
    ]) {
      expect(good(password)).toBe(false);
    }
  });
});

describe("tokens", () => {
  it("are 256 random bits and are stored as their SHA-256 (FIPS 180-4 test vector)", () => {
    expect(Buffer.from(newToken(), "base64url")).toHaveLength(32);
    expect(new Set(Array.from({ length: 100 }, newToken)).size).toBe(100);
    expect(tokenHash("abc")).toBe("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
  });
});

describe("served over https", () => {
  it("asks browsers to stay there, and says so from the public address alone", () => {
    const settings = { DATABASE_URL: "postgres://u:p@h/d", SEALWIRE_DEMO: "on" };
    expect(parseEnv({ ...settings, PUBLIC_ORIGIN: "https://papers.example.com/x" })).toMatchObject({
      https: true,
      PUBLIC_ORIGIN: "https://papers.example.com",
    });
    expect(parseEnv(settings).https).toBe(false);
    expect(commonHeaders(true)["strict-transport-security"]).toMatch(/^max-age=31536000/);
  });
});

describe("settings and log", () => {
  it("names every setting that is missing or wrong, and repeats no value", () => {
    const wrong = {
      NODE_ENV: "production",
      DATABASE_URL: "mysql://user:hunter2@x/y",
      STORAGE_DRIVER: "s3",
      S3_ACCESS_KEY_ID: "k",
    };
    const message = (() => {
      try {
        return String(parseEnv(wrong));
      } catch (error) {
        return String(error);
      }
    })();
    expect(message).toContain("DATABASE_URL");
    expect(message).not.toContain("hunter2");
    const rest = () => parseEnv({ ...wrong, DATABASE_URL: "postgres://u:p@h/d" });
    expect(rest).toThrow(/S3_BUCKET[\s\S]*S3_REGION[\s\S]*S3_SECRET_ACCESS_KEY[\s\S]*SMTP_URL/);
  });
  it("withholds secrets", () => {
    const lines: string[] = [];
    const log = makeLog("info", { write: (line: string) => void lines.push(line) });
    log.info({ password: "hunter2", request: { headers: { cookie: "sealwire=x1y2" }, token: "abc123" } }, "seen");
    expect(lines.join()).not.toMatch(/hunter2|x1y2|abc123/);
  });
  it("keeps the statement of a failed query and not its values", async () => {
    const lines: string[] = [];
    const log = makeLog("info", { write: (line: string) => void lines.push(line) });
    await db.execute(sql`select ${"0777 private"}::int`).catch((error: unknown) => log.error({ err: error }, "failed"));
    const { err } = JSON.parse(lines[0] ?? "{}");
    expect([err.message, err.cause.code]).toEqual(["Failed query: select $1::int", "22P02"]);
    expect(JSON.stringify(err)).not.toContain("private");
  });
});

vi.mock("next/headers", () => ({ cookies: async () => ({ get: () => undefined }) }));
