import { parameter } from "../parameter";
import { since2018, throughEditions } from "./wiring-edition";

export const nominalVoltageV = parameter({
  id: "voltage.nominal",
  unit: "V",
  meaning: "Nominal voltage from line to neutral and to Earth, U0.",
  values: since2018(230, "IET Wiring Matters 54", "seen"),
});

export const lineVoltageV = parameter({
  id: "voltage.line-to-line",
  unit: "V",
  meaning: "Nominal voltage between lines, U.",
  values: throughEditions(400, "appendix 2", "seen"),
});

export const voltageFactorMax = parameter({
  id: "voltage.factor-max",
  unit: "ratio",
  meaning: "Largest supply voltage over nominal, Cmax: the statutory +10 %.",
  values: since2018(1.1, "IET Wiring Matters 54", "seen"),
});

export const voltageFactorMin = parameter({
  id: "voltage.factor-min",
  unit: "ratio",
  meaning: "Smallest supply voltage over nominal used for disconnection, Cmin.",
  values: since2018(0.95, "IET Wiring Matters 54", "seen"),
});
