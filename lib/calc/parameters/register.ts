import type { Parameter } from "../parameter";
import * as cableFactors from "./cable-factors";
import { capacities, tailCapacities, voltDrops } from "./cables";
import * as demand from "./demand";
import * as openPen from "./open-pen";
import * as protection from "./protection";
import * as supply from "./supply";
import * as voltage from "./voltage";
import { wiringEdition } from "./wiring-edition";

/** Every dated figure of the wiring rules: for the register test and the page that lists them. */
export const wiringParameters: readonly Parameter<unknown>[] = [
  wiringEdition,
  ...[voltage, demand, openPen, cableFactors, protection, supply].flatMap((file) => Object.values(file)),
  ...capacities.values(),
  ...voltDrops.values(),
  ...tailCapacities.values(),
];
