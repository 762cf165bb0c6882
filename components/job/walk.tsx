"use client";

import type { Route } from "next";
import Link from "next/link";
import { usePathname, useRouter, useSearchParams } from "next/navigation";
import { useEffect, useRef, useState } from "react";
import { factAt } from "@/components/drafts/facts-at";
import { useDraft } from "@/components/drafts/use-draft";
import { useSummary } from "@/components/drafts/use-summary";
import { ErrorSummary } from "@/components/ui/error-summary";
import type { AssessmentSummary, JobView } from "@/lib/notify/views";
import { ConflictPanel } from "./conflict-panel";
import { wordsOfError } from "./fields/error-words";
import { QuestionAnswer } from "./fields/question-answer";
import { type Blanks, Items } from "./items";
import { JobBar } from "./job-bar";
import { JobHead } from "./job-head";
import { JobThread } from "./job-thread";
import { MissingList } from "./missing-list";
import { type Subject, subjects } from "./questions/model";
import { fieldId, placeOf, recordAddress, type Screen, screensOf, subjectName } from "./questions/screens";
import { SavedLine } from "./saved-line";
import { addressOfStop, screenName, stopAfter } from "./stops";
import { SubjectList } from "./subject-list";
import { threadOfScreen } from "./thread-of-screen";
import { FootFacts } from "./walk-foot";
import { WireBeside } from "./wire";

type Props = {
  job: JobView;
  userId: string;
  today: string;
  summary: AssessmentSummary;
  blanks: Blanks;
};

/**
 * The walk through the record, one subject a screen. Moving between screens asks nothing of the server, so that a
 * poor signal never stands in the way; each change goes through the draft.
 */
export function Walk({ job, userId, today, summary: atFirst, blanks }: Props) {
  const draft = useDraft(job, userId, atFirst);
  const { record, held, store } = draft;
  const summary = useSummary(draft, atFirst, today);
  const router = useRouter();
  const { subject, screen, fromCheck } = useScreen(record);
  const [tried, setTried] = useState<string | null>(null);
  const heading = useArrival(subject, screen, job.number);
  const missing = summary.missing;
  const here = missing.filter(({ path }) => placeOf(path, record)?.subject === subject);
  const wrong = summary.fields;
  const next = fromCheck ? null : stopAfter(record, subject, screen?.key ?? null);
  const errors = errorsOn(screen, held, wrong);
  const place = `${subject} ${screen?.key}`;

  const go = (address: string) =>
    address.includes("/record/") ? window.history.pushState(null, "", address) : router.push(address as Route);
  const onward = () => {
    setTried(place);
    if (errors.length) return;
    void store.sendNow();
    go(next ? addressOfStop(job.id, next) : `/jobs/${job.id}/check`);
  };
  const thread = screen ? threadOfScreen(screen.questions, record, held) : [];

  return (
    <main id="main" className="job-page walk">
      <JobBar number={job.number} back={`/jobs/${job.id}`} backTo="the walk">
        <SavedLine draft={draft} />
      </JobBar>
      <div className="only-desk">
        <JobHead number={job.number} record={record}>
          <SavedLine draft={draft} />
        </JobHead>
      </div>
      <div className="sheet">
        <div className="only-desk">
          <JobThread job={job} record={record} current="job" />
        </div>
        <div className="walk__split">
          <nav className="only-desk walk__subjects" aria-label="Subjects">
            <SubjectList
              jobId={job.id}
              record={record}
              missing={missing}
              photos={{ taken: job.photos.length }}
              current={subject}
            />
          </nav>
          <form
            className="site site__body walk__form"
            noValidate
            onSubmit={(event) => {
              event.preventDefault();
              onward();
            }}
          >
            <div className="step">
              <WireBeside wire="whole" />
              <h1 ref={heading} tabIndex={-1}>
                {screen && screen.title !== subjectName[subject] ? screen.title : subjectName[subject]}
              </h1>
              <p>{leadOf(subject, screen, record)}</p>
            </div>
            <ConflictPanel draft={draft} />
            {(tried === place || draft.message) && (
              <ErrorSummary
                errors={errors}
                idOf={fieldId}
                title={errors.length ? undefined : (draft.message ?? undefined)}
              />
            )}
            {screen?.questions.map((question, index) => (
              <QuestionAnswer
                key={question.at}
                question={question}
                index={screen.item?.index ?? 0}
                job={record}
                value={factAt(record, question.at)}
                held={held[question.at] ?? null}
                wrong={wrong.find(({ path }) => path === question.at)?.message ?? null}
                thread={thread[index] ?? { stitch: "not-yet", wire: "ahead" }}
                today={today}
                edit={store.edit}
                hold={store.hold}
              />
            ))}
            <Items
              subject={subject}
              item={screen?.item ?? null}
              job={record}
              blanks={blanks}
              edit={store.edit}
              onAdded={(list, index) => go(recordAddress(job.id, subject, firstScreenOf(list, index)))}
            />
            <OtherScreens
              jobId={job.id}
              subject={subject}
              screen={screen}
              screens={screensOf(subject, record)}
              go={go}
            />
            <footer className="site__foot">
              <FootFacts
                summary={summary}
                here={here}
                record={record}
                jobId={job.id}
                today={today}
                open={{ conflicts: draft.conflicts.length, held: Object.keys(held) }}
              />
              <button type="submit" className="btn btn--act btn--site">
                {next ? `Save, next is ${next.name}` : "Save, back to the check"}
              </button>
            </footer>
          </form>
          <aside className="only-desk walk__aside" aria-label="Missing for this route">
            <div className="section section__head">
              <h2>Missing</h2>
              <span>{missing.length}</span>
            </div>
            <MissingList missing={missing} record={record} jobId={job.id} />
          </aside>
        </div>
      </div>
    </main>
  );
}

/** The screen the address names. The address is the only place that is kept. */
function useScreen(record: JobView["record"]) {
  const pathname = usePathname();
  const query = useSearchParams();
  const named = pathname.split("/").at(-1);
  const subject = subjects.find((one) => one === named) ?? "intake";
  const screens = screensOf(subject, record);
  const screen = screens.find(({ key }) => key === query.get("screen")) ?? screens.find(({ more }) => !more) ?? null;
  return { subject, screen, fromCheck: query.get("from") === "check" };
}

/** Puts the focus where a person who moved expects it: the field named in the address, else the heading. */
function useArrival(subject: Subject, screen: Screen | null, jobNumber: string) {
  const heading = useRef<HTMLHeadingElement>(null);
  const at = useRef<string | null>(null);
  const place = `${subject} ${screen?.key}`;
  useEffect(() => {
    const first = at.current === null;
    at.current = place;
    const field = window.location.hash ? document.getElementById(window.location.hash.slice(1)) : null;
    if (field) {
      field.focus();
      field.scrollIntoView({ block: "center" });
    } else if (!first) {
      document.title = `${heading.current?.textContent ?? ""}, ${jobNumber}, Sealwire`;
      window.scrollTo(0, 0);
      heading.current?.focus({ preventScroll: true });
    }
  }, [place, jobNumber]);
  return heading;
}

function leadOf(subject: Subject, screen: Screen | null, record: JobView["record"]): string {
  const number = `${subjects.indexOf(subject) + 1} of ${subjects.length}.`;
  const parts = screensOf(subject, record).filter(({ more }) => !more);
  const part = parts.findIndex(({ key }) => key === screen?.key);
  const which = parts.length > 1 && part >= 0 ? ` Part ${part + 1} of ${parts.length}.` : "";
  const item = screen?.item && screen.item.of > 1 ? ` Number ${screen.item.index + 1} of ${screen.item.of}.` : "";
  return `${number}${which}${item}${screen?.lead ? ` ${screen.lead}` : ""}`;
}

const firstScreenOf = (list: "chargepoints" | "circuits" | "boards", index: number) =>
  `${{ chargepoints: "chargepoint", circuits: "circuit", boards: "board" }[list]}-${index + 1}`;

const errorsOn = (
  screen: Screen | null,
  held: Record<string, { message: string }>,
  wrong: AssessmentSummary["fields"],
) =>
  (screen?.questions ?? []).flatMap(({ at, label }) => {
    const said = held[at]?.message ?? wrong.find(({ path }) => path === at)?.message ?? null;
    const message = wordsOfError(label, said);
    return message ? [{ path: at, message }] : [];
  });

type OtherProps = {
  jobId: string;
  subject: Subject;
  screen: Screen | null;
  screens: Screen[];
  go: (to: string) => void;
};

/** The other screens of the subject: those of the walk, and the further facts most jobs do not need. */
function OtherScreens({ jobId, subject, screen, screens, go }: OtherProps) {
  const others = screens.filter(({ key }) => key !== screen?.key);
  if (others.length === 0) return null;
  return (
    <nav className="other-screens" aria-label={`More of ${subjectName[subject].toLowerCase()}`}>
      <h2>More of {subjectName[subject].toLowerCase()}</h2>
      <ul>
        {others.map((other) => (
          <li key={other.key}>
            <Link
              href={recordAddress(jobId, subject, other.key) as Route}
              onClick={(event) => {
                event.preventDefault();
                go(recordAddress(jobId, subject, other.key));
              }}
            >
              {screenName(other)}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
