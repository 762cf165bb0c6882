import { and, eq, isNull } from "drizzle-orm";
import { nowInstant } from "../clock";
import type { Tx } from "../client";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { jobs, photos } from "../schema";
import { asFirm } from "../tenant";
import { lockJob, storeRecord, type LockedJob } from "./job-saves";
import { photoColumns, toPhotoView } from "./photo-views";
import type { Job } from "@/lib/notify/job";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { PhotoView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";
import { preparePhoto, type PreparedPhoto } from "@/lib/server/photos";
import { storage } from "@/lib/server/storage/storage";

export type NewPhoto = {
  jobId: string;
  /** Made by the client: the same upload sent twice is one photo. */
  photoId: string;
  subject: EvidenceSubject;
  /** A chargepoint's id, where the photo is of one of several. */
  of: string | null;
  caption: string | null;
  /** The file as it was sent; made fit to keep before anything is stored. */
  bytes: Uint8Array;
  /** When the phone says it was taken; the picture itself goes first. */
  takenAt?: string | null;
};

const mostPhotos = 100;

/** Puts a job's evidence list in step with a photo, as the next version of the record. */
export async function withEvidence(
  tx: Tx,
  viewer: Viewer,
  job: LockedJob,
  change: (evidence: Job["evidence"]) => Job["evidence"],
): Promise<boolean> {
  const record = { ...job.record, evidence: change(job.record.evidence) };
  return (await storeRecord(tx, viewer, job, record)) !== null;
}

const reused = failed("key-reused", "This id was used before for another photo. Send it again as a new one.");

/** Two ids may begin alike; the name must stay one photo's, in the folder and in every pack. */
const nameIsTaken = async (tx: Tx, { firmId }: Viewer, input: NewPhoto): Promise<boolean> =>
  (await tx.$count(
    photos,
    and(eq(photos.firmId, firmId), eq(photos.jobId, input.jobId), eq(photos.file, fileNameOf(input))),
  )) > 0;

async function sameUpload(tx: Tx, viewer: Viewer, input: NewPhoto, ready: PreparedPhoto) {
  const [present] = await tx
    .select({ ...photoColumns, jobId: photos.jobId, sentSha256: photos.sentSha256, removedAt: photos.removedAt })
    .from(photos)
    .where(and(eq(photos.firmId, viewer.firmId), eq(photos.id, input.photoId)));
  if (!present) return null;
  const { jobId, sentSha256, removedAt, ...view } = present;
  if (jobId !== input.jobId || sentSha256 !== ready.sentSha256 || removedAt) return reused;
  return ok(toPhotoView(view));
}

/** A plain name, unique in its job: subject and the beginning of the photo's id. */
const fileNameOf = ({ subject, photoId }: NewPhoto) => `${subject}-${photoId.slice(0, 8)}.jpg`;

async function insertPhoto(tx: Tx, viewer: Viewer, job: LockedJob, input: NewPhoto, ready: PreparedPhoto) {
  const { subject, of, caption } = input;
  const file = fileNameOf(input);
  const takenAt = ready.takenAt ?? input.takenAt ?? null;
  const key = photoKey(ready);
  const [made] = await tx
    .insert(photos)
    .values({
      firmId: viewer.firmId,
      id: input.photoId,
      jobId: input.jobId,
      file,
      subject,
      of,
      caption,
      takenAt,
      widthPx: ready.widthPx,
      heightPx: ready.heightPx,
      bytes: ready.bytes.byteLength,
      sha256: ready.sha256,
      storageKey: key,
      sentSha256: ready.sentSha256,
      addedBy: viewer.userId,
      createdAt: nowInstant(),
    })
    .returning(photoColumns);
  if (!made) throw new Error("the photo was not stored");
  const stored = await withEvidence(tx, viewer, job, (list) => [...list, { subject, of, file, caption, takenAt }]);
  if (!stored) throw new Error(`job ${job.id} moved on while it was held`);
  return toPhotoView(made);
}

const photoKey = ({ sha256 }: PreparedPhoto) => `photos/${sha256.slice(0, 2)}/${sha256}.jpg`;

/**
 * Adds a photo to a job and to its record's evidence. Failures: of the picture itself (`too-large`,
 * `unsupported`, `unreadable`, each with the field `file`), `not-found`, `key-reused`, `full` (100 photos).
 */
export async function addPhoto(viewer: Viewer, input: NewPhoto): Promise<Result<PhotoView>> {
  const refused = refusal(viewer, "jobs.write");
  if (refused) return refused;
  const known = await asFirm(viewer, (tx) =>
    tx.$count(jobs, and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, input.jobId))),
  );
  if (known === 0) return notFound("job");
  const ready = await preparePhoto(input.bytes);
  if (!ready.ok) return ready;
  await storage().put(photoKey(ready.value), ready.value.bytes);
  return asFirm(viewer, async (tx) => {
    const job = await lockJob(tx, viewer.firmId, input.jobId);
    if (!job) return notFound("job");
    const before = await sameUpload(tx, viewer, input, ready.value);
    if (before) return before;
    if (await nameIsTaken(tx, viewer, input)) return reused;
    const held = await tx.$count(
      photos,
      and(eq(photos.firmId, viewer.firmId), eq(photos.jobId, job.id), isNull(photos.removedAt)),
    );
    if (held >= mostPhotos) return failed("full", `A job holds at most ${mostPhotos} photos. Remove one first.`);
    const photo = await insertPhoto(tx, viewer, job, input, ready.value);
    const about = { jobId: job.id, jobNumber: job.number, photoId: photo.id, subject: photo.subject };
    await recordEvent(tx, viewer, { type: "photo.added", version: 1, ...about });
    return ok(photo);
  });
}
