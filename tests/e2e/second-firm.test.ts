import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import type { APIRequestContext, Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { desk, launch, signIn } from "../support/browser";

/** Every file of the app that answers an address, with its address; route groups in brackets are no part of it. */
function addresses(folder = "app", at = ""): { address: string; file: string }[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return addresses(path, entry.name.startsWith("(") ? at : `${at}/${entry.name}`);
    return entry.name === "page.tsx" || entry.name === "route.ts" ? [{ address: at || "/", file: path }] : [];
  });
}

const ofAFirm = ["jobId", "packId", "photoId", "submissionId", "reviewId"] as const;
type Id = (typeof ofAFirm)[number];

const named = addresses().filter(({ address }) => ofAFirm.some((id) => address.includes(`[${id}]`)));

const nobody: Record<Id, string> = Object.fromEntries(
  ofAFirm.map((id) => [id, "00000000-0000-4000-8000-000000000000"]),
) as Record<Id, string>;

const filled = (address: string, ids: Record<Id, string>) =>
  ofAFirm.reduce((whole, id) => whole.replace(`[${id}]`, ids[id]), address).replace("[subject]", "intake");

const methodsOf = (file: string) =>
  file.endsWith("page.tsx")
    ? ["GET"]
    : [...readFileSync(file, "utf8").matchAll(/export const (GET|POST|PUT|PATCH|DELETE)\b/g)].map(
        ([, method]) => method as string,
      );

// Our own rule: another firm's things are not there, whatever the address or the method.
describe("the second firm", () => {
  let browser: Browser;
  let first: APIRequestContext;
  let second: APIRequestContext;
  let ids: Record<Id, string>;

  beforeAll(async () => {
    browser = await launch();
    const ours = await signIn(browser, "nia@fenwold.example.com", desk);
    const theirs = await signIn(browser, "pim@larkmoor.example.com", desk);
    first = ours.context.request;
    second = theirs.context.request;
    const jobs = await (await first.get("/api/v1/jobs?q=FEN-0147")).json();
    const jobId: string = jobs.rows[0].id;
    const job = await (await first.get(`/api/v1/jobs/${jobId}`)).json();
    const papers = await (await first.get("/api/v1/submissions?tab=all&q=FEN-0147")).json();
    await ours.page.goto(`/jobs/${jobId}/review`);
    const reviews = await (await first.get("/reviews")).text();
    ids = {
      jobId,
      photoId: job.photos[0].id,
      submissionId: papers.rows[0].id,
      packId: papers.rows[0].packId,
      reviewId: reviews.match(/\/reviews\/([0-9a-f-]{36})/)?.[1] ?? "",
    };
  });
  afterAll(() => browser.close());

  const ask = (who: APIRequestContext, method: string, address: string) =>
    who.fetch(address, {
      method,
      maxRedirects: 0,
      headers: { origin: inject("origin"), ...(method === "GET" ? {} : { "content-type": "application/json" }) },
      ...(method === "GET" || method === "DELETE" ? {} : { data: "{}" }),
    });

  it("has something to be kept from", () => {
    expect(named.length).toBeGreaterThan(15);
    for (const id of ofAFirm) expect(ids[id], id).toMatch(/^[0-9a-f-]{36}$/);
  });

  it.each(named)("finds nothing at $address", async ({ address, file }) => {
    for (const method of methodsOf(file)) {
      const answer = await ask(second, method, filled(address, ids));
      const ofNobody = await ask(second, method, filled(address, nobody));
      expect(answer.status(), `${method} ${address}`).toBe(ofNobody.status());
      if (method === "GET") {
        expect(answer.status(), `GET ${address}`).toBe(404);
        expect((await ask(first, method, filled(address, ids))).status(), `the first firm's own ${address}`).toBe(200);
      } else expect([404, 400, 415, 422], `${method} ${address}`).toContain(answer.status());
      expect(await answer.text()).not.toContain("Ropewalk");
    }
  });

  it("sees none of the first firm's rows in any list", async () => {
    for (const address of [
      "/",
      "/jobs",
      "/submissions?tab=all",
      "/reviews",
      "/team",
      "/activity",
      "/api/v1/jobs",
      "/api/v1/submissions?tab=all",
      "/api/v1/submissions/export",
      "/api/v1/counts",
    ]) {
      const answer = await second.get(address);
      expect(answer.status(), address).toBe(200);
      expect(await answer.text(), address).not.toMatch(/FEN-|Fenwold|Ropewalk/);
    }
  });

  it("cannot copy the first firm's job", async () => {
    const answer = await second.get(`/jobs/new?copy=${ids.jobId}`);
    expect(await answer.text()).not.toContain("Ropewalk");
  });

  it("is sent to the sign-in when nobody is signed in", async () => {
    const context = await browser.newContext({ baseURL: inject("origin") });
    for (const { address, file } of named) {
      const answer = await context.request.get(filled(address, ids), { maxRedirects: 0 });
      expect(file.endsWith("page.tsx") ? [307, 303] : [401, 405], address).toContain(answer.status());
    }
    await context.close();
  });
});
