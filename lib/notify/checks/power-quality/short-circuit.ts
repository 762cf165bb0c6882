import { fixed, plain } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import { lowestShortCircuitRatio, powerQualityBands, shortCircuitMultiple } from "@/lib/calc/parameters/supply";
import { lineVoltageV, nominalVoltageV } from "@/lib/calc/parameters/voltage";
import { equipmentKva, impedanceForKvaOhm, leastShortCircuitKva, shortCircuitKva } from "@/lib/calc/power-quality";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { cannotTell, mark, met, metIf, notApplicable, rule, type Answer } from "../rule";
import { supplyImpedance } from "./supply-impedance";

export const shortCircuitRule = rule({
  id: "power-quality.short-circuit-power",
  group: "power-quality",
  title: "Short-circuit power the maker asks of the supply",
  reads: [
    "chargepoints[].minimumShortCircuitPowerKva",
    "chargepoints[].ratedA",
    "supply.lineNeutralImpedanceOhm",
    "supply.externalLoopImpedanceOhm",
    "supply.earthing",
  ],
  sources: ["IEC 61000-3-12", "Circuit theory"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** The least power a unit of the lowest class would need, as a sentence for a maker's figure that is missing. */
function lowestClass(unit: Chargepoint, supplyKva: number | null, on: IsoDate): string {
  const ratedA = knownNumber(unit.ratedA);
  if (ratedA === null || unit.phases === null) return "";
  const ratio = entryAt(lowestShortCircuitRatio, on);
  const powerKva = equipmentKva(ratedA, unit.phases, valueAt(nominalVoltageV, on), valueAt(lineVoltageV, on));
  const neededKva = leastShortCircuitKva(powerKva, ratio.value, valueAt(shortCircuitMultiple, on)[unit.phases]);
  const has = supplyKva === null ? "" : `, and the supply gives ${fixed(supplyKva, 0)} kVA`;
  return ` A unit of the lowest class would need ${fixed(neededKva, 0)} kVA${has}${mark(ratio)}.`;
}

/** The supply's three-phase short-circuit power against the figure the maker asks for. */
export function shortCircuitAnswer(job: JobFacts, unit: Chargepoint, on: IsoDate): Answer {
  const ratedA = knownNumber(unit.ratedA);
  if (ratedA !== null && ratedA <= valueAt(powerQualityBands, on).ordinaryUpToA)
    return notApplicable(`At ${ratedA} A no short-circuit power is asked.`, { used: { ratedA } });
  const neededKva = knownNumber(unit.minimumShortCircuitPowerKva);
  const supply = supplyImpedance(job);
  const lineV = valueAt(lineVoltageV, on);
  const supplyKva = supply === null || supply.ohm === 0 ? null : shortCircuitKva(lineV, supply.ohm);
  const used = { minimumShortCircuitPowerKva: neededKva, supplyKva };
  if (unit.minimumShortCircuitPowerKva === null)
    return notApplicable(
      `No short-circuit power is recorded as asked by the maker.${lowestClass(unit, supplyKva, on)}`,
      { used },
    );
  if (neededKva === null)
    return cannotTell(`The short-circuit power the maker asks could not be told.${lowestClass(unit, supplyKva, on)}`, {
      used,
    });
  if (neededKva === 0)
    return met("The maker asks no short-circuit power of the supply.", { used, recorded: "none asked" });
  const limit = `≥ ${plain(neededKva)} kVA`;
  if (supply === null || supplyKva === null)
    return cannotTell("The line-neutral impedance of the supply is needed to tell its short-circuit power.", {
      used,
      limit,
    });
  const passes = supplyKva >= neededKva;
  return metIf(
    passes,
    `The supply gives ${fixed(supplyKva, 0)} kVA, ${passes ? "not below" : "below"} the ${plain(neededKva)} kVA the maker asks.`,
    {
      used,
      recorded: `${fixed(supplyKva, 0)} kVA`,
      limit,
      workings: [
        `${lineV}² ÷ ${plain(supply.ohm)} Ω ÷ 1000 = ${fixed(supplyKva, 1)} kVA, by ${supply.text}`,
        `${plain(neededKva)} kVA needs ${fixed(impedanceForKvaOhm(lineV, neededKva), 3)} Ω at most`,
      ],
    },
  );
}
