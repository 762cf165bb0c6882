import { z } from "zod";
import { evidenceSubjects } from "@/lib/notify/job/papers";
import { submissionPurposes } from "@/lib/notify/submission";

/** A parameter that was left empty in a form's query is one that was not given. */
const given = <S extends z.ZodType>(schema: S) =>
  z.preprocess((value) => (value === "" ? undefined : value), schema.optional()).transform((value) => value ?? null);

export const id = z.uuid("is not an id");
export const cursor = given(z.string().max(400));

export const routes = ["notify", "apply", "late-application", "more-facts-needed", "stop"] as const;
export const standings = [
  "recording",
  "ready-to-seal",
  "sealing",
  "sealed",
  "sent",
  "answered",
  "closed",
  "returned",
  "stopped",
] as const;

/** Filters of the jobs list, as they stand in the page's own address. */
export const jobFilter = z.object({
  q: given(z.string().trim().max(100)),
  stage: given(z.enum(["planned", "installed"])),
  standing: given(z.enum(standings)),
  operatorId: given(z.string().max(10)),
  route: given(z.enum(routes)),
  installerId: given(id),
  sort: z.enum(["last-day", "updated", "number"]).default("last-day"),
  after: cursor,
});

const tabs = [
  "needs-someone",
  "past-last-day",
  "not-sent",
  "no-acknowledgement",
  "question",
  "chase-due",
  "offer-open",
  "waiting",
  "closed",
  "all",
] as const;

/** Filters of the submissions desk. */
export const submissionFilter = z.object({
  tab: z.enum(tabs).default("needs-someone"),
  q: given(z.string().trim().max(100)),
  operatorId: given(z.string().max(10)),
  purpose: given(z.enum(submissionPurposes)),
  after: cursor,
});

const path = z.string().min(1).max(200);

export const saveRequest = z.strictObject({
  saveId: id,
  baseVersion: z.number().int().min(1),
  changes: z
    .array(z.strictObject({ path, was: z.json().optional(), value: z.json() }))
    .min(1, "send at least one change")
    .max(500, "send at most 500 changes at once"),
});

export const newJob = z.strictObject({
  id,
  record: z.looseObject({}),
  installerId: id.nullable().optional(),
});

export const subject = z.enum(evidenceSubjects);
export const caption = z
  .string()
  .trim()
  .max(400, "use at most 400 characters")
  .transform((text) => text || null);

export const photoChange = z.strictObject({
  caption: caption.nullable(),
  subject,
  inPack: z.boolean(),
});
