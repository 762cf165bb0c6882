import { startCatcher } from "./catcher";
import { env } from "../env";
import { log } from "../log";

const kept = globalThis as typeof globalThis & { sealwireCatcher?: ReturnType<typeof startCatcher> };

/** Where mail is handed over: SMTP_URL, or in demo mode the catcher of this process, started at first use. */
export async function smtpAddress(): Promise<string> {
  const { SMTP_URL, demo, mailDir } = env();
  if (SMTP_URL) return SMTP_URL;
  if (!demo) throw new Error("SMTP_URL is not set and this is not a demo: no mail can be sent");
  if (!kept.sealwireCatcher) {
    kept.sealwireCatcher = startCatcher(mailDir);
    log.info({ folder: mailDir }, "mail is caught here and goes nowhere");
  }
  return (await kept.sealwireCatcher).url;
}

/** Stop the catcher, if one runs. */
export async function stopCatcher(): Promise<void> {
  const running = kept.sealwireCatcher;
  kept.sealwireCatcher = undefined;
  if (running) await (await running).stop();
}
