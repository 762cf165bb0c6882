import type { IsoDate } from "@/lib/calc/parameter";

/** The parts of the United Kingdom that keep different bank holidays. */
export const divisions = ["england-and-wales", "scotland", "northern-ireland"] as const;
export type Division = (typeof divisions)[number];

/** Days between which the list below is complete. Counting outside them is refused, never guessed. */
export const holidayCalendar = {
  from: "2025-01-01",
  to: "2028-12-31",
  source: "govuk-bank-holidays",
} as const;

const daysOf = (year: number, days: string): IsoDate[] => days.split(" ").map((day) => `${year}-${day}`);

/** Bank holidays as published, substitute days included, the weekend days they stand for left out. */
export const bankHolidays: Record<Division, ReadonlySet<IsoDate>> = {
  "england-and-wales": new Set([
    ...daysOf(2025, "01-01 04-18 04-21 05-05 05-26 08-25 12-25 12-26"),
    ...daysOf(2026, "01-01 04-03 04-06 05-04 05-25 08-31 12-25 12-28"),
    ...daysOf(2027, "01-01 03-26 03-29 05-03 05-31 08-30 12-27 12-28"),
    ...daysOf(2028, "01-03 04-14 04-17 05-01 05-29 08-28 12-25 12-26"),
  ]),
  scotland: new Set([
    ...daysOf(2025, "01-01 01-02 04-18 05-05 05-26 08-04 12-01 12-25 12-26"),
    ...daysOf(2026, "01-01 01-02 04-03 05-04 05-25 06-15 08-03 11-30 12-25 12-28"),
    ...daysOf(2027, "01-01 01-04 03-26 05-03 05-31 08-02 11-30 12-27 12-28"),
    ...daysOf(2028, "01-03 01-04 04-14 05-01 05-29 08-07 11-30 12-25 12-26"),
  ]),
  "northern-ireland": new Set([
    ...daysOf(2025, "01-01 03-17 04-18 04-21 05-05 05-26 07-14 08-25 12-25 12-26"),
    ...daysOf(2026, "01-01 03-17 04-03 04-06 05-04 05-25 07-13 08-31 12-25 12-28"),
    ...daysOf(2027, "01-01 03-17 03-26 03-29 05-03 05-31 07-12 08-30 12-27 12-28"),
    ...daysOf(2028, "01-03 03-17 04-14 04-17 05-01 05-29 07-12 08-28 12-25 12-26"),
  ]),
};
