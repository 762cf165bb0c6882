/** A calendar day, `YYYY-MM-DD`, Europe/London. */
export type IsoDate = string;

/** How sure a figure is: read in a source, worked out from theory, or remembered and still to be verified. */
export type Certainty = "seen" | "derived" | "from memory: verify";

export type DatedValue<V> = {
  /** First day on which the value holds. */
  from: IsoDate;
  /** Last day on which it holds; absent while it still does. */
  to?: IsoDate;
  value: V;
  /** A source reference, as `sourceOf` reads it: a register id, then a clause if there is one. */
  source: string;
  certainty: Certainty;
};

export type Parameter<V> = {
  id: string;
  unit: string;
  meaning: string;
  values: readonly [DatedValue<V>, ...DatedValue<V>[]];
};

/** Thrown when a rule asks for a figure on a day that no dated value covers. */
export class NoValueInForce extends Error {
  constructor(parameterId: string, on: IsoDate) {
    super(`${parameterId} has no value in force on ${on}. Add a dated value with its source.`);
    this.name = "NoValueInForce";
  }
}

/** Declares a dated, cited figure. The register test checks for gaps, overlaps and unknown sources. */
export const parameter = <V>(definition: Parameter<V>): Parameter<V> => definition;

/**
 * The dated value in force on a day.
 * @throws NoValueInForce when no entry covers the day; the latest entry is never assumed.
 */
export function entryAt<V>(figure: Parameter<V>, on: IsoDate): DatedValue<V> {
  const found = figure.values.find((entry) => entry.from <= on && (entry.to === undefined || on <= entry.to));
  if (!found) throw new NoValueInForce(figure.id, on);
  return found;
}

/** The figure itself, in the parameter's unit. See `entryAt` for errors. */
export const valueAt = <V>(figure: Parameter<V>, on: IsoDate): V => entryAt(figure, on).value;
