import { plain } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { conditionalServiceA, powerQualityBands } from "@/lib/calc/parameters/supply";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent } from "../facts";
import { cannotTell, met, metIf, notApplicable, rule, type Answer } from "../rule";
import { supplyImpedance } from "./supply-impedance";

export const flickerConditionRule = rule({
  id: "power-quality.flicker-condition",
  group: "power-quality",
  title: "Condition the maker sets on the supply",
  reads: [
    "chargepoints[].flickerCondition",
    "chargepoints[].maximumSystemImpedanceOhm",
    "supply.lineNeutralImpedanceOhm",
    "supply.externalLoopImpedanceOhm",
    "supply.cutOutRatingA",
    "supply.earthing",
  ],
  sources: ["IEC 61000-3-11"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** The supply against what the maker asks of it: a maximum impedance, a service of 100 A, or nothing. */
export function flickerConditionAnswer(job: JobFacts, unit: Chargepoint, on: IsoDate): Answer {
  const { flickerCondition } = unit;
  if (flickerCondition === "max-impedance") return maximumImpedance(job, unit);
  if (flickerCondition === "service-100A") return serviceCurrent(job, on);
  if (flickerCondition === "none")
    return met("The maker sets no condition on the supply.", { used: { flickerCondition } });
  const ratedA = knownNumber(unit.ratedA);
  if (ratedA !== null && ratedA <= valueAt(powerQualityBands, on).ordinaryUpToA)
    return notApplicable(`At ${ratedA} A the ordinary standard sets no condition on the supply.`, {
      used: { ratedA, flickerCondition },
    });
  return cannotTell(`The condition the maker sets on the supply ${absent(flickerCondition)}.`, {
    used: { flickerCondition },
  });
}

function maximumImpedance(job: JobFacts, unit: Chargepoint): Answer {
  const mostOhm = knownNumber(unit.maximumSystemImpedanceOhm);
  const supply = supplyImpedance(job);
  const used = { maximumSystemImpedanceOhm: mostOhm, supplyOhm: supply?.ohm ?? null };
  if (mostOhm === null)
    return cannotTell(`The maker's maximum impedance ${absent(unit.maximumSystemImpedanceOhm)}.`, { used });
  if (supply === null)
    return cannotTell(
      "The line-neutral impedance of the supply is needed; the line-earth one does not stand for it here.",
      {
        used,
        limit: `≤ ${plain(mostOhm)} Ω`,
      },
    );
  const passes = supply.ohm <= mostOhm;
  return metIf(
    passes,
    `The supply's ${supply.text} is ${passes ? "not above" : "above"} the maker's ${plain(mostOhm)} Ω.`,
    { used, recorded: `${plain(supply.ohm)} Ω`, limit: `≤ ${plain(mostOhm)} Ω` },
  );
}

function serviceCurrent(job: JobFacts, on: IsoDate): Answer {
  const fuseA = knownNumber(job.supply.cutOutRatingA);
  const neededA = valueAt(conditionalServiceA, on);
  const used = { cutOutRatingA: fuseA };
  const limit = `≥ ${neededA} A`;
  if (fuseA === null)
    return cannotTell(
      `The unit needs a service of ${neededA} A a phase; the cut-out rating ${absent(job.supply.cutOutRatingA)}.`,
      {
        used,
        limit,
      },
    );
  const passes = fuseA >= neededA;
  return metIf(
    passes,
    `The service of ${fuseA} A is ${passes ? "not below" : "below"} the ${neededA} A a phase the maker asks.`,
    {
      used,
      recorded: `${fuseA} A`,
      limit,
    },
  );
}
