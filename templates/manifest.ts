import type { Job } from "@/lib/notify/job";
import type { Assessment } from "@/lib/notify/assessment";
import type { Issue } from "./issue";

export type ManifestFile = { name: string; bytes: number; sha256: string };

/** `sealwire.pack/1`: what a pack holds, for a program to check it by. */
export type Manifest = {
  format: "sealwire.pack/1";
  firm: string | null;
  jobNumber: string;
  version: number;
  issuedAt: string;
  sealedBy: string;
  ruleset: string;
  route: string;
  gapsReason: string | null;
  /** Head of the firm's chain of events when the pack was sealed; null outside a firm's own records. */
  chainHead: string | null;
  /** Photos by the number that documents cite, with their names in the job record. */
  photos: { number: number; name: string; file: string; subject: string }[];
  files: ManifestFile[];
};

/** The manifest in the order its fields are read in. */
export const manifestOf = (
  { job, assessment, issue, chainHead }: { job: Job; assessment: Assessment; issue: Issue; chainHead: string | null },
  photos: Manifest["photos"],
  files: ManifestFile[],
): Manifest => ({
  format: "sealwire.pack/1",
  firm: job.firm.name,
  jobNumber: job.jobNumber,
  version: issue.version,
  issuedAt: issue.issuedAt,
  sealedBy: issue.sealedBy,
  ruleset: assessment.ruleset,
  route: assessment.route.demand,
  gapsReason: issue.gapsReason,
  chainHead,
  photos,
  files,
});
