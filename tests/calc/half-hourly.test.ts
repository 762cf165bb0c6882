import { describe, expect, test } from "vitest";
import { dayProfileA, readHalfHours, type HalfHour } from "@/lib/calc/demand/half-hourly";
import { britishTimeText } from "@/lib/calc/demand/local-time";

const STEP_MS = 1_800_000;

const seriesOf = (from: string, to: string, kwh: (startMs: number) => number = () => 0.4): HalfHour[] => {
  const out: HalfHour[] = [];
  for (let ms = Date.parse(from); ms < Date.parse(to); ms += STEP_MS)
    out.push({ start: new Date(ms).toISOString(), kwh: kwh(ms) });
  return out;
};

describe("half-hourly series", () => {
  test("an empty series is none", () => expect(readHalfHours([])).toBeNull());

  test("the highest half hour, its time, the length and what is missing", () => {
    const series = seriesOf("2026-01-05T00:00:00Z", "2026-01-12T00:00:00Z", (ms) =>
      new Date(ms).toISOString() === "2026-01-07T18:00:00.000Z" ? 3.2 : 0.5,
    );
    const read = readHalfHours(series.filter((_, index) => index % 10 !== 4))!;
    expect(read.peakKwh).toBe(3.2);
    expect(britishTimeText(read.peakStartMs)).toBe("18:00 on 2026-01-07");
    expect(read.days).toBe(7);
    expect(read.count).toBe(302);
    expect(read.coverage).toBeCloseTo(302 / 336, 9);
    expect(read.wholeWinter).toBeNull();
    expect(read.winterCoverage).toBeNull();
  });

  test("order does not matter, a half hour given twice counts once at its higher figure, the first of equals is the peak", () => {
    const read = readHalfHours([
      { start: "2026-01-05T19:00:00Z", kwh: 2 },
      { start: "2026-01-05T18:00:00Z", kwh: 1 },
      { start: "2026-01-05T18:00:00+00:00", kwh: 2 },
    ])!;
    expect(read.count).toBe(2);
    expect(read.peakKwh).toBe(2);
    expect(britishTimeText(read.peakStartMs)).toBe("18:00 on 2026-01-05");
  });

  test.each([
    ["2025-11-01T00:00:00Z", "2026-03-01T00:00:00Z", 2026],
    ["2023-11-01T00:00:00Z", "2024-03-01T00:00:00Z", 2024],
    ["2025-11-01T00:30:00Z", "2026-03-01T00:00:00Z", null],
    ["2025-11-01T00:00:00Z", "2026-02-28T23:30:00Z", null],
    ["2024-06-01T00:00:00Z", "2025-06-01T00:00:00Z", 2025],
  ])("from %s to %s the whole winter is %s", (from, to, winter) => {
    const read = readHalfHours(seriesOf(from, to))!;
    expect(read.wholeWinter).toBe(winter);
    if (winter !== null) expect(read.winterCoverage).toBe(1);
  });

  test("a hole in the winter lowers its coverage", () => {
    const whole = seriesOf("2025-11-01T00:00:00Z", "2026-03-01T00:00:00Z");
    const read = readHalfHours(whole.filter(({ start }) => !start.startsWith("2025-12-2")))!;
    expect(read.winterCoverage).toBeCloseTo(110 / 120, 6);
  });
});

describe("British clock", () => {
  // Summer Time Act 1972 as amended: last Sunday of March to last Sunday of October, 01:00 UTC.
  test.each([
    ["2026-03-29T00:30:00Z", "00:30 on 2026-03-29"],
    ["2026-03-29T01:00:00Z", "02:00 on 2026-03-29"],
    ["2026-07-01T17:00:00Z", "18:00 on 2026-07-01"],
    ["2026-10-25T00:59:00Z", "01:59 on 2026-10-25"],
    ["2026-10-25T01:00:00Z", "01:00 on 2026-10-25"],
    ["2026-12-31T23:59:00Z", "23:59 on 2026-12-31"],
  ])("%s reads %s", (instant, text) => expect(britishTimeText(Date.parse(instant))).toBe(text));

  // Independent: the platform's own time-zone data.
  test("agrees with the time-zone database through a year", () => {
    const format = new Intl.DateTimeFormat("en-GB", { timeZone: "Europe/London", hour: "2-digit", minute: "2-digit" });
    for (let ms = Date.parse("2026-01-01T00:15:00Z"); ms < Date.parse("2027-01-01T00:00:00Z"); ms += 11 * STEP_MS)
      expect(britishTimeText(ms).slice(0, 5)).toBe(format.format(ms));
  });

  test("the day profile stands by the British clock and leaves empty half hours empty", () => {
    const profile = dayProfileA(
      [
        { start: "2026-07-01T17:00:00Z", kwh: 2.3 },
        { start: "2026-07-02T17:00:00Z", kwh: 1.15 },
      ],
      230,
    );
    expect(profile[36]).toBeCloseTo(20, 9);
    expect(profile.filter((amps) => amps !== null)).toHaveLength(1);
  });
});
