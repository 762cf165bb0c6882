import { z } from "zod";
import { caption, id, subject } from "../../../inputs";
import { addPhoto } from "@/db/queries/photos";
import { itemId } from "@/lib/notify/job/facts";
import { failed } from "@/lib/notify/result";
import { fieldErrors } from "@/lib/server/field-errors";
import { unfit } from "@/lib/server/fit-to-keep";
import { handler, jsonAnswer } from "@/lib/server/handler";
import { photoLimits } from "@/lib/server/photos";

const form = z.object({
  photoId: id,
  subject,
  of: z
    .union([itemId, z.literal("")])
    .default("")
    .transform((text) => text || null),
  caption: caption.default(null),
  takenAt: z
    .union([z.iso.datetime({ offset: true }), z.literal("")])
    .default("")
    .transform((text) => text || null),
  file: z.instanceof(File, { error: () => "choose a photo" }),
});

/** Room for the other fields of the form beside the photo itself. */
const mostBytes = photoLimits.bytes + 64 * 1024;

/** The fields of the form; null when it is cut short or is no form at all, which the platform tells as a TypeError. */
async function partsOf(request: Request): Promise<Record<string, FormDataEntryValue> | null> {
  try {
    return Object.fromEntries(await request.formData());
  } catch (error) {
    if (error instanceof TypeError) return null;
    throw error;
  }
}

/** Adds one photo, as multipart form data: photoId, subject, of, caption, takenAt, file. */
export const POST = handler(
  { params: z.object({ jobId: id }), permission: "jobs.write" },
  async ({ viewer, params, request }) => {
    if (Number(request.headers.get("content-length") ?? 0) > mostBytes)
      return failed("too-large", "This photo is larger than 15 MB. Take it at a smaller setting.");
    if (!request.headers.get("content-type")?.startsWith("multipart/form-data"))
      return failed("unsupported", "Send the photo as multipart form data.");
    const parts = await partsOf(request);
    if (!parts) return failed("bad-request", "The photo did not arrive whole. Send it again.");
    const wrong = unfit(parts);
    if (wrong) return failed("invalid", "The photo was not stored. Look at these again.", [wrong]);
    const sent = form.safeParse(parts);
    if (!sent.success)
      return failed("invalid", "The photo was not stored. Look at these again.", fieldErrors(sent.error));
    const { file, ...about } = sent.data;
    const bytes = new Uint8Array(await file.arrayBuffer());
    const photo = await addPhoto(viewer, { ...params, ...about, bytes });
    return photo.ok ? jsonAnswer(photo.value, 201) : photo;
  },
);
