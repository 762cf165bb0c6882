import { z } from "zod";
import { id, saveRequest } from "../../../inputs";
import { saveJob } from "@/db/queries/jobs";
import { handler, jsonAnswer } from "@/lib/server/handler";

/** Puts changes into a job, the same way with and without a signal. A conflict is 409 with both values of each fact. */
export const POST = handler(
  { params: z.object({ jobId: id }), body: saveRequest, permission: "jobs.write" },
  async ({ viewer, params, body }) => {
    const changes = body.changes.map(({ path, was, value }) => ({ path, was: was ?? null, value }));
    const reply = await saveJob(viewer, { ...params, ...body, changes });
    return reply.ok && !reply.value.saved ? jsonAnswer(reply.value, 409) : reply;
  },
);
