import { z } from "zod";
import { amount, fact, instant, isoDate, itemId, text, word } from "./facts";

/** Certificates, declarations, pictures, files and what the operator has said. */
export const certificateSchema = z.object({
  kind: fact(word(["installation", "minor-works"])),
  number: fact(text(60)),
  issuedOn: fact(isoDate),
});

export const buildingControlSchema = z.object({
  route: fact(word(["self-certified", "third-party", "local-authority", "warrant", "not-notifiable", "unknown"])),
  reference: fact(text(60)),
  notifiedOn: fact(isoDate),
  occupierCopyOn: fact(isoDate),
});

export const declarationSchema = z.object({
  role: word(["competent-person", "designer", "customer"]),
  name: fact(text()),
  at: fact(instant),
  statement: fact(text(2000)),
});

export const evidenceSubjects = [
  "intake",
  "cut-out",
  "service-head",
  "meter",
  "earth-terminal",
  "bonding",
  "consumer-unit",
  "rating-plate",
  "chargepoint",
  "isolator",
  "limit-setting",
  "default-hours-screen",
  "delay-screen",
  "first-use-prompt",
  "discharge-setting",
  "open-pen-device",
  "electrode",
  "neighbour-earths",
  "damage",
  "supply-number",
  "load-survey",
  "test-instrument-screen",
  "other",
] as const;
export type EvidenceSubject = (typeof evidenceSubjects)[number];

export const evidenceSchema = z.object({
  subject: word(evidenceSubjects),
  of: fact(itemId),
  file: z
    .string()
    .regex(/^[A-Za-z0-9][A-Za-z0-9._-]{0,99}$/, "use a plain file name of letters, figures, dots and hyphens"),
  caption: fact(text(400)),
  takenAt: fact(instant),
});

export const attachmentSchema = z.object({
  kind: word([
    "operator-approval",
    "operator-statement",
    "certificate",
    "statement-of-compliance",
    "technical-file",
    "permission",
    "load-data",
    "type-test",
    "other",
  ]),
  file: fact(text(100)),
  sha256: fact(z.string().regex(/^[0-9a-f]{64}$/, "must be 64 hexadecimal figures")),
});

export const operatorRecordSchema = z.object({
  purpose: word([
    "demand-notice",
    "application",
    "completion-notice",
    "generation-notice",
    "generation-application",
    "safety-report",
  ]),
  reference: fact(text(60)),
  decision: fact(word(["approved", "approved-with-limit", "approved-works-to-follow", "refused"])),
  decidedOn: fact(isoDate),
  expires: fact(isoDate),
  limitA: fact(amount(0, 5000, "A")),
  model: fact(text()),
  conditions: fact(text(2000)),
  sentOn: fact(isoDate),
  sentTo: fact(text(254)),
});
