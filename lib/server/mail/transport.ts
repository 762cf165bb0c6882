import { createTransport } from "nodemailer";

export type Mail = {
  messageId: string;
  from: string;
  to: string;
  replyTo: string | null;
  subject: string;
  body: string;
  attachments: { fileName: string; contentType: string; bytes: Uint8Array }[];
};

/**
 * What became of a hand-over.
 * `sent`: the server took it. `refused`: it never will. `later`: it did not take it now, nothing has gone.
 * `ambiguous`: the whole mail was on its way and no answer came back, so it may have gone.
 */
export type Handover = { outcome: "sent" } | { outcome: "refused" | "later" | "ambiguous"; because: string };

type SmtpError = Error & { code?: string; responseCode?: number; response?: string };

/** Nodemailer reports a lost connection alike at every stage; its transaction log shows whether DATA was begun. */
function dataWatch() {
  let begun = false;
  const note = (entry: { tnx?: string }, text?: unknown) => {
    if (entry.tnx === "client" && text === "DATA") begun = true;
  };
  const silent = () => undefined;
  const logger = { level: silent, trace: silent, debug: note, info: note, warn: silent, error: silent, fatal: silent };
  return { logger, begun: () => begun };
}

function meaningOf(error: SmtpError, dataBegun: boolean): Handover {
  const because = (error.response ?? error.message).replace(/\s+/g, " ").slice(0, 300);
  if (error.code === "EAUTH") return { outcome: "later", because: `Our mail server refused our sign-in: ${because}` };
  if (error.responseCode && error.responseCode >= 500) return { outcome: "refused", because };
  if (error.responseCode) return { outcome: "later", because };
  return { outcome: dataBegun ? "ambiguous" : "later", because };
}

/**
 * Hand one mail to the server at `smtpUrl`. Never throws for anything the server does; waits at most
 * `timeoutMs` for each of its answers.
 */
export async function handOver(smtpUrl: string, mail: Mail, timeoutMs = 20_000): Promise<Handover> {
  const watch = dataWatch();
  const transport = createTransport({
    url: smtpUrl,
    connectionTimeout: timeoutMs,
    greetingTimeout: timeoutMs,
    socketTimeout: timeoutMs,
    dnsTimeout: timeoutMs,
    transactionLog: true,
    logger: watch.logger as never,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  try {
    await transport.sendMail({
      messageId: mail.messageId,
      from: mail.from,
      to: mail.to,
      ...(mail.replyTo ? { replyTo: mail.replyTo } : {}),
      subject: mail.subject,
      text: mail.body,
      attachments: mail.attachments.map((one) => ({
        filename: one.fileName,
        contentType: one.contentType,
        content: Buffer.from(one.bytes),
      })),
    });
    return { outcome: "sent" };
  } catch (error) {
    return meaningOf(error as SmtpError, watch.begun());
  } finally {
    transport.close();
  }
}
