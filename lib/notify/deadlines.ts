import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import type { Deadline, OperatorView } from "./assessment";
import { isBuildingControlDue } from "./building-control";
import type { Division } from "./bank-holidays";
import { addDays, longDate } from "./calendar";
import { mark } from "./checks/rule";
import { ownFigure, type OperatorRules, type OwnOperator } from "./firm-rules";
import type { JobFacts } from "./job";
import { divisionOf } from "./operators";
import { buildingControlDays } from "./parameters/legislation";
import { completionNoticeDays, generationNoticeDays } from "./parameters/network";
import { operatorNoticeDays, registerFigure } from "./register-figures";
import { firstDone, ruleDay } from "./rule-day";
import type { Route } from "./route/decide";
import { calendarLimit, lastWorkingDayOnOrBefore } from "./working-days";

const dayCount = (count: number) => `${count} calendar day${count === 1 ? "" : "s"}`;

function deadline(what: Deadline["what"], lastDay: IsoDate, division: Division, basis: string): Deadline {
  const limit = calendarLimit(lastDay);
  return {
    what,
    lastDay,
    safeBy: lastWorkingDayOnOrBefore(lastDay, division),
    basis: limit ? `${basis} ${limit}` : basis,
  };
}

/**
 * The last days of a job, in calendar days: weekends and holidays do not move them, and `safeBy` is the last
 * working day of the operator's division on or before. Nothing is due on a planned job, and a late application
 * has no day: it is overdue.
 */
export function deadlinesOf(
  job: JobFacts,
  route: Route,
  operator: OperatorView,
  rules: OperatorRules,
  own: readonly OwnOperator[] = [],
): Deadline[] {
  const division = divisionOf(operator.id, job.site.territory, own);
  return [
    demandNotice(job, route, operator, rules, division),
    completionNotice(job, route, division),
    generationNotice(job, route, division),
    buildingControl(job, division),
  ].filter((each) => each !== null);
}

function demandNotice(
  job: JobFacts,
  { demand }: Route,
  operator: OperatorView,
  rules: OperatorRules,
  division: Division,
): Deadline | null {
  const done = firstDone(job.dates);
  if (job.stage === "planned" || done === null) return null;
  if (demand !== "notify" && demand !== "more-facts-needed") return null;
  const on = ruleDay(job.dates);
  const own = ownFigure(rules, "noticeDays");
  const days = own?.value ?? operatorNoticeDays(operator.id, on);
  const said = own ? `, as ${own.said}. The register has ${registerFigure("noticeDays", operator.id, on).words}` : "";
  const basis =
    days === 0
      ? `By the day of installing, ${longDate(done)}${said}.`
      : `${dayCount(days)} from installing on ${longDate(done)}${said}.`;
  const proviso = demand === "notify" ? "" : " This is the day if the open facts make it a notice.";
  return deadline("demand-notice", addDays(done, days), division, `${basis}${proviso}`);
}

function completionNotice(
  { dates, stage }: JobFacts,
  { demand, approval }: Route,
  division: Division,
): Deadline | null {
  if (stage === "planned" || !dates.installed || demand !== "apply" || approval !== "held") return null;
  const days = valueAt(completionNoticeDays, ruleDay(dates));
  const basis = `${dayCount(days)} from installing on ${longDate(dates.installed)}, the work having been approved.`;
  return deadline("completion-notice", addDays(dates.installed, days), division, basis);
}

function generationNotice({ dates, stage }: JobFacts, route: Route, division: Division): Deadline | null {
  if (stage === "planned" || !dates.commissioned || route.demand === "stop") return null;
  const { generation, generationApproved } = route;
  const noticed = generation === "g98" || generation === "sgi-1";
  const accepted = generationApproved && generation !== "none" && generation !== "more-facts-needed";
  if (!noticed && !accepted) return null;
  const held = entryAt(generationNoticeDays, ruleDay(dates));
  const basis = `${dayCount(held.value)}, the day of commissioning, ${longDate(dates.commissioned)}, counted as the first${mark(held)}.`;
  return deadline("generation-notice", addDays(dates.commissioned, held.value - 1), division, basis);
}

function buildingControl(job: JobFacts, division: Division): Deadline | null {
  const done = completedOn(job);
  if (!done || !isBuildingControlDue(job)) return null;
  const days = valueAt(buildingControlDays, done);
  const basis = `${dayCount(days)} from completion on ${longDate(done)}: certificate to the occupier, notice to the local authority.`;
  return deadline("building-control", addDays(done, days), division, basis);
}

/** Completed, else the later of installed and commissioned; null while the job is planned. */
export function completedOn({ dates, stage }: JobFacts): IsoDate | null {
  if (stage === "planned") return null;
  const { completed, installed, commissioned } = dates;
  if (completed) return completed;
  if (installed && commissioned) return installed > commissioned ? installed : commissioned;
  return installed ?? commissioned;
}
