import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { notificationData } from "@/lib/notify/notification";
import { csv } from "./csv";
import { documentsFor, hasNotificationRows } from "./documents";
import type { Rasterise } from "./docx/text";
import { drawingsOf } from "./drawings-of";
import type { Issue, IssuePhoto } from "./issue";
import { manifestOf, type Manifest } from "./manifest";
import { withoutMetadata } from "./photo-bytes";
import { photoNames } from "./photo-names";
import { readmeText } from "./readme-text";
import { sha256 } from "./sha256";
import { toDocx } from "./to-docx";
import { archive, type ArchiveEntry } from "./zip";

export type Progress = { done: number; total: number; step: string };

export type BundleInput = {
  job: Job;
  assessment: Assessment;
  issue: Issue;
  /** Bytes of a photo by its file name in the record; null when it is not to be had. */
  photoBytes: (file: string) => Promise<Uint8Array | null>;
  /** SVG to PNG, from `lib/server/rasterise`. */
  rasterise: Rasterise;
  /** Head of the firm's chain of events, printed in the manifest. */
  chainHead?: string | null;
  onProgress?: (progress: Progress) => void | Promise<void>;
};

export type Bundle = {
  zip: Uint8Array;
  manifest: Manifest;
  /** Of the zip. */
  sha256: string;
  /** Of MANIFEST.json: the pack's fingerprint, which does not depend on how the files are packed. */
  manifestSha256: string;
  /** Photos named in the issue that could not be put in: not to be had, or no JPEG, PNG or WebP. */
  leftOut: string[];
};

const json = (value: unknown) => `${JSON.stringify(value, null, 2)}\n`;

/**
 * The whole pack as one zip: documents, drawings, data, photos without their metadata, manifest and hashes. The same
 * input gives the same bytes on any machine, whatever its clock and time zone.
 */
export async function buildBundle(input: BundleInput): Promise<Bundle> {
  const { job, assessment, photoBytes, rasterise, chainHead = null, onProgress } = input;
  const { photos, leftOut } = await readPhotos(input.issue.photos, photoBytes);
  const issue: Issue = { ...input.issue, photos: photos.map(({ photo }) => photo), photosLeftOut: leftOut };
  const documents = documentsFor(job, assessment, issue);
  const total = documents.length + 2;
  const entries: ArchiveEntry[] = [];
  for (const [done, document] of documents.entries()) {
    await onProgress?.({ done, total, step: `Writing ${document.title}` });
    entries.push({ name: `${document.slug}.docx`, bytes: await toDocx(document, rasterise), store: true });
  }
  await onProgress?.({ done: documents.length, total, step: "Adding drawings, data and photos" });
  const names = photoNames(job, issue.photos);
  entries.push(
    ...drawingsOf(job, assessment).map(({ name, drawing }) => ({ name, bytes: drawing.svg })),
    { name: "data/job.json", bytes: json(job) },
    { name: "data/assessment.json", bytes: json(assessment) },
    ...(hasNotificationRows(assessment)
      ? [{ name: "data/notification.csv", bytes: notificationCsv(job, assessment) }]
      : []),
    ...photos.map(({ bytes }, index) => ({ name: names[index] ?? "", bytes, store: true })),
    { name: "README.txt", bytes: readmeText(job, issue, documents) },
  );
  const files = await Promise.all(entries.map(hashed));
  const named = issue.photos.map(({ number, file, subject }, index) => ({
    number,
    name: names[index] ?? "",
    file,
    subject,
  }));
  const manifest = manifestOf({ job, assessment, issue, chainHead }, named, files);
  const manifestText = json(manifest);
  const manifestSha256 = await sha256(manifestText);
  const sums = [...files, { name: "MANIFEST.json", sha256: manifestSha256 }];
  await onProgress?.({ done: documents.length + 1, total, step: "Packing" });
  const zip = await archive([
    ...entries,
    { name: "MANIFEST.json", bytes: manifestText },
    { name: "SHA256SUMS", bytes: sums.map((file) => `${file.sha256}  ${file.name}\n`).join("") },
  ]);
  await onProgress?.({ done: total, total, step: "Done" });
  return { zip, manifest, sha256: await sha256(zip), manifestSha256, leftOut };
}

async function hashed({ name, bytes }: ArchiveEntry): Promise<Manifest["files"][number]> {
  const data = typeof bytes === "string" ? new TextEncoder().encode(bytes) : bytes;
  return { name, bytes: data.length, sha256: await sha256(data) };
}

type ReadPhoto = { photo: IssuePhoto; bytes: Uint8Array };

/** Photos cleaned of their metadata. What cannot be put in is named, never dropped in silence. */
async function readPhotos(
  photos: readonly IssuePhoto[],
  photoBytes: BundleInput["photoBytes"],
): Promise<{ photos: ReadPhoto[]; leftOut: string[] }> {
  const read: ReadPhoto[] = [];
  const leftOut: string[] = [];
  for (const photo of photos) {
    const bytes = await photoBytes(photo.file);
    const clean = bytes && withoutMetadata(bytes);
    // The name's ending follows what the file is, not what it was called.
    if (clean) read.push({ photo: { ...photo, file: renamed(photo.file, clean.kind) }, bytes: clean.bytes });
    else leftOut.push(photo.file);
  }
  return { photos: read, leftOut };
}

const renamed = (file: string, kind: string): string => {
  const ending = file.slice(file.lastIndexOf(".") + 1).toLowerCase();
  const right = ending === kind || (kind === "jpg" && ending === "jpeg");
  return right ? file : `${file}.${kind}`;
};

/** What the operator receives, one row a datum. */
const notificationCsv = (job: Job, assessment: Assessment): string =>
  csv([
    ["section", "key", "label", "value", "unit"],
    ...notificationData(job, assessment).flatMap(({ section, rows }) =>
      rows.map(({ key, label, value, unit }) => [section, key, label, value ?? "not recorded", unit ?? ""]),
    ),
  ]);
