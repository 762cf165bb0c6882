import { z } from "zod";
import { amount, clockTime, fact, figure, isoDate, itemId, observed, text, word } from "./facts";

/** A chargepoint, its open-PEN measure and its smart-charging settings. */
export const openPenMethods = [
  "three-phase-balance",
  "installation-electrode",
  "cpc-earth-70V-device",
  "line-neutral-window-device",
  "equivalent-device",
  "tt",
  "separation",
  "indoor",
  "private-tn-s",
] as const;

export const openPenSchema = z.object({
  method: fact(word(openPenMethods)),
  device: z
    .object({
      position: fact(word(["built-in", "separate", "none", "unknown"])),
      make: fact(text()),
      model: fact(text()),
      standard: fact(text(60)),
      opensEarth: fact(observed),
      opensWithinS: fact(amount(0, 60, "s")),
      recloses: fact(word(["when-back-in-window", "by-hand", "never", "at-once", "unknown"])),
      evidence: fact(word(["maker-declaration", "operator-list", "none"])),
      /** Whether a device on three phases declares that it watches more than one line to neutral. */
      watchesEveryLine: fact(observed),
    })
    .prefault({}),
  functionTest: fact(word(["passed", "failed", "not-done", "unknown"])),
  electrodeOhm: fact(amount(0, 20000, "Ω")),
  separationFromOtherEarthsM: fact(amount(0, 100, "m")),
  buriedSeparationM: fact(amount(0, 100, "m")),
  worstLoadsA: fact(z.array(z.tuple([figure(0, 5000, "A"), figure(0, 5000, "A"), figure(0, 5000, "A")]))),
});

export const weekdays = ["mon", "tue", "wed", "thu", "fri", "sat", "sun"] as const;

const windowSchema = z.object({
  days: z.array(word(weekdays)).min(1, "choose at least one day"),
  from: clockTime,
  to: clockTime,
});
export type ChargingWindow = z.infer<typeof windowSchema>;

export const smartChargingSchema = z.object({
  soldByFirm: fact(z.boolean()),
  transfer: fact(word(["sale", "hire", "loan", "gift", "none"])),
  users: fact(word(["private", "workplace", "public"])),
  maximumPowerKw: fact(amount(0.1, 1000, "kW")),
  vehicleClasses: fact(z.array(word(["car", "van", "motorcycle", "heavy", "other"]))),
  cable: fact(z.boolean()),
  canSendAndReceive: fact(observed),
  clock: fact(word(["local", "utc", "unknown"])),
  factoryDefault: fact(z.array(windowSchema)),
  /** `null` as the factory default, `[]` removed. */
  atHandover: fact(z.array(windowSchema)),
  ownerChoice: fact(word(["accepted", "changed", "removed", "pending", "owner-absent", "refused"])),
  firstUsePrompt: z
    .object({
      how: fact(word(["with-owner-present", "left-for-owner", "not-shown", "unknown"])),
      on: fact(isoDate),
      by: fact(text()),
    })
    .prefault({}),
  randomDelay: z
    .object({
      capabilityS: fact(amount(0, 86400, "s")),
      defaultMaximumS: fact(amount(0, 86400, "s")),
      stepS: fact(amount(0, 3600, "s")),
      remotelyAdjustable: fact(observed),
      ownerOverride: fact(observed),
      onRateChange: fact(observed),
      active: fact(observed),
    })
    .prefault({}),
  demandSideResponse: z
    .object({
      agreementDate: fact(isoDate),
      provider: fact(text()),
      namedInStatement: fact(observed),
      responseService: fact(observed),
    })
    .prefault({}),
  survivesSupplierChange: fact(observed),
  worksOffline: fact(observed),
  respondsToSignals: fact(observed),
  ownerInterface: fact(text(60)),
  ownerHoldsAccount: fact(observed),
  blocksUnsafeInput: fact(observed),
  recordsSessions: fact(observed),
  historyMonths: fact(amount(0, 600, "months")),
  powerResolutionS: fact(amount(0, 86400, "s")),
  accuracyPercent: fact(amount(0, 100, "%")),
  ownerCanChangeLater: fact(observed),
  overrideShown: fact(observed),
  statementOfCompliance: z
    .object({
      reference: fact(text()),
      date: fact(isoDate),
      namesModel: fact(observed),
      coversRegulations: fact(z.array(text(10))),
      coversSchedule1: fact(observed),
      givenOn: fact(isoDate),
      givenHow: fact(text()),
    })
    .prefault({}),
  technicalFile: z.object({ where: fact(text()), checkedOn: fact(isoDate) }).prefault({}),
  undertaking: z.object({ reference: fact(text()), expires: fact(isoDate) }).prefault({}),
  defaultPasswordRemoved: fact(observed),
  firmware: fact(text(60)),
  hardware: fact(text(60)),
  updateCheckDone: fact(observed),
  registerRow: fact(text(60)),
});

export const chargepointSchema = z.object({
  id: itemId,
  circuit: fact(itemId),
  make: fact(text()),
  model: fact(text()),
  serial: fact(text(60)),
  registerReference: fact(text(60)),
  mode: fact(z.literal([2, 3, 4], { error: () => "must be 2, 3 or 4" })),
  phases: fact(z.literal([1, 2, 3], { error: () => "must be 1, 2 or 3" })),
  phase: fact(word(["L1", "L2", "L3"])),
  ratedA: fact(amount(1, 1000, "A")),
  configuredA: fact(amount(1, 1000, "A")),
  configurationSecuredBy: fact(word(["key", "tool", "installer-code", "none", "unknown"])),
  outlets: fact(figure(1, 20, "outlets").int("must be a whole number")),
  outletsShareLoad: fact(observed),
  connection: fact(word(["tethered", "socket"])),
  location: fact(word(["outdoor", "indoor-vehicle-outdoor", "indoor"])),
  access: fact(word(["private", "shared", "public"])),
  standards: fact(z.array(text(60))),
  flickerCondition: fact(word(["none", "max-impedance", "service-100A", "unknown"])),
  maximumSystemImpedanceOhm: fact(amount(0.001, 20, "Ω")),
  minimumShortCircuitPowerKva: fact(amount(0, 1000000, "kVA")),
  dcFaultProtection: fact(word(["rdc-dd", "type-b", "none", "unknown"])),
  builtInRcd: fact(word(["A", "F", "B", "none", "unknown"])),
  discharge: z
    .object({
      kind: fact(word(["none", "disabled", "parallel", "islanded", "both", "unknown"])),
      designA: fact(amount(0, 1000, "A")),
      registeredA: fact(amount(0, 1000, "A")),
      exportLimitA: fact(amount(0, 1000, "A")),
      typeTestReference: fact(text(60)),
    })
    .prefault({}),
  replaces: fact(
    z.object({
      make: fact(text()),
      model: fact(text()),
      serial: fact(text(60)),
      ratedA: fact(amount(1, 1000, "A")),
      removedOn: fact(isoDate),
      reason: fact(text(400)),
    }),
  ),
  openPen: openPenSchema.prefault({}),
  smartCharging: smartChargingSchema.prefault({}),
});
