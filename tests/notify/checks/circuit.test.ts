import { describe, expect, test } from "vitest";
import { assessCircuits } from "@/lib/notify/checks/circuit";
import { recordWith, type Changes } from "./record";

const resultOf = (changes: Changes = {}, on = "2026-11-20") => assessCircuits(recordWith(changes), on).results[0]!;

describe("figures of a circuit", () => {
  // 6 mm² in 4D5 method C, 18 m, B40: Table 4D5, Table 41.3, IEC 60228; sums by hand.
  test("the ordinary house", () => {
    expect(resultOf()).toMatchObject({
      id: "main",
      iz: 47,
      voltDropV: 4.205,
      voltDropPercent: 1.83,
      zsCalculatedOhm: 0.437,
      zsLimitHotOhm: 1.09,
      zsLimitColdOhm: 0.87,
      zsLimitRcdOhm: 1667,
    });
  });

  test("each step of the sum is printed with its figures", () => {
    const { workings } = resultOf();
    expect(workings).toContain("It = 47 A: Table 4D5, 6 mm², method C, two-core");
    expect(workings).toContain("Vd = 7.3 mV/A/m × 32 A × 18 m ÷ 1000 = 4.20 V (1.83 % of 230 V), Table 4D5");
    expect(workings).toContain("Zs limit, B40: 230 V × 0.95 ÷ (5 × 40 A) = 1.09 Ω, Table 41.3");
    expect(workings).toContain("Zs = 0.21 + 0.227 = 0.437 Ω");
    expect(workings).toContain("Longest run by voltage drop and loop: 49.2 m");
  });

  test("a reading of R1+R2 goes before the table: 0.21 + 0.19 × 1.20 = 0.438", () => {
    expect(resultOf({ "circuits.0.measured.r1r2Ohm": 0.19 }).zsCalculatedOhm).toBe(0.438);
  });

  test("on a TT earth only the RCD's limit is given", () => {
    expect(resultOf({ "supply.earthing": "TT" })).toMatchObject({
      zsLimitHotOhm: null,
      zsLimitColdOhm: null,
      zsLimitRcdOhm: 1667,
    });
  });

  test("a secured lower setting changes neither load nor cable", () => {
    const secured = {
      "chargepoints.0.configuredA": 16,
      "chargepoints.0.configurationSecuredBy": "tool",
      evidence: [{ subject: "limit-setting", file: "limit.jpg" }],
    };
    expect(resultOf(secured).workings).toContain("Ib = 32 A");
    expect(resultOf(secured).voltDropV).toBe(4.205);
  });

  test("what cannot be told is null, never nought", () => {
    expect(resultOf({ "circuits.0.cable": {}, "circuits.0.device": {} })).toMatchObject({
      iz: null,
      voltDropV: null,
      voltDropPercent: null,
      zsCalculatedOhm: null,
      zsLimitHotOhm: null,
      zsLimitColdOhm: null,
      zsLimitRcdOhm: null,
    });
    expect(resultOf({}, "2018-01-01")).toMatchObject({ iz: null, voltDropV: null, zsLimitHotOhm: null });
  });
});
