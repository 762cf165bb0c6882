import { parameter } from "../parameter";
import { since2018, throughEditions } from "./wiring-edition";

/** Steps of a table: up to and including `upToMm2`, the figure; the last step has no upper end. */
export type Steps = readonly { upToMm2: number | null; mm2: number }[];

export const pmeBondingMm2 = parameter<Steps>({
  id: "earthing.bonding-pme",
  unit: "mm² copper by supply neutral",
  meaning: "Least main bonding conductor where the supply is PME.",
  values: throughEditions<Steps>(
    [
      { upToMm2: 35, mm2: 10 },
      { upToMm2: 50, mm2: 16 },
      { upToMm2: 95, mm2: 25 },
      { upToMm2: 150, mm2: 35 },
      { upToMm2: null, mm2: 50 },
    ],
    "Table 54.8",
    "seen",
  ),
});

export type BondingBounds = { shareOfEarthing: number; leastMm2: number; mostMm2: number };

export const bondingBounds = parameter<BondingBounds>({
  id: "earthing.bonding-other",
  unit: "share and mm²",
  meaning: "Main bonding elsewhere: a share of the earthing conductor, with a least and a most.",
  values: throughEditions({ shareOfEarthing: 0.5, leastMm2: 6, mostMm2: 25 }, "544.1.1", "seen"),
});

export type ProtectiveSteps = { sameUpToMm2: number; flatUpToMm2: number; flatMm2: number; shareAbove: number };

export const protectiveConductor = parameter<ProtectiveSteps>({
  id: "earthing.protective-conductor",
  unit: "mm² and share",
  meaning: "Least protective conductor by the size of the line conductor.",
  values: throughEditions({ sameUpToMm2: 16, flatUpToMm2: 35, flatMm2: 16, shareAbove: 0.5 }, "Table 54.7", "seen"),
});

export const standardSizesMm2 = parameter<readonly number[]>({
  id: "earthing.standard-sizes",
  unit: "mm²",
  meaning: "Conductor sizes that are made.",
  values: since2018([1, 1.5, 2.5, 4, 6, 10, 16, 25, 35, 50, 70, 95, 120, 150], "IEC 60228", "seen"),
});

export type ExternalMaxima = Readonly<Record<"TN-C-S" | "TN-S" | "TT", number>>;

export const externalLoopMaxOhm = parameter<ExternalMaxima>({
  id: "supply.external-loop-max",
  unit: "Ω",
  meaning: "Typical declared maximum of the external loop up to 100 A; for TT the network's part only.",
  values: since2018({ "TN-C-S": 0.35, "TN-S": 0.8, TT: 21 }, "EREC P23/2", "seen"),
});

export const declaredFaultLevelKa = parameter({
  id: "supply.fault-level-max",
  unit: "kA",
  meaning: "Declared maximum prospective short-circuit current, 230 V single-phase.",
  values: since2018(16, "IET On-Site Guide section 7", "seen"),
});

export const threePhaseFaultMultiple = parameter({
  id: "supply.three-phase-fault",
  unit: "multiple",
  meaning: "Three-phase fault current over a single-phase reading, about.",
  values: since2018(2, "Circuit theory", "from memory: verify"),
});

export const serviceFuseForConditionalA = parameter({
  id: "supply.conditional-service-fuse",
  unit: "A",
  meaning: "Service fuse behind which an assembly's conditional rating stands for its devices.",
  values: since2018(100, "IET On-Site Guide section 7", "from memory: verify"),
});

/** Currents that the three-or-four-cable column and the service condition of IEC 61000-3-11 speak of. */
export const conditionalServiceA = parameter({
  id: "power-quality.conditional-service",
  unit: "A a phase",
  meaning: "Service current that a unit marked for it needs.",
  values: since2018(100, "IEC 61000-3-11", "seen"),
});

export type PowerQualityBands = { ordinaryUpToA: number; conditionalUpToA: number };

export const powerQualityBands = parameter<PowerQualityBands>({
  id: "power-quality.bands",
  unit: "A a phase",
  meaning: "Ratings up to which the ordinary and the conditional emission standards reach.",
  values: since2018({ ordinaryUpToA: 16, conditionalUpToA: 75 }, "IEC 61000-3-12", "seen"),
});

export const lowestShortCircuitRatio = parameter({
  id: "power-quality.lowest-ratio",
  unit: "ratio",
  meaning: "Short-circuit ratio Rsce of the lowest class, for which no minimum power is declared.",
  values: since2018(33, "IEC 61000-3-12", "from memory: verify"),
});

export const shortCircuitMultiple = parameter<Readonly<Record<1 | 2 | 3, number>>>({
  id: "power-quality.short-circuit-multiple",
  unit: "multiple by phases",
  meaning: "Equipment power times this is what Rsce multiplies: 3 single-phase, 2 interphase, 1 three-phase.",
  values: since2018({ 1: 3, 2: 2, 3: 1 }, "IEC 61000-3-12", "from memory: verify"),
});

export const relativeVoltageChangeLimit = parameter({
  id: "power-quality.voltage-change-limit",
  unit: "share",
  meaning: "Steady relative voltage change, dc, that equipment may cause.",
  values: since2018(0.033, "IEC 61000-3-11", "seen"),
});

export const referenceResistanceOhm = parameter({
  id: "power-quality.reference-resistance",
  unit: "Ω",
  meaning: "Resistive part of the reference impedance, line to neutral.",
  values: since2018(0.4, "IEC 60725", "from memory: verify"),
});
