import { adiabaticMm2 } from "@/lib/calc/circuit/adiabatic";
import { effectiveCapacityA, neededTabulatedA } from "@/lib/calc/circuit/capacity";
import {
  breakerLoopLimitOhm,
  coldLimitOhm,
  hotLoopOhm,
  largestRcdMa,
  longestByLoopM,
  loopMilliohmPerM,
  rcdLimitOhm,
} from "@/lib/calc/circuit/loop";
import { coolerRunningFactor, longestByVoltDropM, voltDropV } from "@/lib/calc/circuit/volt-drop";
import { demandUnderLimitA, offeredA } from "@/lib/calc/demand/curtailment";
import { householdDemand, type Load } from "@/lib/calc/demand/diversity";
import { ampsOfHalfHour } from "@/lib/calc/demand/half-hourly";
import { rodOhm, surfacePotentialShare } from "@/lib/calc/earth/electrode";
import { ampsOf, kvaOf } from "@/lib/calc/kva";
import { largestUnseenShiftV, unseenTouchV, windowOpens } from "@/lib/calc/open-pen/line-neutral";
import {
  electrodeMaxConstantCurrentOhm,
  electrodeMaxConstantPowerOhm,
  electrodeMaxOhm,
  electrodeTouchV,
} from "@/lib/calc/open-pen/single-phase";
import {
  leastBaseA,
  openPenComplexV,
  openPenElectrodeMaxOhm,
  openPenV,
  shiftFromReadingsV,
  unbalancedA,
} from "@/lib/calc/open-pen/three-phase";
import { valueAt } from "@/lib/calc/parameter";
import { householdAllowances } from "@/lib/calc/parameters/demand";
import { bondingBounds, pmeBondingMm2, protectiveConductor, standardSizesMm2 } from "@/lib/calc/parameters/supply";
import { conductorMilliohmPerM } from "@/lib/calc/parameters/protection";
import { tailCapacities } from "@/lib/calc/parameters/cables";
import {
  equipmentKva,
  impedanceForKvaOhm,
  leastShortCircuitKva,
  shortCircuitKva,
  voltageChangeShare,
} from "@/lib/calc/power-quality";
import { nextSizeMm2, otherBondingMm2, protectiveMm2, stepMm2 } from "@/lib/calc/supply/earthing";
import { faultKa } from "@/lib/calc/supply/fault-level";

const on = "2026-12-01";
const NOMINAL_V = 230;
const LINE_V = 400;
const TOUCH_V = 70;
const supply = (factor = 1.1) => ({ sourceV: factor * NOMINAL_V, nominalV: NOMINAL_V });

type Input = Record<string, unknown>;
const n = (input: Input, key: string) => input[key] as number;
const lines = (input: Input) => input.currents as [number, number, number];
const factors = (input: Input) => (input.factors as number[]).map((value) => ({ symbol: "C", value }));

/** The sums that case files name, each over plain inputs. */
export const sums: Record<string, (input: Input) => number | boolean | null> = {
  electrodeMax: (input) => electrodeMaxOhm(supply(input.factor as number | undefined), n(input, "amps"), TOUCH_V),
  electrodeMaxConstantCurrent: (input) => electrodeMaxConstantCurrentOhm(n(input, "amps"), TOUCH_V),
  electrodeMaxConstantPower: (input) => electrodeMaxConstantPowerOhm(supply().sourceV, n(input, "watts"), TOUCH_V),
  electrodeTouch: (input) => electrodeTouchV(supply(), n(input, "amps"), n(input, "ohm")),
  unbalanced: (input) => unbalancedA(lines(input)),
  openPen: (input) =>
    openPenV(
      supply(input.factor as number | undefined).sourceV,
      NOMINAL_V,
      lines(input),
      (input.ohm as number) ?? null,
    ),
  openPenElectrodeMax: (input) => openPenElectrodeMaxOhm(supply().sourceV, NOMINAL_V, lines(input), TOUCH_V),
  openPenComplex: (input) => {
    const [a, b, c] = (input.phasors as [number, number][]).map(([amps, lagDegrees]) => ({ amps, lagDegrees }));
    return openPenComplexV(supply().sourceV, [a!, b!, c!]);
  },
  leastBase: (input) => leastBaseA(supply().sourceV, n(input, "amps"), TOUCH_V),
  shiftFromReadings: (input) => shiftFromReadingsV(input.readings as [number, number, number], NOMINAL_V),
  unseenTouch: (input) => unseenTouchV(n(input, "sourceV"), n(input, "lowV")),
  largestUnseenShift: () => largestUnseenShiftV(NOMINAL_V, 253),
  windowOpens: (input) => windowOpens(n(input, "volts"), 207, 253),
  rcdLimit: (input) => rcdLimitOhm(50, n(input, "milliamps")),
  largestRcd: (input) => largestRcdMa(50, n(input, "ohm")),
  rod: (input) => rodOhm(n(input, "soil"), n(input, "length"), n(input, "diameter")),
  surfacePotential: (input) =>
    surfacePotentialShare(n(input, "length"), n(input, "diameter"), n(input, "distance")) * 100,
  pmeBonding: (input) => stepMm2(valueAt(pmeBondingMm2, on), n(input, "mm2")),
  otherBonding: (input) =>
    nextSizeMm2(valueAt(standardSizesMm2, on), otherBondingMm2(valueAt(bondingBounds, on), n(input, "mm2"))),
  nextSize: (input) => nextSizeMm2(valueAt(standardSizesMm2, on), n(input, "mm2")),
  protective: (input) => protectiveMm2(valueAt(protectiveConductor, on), n(input, "mm2")),
  faultAmps: (input) => faultKa(NOMINAL_V, n(input, "ohm")) * 1000,
  household: (input) => {
    const loads = (input.loads as Partial<Load>[]).map((load) => ({ quantity: 1, hasSocket: false, ...load }) as Load);
    return householdDemand(loads, valueAt(householdAllowances, on)).totalA + ((input.plusA as number) ?? 0);
  },
  halfHourAmps: (input) => ampsOfHalfHour(n(input, "kwh"), NOMINAL_V) + ((input.plusA as number) ?? 0),
  offered: (input) =>
    offeredA({ limitA: n(input, "limit"), marginA: 0, houseA: n(input, "house"), mostA: n(input, "most"), leastA: 6 }),
  underLimit: (input) => demandUnderLimitA(n(input, "existing"), n(input, "added"), n(input, "limit")),
  capacity: (input) => effectiveCapacityA(n(input, "tabulated"), factors(input)),
  neededTabulated: (input) => neededTabulatedA(n(input, "amps"), factors(input)),
  voltDrop: (input) => voltDropV(n(input, "mv"), n(input, "amps"), n(input, "metres")),
  voltDropPercent: (input) =>
    (voltDropV(n(input, "mv"), n(input, "amps"), n(input, "metres")) / n(input, "baseV")) * 100,
  longestByVoltDrop: (input) => longestByVoltDropM(n(input, "mv"), n(input, "amps"), n(input, "limitV")),
  longestByLoop: (input) =>
    longestByLoopM({
      limitOhm: n(input, "limit"),
      externalOhm: n(input, "external"),
      milliohmPerM: n(input, "milliohm"),
      hotMultiplier: 1.2,
    }),
  coolerRunning: (input) =>
    coolerRunningFactor({
      conductorC: n(input, "conductorC"),
      loadA: n(input, "amps"),
      tabulatedA: n(input, "tabulated"),
      ambientFactor: 1,
      groupFactor: 1,
    }),
  loopMilliohm: (input) => {
    const copper = valueAt(conductorMilliohmPerM, on);
    return loopMilliohmPerM(copper[n(input, "line")]!, copper[n(input, "cpc")]!);
  },
  loop: (input) => n(input, "external") + hotLoopOhm(n(input, "milliohm"), n(input, "metres"), 1.2),
  breakerLimit: (input) =>
    breakerLoopLimitOhm({
      nominalV: NOMINAL_V,
      factorMin: 0.95,
      multiple: n(input, "multiple"),
      ratingA: n(input, "amps"),
    }),
  coldLimit: (input) => coldLimitOhm(n(input, "ohm"), 0.8),
  adiabatic: (input) => adiabaticMm2(n(input, "amps"), n(input, "seconds"), n(input, "k")),
  kva: (input) => kvaOf(input.perPhase as number[], NOMINAL_V),
  amps: (input) => ampsOf(n(input, "kva"), n(input, "phases"), NOMINAL_V),
  shortCircuitNeeded: (input) =>
    leastShortCircuitKva(
      equipmentKva(n(input, "amps"), n(input, "phases") as 1 | 2 | 3, NOMINAL_V, LINE_V),
      n(input, "ratio"),
      n(input, "multiple"),
    ),
  shortCircuit: (input) => shortCircuitKva(LINE_V, n(input, "ohm")),
  impedanceForKva: (input) => impedanceForKvaOhm(LINE_V, n(input, "kva")),
  voltageChange: (input) => voltageChangeShare(n(input, "amps"), n(input, "ohm"), NOMINAL_V) * 100,
  tails: (input) => valueAt(tailCapacities.get(input.column as string)!, on)[n(input, "mm2")]!,
};
