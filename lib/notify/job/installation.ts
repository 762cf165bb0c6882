import { z } from "zod";
import { amount, fact, figure, isoDate, itemId, observed, word } from "./facts";

/** Boards and circuits: what was added between the supply and the chargepoint. */
const count = (most: number) => figure(0, most, "modules").int("must be a whole number");

export const boardSchema = z.object({
  id: itemId,
  arrangement: fact(word(["existing", "additional", "replaced"])),
  reason: fact(word(["existing-full", "existing-unsuitable", "customer-choice", "none"])),
  ways: fact(count(200)),
  modules: z
    .object({
      mainSwitch: fact(count(40)),
      surgeProtection: fact(count(40)),
      circuitProtection: fact(count(200)),
      other: fact(count(200)),
    })
    .prefault({}),
  assemblyRatingA: fact(amount(10, 3200, "A")),
  conditionalFaultRatingKa: fact(amount(1, 150, "kA")),
  surgeProtection: fact(word(["fitted-type-1-2", "fitted-type-2", "declined-by-owner", "unknown"])),
});

export const rcdTypes = ["AC", "A", "F", "B", "none", "unknown"] as const;

export const circuitSchema = z.object({
  id: itemId,
  board: fact(itemId),
  fedFrom: fact(itemId),
  kind: word(["final", "distribution"]).default("final"),
  device: z
    .object({
      kind: fact(word(["MCB", "RCBO", "MCCB", "BS88-2", "BS88-3", "BS1361", "BS3036"])),
      curve: fact(word(["B", "C", "D"])),
      ratingA: fact(figure(1, 1600, "A")),
      breakingCapacityKa: fact(amount(1, 200, "kA")),
      rcdType: fact(word(rcdTypes)),
      rcdMa: fact(figure(1, 1000, "mA")),
      rcdPlace: fact(word(["in-device", "separate", "in-chargepoint", "none", "unknown"])),
      doublePole: fact(observed),
      bidirectional: fact(observed),
      sharedRcd: fact(observed),
    })
    .prefault({}),
  upstreamRcds: fact(
    z.array(z.object({ type: fact(word(rcdTypes)), ratedMa: fact(figure(1, 3000, "mA")), delayed: fact(observed) })),
  ),
  cable: z
    .object({
      table: fact(word(["4D2A", "4D4A", "4D5", "4E4A"])),
      lineMm2: fact(figure(0.5, 400, "mm²")),
      cpcMm2: fact(amount(0.5, 400, "mm²")),
      cpcKind: fact(word(["core", "armour", "separate"])),
      armourMilliohmPerM: fact(amount(0.01, 100, "mΩ/m")),
      lengthM: fact(amount(0.1, 2000, "m")),
      referenceMethod: fact(word(["A", "B", "C", "D", "E", "100", "101", "102", "103", "unknown"])),
      ambientC: fact(amount(-20, 80, "°C")),
      groundC: fact(amount(-5, 40, "°C")),
      groupedCircuits: fact(figure(1, 60, "circuits").int("must be a whole number")),
      grouping: fact(word(["none", "bunched", "single-layer", "buried-touching", "buried-spaced"])),
      insulationMm: fact(amount(0, 5000, "mm")),
      terminationC: fact(z.literal([70, 90], { error: () => "must be 70 or 90" })),
    })
    .prefault({}),
  measured: z
    .object({
      testedOn: fact(isoDate),
      r1r2Ohm: fact(amount(0, 100, "Ω")),
      zsOhm: fact(amount(0, 5000, "Ω")),
      rcdTripMs: fact(amount(0, 2000, "ms")),
      rcdTestMultiple: fact(z.literal([1, 2, 5], { error: () => "must be 1, 2 or 5" })),
      dcTripMa: fact(amount(0, 100, "mA")),
      insulationMohm: fact(amount(0, 100000, "MΩ")),
      insulationTestV: fact(z.literal([250, 500, 1000], { error: () => "must be 250, 500 or 1000" })),
      polarityCorrect: fact(observed),
      phaseSequenceCorrect: fact(observed),
    })
    .prefault({}),
  isolator: fact(observed),
});
