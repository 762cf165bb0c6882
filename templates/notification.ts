import { notificationVariant } from "@/lib/notify/pack";
import { leaveSealsCaution } from "./cautions";
import { documentOf, operatorName, type Papers } from "./issue";
import type { Block, DocumentModel } from "./model";
import { safetyReport } from "./notification/safety-report";
import {
  dataSections,
  generationSection,
  operatorRecords,
  photoEvidence,
  routeReasons,
  unitSchedule,
} from "./notification/sections";
import { wordingOf } from "./notification/wording";
import { dayOf } from "./words/facts";

/** The paper the network operator receives, in the variant that the route calls for. */
export function networkNotification(papers: Papers): DocumentModel {
  const variant = notificationVariant(papers.job, papers.assessment);
  const { title, subtitle, why } = wordingOf(variant, papers);
  const head = { slug: "01-network-notification", title, subtitle };
  if (variant === "safety-report")
    return documentOf(papers, head, [...safetyReport(papers), declaration(papers), leaveSealsCaution]);
  return documentOf(papers, head, [
    ...(variant === "late-application" ? lateExplanation(papers) : []),
    ...(variant === "not-ready" ? stillMissing(papers) : []),
    ...dataSections(papers),
    ...unitSchedule(papers),
    { kind: "heading", level: 1, text: why },
    ...routeReasons(papers),
    ...generationSection(papers),
    ...operatorRecords(papers),
    ...evidenceCaution(papers),
    ...photoEvidence(papers),
    { kind: "heading", level: 1, text: "Declaration" },
    declaration(papers),
  ]);
}

/** Said plainly, before anything else, so that nobody takes it for an application made in time. */
function lateExplanation({ job, assessment }: Papers): Block[] {
  const triggers = assessment.route.reasons.filter(({ used }) => used.leadsTo === "apply");
  return [
    {
      kind: "caution",
      title: "This application is late",
      text: `The chargepoint was installed on ${dayOf(job.dates.installed)}, before ${operatorName(assessment)} was asked. No approval held before that day is recorded. The operator is asked to assess the connection now and to say what has to be done.`,
    },
    {
      kind: "paragraph",
      text: triggers.length
        ? `It should have been applied for first because: ${triggers.map(({ because }) => because).join(" ")}`
        : "The record does not say which rule called for an application.",
    },
  ];
}

const stillMissing = ({ assessment }: Papers): Block[] => [
  {
    kind: "caution",
    title: "Not to be sent as it stands",
    text: "Facts that the rules need are missing. Nothing in this paper is a notice or an application.",
  },
  {
    kind: "list",
    ordered: false,
    items: assessment.missing.map(({ path, needed }) => [{ text: needed }, { text: ` (${path})`, quiet: true }]),
  },
];

/** The footing of the rating, where it is less than the operator's own word. */
function evidenceCaution({ job }: Papers): Block[] {
  const { cutOutEvidence, cutOutSeenUnder } = job.supply;
  if (cutOutEvidence === "carrier-label")
    return [
      {
        kind: "caution",
        title: "The cut-out rating is as marked on the carrier",
        text: "A carrier's label says what it can hold. The fuse link itself was not seen; no seal was broken for this record.",
      },
    ];
  if (cutOutEvidence === "fuse-seen")
    return [
      {
        kind: "caution",
        title: "The fuse link was seen",
        text: `Authority: ${cutOutSeenUnder.authority ?? "not recorded"}. Day: ${dayOf(cutOutSeenUnder.on)}.`,
      },
    ];
  return [];
}

function declaration({ job }: Papers): Block {
  const made = job.declarations.find(({ role }) => role === "competent-person");
  const { name, registration } = job.competentPerson;
  return {
    kind: "signature",
    role: registration ? `competent person, ${registration}` : "competent person",
    name: made?.name ?? name,
    at: made?.at ?? null,
    statement:
      made?.statement ??
      "What is recorded here is what was found and done. Dates are those of the day itself. What was not seen is recorded as not known.",
  };
}
