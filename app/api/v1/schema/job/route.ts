import { jobJsonSchema } from "@/lib/notify/job";
import { publicHandler } from "@/lib/server/handler";

/** JSON Schema (2020-12) of the job record that `POST /api/v1/jobs` takes. */
export const GET = publicHandler({}, async () =>
  Response.json(jobJsonSchema(), { headers: { "content-type": "application/schema+json" } }),
);
