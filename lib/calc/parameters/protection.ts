import { parameter } from "../parameter";
import type { Column } from "./cables";
import { since2018, throughEditions } from "./wiring-edition";

export const conductorMilliohmPerM = parameter<Column>({
  id: "conductor.resistance",
  unit: "mΩ/m by mm²",
  meaning: "Resistance of a plain copper conductor at 20 °C.",
  values: since2018(
    { 1: 18.1, 1.5: 12.1, 2.5: 7.41, 4: 4.61, 6: 3.08, 10: 1.83, 16: 1.15, 25: 0.727, 35: 0.524 },
    "IEC 60228",
    "seen",
  ),
});

export const hotMultiplier70 = parameter({
  id: "conductor.hot-70",
  unit: "ratio",
  meaning: "Resistance at 70 °C over resistance at 20 °C.",
  values: since2018(1.2, "IET On-Site Guide appendix I", "seen"),
});

export const hotMultiplier90 = parameter({
  id: "conductor.hot-90",
  unit: "ratio",
  meaning: "Resistance at 90 °C over resistance at 20 °C.",
  values: since2018(1.28, "IET On-Site Guide appendix I", "seen"),
});

export const instantaneousMultiple = parameter<Readonly<Record<"B" | "C" | "D", number>>>({
  id: "protection.instantaneous-multiple",
  unit: "multiple of rated current",
  meaning: "Current that trips a circuit-breaker at once, by curve.",
  values: throughEditions({ B: 5, C: 10, D: 20 }, "Table 41.3", "seen"),
});

export const fuseLoopLimitOhm = parameter<Column>({
  id: "protection.fuse-88-3-loop-limit",
  unit: "Ω by A",
  meaning: "Largest loop impedance for a BS 88-3 fuse, 0.4 s.",
  values: throughEditions({ 32: 0.91 }, "Table 41.2", "from memory: verify"),
});

export const coldReadingShare = parameter({
  id: "protection.cold-reading",
  unit: "share",
  meaning: "Share of the printed loop limit that a reading on cold conductors may reach.",
  values: since2018(0.8, "NICEIC Connections", "seen"),
});

export const farAboveDesign = parameter({
  id: "protection.far-above-design",
  unit: "multiple",
  meaning: "Measured loop over calculated loop from which the difference has to be explained.",
  values: since2018(5, "Own proposal", "derived"),
});

export type DisconnectionTimes = { shortS: number; longS: number };

export const disconnectionTn = parameter<DisconnectionTimes>({
  id: "protection.disconnection-tn",
  unit: "s",
  meaning: "Disconnection in a TN system: final circuits, and larger fixed or distribution circuits.",
  values: throughEditions({ shortS: 0.4, longS: 5 }, "Table 41.1", "seen"),
});

export const disconnectionTt = parameter<DisconnectionTimes>({
  id: "protection.disconnection-tt",
  unit: "s",
  meaning: "Disconnection in a TT system: final circuits, and larger fixed or distribution circuits.",
  values: throughEditions({ shortS: 0.2, longS: 1 }, "Table 41.1", "seen"),
});

export const socketCircuitUpToA = parameter({
  id: "protection.socket-circuit-up-to",
  unit: "A",
  meaning: "Rating up to which a circuit with socket-outlets needs the short time.",
  values: throughEditions(63, "411.3.2.2", "seen"),
});

export const fixedCircuitUpToA = parameter({
  id: "protection.fixed-circuit-up-to",
  unit: "A",
  meaning: "Rating up to which a circuit with only fixed equipment needs the short time.",
  values: throughEditions(32, "411.3.2.2", "seen"),
});

export const rcdTripLimitMs = parameter<Readonly<Record<1 | 2 | 5, number>>>({
  id: "protection.rcd-trip",
  unit: "ms by test multiple",
  meaning: "Longest trip of a general RCD at that multiple of its rated residual current.",
  values: since2018({ 1: 300, 2: 150, 5: 40 }, "BS EN 61008-1", "seen"),
});

export const pointRcdMa = parameter({
  id: "protection.point-rcd",
  unit: "mA",
  meaning: "Largest rated residual current of the RCD of a charging point.",
  values: throughEditions(30, "722.531", "seen"),
});

export const directCurrentTripMa = parameter({
  id: "protection.direct-current-trip",
  unit: "mA",
  meaning: "Smooth direct current that a detecting device must act on.",
  values: since2018(6, "IEC 62955", "from memory: verify"),
});

export const instantaneousTimeS = parameter({
  id: "protection.instantaneous-time",
  unit: "s",
  meaning: "Time taken for a breaker acting at once in the adiabatic sum.",
  values: throughEditions(0.1, "543.1.3", "seen"),
});

export type HeatFactors = { inCable: number; separate: number };

export const heatFactor70 = parameter<HeatFactors>({
  id: "protection.heat-factor-70",
  unit: "A·s½/mm²",
  meaning: "k of a copper protective conductor with 70 °C insulation.",
  values: throughEditions({ inCable: 115, separate: 143 }, "Tables 54.2 and 54.3", "seen"),
});

export const heatFactor90 = parameter<HeatFactors>({
  id: "protection.heat-factor-90",
  unit: "A·s½/mm²",
  meaning: "k of a copper protective conductor with 90 °C insulation.",
  values: throughEditions({ inCable: 143, separate: 176 }, "Tables 54.2 and 54.3", "seen"),
});

export const insulationMohmAtLeast = parameter({
  id: "protection.insulation",
  unit: "MΩ",
  meaning: "Least insulation resistance of a circuit.",
  values: throughEditions(1, "Table 64", "from memory: verify"),
});

export const insulationTestV = parameter<readonly number[]>({
  id: "protection.insulation-test",
  unit: "V d.c.",
  meaning: "Test voltages: the ordinary one, and the one with sensitive equipment connected.",
  values: throughEditions([500, 250], "Table 64 and 643.3", "from memory: verify"),
});
