import type { IsoDate } from "@/lib/calc/parameter";
import type { Assessment } from "./assessment";
import { buildingControlChecks } from "./building-control";
import { cautionsOf } from "./cautions";
import { assessCircuits } from "./checks/circuit";
import { assessDemand } from "./checks/demand";
import { assessOpenPen } from "./checks/open-pen";
import { powerQualityChecks } from "./checks/power-quality";
import { supplyChecks } from "./checks/supply";
import { completedOn, deadlinesOf } from "./deadlines";
import { inForceOr } from "./in-force";
import { noFirmRules, ownFigure, rulesFor, type FirmRules } from "./firm-rules";
import type { JobFacts } from "./job";
import { operatorOf, ownEntryOf } from "./operators";
import { paperMissing } from "./paper-facts";
import { ruleDay, ruleset, wiringDay } from "./rule-day";
import { decideRoute } from "./route/decide";
import { unique } from "./route/finding";
import { assessSettings } from "./smart-charging/settings";

export { ruleset };

const none = () => [];

/**
 * What the rules say of one record. Pure: the same record, day and firm settings give the same assessment.
 * `asAt` is printed and counts days left; it never changes a route. Families run in a fixed order:
 * demand, supply, circuits, open PEN, power quality, route, days, building control, settings.
 */
export function assess(job: JobFacts, asAt: IsoDate, firm: FirmRules = noFirmRules): Assessment {
  const operator = operatorOf(job, firm.own);
  const ownEntry = ownEntryOf(operator.id, firm.own);
  const rules = rulesFor(firm, operator.id, ruleDay(job.dates));
  const on = wiringDay(job.dates);
  const demand = assessDemand(job, on);
  const supply = supplyChecks(job, on);
  const circuits = assessCircuits(job, on);
  const openPen = assessOpenPen(job, on, {
    operatorId: operator.id,
    buriedSeparationM: rules.buriedSeparationM,
    buriedSeparationSaid: ownFigure(rules, "buriedSeparationM")?.said,
  });
  const powerQuality = powerQualityChecks(job, on);
  const route = decideRoute({ job, operator, rules, ownEntry, demand, powerQuality });
  const deadlines = inForceOr(none, () => deadlinesOf(job, route, operator, rules, firm.own));
  return {
    format: "sealwire.assessment/1",
    asAt,
    ruleset,
    operator,
    route: {
      demand: route.demand,
      generation: route.generation,
      approval: route.approval,
      reasons: route.reasons,
    },
    deadlines,
    missing: unique([...route.missing, ...paperMissing(job, route.demand)]),
    demand: demand.result,
    circuits: circuits.results,
    openPen: openPen.results,
    checks: [
      ...demand.checks,
      ...supply,
      ...circuits.checks,
      ...openPen.checks,
      ...powerQuality,
      ...inForceOr(none, () => buildingControlChecks(job, completedOn(job))),
    ],
    smartCharging: assessSettings(job),
    cautions: inForceOr(none, () => cautionsOf({ job, route, operator, ownEntry, deadlines })),
  };
}
