import type { SubmissionPurpose, SubmissionState } from "@/lib/notify/submission";
import { longDate } from "@/lib/notify/calendar";

export type LetterFacts = {
  purpose: SubmissionPurpose;
  state: SubmissionState;
  jobNumber: string;
  site: string;
  postcode: string | null;
  supplyCore: string | null;
  unit: string;
  installedOn: string | null;
  plannedOn: string | null;
  sentOn: string | null;
  reference: string | null;
  workingDaysSinceSent: number | null;
  packVersion: number | null;
  /** What the operator asked, in their words, while a question waits for its answer. */
  question: string | null;
  firmName: string;
  sender: string;
  phone: string | null;
};

const papers: Record<SubmissionPurpose, { name: string; opening: (facts: LetterFacts) => string }> = {
  "demand-notice": {
    name: "Notice of one EV chargepoint installation",
    opening: (facts) => `We notify you of ${facts.unit}, installed ${dayOf(facts)} at ${placeOf(facts)}.`,
  },
  application: {
    name: "Application before installing an EV chargepoint",
    opening: (facts) =>
      facts.installedOn
        ? `We apply for ${facts.unit} at ${placeOf(facts)}. It was installed ${dayOf(facts)} without your answer; the form says why.`
        : `We apply to install ${facts.unit} at ${placeOf(facts)}. Nothing will be installed before your answer.`,
  },
  "completion-notice": {
    name: "Completion of an approved EV chargepoint",
    opening: (facts) => `The work you approved is done: ${facts.unit}, installed ${dayOf(facts)} at ${placeOf(facts)}.`,
  },
  "generation-notice": {
    name: "Notice of a chargepoint that can discharge",
    opening: (facts) =>
      `We notify you of ${facts.unit}, which can discharge, commissioned ${dayOf(facts)} at ${placeOf(facts)}.`,
  },
  "generation-application": {
    name: "Application for a chargepoint that can discharge",
    opening: (facts) => `We apply to connect ${facts.unit}, which can discharge, at ${placeOf(facts)}.`,
  },
  "safety-report": {
    name: "Condition of the service equipment",
    opening: (facts) =>
      `We report what was seen of your equipment at ${placeOf(facts)}. This confirms the telephone report; the form lists what was seen.`,
  },
};

function dayOf({ installedOn, plannedOn }: LetterFacts): string {
  const day = installedOn ?? plannedOn;
  return day ? `on ${longDate(day)}` : "on a day stated in the form";
}

function placeOf({ site, postcode, supplyCore }: LetterFacts): string {
  const place = postcode && !site.includes(postcode) ? `${site}, ${postcode}` : site;
  return supplyCore ? `${place} (supply number ${supplyCore})` : place;
}

/** A title inside a sentence: only its first letter loses its height, so that "EV" and names keep theirs. */
const inSentence = (title: string) => title.charAt(0).toLowerCase() + title.slice(1);

/** The head of an answer; the answer itself is the sender's, and goes in after it. */
function answer(facts: LetterFacts): string {
  const name = inSentence(papers[facts.purpose].name);
  const asked = facts.question ? `you asked: “${facts.question}”` : "you asked us for more.";
  return `About our ${name} for ${placeOf(facts)}, ${asked}`;
}

function chase(facts: LetterFacts): string {
  const name = inSentence(papers[facts.purpose].name);
  const reference = facts.reference ? ` under your reference ${facts.reference}` : "";
  const sent = facts.sentOn ? ` on ${longDate(facts.sentOn)}` : "";
  const gone = facts.workingDaysSinceSent;
  const days = gone === null ? "" : ` ${gone} working day${gone === 1 ? " has" : "s have"} passed since.`;
  const ask =
    facts.state === "submitted"
      ? "Please confirm that it has arrived and tell us your reference."
      : "Please tell us how it stands, and what you still need from us.";
  return `We sent you our ${name} for ${placeOf(facts)}${sent}${reference}.${days} ${ask}`;
}

const chased: SubmissionState[] = ["submitted", "acknowledged"];

/** A drafted mail for a paper as it stands: the first sending, a chase, or the answer to a question. A person reads it before it goes. */
export function submissionLetter(facts: LetterFacts): { subject: string; body: string } {
  const again = chased.includes(facts.state) || facts.state === "question";
  const paper = papers[facts.purpose];
  const sealed =
    facts.packVersion === null
      ? ""
      : `The sealed pack is attached${again ? " again" : ""}, version ${facts.packVersion}.`;
  const number = facts.phone ? `Telephone ${facts.phone}.` : "";
  const words = (between: string, opening: string) => [opening, sealed].filter(Boolean).join(between);
  return {
    subject: `${facts.reference ? `${facts.reference}: ` : ""}${paper.name}, ${facts.site} (${facts.jobNumber})`,
    body: [
      "Dear connections team,",
      facts.state === "question"
        ? words("\n\n", answer(facts))
        : words(" ", again ? chase(facts) : paper.opening(facts)),
      `Our job number is ${facts.jobNumber}. ${number}`.trim(),
      `${facts.sender}\n${facts.firmName}`,
    ].join("\n\n"),
  };
}
