import type { Job } from "@/lib/notify/job";
import type { Issue } from "./issue";
import type { DocumentModel } from "./model";
import { printable } from "./printable";
import { clockDate } from "./words/dates";

/** README.txt of a pack: what lies where, and how anybody checks that nothing was altered. */
export function readmeText(job: Job, issue: Issue, documents: readonly DocumentModel[]): string {
  const leftOut = issue.photosLeftOut ?? [];
  const lines = [
    `${job.firm.name ?? "Firm not recorded"}: job ${job.jobNumber}, version ${issue.version}`,
    `Sealed ${clockDate(issue.issuedAt)} by ${issue.sealedBy}.`,
    "",
    "Documents",
    ...documents.map(({ slug, title }) => `  ${slug}.docx  ${title}`),
    "",
    "Beside them",
    "  drawings/  the drawings of the documents, as SVG",
    "  data/      the job record and the assessment as JSON, the network data as CSV",
    "  photos/    numbered as the documents cite them; place and other metadata removed",
    ...(leftOut.length
      ? ["", "Photos named in the record and not in this pack", ...leftOut.map((file) => `  ${file}`)]
      : []),
    "",
    "To check that nothing was altered",
    "  Unpack, go into the folder and run:  sha256sum -c SHA256SUMS",
    "  On a Mac:  shasum -a 256 -c SHA256SUMS",
    "  On Windows, for one file:  certutil -hashfile NAME SHA256",
    "  Each hash must be the one in SHA256SUMS. MANIFEST.json holds the same hashes with sizes.",
    "",
    "A sealed version never changes. A correction is a new version.",
    "The pack says what was recorded, which rule was applied and what is missing. The wiring standard,",
    "the network operator and a competent person prevail over it.",
  ];
  return `${lines.map((line) => line.split("\n").map(noControls).join(" ")).join("\r\n")}\r\n`;
}

/** Without what a terminal could take for a command; the blanks that set out the columns stay. */
const noControls = (line: string): string =>
  line
    .split(/( {2,})/)
    .map((part) => (/^ +$/.test(part) ? part : printable(part)))
    .join("");
