import { roundTo } from "../exact";
import type { Column } from "../parameters/cables";

export type Factor = { symbol: string; value: number };

/** Current a cable carries as installed: the tabulated current times every factor, amps. */
export const effectiveCapacityA = (tabulatedA: number, factors: readonly Factor[]): number =>
  roundTo(
    factors.reduce((amps, factor) => amps * factor.value, tabulatedA),
    6,
  );

/** Tabulated current that a load of `currentA` needs under the factors, amps. */
export const neededTabulatedA = (currentA: number, factors: readonly Factor[]): number =>
  factors.reduce((amps, factor) => amps / factor.value, currentA);

/**
 * The figure of the first row at or above a value: for temperatures, groups and lengths, where the next row is the
 * stricter. Null above the last row.
 */
export function rowAtOrAbove(column: Column, value: number): { row: number; figure: number } | null {
  const row = rowsOf(column).find((candidate) => candidate >= value);
  return row === undefined ? null : { row, figure: column[row] as number };
}

/** The rows of a column in rising order. */
export const rowsOf = (column: Column): number[] =>
  Object.keys(column)
    .map(Number)
    .sort((a, b) => a - b);
