import type { Route } from "next";
import Link from "next/link";
import { OutcomeGlyph } from "@/components/ui/mark";
import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import { addressOf, labelOf } from "./questions/screens";

/** What this route still needs, each with the way to its field. */
export function MissingList({
  missing,
  record,
  jobId,
}: {
  missing: AssessmentSummary["missing"];
  record: Job;
  jobId: string;
}) {
  if (missing.length === 0) return <p className="quiet">Nothing is missing for this route.</p>;
  return (
    <ul className="missing">
      {missing.map(({ path, needed }) => (
        <li key={path}>
          <span className="missing__mark">
            <OutcomeGlyph outcome="cannot-tell" />
          </span>
          <span>{inSentence(needed)}</span>
          <Link href={addressOf(path, record, jobId) as Route}>
            Add<span className="vh">: {labelOf(path, record)}</span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** The rules name what is needed as part of a sentence; a line of its own begins with a capital. */
export const inSentence = (needed: string) => needed.charAt(0).toUpperCase() + needed.slice(1);
