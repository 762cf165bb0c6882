import type { Job } from "@/lib/notify/job";
import type { IssuePhoto } from "./issue";

/** What may stand in the name of an entry: a job number may hold a slash, which would make a folder. */
export const fileJobNumber = ({ jobNumber }: Pick<Job, "jobNumber">): string =>
  jobNumber.replace(/[^A-Za-z0-9-]/g, "-");

const known: Readonly<Record<string, string>> = { jpg: "jpg", jpeg: "jpg", png: "png", webp: "webp" };

/** "photos/FEN-0147-03-cut-out.jpg" for each photo, in their order. */
export const photoNames = (job: Pick<Job, "jobNumber">, photos: readonly IssuePhoto[]): string[] =>
  photos.map(({ number, subject, file }) => {
    const ending = known[file.slice(file.lastIndexOf(".") + 1).toLowerCase()] ?? "jpg";
    return `photos/${fileJobNumber(job)}-${String(number).padStart(2, "0")}-${subject}.${ending}`;
  });
