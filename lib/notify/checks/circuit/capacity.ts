import { effectiveCapacityA, rowAtOrAbove, type Factor } from "@/lib/calc/circuit/capacity";
import { fixed, plain } from "@/lib/calc/exact";
import { entryAt, type IsoDate, type Parameter } from "@/lib/calc/parameter";
import {
  ambientFactor70,
  ambientFactor90,
  buriedFactor,
  bunchedFactor,
  groundFactor70,
  groundFactor90,
  insulationFactor,
  semiEnclosedFuseFactor,
  singleLayerFactor,
} from "@/lib/calc/parameters/cable-factors";
import { capacities, type Column } from "@/lib/calc/parameters/cables";
import type { Circuit } from "@/lib/notify/job";
import { isNotKnown } from "@/lib/notify/job/facts";
import { mark } from "../rule";
import type { Gap } from "./load";

export type Capacity = {
  izA: number;
  tabulatedA: number;
  factors: readonly Factor[];
  ambientFactor: number;
  groupFactor: number;
  conductorC: 70 | 90;
  workings: string[];
};

type Cited = Factor & { text: string };

/** 90 °C cable counts as such only where its terminations are declared for 90 °C; else the 70 °C currents apply. */
export const conductorC = ({ table, terminationC }: Circuit["cable"]): 70 | 90 =>
  table === "4E4A" && terminationC === 90 ? 90 : 70;

/** The cable's current as installed, with each factor, or the sentence that says what is missing. */
export function capacityOf({ cable, device }: Circuit, phases: 1 | 3, on: IsoDate): Capacity | Gap {
  const { table, lineMm2, referenceMethod } = cable;
  if (table === null || lineMm2 === null) return { gap: "The cable's table and size are needed." };
  if (referenceMethod === null || referenceMethod === "unknown")
    return { gap: "How the cable is installed is not told." };
  const conductor = conductorC(cable);
  const used = table === "4E4A" && conductor === 70 ? "4D4A" : table;
  const cores = phases === 1 ? "two-core" : "three-core";
  const column = capacities.get(`${used} ${referenceMethod} ${cores}`);
  const entry = column && entryAt(column, on);
  const tabulatedA = entry?.value[lineMm2];
  if (!entry || tabulatedA === undefined)
    return { gap: `No figure is held for Table ${used}, ${lineMm2} mm², method ${referenceMethod}, ${cores}.` };
  const ambient = ambientOf(cable, conductor, on);
  const group = groupOf(cable, on);
  const insulation = insulationOf(cable, on);
  if ("gap" in ambient) return ambient;
  if ("gap" in group) return group;
  if ("gap" in insulation) return insulation;
  const factors: Cited[] = [ambient, group, insulation, ...protectionFactors(cable, device.kind, on)];
  const izA = effectiveCapacityA(tabulatedA, factors);
  const note = used === table ? "" : ", 70 °C currents for the terminations";
  return {
    izA,
    tabulatedA,
    factors,
    ambientFactor: ambient.value,
    groupFactor: group.value,
    conductorC: conductor,
    workings: [
      `It = ${tabulatedA} A: Table ${used}, ${lineMm2} mm², method ${referenceMethod}, ${cores}${note}${mark(entry)}`,
      ...factors.map(({ symbol, value, text }) => `${symbol} = ${value}: ${text}`),
      `Iz = ${[tabulatedA, ...factors.map(({ value }) => value)].join(" × ")} = ${fixed(izA, 1)} A`,
    ],
  };
}

type Answered = Cited | Gap;

function fromRow(symbol: string, figure: Parameter<Column>, value: number, name: string, on: IsoDate): Answered {
  const entry = entryAt(figure, on);
  const row = rowAtOrAbove(entry.value, value);
  if (row === null) return { gap: `The tables held here stop before ${name}.` };
  return { symbol, value: row.figure, text: `${name}, read at ${plain(row.row)}${mark(entry)}` };
}

function ambientOf(cable: Circuit["cable"], conductor: 70 | 90, on: IsoDate): Answered {
  const buried = cable.referenceMethod === "D";
  const degrees = buried ? cable.groundC : cable.ambientC;
  if (typeof degrees !== "number")
    return { gap: buried ? "The temperature of the ground is needed." : "The temperature of the air is needed." };
  const inGround = conductor === 90 ? groundFactor90 : groundFactor70;
  const inAir = conductor === 90 ? ambientFactor90 : ambientFactor70;
  return fromRow("Ca", buried ? inGround : inAir, degrees, `${plain(degrees)} °C of ${buried ? "ground" : "air"}`, on);
}

function groupOf({ grouping, groupedCircuits }: Circuit["cable"], on: IsoDate): Answered {
  if (grouping === null || groupedCircuits === null)
    return { gap: "How the cable is grouped, and with how many circuits, is needed." };
  const alone = { symbol: "Cg", value: 1, text: "not grouped" };
  if (groupedCircuits === 1) return alone;
  if (grouping === "none") return { gap: "Grouped circuits are counted but the grouping is recorded as none." };
  if (grouping === "bunched" || grouping === "single-layer")
    return fromRow(
      "Cg",
      grouping === "bunched" ? bunchedFactor : singleLayerFactor,
      groupedCircuits,
      `${groupedCircuits} circuits, ${grouping.replace("-", " ")}`,
      on,
    );
  return { gap: "The grouping tables for buried cables are not held here." };
}

function insulationOf({ insulationMm, referenceMethod }: Circuit["cable"], on: IsoDate): Answered {
  if (isNotKnown(insulationMm)) return { gap: "How far the cable runs in thermal insulation could not be told." };
  if (insulationMm === null || insulationMm === 0 || referenceMethod?.startsWith("10"))
    return { symbol: "Ci", value: 1, text: "no length in insulation beyond the method's own" };
  const entry = entryAt(insulationFactor, on);
  const longest = Math.max(...Object.keys(entry.value).map(Number));
  return fromRow(
    "Ci",
    insulationFactor,
    Math.min(insulationMm, longest),
    `${plain(insulationMm)} mm in insulation`,
    on,
  );
}

function protectionFactors(cable: Circuit["cable"], kind: Circuit["device"]["kind"], on: IsoDate): Cited[] {
  const buried = entryAt(buriedFactor, on);
  const rewirable = entryAt(semiEnclosedFuseFactor, on);
  return [
    ...(cable.referenceMethod === "D"
      ? [{ symbol: "Cc", value: buried.value, text: `cable in the ground${mark(buried)}` }]
      : []),
    ...(kind === "BS3036" ? [{ symbol: "Cf", value: rewirable.value, text: "semi-enclosed fuse" }] : []),
  ];
}
