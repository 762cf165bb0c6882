import { breakerLoopLimitOhm, coldLimitOhm, rcdLimitOhm } from "@/lib/calc/circuit/loop";
import { fixed } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import { rcdTouchLimitV } from "@/lib/calc/parameters/open-pen";
import { coldReadingShare, fuseLoopLimitOhm, instantaneousMultiple } from "@/lib/calc/parameters/protection";
import { nominalVoltageV, voltageFactorMin } from "@/lib/calc/parameters/voltage";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { circuitEarthing } from "../facts";
import { mark } from "../rule";
import { rcdOf } from "./rcd-facts";

export type LoopLimits = {
  /** The printed limit of the device, hot; null where none is held, and on TT. */
  hotOhm: number | null;
  /** For a reading on cold conductors. */
  coldOhm: number | null;
  /** The RCD's own limit, exact; null without an RCD whose rating is known. */
  rcdOhm: number | null;
  rcdMa: number | null;
  workings: string[];
};

/** The limits a loop is held against; on a TT earth the RCD's only. */
export function loopLimits(job: JobFacts, circuit: Circuit, on: IsoDate): LoopLimits {
  const printed = circuitEarthing(job, circuit) === "TT" ? null : printedLimit(circuit, on);
  const share = valueAt(coldReadingShare, on);
  const coldOhm = printed === null ? null : coldLimitOhm(printed.ohm, share);
  const rcd = rcdOf(job, circuit);
  const rcdMa = rcd.standing === "there" ? rcd.ratedMa : null;
  const touchV = valueAt(rcdTouchLimitV, on);
  const rcdOhm = rcdMa === null ? null : rcdLimitOhm(touchV, rcdMa);
  return {
    hotOhm: printed?.ohm ?? null,
    coldOhm,
    rcdOhm,
    rcdMa,
    workings: [
      ...(printed === null ? [] : [printed.working]),
      ...(printed === null || coldOhm === null
        ? []
        : [`Cold reading: ${share} × ${fixed(printed.ohm, 2)} Ω, rounded down = ${fixed(coldOhm, 2)} Ω`]),
      ...(rcdOhm === null ? [] : [`RCD: ${touchV} V ÷ ${rcdMa} mA = ${fixed(rcdOhm, 0)} Ω`]),
    ],
  };
}

function printedLimit({ device }: Circuit, on: IsoDate): { ohm: number; working: string } | null {
  const { kind, curve, ratingA } = device;
  if (ratingA === null) return null;
  if (kind === "BS88-3") {
    const entry = entryAt(fuseLoopLimitOhm, on);
    const ohm = entry.value[ratingA];
    return ohm === undefined
      ? null
      : { ohm, working: `BS 88-3 fuse, ${ratingA} A, Table 41.2: ${fixed(ohm, 2)} Ω${mark(entry)}` };
  }
  if ((kind !== "MCB" && kind !== "RCBO") || curve === null) return null;
  const nominalV = valueAt(nominalVoltageV, on);
  const factorMin = valueAt(voltageFactorMin, on);
  const multiple = valueAt(instantaneousMultiple, on)[curve];
  const ohm = breakerLoopLimitOhm({ nominalV, factorMin, multiple, ratingA });
  return {
    ohm,
    working: `Zs limit, ${curve}${ratingA}: ${nominalV} V × ${factorMin} ÷ (${multiple} × ${ratingA} A) = ${fixed(ohm, 2)} Ω, Table 41.3`,
  };
}
