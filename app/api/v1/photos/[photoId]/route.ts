import { z } from "zod";
import { id, photoChange } from "../../inputs";
import { openPhoto, removePhoto, setPhoto } from "@/db/queries/photos";
import { handler } from "@/lib/server/handler";

const params = z.object({ photoId: id });

/** The picture. It never changes under its id, so the browser may keep it for this person. */
export const GET = handler({ params, permission: "jobs.read" }, async ({ viewer, params }) => {
  const photo = await openPhoto(viewer, params);
  if (!photo.ok) return photo;
  return new Response(photo.value.stream, {
    headers: {
      "content-type": "image/jpeg",
      "content-length": String(photo.value.bytes),
      "content-disposition": `inline; filename="${params.photoId}.jpg"`,
      "cache-control": "private, max-age=86400, immutable",
      // Kept for this session only: after sign-out the browser asks again, and is refused.
      vary: "Cookie",
    },
  });
});

/** Changes what a photo is said to show and whether it goes into the pack. */
export const PATCH = handler(
  { params, body: photoChange, permission: "jobs.write" },
  async ({ viewer, params, body }) => setPhoto(viewer, { ...params, ...body }),
);

/** Takes a photo out of its job. */
export const DELETE = handler({ params, permission: "jobs.write" }, ({ viewer, params }) =>
  removePhoto(viewer, params),
);
