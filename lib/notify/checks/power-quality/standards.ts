import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import { powerQualityBands, referenceResistanceOhm, relativeVoltageChangeLimit } from "@/lib/calc/parameters/supply";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import { voltageChangeShare } from "@/lib/calc/power-quality";
import { fixed } from "@/lib/calc/exact";
import type { Chargepoint } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent } from "../facts";
import { cannotTell, mark, met, notMet, rule, type Answer, type Rule } from "../rule";

const reads = ["chargepoints[].ratedA", "chargepoints[].standards"];

export const harmonicsRule = rule({
  id: "power-quality.harmonics",
  group: "power-quality",
  title: "Harmonic current standard declared",
  reads,
  sources: ["IEC 61000-3-2", "IEC 61000-3-12"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const flickerRule = rule({
  id: "power-quality.flicker",
  group: "power-quality",
  title: "Voltage change and flicker standard declared",
  reads,
  sources: ["IEC 61000-3-3", "IEC 61000-3-11"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** Conditional standard of voltage change, for which the one-step sum is printed. */
const flickerStandard = "61000-3-11";

type Pair = { about: Rule; ordinary: string; conditional: string };
export const standardPairs: readonly Pair[] = [
  { about: harmonicsRule, ordinary: "61000-3-2", conditional: "61000-3-12" },
  { about: flickerRule, ordinary: "61000-3-3", conditional: flickerStandard },
];

/** Whether a declared text names a standard, with or without its prefix and year. */
const names = (declared: string, standard: string) => new RegExp(`(^|\\D)${standard}(\\D|$)`).test(declared);

/** The standard that a rating calls for, among those the maker declares. */
export function standardAnswer(unit: Chargepoint, { ordinary, conditional }: Omit<Pair, "about">, on: IsoDate): Answer {
  const ratedA = knownNumber(unit.ratedA);
  const used = { ratedA, standards: unit.standards };
  if (ratedA === null) return cannotTell(`The rated current ${absent(unit.ratedA)}.`, { used });
  const { ordinaryUpToA, conditionalUpToA } = valueAt(powerQualityBands, on);
  if (ratedA > conditionalUpToA)
    return cannotTell(
      `Above ${conditionalUpToA} A a phase no general standard reaches: the operator decides the case.`,
      { used },
    );
  const wanted = ratedA <= ordinaryUpToA ? [ordinary, conditional] : [conditional];
  const limit = wanted.join(" or ");
  if (unit.standards === null) return cannotTell("The standards the maker declares are not recorded.", { used, limit });
  const found = wanted.find((standard) => unit.standards?.some((declared) => names(declared, standard)));
  const rest = {
    used,
    limit,
    recorded: unit.standards.join(", ") || "none",
    workings: conditional === flickerStandard ? [stepLine(ratedA, on)] : [],
  };
  if (found === undefined) return notMet(`At ${ratedA} A the unit has to be declared to ${limit}, and is not.`, rest);
  return met(`At ${ratedA} A the unit is declared to ${found}.`, rest);
}

/** Why a unit of this size cannot rest on the ordinary standard: its whole load switched in one step. */
function stepLine(ratedA: number, on: IsoDate): string {
  const reference = entryAt(referenceResistanceOhm, on);
  const change = voltageChangeShare(ratedA, reference.value, valueAt(nominalVoltageV, on));
  const limit = valueAt(relativeVoltageChangeLimit, on);
  return `Switched in one step, ${ratedA} A × ${reference.value} Ω${mark(reference)} ÷ ${valueAt(nominalVoltageV, on)} V = ${fixed(change * 100, 2)} %, against ${fixed(limit * 100, 1)} %`;
}
