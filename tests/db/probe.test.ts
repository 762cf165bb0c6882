import { randomUUID } from "node:crypto";
import { Writable } from "node:stream";
import sharp from "sharp";
import { beforeAll, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { codeOf, colleague, connected, exampleRecord, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { POST as addPhotoRoute } from "@/app/api/v1/jobs/[jobId]/photos/route";
import { POST as saveRoute } from "@/app/api/v1/jobs/[jobId]/saves/route";
import { GET as jobsRoute, POST as openRoute } from "@/app/api/v1/jobs/route";
import { GET as photoRoute } from "@/app/api/v1/photos/[photoId]/route";
import { GET as submissionsRoute } from "@/app/api/v1/submissions/route";
import { csvCell } from "@/app/api/v1/submissions/export/csv";
import { cursorText, isDay, isInstant } from "@/db/keyset";
import { createJob, getJob, listJobs, saveJob } from "@/db/queries/jobs";
import { addPhoto, removePhoto } from "@/db/queries/photos";
import { approveReview, listReviews } from "@/db/queries/reviews";
import { asFirm } from "@/db/tenant";
import { events } from "@/db/schema";
import { ok } from "@/lib/notify/result";
import { publicAction } from "@/lib/server/actions";
import { startSession } from "@/lib/server/auth/lucia";
import { sessionCookieName } from "@/lib/server/auth/session-cookie";
import type { Viewer } from "@/lib/server/auth/viewer";
import { unfit } from "@/lib/server/fit-to-keep";
import { makeLog } from "@/lib/server/log";
import { isOwnOrigin } from "@/lib/server/same-origin";

/**
 * What somebody hostile would send, and what must come back: an answer, never a surprise. After OWASP ASVS 5.0,
 * chapters 1 (encoding), 2 (validation), 3.5 (origins), 5 (files), 8 (authorisation) and 16 (errors and logs).
 */
const origin = process.env["PUBLIC_ORIGIN"] ?? "http://127.0.0.1:3000";
const sent = vi.hoisted(() => ({ headers: new Headers() }));
vi.mock("next/headers", () => ({ headers: async () => sent.headers, cookies: async () => ({ get: () => undefined }) }));

let owner: Viewer;
let cookie: string;
let jobId: string;

beforeAll(async () => {
  owner = await soleTrader();
  cookie = `${sessionCookieName()}=${await startSession(owner.userId, "Test")}`;
  jobId = await openJob(owner);
});

const request = (path: string, init: RequestInit = {}, more: Record<string, string> = {}) =>
  new Request(`${origin}${path}`, { ...init, headers: { origin, cookie, ...more } });
const json = { "content-type": "application/json", "idempotency-key": randomUUID() };
const inJob = { params: Promise.resolve({ get jobId() { return jobId; } }) }; // prettier-ignore

const save = (text: string) =>
  saveRoute(
    request(
      `/api/v1/jobs/${jobId}/saves`,
      {
        method: "POST",
        body: `{"saveId":"${randomUUID()}","baseVersion":1,"changes":[{"path":"notes","was":null,"value":${text}}]}`,
      },
      json,
    ),
    inJob,
  );

async function picture(widthPx: number): Promise<Uint8Array<ArrayBuffer>> {
  const image = sharp({ create: { width: widthPx, height: 20, channels: 3, background: "#446" } });
  return new Uint8Array(await image.png().toBuffer());
}

describe("input that cannot be kept is refused before anything reads it", () => {
  it.each([
    ["a NUL", String.raw`"a\u0000b"`],
    ["half of a surrogate pair", String.raw`"a\ud800b"`],
    ["a NUL in a name", String.raw`{"a\u0000":1}`],
    ["nesting without end", "[".repeat(200_000) + "]".repeat(200_000)],
    ["more values than a record holds", `[${"0,".repeat(200_000)}0]`],
  ])("in a save: %s", async (_what, text) => {
    const response = await save(text);
    expect([response.status, ((await response.json()) as { error: { code: string } }).error.code]).toEqual([
      422,
      "invalid",
    ]);
  });

  it("in a new job, however deep", async () => {
    const deep = `${'{"a":'.repeat(3_000)}1${"}".repeat(3_000)}`;
    const body = `{"id":"${randomUUID()}","record":{"stage":"planned","x":${deep}}}`;
    expect((await openRoute(request("/api/v1/jobs", { method: "POST", body }, json))).status).toBe(422);
  });

  it("but not text of any script, a whole pair, or files", () => {
    expect(unfit({ a: ["Ŵyn 🔌 \u202e ]]>"], file: new File(["x"], "a\u0000.png"), at: null })).toBeNull();
    expect(unfit({ a: [{ b: "x\u0000" }] })?.path).toBe("a[0].b");
  });

  const id = randomUUID();
  it.each([
    ["a day that is not in the calendar", `?after=${cursorText({ key: "2026-02-30", id })}`],
    ["the year nought", `?after=${cursorText({ key: "0000-01-01", id })}`],
    ["an instant that is none", `?sort=updated&after=${cursorText({ key: "2026-99-99T99:99:99Z", id })}`],
    ["a NUL in a cursor", `?sort=number&after=${cursorText({ key: "a\u0000", id })}`],
  ])("a cursor with %s starts the list at its head", async (_what, query) => {
    const response = await jobsRoute(request(`/api/v1/jobs${query}`));
    expect(response.status).toBe(200);
    expect(((await response.json()) as { rows: unknown[] }).rows.length).toBeGreaterThan(0);
  });

  it("knows a day and an instant of its own", () => {
    expect(["2026-12-01", "2024-02-29", "2026-02-29", "99999-01-01"].map(isDay)).toEqual([true, true, false, false]);
    expect(["2026-12-01T10:00:00.000Z", "2026-12-01T10:00:00Z"].map(isInstant)).toEqual([true, false]);
  });

  it("filters with a NUL are a bad request in the API and match nothing from a page", async () => {
    expect((await jobsRoute(request("/api/v1/jobs?q=%00"))).status).toBe(400);
    expect((await submissionsRoute(request("/api/v1/submissions?operatorId=%00"))).status).toBe(400);
    const filter = {
      stage: null,
      standing: null,
      route: null,
      installerId: null,
      sort: "number",
      after: null,
    } as const;
    const found = value(await listJobs(owner, { ...filter, q: null, operatorId: "\u0000" }));
    expect(found.rows).toEqual([]);
    expect(codeOf(await listJobs(owner, { ...filter, q: "a\u0000", operatorId: null }))).toBe("ok");
  });
});

describe("acts ask for the Origin that browsers send (ASVS 5.0 3.5)", () => {
  const run = vi.fn(async () => ok(1));
  const act = publicAction(z.object({ note: z.string() }), run);
  const host = new URL(origin).host;

  it.each([
    ["none", {}],
    ["null", { origin: "null" }],
    ["another port", { origin: "http://127.0.0.1:1" }],
    ["another site, said by the browser", { origin, "sec-fetch-site": "same-site" }],
  ])("refuses %s", async (_what, headers) => {
    sent.headers = new Headers({ host, ...headers } as Record<string, string>);
    expect((await act({ note: "x" })).status).toBe("failed");
    expect(run).not.toHaveBeenCalled();
  });

  it("refuses a plain-http page of the host when the public address is https", () => {
    const from = (scheme: string) => new Headers({ host: "app.example.com", origin: `${scheme}://app.example.com` });
    expect(isOwnOrigin(from("http"), "https://app.example.com")).toBe(false);
    expect(isOwnOrigin(from("https"), "https://app.example.com")).toBe(true);
  });

  it("takes our own, but no text that cannot be kept", async () => {
    sent.headers = new Headers({ host, origin });
    expect(await act({ note: "a\u0000" })).toMatchObject({ status: "failed", fields: [{ path: "note" }] });
    expect(await act({ note: "x" })).toEqual({ status: "done", value: 1 });
  });
});

describe("photos", () => {
  const upload = (body: BodyInit, headers: Record<string, string> = {}) =>
    addPhotoRoute(request(`/api/v1/jobs/${jobId}/photos`, { method: "POST", body }, headers), inJob);

  it("a form cut short is a bad request", async () => {
    expect((await upload("--x\r\ngarbage", { "content-type": "multipart/form-data; boundary=x" })).status).toBe(400);
    expect((await upload("x", { "content-type": "multipart/form-data" })).status).toBe(400);
  });

  it("a caption with a NUL is refused", async () => {
    const form = new FormData();
    form.set("photoId", randomUUID());
    form.set("subject", "meter");
    form.set("caption", "a\u0000b");
    form.set("file", new File([await picture(20)], "meter.png"));
    expect((await upload(form)).status).toBe(422);
  });

  it("two ids that begin alike do not share a file name, nor end in a surprise", async () => {
    const photo = { jobId, subject: "meter", of: null, caption: null } as const;
    const first = randomUUID();
    const second = `${first.slice(0, 8)}${randomUUID().slice(8)}`;
    value(await addPhoto(owner, { ...photo, photoId: first, bytes: await picture(21) }));
    expect(codeOf(await addPhoto(owner, { ...photo, photoId: second, bytes: await picture(22) }))).toBe("key-reused");
  });

  it("two people taking out one photo do it once", async () => {
    const photo = { jobId, photoId: randomUUID(), subject: "meter", of: null, caption: null } as const;
    const { id: photoId } = value(await addPhoto(owner, { ...photo, bytes: await picture(23) }));
    const both = await Promise.all([removePhoto(owner, { photoId }), removePhoto(owner, { photoId })]);
    expect(both.map(codeOf).sort()).toEqual(["not-found", "ok"]);
  });

  it("are kept by the browser for this session only", async () => {
    const photo = { jobId, photoId: randomUUID(), subject: "meter", of: null, caption: null } as const;
    const { id: photoId } = value(await addPhoto(owner, { ...photo, bytes: await picture(24) }));
    const response = await photoRoute(request(`/api/v1/photos/${photoId}`), { params: Promise.resolve({ photoId }) });
    expect([response.headers.get("cache-control"), response.headers.get("vary")]).toEqual([
      "private, max-age=86400, immutable",
      "Cookie",
    ]);
  });

  it("the list of evidence is written by adding photos and in no other way", async () => {
    const listed = { subject: "meter", of: null, file: "never-taken.jpg", caption: null, takenAt: null };
    const { version: baseVersion } = value(await getJob(owner, { jobId }));
    const changes = [{ path: "evidence", was: [], value: [listed] }];
    expect(codeOf(await saveJob(owner, { jobId, saveId: randomUUID(), baseVersion, changes }))).toBe("invalid");
    const record = { ...exampleRecord(), evidence: [listed] };
    expect(codeOf(await createJob(owner, { id: randomUUID(), saveId: randomUUID(), record }))).toBe("invalid");
  });
});

describe("what goes out", () => {
  it("a cell cannot break in two where lists are parted by semicolons or tabs", () => {
    expect(["a;=cmd|' /C calc'!A0", "a\t=1+1", "=1", "plain"].map(csvCell)).toEqual([
      `"a;=cmd|' /C calc'!A0"`,
      '"a\t=1+1"',
      "'=1",
      "plain",
    ]);
  });

  it("a failed statement tells no values, neither in the log nor when printed whole", async () => {
    const secret = "Mrs Harkaway, 4 Ropewalk Lane";
    const failing = asFirm(owner, (tx) =>
      tx.insert(events).values({
        firmId: owner.firmId,
        id: randomUUID(),
        actorId: null,
        actorName: secret,
        type: "x",
        jobId: null,
        payload: { wrong: `${secret}\u0000` },
      }),
    );
    const error: unknown = await failing.then(() => null, (caught: unknown) => caught); // prettier-ignore
    expect(error).toBeInstanceOf(Error);
    const { inspect } = await import("node:util");
    expect(inspect(error, { depth: 9 })).not.toContain("Harkaway");
    expect(inspect(error, { depth: 9 })).toContain("22P05");
    let written = "";
    makeLog("error", new Writable({ write: (chunk, _as, done) => ((written += String(chunk)), done()) })).error({
      err: error,
    });
    expect(written).toContain("22P05");
    expect(written).not.toContain("Harkaway");
  });
});

describe("who may", () => {
  it("an installer may not sign off what they sealed", async () => {
    const firm = await soleTrader();
    await sealAndBuild(firm, await openJob(firm));
    const [review] = value(await listReviews(firm, { state: "waiting", after: null })).rows;
    const decision = { reviewId: review?.id ?? "", version: 1, note: null };
    expect(codeOf(await approveReview(await colleague(firm, ["installer"]), decision))).toBe("forbidden");
    expect(codeOf(await approveReview(await colleague(firm, ["admin"]), decision))).toBe("forbidden");
    expect(codeOf(await approveReview(owner, decision))).toBe("not-found");
  });

  it("the program's role sees no firm's rows without a firm, and may neither truncate nor make tables", async () => {
    await connected("app", async (client) => {
      const tables = await client.query<{ relname: string }>(
        "select relname from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' and relrowsecurity",
      );
      expect(tables.rows.length).toBeGreaterThanOrEqual(14);
      for (const { relname } of tables.rows) {
        expect((await client.query(`select count(*)::int as rows from "${relname}"`)).rows).toEqual([{ rows: 0 }]);
        await expect(client.query(`truncate "${relname}"`)).rejects.toMatchObject({ code: "42501" });
      }
      await expect(client.query("create table public.mine (x int)")).rejects.toMatchObject({ code: "42501" });
      await expect(client.query("set role sealwire_owner")).rejects.toMatchObject({ code: "42501" });
      await expect(client.query("alter table events disable trigger all")).rejects.toMatchObject({ code: "42501" });
    });
  });
});
