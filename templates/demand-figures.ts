import { dayProfileA } from "@/lib/calc/demand/half-hourly";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { dwellingLimitA } from "@/lib/notify/parameters/network";
import { ruleDay, wiringDay } from "@/lib/notify/rule-day";
import { inForce } from "./in-force";
import { demandChart, demandDayChart, type DemandLimits } from "./drawings/demand-chart";
import type { Drawing, Surface } from "./drawings/svg";

type Drawable = Pick<Job, "site" | "supply" | "demand" | "dates">;

/** The limits to draw: the cut-out where its rating is known, the limit for a notice where the premises are a dwelling. */
export const demandLimits = ({ site, supply, dates }: Drawable): DemandLimits => ({
  cutOutA: knownNumber(supply.cutOutRatingA),
  noticeA: site.premises === "domestic" ? inForce(dwellingLimitA, ruleDay(dates)) : null,
});

const phaseNames = ["L1", "L2", "L3"];

/** Demand before and after the work, phase by phase; null when the assessment has neither. */
export function demandFigure(
  job: Drawable,
  { demand }: Pick<Assessment, "demand">,
  surface: Surface = "paper",
): Drawing | null {
  const count = Math.max(demand.existingA?.length ?? 0, demand.afterA?.length ?? 0);
  if (count === 0) return null;
  const phases = Array.from({ length: count }, (_, index) => ({
    name: count === 1 ? "one phase" : (phaseNames[index] ?? `phase ${index + 1}`),
    existingA: demand.existingA?.[index] ?? null,
    afterA: demand.afterA?.[index] ?? null,
  }));
  return demandChart(phases, demandLimits(job), surface);
}

/**
 * The day's profile from the meter's half hours, with what the job adds. Null without half hours, and on a supply of
 * several phases, whose total says nothing about one of them.
 */
export function demandDayFigure(
  job: Drawable,
  { demand }: Pick<Assessment, "demand">,
  surface: Surface = "paper",
): Drawing | null {
  const series = job.demand.halfHourKwh;
  const existingA = demand.existingA?.[0];
  const afterA = demand.afterA?.[0];
  if (!series?.length || job.supply.phases !== 1 || existingA === undefined || afterA === undefined) return null;
  const nominalV = inForce(nominalVoltageV, wiringDay(job.dates));
  if (nominalV === null) return null;
  const profile = dayProfileA(series, nominalV);
  return demandDayChart({ houseA: profile, existingA, afterA }, demandLimits(job), surface);
}
