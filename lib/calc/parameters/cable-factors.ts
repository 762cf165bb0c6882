import { parameter } from "../parameter";
import type { Column } from "./cables";
import { throughEditions } from "./wiring-edition";

export const ambientFactor70 = parameter<Column>({
  id: "cable.ambient-70",
  unit: "factor by °C of air",
  meaning: "Correction for air temperature, 70 °C insulation, reference 30 °C.",
  values: throughEditions({ 25: 1.03, 30: 1, 35: 0.94, 40: 0.87, 45: 0.79, 50: 0.71 }, "Table 4B1", "seen"),
});

export const ambientFactor90 = parameter<Column>({
  id: "cable.ambient-90",
  unit: "factor by °C of air",
  meaning: "Correction for air temperature, 90 °C insulation, reference 30 °C.",
  values: throughEditions({ 30: 1, 35: 0.96, 40: 0.91, 45: 0.87, 50: 0.82 }, "Table 4B1", "seen"),
});

export const groundFactor70 = parameter<Column>({
  id: "cable.ground-70",
  unit: "factor by °C of ground",
  meaning: "Correction for ground temperature, 70 °C insulation, reference 20 °C.",
  values: throughEditions({ 10: 1.1, 15: 1.05, 20: 1, 25: 0.95 }, "Table 4B2", "from memory: verify"),
});

export const groundFactor90 = parameter<Column>({
  id: "cable.ground-90",
  unit: "factor by °C of ground",
  meaning: "Correction for ground temperature, 90 °C insulation, reference 20 °C.",
  values: throughEditions({ 10: 1.07, 15: 1.04, 20: 1, 25: 0.96 }, "Table 4B2", "from memory: verify"),
});

export const bunchedFactor = parameter<Column>({
  id: "cable.grouping-bunched",
  unit: "factor by circuits",
  meaning: "Correction for circuits bunched or enclosed.",
  values: throughEditions(
    { 1: 1, 2: 0.8, 3: 0.7, 4: 0.65, 5: 0.6, 6: 0.57, 7: 0.54, 8: 0.52, 9: 0.5 },
    "Table 4C1",
    "seen",
  ),
});

export const singleLayerFactor = parameter<Column>({
  id: "cable.grouping-single-layer",
  unit: "factor by circuits",
  meaning: "Correction for circuits in a single layer, clipped.",
  values: throughEditions({ 1: 1, 2: 0.85, 3: 0.79, 4: 0.75, 5: 0.73, 6: 0.72 }, "Table 4C1", "seen"),
});

export const insulationFactor = parameter<Column>({
  id: "cable.insulation",
  unit: "factor by mm",
  meaning: "Correction for a length in thermal insulation; longer runs take the last figure.",
  values: throughEditions({ 50: 0.88, 100: 0.78, 200: 0.63, 400: 0.51, 500: 0.5 }, "Table 52.2", "seen"),
});

export const semiEnclosedFuseFactor = parameter({
  id: "cable.semi-enclosed-fuse",
  unit: "factor",
  meaning: "Correction where a semi-enclosed fuse to BS 3036 protects.",
  values: throughEditions(0.725, "433.1.202", "seen"),
});

export const buriedFactor = parameter({
  id: "cable.buried",
  unit: "factor",
  meaning: "Correction for cables in the ground protected by a modern device.",
  values: throughEditions(0.9, "appendix 4", "from memory: verify"),
});

export const voltDropLimitShare = parameter({
  id: "circuit.volt-drop-limit",
  unit: "share",
  meaning: "Voltage drop from the origin, public supply, other than lighting.",
  values: throughEditions(0.05, "Table 4Ab", "seen"),
});

export const voltDropLimitPrivateShare = parameter({
  id: "circuit.volt-drop-limit-private",
  unit: "share",
  meaning: "Voltage drop from the origin, supply from the customer's own transformer, other than lighting.",
  values: throughEditions(0.08, "Table 4Ab", "seen"),
});
