import type { DemandRoute } from "./assessment";

/** The life of one paper sent to an operator. Silence never approves: no move leads from silence to approved. */
export const submissionPurposes = [
  "demand-notice",
  "application",
  "completion-notice",
  "generation-notice",
  "generation-application",
  "safety-report",
] as const;
export type SubmissionPurpose = (typeof submissionPurposes)[number];

export const submissionPurposeName: Record<SubmissionPurpose, string> = {
  "demand-notice": "Notice",
  application: "Application",
  "completion-notice": "Completion notice",
  "generation-notice": "Generation notice",
  "generation-application": "Generation application",
  "safety-report": "Safety report",
};

export const submissionChannels = ["e-mail", "operator-page", "telephone", "post"] as const;
export type SubmissionChannel = (typeof submissionChannels)[number];

export const submissionChannelName: Record<SubmissionChannel, string> = {
  "e-mail": "E-mail",
  "operator-page": "Operator’s own page",
  telephone: "Telephone",
  post: "Post",
};

export const submissionStates = [
  "draft",
  "queued",
  "submitted",
  "bounced",
  "acknowledged",
  "question",
  "recorded",
  "approved",
  "approved-with-limit",
  "approved-works-to-follow",
  "works-required",
  "offer-open",
  "refused",
  "withdrawn",
  "closed",
] as const;
export type SubmissionState = (typeof submissionStates)[number];

export const submissionStateName: Record<SubmissionState, string> = {
  draft: "Ready, not sent",
  queued: "Leaving by e-mail",
  submitted: "No acknowledgement",
  bounced: "Bounced",
  acknowledged: "Acknowledged",
  question: "Question to answer",
  recorded: "Recorded by the operator",
  approved: "Approved",
  "approved-with-limit": "Approved with a limit",
  "approved-works-to-follow": "Approved, works to follow",
  "works-required": "Works required",
  "offer-open": "Offer open",
  refused: "Refused",
  withdrawn: "Withdrawn",
  closed: "Closed",
};

export type SubmissionNeed = "reference" | "decision-day" | "limit" | "note" | "expires";
export type SubmissionMove = {
  to: SubmissionState;
  label: string;
  /** What the person must give with the move. */
  needs: SubmissionNeed[];
  /** `send`: made by sending or recording that it was sent; `reply`: what the operator said; `firm`: the firm's own act. */
  by: "send" | "reply" | "firm";
};

const asks = (purpose: SubmissionPurpose) => purpose === "application" || purpose === "generation-application";

const sendMoves: SubmissionMove[] = [
  { to: "queued", label: "Send by e-mail", needs: [], by: "send" },
  { to: "submitted", label: "Record as sent", needs: [], by: "send" },
];
const withdraw: SubmissionMove = { to: "withdrawn", label: "Withdraw", needs: ["note"], by: "firm" };
const close = (label: string): SubmissionMove => ({ to: "closed", label, needs: [], by: "firm" });

const acknowledge: SubmissionMove = { to: "acknowledged", label: "Acknowledged", needs: ["reference"], by: "reply" };
const ask: SubmissionMove = { to: "question", label: "The operator asks for more", needs: ["note"], by: "reply" };
const answer: SubmissionMove = { to: "acknowledged", label: "Question answered", needs: ["note"], by: "firm" };
const bounce: SubmissionMove = { to: "bounced", label: "It came back undelivered", needs: ["note"], by: "reply" };
const works: SubmissionMove = { to: "works-required", label: "Works are required", needs: ["note"], by: "reply" };

/** A decision is the operator's written word: it always carries its reference and its day. */
const decided: SubmissionMove[] = [
  { to: "approved", label: "Approved", needs: ["reference", "decision-day"], by: "reply" },
  {
    to: "approved-with-limit",
    label: "Approved with a limit",
    needs: ["reference", "decision-day", "limit"],
    by: "reply",
  },
  {
    to: "approved-works-to-follow",
    label: "Approved, works to follow",
    needs: ["reference", "decision-day", "note"],
    by: "reply",
  },
  works,
  {
    to: "offer-open",
    label: "Quotation or connection offer",
    needs: ["reference", "decision-day", "expires"],
    by: "reply",
  },
  { to: "refused", label: "Refused as applied", needs: ["decision-day", "note"], by: "reply" },
];
const noted: SubmissionMove[] = [{ to: "recorded", label: "Recorded", needs: ["reference"], by: "reply" }, works];

const answers = (purpose: SubmissionPurpose) => (asks(purpose) ? decided : noted);
const without = (moves: SubmissionMove[], ...states: SubmissionState[]) =>
  moves.filter(({ to }) => !states.includes(to));

const offered: SubmissionMove[] = [
  ...without(decided, "offer-open", "works-required"),
  { to: "works-required", label: "Offer accepted, works to book", needs: ["decision-day"], by: "firm" },
  { to: "withdrawn", label: "Offer left to lapse", needs: ["note"], by: "firm" },
];

const moves: Record<SubmissionState, (purpose: SubmissionPurpose) => SubmissionMove[]> = {
  draft: () => [...sendMoves, withdraw],
  queued: () => [{ to: "submitted", label: "Left by e-mail", needs: [], by: "send" }, bounce],
  submitted: (purpose) => [acknowledge, ...answers(purpose), ask, bounce, withdraw],
  bounced: () => [...sendMoves, withdraw],
  acknowledged: (purpose) => [...answers(purpose), ask, withdraw],
  question: (purpose) => [answer, ...answers(purpose), withdraw],
  recorded: () => [ask, works, close("Close")],
  approved: () => [ask, close("Close")],
  "approved-with-limit": () => [ask, close("Close")],
  "approved-works-to-follow": () => [close("Works done, close")],
  "works-required": (purpose) => [
    ...without(answers(purpose), "works-required"),
    ask,
    withdraw,
    close("Works done, close"),
  ],
  "offer-open": (purpose) => (asks(purpose) ? offered : [withdraw]),
  refused: () => [close("Close")],
  withdrawn: () => [],
  closed: () => [],
};

/** Every way out of a state, for one kind of paper, in the order a screen offers them. */
export const submissionMoves = (from: SubmissionState, purpose: SubmissionPurpose): SubmissionMove[] =>
  moves[from](purpose);

/** States from which a paper may come to `to`, for the guard of an update; of one purpose, or of any. */
export const cameFrom = (to: SubmissionState, purpose?: SubmissionPurpose): SubmissionState[] =>
  submissionStates.filter((from) =>
    (purpose ? [purpose] : submissionPurposes).some((each) => moves[from](each).some((move) => move.to === to)),
  );

/** States in which the operator holds the paper. */
export const isSent = (state: SubmissionState): boolean => !["draft", "queued", "bounced", "withdrawn"].includes(state);

/** States in which the operator has answered. */
export const isAnswered = (state: SubmissionState): boolean =>
  isSent(state) && !["submitted", "acknowledged", "question", "offer-open"].includes(state);

/** States that ask nothing more of anybody. */
export const isOver = (state: SubmissionState): boolean => state === "closed" || state === "withdrawn";

/**
 * Why a paper may not leave now, or null when it may. The safety report goes first: while one waits unsent, and
 * for as long as the route is stop, nothing else leaves.
 * `safetyReport` is the state of the job's safety report, null when it has none.
 */
export function heldBack(paper: {
  purpose: SubmissionPurpose;
  route: DemandRoute | null;
  safetyReport: SubmissionState | null;
}): string | null {
  if (paper.purpose === "safety-report") return null;
  if (paper.route === null) return "The record contradicts itself. Put the marked facts right, then send.";
  if (paper.route === "stop")
    return "The route is stop. Only the safety report leaves this job until the danger is cleared and recorded.";
  if (paper.safetyReport !== null && !isSent(paper.safetyReport) && !isOver(paper.safetyReport))
    return "A safety report waits unsent. Record it as sent first.";
  return null;
}
