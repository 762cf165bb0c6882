"use client";

import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import type { DraftState } from "@/components/drafts/draft-state";
import { useDraft } from "@/components/drafts/use-draft";
import { useSummary } from "@/components/drafts/use-summary";
import { counted } from "@/components/ui/counted";
import { daysLeftInWords, shortDate } from "@/components/ui/dates";
import { ErrorSummary } from "@/components/ui/error-summary";
import { OutcomeGlyph } from "@/components/ui/mark";
import { useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";
import type { AssessmentSummary, JobView } from "@/lib/notify/views";
import { AnswerGroups } from "./answer-groups";
import { siteOf, standingOf, unitOf } from "./answer-text";
import { factAt } from "../drafts/facts-at";
import { ConflictPanel } from "./conflict-panel";
import { declarationWords, Declaration } from "./declaration";
import { wordsOfError } from "./fields/error-words";
import { JobBar } from "./job-bar";
import { JobHead } from "./job-head";
import { JobThread } from "./job-thread";
import { addressOf, fieldId, labelOf, walkOf } from "./questions/screens";
import { inSentence } from "./missing-list";
import { SavedLine } from "./saved-line";
import { WireBeside } from "./wire";

type Props = {
  job: JobView;
  userId: string;
  today: string;
  summary: AssessmentSummary;
  operatorName: string | null;
  nextVersion: number;
  building: boolean;
  neededPhotos: readonly { subject: string; of: string | null; have: boolean }[];
  mayWrite: boolean;
  maySeal: boolean;
  seal: (input: unknown) => Promise<ActionState<{ packId: string; version: number }>>;
};

/** Check answers before sealing: what blocks, the facts by subject, the declaration, the seal. */
export function Check(props: Props) {
  const { job, userId, today, operatorName, nextVersion, building, neededPhotos, mayWrite, maySeal, seal } = props;
  const draft = useDraft(job, userId, props.summary);
  const { record } = draft;
  const summary = useSummary(draft, props.summary, today);
  const router = useRouter();
  const [declared, setDeclared] = useState(false);
  const [withGaps, setWithGaps] = useState(false);
  const [reason, setReason] = useState("");
  const [packId] = useState(() => crypto.randomUUID());
  const act = useAct(seal, () => router.push(`/jobs/${job.id}/pack` as Route));
  const { missing, fields } = summary;
  const gaps = missing.length > 0;
  const waits = waitingFor({
    declared,
    gaps,
    withGaps,
    reason,
    building,
    fields: fields.length,
    unsent: draft.unsent,
    maySeal,
  });
  const name = record.competentPerson.name;
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
        <form
          className="site site__body check-form"
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            if (waits) return;
            act.run({
              jobId: job.id,
              packId,
              expectedVersion: draft.version,
              declaration: { name, statement: declarationWords },
              gapsReason: gaps ? reason : null,
            });
          }}
        >
          <div className="step">
            <WireBeside wire="whole" />
            <h1>{mayWrite ? "Check answers" : "All answers"}</h1>
            <p>
              {siteOf(record)}. {unitOf(record)}
              {operatorName ? `, ${paperFor(summary.route)} ${operatorName}` : ""}.
            </p>
          </div>
          <ConflictPanel draft={draft} />
          {act.state.status === "failed" && (
            <ErrorSummary
              errors={act.state.fields}
              idOf={fieldId}
              title={act.state.fields.length ? undefined : act.state.message}
            />
          )}
          <Blocks
            job={job}
            record={record}
            summary={summary}
            held={draft.held}
            photosLacking={neededPhotos.filter(({ have }) => !have).length}
            mayWrite={mayWrite}
          />
          <AnswerGroups
            jobId={job.id}
            record={record}
            missing={missing}
            mayWrite={mayWrite}
            photos={{ taken: job.photos.length, needed: neededPhotos }}
          />
          {mayWrite && (
            <>
              <Declaration
                record={record}
                isNext={!gaps && fields.length === 0}
                declared={declared}
                setDeclared={setDeclared}
                gaps={gaps ? { open: withGaps, setOpen: setWithGaps, reason, setReason } : null}
              />
              <footer className="site__foot">
                <div className="site__facts">
                  {gaps ? (
                    <a href="#blocks">
                      {counted(missing.length, "answer")} {missing.length === 1 ? "blocks" : "block"}
                    </a>
                  ) : (
                    <b className="strong">{fields.length ? "Facts contradict" : "Nothing blocks"}</b>
                  )}
                  <span>
                    {summary.lastDay && summary.daysLeft !== null && (
                      <>
                        <b className="strong">{daysLeftInWords(summary.daysLeft)}</b>, to{" "}
                        {shortDate(summary.lastDay, today)}
                      </>
                    )}
                  </span>
                </div>
                {waits && (
                  <p className="foot-waits" id="seal-waits">
                    {waits}
                  </p>
                )}
                <button
                  type="submit"
                  className={`btn ${waits ? "btn--off" : "btn--act"} btn--site`}
                  aria-disabled={waits || act.pending ? true : undefined}
                  aria-describedby={waits ? "seal-waits" : undefined}
                >
                  {act.pending ? "Sealing" : `Seal version ${nextVersion}`}
                </button>
              </footer>
            </>
          )}
        </form>
      </div>
    </main>
  );
}

type Waiting = {
  declared: boolean;
  gaps: boolean;
  withGaps: boolean;
  reason: string;
  building: boolean;
  fields: number;
  unsent: number;
  maySeal: boolean;
};

/** What the seal still waits for, first things first; null when it waits for nothing. */
function waitingFor({ declared, gaps, withGaps, reason, building, fields, unsent, maySeal }: Waiting): string | null {
  if (!maySeal) return "An installer seals.";
  if (building) return "The version before is still being built.";
  if (fields) return "Put right the facts that contradict each other.";
  if (unsent) return `${counted(unsent, "answer")} not sent yet.`;
  if (gaps && !withGaps) return "Answer what blocks, or seal with gaps and say why.";
  if (gaps && !reason.trim()) return "Say why it is sealed with gaps.";
  if (!declared) return "Tick the declaration.";
  return null;
}

const paperFor = (route: AssessmentSummary["route"]) =>
  route === "notify"
    ? "a notice to"
    : route === "apply" || route === "late-application"
      ? "an application to"
      : "supply of";

type BlockProps = {
  job: JobView;
  record: JobView["record"];
  summary: AssessmentSummary;
  held: DraftState["held"];
  /** Photos of this route's list that are not taken; they do not block, but the reader will look for them. */
  photosLacking: number;
  mayWrite: boolean;
};

/** What blocks sealing, each with its own way in; or that nothing does, and how many answers stay open. */
function Blocks({ job, record, summary, held, photosLacking, mayWrite }: BlockProps) {
  const blocking = [
    ...Object.entries(held).map(([path, { message }]) => ({
      path,
      words: wordsOfError(labelOf(path, record), message) ?? message,
      way: "Change",
    })),
    ...summary.missing.map(({ path, needed }) => ({
      path,
      words: inSentence(needed),
      way: path.startsWith("evidence") ? "Take" : "Add",
    })),
    ...summary.fields.map(({ path, message }) => ({
      path,
      words: `${labelOf(path, record)}: ${message}`,
      way: "Change",
    })),
  ];
  if (blocking.length === 0) {
    const open = walkOf(record)
      .flatMap(({ questions }) => questions)
      .filter(({ at }) => standingOf(factAt(record, at)) === "not-yet").length;
    return (
      <p className="blocks blocks--none">
        <WireBeside wire="whole" />
        <OutcomeGlyph outcome="met" size={20} />
        <span>
          Nothing blocks sealing.
          {open > 0 &&
            ` ${counted(open, "answer")} ${open === 1 ? "stays" : "stay"} “not recorded” and ${open === 1 ? "is" : "are"} printed so.`}
          {photosLacking > 0 && ` ${counted(photosLacking, "photo")} of the list not taken.`}
        </span>
      </p>
    );
  }
  return (
    <section className="blocks" id="blocks" aria-labelledby="blocks-title" tabIndex={-1}>
      <WireBeside wire="whole" />
      <h2 id="blocks-title">
        {counted(blocking.length, "answer")} {blocking.length === 1 ? "blocks" : "block"} sealing
      </h2>
      <ul>
        {blocking.map(({ path, words, way }) => (
          <li key={path + words}>
            <OutcomeGlyph outcome="cannot-tell" size={20} />
            <span>{words}</span>
            {mayWrite && (
              <Link href={fromCheck(addressOf(path, record, job.id)) as Route}>
                {way}
                <span className="vh">: {labelOf(path, record)}</span>
              </Link>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

/** The same address, coming back here in one step. */
function fromCheck(address: string): string {
  const [path = "", hash] = address.split("#");
  return `${path}${path.includes("?") ? "&" : "?"}from=check${hash ? `#${hash}` : ""}`;
}
