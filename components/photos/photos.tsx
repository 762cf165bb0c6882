"use client";

import type { Route } from "next";
import Link from "next/link";
import { useState } from "react";
import { useDraft } from "@/components/drafts/use-draft";
import { JobBar } from "@/components/job/job-bar";
import { JobHead } from "@/components/job/job-head";
import { JobThread } from "@/components/job/job-thread";
import { subjects } from "@/components/job/questions/model";
import { recordAddress } from "@/components/job/questions/screens";
import { SavedLine } from "@/components/job/saved-line";
import { FootFacts } from "@/components/job/walk-foot";
import { type Wire, WireBeside } from "@/components/job/wire";
import { Button } from "@/components/ui/button";
import { Select } from "@/components/ui/field";
import { CameraIcon } from "@/components/ui/icons";
import { OutcomeGlyph } from "@/components/ui/mark";
import { Stitch } from "@/components/ui/stitch";
import { counted } from "@/components/ui/counted";
import type { AssessmentSummary, JobView, PhotoView } from "@/lib/notify/views";
import { PhotoRow } from "./photo-row";
import { photoHow, photoName, photoSubjects } from "./subject-words";
import { TakePhoto } from "./take-photo";
import { type Sending, useSending } from "./use-sending";

export type NeededPhoto = { subject: string; of: string | null; why: string; have: boolean };

type Props = {
  job: JobView;
  userId: string;
  today: string;
  summary: AssessmentSummary;
  needed: readonly NeededPhoto[];
  mayWrite: boolean;
  fromCheck: boolean;
};

/** The photo checklist of this route: what is taken, what is on its way, what is missing and why. */
export function Photos({ job, userId, today, summary: atFirst, needed, mayWrite, fromCheck }: Props) {
  const draft = useDraft(job, userId, atFirst);
  const sending = useSending(job.id);
  const rows = checklist(needed, job.photos, sending.list);
  const missing = rows.filter((row) => row.photos.length === 0 && (!row.sending || row.sending.state === "failed"));
  const next = missing[0];
  const listed = new Set(rows.flatMap(({ photos }) => photos.map(({ id }) => id)));
  const others = job.photos.filter(({ id }) => !listed.has(id));
  const take = (subject: string, of: string | null, replaces?: string) => (file: File) =>
    void sending.take(file, { subject, of, replaces });
  const onWay = sending.list.filter(({ state }) => state !== "failed").length;
  const onward = fromCheck ? `/jobs/${job.id}/check` : recordAddress(job.id, "people");
  return (
    <main id="main" className="job-page walk">
      <JobBar number={job.number} back={`/jobs/${job.id}`} backTo="the walk">
        {onWay ? (
          <span className="site__saved" role="status">
            {counted(onWay, "photo")} to send
          </span>
        ) : (
          <SavedLine draft={draft} />
        )}
      </JobBar>
      <div className="only-desk">
        <JobHead number={job.number} record={draft.record} />
      </div>
      <div className="sheet">
        <div className="only-desk">
          <JobThread job={job} record={draft.record} current="job" />
        </div>
        <div className="site site__body walk__form photos">
          <div className="step">
            <WireBeside wire="whole" />
            <h1>Photos</h1>
            <p>
              {subjects.indexOf("photos") + 1} of {subjects.length}. No covers off, no seals broken.
            </p>
          </div>
          <p className="route-line">
            <WireBeside wire="whole" />
            <span>{routeName(atFirst.route)}</span>
            <span>
              {rows.filter(({ photos }) => photos.length > 0).length} of {rows.length}
            </span>
          </p>
          <ul className="shots">
            {rows.map((row) => (
              <NeededRow
                key={row.key}
                row={row}
                isOneOfSeveral={job.record.chargepoints.length > 1}
                today={today}
                mayWrite={mayWrite}
                take={take}
                sending={sending}
              />
            ))}
          </ul>
          <Others photos={others} sending={sending} listed={rows} today={today} mayWrite={mayWrite} take={take} />
          {mayWrite && (
            <footer className="site__foot">
              {missing.length ? (
                <div className="site__facts">
                  <b className="strong">{counted(missing.length, "photo")} missing</b>
                  <Link href={onward as Route}>{fromCheck ? "Back to the check" : "Next is People"}</Link>
                </div>
              ) : (
                <FootFacts
                  summary={draft.summary ?? atFirst}
                  here={[]}
                  record={draft.record}
                  jobId={job.id}
                  today={today}
                />
              )}
              {next ? (
                <TakePhoto
                  className="btn btn--act btn--site"
                  label={`Take ${photoName(next.subject)}`}
                  onFile={take(next.subject, next.of)}
                >
                  Take {photoName(next.subject).toLowerCase()}
                </TakePhoto>
              ) : (
                <Link className="btn btn--act btn--site" href={onward as Route}>
                  {fromCheck ? "Back to the check" : "Next is People and dates"}
                </Link>
              )}
            </footer>
          )}
        </div>
      </div>
    </main>
  );
}

type Row = NeededPhoto & { key: string; photos: PhotoView[]; sending: Sending | null; wire: Wire; isPast: boolean };

function checklist(needed: readonly NeededPhoto[], photos: readonly PhotoView[], sending: readonly Sending[]): Row[] {
  let open = false;
  return needed.map((one) => {
    const taken = photos.filter(
      ({ subject, of }) => subject === one.subject && (one.of === null || of === null || of === one.of),
    );
    const isPast = open;
    if (taken.length === 0) open = true;
    return {
      ...one,
      key: `${one.subject}-${one.of}`,
      photos: taken,
      sending:
        sending.find(({ subject, of, replaces }) => subject === one.subject && of === one.of && !replaces) ?? null,
      wire: isPast ? "ahead" : open ? "to-here" : "whole",
      isPast,
    };
  });
}

type Take = (subject: string, of: string | null, replaces?: string) => (file: File) => void;
type RowProps = {
  row: Row;
  isOneOfSeveral: boolean;
  today: string;
  mayWrite: boolean;
  take: Take;
  sending: ReturnType<typeof useSending>;
};

function NeededRow({ row, isOneOfSeveral, today, mayWrite, take, sending }: RowProps) {
  const { subject, of, photos, sending: onWay, isPast } = row;
  if (photos.length > 0)
    return photos.map((photo) => (
      <PhotoRow
        key={photo.id}
        photo={photo}
        stitch={isPast ? "past-a-gap" : "answered"}
        wire={row.wire}
        today={today}
        mayWrite={mayWrite}
        onRetake={take(photo.subject, photo.of, photo.id)}
      />
    ));
  const words = (
    <>
      <span className="shot__blank">
        <CameraIcon />
      </span>
      <span>
        <b>
          {photoName(subject)}
          {of && isOneOfSeveral ? `, ${of}` : ""}
        </b>
        {onWay ? <SendingWords one={onWay} /> : <span>{row.why || photoHow(subject)}</span>}
      </span>
    </>
  );
  return (
    <li className="shot-item">
      <WireBeside wire={row.wire} at={34} />
      <Stitch state={onWay?.state === "failed" ? "take-again" : "not-yet"} />
      {mayWrite ? (
        <TakePhoto className="shot" label={`Take ${photoName(subject)}`} onFile={take(subject, of)}>
          {words}
        </TakePhoto>
      ) : (
        <div className="shot">{words}</div>
      )}
      {onWay?.state === "failed" && onWay.photo && (
        <Button onClick={() => void sending.again(onWay)}>
          Send again<span className="vh">: {photoName(subject)}</span>
        </Button>
      )}
    </li>
  );
}

function SendingWords({ one }: { one: Sending }) {
  if (one.state === "failed")
    return (
      <span className="shot__warn" role="alert">
        <OutcomeGlyph outcome="not-met" size={18} />
        {one.message}
      </span>
    );
  return <span role="status">{one.state === "preparing" ? "Making it smaller" : "Sending"}</span>;
}

type OthersProps = {
  photos: PhotoView[];
  sending: ReturnType<typeof useSending>;
  listed: Row[];
  today: string;
  mayWrite: boolean;
  take: Take;
};

/** Photos beyond the checklist, and a way to add one of any subject. */
function Others({ photos, sending, listed, today, mayWrite, take }: OthersProps) {
  const [subject, setSubject] = useState("other");
  const mine = sending.list.filter(({ photoId }) => !listed.some((row) => row.sending?.photoId === photoId));
  return (
    <>
      <p className="route-line">
        <span>Other photos</span>
        <span>{photos.length}</span>
      </p>
      <ul className="shots">
        {photos.map((photo) => (
          <PhotoRow
            key={photo.id}
            photo={photo}
            stitch="past-a-gap"
            wire="ahead"
            today={today}
            mayWrite={mayWrite}
            onRetake={take(photo.subject, photo.of, photo.id)}
          />
        ))}
        {mine.map((one) => (
          <li key={one.photoId} className="shot-item">
            <div className="shot">
              <span className="shot__blank">
                <CameraIcon />
              </span>
              <span>
                <b>{photoName(one.subject)}</b>
                <SendingWords one={one} />
              </span>
            </div>
            {one.state === "failed" && (
              <div className="choices choices--2">
                {one.photo && <Button onClick={() => void sending.again(one)}>Send again</Button>}
                <Button onClick={() => sending.drop(one.photoId)}>Leave it</Button>
              </div>
            )}
          </li>
        ))}
      </ul>
      {mayWrite && (
        <div className="another-photo">
          <label htmlFor="another-subject">What another photo shows</label>
          <Select id="another-subject" value={subject} onChange={(event) => setSubject(event.target.value)}>
            {photoSubjects.map((one) => (
              <option key={one.subject} value={one.subject}>
                {one.name}
              </option>
            ))}
          </Select>
          <TakePhoto className="btn" label="Add another photo" onFile={take(subject, null)}>
            Add another photo
          </TakePhoto>
        </div>
      )}
    </>
  );
}

const routeName = (route: AssessmentSummary["route"]) =>
  route === "notify"
    ? "For a notice"
    : route === "apply" || route === "late-application"
      ? "For an application"
      : route === "stop"
        ? "For the safety report"
        : "For this job";
