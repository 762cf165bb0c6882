import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { assess } from "@/lib/notify/assess";
import { assessDemand } from "@/lib/notify/checks/demand";
import { recordWith, type Changes } from "./record";

const on = "2026-11-20";
const demandOf = (changes: Changes = {}) => assessDemand(recordWith(changes), on);
const three = (changes: Changes = {}): Changes => ({
  "supply.phases": 3,
  "demand.existingA": [31, 26, 24],
  "chargepoints.0.phase": "L2",
  ...changes,
});

describe("demand after the work", () => {
  test("one phase: existing plus the unit, in amps and kVA", () => {
    const { result, worstAfterA, everyPhaseKnown, missing } = demandOf();
    expect(result).toMatchObject({ existingA: [24.8], afterA: [56.8], afterKva: 13.064, limitCounted: false });
    expect(result.withLimitA).toBeNull();
    expect(worstAfterA).toBe(56.8);
    expect(everyPhaseKnown).toBe(true);
    expect(missing).toEqual([]);
    expect(result.workings).toContain("0.23 kV × 56.8 A = 13.064 kVA");
  });

  test("a three-phase unit adds to each phase", () => {
    const { result } = demandOf(three({ "chargepoints.0.phases": 3 }));
    expect(result.afterA).toEqual([63, 58, 56]);
    expect(result.afterKva).toBe(40.71);
    expect(result.workings).toContain("L1: 31 + 32 = 63 A");
    expect(result.workings).toContain("0.23 kV × (63 + 58 + 56) A = 40.71 kVA");
  });

  test("a single-phase unit adds to its own phase only", () => {
    expect(demandOf(three()).result.afterA).toEqual([31, 58, 24]);
  });

  test("without its phase nothing is told, and the worst case and the least stand beside", () => {
    const demand = demandOf(three({ "chargepoints.0.phase": null }));
    expect(demand.result.afterA).toBeNull();
    expect(demand.result.existingA).toEqual([31, 26, 24]);
    expect(demand.everyPhaseKnown).toBe(false);
    expect(demand.worstAfterA).toBe(63);
    expect(demand.leastWorstAfterA).toBe(56);
    expect(demand.missing).toEqual([{ path: "chargepoints[0].phase", needed: "The phase that chargepoint cp1 is on" }]);
  });

  test("split phase: two figures, and a phase that the supply does not have is not told", () => {
    const split = { "supply.phases": 2, "demand.existingA": [20, 30] };
    expect(demandOf({ ...split, "chargepoints.0.phase": "L1" }).result.afterA).toEqual([52, 30]);
    expect(demandOf({ ...split, "chargepoints.0.phase": "L3" }).result.afterA).toBeNull();
    expect(demandOf({ ...split, "chargepoints.0.phases": 2 }).result.afterA).toEqual([52, 62]);
  });

  test("a unit of two phases on three is not told", () => {
    expect(demandOf(three({ "chargepoints.0.phases": 2 })).result.afterA).toBeNull();
  });

  test("figures that do not match the phases are asked for again", () => {
    const demand = demandOf({ "supply.phases": 3, "chargepoints.0.phase": "L1" });
    expect(demand.result.existingA).toBeNull();
    expect(demand.missing[0]).toEqual({
      path: "demand.existingA",
      needed: "The demand before the work on each of 3 phases",
    });
    expect(demand.worstAfterA).toBeNull();
    expect(demand.leastWorstAfterA).toBe(32);
  });

  test("without phases of the supply nothing is told", () => {
    const demand = demandOf({ "supply.phases": null });
    expect(demand.result.afterA).toBeNull();
    expect(demand.leastWorstAfterA).toBeNull();
    expect(demand.unlimitedWorstA).toBeNull();
    expect(demand.missing[0]?.path).toBe("supply.phases");
  });

  test("a unit of unknown current leaves a lower bound only", () => {
    const demand = demandOf({ "chargepoints.0.ratedA": "unknown", "chargepoints.0.configuredA": null });
    expect(demand.result.afterA).toBeNull();
    expect(demand.leastWorstAfterA).toBe(24.8);
    expect(demand.worstAfterA).toBeNull();
    expect(demand.missing[0]?.path).toBe("chargepoints[0].ratedA");
    expect(demandOf({ "chargepoints.0.phases": null }).missing[0]?.path).toBe("chargepoints[0].phases");
  });

  test("several units stand in one sum", () => {
    const second = { id: "cp2", phases: 1, ratedA: 16 };
    expect(demandOf({ "chargepoints.1": second }).result.afterA).toEqual([72.8]);
  });

  test("a removal adds nothing", () => {
    expect(demandOf({ kind: "removal" }).result.afterA).toEqual([24.8]);
  });

  test("before the first edition held here the figures stand and the kVA does not", () => {
    const { result } = assessDemand(recordWith(), "2018-01-01");
    expect(result.afterA).toEqual([56.8]);
    expect(result.afterKva).toBeNull();
    expect(result.workings.at(-1)).toMatch(/No figure held here/);
  });
});

describe("what counts as the unit's current", () => {
  const limited: Changes = {
    "chargepoints.0.configuredA": 16,
    "chargepoints.0.configurationSecuredBy": "installer-code",
  };
  test("a secured setting counts only with its photo", () => {
    expect(demandOf(limited).result.afterA).toEqual([56.8]);
    const photo = { subject: "limit-setting", file: "limit.jpg" };
    expect(demandOf({ ...limited, evidence: [photo] }).result.afterA).toEqual([40.8]);
    expect(demandOf({ ...limited, evidence: [{ ...photo, of: "other" }] }).result.afterA).toEqual([56.8]);
    const twoUnits = { ...limited, "chargepoints.1": { id: "cp2", phases: 1, ratedA: 16 } };
    expect(demandOf({ ...twoUnits, evidence: [photo] }).result.afterA).toEqual([72.8]);
    expect(demandOf({ ...twoUnits, evidence: [{ ...photo, of: "cp1" }] }).result.afterA).toEqual([56.8]);
  });

  test("electrodes are judged at the rated current, whatever counts in the demand", () => {
    const photo = { evidence: [{ subject: "limit-setting", file: "limit.jpg" }] };
    expect(demandOf({ ...limited, ...photo }).unlimitedWorstA).toBe(56.8);
  });
});

describe("load limit", () => {
  const limit = (rest: Changes) => ({ "demand.loadLimit": { kind: "site", limitA: 50, ...rest } });
  test("without an agreement it is said, not counted", () => {
    const { result } = demandOf(limit({}));
    expect(result).toMatchObject({ afterA: [56.8], withLimitA: [50], limitCounted: false });
    expect(result.workings).toContain("with the load limit of 50 A, not counted = 50 A");
  });
  test("with an agreement it counts, never below what stood there before", () => {
    expect(demandOf(limit({ operatorAgreement: "26-1" })).result).toMatchObject({ afterA: [50], limitCounted: true });
    expect(demandOf(limit({ operatorAgreement: "26-1", limitA: 20 })).result.afterA).toEqual([24.8]);
    expect(demandOf(limit({ operatorAgreement: "26-1" })).unlimitedWorstA).toBe(56.8);
  });
  test("it bounds the worst case of a phase that is not told", () => {
    const demand = demandOf(three({ "chargepoints.0.phase": null, ...limit({ operatorAgreement: "26-1" }) }));
    expect(demand.worstAfterA).toBe(50);
    expect(demand.leastWorstAfterA).toBe(50);
  });
});

describe("other equipment and replaced units", () => {
  const pump = (rest: Changes) => ({ "demand.otherEquipment": [{ kind: "heat-pump", ratedA: 14, ...rest }] });
  test("equipment that the figure leaves out is added", () => {
    expect(demandOf(pump({ inExistingDemand: "no" })).result.afterA).toEqual([70.8]);
    expect(demandOf(pump({ inExistingDemand: "yes" })).result.afterA).toEqual([56.8]);
    expect(demandOf(three(pump({ inExistingDemand: "no", phase: "L3" }))).result.afterA).toEqual([31, 58, 38]);
  });
  test("its current or phase missing, nothing is told", () => {
    const noCurrent = demandOf(pump({ inExistingDemand: "no", ratedA: null }));
    expect(noCurrent.result.afterA).toBeNull();
    expect(noCurrent.missing[0]?.path).toBe("demand.otherEquipment[0].ratedA");
    expect(noCurrent.unlimitedWorstA).toBeNull();
    const noPhase = demandOf(three(pump({ inExistingDemand: "no" })));
    expect(noPhase.result.afterA).toBeNull();
    expect(noPhase.worstAfterA).toBe(72);
    expect(noPhase.missing[0]?.path).toBe("demand.otherEquipment[0].phase");
  });
  test("whether it is in the figure is asked", () => {
    const demand = demandOf(pump({}));
    expect(demand.everyPhaseKnown).toBe(false);
    expect(demand.missing[0]?.path).toBe("demand.otherEquipment[0].inExistingDemand");
    expect(demandOf({ "demand.otherEquipment": null }).missing[0]?.path).toBe("demand.otherEquipment");
    expect(demandOf({ chargepoints: [] }).missing[0]?.path).toBe("chargepoints");
  });

  const replaces = { model: "Dock 3", ratedA: 16, removedOn: "2026-11-20" };
  const listed = (rest: Changes) => [{ kind: "chargepoint", model: "Dock 3", ratedA: 16, ...rest }];
  test("a replaced unit comes off once, when it was in the figure", () => {
    const swap = { "chargepoints.0.replaces": replaces };
    const included = { "demand.otherEquipment": listed({ inExistingDemand: "yes" }) };
    expect(demandOf({ ...swap, ...included }).result.afterA).toEqual([40.8]);
    expect(demandOf({ ...swap, ...included }).result.workings).toContain("replaced unit taken out = 16 A");
    expect(demandOf(swap).result.afterA).toEqual([56.8]);
    // Listed as outside the figure and taken away by this job: neither added nor taken off.
    expect(demandOf({ ...swap, "demand.otherEquipment": listed({ inExistingDemand: "no" }) }).result.afterA).toEqual([
      56.8,
    ]);
    expect(demandOf({ "demand.otherEquipment": listed({ inExistingDemand: "no" }) }).result.afterA).toEqual([72.8]);
    const other = { "demand.otherEquipment": [{ ...listed({ inExistingDemand: "no" })[0], model: "Post 2" }] };
    expect(demandOf({ ...swap, ...other }).result.afterA).toEqual([72.8]);
  });
  test("on its own phase, never below nothing", () => {
    const swap = {
      "chargepoints.0.replaces": { ...replaces, ratedA: 28 },
      "demand.otherEquipment": listed({ inExistingDemand: "yes", phase: "L2", ratedA: 28 }),
    };
    expect(demandOf(three(swap)).result.afterA).toEqual([31, 32, 24]);
  });
  // The demand must not come out too low: a unit comes off only with its day of removal, once, at its lesser current.
  test("nothing comes off on a doubtful record", () => {
    const swap = (rest: Changes) => ({ "chargepoints.0.replaces": { ...replaces, ...rest } });
    const outside = { "demand.otherEquipment": listed({ inExistingDemand: "no" }) };
    expect(demandOf({ ...swap({ removedOn: null }), ...outside }).result.afterA).toEqual([72.8]);
    const included = { "demand.otherEquipment": listed({ inExistingDemand: "yes" }) };
    expect(demandOf({ ...swap({ ratedA: 32 }), ...included }).result.afterA).toEqual([40.8]);
    const twice = { "chargepoints.1": { id: "cp2", phases: 1, ratedA: 16, replaces } };
    expect(demandOf({ ...swap({}), ...twice, ...included }).result.afterA).toEqual([56.8]);
  });
});

describe("methods", () => {
  const loads = [
    { kind: "lighting", ratedA: 6 },
    { kind: "standard-circuit", ratedA: 32 },
  ];
  test("household allowances, item by item; other methods print beside", () => {
    const { result } = demandOf({ "demand.method": "diversity", "demand.loads": loads });
    // 0.66 × 6 + 32 = 35.96 A: the household table of the On-Site Guide.
    expect(result.existingA).toEqual([35.96]);
    expect(result.afterA).toEqual([67.96]);
    expect(result.workings).toContain("lighting: 0.66 × 6 = 3.96 A");
    expect(result.workings).toContain("Beside it, not used: 24.8 A by figures recorded.");
  });
  test("a measured figure stands with the allowances beside it", () => {
    const { result } = demandOf({
      "demand.loads": loads,
      "demand.halfHourKwh": [{ start: "2026-01-05T18:00:00Z", kwh: 3.2 }],
    });
    expect(result.existingA).toEqual([24.8]);
    expect(result.workings).toContain("Beside it, not used: 35.96 A by household allowances.");
    expect(result.workings).toContain("Beside it, not used: 27.826 A by half-hourly data.");
  });
  test("another method without its data is not printed", () => {
    const { result } = demandOf({ "demand.loads": [{ kind: "cooking", ratedA: 30 }] });
    expect(result.workings.join()).not.toContain("Beside");
  });
  test("loads of a three-phase household stand on their phases", () => {
    const changes = three({
      "demand.method": "diversity",
      "demand.loads": [
        { kind: "lighting", ratedA: 10, phase: "L1" },
        { kind: "standard-circuit", ratedA: 32, phase: "L3" },
      ],
    });
    expect(demandOf(changes).result.existingA).toEqual([6.6, 0, 32]);
  });
  test("what the allowances need is named", () => {
    expect(
      demandOf({ "demand.method": "diversity", "demand.loads": [{ kind: "cooking", ratedA: 30 }] }).missing[0]?.path,
    ).toBe("demand.loads[0].socketInControlUnit");
    expect(demandOf(three({ "demand.method": "diversity", "demand.loads": loads })).missing[0]?.path).toBe(
      "demand.loads[0].phase",
    );
    expect(demandOf({ "demand.method": "diversity" }).missing[0]?.path).toBe("demand.loads");
    const early = assessDemand(recordWith({ "demand.method": "diversity", "demand.loads": loads }), "2018-01-01");
    expect(early.result.existingA).toBeNull();
  });
  test("the cooker's socket adds its 5 A", () => {
    const cooker = (socketInControlUnit: boolean) =>
      demandOf({
        "demand.method": "diversity",
        "demand.loads": [{ kind: "cooking", ratedA: 30, socketInControlUnit }],
      });
    expect(cooker(false).result.existingA).toEqual([16]);
    expect(cooker(true).result.existingA).toEqual([21]);
  });

  const halfHours = (kwh: number): Changes => ({
    "demand.method": "half-hourly",
    "demand.halfHourKwh": [{ start: "2026-01-05T18:00:00Z", kwh }],
  });
  test("half hours on one phase", () => {
    const { result } = demandOf(halfHours(3.2));
    expect(result.existingA).toEqual([27.826]);
    expect(result.workings).toContain("2 × 3.2 kWh × 1000 ÷ 230 V = 27.83 A, the half-hour average");
  });
  test("half hours on three phases say nothing about one phase, only its bounds", () => {
    // 6.9 kWh is 20 A a phase if balanced, 60 A on one.
    const demand = demandOf(three(halfHours(6.9)));
    expect(demand.result.existingA).toBeNull();
    expect(demand.leastWorstAfterA).toBe(32);
    expect(demand.worstAfterA).toBe(92);
    expect(demand.result.workings.at(-1)).toBeDefined();
    expect(demandOf(three({ ...halfHours(20) })).leastWorstAfterA).toBeGreaterThan(60);
  });
  test("no readings, no figure", () => {
    expect(demandOf({ "demand.method": "half-hourly" }).missing[0]?.path).toBe("demand.halfHourKwh");
    expect(demandOf({ "demand.method": null }).missing[0]?.path).toBe("demand.method");
    expect(demandOf({ "demand.method": "declared" }).result.workings[0]).toContain("declared");
  });

  const series = (from: string, to: string) => {
    const out: { start: string; kwh: number }[] = [];
    for (let ms = Date.parse(from); ms < Date.parse(to); ms += 1_800_000)
      out.push({ start: new Date(ms).toISOString(), kwh: 1 });
    return out;
  };
  test.each([
    ["2025-10-01T00:00:00Z", "2026-10-01T00:00:00Z", 1, "met"],
    ["2025-11-01T00:00:00Z", "2026-03-01T00:00:00Z", 1, "met"],
    ["2026-01-01T00:00:00Z", "2026-03-01T00:00:00Z", 1, "cannot-tell"],
    ["2025-11-01T00:00:00Z", "2026-03-01T00:00:00Z", 3, "cannot-tell"],
  ])("half hours from %s to %s on %i phases: %s", (from, to, phases, outcome) => {
    const { evidence } = demandOf({
      "demand.method": "half-hourly",
      "demand.halfHourKwh": series(from, to),
      "supply.phases": phases,
    });
    expect(evidence.outcome).toBe(outcome);
  });
});

describe("the 60 A line of a dwelling", () => {
  // The ENA form: 60 A (13.8 kVA) after the work is told afterwards, more is asked first.
  const planned = {
    stage: "planned",
    dates: { planned: "2026-12-14" },
    "site.supplyNumber": "2399232323236",
    "site.supplyNumberKind": "import",
  };
  test("60.0 A is not above it, 60.1 A is", () => {
    const route = (existing: number) =>
      assess(recordWith({ ...planned, "demand.existingA": [existing] }), "2026-12-01").route.demand;
    expect(route(28)).not.toBe("apply");
    expect(route(28.1)).toBe("apply");
  });
});

test("permuting the phases permutes the answer and nothing else", () => {
  const orders = [
    [0, 1, 2],
    [0, 2, 1],
    [1, 0, 2],
    [1, 2, 0],
    [2, 0, 1],
    [2, 1, 0],
  ] as const;
  const amps = fc.double({ min: 0, max: 80, noNaN: true }).map((value) => Math.round(value * 10) / 10);
  fc.assert(
    fc.property(
      fc.tuple(amps, amps, amps),
      fc.integer({ min: 0, max: 2 }),
      fc.constantFrom(...orders),
      (existing, at, order) => {
        const plain = demandOf(three({ "demand.existingA": existing, "chargepoints.0.phase": `L${at + 1}` }));
        const moved = demandOf(
          three({
            "demand.existingA": order.map((index) => existing[index]),
            "chargepoints.0.phase": `L${(order as readonly number[]).indexOf(at) + 1}`,
          }),
        );
        expect(moved.result.afterA).toEqual(order.map((index) => plain.result.afterA![index]));
        expect(moved.worstAfterA).toBe(plain.worstAfterA);
        expect(moved.result.afterKva).toBe(plain.result.afterKva);
      },
    ),
    { numRuns: 40 },
  );
});
