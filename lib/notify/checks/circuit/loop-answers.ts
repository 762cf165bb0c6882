import { fixed, plain } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { farAboveDesign } from "@/lib/calc/parameters/protection";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, circuitEarthing, isPlanned } from "../facts";
import { cannotTell, met, notMet, notYet, rule, type Answer } from "../rule";
import { calculatedLoop } from "./loop";
import { loopLimits, type LoopLimits } from "./loop-limits";

const reads = [
  "supply.externalLoopImpedanceOhm",
  "supply.earthing",
  "circuits[].cable",
  "circuits[].device",
  "circuits[].fedFrom",
  "circuits[].measured.r1r2Ohm",
];

export const calculatedLoopRule = rule({
  id: "circuit.loop-calculated",
  group: "circuit",
  title: "Earth fault loop, calculated hot",
  reads,
  sources: ["BS 7671 Table 41.3", "BS 7671 411.4", "IEC 60228"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const measuredLoopRule = rule({
  id: "circuit.loop-measured",
  group: "circuit",
  title: "Earth fault loop, measured cold",
  reads: [...reads, "circuits[].measured.zsOhm"],
  sources: ["BS 7671 Table 41.3", "NICEIC Connections"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const caution = "Protection rests on the RCD alone, so keep it tested.";

/** Against the device's limit, then the RCD's; on TT the RCD's only. */
function against(given: {
  ohm: number;
  deviceOhm: number | null;
  limits: LoopLimits;
  tt: boolean;
  kind: "calculated" | "measured";
  rest: { used: Record<string, number | string | null>; workings: readonly string[] };
}): Answer {
  const { ohm, deviceOhm, limits, tt, kind } = given;
  const value = `${plain(ohm)} Ω`;
  const rest = { ...given.rest, recorded: value };
  if (deviceOhm !== null && ohm <= deviceOhm)
    return met(`${value} ${kind} is not above the device's ${fixed(deviceOhm, 2)} Ω.`, {
      ...rest,
      limit: `≤ ${fixed(deviceOhm, 2)} Ω`,
    });
  if (limits.rcdOhm !== null) {
    const rcd = { ...rest, limit: `≤ ${fixed(limits.rcdOhm, 0)} Ω (RCD)` };
    const above = deviceOhm === null ? "" : `, though above the device's ${fixed(deviceOhm, 2)} Ω`;
    if (ohm <= limits.rcdOhm)
      return met(
        `${value} ${kind} is met by the RCD of ${limits.rcdMa} mA, ${fixed(limits.rcdOhm, 0)} Ω${above}. ${caution}`,
        rcd,
      );
    return notMet(`${value} ${kind} is above the RCD's ${fixed(limits.rcdOhm, 0)} Ω.`, rcd);
  }
  if (tt) return cannotTell("On a TT earth the loop is held by an RCD, and none of known rating is recorded.", rest);
  if (deviceOhm === null)
    return cannotTell("No loop limit is held for this device, and no RCD of known rating is recorded.", rest);
  return notMet(
    `${value} ${kind} is above the device's ${fixed(deviceOhm, 2)} Ω, and no RCD of known rating is recorded.`,
    {
      ...rest,
      limit: `≤ ${fixed(deviceOhm, 2)} Ω`,
    },
  );
}

/** The loop by calculation, at working temperature, against the printed limit. */
export function calculatedLoopAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  const earthing = circuitEarthing(job, circuit);
  if (earthing === null) return cannotTell(`The earthing of the supply ${absent(job.supply.earthing)}.`);
  const loop = calculatedLoop(job, circuit, on);
  if ("gap" in loop) return cannotTell(loop.gap);
  const limits = loopLimits(job, circuit, on);
  return against({
    ohm: loop.ohm,
    deviceOhm: limits.hotOhm,
    limits,
    tt: earthing === "TT",
    kind: "calculated",
    rest: {
      used: { zsOhm: loop.ohm, hotLimitOhm: limits.hotOhm, rcdMa: limits.rcdMa, earthing },
      workings: [...loop.workings, ...limits.workings],
    },
  });
}

/** The loop as read on cold conductors, against the share of the printed limit; far above design asks why. */
export function measuredLoopAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  if (isPlanned(job)) return notYet("the reading of the loop");
  const ohm = knownNumber(circuit.measured.zsOhm);
  if (ohm === null) return cannotTell(`The reading of the loop ${absent(circuit.measured.zsOhm)}.`);
  const earthing = circuitEarthing(job, circuit);
  if (earthing === null) return cannotTell(`The earthing of the supply ${absent(job.supply.earthing)}.`);
  const limits = loopLimits(job, circuit, on);
  const loop = calculatedLoop(job, circuit, on);
  const designOhm = "gap" in loop ? null : loop.ohm;
  const rest = {
    used: { zsOhm: ohm, coldLimitOhm: limits.coldOhm, rcdMa: limits.rcdMa, designOhm, earthing },
    workings: [`Zs read = ${plain(ohm)} Ω`, ...limits.workings],
  };
  const times = valueAt(farAboveDesign, on);
  const aboveDevice = limits.coldOhm !== null && ohm > limits.coldOhm;
  const withinRcd = limits.rcdOhm !== null && ohm <= limits.rcdOhm;
  if (aboveDevice && withinRcd && designOhm !== null && ohm > times * designOhm)
    return cannotTell(
      `${plain(ohm)} Ω measured is more than ${times} times the ${fixed(designOhm, 2)} Ω of the design: find out why, although the RCD's limit is not passed.`,
      { ...rest, recorded: `${plain(ohm)} Ω` },
    );
  return against({ ohm, deviceOhm: limits.coldOhm, limits, tt: earthing === "TT", kind: "measured", rest });
}
