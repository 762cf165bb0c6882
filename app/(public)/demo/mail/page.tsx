import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { longMoment } from "@/components/ui/dates";
import styles from "./mail.module.css";
import { env } from "@/lib/server/env";
import { caughtMails } from "@/lib/server/mail/catcher";

export const metadata: Metadata = { title: "Caught mail", robots: { index: false, follow: false } };

/** Every mail that the demo would have sent, newest first. Exists in demo mode only. */
export default async function CaughtMailPage() {
  const { demo, mailDir } = env();
  if (!demo) notFound();
  const mails = await caughtMails(mailDir);
  return (
    <main id="main" className="plain-page">
      <h1>Caught mail</h1>
      <p>This is a demo. Nothing here has left the machine; the newest hundred are listed.</p>
      {mails.length === 0 ? (
        <p>No mail yet. Ask for a new password, invite somebody, or send a notice.</p>
      ) : (
        <ul>
          {mails.map((mail) => (
            <li key={mail.id} className={styles.mail}>
              <Link href={`/demo/mail/${mail.id}`}>{mail.subject || "No subject"}</Link>
              <p>
                To {mail.to}
                {mail.at ? `, ${longMoment(mail.at)}` : ""}
                {mail.attachments.length > 0 ? `, ${mail.attachments.length} attached` : ""}
              </p>
            </li>
          ))}
        </ul>
      )}
    </main>
  );
}
