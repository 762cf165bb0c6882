import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { parseSupplyNumber } from "@/lib/notify/supply-number";
import type { Block, DocumentModel } from "./model";
import { addressOf } from "./words/facts";

export type IssuePhoto = {
  /** File name in the job record; the bundle renames it. */
  file: string;
  subject: EvidenceSubject;
  caption: string | null;
  takenAt: string | null;
  /** Number by which the documents cite it, from 1. */
  number: number;
};

export type IssueChange = { path: string; was: unknown; now: unknown };

/** What is said of one sealing of a pack beside the record itself. */
export type Issue = {
  version: number;
  /** UTC instant; every date in the pack that is not in the record comes from it. */
  issuedAt: string;
  sealedBy: string;
  /** Why it was sealed although facts were missing; null when none were. */
  gapsReason: string | null;
  photos: readonly IssuePhoto[];
  /** Photos the record names that could not be put in; the bundle finds them, the cover says so. */
  photosLeftOut?: readonly string[];
  /** What changed since the version before, field by field; empty in version 1. */
  changes: readonly IssueChange[];
};

/** Everything a document is made from. */
export type Papers = { job: Job; assessment: Assessment; issue: Issue };

/** The model's frame: running head and foot, title, then the blocks. */
export const documentOf = (
  { job, assessment, issue }: Papers,
  head: Pick<DocumentModel, "slug" | "title" | "subtitle">,
  blocks: readonly Block[],
): DocumentModel => ({
  ...head,
  firmName: job.firm.name ?? "Firm not recorded",
  jobNumber: job.jobNumber,
  version: issue.version,
  issuedAt: issue.issuedAt,
  ruleset: assessment.ruleset,
  blocks,
});

export const siteOf = ({ site }: Pick<Job, "site">): string => addressOf(site.address, site.postcode);

/** The supply number as it is read aloud, as typed where it cannot be read; null where there is none. */
export function supplyNumberOf({ site }: Pick<Job, "site">): string | null {
  if (site.supplyNumber === null) return null;
  const reading = parseSupplyNumber(site.supplyNumber, site.territory);
  return reading.ok ? reading.printed : site.supplyNumber;
}

/** The operator by name, or in words where it could not be told. */
export const operatorName = ({ operator }: Assessment): string =>
  operator.kind === "unknown" ? "the network operator" : operator.name;

/** "photo 3", "photos 3 and 4", or null when no photo of the subject is in the pack. */
export function photosOf({ photos }: Issue, subjects: readonly EvidenceSubject[]): string | null {
  const numbers = photos.filter(({ subject }) => subjects.includes(subject)).map(({ number }) => number);
  if (numbers.length === 0) return null;
  return numbers.length === 1
    ? `photo ${numbers[0]}`
    : `photos ${numbers.slice(0, -1).join(", ")} and ${numbers.at(-1)}`;
}
