import { z } from "zod";
import { chargepointSchema } from "./job/chargepoint";
import { fact, text, word } from "./job/facts";
import { boardSchema, circuitSchema } from "./job/installation";
import {
  attachmentSchema,
  buildingControlSchema,
  certificateSchema,
  declarationSchema,
  evidenceSchema,
  operatorRecordSchema,
} from "./job/papers";
import {
  competentPersonSchema,
  customerSchema,
  datesSchema,
  demandSchema,
  firmSchema,
  onBehalfOfSchema,
  siteSchema,
  supplySchema,
} from "./job/site";
import { contradictions } from "./job/contradictions";
import type { FieldError } from "./result";

/**
 * The job record, `sealwire.job/1`: the one definition of a job's facts. Forms fill it, the jobs table
 * stores it, the pack carries it and the two commands read it. Omitted and `null` mean "not asked yet";
 * `"unknown"` means somebody looked and could not tell; `[]` means looked, none.
 */
export const jobSchema = z.object({
  format: z.literal("sealwire.job/1", { error: () => 'must be "sealwire.job/1"' }),
  jobNumber: z
    .string({ error: () => "give the job a number, for example FEN-0147" })
    .trim()
    .regex(/^[A-Za-z0-9][A-Za-z0-9/-]{0,29}$/, "use letters, figures and hyphens, at most 30 characters"),
  stage: word(["planned", "installed"]),
  kind: word(["new", "replacement", "change-after-commissioning", "removal"]).default("new"),
  follows: fact(text(30)),
  dates: datesSchema.prefault({}),
  firm: firmSchema.prefault({}),
  competentPerson: competentPersonSchema.prefault({}),
  onBehalfOf: onBehalfOfSchema.prefault({}),
  customer: customerSchema.prefault({}),
  site: siteSchema.prefault({}),
  supply: supplySchema.prefault({}),
  demand: demandSchema.prefault({}),
  boards: z.array(boardSchema).max(20).default([]),
  circuits: z.array(circuitSchema).max(60).default([]),
  chargepoints: z.array(chargepointSchema).max(60).default([]),
  certificate: certificateSchema.prefault({}),
  buildingControl: buildingControlSchema.prefault({}),
  declarations: z.array(declarationSchema).max(20).default([]),
  evidence: z.array(evidenceSchema).max(200).default([]),
  attachments: z.array(attachmentSchema).max(100).default([]),
  operatorRecords: z.array(operatorRecordSchema).max(100).default([]),
  notes: fact(text(5000)),
});

export type Job = z.output<typeof jobSchema>;
export type Circuit = Job["circuits"][number];
export type Board = Job["boards"][number];
export type Chargepoint = Job["chargepoints"][number];

/** A record whose facts do not contradict each other: the only thing the rules accept. */
export type JobFacts = Job & { readonly __facts: unique symbol };

/**
 * Takes out what means "not asked": nulls and blank text in objects, blank lines in lists of text. A null inside
 * a list stays and is refused, so that no phase or reading can drop out of a list unseen.
 */
function withoutBlanks(value: unknown): unknown {
  if (Array.isArray(value)) return value.filter((item) => !isBlankText(item)).map(withoutBlanks);
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(
    Object.entries(value)
      .filter(([, item]) => item !== null && !isBlankText(item))
      .map(([key, item]) => [key, withoutBlanks(item)]),
  );
}

const isBlankText = (value: unknown) => typeof value === "string" && value.trim() === "";

export type Parsed<T> = { ok: true; value: T; unread: string[] } | { ok: false; fields: FieldError[] };

const pathOf = (path: readonly PropertyKey[]) =>
  path
    .map(String)
    .reduce((whole, part) => (/^\d+$/.test(part) ? `${whole}[${part}]` : whole ? `${whole}.${part}` : part), "");

/**
 * Reads a record as a draft: any fact may be missing, none may be malformed.
 * Errors: one entry a field, with its path and the remedy. Nothing is thrown.
 */
export function parseDraft(input: unknown): Parsed<Job> {
  if (input === null || typeof input !== "object" || Array.isArray(input))
    return {
      ok: false,
      fields: [{ path: "(record)", message: "must be a JSON object; see the job record's JSON Schema" }],
    };
  const cleaned = withoutBlanks(input);
  const parsed = jobSchema.safeParse(cleaned);
  if (!parsed.success)
    return {
      ok: false,
      fields: parsed.error.issues.map((issue) => ({ path: pathOf(issue.path) || "(record)", message: issue.message })),
    };
  return { ok: true, value: parsed.data, unread: unreadPaths(cleaned, parsed.data) };
}

/** Paths in the input that the record does not define, so that a misspelt fact is never dropped in silence. */
function unreadPaths(input: unknown, read: unknown, path = ""): string[] {
  if (input === null || typeof input !== "object") return [];
  if (read === null || typeof read !== "object") return path ? [path] : [];
  return Object.entries(input).flatMap(([key, value]) => {
    const here = Array.isArray(input) ? `${path}[${key}]` : path ? `${path}.${key}` : key;
    return key in read ? unreadPaths(value, (read as Record<string, unknown>)[key], here) : [here];
  });
}

/**
 * Reads a record for the rules: a draft whose facts do not contradict each other.
 * Errors as `parseDraft`, and one for each contradiction (installed without its date, commissioned before
 * installed, a three-phase unit on a one-phase supply, sold by nobody).
 */
export function parseJob(input: unknown): Parsed<JobFacts> {
  const draft = parseDraft(input);
  if (!draft.ok) return draft;
  const fields = contradictions(draft.value);
  return fields.length ? { ok: false, fields } : { ok: true, value: draft.value as JobFacts, unread: draft.unread };
}

/** JSON Schema (2020-12) of what a client may send; served at `/api/v1/schema/job`. */
export const jobJsonSchema = () =>
  z.toJSONSchema(jobSchema, { io: "input", target: "draft-2020-12", unrepresentable: "any" });
