import { parameter, valueAt, type Certainty, type DatedValue, type IsoDate } from "../parameter";

/** The edition a design of that day had to follow, as a source id. Editions overlapped in print; these dates do not. */
export const wiringEdition = parameter<string>({
  id: "wiring.edition",
  unit: "source id",
  meaning: "Edition of BS 7671 that work of this day had to follow.",
  values: [
    { from: "2018-07-01", to: "2020-07-31", value: "BS 7671:2018", source: "BS 7671:2018", certainty: "seen" },
    {
      from: "2020-08-01",
      to: "2022-09-27",
      value: "BS 7671:2018+A1:2020",
      source: "BS 7671:2018+A1:2020",
      certainty: "seen",
    },
    {
      from: "2022-09-28",
      to: "2026-10-14",
      value: "BS 7671:2018+A2:2022",
      source: "BS 7671:2018+A2:2022",
      certainty: "from memory: verify",
    },
    { from: "2026-10-15", value: "BS 7671:2018+A4:2026", source: "BS 7671:2018+A4:2026", certainty: "seen" },
  ],
});

/**
 * Dated values for a figure that stands unchanged through the 18th edition: no source suggests that Amendment 4
 * changed it. `clause` is cited from the edition in force on each side of 15 October 2026.
 */
export function throughEditions<V>(
  value: V,
  clause: string,
  certainty: Certainty,
): readonly [DatedValue<V>, DatedValue<V>] {
  return [
    { from: "2018-07-01", to: "2026-10-14", value, source: `BS 7671:2018+A2:2022 ${clause}`, certainty },
    { from: "2026-10-15", value, source: `BS 7671:2018+A4:2026 ${clause}`, certainty },
  ];
}

/** Dated values for a figure of another source, held from the first day the wiring rules here reach back to. */
export const since2018 = <V>(value: V, source: string, certainty: Certainty): readonly [DatedValue<V>] => [
  { from: "2018-07-01", value, source, certainty },
];

/**
 * A reference such as `BS 7671 722.531` with the edition of the day in place of the bare title; other references
 * come back as they are.
 * @throws NoValueInForce before the 18th edition.
 */
export const citedOn = (reference: string, on: IsoDate): string =>
  reference.startsWith("BS 7671 ") ? `${valueAt(wiringEdition, on)}${reference.slice("BS 7671".length)}` : reference;
