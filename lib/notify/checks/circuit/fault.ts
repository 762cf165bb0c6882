import { adiabaticMm2 } from "@/lib/calc/circuit/adiabatic";
import { fixed, plain } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import {
  heatFactor70,
  heatFactor90,
  instantaneousMultiple,
  instantaneousTimeS,
  rcdTripLimitMs,
} from "@/lib/calc/parameters/protection";
import { protectiveConductor, serviceFuseForConditionalA } from "@/lib/calc/parameters/supply";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import { protectiveMm2 } from "@/lib/calc/supply/earthing";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent } from "../facts";
import { cannotTell, mark, met, metIf, notMet, rule, type Answer } from "../rule";
import { faultLevelAtOrigin } from "../supply/fault-level";
import { calculatedLoop } from "./loop";
import { loopLimits } from "./loop-limits";
import { disconnectionS, rcdOf } from "./rcd-facts";

export const breakingCapacityRule = rule({
  id: "circuit.breaking-capacity",
  group: "circuit",
  title: "Breaking capacity above the fault current",
  reads: [
    "circuits[].device.breakingCapacityKa",
    "boards[].conditionalFaultRatingKa",
    "supply.prospectiveFaultCurrentKa",
    "supply.externalLoopImpedanceOhm",
    "supply.lineNeutralImpedanceOhm",
    "supply.cutOutRatingA",
    "supply.phases",
  ],
  sources: ["BS 7671 434.5.1"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const protectiveConductorRule = rule({
  id: "circuit.protective-conductor",
  group: "circuit",
  title: "Protective conductor carries the fault",
  reads: ["circuits[].cable", "circuits[].device", "circuits[].measured.zsOhm", "supply.externalLoopImpedanceOhm"],
  sources: ["BS 7671 543.1.3", "BS 7671 Table 54.7"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** The device's own capacity, or the assembly's conditional rating behind a service fuse that allows it. */
export function breakingCapacityAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  const level = faultLevelAtOrigin(job, on);
  const ownKa = knownNumber(circuit.device.breakingCapacityKa);
  const board = job.boards.find(({ id }) => id === circuit.board);
  const conditionalKa = knownNumber(board?.conditionalFaultRatingKa);
  const fuseA = knownNumber(job.supply.cutOutRatingA);
  const used = { faultKa: level?.ka ?? null, breakingCapacityKa: ownKa, conditionalKa, cutOutRatingA: fuseA };
  if (level === null || job.supply.phases === null)
    return cannotTell("The fault current at the origin cannot be told.", { used });
  const value = `${fixed(level.ka, 1)} kA`;
  const rest = { used, limit: `≥ ${value}`, workings: level.workings };
  if (ownKa !== null && ownKa >= level.ka)
    return met(`The device's ${plain(ownKa)} kA is not below the fault current of ${value}.`, {
      ...rest,
      recorded: `${plain(ownKa)} kA`,
    });
  const behind = entryAt(serviceFuseForConditionalA, on);
  if (conditionalKa !== null && conditionalKa >= level.ka && fuseA !== null && fuseA <= behind.value)
    return met(
      `The assembly's conditional rating of ${plain(conditionalKa)} kA behind the ${fuseA} A service fuse is not below ${value}${mark(behind)}.`,
      { ...rest, recorded: `${plain(conditionalKa)} kA, conditional` },
    );
  if (ownKa === null)
    return cannotTell(`The device's breaking capacity ${absent(circuit.device.breakingCapacityKa)}.`, rest);
  if (conditionalKa === null || fuseA === null)
    return cannotTell(
      `The device's ${plain(ownKa)} kA is below ${value}; the assembly's conditional rating and the service fuse decide, and are not both known.`,
      rest,
    );
  return notMet(
    `The device's ${plain(ownKa)} kA is below the fault current of ${value}, and the assembly does not make it good.`,
    {
      ...rest,
      recorded: `${plain(ownKa)} kA`,
    },
  );
}

/** Fault current at the end of the circuit: the larger, from the reading or the calculation. */
function faultAtEnd(job: JobFacts, circuit: Circuit, on: IsoDate): { amps: number; working: string } | null {
  const loop = calculatedLoop(job, circuit, on);
  const readOhm = knownNumber(circuit.measured.zsOhm);
  const ohms = [readOhm, "gap" in loop ? null : loop.ohm].filter((ohm): ohm is number => ohm !== null && ohm > 0);
  if (ohms.length === 0) return null;
  const leastOhm = Math.min(...ohms);
  const nominalV = valueAt(nominalVoltageV, on);
  const amps = nominalV / leastOhm;
  return { amps, working: `If = ${nominalV} V ÷ ${fixed(leastOhm, 3)} Ω = ${fixed(amps, 0)} A` };
}

/** How long the fault lasts, seconds: at once on the breaker's curve, by the RCD, or within a fuse's limit. */
function faultSeconds(job: JobFacts, circuit: Circuit, amps: number, on: IsoDate): number | null {
  const { curve, ratingA, kind } = circuit.device;
  const breaker = kind === "MCB" || kind === "RCBO";
  if (breaker && curve !== null && ratingA !== null && amps >= valueAt(instantaneousMultiple, on)[curve] * ratingA)
    return valueAt(instantaneousTimeS, on);
  const rcd = rcdOf(job, circuit);
  if (rcd.standing === "there") return valueAt(rcdTripLimitMs, on)[1] / 1000;
  const { hotOhm } = loopLimits(job, circuit, on);
  if (!breaker && hotOhm !== null && valueAt(nominalVoltageV, on) / amps <= hotOhm)
    return disconnectionS(job, circuit, "TN-S", on);
  return null;
}

/** By the adiabatic sum, or by the table of sizes: either is enough. */
export function protectiveConductorAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  const { cpcKind, cpcMm2, lineMm2, table } = circuit.cable;
  const mm2 = knownNumber(cpcMm2);
  const used = { cpcMm2: mm2, cpcKind, lineMm2 };
  if (cpcKind === "armour")
    return cannotTell("The armour is the protective conductor; its maker's figures decide, and are not held here.", {
      used,
    });
  if (mm2 === null || cpcKind === null)
    return cannotTell(`The protective conductor's size and kind are needed; the size ${absent(cpcMm2)}.`, { used });
  const byTable = lineMm2 === null ? null : protectiveMm2(valueAt(protectiveConductor, on), lineMm2);
  if (byTable !== null && mm2 >= byTable)
    return met(`${mm2} mm² is not less than the ${plain(byTable)} mm² of Table 54.7.`, {
      used,
      recorded: `${mm2} mm²`,
      limit: `≥ ${plain(byTable)} mm²`,
      workings: [`Table 54.7, line conductor ${lineMm2} mm²: ${plain(byTable)} mm²`],
    });
  const fault = faultAtEnd(job, circuit, on);
  if (fault === null) return cannotTell("The loop impedance is needed to tell the fault current.", { used });
  const seconds = faultSeconds(job, circuit, fault.amps, on);
  if (seconds === null)
    return cannotTell("How long the device lets the fault last cannot be told.", { used, workings: [fault.working] });
  const factors = valueAt(table === "4E4A" ? heatFactor90 : heatFactor70, on);
  const k = cpcKind === "separate" ? factors.separate : factors.inCable;
  const leastMm2 = adiabaticMm2(fault.amps, seconds, k);
  const least = `${fixed(leastMm2, 2)} mm²`;
  const rest = {
    used: { ...used, faultA: fault.amps, seconds, k, leastMm2 },
    recorded: `${mm2} mm²`,
    limit: `≥ ${least}`,
    workings: [fault.working, `S = √(${fixed(fault.amps, 0)}² × ${seconds} s) ÷ ${k} = ${least}`],
  };
  if (mm2 < leastMm2 && seconds <= valueAt(instantaneousTimeS, on))
    return cannotTell(
      `${mm2} mm² is less than the ${least} of a fault of ${seconds} s; the device acts sooner, and its maker’s let-through energy decides.`,
      rest,
    );
  return metIf(
    mm2 >= leastMm2,
    `${mm2} mm² is ${mm2 >= leastMm2 ? "not less than" : "less than"} the ${least} that the fault needs.`,
    rest,
  );
}
