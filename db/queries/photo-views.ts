import { and, asc, eq, isNull } from "drizzle-orm";
import type { Tx } from "../client";
import { photos } from "../schema";
import type { PhotoView } from "@/lib/notify/views";

export const photoColumns = {
  id: photos.id,
  file: photos.file,
  subject: photos.subject,
  of: photos.of,
  caption: photos.caption,
  takenAt: photos.takenAt,
  widthPx: photos.widthPx,
  heightPx: photos.heightPx,
  bytes: photos.bytes,
  inPack: photos.inPack,
};

export const toPhotoView = (row: Omit<PhotoView, "url">): PhotoView => ({ ...row, url: `/api/v1/photos/${row.id}` });

/** The photos of a job that have not been taken out of it, oldest first. */
export async function photosOf(tx: Tx, firmId: string, jobId: string): Promise<PhotoView[]> {
  const rows = await tx
    .select(photoColumns)
    .from(photos)
    .where(and(eq(photos.firmId, firmId), eq(photos.jobId, jobId), isNull(photos.removedAt)))
    .orderBy(asc(photos.createdAt), asc(photos.id));
  return rows.map(toPhotoView);
}
