import { electrodeTouchV } from "@/lib/calc/open-pen/single-phase";
import { aboveGroundSeparationM, touchLimitV } from "@/lib/calc/parameters/open-pen";
import { nominalVoltageV, voltageFactorMax } from "@/lib/calc/parameters/voltage";
import { knownNumber } from "@/lib/notify/job/facts";
import type { Assessment, OpenPenResult } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { wiringDay } from "@/lib/notify/rule-day";
import type { Drawing, Surface } from "./drawings/svg";
import { touchVoltage } from "./drawings/touch-voltage";
import { inForce } from "./in-force";
import { amountOf } from "./words/facts";

/** "2.5 m": the reach kept between parts of two earthing systems, on the day whose wiring standard applies. */
export function reachBetweenEarths({ dates }: Pick<Job, "dates">): string {
  const reachM = inForce(aboveGroundSeparationM, wiringDay(dates));
  return reachM === null ? "reach" : amountOf(reachM, "m");
}

const perDecade = 20;

/**
 * The curve for a single-phase electrode, from the rule's own formula; null for other methods, and where the demand
 * after the work cannot be told.
 */
export function touchVoltageFigure(
  job: Pick<Job, "dates" | "supply" | "chargepoints">,
  assessment: Pick<Assessment, "demand">,
  result: OpenPenResult,
  surface: Surface = "paper",
): Drawing | null {
  const unit = job.chargepoints.find(({ id }) => id === result.chargepoint);
  const demandA = assessment.demand.afterA?.[0];
  if (unit?.openPen.method !== "installation-electrode" || job.supply.phases !== 1 || !demandA) return null;
  const on = wiringDay(job.dates);
  const nominalV = inForce(nominalVoltageV, on);
  const factor = inForce(voltageFactorMax, on);
  const limitV = inForce(touchLimitV, on);
  if (nominalV === null || factor === null || limitV === null) return null;
  const supply = { nominalV, sourceV: nominalV * factor };
  const electrodeOhm = knownNumber(unit.openPen.electrodeOhm);
  const curve = Array.from({ length: 3 * perDecade + 1 }, (_, step) => {
    const ohm = 10 ** (step / perDecade - 1);
    return { ohm, volts: electrodeTouchV(supply, demandA, ohm) };
  });
  const chart = {
    curve,
    limitV,
    mostOhm: result.electrodeMaxOhm,
    measured:
      electrodeOhm === null || result.touchVoltageV === null
        ? null
        : { ohm: electrodeOhm, volts: result.touchVoltageV },
    demandA,
  };
  return touchVoltage(chart, surface);
}
