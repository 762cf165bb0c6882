import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { desk, expectNoAxeViolations, launch, phone, signIn } from "../support/browser";

const open = ["/sign-in", "/forgotten", "/verify", "/nothing-here"];
const ofTheFirm = [
  "/",
  "/jobs",
  "/jobs/new",
  "/submissions",
  "/reviews",
  "/operators",
  "/rules",
  "/activity",
  "/account",
];
const people = [
  { who: "tam@fenwold.example.com", viewport: phone, own: ["/operators/10"] },
  { who: "nia@fenwold.example.com", viewport: desk, own: ["/operators/10", "/team"] },
  { who: "edda@fenwold.example.com", viewport: desk, own: [] },
  { who: "sole@fenwold.example.com", viewport: phone, own: ["/team"] },
];

const ofAJob = ["", "/check", "/assessment", "/pack", "/photos", "/submission", "/review"];
const subjects = ["intake", "demand", "chargepoint", "circuit", "earthing", "settings", "people"];
const told = ["/check", "/assessment"];
/** A notice in full; of a danger, an application ahead, one barely begun and one of two-way power what differs. */
const jobs = [
  { number: "FEN-0147", viewport: phone, parts: [...ofAJob, ...subjects.map((subject) => `/record/${subject}`)] },
  { number: "FEN-0147", viewport: desk, parts: [...ofAJob, "/record/intake", "/record/settings"] },
  { number: "FEN-0153", viewport: phone, parts: told },
  { number: "FEN-0153", viewport: desk, parts: ["/assessment", "/pack"] },
  { number: "FEN-0125", viewport: desk, parts: ["/assessment", "/submission"] },
  { number: "FEN-0155", viewport: phone, parts: ["", ...told, "/photos"] },
  { number: "FEN-0151", viewport: desk, parts: told },
];

/** Next's own word for a page that is not there is no fault of the page. */
const isExpected = (message: string) => /status of 404/.test(message);

// axe-core 4.13 (WCAG 2.0 to 2.2, A and AA, target-size); reflow at 320 px: WCAG 2.2, 1.4.10.
describe("every page", () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await launch();
  });
  afterAll(() => browser.close());

  async function inspect(page: Page, address: string) {
    const faults: string[] = [];
    const listen = (message: { type(): string; text(): string }) => {
      if (message.type() === "error" && !isExpected(message.text())) faults.push(message.text());
    };
    page.on("console", listen);
    await page.goto(address, { waitUntil: "load" });
    await page.locator("h1:visible").first().waitFor({ timeout: 15_000 });
    await expectNoAxeViolations(page);
    page.off("console", listen);
    expect(faults, address).toEqual([]);
  }

  async function reflows(page: Page, address: string) {
    await page.setViewportSize({ width: 320, height: 740 });
    const beyond = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(beyond, `${address} scrolls sideways at 320 px`).toBe(0);
    await page.setViewportSize(phone);
  }

  async function inspectAll(page: Page, addresses: readonly string[], viewport: typeof phone) {
    for (const address of addresses) {
      await inspect(page, address);
      if (viewport === phone) await reflows(page, address);
    }
  }

  it.each([desk, phone])("that anybody may open, at $width px", async (viewport) => {
    const context = await browser.newContext({ viewport, baseURL: inject("origin") });
    await inspectAll(await context.newPage(), open, viewport);
    await context.close();
  });

  it.each(people)("of the firm, for $who at $viewport.width px", async ({ who, own, viewport }) => {
    const { context, page } = await signIn(browser, who, viewport);
    await inspectAll(page, [...ofTheFirm, ...own], viewport);
    await context.close();
  });

  it.each(jobs)("of $number at $viewport.width px", async ({ number, viewport, parts }) => {
    const { context, page } = await signIn(browser, "sole@fenwold.example.com", viewport);
    const { rows } = await (await context.request.get(`/api/v1/jobs?q=${number}`)).json();
    await inspectAll(
      page,
      parts.map((part) => `/jobs/${rows[0].id}${part}`),
      viewport,
    );
    await context.close();
  });
});
