import { AxeBuilder } from "@axe-core/playwright";
import { chromium, type Browser, type BrowserContext, type Page } from "playwright-core";
import { expect, inject } from "vitest";

export const password = "copper-wire-seal-7";
export const phone = { width: 360, height: 740 };
export const desk = { width: 1440, height: 900 };

/** Debian's Chromium, with its calls to the outside switched off. */
export const launch = (): Promise<Browser> =>
  chromium.launch({
    executablePath: "/usr/bin/chromium",
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
  });

/** Signs a person in on a fresh context and returns their page, standing on today. */
export async function signIn(
  browser: Browser,
  email: string,
  viewport: { width: number; height: number },
): Promise<{ context: BrowserContext; page: Page }> {
  const context = await browser.newContext({ viewport, baseURL: inject("origin"), locale: "en-GB" });
  const page = await context.newPage();
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => url.pathname === "/");
  return { context, page };
}

/** axe-core 4.13 over WCAG 2.0 to 2.2, A and AA, with target-size: no violations. */
export async function expectNoAxeViolations(page: Page): Promise<void> {
  // A page that refreshes itself after an act is without its title for a moment.
  await expect.poll(() => page.title(), { timeout: 5_000 }).not.toBe("");
  const { violations } = await new AxeBuilder({ page })
    .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
    .options({ rules: { "target-size": { enabled: true } } })
    .analyze();
  const told = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(" ")).join(" | ")}`);
  expect(told, page.url()).toEqual([]);
}
