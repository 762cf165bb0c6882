import type { IsoDate } from "@/lib/calc/parameter";
import type { Job } from "./job";

/** Version of the rule set; its date is the day the rules were last read against their sources. */
export const ruleset = "2026-12-01.1";

const rulesetDay: IsoDate = ruleset.slice(0, "2026-12-01".length);

/**
 * The day whose operator rules apply: installed, else commissioned, else planned. A job without any of them is judged by the day of the rule set; the day of reading never changes a route.
 */
export function ruleDay(dates: Job["dates"]): IsoDate {
  return dates.installed ?? dates.commissioned ?? dates.planned ?? rulesetDay;
}

/** The day whose wiring standard applies: designed, else installed, else planned, else that of the rule set. */
export const wiringDay = (dates: Job["dates"]): IsoDate =>
  dates.designed ?? dates.installed ?? dates.planned ?? rulesetDay;

/** The earlier of installed and commissioned, null while nothing is installed. */
export function firstDone({ installed, commissioned }: Job["dates"]): IsoDate | null {
  if (installed && commissioned) return commissioned < installed ? commissioned : installed;
  return installed ?? commissioned;
}
