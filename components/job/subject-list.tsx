import type { Route } from "next";
import Link from "next/link";
import { Stitch, type StitchState } from "@/components/ui/stitch";
import { counted } from "@/components/ui/counted";
import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import { type Subject, subjects } from "./questions/model";
import { recordAddress, subjectName } from "./questions/screens";
import { standingOfSubject, type SubjectStanding } from "./stops";
import { type Wire, WireBeside } from "./wire";

type Props = {
  jobId: string;
  record: Job;
  missing: AssessmentSummary["missing"];
  photos: { taken: number };
  current?: Subject;
};

/** The eight subjects in walking order, threaded as far as nothing is missing. */
export function SubjectList({ jobId, record, missing, photos, current }: Props) {
  const rows = rowsOf(record, missing, photos);
  return (
    <ol className="subjects">
      {rows.map(({ subject, words, stitch, wire }) => (
        <li key={subject}>
          <WireBeside wire={wire} at={24} />
          <Stitch state={stitch} />
          <Link href={recordAddress(jobId, subject) as Route} aria-current={subject === current ? "page" : undefined}>
            <b>{subjectName[subject]}</b>
            <span>{words}</span>
          </Link>
        </li>
      ))}
    </ol>
  );
}

function rowsOf(record: Job, missing: Props["missing"], photos: Props["photos"]) {
  let open = false;
  return subjects.map((subject): { subject: Subject; words: string; stitch: StitchState; wire: Wire } => {
    const standing = standingOfSubject(subject, record, missing);
    const done =
      subject === "photos"
        ? photos.taken > 0 && standing.missing === 0
        : standing.missing === 0 && standing.answered > 0;
    const words = subject === "photos" ? photoWords(photos.taken, standing.missing) : factWords(standing);
    if (open) return { subject, words, stitch: done ? "past-a-gap" : "not-yet", wire: "ahead" };
    if (done) return { subject, words, stitch: "answered", wire: "whole" };
    open = true;
    return { subject, words, stitch: "in-hand", wire: "to-here" };
  });
}

const photoWords = (taken: number, missing: number) =>
  `${counted(taken, "photo")} taken${missing ? `, ${missing} missing` : ""}`;

function factWords({ asked, answered, notKnown, missing }: SubjectStanding): string {
  if (asked === 0) return "Nothing added yet";
  const parts = [`${answered} of ${asked} answered`];
  if (notKnown) parts.push(`${notKnown} not known`);
  if (missing) parts.push(`${missing} missing`);
  return parts.join(", ");
}
