import type { Chargepoint, Job } from "@/lib/notify/job";
import type { ChargingWindow, weekdays } from "@/lib/notify/job/chargepoint";
import { peakHours } from "@/lib/notify/parameters/legislation";
import { ruleDay } from "@/lib/notify/rule-day";
import { inForce } from "./in-force";
import type { Drawing, Surface } from "./drawings/svg";
import { weekChart } from "./drawings/week-chart";

const workingWeek: (typeof weekdays)[number][] = ["mon", "tue", "wed", "thu", "fri"];

/** Peak hours in force on the day of sale, else of the work; none before the rules began. */
function peakOn({ dates }: Pick<Job, "dates">) {
  const on = dates.sold ?? ruleDay(dates);
  return (inForce(peakHours, on) ?? []).map((band) => ({ ...band, days: workingWeek }));
}

export type WeekFigure = { season: "all year" | "winter" | "summer time"; drawing: Drawing };

/** Minutes by which British clocks run ahead of UTC in summer. */
const summerAheadMin = 60;

/**
 * The week of the hours given, on the wall clock: one drawing, or one for winter and one for summer time where the
 * unit keeps UTC.
 */
export function weekFigures(
  job: Pick<Job, "dates">,
  unit: Pick<Chargepoint, "smartCharging">,
  windows: readonly ChargingWindow[],
  surface: Surface = "paper",
): WeekFigure[] {
  const peak = peakOn(job);
  const at = (aheadMin: number) => weekChart({ windows, peak, aheadMin }, surface);
  return unit.smartCharging.clock === "utc"
    ? [
        { season: "winter", drawing: at(0) },
        { season: "summer time", drawing: at(summerAheadMin) },
      ]
    : [{ season: "all year", drawing: at(0) }];
}
