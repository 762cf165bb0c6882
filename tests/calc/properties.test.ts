import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { breakerLoopLimitOhm } from "@/lib/calc/circuit/loop";
import { rowAtOrAbove } from "@/lib/calc/circuit/capacity";
import { voltDropV } from "@/lib/calc/circuit/volt-drop";
import { demandUnderLimitA, offeredA } from "@/lib/calc/demand/curtailment";
import { householdDemand, type Load } from "@/lib/calc/demand/diversity";
import { ampsOf, kvaOf } from "@/lib/calc/kva";
import { electrodeMaxOhm, electrodeTouchV } from "@/lib/calc/open-pen/single-phase";
import {
  openPenComplexV,
  openPenElectrodeMaxOhm,
  openPenV,
  shiftFromReadingsV,
  unbalancedA,
} from "@/lib/calc/open-pen/three-phase";
import { valueAt } from "@/lib/calc/parameter";
import { householdAllowances } from "@/lib/calc/parameters/demand";
import { stepMm2 } from "@/lib/calc/supply/earthing";

const amps = fc.double({ min: 0.5, max: 200, noNaN: true });
const state = fc.tuple(amps, amps, amps);
const supply = { sourceV: 253, nominalV: 230 };
const close = (a: number, b: number, within = 1e-6): void => {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(within * Math.max(1, Math.abs(a)));
};

describe("open PEN", () => {
  test("permuting the phases changes nothing", () => {
    fc.assert(
      fc.property(state, ([a, b, c]) => {
        const volts = openPenV(253, 230, [a, b, c], null);
        for (const other of [
          [a, c, b],
          [b, a, c],
          [b, c, a],
          [c, a, b],
          [c, b, a],
        ] as const)
          close(openPenV(253, 230, other, null), volts);
      }),
    );
  });

  test("without an electrode, scaling every load changes nothing", () => {
    fc.assert(
      fc.property(state, fc.double({ min: 0.1, max: 10, noNaN: true }), ([a, b, c], by) =>
        close(openPenV(253, 230, [a * by, b * by, c * by], null), openPenV(253, 230, [a, b, c], null)),
      ),
    );
  });

  test("touch voltage rises with electrode and current, and stays below the source", () => {
    fc.assert(
      fc.property(amps, amps, fc.double({ min: 0.1, max: 500, noNaN: true }), (current, more, ohm) => {
        const volts = electrodeTouchV(supply, current, ohm);
        expect(electrodeTouchV(supply, current + more, ohm)).toBeGreaterThan(volts);
        expect(electrodeTouchV(supply, current, ohm + more)).toBeGreaterThan(volts);
        expect(volts).toBeLessThan(253);
      }),
    );
    expect(electrodeTouchV(supply, 0, 10)).toBe(0);
  });

  test("the largest electrode gives the limit exactly", () => {
    fc.assert(
      fc.property(amps, (current) => close(electrodeTouchV(supply, current, electrodeMaxOhm(supply, current, 70)), 70)),
    );
  });

  test("the three-phase form is the single-phase form for one loaded phase", () => {
    fc.assert(
      fc.property(amps, fc.double({ min: 0.1, max: 500, noNaN: true }), (current, ohm) => {
        close(openPenElectrodeMaxOhm(253, 230, [current, 0, 0], 70)!, electrodeMaxOhm(supply, current, 70));
        close(openPenV(253, 230, [current, 0, 0], ohm), electrodeTouchV(supply, current, ohm));
      }),
    );
  });

  test("the complex form agrees at equal power factors", () => {
    fc.assert(
      fc.property(state, fc.double({ min: -60, max: 60, noNaN: true }), ([a, b, c], lagDegrees) =>
        close(
          openPenComplexV(253, [
            { amps: a, lagDegrees },
            { amps: b, lagDegrees },
            { amps: c, lagDegrees },
          ]),
          openPenV(253, 230, [a, b, c], null),
        ),
      ),
    );
  });

  test("readings of the shifted lines give back the shift", () => {
    fc.assert(
      fc.property(state, ([a, b, c]) => {
        const sin = Math.sqrt(3) / 2;
        const sum = a + b + c;
        const [re, im] = [(230 * (a - 0.5 * (b + c))) / sum, (230 * sin * (c - b)) / sum];
        const readings = [
          Math.hypot(230 - re, im),
          Math.hypot(-115 - re, -230 * sin - im),
          Math.hypot(-115 - re, 230 * sin - im),
        ];
        close(shiftFromReadingsV(readings as [number, number, number], 230), openPenV(230, 230, [a, b, c], null), 1e-5);
      }),
    );
    expect(shiftFromReadingsV([220, 220, 220], 230)).toBe(0);
  });

  test("no load leaves no voltage, and a balanced load no imbalance", () => {
    expect(openPenV(253, 230, [0, 0, 0], null)).toBe(0);
    expect(unbalancedA([16, 16, 16])).toBe(0);
  });
});

describe("demand", () => {
  const kinds = ["lighting", "heating-and-power", "cooking", "standard-circuit", "fixed"] as const;
  const load: fc.Arbitrary<Load> = fc.record({
    kind: fc.constantFrom(...kinds),
    ratedA: fc.double({ min: 0.5, max: 60, noNaN: true }),
    quantity: fc.integer({ min: 1, max: 3 }),
    hasSocket: fc.constant(false),
  });
  const allowances = valueAt(householdAllowances, "2026-12-01");
  const total = (loads: readonly Load[]) => householdDemand(loads, allowances).totalA;

  test("allowances never exceed the connected load and never fall when a load is added", () => {
    fc.assert(
      fc.property(fc.array(load, { minLength: 1, maxLength: 8 }), load, (loads, one) => {
        const connected = loads.reduce((sum, { ratedA, quantity }) => sum + ratedA * quantity, 0);
        expect(total(loads)).toBeLessThanOrEqual(connected + 1e-9);
        expect(total([...loads, one])).toBeGreaterThanOrEqual(total(loads) - 1e-9);
      }),
    );
  });

  test("the order of the list does not matter", () => {
    fc.assert(
      fc.property(fc.array(load, { maxLength: 8 }), (loads) => close(total(loads), total([...loads].reverse()))),
    );
  });

  test("a counted limit never lowers what stood there before", () => {
    fc.assert(
      fc.property(amps, amps, amps, (existing, added, limit) => {
        const after = demandUnderLimitA(existing, added, limit);
        expect(after).toBeGreaterThanOrEqual(existing);
        expect(after).toBeLessThanOrEqual(Math.max(existing, limit));
      }),
    );
  });

  test("a vehicle is never offered more than is left", () => {
    fc.assert(
      fc.property(amps, amps, (limitA, houseA) => {
        const offered = offeredA({ limitA, marginA: 1, houseA, mostA: 32, leastA: 6 });
        expect(offered === 0 || (offered >= 6 && offered + houseA + 1 <= limitA && offered <= 32)).toBe(true);
      }),
    );
  });

  test("kVA and amps undo each other", () => {
    fc.assert(
      fc.property(amps, fc.constantFrom(1, 2, 3), (current, phases) =>
        close(ampsOf(kvaOf(Array<number>(phases).fill(current), 230), phases, 230), current),
      ),
    );
  });
});

describe("circuit", () => {
  test("voltage drop is proportional to current and to length", () => {
    fc.assert(
      fc.property(amps, amps, fc.double({ min: 0.5, max: 10, noNaN: true }), (current, metres, by) => {
        close(voltDropV(7.3, current * by, metres), by * voltDropV(7.3, current, metres));
        close(voltDropV(7.3, current, metres * by), by * voltDropV(7.3, current, metres));
      }),
    );
  });

  test("a larger breaker has a lower loop limit", () => {
    const ratings = [6, 10, 16, 20, 25, 32, 40, 50, 63];
    const limits = ratings.map((ratingA) =>
      breakerLoopLimitOhm({ nominalV: 230, factorMin: 0.95, multiple: 5, ratingA }),
    );
    expect(limits).toEqual([...limits].sort((a, b) => b - a));
  });

  test("between rows the next row is read, and above the last there is none", () => {
    expect(rowAtOrAbove({ 30: 1, 35: 0.94 }, 31)).toEqual({ row: 35, figure: 0.94 });
    expect(rowAtOrAbove({ 30: 1, 35: 0.94 }, 36)).toBeNull();
  });

  test("a stepped table without an open end is an error", () => {
    expect(() => stepMm2([{ upToMm2: 35, mm2: 10 }], 50)).toThrow(/no upper end/);
  });
});
