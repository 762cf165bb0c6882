import { z } from "zod";
import { jobFilter, newJob } from "../inputs";
import { createJob, listJobs } from "@/db/queries/jobs";
import { failed } from "@/lib/notify/result";
import { handler, jsonAnswer } from "@/lib/server/handler";

/** One page of the firm's jobs. */
export const GET = handler({ query: jobFilter, permission: "jobs.read" }, ({ viewer, query }) =>
  listJobs(viewer, query),
);

const key = z.string().min(8).max(100);

/** Opens a job. The `Idempotency-Key` header is asked for: sent again, it gets the first answer. */
export const POST = handler({ body: newJob, permission: "jobs.write" }, async ({ viewer, body, request }) => {
  const saveId = key.safeParse(request.headers.get("idempotency-key"));
  if (!saveId.success)
    return failed("key-missing", "Send an Idempotency-Key header of 8 to 100 characters, new for each job.");
  const opened = await createJob(viewer, { ...body, saveId: saveId.data });
  return opened.ok ? jsonAnswer(opened.value, 201) : opened;
});
