import { fixed, plain } from "@/lib/calc/exact";
import { leastBaseA, openPenV, unbalancedA } from "@/lib/calc/open-pen/three-phase";
import { valueAt } from "@/lib/calc/parameter";
import { touchLimitV } from "@/lib/calc/parameters/open-pen";
import { nominalVoltageV, voltageFactorMax } from "@/lib/calc/parameters/voltage";
import type { Chargepoint } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, supplyEarthing } from "../facts";
import { cannotTell, notMet, rule } from "../rule";
import type { MethodRule } from "./finding";

const about = rule({
  id: "open-pen.three-phase-balance",
  group: "open-pen",
  title: "Open PEN: balance of the three phases",
  reads: ["chargepoints[].openPen.worstLoadsA", "supply.phases", "supply.earthing"],
  sources: ["BS 7671 722.411.4.1", "Circuit theory"],
  gives: ["not-met", "cannot-tell"],
});

/** Every state given, worst first. Within the limit a person still has to look up the edition: never met here. */
export const threePhaseBalance: MethodRule = {
  about,
  find: ({ job, unit, on }) => {
    const { phases } = job.supply;
    if (phases !== null && phases !== 3)
      return {
        answer: notMet(
          `The method is three-phase balance, but the supply has ${phases} phase${phases === 1 ? "" : "s"}.`,
        ),
      };
    const earthing = supplyEarthing(job);
    if (earthing === "TT")
      return {
        answer: notMet("The method is three-phase balance against an open PEN, but the supply is recorded as TT."),
      };
    if (phases === null || earthing === null)
      return {
        answer: cannotTell(
          `The ${phases === null ? "number of phases is not recorded" : `earthing of the supply ${absent(job.supply.earthing)}`}.`,
        ),
      };
    const states = unit.openPen.worstLoadsA ?? [];
    if (states.length === 0)
      return { answer: cannotTell("The currents of every credible state, phase by phase, are needed.") };
    const nominalV = valueAt(nominalVoltageV, on);
    const sourceV = nominalV * valueAt(voltageFactorMax, on);
    const limitV = valueAt(touchLimitV, on);
    const judged = states.map((state) => ({
      state,
      volts: openPenV(sourceV, nominalV, state, null),
      imbalanceA: unbalancedA(state),
    }));
    const worst = judged.reduce((most, one) => (one.volts > most.volts ? one : most));
    const figures = { touchVoltageV: worst.volts, imbalanceA: worst.imbalanceA };
    const value = `${fixed(worst.volts, 1)} V`;
    const rest = {
      used: { touchVoltageV: worst.volts, imbalanceA: worst.imbalanceA, states: states.length },
      recorded: `${value} in the worst of ${states.length} states`,
      limit: `≤ ${limitV} V`,
      workings: [
        ...judged.map(
          ({ state, volts, imbalanceA }) =>
            `${state.map(plain).join(" / ")} A: ${fixed(imbalanceA, 2)} A out of balance, ${fixed(sourceV, 0)} × ${fixed(imbalanceA, 2)} ÷ ${plain(state[0] + state[1] + state[2])} = ${fixed(volts, 1)} V`,
        ),
        ...baseLine(unit, sourceV, limitV),
      ],
    };
    if (worst.volts > limitV)
      return { ...figures, answer: notMet(`The worst state leaves ${value}, above ${limitV} V.`, rest) };
    return {
      ...figures,
      answer: cannotTell(
        `The worst state leaves ${value}, not above ${limitV} V; a competent person must confirm that the edition in force still lists this method.`,
        rest,
      ),
    };
  },
};

/** The quick rule for a single-phase unit beside an otherwise balanced load. */
function baseLine(unit: Chargepoint, sourceV: number, limitV: number): string[] {
  const ratedA = knownNumber(unit.ratedA);
  if (ratedA === null || unit.phases !== 1) return [];
  return [
    `A single-phase unit of ${plain(ratedA)} A needs ${fixed(leastBaseA(sourceV, ratedA, limitV), 1)} A on every phase beside it, at every moment`,
  ];
}
