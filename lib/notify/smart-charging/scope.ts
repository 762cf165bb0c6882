import { valueAt } from "@/lib/calc/parameter";
import { knownNumber } from "../job/facts";
import { longDate } from "../calendar";
import { rapidKw, smartChargingFrom } from "../parameters/legislation";
import type { Reason } from "../result";
import { rule } from "../rule";
import { detailOf, type UnitFacts } from "./unit-facts";

export const scope = rule({
  id: "scope",
  group: "settings",
  title: "Within the smart charge point regulations",
  reads: [
    "site.territory",
    "dates.sold",
    "onBehalfOf.isSeller",
    "chargepoints[].access",
    "chargepoints[].smartCharging.soldByFirm",
    "chargepoints[].smartCharging.transfer",
    "chargepoints[].smartCharging.users",
    "chargepoints[].smartCharging.maximumPowerKw",
    "chargepoints[].smartCharging.vehicleClasses",
    "chargepoints[].smartCharging.cable",
    "chargepoints[].smartCharging.canSendAndReceive",
  ],
  sources: ["SI 2021/1467 reg 3", "AEVA 2018 section 15", "govuk-smart-chargepoints", "SI 2023/1168"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

/** Why the Regulations do not apply, or null while nothing recorded excludes the unit. */
export function exclusionOf({ job, settings, on }: UnitFacts): string | null {
  const { sold } = job.dates;
  const from = valueAt(smartChargingFrom, sold ?? on);
  const limitKw = valueAt(rapidKw, on);
  const powerKw = knownNumber(settings.maximumPowerKw);
  if (job.site.territory === "northern-ireland")
    return "The Regulations extend to Great Britain only; this unit is in Northern Ireland.";
  if (settings.soldByFirm === false || (settings.soldByFirm === null && job.onBehalfOf.isSeller === true))
    return "The firm is not the seller: it fitted a unit that another sold. The duties lie with the seller.";
  if (sold !== null && sold < from) return `Sold on ${longDate(sold)}, before the Regulations on ${longDate(from)}.`;
  if (settings.users === "public")
    return "A public chargepoint, customers’ car parks included, is outside these Regulations; SI 2023/1168 speaks of those.";
  if (powerKw !== null && powerKw >= limitKw)
    return `${powerKw} kW is rapid: the Regulations stop below ${limitKw} kW.`;
  if (settings.vehicleClasses !== null && !settings.vehicleClasses.some((each) => each === "car" || each === "van"))
    return "The unit is meant for neither cars nor vans.";
  if (settings.cable === true && settings.canSendAndReceive === false)
    return "A cable that can send and receive nothing is not a relevant chargepoint.";
  return null;
}

/** What must be known before the unit can be said to fall within the Regulations. */
function open({ job, settings, unit }: UnitFacts): string | null {
  if (job.site.territory === null) return "The territory is not recorded.";
  if (settings.soldByFirm === null) return "Whether the firm sold the unit is not recorded.";
  if (job.dates.sold === null) return "The day of the sale is not recorded, and the law goes by it.";
  if (settings.users === null) return "Who the unit is for is not recorded.";
  if (settings.users === "workplace" && unit.access === "public")
    return "Recorded as a workplace chargepoint with public access: whether it is primarily for the public must be settled.";
  if (knownNumber(settings.maximumPowerKw) === null) return "The largest power is not known.";
  if (settings.vehicleClasses === null) return "The vehicles it is meant for are not recorded.";
  if (settings.cable === null) return "Whether it is a cable is not recorded.";
  if (settings.cable && settings.canSendAndReceive !== true)
    return "Whether the cable can send and receive is not known.";
  return null;
}

export function scopeOf(facts: UnitFacts): Reason {
  const { sold } = facts.job.dates;
  const detail = detailOf(facts, null, {
    sold,
    users: facts.settings.users,
    maximumPowerKw: knownNumber(facts.settings.maximumPowerKw),
    soldByFirm: facts.settings.soldByFirm,
  });
  const exclusion = exclusionOf(facts);
  if (exclusion) return scope.says("not-applicable", exclusion, detail);
  const missing = open(facts);
  return missing
    ? scope.says("cannot-tell", missing, detail)
    : scope.says("met", `Sold by the firm on ${longDate(sold as string)}: a relevant chargepoint.`, detail);
}
