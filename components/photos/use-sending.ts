"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { preparePhoto } from "./prepare-photo";
import { type NewPhoto, removePhoto, sendPhoto } from "./photo-requests";

/** A photo on its way, or one that could not be taken or sent. */
export type Sending = {
  photoId: string;
  subject: string;
  of: string | null;
  state: "preparing" | "sending" | "failed";
  message: string | null;
  warning: string | null;
  /** Kept until it has arrived, so that it can be sent again. */
  photo: NewPhoto | null;
  /** The photo it takes the place of. */
  replaces: string | null;
};

/** The file's own time: for a photo just taken, the moment of taking. */
const takenAtOf = ({ lastModified }: File) => (lastModified > 0 ? new Date(lastModified).toISOString() : null);

type Want = { subject: string; of: string | null; replaces?: string };

/** Takes photos, shrinks them and sends them one after another; what failed stays with its sentence. */
export function useSending(jobId: string) {
  const router = useRouter();
  const [list, setList] = useState<Sending[]>([]);
  const change = (photoId: string, part: Partial<Sending>) =>
    setList((before) => before.map((one) => (one.photoId === photoId ? { ...one, ...part } : one)));
  const drop = (photoId: string) => setList((before) => before.filter((one) => one.photoId !== photoId));

  const send = async (photo: NewPhoto, replaces: string | null) => {
    change(photo.photoId, { state: "sending", message: null });
    const answer = await sendPhoto(jobId, photo);
    if (!answer.ok) return change(photo.photoId, { state: "failed", message: answer.message });
    if (replaces) await removePhoto(replaces);
    drop(photo.photoId);
    router.refresh();
  };
  const take = async (file: File, { subject, of, replaces = undefined }: Want) => {
    const photoId = crypto.randomUUID();
    const begun: Sending = {
      photoId,
      subject,
      of,
      state: "preparing",
      message: null,
      warning: null,
      photo: null,
      replaces: replaces ?? null,
    };
    setList((before) => [...before.filter((one) => one.state !== "failed" || one.subject !== subject), begun]);
    const prepared = await preparePhoto(file);
    if (!prepared.ok) return change(photoId, { state: "failed", message: prepared.message });
    const photo = {
      photoId,
      subject,
      of,
      caption: "",
      file: prepared.file,
      name: prepared.name,
      takenAt: takenAtOf(file),
    };
    change(photoId, { photo, warning: prepared.warning });
    await send(photo, replaces ?? null);
  };
  const again = ({ photo, replaces }: Sending) => photo && send(photo, replaces);
  return { list, take, again, drop };
}
