import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exactQuotient, fixed, plain, roundTo, tidy, type Rounding } from "@/lib/calc/exact";

describe("rounding as decimals", () => {
  // Table 41.3 prints 2.19 for B20 and C10; 218.5 / 100 is a tie that binary rounding can lose.
  test.each<[number[], number[], number, Rounding, number]>([
    [[230, 0.95], [5, 20], 2, "half-up", 2.19],
    [[230, 0.95], [10, 16], 2, "half-up", 1.37],
    [[0.91, 0.8], [1], 2, "down", 0.72],
    [[0.55, 0.8], [1], 2, "down", 0.44],
    [[0.55, 0.8], [1], 2, "up", 0.44],
    [[1.005], [1], 2, "half-up", 1.01],
    [[1.001], [1], 2, "up", 1.01],
    [[1e-7], [1], 2, "half-up", 0],
    [[1e21], [1e21], 2, "half-up", 1],
    [[5e21], [1], 0, "down", 5e21],
    [[0], [3], 2, "up", 0],
  ])("%j over %j to %i places, %s", (over, under, places, rounding, expected) => {
    expect(exactQuotient(over, under, places, rounding)).toBe(expected);
  });

  test("float dust goes, figures stay", () => {
    expect(tidy(24.8 + 32)).toBe(56.8);
    expect(tidy(56.800000000000004)).toBe(56.8);
    expect(tidy(13.063999999999998)).toBe(13.064);
    expect(plain(56.8)).toBe("56.8");
    expect(fixed(4.2048, 2)).toBe("4.20");
  });

  // Independent: the same tie decided with whole numbers.
  test("agrees with whole-number arithmetic on hundredths", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 5_000_000 }), fc.integer({ min: 1, max: 3 }), (thousandths, places) => {
        const drop = 10 ** (3 - places);
        const expected = Math.floor((thousandths + drop / 2) / drop) / 10 ** places;
        expect(roundTo(thousandths / 1000, places)).toBe(expected);
      }),
    );
  });

  test("down never exceeds, up never falls short, and both lie within one place", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e6, noNaN: true }), (value) => {
        expect(roundTo(value, 2, "down")).toBeLessThanOrEqual(value);
        expect(roundTo(value, 2, "up")).toBeGreaterThanOrEqual(value);
        expect(roundTo(value, 2, "up") - roundTo(value, 2, "down")).toBeLessThan(0.0100001);
      }),
    );
  });
});
