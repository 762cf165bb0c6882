import { describe, expect, test } from "vitest";
import { assessOpenPen } from "@/lib/notify/checks/open-pen";
import { recordWith, type Changes } from "./record";

const at = "chargepoints.0.openPen";
const resultOf = (changes: Changes = {}, buriedSeparationM: number | null = 3.5) =>
  assessOpenPen(recordWith(changes), "2026-11-20", { operatorId: "23", buriedSeparationM }).results[0]!;

describe("open-PEN result", () => {
  test("a met window device carries its residual risk and no touch voltage", () => {
    const result = resultOf();
    expect(result).toMatchObject({
      chargepoint: "cp1",
      outcome: "met",
      method: "line-neutral-window-device",
      touchVoltageV: null,
      electrodeMaxOhm: null,
      imbalanceA: null,
    });
    expect(result.residualRisk).toContain("127 V");
    expect(result.residualRisk).toContain("207 to 253 V");
    expect(result.sources[0]).toBe("BS 7671:2018+A4:2026 722.411.4.1");
  });

  test("the electrode's figures: 253 × 12.4 ÷ (12.4 + 230 ÷ 56.8) = 190.7 V, 87.978 ÷ 56.8 = 1.549 Ω", () => {
    const result = resultOf({ [`${at}.method`]: "installation-electrode", [`${at}.electrodeOhm`]: 12.4 });
    expect(result.outcome).toBe("not-met");
    expect(result.touchVoltageV).toBeCloseTo(190.7, 1);
    expect(result.electrodeMaxOhm).toBeCloseTo(1.549, 3);
  });

  test("the electrode is judged without the load limit that the demand counts", () => {
    const limit = { "demand.loadLimit": { kind: "operator-scheme", limitA: 30 } };
    const method = { [`${at}.method`]: "installation-electrode", [`${at}.electrodeOhm`]: 2 };
    expect(resultOf({ ...limit, ...method }).electrodeMaxOhm).toBeCloseTo(1.549, 3);
  });

  test("balance gives the worst state given: 60/40/20 A, 34.64 A out of balance, 73.03 V", () => {
    const result = resultOf({
      [`${at}.method`]: "three-phase-balance",
      "supply.phases": 3,
      [`${at}.worstLoadsA`]: [
        [62, 30, 30],
        [60, 40, 20],
      ],
    });
    expect(result.imbalanceA).toBeCloseTo(34.641, 3);
    expect(result.touchVoltageV).toBeCloseTo(73.03, 1);
  });

  test("no measure recorded", () => {
    expect(resultOf({ [`${at}.method`]: null })).toMatchObject({
      outcome: "cannot-tell",
      method: null,
      residualRisk: null,
    });
  });

  test("a caravan or boat on the operator's earth is stopped whatever the device", () => {
    const result = resultOf({ "site.premises": "caravan-or-boat" });
    expect(result.outcome).toBe("not-met");
    expect(result.sources[0]).toBe("SI 2002/2665 reg 9(4)");
  });

  test("on the highway nothing is met until the operator's terms are looked at", () => {
    expect(resultOf({ "site.premises": "public-highway" }).outcome).toBe("cannot-tell");
    expect(resultOf({ "site.premises": "public-highway", [`${at}.functionTest`]: "failed" }).outcome).toBe("not-met");
  });

  test("each chargepoint is judged by itself, the worst outcome first", () => {
    const job = recordWith({ "chargepoints.1": { id: "cp2", phases: 1, ratedA: 16 } });
    const { results } = assessOpenPen(job, "2026-11-20", { operatorId: "23", buriedSeparationM: null });
    expect(results.map(({ chargepoint, outcome }) => `${chargepoint} ${outcome}`)).toEqual([
      "cp2 cannot-tell",
      "cp1 met",
    ]);
  });
});
