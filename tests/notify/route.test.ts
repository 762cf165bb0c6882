import { describe, expect, it } from "vitest";
import { NoValueInForce } from "@/lib/calc/parameter";
import { inForceOr } from "@/lib/notify/in-force";
import { parseDraft, parseJob } from "@/lib/notify/job";
import { assessWith, found, jobWith, recordWith, type Changes } from "./record";

const planned: Changes = {
  stage: "planned",
  "dates.installed": null,
  "dates.commissioned": null,
  "dates.planned": "2026-12-14",
};
const decision = (more: object) => ({
  purpose: "application",
  reference: "26-1",
  decision: "approved",
  decidedOn: "2026-11-10",
  ...more,
});
const missing = (changes: Changes) => assessWith(changes).missing.map(({ path }) => path);

describe("an approval", () => {
  const over: Changes = { "demand.existingA": [34.6] };

  it("counts by its latest decision", () => {
    const both = [decision({ decision: "refused", decidedOn: "2026-11-02" }), decision({})];
    expect(assessWith({ ...over, operatorRecords: both }).route.approval).toBe("held");
    expect(assessWith({ ...over, operatorRecords: [...both].reverse() }).route.approval).toBe("held");
    const undated = [decision({ decidedOn: null }), decision({ decision: "refused" })];
    expect(assessWith({ ...over, operatorRecords: undated }).route.demand).toBe("late-application");
    expect(assessWith({ ...over, operatorRecords: [...undated].reverse() }).route.approval).toBe("none");
  });

  it("is not made by an application without an answer, nor by a reference", () => {
    const unanswered = assessWith({ ...over, operatorRecords: [decision({ decision: null, decidedOn: null })] });
    expect(unanswered.route).toMatchObject({ demand: "late-application", approval: "none" });
    expect(found(unanswered, "reasons[route.approval].because")).toMatch(/No answer is not an approval/);
  });

  it("of too little stops a fitted job and sends a planned one back to the operator", () => {
    const little = { operatorRecords: [decision({ decision: "approved-with-limit", limitA: 16 })] };
    expect(assessWith(little).route).toMatchObject({ demand: "stop", approval: "exceeded" });
    expect(assessWith({ ...planned, ...little }).route).toMatchObject({ demand: "apply", approval: "exceeded" });
    expect(assessWith({ ...little, "chargepoints[0].configuredA": null }).route.demand).toBe("stop");
    expect(
      assessWith({ ...little, "chargepoints[0].configuredA": "unknown", "chargepoints[0].ratedA": "unknown" }).route
        .demand,
    ).not.toBe("stop");
  });

  it("holds with a lower setting that is secured and photographed, and asks for both", () => {
    const limited = {
      ...over,
      operatorRecords: [decision({ decision: "approved-with-limit", limitA: 16 })],
      "chargepoints[0].configuredA": 16,
    };
    expect(missing(limited)).toContain("chargepoints[0].configurationSecuredBy");
    const secured = {
      ...limited,
      "chargepoints[0].configurationSecuredBy": "tool",
      "evidence+": { subject: "limit-setting", of: "cp1", file: "limit.jpg" },
    };
    expect(found(assessWith(secured), "reasons[route.approval].outcome")).toBe("met");
    expect(missing(secured)).toEqual([]);
  });

  it("compares maker and model as they are written, whatever the case and spaces", () => {
    for (const model of ["Dock 7", "dock7", "KESTREL Dock-7"])
      expect(assessWith({ ...over, operatorRecords: [decision({ model })] }).route.approval, model).toBe("held");
    expect(
      assessWith({ ...over, operatorRecords: [decision({ model: "Dock 7" })], "chargepoints[0].make": null }).route
        .approval,
    ).toBe("held");
    expect(
      assessWith({ ...over, operatorRecords: [decision({ model: "Post 22", reference: null })] }).route.approval,
    ).toBe("other-equipment");
    expect(assessWith({ ...over, operatorRecords: [decision({ reference: null })] }).route.approval).toBe("held");
  });

  it("runs out by the planned day, and without a day does not", () => {
    const old = { ...over, operatorRecords: [decision({ expires: "2026-11-15" })] };
    expect(assessWith({ ...planned, ...old }).route.approval).toBe("expired");
    expect(assessWith({ ...planned, ...old, "dates.planned": null }).route.approval).toBe("held");
  });
});

describe("the order of the route", () => {
  // A proven trigger counts even when other facts are open.
  it("puts a proven trigger before open facts, and danger before both", () => {
    const open: Changes = { "demand.method": null, "supply.metered": null };
    expect(assessWith({ ...open, "supply.looped": "feeds-neighbour" }).route.demand).toBe("late-application");
    expect(assessWith({ ...planned, ...open, "supply.looped": "feeds-neighbour" }).route.demand).toBe("apply");
    expect(
      assessWith({ ...open, "supply.looped": "feeds-neighbour", "supply.serviceConditions": ["damaged"] }).route.demand,
    ).toBe("stop");
    expect(assessWith(open).route.demand).toBe("more-facts-needed");
  });

  it("proves a limit passed by the least the demand can be, although a phase is not told", () => {
    const threePhase: Changes = {
      ...planned,
      "supply.phases": 3,
      "supply.cutOutRatingA": 60,
      "demand.existingA": [62, 20, 20],
      "chargepoints[0].phase": null,
    };
    const assessment = assessWith(threePhase);
    expect(assessment.demand.afterA).toBeNull();
    expect(assessment.route.demand).toBe("apply");
    expect(found(assessment, "reasons[route.demand-over-cut-out].because")).toMatch(/^At least 62\.0 A/);
  });

  it("lists first what blocks the route, then what the paper asks", () => {
    expect(missing({ "supply.looped": null, "customer.phone": null, "chargepoints[0].serial": null })).toEqual([
      "supply.looped",
      "customer.phone",
      "chargepoints[0].serial",
    ]);
    expect(missing({ "customer.interest": "tenant" })).toEqual(["customer.permission.from"]);
    expect(missing({ ...planned, "dates.planned": null, "chargepoints[0].serial": null })).toEqual(["dates.planned"]);
    expect(missing({ "site.postcode": null, "site.gridReference": "XX 123 456" })).toEqual([]);
    expect(missing({ "site.address": [], "chargepoints[0].mode": null })).toEqual([
      "site.address",
      "chargepoints[0].mode",
    ]);
    expect(missing({ "supply.serviceConditions": ["water"], "customer.phone": null, "customer.name": null })).toEqual([
      "customer.phone",
    ]);
  });

  it("asks for a better survey by the way it was made", () => {
    const path = (changes: Changes) => missing(changes)[0];
    expect(path({ "demand.measurement.resolutionS": 1800 })).toBe("demand.measurement");
    expect(path({ "demand.method": "declared" })).toBe("supply.authorisedCapacityKva");
    const day = Array.from({ length: 48 }, (_, index) => ({
      start: new Date(Date.UTC(2026, 0, 5) + index * 1_800_000).toISOString(),
      kwh: 0.5,
    }));
    expect(path({ "demand.method": "half-hourly", "demand.halfHourKwh": day })).toBe("demand.halfHourKwh");
    expect(
      path({
        "demand.method": "diversity",
        "site.premises": "commercial",
        "supply.authorisedCapacityKva": 23,
        "demand.loads": [{ kind: "fixed", ratedA: 5 }],
      }),
    ).toBe("demand.loads");
  });

  it("cannot tell on a day for which no wiring figure is held", () => {
    const day = [{ start: "2026-01-05T18:00:00Z", kwh: 1 }];
    const assessment = assessWith({
      "dates.designed": "2012-01-01",
      "demand.method": "half-hourly",
      "demand.halfHourKwh": day,
    });
    expect(assessment.route.demand).toBe("more-facts-needed");
    expect(assessment.missing[0]?.path).toBe("demand.existingA");
  });

  it("judges nothing for a day before any rules are held, and does not break", () => {
    const old = assessWith({ "dates.installed": "2010-05-05", "dates.commissioned": "2010-05-05", "dates.sold": null });
    expect(old.route.reasons.map(({ rule }) => rule)).toEqual(["route.rules-held"]);
    expect(old.deadlines).toEqual([]);
  });
});

describe("single facts that turn the route", () => {
  const route = (changes: Changes) => assessWith(changes).route.demand;

  it("a rating that is assumed, or without evidence, counts as not known", () => {
    expect(route({ "supply.cutOutEvidence": "assumed" })).toBe("late-application");
    expect(route({ "supply.cutOutEvidence": null })).toBe("late-application");
  });

  it("a fuse that was seen needs the authority and the day", () => {
    const seen = (under: object): Changes => ({
      "supply.cutOutEvidence": "fuse-seen",
      "supply.cutOutSeenUnder": under,
    });
    expect(missing(seen({}))).toEqual(["supply.cutOutSeenUnder.authority"]);
    expect(missing(seen({ authority: "A-17" }))).toEqual(["supply.cutOutSeenUnder.on"]);
    expect(route(seen({ authority: "A-17", on: "2026-11-01" }))).toBe("notify");
  });

  it("a TT or separated unit at a caravan pitch keeps off the operator’s earth", () => {
    const pitch: Changes = { "site.premises": "caravan-or-boat", "supply.authorisedCapacityKva": 23 };
    expect(route({ ...pitch, "chargepoints[0].openPen.method": "tt" })).not.toBe("stop");
    expect(route({ ...pitch, "chargepoints[0].openPen.method": null })).toBe("stop");
    expect(route({ ...pitch, "supply.earthing": "unknown" })).toBe("late-application");
  });

  it("hardware of 32 A set to 16 A is told after commissioning (SGI-1)", () => {
    const unit = { kind: "parallel", designA: 32, registeredA: 16, typeTestReference: "TT-1" };
    expect(assessWith({ "chargepoints[0].discharge": unit }).route).toMatchObject({
      demand: "notify",
      generation: "sgi-1",
    });
  });

  it("existing generation needs its capacity and its acceptance", () => {
    const twoWay: Changes = {
      ...planned,
      "chargepoints[0].discharge": { kind: "both", designA: 16, registeredA: 16, typeTestReference: "TT-1" },
    };
    const solar = { kind: "solar", ratedA: 16, inExistingDemand: "yes" };
    expect(missing({ ...twoWay, "demand.otherEquipment": [solar] })).toEqual([
      "demand.otherEquipment[0].registeredA",
      "demand.otherEquipment[0].designA",
      "demand.otherEquipment[0].acceptance",
    ]);
    expect(missing({ ...twoWay, "chargepoints[0].discharge.typeTestReference": null })).toContain(
      "chargepoints[0].discharge.typeTestReference",
    );
    expect(missing({ ...twoWay, "supply.phases": null })).toContain("supply.phases");
    expect(assessWith({ ...twoWay, "demand.otherEquipment": null }).route.demand).toBe("more-facts-needed");
    const split = { ...twoWay, "supply.phases": 2, "demand.existingA": [5, 5], "chargepoints[0].phase": "L1" };
    expect(found(assessWith(split), "reasons[generation.phase-imbalance].outcome")).toBe("not-applicable");
  });

  it("a number whose kind could not be told holds a site that can export", () => {
    const solar = {
      kind: "solar",
      ratedA: 16,
      designA: 16,
      registeredA: 16,
      acceptance: "OP-1",
      inExistingDemand: "yes",
    };
    expect(route({ "site.supplyNumberKind": "unknown" })).toBe("notify");
    expect(route({ "site.supplyNumberKind": "unknown", "demand.otherEquipment": [solar] })).toBe("more-facts-needed");
    expect(route({ "site.supplyNumberKind": "unknown", "demand.otherEquipment": null })).toBe("more-facts-needed");
    const twoWay = { kind: "both", designA: 16, registeredA: 16, typeTestReference: "TT-1" };
    expect(route({ "site.supplyNumberKind": "unknown", "chargepoints[0].discharge": twoWay })).toBe(
      "more-facts-needed",
    );
  });

  it("earlier chargepoints count in the table of UK Power Networks", () => {
    const table = (equipment: object[] | null, more: Changes = {}) =>
      found(
        assessWith({ "site.supplyNumber": "@10", "demand.otherEquipment": equipment, ...more }),
        "reasons[route.ukpn-table].outcome",
      );
    const earlier = { kind: "chargepoint", ratedA: 16, inExistingDemand: "yes" };
    expect(table([])).toBe("met");
    expect(table([earlier])).toBe("not-met");
    expect(table([{ ...earlier, ratedA: null }])).toBe("cannot-tell");
    expect(table(null)).toBe("met");
    const threePhase: Changes = { "supply.phases": 3, "demand.existingA": [5, 5, 5], "chargepoints[0].phase": "L1" };
    expect(table([{ ...earlier, phase: "L2" }], threePhase)).toBe("met");
    expect(table([{ ...earlier, phase: "L1" }], threePhase)).toBe("not-met");
    expect(table([], { "supply.phases": null })).toBe("cannot-tell");
    expect(table([], { "supply.phases": 2, "demand.existingA": [5, 5], "chargepoints[0].phase": "L1" })).toBe(
      "not-met",
    );
  });

  it("earlier chargepoints count in the share of the Scottish guide", () => {
    const office: Changes = {
      "site.premises": "commercial",
      "site.territory": "scotland",
      "site.supplyNumber": "@17",
      "supply.authorisedCapacityKva": 69,
      "supply.cutOutRatingA": 400,
      "demand.existingA": [150],
    };
    const share = (changes: Changes) =>
      found(assessWith({ ...office, ...changes }), "reasons[route.commercial-share].recorded");
    expect(share({})).toBe("21.3 %");
    expect(share({ "demand.otherEquipment": [{ kind: "chargepoint", ratedA: 32, inExistingDemand: "yes" }] })).toBe(
      "42.7 %",
    );
    expect(share({ "demand.otherEquipment": [{ kind: "chargepoint", inExistingDemand: "yes" }] })).toBeNull();
    expect(share({ "demand.otherEquipment": null })).toBe("21.3 %");
    expect(share({ "chargepoints[0].phases": null })).toBeNull();
    expect(share({ "demand.existingA": [0] })).toBeNull();
  });

  it("on the highway an electrode, or a device from the list, serves UK Power Networks", () => {
    const street: Changes = {
      "site.premises": "public-highway",
      "site.supplyNumber": "@10",
      "supply.authorisedCapacityKva": 23,
    };
    const outcome = (changes: Changes) =>
      found(assessWith({ ...street, ...changes }), "reasons[route.highway-earthing].outcome");
    expect(outcome({ "chargepoints[0].openPen.method": "tt" })).toBe("met");
    expect(outcome({ "supply.earthing": "TT", "chargepoints[0].openPen.method": "tt" })).toBe("met");
    expect(outcome({ "supply.earthing": "TT", "chargepoints[0].openPen.method": null })).toBe("cannot-tell");
    expect(outcome({ "supply.earthing": null })).toBe("cannot-tell");
    expect(outcome({ "chargepoints[0].openPen.method": "installation-electrode" })).toBe("not-met");
    expect(outcome({ "chargepoints[0].openPen.device.evidence": "none" })).toBe("not-met");
  });

  it("a photo of another chargepoint proves nothing for this one", () => {
    const unit = jobWith().chargepoints[0];
    const two: Changes = {
      chargepoints: [
        { ...unit, discharge: { kind: "disabled" } },
        { ...unit, id: "cp2", serial: "KD7-2" },
      ],
      "demand.existingA": [0],
      "supply.cutOutRatingA": 100,
    };
    const photo = (of: string | null) => ({ "evidence+": { subject: "discharge-setting", of, file: "d.jpg" } });
    const outcome = (changes: Changes) =>
      found(assessWith({ ...two, ...changes }), "reasons[generation.discharge].outcome");
    expect(outcome(photo("cp1"))).toBe("met");
    expect(outcome(photo("cp2"))).toBe("cannot-tell");
    expect(outcome(photo(null))).toBe("cannot-tell");
  });
});

describe("a heat pump", () => {
  it("of which it was not asked whether the figure holds it keeps the route open", () => {
    const pump = { kind: "heat-pump", ratedA: 8 };
    expect(missing({ "demand.otherEquipment": [pump] })).toContain("demand.otherEquipment[0].inExistingDemand");
  });
});

describe("bad input", () => {
  it("names the field and the remedy of a figure out of range, quoted or of another kind", () => {
    const messages = (changes: Changes) => {
      const parsed = parseDraft(recordWith(changes));
      return parsed.ok ? [] : parsed.fields.map(({ path, message }) => `${path}: ${message}`);
    };
    expect(messages({ "supply.cutOutRatingA": 1000 })).toEqual([
      'supply.cutOutRatingA: must be at most 800 A; read it again or choose "unknown"',
    ]);
    expect(messages({ "supply.cutOutRatingA": "100" })).toEqual([
      'supply.cutOutRatingA: must be a number in A without quotation marks, or "unknown"',
    ]);
    expect(messages({ "supply.metered": "perhaps" })).toEqual(['supply.metered: must be true, false or "unknown"']);
    expect(messages({ "circuits[0].device.ratingA": "40" })).toEqual([
      "circuits[0].device.ratingA: must be a number in A without quotation marks",
    ]);
    expect(messages({ "dates.sold": "2062-01-01" })).toEqual([
      "dates.sold: check the year: it must lie from 2000 to 2049",
    ]);
  });

  it("is named as a whole when it is no record at all", () => {
    for (const input of [null, "text", [], 7])
      expect(parseJob(input)).toMatchObject({ ok: false, fields: [{ path: "(record)" }] });
  });

  it("names what it did not read, also inside lists", () => {
    const record = recordWith({
      "chargepoints[0].colour": "green",
      "supply.meter": { kind: "smart", size: { wide: 1 } },
    });
    const parsed = parseDraft(record);
    expect(parsed.ok && parsed.unread.sort()).toEqual(["chargepoints[0].colour", "supply.meter.size"]);
  });
});

describe("a rule asked about a day without figures", () => {
  it("takes the other way only for that, and passes every other fault on", () => {
    const fails = (error: Error) => () => {
      throw error;
    };
    expect(inForceOr(() => "other", fails(new NoValueInForce("x", "2010-01-01")))).toBe("other");
    expect(() => inForceOr(() => "other", fails(new Error("broken")))).toThrow("broken");
  });
});
