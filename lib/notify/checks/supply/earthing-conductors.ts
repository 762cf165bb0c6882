import { plain } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { bondingBounds, pmeBondingMm2, protectiveConductor, standardSizesMm2 } from "@/lib/calc/parameters/supply";
import { nextSizeMm2, otherBondingMm2, protectiveMm2, stepMm2 } from "@/lib/calc/supply/earthing";
import type { JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, supplyEarthing } from "../facts";
import { cannotTell, met, notMet, rule, type Answer } from "../rule";

export const earthingConductorRule = rule({
  id: "supply.earthing-conductor",
  group: "supply",
  title: "Size of the earthing conductor",
  reads: ["supply.earthingConductorMm2", "supply.tailsMm2", "supply.supplyNeutralMm2", "supply.earthing"],
  sources: ["BS 7671 Table 54.7", "BS 7671 Table 54.8"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const bondingRule = rule({
  id: "supply.bonding",
  group: "supply",
  title: "Main protective bonding",
  reads: ["supply.bonding", "supply.supplyNeutralMm2", "supply.earthingConductorMm2", "supply.earthing"],
  sources: ["BS 7671 544.1", "BS 7671 Table 54.8"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** Earthing conductor by the line conductor's size; where the supply is PME never less than the bonding size. */
export function earthingConductorAnswer(job: JobFacts, on: IsoDate): Answer {
  const { supply } = job;
  const mm2 = knownNumber(supply.earthingConductorMm2);
  const tailsMm2 = knownNumber(supply.tailsMm2);
  const neutralMm2 = knownNumber(supply.supplyNeutralMm2);
  const earthing = supplyEarthing(job);
  const used = { earthingConductorMm2: mm2, tailsMm2, supplyNeutralMm2: neutralMm2, earthing };
  if (mm2 === null)
    return cannotTell(`The size of the earthing conductor ${absent(supply.earthingConductorMm2)}.`, { used });
  if (earthing === null) return cannotTell(`The earthing of the supply ${absent(supply.earthing)}.`, { used });
  const pmeMm2 = earthing === "TN-C-S" && neutralMm2 !== null ? stepMm2(valueAt(pmeBondingMm2, on), neutralMm2) : null;
  const pmeLine = pmeMm2 === null ? [] : [`Table 54.8, supply neutral ${neutralMm2} mm²: ${pmeMm2} mm² at least`];
  const recorded = `${mm2} mm²`;
  if (pmeMm2 !== null && mm2 < pmeMm2)
    return notMet(`The earthing conductor of ${mm2} mm² is smaller than the ${pmeMm2} mm² a PME supply asks.`, {
      used,
      recorded,
      limit: `≥ ${pmeMm2} mm²`,
      workings: pmeLine,
    });
  if (earthing === "TN-C-S" && pmeMm2 === null)
    return cannotTell("The size of the supply neutral is needed to size the earthing conductor of a PME supply.", {
      used,
      recorded,
    });
  if (tailsMm2 === null)
    return cannotTell(`The size of the tails ${absent(supply.tailsMm2)}, and Table 54.7 starts from it.`, {
      used,
      recorded,
    });
  const tableMm2 = protectiveMm2(valueAt(protectiveConductor, on), tailsMm2);
  const workings = [...pmeLine, `Table 54.7, line conductor ${tailsMm2} mm²: ${plain(tableMm2)} mm²`];
  const rest = { used, recorded, limit: `≥ ${plain(tableMm2)} mm²`, workings };
  if (mm2 >= tableMm2)
    return met(`The earthing conductor of ${mm2} mm² is not less than the table's ${plain(tableMm2)} mm².`, rest);
  return cannotTell(
    `The earthing conductor of ${mm2} mm² is below the table's ${plain(tableMm2)} mm²: it needs an adiabatic sum with the service fuse's own curve.`,
    rest,
  );
}

/** Least main bonding conductor, mm², with the line that says how; null where a fact is missing. */
function bondingLeast(job: JobFacts, on: IsoDate): { mm2: number; working: string } | null {
  const earthing = supplyEarthing(job);
  const neutralMm2 = knownNumber(job.supply.supplyNeutralMm2);
  const earthingMm2 = knownNumber(job.supply.earthingConductorMm2);
  if (earthing === "TN-C-S") {
    if (neutralMm2 === null) return null;
    const mm2 = stepMm2(valueAt(pmeBondingMm2, on), neutralMm2);
    return { mm2, working: `Table 54.8, supply neutral ${neutralMm2} mm²: ${mm2} mm²` };
  }
  if (earthing === null || earthingMm2 === null) return null;
  const bounds = valueAt(bondingBounds, on);
  const exactMm2 = otherBondingMm2(bounds, earthingMm2);
  const mm2 = nextSizeMm2(valueAt(standardSizesMm2, on), exactMm2);
  return {
    mm2,
    working: `${bounds.shareOfEarthing} × earthing conductor of ${earthingMm2} mm², at least ${bounds.leastMm2}, at most ${bounds.mostMm2}: ${plain(exactMm2)}, made as ${mm2} mm²`,
  };
}

/** Each bonded service against the least size; the worst decides. */
export function bondingAnswer(job: JobFacts, on: IsoDate): Answer {
  const { bonding } = job.supply;
  if (bonding === null) return cannotTell("Main bonding is not recorded.");
  const used = {
    services: bonding.map(({ service }) => service),
    mm2: bonding.map(({ mm2 }) => knownNumber(mm2)),
    earthing: supplyEarthing(job),
  };
  if (bonding.length === 0)
    return cannotTell("No bonded service was found; whether there is pipework to bond is not recorded.", { used });
  const least = bondingLeast(job, on);
  if (least === null)
    return cannotTell("The earthing and the size it is reckoned from are needed to size the bonding.", { used });
  const rest = {
    used,
    limit: `≥ ${least.mm2} mm²`,
    workings: [least.working],
    recorded: bonding.map(({ service, mm2 }) => `${service} ${mm2 ?? "not recorded"}`).join(", "),
  };
  const small = bonding.filter(({ mm2 }) => (knownNumber(mm2) ?? least.mm2) < least.mm2);
  if (small.length > 0)
    return notMet(
      `Bonding smaller than ${least.mm2} mm²: ${small.map(({ service, mm2 }) => `${service} ${mm2} mm²`).join(", ")}.`,
      rest,
    );
  const open = bonding.filter(({ mm2, seen }) => knownNumber(mm2) === null || seen !== true);
  if (open.length > 0)
    return cannotTell(`Size not known, or not seen: ${open.map(({ service }) => service).join(", ")}.`, rest);
  return met(`Each bonded service has ${least.mm2} mm² or more.`, rest);
}
