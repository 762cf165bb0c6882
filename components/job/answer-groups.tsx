import type { Route } from "next";
import Link from "next/link";
import { factAt } from "@/components/drafts/facts-at";
import { photoName } from "@/components/photos/subject-words";
import { counted } from "@/components/ui/counted";
import { OutcomeGlyph } from "@/components/ui/mark";
import { Stitch } from "@/components/ui/stitch";
import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import { answerText, isMono, standingOf } from "./answer-text";
import { type Subject, subjects } from "./questions/model";
import { type AskedQuestion, placeOf, recordAddress, type Screen, screensOf, subjectName } from "./questions/screens";
import { WireBeside } from "./wire";

type Props = {
  jobId: string;
  record: Job;
  missing: AssessmentSummary["missing"];
  mayWrite: boolean;
  photos: { taken: number; needed: readonly { subject: string; of: string | null; have: boolean }[] };
};

/** Every answer, a group a subject, with one way back to each; the wire stops at the first subject that blocks. */
export function AnswerGroups({ jobId, record, missing, mayWrite, photos }: Props) {
  const blocked = new Set(missing.map(({ path }) => placeOf(path, record)?.subject));
  const firstBlock = subjects.findIndex((subject) => blocked.has(subject));
  return subjects.map((subject, index) => {
    const isPast = firstBlock >= 0 && index > firstBlock;
    const stitch = blocked.has(subject) ? (isPast ? "past-a-gap" : "not-known") : isPast ? "past-a-gap" : "answered";
    return (
      <section key={subject} className="answers" aria-labelledby={`answers-${subject}`}>
        <WireBeside wire={isPast ? "ahead" : blocked.has(subject) ? "to-here" : "whole"} at={24} />
        <Stitch state={stitch} />
        <div className="answers__head">
          <h2 id={`answers-${subject}`}>{subjectName[subject]}</h2>
          {mayWrite && (
            <Link href={`${recordAddress(jobId, subject)}?from=check` as Route}>
              Change<span className="vh"> {subjectName[subject].toLowerCase()}</span>
            </Link>
          )}
        </div>
        {subject === "photos" ? (
          <PhotoAnswers {...photos} />
        ) : (
          <SubjectAnswers subject={subject} record={record} missing={missing} />
        )}
      </section>
    );
  });
}

function SubjectAnswers({ subject, record, missing }: { subject: Subject; record: Job; missing: Props["missing"] }) {
  const screens = screensOf(subject, record);
  const rest = screens
    .filter(({ more }) => more)
    .map((screen) => ({
      ...screen,
      questions: screen.questions.filter(({ at }) => standingOf(factAt(record, at)) !== "not-yet"),
    }));
  const count = rest.reduce((sum, { questions }) => sum + questions.length, 0);
  return (
    <>
      {screens.length === 0 && <p className="quiet">Nothing added yet</p>}
      {screens
        .filter(({ more }) => !more)
        .map((screen) => (
          <ScreenAnswers key={screen.key} screen={screen} record={record} missing={missing} />
        ))}
      {count > 0 && (
        <details className="answers__more">
          <summary>{counted(count, "more fact")} recorded</summary>
          {rest.map((screen) => (
            <ScreenAnswers key={screen.key} screen={screen} record={record} missing={missing} />
          ))}
        </details>
      )}
    </>
  );
}

type ScreenProps = { screen: Screen; record: Job; missing: Props["missing"] };

function ScreenAnswers({ screen, record, missing }: ScreenProps) {
  if (screen.questions.length === 0) return null;
  return (
    <>
      {screen.item && screen.item.of > 1 && <h3>{itemName(screen)}</h3>}
      <dl>
        {screen.questions.map((question) => (
          <AnswerRow key={question.at} question={question} record={record} missing={missing} />
        ))}
      </dl>
    </>
  );
}

const itemName = ({ item, title }: Screen) =>
  item && item.of > 1 ? `${title}, ${item.index + 1} of ${item.of}` : title;

function AnswerRow({ question, record, missing }: { question: AskedQuestion; record: Job; missing: Props["missing"] }) {
  const value = factAt(record, question.at);
  const blocks = missing.some(({ path }) => placeOf(path, record)?.at === question.at);
  const words = answerText(question, value);
  const skipped = standingOf(value) === "not-yet";
  return (
    <div className={blocks ? "is-blocking" : skipped ? "is-skipped" : undefined}>
      <dt>{question.short ?? question.label}</dt>
      <dd>
        {blocks && <OutcomeGlyph outcome="cannot-tell" size={20} />}
        {isMono(question, value) ? <span className="mono">{words}</span> : words}
      </dd>
    </div>
  );
}

function PhotoAnswers({ taken, needed }: Props["photos"]) {
  const lacking = needed.filter((photo) => !photo.have);
  return (
    <dl>
      <div>
        <dt>Taken</dt>
        <dd>
          {taken}
          {needed.length ? `, ${needed.length - lacking.length} of the ${needed.length} on the list` : ""}
        </dd>
      </div>
      {lacking.map(({ subject, of }) => (
        <div key={`${subject}-${of}`} className="is-skipped">
          <dt>{photoName(subject)}</dt>
          <dd>Not taken</dd>
        </div>
      ))}
    </dl>
  );
}
