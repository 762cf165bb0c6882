import { largestRcdMa, rcdLimitOhm } from "@/lib/calc/circuit/loop";
import { fixed, plain } from "@/lib/calc/exact";
import { valueAt } from "@/lib/calc/parameter";
import { aboveGroundSeparationM, rcdTouchLimitV, ttStableOhm } from "@/lib/calc/parameters/open-pen";
import { knownNumber } from "@/lib/notify/job/facts";
import { rcdOf } from "../circuit/rcd-facts";
import { circuitOf, supplyEarthing } from "../facts";
import { cannotTell, met, notMet, rule, type Answer } from "../rule";
import type { MethodRule, OpenPenCase } from "./finding";

const about = rule({
  id: "open-pen.tt",
  group: "open-pen",
  title: "TT earth: electrode, RCD and both separations",
  reads: [
    "chargepoints[].openPen.electrodeOhm",
    "chargepoints[].openPen.separationFromOtherEarthsM",
    "chargepoints[].openPen.buriedSeparationM",
    "circuits[].device.rcdPlace",
    "circuits[].device.rcdMa",
    "supply.earthing",
    "supply.externalLoopImpedanceOhm",
  ],
  sources: ["BS 7671 411.5.3", "BS 7671 Table 41.5", "BS 7671 411.3.1.1", "EREC G12"],
  gives: ["met", "not-met", "cannot-tell"],
});

const residualRisk =
  "Metalwork joined to another earth and brought within reach later, a neighbour's or a second vehicle's, ends this separation; measure from wherever the vehicle can stand on its lead.";

type Part = { outcome: "met" | "not-met" | "cannot-tell"; clause: string };

function electrodePart(given: OpenPenCase): Part & { ohm: number | null; mostOhm: number | null } {
  const { job, unit, on } = given;
  const ohm =
    knownNumber(unit.openPen.electrodeOhm) ??
    (supplyEarthing(job) === "TT" ? knownNumber(job.supply.externalLoopImpedanceOhm) : null);
  const circuit = circuitOf(job, unit);
  const rcd = circuit === null ? null : rcdOf(job, circuit);
  const none = { ohm, mostOhm: null };
  if (rcd === null) return { ...none, outcome: "cannot-tell", clause: "no circuit is recorded for the unit" };
  if (rcd.standing === "none")
    return { ...none, outcome: "not-met", clause: "a TT earth is protected by an RCD, and none is recorded" };
  if (rcd.standing === "not told" || rcd.ratedMa === null)
    return { ...none, outcome: "cannot-tell", clause: "the RCD and its rated residual current are not told" };
  const mostOhm = rcdLimitOhm(valueAt(rcdTouchLimitV, on), rcd.ratedMa);
  const stableOhm = valueAt(ttStableOhm, on);
  if (ohm === null)
    return { ohm, mostOhm, outcome: "cannot-tell", clause: "the resistance of the electrode is not known" };
  const value = `${plain(ohm)} Ω`;
  if (ohm > mostOhm)
    return {
      ohm,
      mostOhm,
      outcome: "not-met",
      clause: `the electrode's ${value} is above the RCD's ${fixed(mostOhm, 0)} Ω`,
    };
  if (ohm > stableOhm)
    return {
      ohm,
      mostOhm,
      outcome: "cannot-tell",
      clause: `the electrode's ${value} is within the RCD's ${fixed(mostOhm, 0)} Ω but above ${stableOhm} Ω, where it may not stay stable: a competent person has to judge it`,
    };
  return { ohm, mostOhm, outcome: "met", clause: `the electrode's ${value} is not above ${stableOhm} Ω` };
}

function abovePart({ unit, on }: OpenPenCase): Part {
  const metres = knownNumber(unit.openPen.separationFromOtherEarthsM);
  const leastM = valueAt(aboveGroundSeparationM, on);
  if (metres === null) return { outcome: "cannot-tell", clause: "the distance to parts of other earths is not known" };
  if (metres < leastM)
    return { outcome: "not-met", clause: `parts of another earth are ${metres} m away, nearer than ${leastM} m` };
  return { outcome: "met", clause: `parts of other earths are ${metres} m away` };
}

function buriedPart({ unit, rules }: OpenPenCase): Part {
  const metres = knownNumber(unit.openPen.buriedSeparationM);
  if (rules.buriedSeparationM === null)
    return { outcome: "cannot-tell", clause: "the operator's own distance between buried metalwork is not set" };
  if (metres === null)
    return { outcome: "cannot-tell", clause: "the distance of the electrode to buried metalwork is not known" };
  const leastM = `the operator's ${rules.buriedSeparationM} m${rules.buriedSeparationSaid ? `, ${rules.buriedSeparationSaid}` : ""}`;
  if (metres < rules.buriedSeparationM)
    return {
      outcome: "not-met",
      clause: `buried metalwork is ${metres} m from the electrode, nearer than ${leastM}`,
    };
  return { outcome: "met", clause: `buried metalwork is ${metres} m from the electrode, not nearer than ${leastM}` };
}

function combined(parts: readonly Part[], rest: Omit<Answer, "outcome" | "because">): Answer {
  const sentence = (list: readonly Part[]) => {
    const text = list.map(({ clause }) => clause).join("; ");
    return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
  };
  const wrong = parts.filter(({ outcome }) => outcome === "not-met");
  if (wrong.length > 0) return notMet(sentence(wrong), rest);
  const open = parts.filter(({ outcome }) => outcome === "cannot-tell");
  if (open.length > 0) return cannotTell(sentence(open), rest);
  return met(sentence(parts), rest);
}

/** TT for the chargepoint or the whole installation: all three parts have to hold. */
export const ttEarth: MethodRule = {
  about,
  find: (given) => {
    const electrode = electrodePart(given);
    const { unit, on, rules } = given;
    const leastM = valueAt(aboveGroundSeparationM, on);
    return {
      electrodeMaxOhm: electrode.mostOhm,
      residualRisk,
      answer: combined([electrode, abovePart(given), buriedPart(given)], {
        used: {
          electrodeOhm: electrode.ohm,
          separationFromOtherEarthsM: knownNumber(unit.openPen.separationFromOtherEarthsM),
          buriedSeparationM: knownNumber(unit.openPen.buriedSeparationM),
          registerBuriedSeparationM: null,
          firmBuriedSeparationM: rules.buriedSeparationM,
          operator: rules.operatorId,
        },
        recorded: electrode.ohm === null ? null : `${plain(electrode.ohm)} Ω`,
        limit: electrode.mostOhm === null ? null : `≤ ${fixed(electrode.mostOhm, 0)} Ω`,
        workings: [
          ...(electrode.mostOhm === null
            ? []
            : [`RA × IΔn ≤ ${valueAt(rcdTouchLimitV, on)} V: RA ≤ ${fixed(electrode.mostOhm, 0)} Ω`]),
          ...(electrode.ohm === null || electrode.ohm === 0
            ? []
            : [
                `${plain(electrode.ohm)} Ω allows an RCD of ${fixed(largestRcdMa(valueAt(rcdTouchLimitV, on), electrode.ohm), 0)} mA at most`,
              ]),
          `Above ground ${leastM} m at least; below ground ${rules.buriedSeparationM === null ? "the operator's figure, not set" : `${rules.buriedSeparationM} m`}`,
        ],
      }),
    };
  },
};
