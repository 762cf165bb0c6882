import { z } from "zod";

/** What each kind of queued work carries: ids only, the worker reads the rest under the firm's policies. */
export const jobSchemas = {
  "build-pack": z.strictObject({ firmId: z.uuid(), packId: z.uuid() }),
  "relay-mail": z.strictObject({ firmId: z.uuid(), outboxId: z.uuid() }),
} as const;

export type JobName = keyof typeof jobSchemas;
export type JobData<N extends JobName> = z.output<(typeof jobSchemas)[N]>;

/**
 * How long one try may take. A process that is killed holds its work until then, and only then does another try
 * begin: so no longer than the slowest honest run (a pack builds in seconds; a mail server may be slow to answer).
 */
export const tryLimitSeconds: Record<JobName, number> = { "build-pack": 90, "relay-mail": 150 };
