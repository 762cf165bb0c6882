import type { Deadline, OperatorView } from "./assessment";
import { ownEntryWords, type OwnOperator } from "./firm-rules";
import type { JobFacts } from "./job";
import { hasTrait } from "./operators";
import { ruleDay } from "./rule-day";
import { operatorNoticeDays } from "./register-figures";
import type { Route } from "./route/decide";
import { firmFigure } from "./route/firm-figures";
import { notInRegister, parseSupplyNumber } from "./supply-number";
import { calendarLimit } from "./working-days";

export const standingCaution =
  "Leave covers and seals as found; never draw the cut-out fuse or break a seal without the operator’s authority. The standard, the operator and a competent person prevail over this assessment.";

type CautionInput = {
  job: JobFacts;
  route: Route;
  operator: OperatorView;
  /** The firm's own entry, where nothing else names the operator. */
  ownEntry: OwnOperator | null;
  deadlines: readonly Deadline[];
};

/** What a person should know before acting on an assessment, the gravest first. */
export function cautionsOf({ job, route, operator, ownEntry, deadlines }: CautionInput): string[] {
  return [
    ...emergency(job, route),
    ...energise(route),
    ...island(job),
    ...directCurrentUnits(job, route, operator),
    standingCaution,
    ...ofOperator(operator, ownEntry),
    ...loosened(route),
    ...ofSupplyNumber(job, ownEntry),
    ...beforehand(job, route, operator),
    ...deadlines.flatMap(({ lastDay }) => calendarLimit(lastDay) ?? []),
  ].filter((each, index, all) => all.indexOf(each) === index);
}

function emergency({ site }: JobFacts, { demand }: Route): string[] {
  if (demand !== "stop") return [];
  const line =
    site.territory === "northern-ireland"
      ? "Northern Ireland has an emergency number of its own; 105 serves Great Britain only."
      : "The emergency line of the operators of Great Britain is 105.";
  return [`${line} The operator sets the category of the fault.`];
}

const energise = ({ generation }: Route): string[] =>
  ["sgi-2", "sgi-3", "full-application"].includes(generation)
    ? ["Do not energise the unit as generation before the operator has accepted it in writing."]
    : [];

/** An island may not lean on the operator's earth, and the record holds no fact of its earth or neutral link. */
const island = ({ chargepoints }: JobFacts): string[] =>
  chargepoints.some(({ discharge }) => discharge.kind === "islanded" || discharge.kind === "both")
    ? [
        "A unit that runs apart from the network needs an earth electrode of its own and a neutral link made only while apart. The record does not hold them: a competent person settles both before it is used that way.",
      ]
    : [];

/** UK Power Networks wants a power-quality form with the application for a unit of mode 4 (EDS 08-5050, 08-5055). */
const directCurrentUnits = ({ chargepoints }: JobFacts, { demand }: Route, { id, name }: OperatorView): string[] =>
  (demand === "apply" || demand === "late-application") &&
  hasTrait(id, "supply-table") &&
  chargepoints.some(({ mode }) => mode === 4)
    ? [`${name} wants its power-quality form with the application, one for each type of mode 4 chargepoint.`]
    : [];

function ofOperator({ kind, name, reason }: OperatorView, ownEntry: OwnOperator | null): string[] {
  const general = "The general rules and 28 days are applied.";
  if (kind === "unknown") return [`${reason} ${general}`];
  return ownEntry ? [`${name}: ${ownEntryWords(ownEntry)} ${general}`] : [];
}

/** What the firm has set looser than the register: used, and printed on the cover. */
const loosened = ({ reasons }: Route): string[] =>
  reasons.filter(({ rule, outcome }) => rule === firmFigure.id && outcome === "not-met").map(({ because }) => because);

function ofSupplyNumber({ site, evidence }: JobFacts, ownEntry: OwnOperator | null): string[] {
  if (site.supplyNumber === null || evidence.some(({ subject }) => subject === "supply-number")) return [];
  const reading = parseSupplyNumber(site.supplyNumber, site.territory);
  const answered = ownEntry ? notInRegister(ownEntry.id) : null;
  return reading.ok ? reading.cautions.filter((each) => each !== answered) : [];
}

/** A planned job whose operator wants the notice by the day of installing should not wait for that day. */
function beforehand(job: JobFacts, { demand }: Route, operator: OperatorView): string[] {
  const byTheDay = operatorNoticeDays(operator.id, ruleDay(job.dates)) === 0;
  return job.stage === "planned" && demand === "notify" && byTheDay
    ? [
        `${operator.name} wants the notice by the day of installing: seal and send it before, and confirm the day afterwards.`,
      ]
    : [];
}
