import type { IsoDate } from "@/lib/calc/parameter";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { hasPhoto, isPlanned } from "../facts";
import { cannotTell, judge, met, notMet, notYet, rule } from "../rule";
import { methodName } from "./finding";

export const caravanRule = rule({
  id: "open-pen.caravan-or-boat",
  group: "open-pen",
  title: "Caravans and boats: no PME earth",
  reads: ["site.premises", "chargepoints[].openPen.method"],
  sources: ["SI 2002/2665 reg 9(4)", "BS 7671 708.411.4", "BS 7671 709.411.4"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const highwayRule = rule({
  id: "open-pen.highway",
  group: "open-pen",
  title: "On the highway: the operator's earthing terms",
  reads: ["site.premises", "chargepoints[].openPen.method"],
  sources: ["EREC G12"],
  gives: ["cannot-tell"],
});

export const separationPhotoRule = rule({
  id: "open-pen.separation-photo",
  group: "open-pen",
  title: "Photo of the separation from other earths",
  reads: ["evidence[].subject", "chargepoints[].openPen.method"],
  sources: ["Own proposal"],
  gives: ["met", "cannot-tell", "not-applicable"],
});

export const methodRule = rule({
  id: "open-pen.method",
  group: "open-pen",
  title: "Open PEN: a measure is recorded",
  reads: ["chargepoints[].openPen.method", "chargepoints[].location"],
  sources: ["BS 7671 722.411.4.1"],
  gives: ["met", "cannot-tell"],
});

const withoutPme = ["tt", "separation", "private-tn-s"];

/** Checks of the place that come before the method. */
export function placeChecks(job: JobFacts, unit: Chargepoint, on: IsoDate): Reason[] {
  const { premises } = job.site;
  return [
    ...(premises === "caravan-or-boat" ? [caravanCheck(unit, on)] : []),
    ...(premises === "public-highway" ? [highwayCheck(unit, on)] : []),
    ...(unit.openPen.method === "tt" ? [photoCheck(job, unit, on)] : []),
  ];
}

const caravanCheck = (unit: Chargepoint, on: IsoDate): Reason =>
  judge(caravanRule, unit.id, on, () => {
    const { method } = unit.openPen;
    const used = { method };
    if (method === null)
      return cannotTell("How the unit is earthed is not recorded; a PME earth may not serve a caravan or boat.", {
        used,
      });
    if (withoutPme.includes(method))
      return met(`The measure is ${methodName[method]}, which does not use a PME earth.`, { used });
    return notMet(
      `The measure is ${methodName[method]}, which keeps the operator's earth; a PME earth may not serve a caravan or boat.`,
      {
        used,
      },
    );
  });

const highwayCheck = (unit: Chargepoint, on: IsoDate): Reason =>
  judge(highwayRule, unit.id, on, () =>
    cannotTell("On the highway the operator sets how street equipment is earthed; its terms are not held here.", {
      used: { method: unit.openPen.method },
    }),
  );

const photoCheck = (job: JobFacts, unit: Chargepoint, on: IsoDate): Reason =>
  judge(separationPhotoRule, unit.id, on, () => {
    if (isPlanned(job)) return notYet("the photo of the separation");
    return hasPhoto(job, "neighbour-earths", unit)
      ? met("A photo shows the parts of other earths near the unit.")
      : cannotTell("No photo shows how far parts of other earths are from the unit and the vehicle.");
  });
