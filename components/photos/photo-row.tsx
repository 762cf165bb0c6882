"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { clockTime, longDate, dayOf } from "@/components/ui/dates";
import { Input, Select } from "@/components/ui/field";
import { OutcomeGlyph } from "@/components/ui/mark";
import { Stitch, type StitchState } from "@/components/ui/stitch";
import type { PhotoView } from "@/lib/notify/views";
import { type Wire, WireBeside } from "../job/wire";
import { isDark, tooDark } from "./prepare-photo";
import { changePhoto, removePhoto } from "./photo-requests";
import { photoName, photoSubjects } from "./subject-words";
import { TakePhoto } from "./take-photo";

type Props = {
  photo: PhotoView;
  stitch: StitchState;
  wire: Wire;
  today: string;
  mayWrite: boolean;
  onRetake: (file: File) => void;
};

/** One photo that was taken: what it shows, when, and what may be changed about it. */
export function PhotoRow({ photo, stitch, wire, today, mayWrite, onRetake }: Props) {
  const [dark, setDark] = useState(false);
  return (
    <li className="shot-item">
      <WireBeside wire={wire} at={34} />
      <Stitch state={dark ? "take-again" : stitch} />
      <details>
        <summary className="shot shot--taken">
          {/* The address needs the session's cookie, so an optimiser between would get nothing. */}
          {/* eslint-disable-next-line @next/next/no-img-element */}
          <img
            src={photo.url}
            alt={photo.caption ?? photoName(photo.subject)}
            width={64}
            height={64}
            onLoad={(event) => setDark(isDark(event.currentTarget))}
          />
          <span>
            <b>{photoName(photo.subject)}</b>
            {dark && (
              <span className="shot__warn">
                <OutcomeGlyph outcome="not-met" size={18} />
                {tooDark}
              </span>
            )}
            <span>
              {takenInWords(photo.takenAt, today)}
              {photo.inPack ? "" : ", not in the pack"}
            </span>
          </span>
        </summary>
        {mayWrite && <PhotoForm photo={photo} onRetake={onRetake} />}
      </details>
    </li>
  );
}

function takenInWords(takenAt: string | null, today: string): string {
  if (!takenAt) return "Time not recorded";
  const day = dayOf(takenAt);
  return day === today ? `Taken ${clockTime(takenAt)}` : `Taken ${longDate(day)}, ${clockTime(takenAt)}`;
}

function PhotoForm({ photo, onRetake }: Pick<Props, "photo" | "onRetake">) {
  const router = useRouter();
  const [caption, setCaption] = useState(photo.caption ?? "");
  const [message, setMessage] = useState<string | null>(null);
  const settle = async (request: ReturnType<typeof changePhoto>) => {
    const answer = await request;
    setMessage(answer.ok ? null : answer.message);
    if (answer.ok) router.refresh();
  };
  const change = (part: Partial<PhotoView>) =>
    settle(changePhoto({ ...photo, caption: caption.trim() || null, ...part }));
  const id = `photo-${photo.id}`;
  return (
    <div className="shot-form">
      {message && (
        <p className="q__error" role="alert">
          <OutcomeGlyph outcome="not-met" size={18} />
          {message}
        </p>
      )}
      <label htmlFor={`${id}-caption`}>Caption</label>
      <Input
        id={`${id}-caption`}
        className="field--words"
        value={caption}
        maxLength={400}
        onChange={(event) => setCaption(event.target.value)}
        onBlur={() => (caption.trim() || null) !== photo.caption && void change({})}
      />
      <label htmlFor={`${id}-subject`}>What it shows</label>
      <Select
        id={`${id}-subject`}
        value={photo.subject}
        onChange={(event) => void change({ subject: event.target.value })}
      >
        {photoSubjects.map(({ subject, name }) => (
          <option key={subject} value={subject}>
            {name}
          </option>
        ))}
      </Select>
      <label className="tick">
        <input
          className="check"
          type="checkbox"
          checked={photo.inPack}
          onChange={(event) => void change({ inPack: event.target.checked })}
        />
        <span>In the pack</span>
      </label>
      <div className="choices choices--2">
        <TakePhoto className="btn" label={`Take again: ${photoName(photo.subject)}`} onFile={onRetake}>
          Take again
        </TakePhoto>
        <Button onClick={() => void settle(removePhoto(photo.id))}>
          Remove<span className="vh">: {photoName(photo.subject)}</span>
        </Button>
      </div>
    </div>
  );
}
