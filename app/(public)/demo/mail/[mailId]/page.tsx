import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { longMoment } from "@/components/ui/dates";
import styles from "../mail.module.css";
import { env } from "@/lib/server/env";
import { caughtMail } from "@/lib/server/mail/catcher";

export const metadata: Metadata = { title: "Caught mail", robots: { index: false, follow: false } };

const kb = (bytes: number) => `${Math.max(1, Math.round(bytes / 1024))} kB`;

/** The text of a mail, with its web addresses as links: a reset or an invitation is followed from here. */
function MailText({ text }: { text: string }) {
  return (
    <pre className={styles.text}>
      {text.split(/(https?:\/\/[^\s<>]+)/).map((part, index) =>
        index % 2 === 1 ? (
          <a key={index} href={part}>
            {part}
          </a>
        ) : (
          part
        ),
      )}
    </pre>
  );
}

/** One caught mail. Exists in demo mode only. */
export default async function OneCaughtMailPage({ params }: PageProps<"/demo/mail/[mailId]">) {
  const { demo, mailDir } = env();
  const mail = demo ? await caughtMail(mailDir, (await params).mailId) : null;
  if (!mail) notFound();
  return (
    <main id="main" className="plain-page">
      <h1>{mail.subject || "No subject"}</h1>
      <p>
        From {mail.from} to {mail.to}
        {mail.at ? `, ${longMoment(mail.at)}` : ""}
      </p>
      <MailText text={mail.text} />
      {mail.attachments.length > 0 && (
        <>
          <h2>Attached</h2>
          <ul>
            {mail.attachments.map((file) => (
              <li key={file.fileName} className="mono">
                {file.fileName}, {kb(file.bytes)}
              </li>
            ))}
          </ul>
        </>
      )}
      <p>
        <Link href="/demo/mail">All caught mail</Link>
      </p>
    </main>
  );
}
