import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import JSZip from "jszip";
import mammoth from "mammoth";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { desk, expectNoAxeViolations, launch, phone, signIn } from "../support/browser";

/**
 * The demo of the foundation, against the production build: the installer finishes the half-done job on a phone and
 * seals it, the admin sends it and records the answer, the compliance lead approves its settings.
 */
describe("a job from the drive to a reviewed pack", () => {
  let browser: Browser;
  let jobPath = "";
  const photo = "db/seed/photos/cut-out.jpg";

  beforeAll(async () => {
    browser = await launch();
  });
  afterAll(() => browser.close());

  const change = async (page: Page, label: string, value: string) => {
    const field = page.getByLabel(label, { exact: true });
    await field.fill(value);
    await field.blur();
  };

  /** Every answer has left the phone. */
  const saved = (page: Page) =>
    expect.poll(() => page.locator(".site__saved").first().innerText(), { timeout: 15_000 }).toMatch(/^Saved/);

  it("is finished and sealed by the installer on a 360 x 740 screen", async () => {
    const { context, page } = await signIn(browser, "tam@fenwold.example.com", phone);
    await expectNoAxeViolations(page);
    await page
      .getByRole("link", { name: /5 Bell Yard/ })
      .first()
      .click();
    await page.waitForURL(/\/jobs\/[0-9a-f-]{36}/);
    jobPath = `/jobs/${page.url().match(/jobs\/([0-9a-f-]{36})/)?.[1]}`;

    await page.goto(`${jobPath}/check`);
    await expect.poll(() => page.getByRole("heading", { level: 2 }).first().innerText()).toMatch(/blocks? sealing/);
    await expectNoAxeViolations(page);
    const seal = page.getByRole("button", { name: "Seal version 1" });
    expect(await seal.getAttribute("aria-disabled")).toBe("true");

    await page.goto(`${jobPath}/photos`);
    await page.getByLabel("Take Service head", { exact: false }).first().setInputFiles(photo);
    await expect.poll(() => page.locator("img[alt='Service head']").count(), { timeout: 20_000 }).toBe(1);
    await expectNoAxeViolations(page);

    await page.goto(`${jobPath}/check`);
    await page
      .getByRole("link", { name: /^Add.*telephone/ })
      .first()
      .click();
    await page.waitForURL(/record\/people/);
    await change(page, "Customer’s telephone", "07700 900152");
    await saved(page);
    await expectNoAxeViolations(page);
    await page.getByRole("button", { name: "Save, back to the check" }).click();
    await page.waitForURL(/check/);

    await page.goto(`${jobPath}/record/circuit?screen=tests-1&from=check`);
    await change(page, "Zs at the unit", "0.36");
    await saved(page);
    await page.getByRole("button", { name: "Save, back to the check" }).click();

    await page.waitForURL(/check/);
    await expect.poll(() => page.getByText("Nothing blocks sealing").count()).toBe(1);
    await page.getByLabel("I declare this as the competent person").check();
    await page.getByRole("button", { name: "Seal version 1" }).click();
    await page.waitForURL(/pack/);
    await page.getByRole("heading", { name: "Sealed, version 1" }).waitFor({ timeout: 30_000 });
    await expectNoAxeViolations(page);

    const [download] = await Promise.all([
      page.waitForEvent("download"),
      page
        .getByRole("link", { name: /^Download/ })
        .first()
        .click(),
    ]);
    const zip = await JSZip.loadAsync(await readFile(await download.path()));
    const sums = await zip.file("SHA256SUMS")?.async("string");
    expect(sums).toBeTruthy();
    for (const line of sums?.trim().split("\n") ?? []) {
      const [hash, name] = line.split("  ");
      const bytes = await zip.file(name ?? "")?.async("uint8array");
      expect(
        createHash("sha256")
          .update(bytes ?? "")
          .digest("hex"),
        name,
      ).toBe(hash);
    }
    const documents = Object.keys(zip.files).filter((name) => name.endsWith(".docx"));
    expect(documents.map((name) => name.slice(0, 2))).toEqual(expect.arrayContaining(["00", "01", "02", "03"]));
    for (const name of documents) {
      const buffer = await zip.file(name)?.async("nodebuffer");
      const { value } = await mammoth.extractRawText({ buffer: buffer as Buffer });
      expect(value, name).toContain("5 Bell Yard");
      expect(value, name).not.toMatch(/undefined|\bnull\b|NaN|\[object/);
    }
    await context.close();
  });

  it("is marked as sent and acknowledged by the admin", async () => {
    const { context, page } = await signIn(browser, "nia@fenwold.example.com", desk);
    await expectNoAxeViolations(page);
    await page.goto(`${jobPath}/submission`);
    await page.getByRole("button", { name: "Sent another way" }).click();
    await page.getByLabel("How it was sent").selectOption({ label: "E-mail" });
    await page.getByLabel("Sent to").fill("notices@northernpowergrid.example.com");
    await page.getByRole("button", { name: "Record as sent" }).click();
    await page.getByRole("button", { name: "Record a reply" }).click();
    await page.getByLabel("What happened").selectOption("acknowledged");
    await page.getByLabel(/Operator’s reference/).fill("NP-55152");
    await page
      .getByRole("button", { name: /^Record/ })
      .last()
      .click();
    await expect.poll(() => page.getByText("NP-55152").count()).toBeGreaterThan(0);
    await expectNoAxeViolations(page);
    await context.close();
  });

  it("is approved by the compliance lead", async () => {
    const { context, page } = await signIn(browser, "edda@fenwold.example.com", desk);
    await page.goto("/reviews");
    await expectNoAxeViolations(page);
    await page.getByRole("link", { name: /5 Bell Yard/ }).click();
    await page.getByRole("heading", { level: 1, name: /5 Bell Yard/ }).waitFor();
    await expectNoAxeViolations(page);
    await page.getByLabel("Your note, kept with the decision").fill("Judged on the maker’s statement of June 2026.");
    await page.getByRole("button", { name: "Approve" }).click();
    await page.goto(`${jobPath}/review`);
    await expect.poll(() => page.getByText(/[Aa]pproved/).count()).toBeGreaterThan(0);
    await context.close();
  });
});
