import { and, eq, isNull } from "drizzle-orm";
import { nowInstant } from "../clock";
import type { Tx } from "../client";
import { movedOn, notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { photos } from "../schema";
import { asFirm } from "../tenant";
import { lockJob } from "./job-saves";
import { withEvidence } from "./photo-adding";
import { photoColumns, toPhotoView } from "./photo-views";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { ok, type Result } from "@/lib/notify/result";
import type { PhotoView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";
import { storage } from "@/lib/server/storage/storage";

export { addPhoto } from "./photo-adding";

/** A photo that is still in its job, and the job, held. */
async function holdPhoto(tx: Tx, viewer: Viewer, photoId: string) {
  const mine = and(eq(photos.firmId, viewer.firmId), eq(photos.id, photoId), isNull(photos.removedAt));
  const [photo] = await tx
    .select({ ...photoColumns, jobId: photos.jobId })
    .from(photos)
    .where(mine);
  const job = photo ? await lockJob(tx, viewer.firmId, photo.jobId) : null;
  return photo && job ? { photo, job } : null;
}

export type PhotoChange = { photoId: string; caption: string | null; subject: EvidenceSubject; inPack: boolean };

/** Changes what a photo is said to show, and whether it goes into the pack. */
export async function setPhoto(viewer: Viewer, input: PhotoChange): Promise<Result<PhotoView>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  const { photoId, caption, subject, inPack } = input;
  return asFirm(viewer, async (tx) => {
    const held = await holdPhoto(tx, viewer, photoId);
    if (!held) return notFound("photo");
    const { photo, job } = held;
    const [changed] = await tx
      .update(photos)
      .set({ caption, subject, inPack })
      .where(and(eq(photos.firmId, viewer.firmId), eq(photos.id, photoId), isNull(photos.removedAt)))
      .returning(photoColumns);
    if (!changed) return movedOn("photo");
    if (photo.caption !== caption || photo.subject !== subject)
      await withEvidence(tx, viewer, job, (list) =>
        list.map((entry) => (entry.file === photo.file ? { ...entry, caption, subject } : entry)),
      );
    const about = { jobId: job.id, jobNumber: job.number, photoId, subject };
    await recordEvent(tx, viewer, { type: "photo.changed", version: 1, ...about });
    return ok(toPhotoView(changed));
  });
}

/** Takes a photo out of its job. Packs already sealed keep it. */
export async function removePhoto(viewer: Viewer, { photoId }: { photoId: string }): Promise<Result<{ id: string }>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const held = await holdPhoto(tx, viewer, photoId);
    if (!held) return notFound("photo");
    const { photo, job } = held;
    const removed = await tx
      .update(photos)
      .set({ removedAt: nowInstant() })
      .where(and(eq(photos.firmId, viewer.firmId), eq(photos.id, photoId), isNull(photos.removedAt)))
      .returning({ id: photos.id });
    if (removed.length === 0) return notFound("photo"); // somebody else took it out while the job was waited for
    await withEvidence(tx, viewer, job, (list) => list.filter(({ file }) => file !== photo.file));
    const about = { jobId: job.id, jobNumber: job.number, photoId, subject: photo.subject };
    await recordEvent(tx, viewer, { type: "photo.removed", version: 1, ...about });
    return ok({ id: photoId });
  });
}

export type OpenPhoto = { stream: ReadableStream<Uint8Array>; bytes: number; sha256: string };

/** The picture itself, also of a photo taken out of its job, which a sealed pack may still show. */
export async function openPhoto(viewer: Viewer, { photoId }: { photoId: string }): Promise<Result<OpenPhoto>> {
  const refused = refusal(viewer, "jobs.read");
  if (refused) return refused;
  const [photo] = await asFirm(viewer, (tx) =>
    tx
      .select({ storageKey: photos.storageKey, sha256: photos.sha256 })
      .from(photos)
      .where(and(eq(photos.firmId, viewer.firmId), eq(photos.id, photoId))),
  );
  if (!photo) return notFound("photo");
  const file = await storage().get(photo.storageKey);
  if (!file) throw new Error(`photo ${photoId} is not in storage`);
  return ok({ ...file, sha256: photo.sha256 });
}
