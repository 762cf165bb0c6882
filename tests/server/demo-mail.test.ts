import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { renderToStaticMarkup } from "react-dom/server";
import { afterAll, expect, it, vi } from "vitest";
import CaughtMailPage from "@/app/(public)/demo/mail/page";
import OneCaughtMailPage from "@/app/(public)/demo/mail/[mailId]/page";
import { caughtMails, startCatcher } from "@/lib/server/mail/catcher";
import { handOver } from "@/lib/server/mail/transport";

const state = vi.hoisted(() => ({ demo: true, mailDir: "" }));
vi.mock("@/lib/server/env", () => ({ env: () => state }));
state.mailDir = mkdtempSync(join(tmpdir(), "sealwire-demo-"));
afterAll(() => rmSync(state.mailDir, { recursive: true }));

const one = (mailId: string) =>
  OneCaughtMailPage({ params: Promise.resolve({ mailId }), searchParams: Promise.resolve({}) });

it("shows caught mail in a demo, with its markup as text, and nothing at all otherwise", async () => {
  const catcher = await startCatcher(state.mailDir);
  await handOver(catcher.url, {
    messageId: "<1@sealwire.example.com>",
    from: "Sealwire <sealwire@example.com>",
    to: "tam@fenwold.example.com",
    replyTo: null,
    subject: "Join <b>Fenwold</b>",
    body: "Open this:\nhttp://127.0.0.1:3000/invitation/x\n<script>alert(1)</script>",
    attachments: [],
  });
  await catcher.stop();
  expect(renderToStaticMarkup(await CaughtMailPage())).toContain("Join &lt;b&gt;Fenwold&lt;/b&gt;");
  const [mail] = await caughtMails(state.mailDir);
  const page = renderToStaticMarkup(await one(mail?.id ?? ""));
  expect(page).toContain('<a href="http://127.0.0.1:3000/invitation/x">');
  expect(page).not.toContain("<script>");
  await expect(one("../../etc/passwd")).rejects.toMatchObject({ digest: expect.stringContaining("404") });

  state.demo = false;
  await expect(CaughtMailPage()).rejects.toMatchObject({ digest: expect.stringContaining("404") });
  await expect(one(mail?.id ?? "")).rejects.toMatchObject({ digest: expect.stringContaining("404") });
});
