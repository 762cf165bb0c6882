import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { documentsIn, type DocumentSlug } from "@/lib/notify/pack";
import { cover, type Listed } from "./cover";
import { demandAndCircuit } from "./demand-and-circuit";
import { drawingsOf } from "./drawings-of";
import { earthingAndOpenPen } from "./earthing-and-open-pen";
import { handover } from "./handover";
import type { Issue, Papers } from "./issue";
import type { DocumentModel } from "./model";
import { networkNotification } from "./notification";
import { photoNames } from "./photo-names";
import { printableModel } from "./printable";
import { smartChargingSettings } from "./smart-charging-settings";
import { subjectWords } from "./words/vocabulary";

const writers: Readonly<Record<Exclude<DocumentSlug, "00-cover">, (papers: Papers) => DocumentModel>> = {
  "01-network-notification": networkNotification,
  "02-earthing-and-open-pen": earthingAndOpenPen,
  "03-smart-charging-settings": smartChargingSettings,
  "04-demand-and-circuit": demandAndCircuit,
  "05-handover": handover,
};

/**
 * The documents of one issue of a pack, cover first. Pure: the same record, assessment and issue give the same
 * models. Text is already fit for XML; every renderer prints the same words in the same order.
 */
export function documentsFor(job: Job, assessment: Assessment, issue: Issue): DocumentModel[] {
  const papers: Papers = { job, assessment, issue };
  const documents = documentsIn(job, assessment)
    .filter((slug) => slug !== "00-cover")
    .map((slug) => writers[slug](papers));
  return [cover(papers, contentsOf(papers, documents)), ...documents].map(printableModel);
}

/** A stopped job sends nothing but its safety report, so it carries no rows that could be taken for a notice. */
export const hasNotificationRows = ({ route }: Assessment): boolean => route.demand !== "stop";

/** Every file of the bundle by name, as the cover lists it. */
function contentsOf(papers: Papers, documents: readonly DocumentModel[]): Listed[] {
  const { job, assessment, issue } = papers;
  const names = photoNames(job, issue.photos);
  return [
    ...documents.map(({ slug, title }) => ({ name: `${slug}.docx`, title })),
    ...drawingsOf(job, assessment).map(({ name, title }) => ({ name, title })),
    { name: "data/job.json", title: "The job record" },
    { name: "data/assessment.json", title: "The assessment" },
    ...(hasNotificationRows(assessment)
      ? [{ name: "data/notification.csv", title: "What the operator receives, as rows" }]
      : []),
    ...issue.photos.map(({ number, subject }, index) => ({
      name: names[index] ?? "",
      title: `Photo ${number}: ${subjectWords[subject].toLowerCase()}`,
    })),
    { name: "README.txt", title: "How to read and check the pack" },
    { name: "MANIFEST.json, SHA256SUMS", title: "The hash of every file" },
  ];
}
