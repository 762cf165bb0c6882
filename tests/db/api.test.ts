import { randomUUID } from "node:crypto";
import { readdirSync } from "node:fs";
import { join, relative } from "node:path";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { exampleRecord, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { submissionsOfJob } from "@/db/queries/submissions";
import { getPack } from "@/db/queries/packs";
import { addPhoto } from "@/db/queries/photos";
import { startSession } from "@/lib/server/auth/lucia";
import { sessionCookieName } from "@/lib/server/auth/session-cookie";
import type { Viewer } from "@/lib/server/auth/viewer";

/**
 * Every route of the API, found in the tree and called as it is served: signed out, as another firm, and without
 * the origin of our own pages (OWASP ASVS 5.0, 8.2.2 and 3.5).
 */
const root = join(import.meta.dirname, "../../app/api");
type Handler = (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>;
type Route = { path: string; module: Record<string, Handler>; method: string };

const files = readdirSync(root, { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith("route.ts"));
const methods = ["GET", "POST", "PATCH", "PUT", "DELETE"];
const modules = await Promise.all(
  files.map(async (file) => ({
    path: `/api/${relative(root, join(root, file)).replace(/\/?route\.ts$/, "")}`,
    module: (await import(join(root, file))) as Record<string, Handler>,
  })),
);
const routes: Route[] = modules.flatMap(({ path, module }) =>
  methods.filter((method) => method in module).map((method) => ({ path, module, method })),
);
const open = ["/api/health", "/api/v1/schema/job"];
const withId = routes.filter(({ path }) => path.includes("["));

let owner: Viewer;
let cookies: Record<"owner" | "stranger", string>;
let ids: Record<string, string>;

beforeAll(async () => {
  owner = await soleTrader();
  const stranger = await soleTrader();
  const cookie = async ({ userId }: Viewer) => `${sessionCookieName()}=${await startSession(userId, "Test")}`;
  cookies = { owner: await cookie(owner), stranger: await cookie(stranger) };
  const jobId = await openJob(owner);
  const packId = await sealAndBuild(owner, jobId);
  const bytes = await sharp({ create: { width: 20, height: 20, channels: 3, background: "#446" } })
    .png()
    .toBuffer();
  const photo = { jobId, photoId: randomUUID(), subject: "cut-out", of: null, caption: null } as const;
  const { id: photoId } = value(await addPhoto(owner, { ...photo, bytes: new Uint8Array(bytes) }));
  const submissionId = value(await submissionsOfJob(owner, { jobId }))[0]?.id ?? "";
  ids = { jobId, packId, photoId, submissionId };
}, 120_000);

const bodies: Record<string, unknown> = {
  "POST /api/v1/jobs": { id: randomUUID(), record: { stage: "planned" } },
  "POST /api/v1/jobs/[jobId]/saves": {
    saveId: randomUUID(),
    baseVersion: 1,
    changes: [{ path: "notes", was: null, value: "x" }],
  },
  "PATCH /api/v1/photos/[photoId]": { caption: "x", subject: "cut-out", inPack: true },
};

const origin = process.env["PUBLIC_ORIGIN"] ?? "http://127.0.0.1:3000";

async function photoForm(): Promise<FormData> {
  const form = new FormData();
  const bytes = await sharp({ create: { width: 20, height: 20, channels: 3, background: "#933" } })
    .png()
    .toBuffer();
  form.set("photoId", randomUUID());
  form.set("subject", "meter");
  form.set("file", new File([new Uint8Array(bytes)], "meter.png", { type: "image/png" }));
  return form;
}

async function call({ path, module, method }: Route, headers: Record<string, string>): Promise<Response> {
  const url = `${origin}${path.replace(/\[(\w+)\]/g, (_all, name: string) => ids[name] ?? "")}`;
  const isForm = method === "POST" && path.endsWith("/photos");
  const body = isForm ? await photoForm() : bodies[`${method} ${path}`];
  const request = new Request(url, {
    method,
    headers: {
      origin,
      "idempotency-key": randomUUID(),
      ...(body && !isForm ? { "content-type": "application/json" } : {}),
      ...headers,
    },
    ...(body ? { body: isForm ? (body as FormData) : JSON.stringify(body) } : {}),
  });
  const run = module[method];
  if (!run) throw new Error(`${path} has no ${method}`);
  return run(request, { params: Promise.resolve(ids) });
}

describe("the API", () => {
  it("has the routes it is known by", () => {
    expect(routes.length).toBeGreaterThanOrEqual(16);
    expect(withId.length).toBeGreaterThanOrEqual(10);
  });

  it.each(withId)("$method $path is not found for another firm", async (route) => {
    const response = await call(route, { cookie: cookies.stranger });
    expect(response.status).toBe(404);
    expect(response.headers.get("cache-control")).toContain("no-store");
  });

  it.each(routes.filter(({ path }) => !open.includes(path)))("$method $path asks to sign in", async (route) => {
    expect((await call(route, {})).status).toBe(401);
  });

  it.each(routes.filter(({ method }) => method !== "GET"))("$method $path refuses a foreign origin", async (route) => {
    const response = await call(route, { cookie: cookies.owner, origin: "https://elsewhere.example.com" });
    expect(response.status).toBe(403);
  });

  it.each(routes.filter(({ method }) => method !== "DELETE"))("$method $path answers its own firm", async (route) => {
    const response = await call(route, { cookie: cookies.owner });
    expect([200, 201]).toContain(response.status);
    expect(response.headers.get("x-content-type-options")).toBe("nosniff");
  });

  it("serves the sealed zip byte for byte under its hash", async () => {
    const route = routes.find(({ path }) => path.endsWith("/download"));
    const response = await call(route as Route, { cookie: cookies.owner });
    const { sha256 } = value(await getPack(owner, { packId: ids["packId"] ?? "" }));
    const digest = await crypto.subtle.digest("SHA-256", await response.arrayBuffer());
    expect(Buffer.from(digest).toString("hex")).toBe(sha256);
    expect(response.headers.get("content-disposition")).toMatch(/^attachment; filename="THR-\d+-pack-v1\.zip"$/);
  });

  it("asks for an Idempotency-Key, and answers a conflict with 409 and both values", async () => {
    const jobs = routes.find(({ path, method }) => path === "/api/v1/jobs" && method === "POST") as Route;
    expect((await call(jobs, { cookie: cookies.owner, "idempotency-key": "" })).status).toBe(400);
    const jobId = await openJob(owner, exampleRecord());
    const saves = routes.find(({ path }) => path.endsWith("/saves")) as Route;
    const send = (to: number) =>
      (saves.module["POST"] as Handler)(
        new Request(`${origin}/api/v1/jobs/${jobId}/saves`, {
          method: "POST",
          headers: { origin, cookie: cookies.owner, "content-type": "application/json" },
          body: JSON.stringify({
            saveId: randomUUID(),
            baseVersion: 1,
            changes: [{ path: "supply.cutOutRatingA", was: 100, value: to }],
          }),
        }),
        { params: Promise.resolve({ jobId }) },
      );
    expect((await send(80)).status).toBe(200);
    const late = await send(60);
    expect(late.status).toBe(409);
    expect(await late.json()).toMatchObject({ saved: false, conflicts: [{ yours: 60, theirs: 80 }] });
    const wrong = await send(-5);
    expect(wrong.status).toBe(409); // still behind: the conflict is told first
  });
});
