import fc from "fast-check";
import { lusolve } from "mathjs";
import { describe, expect, test } from "vitest";
import { electrodeTouchV } from "@/lib/calc/open-pen/single-phase";
import { openPenComplexV, openPenV } from "@/lib/calc/open-pen/three-phase";

/**
 * The check stands outside the code: the network is written down node by node and solved by Gaussian elimination,
 * with a small series impedance in each line and the load elements between line ends and the open neutral.
 * Unknowns: the voltages of the three line ends and of the neutral. Circuit theory only, no closed form.
 */
type Complex = { re: number; im: number };
const cis = (size: number, degrees: number): Complex => ({
  re: size * Math.cos((degrees * Math.PI) / 180),
  im: size * Math.sin((degrees * Math.PI) / 180),
});
const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const minus = (a: Complex): Complex => ({ re: -a.re, im: -a.im });
const zero: Complex = { re: 0, im: 0 };

/** A complex system as a real one of twice the size: [G -B; B G]. */
const asReal = (rows: readonly Complex[][]): number[][] => [
  ...rows.map((row) => [...row.map(({ re }) => re), ...row.map(({ im }) => -im)]),
  ...rows.map((row) => [...row.map(({ im }) => im), ...row.map(({ re }) => re)]),
];

function neutralV(
  sourceV: number,
  loads: readonly { amps: number; lagDegrees: number }[],
  electrodeOhm: number | null,
) {
  const lineSiemens = 1e7;
  const load = loads.map(({ amps, lagDegrees }) => cis(amps / 230, -lagDegrees));
  const source = [0, 1, 2].map((index) => cis(sourceV * lineSiemens, -120 * index));
  const earth: Complex = { re: electrodeOhm === null ? 0 : 1 / electrodeOhm, im: 0 };
  const rows = [0, 1, 2].map((index) => [
    ...[0, 1, 2].map((other) => (other === index ? plus({ re: lineSiemens, im: 0 }, load[index]!) : zero)),
    minus(load[index]!),
  ]);
  rows.push([...load.map(minus), load.reduce(plus, earth)]);
  const right = [...source, zero];
  const solved = lusolve(asReal(rows), [...right.map(({ re }) => re), ...right.map(({ im }) => im)]) as number[][];
  return Math.hypot(solved[3]![0]!, solved[7]![0]!);
}

const amps = fc.double({ min: 1, max: 120, noNaN: true });
const state = fc.tuple(amps, amps, amps);
const resistive = (currents: readonly number[]) => currents.map((current) => ({ amps: current, lagDegrees: 0 }));

describe("against an independent nodal solution", () => {
  test("three phases, no electrode", () => {
    fc.assert(
      fc.property(state, (currents) => {
        expect(openPenV(253, 230, currents, null)).toBeCloseTo(neutralV(253, resistive(currents), null), 3);
      }),
    );
  });

  test("three phases with an electrode", () => {
    fc.assert(
      fc.property(state, fc.double({ min: 0.2, max: 300, noNaN: true }), (currents, ohm) => {
        expect(openPenV(253, 230, currents, ohm)).toBeCloseTo(neutralV(253, resistive(currents), ohm), 3);
      }),
    );
  });

  test("unequal power factors", () => {
    const phasor = fc.record({ amps, lagDegrees: fc.double({ min: -30, max: 60, noNaN: true }) });
    fc.assert(
      fc.property(fc.tuple(phasor, phasor, phasor), (lines) => {
        expect(openPenComplexV(253, lines)).toBeCloseTo(neutralV(253, lines, null), 3);
      }),
    );
  });

  test("one phase with an electrode", () => {
    fc.assert(
      fc.property(amps, fc.double({ min: 0.2, max: 300, noNaN: true }), (current, ohm) => {
        const touchV = electrodeTouchV({ sourceV: 253, nominalV: 230 }, current, ohm);
        expect(touchV).toBeCloseTo(neutralV(253, resistive([current, 0, 0]), ohm), 3);
      }),
    );
  });
});
