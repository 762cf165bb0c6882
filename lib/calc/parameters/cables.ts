import { parameter, type Certainty, type Parameter } from "../parameter";
import { throughEditions } from "./wiring-edition";

/** A column of a table: conductor size in mm² to a figure. */
export type Column = Readonly<Record<number, number>>;
export type Cores = "two-core" | "three-core";

const sizes = {
  house: [1, 1.5, 2.5, 4, 6, 10, 16],
  multicore: [2.5, 4, 6, 10, 16],
} as const;

const column = (of: readonly number[], figures: readonly number[]): Column =>
  Object.fromEntries(of.map((mm2, index) => [mm2, figures[index] as number]));

const capacity = (
  table: string,
  method: string,
  cores: Cores,
  of: readonly number[],
  figures: readonly number[],
  certainty: Certainty,
): [string, Parameter<Column>] => [
  `${table} ${method} ${cores}`,
  parameter<Column>({
    id: `cable.capacity.${table}.${method}.${cores}`,
    unit: "A by mm²",
    meaning: `Tabulated current, Table ${table}, reference method ${method}, ${cores}.`,
    values: throughEditions(column(of, figures), `Table ${table}`, certainty),
  }),
];

const memory = "from memory: verify";

/** Tabulated currents by `table method cores`. A column that mixes seen and remembered rows is marked remembered. */
export const capacities: ReadonlyMap<string, Parameter<Column>> = new Map([
  capacity("4D5", "100", "two-core", sizes.house, [13, 16, 21, 27, 34, 45, 57], "seen"),
  capacity("4D5", "101", "two-core", sizes.house, [10.5, 13, 17, 22, 27, 36, 46], memory),
  capacity("4D5", "102", "two-core", sizes.house, [13, 16, 21, 27, 35, 47, 63], memory),
  capacity("4D5", "103", "two-core", sizes.house, [8, 10, 13.5, 17.5, 23.5, 32, 42.5], "seen"),
  capacity("4D5", "C", "two-core", sizes.house, [16, 20, 27, 37, 47, 64, 85], "seen"),
  capacity("4D5", "A", "two-core", sizes.house, [11.5, 14.5, 20, 26, 32, 44, 57], memory),
  capacity("4D2A", "B", "two-core", sizes.multicore, [23, 30, 38, 52, 69], "seen"),
  capacity("4D2A", "B", "three-core", sizes.multicore, [20, 27, 34, 46, 62], memory),
  capacity("4D2A", "C", "two-core", sizes.multicore, [27, 36, 46, 63, 85], "seen"),
  capacity("4D2A", "C", "three-core", sizes.multicore, [24, 32, 41, 57, 76], memory),
  capacity("4D4A", "C", "two-core", sizes.multicore, [28, 38, 49, 67, 89], memory),
  capacity("4D4A", "C", "three-core", sizes.multicore, [25, 33, 42, 58, 77], memory),
  capacity("4D4A", "D", "two-core", sizes.multicore, [29, 37, 46, 60, 78], memory),
  capacity("4D4A", "D", "three-core", sizes.multicore, [24, 30, 38, 50, 64], memory),
  capacity("4E4A", "C", "two-core", sizes.multicore, [36, 49, 62, 85, 110], "seen"),
  capacity("4E4A", "C", "three-core", sizes.multicore, [31, 42, 53, 73, 94], "seen"),
  capacity("4E4A", "D", "two-core", sizes.multicore, [33, 43, 53, 71, 91], "seen"),
  capacity("4E4A", "D", "three-core", sizes.multicore, [28, 36, 44, 58, 75], "seen"),
  capacity("4E4A", "E", "two-core", sizes.multicore, [39, 52, 66, 90, 115], "seen"),
  capacity("4E4A", "E", "three-core", sizes.multicore, [33, 44, 56, 78, 99], "seen"),
]);

const drop = (
  table: string,
  cores: Cores,
  of: readonly number[],
  figures: readonly number[],
  certainty: Certainty,
): [string, Parameter<Column>] => [
  `${table} ${cores}`,
  parameter<Column>({
    id: `cable.volt-drop.${table}.${cores}`,
    unit: "mV/A/m by mm²",
    meaning: `Tabulated voltage drop, ${table}, ${cores}; three-core figures are between lines.`,
    values: throughEditions(column(of, figures), `Table ${table}`, certainty),
  }),
];

/** Tabulated voltage drop by `table cores`. */
export const voltDrops: ReadonlyMap<string, Parameter<Column>> = new Map([
  drop("4D5", "two-core", sizes.house, [44, 29, 18, 11, 7.3, 4.4, 2.8], "seen"),
  drop("4D2A", "two-core", sizes.multicore, [18, 11, 7.3, 4.4, 2.8], memory),
  drop("4D2A", "three-core", sizes.multicore, [15, 9.5, 6.4, 3.8, 2.4], memory),
  drop("4D4A", "two-core", sizes.multicore, [18, 11, 7.3, 4.4, 2.8], memory),
  drop("4D4A", "three-core", sizes.multicore, [15, 9.5, 6.4, 3.8, 2.4], memory),
  drop("4E4A", "two-core", sizes.multicore, [19, 12, 7.9, 4.7, 2.9], "seen"),
  drop("4E4A", "three-core", sizes.multicore, [16, 10, 6.8, 4.0, 2.5], "seen"),
]);

const tailSizes = [16, 25, 35];

const tails = (method: string, cores: Cores, figures: readonly number[], certainty: Certainty) =>
  [
    `${method} ${cores}`,
    parameter<Column>({
      id: `supply.tails.${method}.${cores}`,
      unit: "A by mm²",
      meaning: `Single-core tails, Table 4D1A, reference method ${method}, ${cores === "two-core" ? "two" : "three or four"} cables.`,
      values: throughEditions(column(tailSizes, figures), "Table 4D1A", certainty),
    }),
  ] as const;

/** Current of meter tails by `method cores`. */
export const tailCapacities: ReadonlyMap<string, Parameter<Column>> = new Map([
  tails("A", "two-core", [61, 80, 99], "seen"),
  tails("B", "two-core", [76, 101, 125], "seen"),
  tails("C", "two-core", [87, 114, 141], "seen"),
  tails("A", "three-core", [56, 73, 89], memory),
  tails("B", "three-core", [68, 89, 110], memory),
  tails("C", "three-core", [79, 104, 129], memory),
]);
