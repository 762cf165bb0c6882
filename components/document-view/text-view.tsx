import { outcomeMark } from "@/templates/drawings/marks";
import type { Outcome } from "@/lib/notify/result";
import type { Span, Text } from "@/templates/model";
import styles from "./document-view.module.css";

/** The outcome's shape; its word always follows, so the shape itself is not read aloud. */
export function Mark({ outcome }: { outcome: Outcome }) {
  return <span className={styles.mark} aria-hidden dangerouslySetInnerHTML={{ __html: outcomeMark(outcome) }} />;
}

function SpanView({ text, strong, mono, quiet, mark }: Span) {
  const Tag = strong ? "b" : "span";
  const names = [mono && "mono", quiet && "quiet", mark && styles.marked].filter(Boolean).join(" ");
  return (
    <Tag className={names || undefined}>
      {mark && <Mark outcome={mark} />}
      {text}
    </Tag>
  );
}

/** Inline text of a document, spans and all. */
export function TextView({ text }: { text: Text }) {
  if (typeof text === "string") return text;
  return text.map((span, index) => <SpanView key={index} {...span} />);
}
