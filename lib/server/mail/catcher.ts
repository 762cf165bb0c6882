import { randomUUID } from "node:crypto";
import { mkdir, readFile, readdir, rename, writeFile } from "node:fs/promises";
import type { AddressInfo } from "node:net";
import { join } from "node:path";
import { simpleParser } from "mailparser";
import { SMTPServer } from "smtp-server";

/** A mail server for one machine: takes every mail, sends none on, keeps each as a file. */

const limitBytes = 40 * 1024 * 1024;

async function readMail(stream: AsyncIterable<Uint8Array>): Promise<Buffer> {
  const parts: Uint8Array[] = [];
  for await (const part of stream) parts.push(part);
  return Buffer.concat(parts);
}

async function keep(folder: string, raw: Buffer): Promise<void> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  // The name sorts by time of arrival; the file appears whole.
  const name = `${new Date().toISOString().replaceAll(/[:.]/g, "-")}-${randomUUID().slice(0, 8)}`;
  await writeFile(join(folder, `${name}.part`), raw, { mode: 0o600 });
  await rename(join(folder, `${name}.part`), join(folder, `${name}.eml`));
}

/** Start a catcher on a free loopback port. `url` is what a transport connects to. */
export async function startCatcher(folder: string): Promise<{ url: string; stop: () => Promise<void> }> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    size: limitBytes,
    logger: false,
    onData(stream, _session, done) {
      readMail(stream)
        .then((raw) => keep(folder, raw))
        .then(() => done(), done);
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.on("error", reject);
    server.listen(0, "127.0.0.1", () => resolve());
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

export type CaughtMail = {
  /** File name without its ending; what the page's address holds. */
  id: string;
  at: string | null;
  from: string;
  to: string;
  subject: string;
  messageId: string | null;
  text: string;
  attachments: { fileName: string; bytes: number }[];
};

const idPattern = /^[0-9TZ-]{24}-[0-9a-f]{8}$/;

async function parse(folder: string, id: string): Promise<CaughtMail> {
  const mail = await simpleParser(await readFile(join(folder, `${id}.eml`)), { skipHtmlToText: true });
  const to = Array.isArray(mail.to) ? mail.to.map((one) => one.text).join(", ") : (mail.to?.text ?? "");
  return {
    id,
    at: mail.date?.toISOString() ?? null,
    from: mail.from?.text ?? "",
    to,
    subject: mail.subject ?? "",
    messageId: mail.messageId ?? null,
    text: mail.text ?? "",
    attachments: mail.attachments.map((one) => ({ fileName: one.filename ?? "file", bytes: one.size })),
  };
}

/** The newest mails of the folder, newest first. */
export async function caughtMails(folder: string, most = 100): Promise<CaughtMail[]> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const ids = (await readdir(folder))
    .filter((name) => name.endsWith(".eml"))
    .map((name) => name.slice(0, -".eml".length))
    .filter((id) => idPattern.test(id));
  const newest = ids.sort().reverse().slice(0, most);
  return Promise.all(newest.map((id) => parse(folder, id)));
}

/** One caught mail, or null. */
export async function caughtMail(folder: string, id: string): Promise<CaughtMail | null> {
  if (!idPattern.test(id) || !(await readdir(folder)).includes(`${id}.eml`)) return null;
  return parse(folder, id);
}
