import { z } from "zod";
import { id } from "../../inputs";
import { getJob } from "@/db/queries/jobs";
import { handler } from "@/lib/server/handler";

/** One job: its record, its thread and its photos. */
export const GET = handler({ params: z.object({ jobId: id }), permission: "jobs.read" }, ({ viewer, params }) =>
  getJob(viewer, params),
);
