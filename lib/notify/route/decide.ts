import type { IsoDate } from "@/lib/calc/parameter";
import type { ApprovalStanding, DemandRoute, Missing, OperatorView } from "../assessment";
import type { DemandAssessment } from "../checks/demand";
import type { OperatorRules, OwnOperator } from "../firm-rules";
import type { JobFacts } from "../job";
import type { Reason } from "../result";
import { inForceOr } from "../in-force";
import { rule } from "../rule";
import { ruleDay } from "../rule-day";
import { approvalOf, type Approval } from "./approval";
import { dangerFindings } from "./danger";
import { capacityLimit, cutOutLimit, demandFinding, dwellingLimit } from "./demand";
import { heatPumpFinding, programmeFinding, replacementFinding, scheduleFinding, standardsFinding } from "./devices";
import { finding, need, unique, type Finding } from "./finding";
import { firmFigureFindings } from "./firm-figures";
import { generationOf, type Generation } from "./generation";
import { highwayFinding, multiOccupiedFinding, shareFinding, tableFinding } from "./overlays";
import { conditionFinding, serviceFindings } from "./service";
import { supplyNumberFinding } from "./supply-number";

export type RouteInput = {
  job: JobFacts;
  operator: OperatorView;
  /** What the firm has set for this operator and holds on the day of the work. */
  rules: OperatorRules;
  /** The firm's own entry, where nothing else names the operator. */
  ownEntry: OwnOperator | null;
  demand: DemandAssessment;
  powerQuality: readonly Reason[];
};

export type Route = {
  demand: DemandRoute;
  generation: Generation["route"];
  approval: ApprovalStanding;
  /** Whether the generation application, if one was made, was approved before installing. */
  generationApproved: boolean;
  reasons: Reason[];
  /** Facts that block the route, in the order in which they block it. */
  missing: Missing[];
};

export const generationFirst = rule({
  id: "route.generation-first",
  group: "route",
  title: "No generation to be accepted first",
  reads: ["chargepoints[].discharge", "demand.otherEquipment", "operatorRecords"],
  sources: ["EREC G99 section 6.2.2", "ena-v2g-guidance"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const rulesHeld = rule({
  id: "route.rules-held",
  group: "route",
  title: "Rules held for the day of the work",
  reads: ["dates.installed", "dates.commissioned", "dates.planned"],
  sources: ["our-practice"],
  outcomes: ["cannot-tell"],
});

export const approvalKept = rule({
  id: "route.approval-kept",
  group: "route",
  title: "Fitted within the approved limit",
  reads: ["operatorRecords", "chargepoints[].configuredA", "chargepoints[].ratedA"],
  sources: ["our-practice"],
  outcomes: ["met", "not-met", "not-applicable"],
});

/**
 * Decides how the operator is told. Order: danger; then an approval that is held, every proven trigger and generation
 * that must be accepted first; then facts that were not asked; only then a notice. A day for which no rules are held
 * gives no route.
 */
export function decideRoute(input: RouteInput): Route {
  const on = ruleDay(input.job.dates);
  return inForceOr(
    () => noRules(on),
    () => decideOn(input, on),
  );
}

function noRules(on: IsoDate): Route {
  const because = `No rules are held for ${on}, so this record is not judged. Check the dates.`;
  return {
    demand: "more-facts-needed",
    generation: "more-facts-needed",
    approval: "none",
    generationApproved: false,
    reasons: [rulesHeld.says("cannot-tell", because, { used: { on } })],
    missing: [need("dates.installed", "a day for which rules are held")],
  };
}

function decideOn(input: RouteInput, on: IsoDate): Route {
  const { job } = input;
  const generation = generationOf(job, on);
  const approval = approvalOf(job, "application");
  const generationApproval = approvalOf(job, "generation-application");
  const findings = [
    ...dangerFindings(job),
    approvalFinding(job, [approval, generationApproval]),
    ...(job.kind === "removal" ? removalFindings(input) : workFindings(input, on)),
    generationFinding(generation, generationApproval),
    ...firmFigureFindings(input.operator.id, input.rules, on),
  ];
  const demand = routeOf(findings, job, approval);
  return {
    demand,
    generation: generation.route,
    approval: standingOf(demand, approval, generationApproval),
    generationApproved: generationApproval.standing === "held",
    reasons: reasonsOf(findings, generation, approval, generationApproval),
    missing: missingOf(demand, findings, generation, [approval, generationApproval]),
  };
}

function workFindings({ job, operator, rules, ownEntry, demand, powerQuality }: RouteInput, on: IsoDate): Finding[] {
  return [
    dwellingLimit(job, demand, operator.id, rules, on),
    cutOutLimit(job, demand),
    capacityLimit(job, demand),
    tableFinding(job, demand, operator.id, on),
    shareFinding(job, demand, operator.id, on),
    ...serviceFindings(job, operator.id, rules, on),
    multiOccupiedFinding(job),
    highwayFinding(job, operator.id),
    demandFinding(job, demand),
    standardsFinding(job, powerQuality),
    heatPumpFinding(job),
    supplyNumberFinding(job, operator, ownEntry),
    scheduleFinding(job),
    replacementFinding(job),
    programmeFinding(),
  ];
}

const removalFindings = ({ job, operator, ownEntry }: RouteInput): Finding[] => [
  conditionFinding(job),
  supplyNumberFinding(job, operator, ownEntry),
  replacementFinding(job),
];

function generationFinding({ route, missing }: Generation, approval: Approval): Finding {
  const used = { generation: route, approval: approval.standing };
  const first = route === "sgi-2" || route === "sgi-3" || route === "full-application";
  if (first && approval.standing !== "held")
    return finding(
      generationFirst.says(
        "not-met",
        "Generation must be applied for and accepted first; do not install or energise before the answer.",
        { used },
      ),
      "apply",
      missing,
    );
  if (missing.length)
    return finding(
      generationFirst.says("cannot-tell", "Whether generation must be accepted first cannot be told yet.", { used }),
      "hold",
      missing,
    );
  const because = first ? "The generation was accepted before installing." : "No generation has to be accepted first.";
  return finding(generationFirst.says("met", because, { used }), "none");
}

/** Equipment fitted above what the operator approved is a danger to its network, and stops the job. */
function approvalFinding({ stage }: JobFacts, approvals: readonly Approval[]): Finding {
  const exceeded = approvals.find(({ standing }) => standing === "exceeded");
  if (!exceeded) {
    const any = approvals.some(({ standing }) => standing !== "none");
    return any
      ? finding(approvalKept.says("met", "Nothing recorded is above what the operator approved."), "none")
      : finding(approvalKept.says("not-applicable", "No approval is recorded."), "none");
  }
  const installed = stage === "installed";
  const todo = installed ? "Turn it down or switch it off, and tell the operator." : "Apply again before fitting.";
  return finding(
    {
      ...approvalKept.says("not-met", `${exceeded.reason.because} ${todo}`, { used: exceeded.reason.used }),
      title: installed ? "Set above the approved limit" : approvalKept.title,
    },
    installed ? "stop" : "apply",
  );
}

/** Standing of the approval. One of the generation alone is not held for a demand that has to be applied for. */
function standingOf(demand: DemandRoute, approval: Approval, ofGeneration: Approval): ApprovalStanding {
  if (approval.standing !== "none") return approval.standing;
  const asksForDemand = demand === "apply" || demand === "late-application";
  return asksForDemand && ofGeneration.standing === "held" ? "none" : ofGeneration.standing;
}

function routeOf(findings: readonly Finding[], job: JobFacts, approval: Approval): DemandRoute {
  const has = (effect: Finding["effect"]) => findings.some((each) => each.effect === effect);
  const approved = approval.standing === "held";
  if (has("stop")) return "stop";
  if (approved) return "apply";
  if (has("apply")) return job.stage === "installed" ? "late-application" : "apply";
  return has("hold") ? "more-facts-needed" : "notify";
}

/** What decides comes first: danger, triggers, open facts, then what was found in order. */
function reasonsOf(findings: readonly Finding[], generation: Generation, ...approvals: Approval[]): Reason[] {
  const order = ["stop", "apply", "hold", "none"];
  const byWeight = [...findings].sort((a, b) => order.indexOf(a.effect) - order.indexOf(b.effect));
  const approvalReasons = approvals.map(({ reason }) => reason);
  return [...byWeight.map(({ reason }) => reason), ...generation.reasons, ...approvalReasons];
}

function missingOf(
  demand: DemandRoute,
  findings: readonly Finding[],
  generation: Generation,
  approvals: readonly Approval[],
): Missing[] {
  if (demand === "stop") return [];
  const of = (effect: Finding["effect"]) =>
    findings.filter((each) => each.effect === effect).flatMap(({ missing }) => missing);
  const late =
    demand === "late-application"
      ? [need("operatorRecords", "the operator’s approval, if one was given before installing")]
      : [];
  return unique([
    ...of("hold"),
    ...of("apply"),
    ...late,
    ...approvals.flatMap(({ missing }) => missing),
    ...generation.missing,
    ...of("none"),
  ]);
}
