import { z } from "zod";
import { id } from "../../../inputs";
import { assessJob } from "@/db/queries/assessments";
import { handler } from "@/lib/server/handler";

/** What the rules say of the job as it stands today. A record that contradicts itself is 422, field by field. */
export const GET = handler({ params: z.object({ jobId: id }), permission: "jobs.read" }, ({ viewer, params }) =>
  assessJob(viewer, params),
);
