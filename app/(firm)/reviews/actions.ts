"use server";

import { z } from "zod";
import { approveReview, returnReview } from "@/db/queries/reviews";
import { viewerAction } from "@/lib/server/actions";

const reviewed = { reviewId: z.uuid(), version: z.coerce.number().int().positive() };
const words = z.string().trim().max(2000, "Use 2,000 characters or fewer");

/** Signs off the settings of a sealed pack. */
export const approveAct = viewerAction(
  z.object({ ...reviewed, note: words.nullish().transform((note) => note || null) }),
  approveReview,
);

/** Sends a pack back to whoever recorded it, with a reason they can act on. */
export const returnAct = viewerAction(
  z.object({ ...reviewed, reason: words.min(10, "Say what must be put right, in at least 10 characters") }),
  returnReview,
);
