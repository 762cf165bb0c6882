import { z } from "zod";
import { amount, fact, figure, isoDate, observed, text, word } from "./facts";

/** Who did the work, for whom, and where. */
export const datesSchema = z.object({
  surveyed: fact(isoDate),
  designed: fact(isoDate),
  planned: fact(isoDate),
  sold: fact(isoDate),
  installed: fact(isoDate),
  completed: fact(isoDate),
  commissioned: fact(isoDate),
  handedOver: fact(isoDate),
});

export const firmSchema = z.object({
  name: fact(text()),
  contactName: fact(text()),
  phone: fact(text(40)),
  email: fact(text(254)),
  address: fact(z.array(text())),
  registration: fact(text(60)),
});

export const competentPersonSchema = z.object({ name: fact(text()), registration: fact(text(60)) });

export const onBehalfOfSchema = z.object({
  name: fact(text()),
  reference: fact(text(60)),
  isSeller: fact(z.boolean()),
});

export const customerSchema = z.object({
  name: fact(text()),
  phone: fact(text(40)),
  email: fact(text(254)),
  address: fact(z.array(text())),
  interest: fact(word(["owner", "tenant", "landlord", "managing-agent", "employee-driver", "employer", "developer"])),
  permission: z.object({ from: fact(text()), on: fact(isoDate) }).prefault({}),
});

export const siteSchema = z.object({
  address: fact(z.array(text())),
  postcode: fact(text(10)),
  uprn: fact(text(12)),
  gridReference: fact(text(20)),
  territory: fact(word(["england", "wales", "scotland", "northern-ireland"])),
  premises: fact(
    word([
      "domestic",
      "small-commercial",
      "commercial",
      "multi-occupied",
      "public-highway",
      "car-park",
      "caravan-or-boat",
      "fuel-filling-station",
      "agricultural",
    ]),
  ),
  building: fact(word(["house", "flat", "outbuilding", "car-park", "column", "other"])),
  /** As typed; parsed by `parseSupplyNumber`. */
  supplyNumber: fact(text(60)),
  supplyNumberKind: fact(word(["import", "export", "unknown"])),
  operatorOverride: z.object({ id: fact(text(10)), reason: fact(text(400)) }).prefault({}),
  chargepointPosition: fact(text(400)),
});

export const serviceConditions = [
  "sound",
  "damaged",
  "heat-marks",
  "exposed-live",
  "pitch-leak",
  "tamper",
  "water",
  "asbestos-suspected",
  "no-earth-found",
  "other-concern",
  "unknown",
] as const;

export const supplySchema = z.object({
  connection: fact(word(["existing", "alteration", "new"])),
  ownedBy: fact(word(["distributor", "private-network", "unknown"])),
  metered: fact(observed),
  meter: z.object({ kind: fact(text(40)), serial: fact(text(40)), currentTransformers: fact(observed) }).prefault({}),
  phases: fact(z.literal([1, 2, 3], { error: () => "must be 1, 2 (split phase) or 3" })),
  cutOutRatingA: fact(amount(5, 800, "A")),
  cutOutEvidence: fact(word(["operator-statement", "fuse-seen", "carrier-label", "assumed", "unreadable"])),
  cutOutSeenUnder: z.object({ authority: fact(text()), on: fact(isoDate) }).prefault({}),
  looped: fact(word(["no", "feeds-neighbour", "fed-from-neighbour", "unknown"])),
  serviceConditions: fact(z.array(word(serviceConditions))),
  authorisedCapacityKva: fact(amount(0, 20000, "kVA")),
  siteDemandKva: fact(amount(0, 20000, "kVA")),
  earthing: fact(word(["TN-C-S", "TN-S", "TT", "unknown"])),
  earthingConfirmedPrivate: fact(z.boolean()),
  externalLoopImpedanceOhm: fact(amount(0, 2000, "ohm")),
  externalLoopObtained: fact(word(["measured", "declared", "enquiry"])),
  lineNeutralImpedanceOhm: fact(amount(0, 20, "ohm")),
  prospectiveFaultCurrentKa: fact(amount(0, 100, "kA")),
  tailsMm2: fact(amount(1, 400, "mm²")),
  tailsReferenceMethod: fact(word(["A", "B", "C", "unknown"])),
  supplyNeutralMm2: fact(amount(1, 400, "mm²")),
  earthingConductorMm2: fact(amount(1, 400, "mm²")),
  bonding: fact(z.array(z.object({ service: text(60), mm2: fact(amount(1, 400, "mm²")), seen: fact(observed) }))),
  isolatorAfterMeter: fact(word(["yes", "no", "unknown"])),
});

export const loadKinds = [
  "lighting",
  "heating-and-power",
  "cooking",
  "instantaneous-water-heater",
  "thermostatic-water-heater",
  "floor-warming",
  "storage-heating",
  "standard-circuit",
  "socket-outlets",
  "fixed",
] as const;

const phaseName = word(["L1", "L2", "L3"]);

export const demandSchema = z.object({
  method: fact(word(["measured", "half-hourly", "diversity", "declared"])),
  assessor: fact(text()),
  assessedOn: fact(isoDate),
  /** One number a phase, amps. */
  existingA: fact(
    z
      .array(figure(0, 5000, "A"))
      .min(1, "give one number a phase")
      .max(3, "give at most three numbers, one a phase"),
  ),
  measurement: z
    .object({
      from: fact(isoDate),
      to: fact(isoDate),
      resolutionS: fact(figure(1, 86400, "s")),
      perPhase: fact(z.boolean()),
    })
    .prefault({}),
  halfHourKwh: fact(
    z.array(
      z.object({
        start: z.iso.datetime({ offset: true, error: () => "write the start as 2026-01-05T18:00:00Z" }),
        kwh: figure(0, 5000, "kWh"),
      }),
    ),
  ),
  loads: fact(
    z.array(
      z.object({
        kind: word(loadKinds),
        ratedA: figure(0, 5000, "A"),
        quantity: figure(1, 1000, "").int("must be a whole number").default(1),
        phase: fact(phaseName),
        socketInControlUnit: fact(z.boolean()),
      }),
    ),
  ),
  otherEquipment: fact(
    z.array(
      z.object({
        kind: word(["chargepoint", "heat-pump", "solar", "battery", "generator", "other"]),
        make: fact(text()),
        model: fact(text()),
        ratedA: fact(amount(0, 5000, "A")),
        phase: fact(phaseName),
        designA: fact(amount(0, 5000, "A")),
        registeredA: fact(amount(0, 5000, "A")),
        exportLimitA: fact(amount(0, 5000, "A")),
        acceptance: fact(text()),
        inExistingDemand: fact(word(["yes", "no", "unknown"])),
      }),
    ),
  ),
  loadLimit: z
    .object({
      kind: fact(word(["none", "chargepoint", "site", "operator-scheme"])),
      limitA: fact(figure(0, 5000, "A")),
      operatorAgreement: fact(text()),
      failSafeTested: fact(observed),
      sealedBy: fact(text()),
    })
    .prefault({}),
});
