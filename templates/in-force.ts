import type { IsoDate, Parameter } from "@/lib/calc/parameter";

/** The figure of that day, or null on a day the register has no figure for: a drawing then leaves it out. */
export const inForce = <V>(figure: Parameter<V>, on: IsoDate): V | null =>
  figure.values.find(({ from, to }) => from <= on && (to === undefined || on <= to))?.value ?? null;
