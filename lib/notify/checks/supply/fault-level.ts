import { fixed, plain } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import { declaredFaultLevelKa, externalLoopMaxOhm, threePhaseFaultMultiple } from "@/lib/calc/parameters/supply";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import { faultKa } from "@/lib/calc/supply/fault-level";
import type { JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, isPlanned, supplyEarthing } from "../facts";
import { cannotTell, mark, metIf, notApplicable, notYet, rule, type Answer } from "../rule";

export const externalLoopRule = rule({
  id: "supply.external-loop",
  group: "supply",
  title: "External loop impedance against the declared maximum",
  reads: ["supply.externalLoopImpedanceOhm", "supply.externalLoopObtained", "supply.earthing"],
  sources: ["EREC P23/2", "BS 7671 313.1"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const faultLevelRule = rule({
  id: "supply.fault-level",
  group: "supply",
  title: "Prospective fault current at the origin",
  reads: [
    "supply.prospectiveFaultCurrentKa",
    "supply.externalLoopImpedanceOhm",
    "supply.lineNeutralImpedanceOhm",
    "supply.phases",
  ],
  sources: ["BS 7671 434.1", "IET On-Site Guide section 7"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** Ze against the typical declared maximum of the earthing. On TT the reading holds the electrode as well. */
export function externalLoopAnswer(job: JobFacts, on: IsoDate): Answer {
  const { externalLoopObtained: obtained, externalLoopImpedanceOhm } = job.supply;
  const ohm = knownNumber(externalLoopImpedanceOhm);
  const earthing = supplyEarthing(job);
  const used = { externalLoopOhm: ohm, obtained, earthing };
  if (ohm === null && isPlanned(job)) return notYet("the reading of the external loop");
  if (ohm === null) return cannotTell(`The external loop impedance ${absent(externalLoopImpedanceOhm)}.`, { used });
  if (earthing === null) return cannotTell(`The earthing of the supply ${absent(job.supply.earthing)}.`, { used });
  if (earthing === "TT")
    return notApplicable("On a TT supply the reading is mostly the electrode; it is judged with the RCD.", { used });
  const maximumOhm = valueAt(externalLoopMaxOhm, on)[earthing];
  const rest = {
    used,
    recorded: `${plain(ohm)} Ω, ${obtained ?? "how obtained not recorded"}`,
    limit: `≤ ${maximumOhm} Ω`,
    workings: [`${earthing}, typical declared maximum up to 100 A: ${maximumOhm} Ω`],
  };
  if (ohm > maximumOhm)
    return metIf(false, `The external loop of ${plain(ohm)} Ω is above the typical maximum of ${maximumOhm} Ω.`, rest);
  if (obtained !== "measured" && !isPlanned(job))
    return cannotTell(`The external loop of ${plain(ohm)} Ω was not measured; a declared value is no proof.`, rest);
  return metIf(true, `The external loop of ${plain(ohm)} Ω is not above the typical maximum of ${maximumOhm} Ω.`, rest);
}

export type FaultLevel = { ka: number; workings: string[] };

/**
 * The largest fault current that the record speaks of, kA: the reading, or what either loop gives; on more than
 * one phase a single-phase figure counts double. Null when none is known.
 */
export function faultLevelAtOrigin({ supply }: JobFacts, on: IsoDate): FaultLevel | null {
  const nominalV = valueAt(nominalVoltageV, on);
  const loops = [
    ["line-earth loop", knownNumber(supply.externalLoopImpedanceOhm)],
    ["line-neutral loop", knownNumber(supply.lineNeutralImpedanceOhm)],
  ] as const;
  const lines: { ka: number; text: string }[] = loops.flatMap(([name, ohm]) =>
    ohm === null || ohm === 0
      ? []
      : [
          {
            ka: faultKa(nominalV, ohm),
            text: `${nominalV} V ÷ ${plain(ohm)} Ω = ${fixed(faultKa(nominalV, ohm), 2)} kA, ${name}`,
          },
        ],
  );
  const readKa = knownNumber(supply.prospectiveFaultCurrentKa);
  if (readKa !== null) lines.push({ ka: readKa, text: `Recorded: ${plain(readKa)} kA` });
  if (lines.length === 0) return null;
  const singleKa = Math.max(...lines.map(({ ka }) => ka));
  const texts = lines.map(({ text }) => text);
  if (supply.phases === 1) return { ka: singleKa, workings: texts };
  const multiple = entryAt(threePhaseFaultMultiple, on);
  return {
    ka: singleKa * multiple.value,
    workings: [
      ...texts,
      `Between lines, about ${multiple.value} × ${fixed(singleKa, 2)} = ${fixed(singleKa * multiple.value, 2)} kA${mark(multiple)}`,
    ],
  };
}

/** The largest fault current the record speaks of against the declared maximum. */
export function faultLevelAnswer(job: JobFacts, on: IsoDate): Answer {
  const level = faultLevelAtOrigin(job, on);
  if (level === null && isPlanned(job)) return notYet("the reading of the fault current");
  if (level === null)
    return cannotTell(`The prospective fault current ${absent(job.supply.prospectiveFaultCurrentKa)}.`);
  if (job.supply.phases === null) return cannotTell("The number of phases is needed to tell the fault current.");
  const maximumKa = valueAt(declaredFaultLevelKa, on);
  const known = fixed(level.ka, 2);
  return metIf(
    level.ka <= maximumKa,
    `The fault current of ${known} kA is ${level.ka <= maximumKa ? "not above" : "above"} the declared maximum of ${maximumKa} kA.`,
    {
      used: { faultKa: level.ka },
      recorded: `${known} kA`,
      limit: `≤ ${maximumKa} kA`,
      workings: level.workings,
    },
  );
}
