import { z } from "zod";
import { id } from "../../inputs";
import { getSubmission } from "@/db/queries/submissions";
import { handler } from "@/lib/server/handler";

/** One paper: history, the moves open to it, where it goes and a drafted mail. */
export const GET = handler(
  { params: z.object({ submissionId: id }), permission: "submissions.read" },
  ({ viewer, params }) => getSubmission(viewer, params),
);
