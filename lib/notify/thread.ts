import type { DemandRoute } from "./assessment";
import type { ReviewState } from "./review";
import {
  isAnswered,
  isOver,
  isSent,
  submissionStateName,
  type SubmissionPurpose,
  type SubmissionState,
} from "./submission";
import type { EyeletStanding, JobStanding, PackStatus, ThreadView } from "./views";

export type ThreadInput = {
  stage: "planned" | "installed";
  /** Facts recorded, for the first eyelet; null when not counted. */
  factCount: number | null;
  /** Null when the record contradicts itself. */
  route: DemandRoute | null;
  missingCount: number;
  /** The newest pack, null before any. */
  pack: { version: number; status: PackStatus; sha256: string | null } | null;
  /** Papers of the job that are not withdrawn. */
  submissions: readonly { purpose: SubmissionPurpose; state: SubmissionState; reference: string | null }[];
  /** The newest review that is not superseded. */
  review: { state: ReviewState } | null;
};

const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? "" : "s"}`;
const hash8 = (hash: string | null) => hash?.slice(0, 8) ?? null;

const routeWords: Record<DemandRoute, string> = {
  notify: "notify",
  apply: "apply",
  "late-application": "late application",
  "more-facts-needed": "more facts needed",
  stop: "stop",
};

type Eye = Omit<EyeletStanding, "name" | "hash8"> & { hash8?: string | null };

function jobEyelet({ stage, factCount, route }: ThreadInput): Eye {
  if (route === null) return { standing: "stopped", state: "facts contradict each other" };
  const recorded = factCount === null ? "recorded" : `${plural(factCount, "fact")} recorded`;
  return { standing: "passed", state: stage === "planned" ? `${recorded}, planned` : recorded };
}

function assessmentEyelet({ route, missingCount }: ThreadInput): Eye {
  if (route === null) return { standing: "ahead", state: "waits for the facts" };
  if (route === "stop") return { standing: "stopped", state: "stop, danger recorded" };
  const missing = missingCount ? `, ${plural(missingCount, "fact")} missing` : "";
  return { standing: missingCount ? "now" : "passed", state: `${routeWords[route]}${missing}` };
}

function packEyelet({ pack, route }: ThreadInput): Eye {
  if (!pack) return { standing: "ahead", state: route === "stop" ? "safety report only" : "not sealed" };
  if (pack.status === "building") return { standing: "now", state: `version ${pack.version} is being sealed` };
  if (pack.status === "failed") return { standing: "stopped", state: `version ${pack.version} could not be built` };
  return { standing: "passed", state: `version ${pack.version}, sealed`, hash8: hash8(pack.sha256) };
}

/** The paper that most needs somebody, in the order a desk looks at them. */
function leading(submissions: ThreadInput["submissions"]) {
  const order: SubmissionState[] = [
    "bounced",
    "question",
    "refused",
    "works-required",
    "offer-open",
    "draft",
    "queued",
  ];
  for (const state of order) {
    const found = submissions.find((paper) => paper.state === state);
    if (found) return found;
  }
  return submissions.find(({ state }) => !isAnswered(state)) ?? submissions[0];
}

function submissionEyelet({ submissions, route }: ThreadInput): Eye {
  const paper = leading(submissions);
  if (!paper) return { standing: "ahead", state: route === "stop" ? "nothing else may leave" : "nothing sent" };
  const reference = paper.reference ? `, ${paper.reference}` : "";
  const state = `${submissionStateName[paper.state].toLowerCase()}${reference}`;
  if (paper.state === "bounced" || paper.state === "refused") return { standing: "stopped", state };
  const done = isAnswered(paper.state) || isOver(paper.state);
  return { standing: done ? "passed" : "now", state };
}

function reviewEyelet({ review, pack, stage }: ThreadInput): Eye {
  if (!review) {
    if (stage === "planned") return { standing: "ahead", state: "after installing" };
    return { standing: "ahead", state: pack ? "not opened" : "waits for the pack" };
  }
  if (review.state === "returned") return { standing: "stopped", state: "returned" };
  if (review.state === "approved") return { standing: "passed", state: "approved" };
  return { standing: "now", state: review.state === "superseded" ? "superseded" : "in the queue" };
}

/** The five eyelets of a job: job, assessment, pack, submission, review. The first unfinished one is in hand. */
export function threadOf(input: ThreadInput): ThreadView {
  const eyelets: EyeletStanding[] = [
    { name: "job", hash8: null, ...jobEyelet(input) },
    { name: "assessment", hash8: null, ...assessmentEyelet(input) },
    { name: "pack", hash8: null, ...packEyelet(input) },
    { name: "submission", hash8: null, ...submissionEyelet(input) },
    { name: "review", hash8: null, ...reviewEyelet(input) },
  ];
  if (eyelets.some(({ standing }) => standing === "now" || standing === "stopped")) return eyelets;
  const next = eyelets.findIndex(({ standing }) => standing === "ahead");
  return eyelets.map((eyelet, index) => (index === next ? { ...eyelet, standing: "now" } : eyelet));
}

/** Where a job stands in one word: the furthest eyelet reached, unless something holds it. */
export function standingOf(input: ThreadInput): JobStanding {
  const { route, missingCount, pack, submissions, review } = input;
  if (route === "stop") return "stopped";
  if (review?.state === "returned") return "returned";
  if (pack?.status === "building") return "sealing";
  if (submissions.length > 0 && submissions.every(({ state }) => isOver(state))) return "closed";
  if (submissions.some(({ state }) => isAnswered(state))) return "answered";
  if (submissions.some(({ state }) => isSent(state))) return "sent";
  if (pack?.status === "sealed") return "sealed";
  return route !== null && route !== "more-facts-needed" && missingCount === 0 ? "ready-to-seal" : "recording";
}
