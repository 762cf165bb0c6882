import { valueAt } from "@/lib/calc/parameter";
import type { SmartChargingResult } from "@/lib/notify/assessment";
import type { Chargepoint } from "@/lib/notify/job";
import { weekdays } from "@/lib/notify/job/chargepoint";
import { peakHours } from "@/lib/notify/parameters/legislation";
import { weekChart } from "@/templates/drawings/week-chart";
import { WeekView } from "./week-view";

type Props = {
  chargepoint: Chargepoint;
  on: string;
  results: readonly SmartChargingResult[];
  level?: "h2" | "h3" | "h4";
};

const workDays = weekdays.slice(0, 5);

/** The week of default hours against peak hours, with what the rule on default hours says of it. */
export function WeekSection({ chargepoint, on, results, level = "h3" }: Props) {
  const rule = results.find(({ rule }) => rule === "R10-1");
  const windows = chargepoint.smartCharging.factoryDefault;
  if (!rule || rule.outcome === "not-applicable" || !windows?.length) return null;
  const { clock } = chargepoint.smartCharging;
  const peak = valueAt(peakHours, on).map((band) => ({ ...band, days: workDays }));
  const drawn = (name: string, aheadMin: number) => {
    const { svg, alt } = weekChart({ windows, peak, aheadMin }, "screen");
    return { name, svg, say: alt };
  };
  const views = [
    drawn("Winter", 0),
    drawn(clock === "local" || clock === "utc" ? "Summer time" : "Summer time, if UTC", clock === "local" ? 0 : 60),
  ];
  const winter = minutesIn(rule, "winterMinutes");
  const summer = minutesIn(rule, "summerMinutes");
  return (
    <section className="weekly" aria-label="Default hours against peak hours">
      <WeekView level={level} title="Default hours against peak hours" views={views} worst={summer > winter ? 1 : 0} />
      <div>
        <p className="weekly__say">{inWords(winter, summer)}</p>
        <p>{rule.because}</p>
      </div>
    </section>
  );
}

const minutesIn = ({ used }: SmartChargingResult, name: string) => {
  const minutes = used[name];
  return typeof minutes === "number" ? minutes : 0;
};

function inWords(winter: number, summer: number) {
  if (winter === 0 && summer === 0) return "None of the default hours is inside peak hours.";
  if (winter === summer) return `${winter} minutes a week inside peak hours, all year.`;
  return winter === 0
    ? `${summer} minutes a week inside peak hours, in summer time.`
    : `${winter} minutes a week inside peak hours in winter, ${summer} in summer time.`;
}
