import { readHalfHours } from "@/lib/calc/demand/half-hourly";
import { fixed } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import {
  halfHourCoverage,
  halfHourDaysAtLeast,
  loggerDaysAtLeast,
  loggerResolutionS,
} from "@/lib/calc/parameters/demand";
import type { JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { knownNumber } from "@/lib/notify/job/facts";
import { cannotTell, judge, met, type Answer } from "../rule";
import { evidenceRule } from "./rules";

const DAY_MS = 86_400_000;
const ours = "No public rule fixes how long to look; these lengths are ours.";

/** Whether the recorded method is good enough to rest a notice on; the figures stand either way. */
export const evidenceCheck = (job: JobFacts, on: IsoDate): Reason =>
  judge(evidenceRule, null, on, () => {
    const answer = byMethod(job, on);
    if (answer.outcome === "met" && job.demand.assessor === null)
      return { ...answer, outcome: "cannot-tell", because: "Who assessed the demand is not recorded." };
    return answer;
  });

function byMethod(job: JobFacts, on: IsoDate): Answer {
  switch (job.demand.method) {
    case "measured":
      return logged(job, on);
    case "half-hourly":
      return halfHourly(job, on);
    case "diversity":
      return allowances(job);
    case "declared":
      return declared(job);
    default:
      return cannotTell("How the demand before the work was found is not recorded.");
  }
}

function logged(job: JobFacts, on: IsoDate): Answer {
  const { from, to, resolutionS, perPhase } = job.demand.measurement;
  const used = { from, to, resolutionS, perPhase };
  const [daysAtLeast, coarsestS] = [valueAt(loggerDaysAtLeast, on), valueAt(loggerResolutionS, on)];
  const limit = `≥ ${daysAtLeast} days at ≤ ${coarsestS} s, a weekend in it`;
  if (from === null || to === null || resolutionS === null)
    return cannotTell("The first day, the last day and the step of the logging are needed.", { used, limit });
  const days = Math.round((Date.parse(to) - Date.parse(from)) / DAY_MS) + 1;
  const rest = { used, limit, recorded: `${days} days at ${resolutionS} s`, workings: [ours] };
  if (days < daysAtLeast)
    return cannotTell(`Logged for ${days} days from ${from} to ${to}; ${daysAtLeast} days are looked for.`, rest);
  if (resolutionS > coarsestS)
    return cannotTell(`Logged every ${resolutionS} s; steps of ${coarsestS} s or finer are looked for.`, rest);
  if (job.supply.phases === null)
    return cannotTell("The number of phases is not recorded, so the logging cannot be matched to them.", rest);
  if (job.supply.phases > 1 && perPhase !== true)
    return cannotTell("The logging is not recorded as taken on each phase.", rest);
  return met(`Logged for ${days} days at ${resolutionS} s, a weekend in it.`, rest);
}

function halfHourly(job: JobFacts, on: IsoDate): Answer {
  const series = readHalfHours(job.demand.halfHourKwh ?? []);
  if (series === null) return cannotTell("No half-hourly reading is recorded.");
  const [daysAtLeast, coverageAtLeast] = [valueAt(halfHourDaysAtLeast, on), valueAt(halfHourCoverage, on)];
  const year = series.days >= daysAtLeast && series.coverage >= coverageAtLeast;
  const winter = series.winterCoverage !== null && series.winterCoverage >= coverageAtLeast;
  const percent = fixed(series.coverage * 100, 1);
  const rest = {
    used: { halfHours: series.count, days: series.days, coverage: series.coverage, wholeWinter: series.wholeWinter },
    recorded: `${fixed(series.days, 0)} days, ${percent} % of the half hours`,
    limit: `12 months, or November to February whole; ${fixed(coverageAtLeast * 100, 0)} % present`,
    workings: [ours],
  };
  if (!year && !winter)
    return cannotTell(
      `The half hours span ${fixed(series.days, 0)} days with ${percent} % present: neither 12 months nor a whole November to February.`,
      rest,
    );
  if (job.supply.phases !== 1)
    return cannotTell("Half-hourly readings are a total: they say nothing about one phase of several.", rest);
  return met(
    year ? "The half hours cover 12 months." : `The half hours cover November to February ${series.wholeWinter} whole.`,
    rest,
  );
}

function allowances(job: JobFacts): Answer {
  const { premises } = job.site;
  const used = { premises };
  if (premises !== "domestic")
    return cannotTell("The household allowances are for individual households; this site is not recorded as one.", {
      used,
    });
  if ((job.demand.loads ?? []).length === 0)
    return cannotTell("The household allowances need the loads item by item.", { used });
  return met("Household allowances on the listed loads: a ceiling estimate, commonly above what a logger shows.", {
    used,
    recorded: "household allowances",
  });
}

function declared(job: JobFacts): Answer {
  const { premises } = job.site;
  const capacityKva = knownNumber(job.supply.authorisedCapacityKva);
  const used = { premises, authorisedCapacityKva: capacityKva };
  if (premises === null || premises === "domestic")
    return cannotTell("A declared figure is not taken for a dwelling: log it, use half hours or the allowances.", {
      used,
    });
  if (capacityKva === null)
    return cannotTell("A declared figure needs the authorised capacity of the supply beside it.", { used });
  return met(`Declared, with an authorised capacity of ${capacityKva} kVA recorded.`, { used, recorded: "declared" });
}
