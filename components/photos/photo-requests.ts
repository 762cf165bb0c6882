import type { PhotoView } from "@/lib/notify/views";

export type Answer = { ok: true } | { ok: false; message: string };

const uploadPatienceMs = 60_000;
const patienceMs = 15_000;

type Failed = { error?: { message?: string; fields?: { message: string }[] } };

async function answerOf(request: Promise<Response>, whenLost: string): Promise<Answer> {
  try {
    const response = await request;
    if (response.ok) return { ok: true };
    if (response.status === 401) return { ok: false, message: "You are signed out. Sign in again, then send it." };
    const body = (await response.json()) as Failed;
    return { ok: false, message: body.error?.fields?.[0]?.message ?? body.error?.message ?? whenLost };
  } catch (error) {
    console.warn("The photo request got no answer.", error);
    return { ok: false, message: whenLost };
  }
}

/** `takenAt`: when the phone says it was taken, UTC. */
export type NewPhoto = {
  takenAt: string | null;
  photoId: string;
  subject: string;
  of: string | null;
  caption: string;
  file: Blob;
  name: string;
};

/** Sends one photo under an id made here, so that sending it twice keeps it once. */
export function sendPhoto(jobId: string, photo: NewPhoto): Promise<Answer> {
  const form = new FormData();
  form.set("photoId", photo.photoId);
  form.set("subject", photo.subject);
  if (photo.of) form.set("of", photo.of);
  if (photo.caption) form.set("caption", photo.caption);
  if (photo.takenAt) form.set("takenAt", photo.takenAt);
  form.set("file", photo.file, photo.name);
  const request = fetch(`/api/v1/jobs/${jobId}/photos`, {
    method: "POST",
    body: form,
    signal: AbortSignal.timeout(uploadPatienceMs),
  });
  return answerOf(request, "Not sent: no answer from the server. It stays here; try again.");
}

/** Changes the words, the subject or the tick of a photo. */
export function changePhoto({
  id,
  caption,
  subject,
  inPack,
}: Pick<PhotoView, "id" | "caption" | "subject" | "inPack">): Promise<Answer> {
  const request = fetch(`/api/v1/photos/${id}`, {
    method: "PATCH",
    headers: { "content-type": "application/json" },
    body: JSON.stringify({ caption, subject, inPack }),
    signal: AbortSignal.timeout(patienceMs),
  });
  return answerOf(request, "Not saved: no answer from the server. Try again.");
}

export const removePhoto = (id: string): Promise<Answer> =>
  answerOf(
    fetch(`/api/v1/photos/${id}`, { method: "DELETE", signal: AbortSignal.timeout(patienceMs) }),
    "Not removed: no answer from the server. Try again.",
  );
