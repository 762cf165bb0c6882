import { describe, expect, it } from "vitest";
import { papersDue } from "@/lib/notify/papers-due";
import { assessWith, found, recordWith, supplyNumberOf, type Changes } from "./record";

const planned: Changes = {
  stage: "planned",
  "dates.installed": null,
  "dates.commissioned": null,
  "dates.planned": "2026-12-14",
};
const approval = (purpose: string) => ({ purpose, reference: "26-1", decision: "approved", decidedOn: "2026-11-10" });
const twoWay: Changes = {
  "chargepoints[0].discharge": { kind: "parallel", designA: 32, registeredA: 32, typeTestReference: "TT-1" },
};
const settings = "chargepoints[0].smartCharging";

/** Source of each: ENA form and guidance; where none speaks, the practice set out in the rule's own sources. */
describe("an approval", () => {
  it("that is held keeps the route at apply, whatever else is open, and its completion notice runs", () => {
    const held = assessWith({ "supply.looped": null, operatorRecords: [approval("application")] });
    expect(held.route).toMatchObject({ demand: "apply", approval: "held" });
    expect(held.missing.map(({ path }) => path)).toContain("supply.looped");
    expect(found(held, "deadlines[completion-notice].lastDay")).toBe("2026-12-18");
  });

  it("of the generation alone is not one of the demand", () => {
    const generationOnly = { ...twoWay, operatorRecords: [approval("generation-application")] };
    expect(assessWith(generationOnly).route).toMatchObject({ demand: "notify", approval: "held" });
    const looped = { ...generationOnly, "supply.looped": "feeds-neighbour" };
    expect(assessWith(looped).route).toMatchObject({ demand: "late-application", approval: "none" });
    const before = assessWith({ ...looped, ...planned });
    expect(before.route).toMatchObject({ demand: "apply", approval: "none" });
    expect(papersDue(before).map(({ purpose }) => purpose)).toContain("application");
  });
});

describe("a record that leaves something out", () => {
  it("does not notify without the circuit of an installed unit, but a removal and a plan may", () => {
    const bare = { circuits: [], "chargepoints[0].circuit": null };
    expect(assessWith(bare).route.demand).toBe("more-facts-needed");
    expect(assessWith(bare).missing.map(({ path }) => path)).toContain("circuits");
    expect(assessWith({ ...bare, ...planned }).route.demand).toBe("notify");
    expect(assessWith({ ...bare, kind: "removal" }).route.demand).toBe("notify");
  });

  it("takes an operator set by hand only with its reason", () => {
    const elsewhere = { "site.supplyNumber": supplyNumberOf("17") };
    const byHand = (reason: string | null) =>
      assessWith({ ...elsewhere, "site.operatorOverride": { id: "23", reason } }).route.demand;
    expect(byHand(null)).toBe("more-facts-needed");
    expect(byHand("read from the bill")).toBe("notify");
  });
});

describe("a unit that may run as an island", () => {
  // SI 2002/2665 reg 21: a switched alternative source; BS 7671 551.4.3.2: not the operator's earth alone.
  it("carries the caution of its earth and neutral link", () => {
    const cautionsOf = (kind: string) => assessWith({ "chargepoints[0].discharge": { kind } }).cautions.join(" ");
    expect(cautionsOf("islanded")).toMatch(/earth electrode of its own and a neutral link/);
    expect(cautionsOf("both")).toMatch(/neutral link/);
    expect(cautionsOf("parallel")).not.toMatch(/neutral link/);
  });
});

describe("a figure from memory", () => {
  // The figure for a lost earth is ours and from memory; the generation notice is SI 2002/2665 reg 22, from memory.
  it("passes nothing by itself and keeps its mark", () => {
    const earth = assessWith().route.reasons.find(({ rule }) => rule === "route.impedance-danger");
    expect(earth).toMatchObject({ outcome: "not-applicable", limit: "< 5 Ω (from memory: verify)" });
    const generation = { kind: "parallel", designA: 16, registeredA: 16, typeTestReference: "TT-1" };
    const told = assessWith({ "chargepoints[0].discharge": generation });
    expect(found(told, "deadlines[generation-notice].lastDay")).toBe("2026-12-17");
    expect(found(told, "deadlines[generation-notice].basis")).toMatch(/from memory: verify/);
  });
});

describe("a mode 4 unit", () => {
  // UK Power Networks EDS 08-5050: a power-quality form for each type goes with the application.
  it("is applied for with a power-quality form where the operator wants one", () => {
    const unit: Changes = { "chargepoints[0].mode": 4, "demand.existingA": [75] };
    const wants = (changes: Changes) => /power-quality form/.test(assessWith(changes).cautions.join(" "));
    expect(wants({ ...unit, "site.supplyNumber": supplyNumberOf("10") })).toBe(true);
    expect(wants(unit)).toBe(false);
  });
});

describe("the condition a maker sets on the supply", () => {
  const unit = "chargepoints[0]";
  // EN 61000-3-11 and the ENA form, section B: a condition not shown to hold is asked about first.
  it("sends the job to the operator when it could not be told, and waits when it was not asked", () => {
    const demandOf = (changes: Changes) => assessWith({ ...planned, ...changes }).route.demand;
    const impedance = { [`${unit}.flickerCondition`]: "max-impedance", "supply.lineNeutralImpedanceOhm": 0.21 };
    expect(demandOf({ [`${unit}.flickerCondition`]: "unknown" })).toBe("apply");
    expect(demandOf({ [`${unit}.flickerCondition`]: null })).toBe("more-facts-needed");
    expect(demandOf({ ...impedance, [`${unit}.maximumSystemImpedanceOhm`]: "unknown" })).toBe("apply");
    expect(demandOf({ ...impedance, [`${unit}.maximumSystemImpedanceOhm`]: null })).toBe("more-facts-needed");
    expect(demandOf({ ...impedance, [`${unit}.maximumSystemImpedanceOhm`]: 0.3 })).toBe("notify");
    const unread = { "supply.lineNeutralImpedanceOhm": "unreadable", "supply.earthing": "TN-S" };
    expect(demandOf({ ...impedance, [`${unit}.maximumSystemImpedanceOhm`]: 0.3, ...unread })).toBe("apply");
  });
});

describe("a unit that was swapped", () => {
  const old = { kind: "chargepoint", model: "Dock 3", ratedA: 32, inExistingDemand: "yes" };
  const swap = (removedOn: string | null): Changes => ({
    kind: "replacement",
    "site.supplyNumber": supplyNumberOf("10"),
    "demand.otherEquipment": [old],
    "demand.existingA": [50],
    "chargepoints[0].replaces": { model: "Dock 3", ratedA: 32, removedOn },
  });

  // UK Power Networks EDS 08-5050 table 5-1: 100 A single-phase, 7 kW (32 A) of chargepoints without assessment.
  it("does not count beside the new one once it is removed", () => {
    expect(found(assessWith(swap("2026-11-20")), "reasons[route.ukpn-table].recorded")).toBe("32 A a phase");
    expect(assessWith(swap("2026-11-20")).route.demand).toBe("notify");
    expect(found(assessWith(swap(null)), "reasons[route.ukpn-table].recorded")).toBe("64 A a phase");
  });
});

describe("the share of a Scottish site", () => {
  // SP Energy Networks and SSEN guide to connecting fleets, page 5: below 30 % of the site's demand is notified.
  it("counts a unit as the demand does: its secured setting, else its rating", () => {
    const site: Changes = {
      "site.territory": "scotland",
      "site.supplyNumber": supplyNumberOf("18"),
      "site.premises": "commercial",
      "supply.authorisedCapacityKva": 23,
      "demand.existingA": [50],
      "chargepoints[0].configuredA": 10,
      "chargepoints[0].configurationSecuredBy": "key",
    };
    const photo = { subject: "limit-setting", of: "cp1", file: "limit.jpg" };
    expect(found(assessWith(site), "reasons[route.commercial-share].recorded")).toBe("64.0 %");
    const shown = assessWith({ ...site, "evidence+": photo });
    expect(found(shown, "reasons[route.commercial-share].recorded")).toBe("20.0 %");
    expect(shown.route.demand).toBe("notify");
  });
});

describe("hours at handover", () => {
  // SI 2021/1467 reg 10: the owner may change the hours; the same hours written another way are no change.
  it("are compared as hours, not as text", () => {
    const hours = (days: string[]) => [{ days, from: "23:00", to: "06:00" }];
    const written = (atHandover: unknown) =>
      found(
        assessWith({ [`${settings}.factoryDefault`]: hours(["mon", "tue"]), [`${settings}.atHandover`]: atHandover }),
        "settings[R10-2].outcome",
      );
    expect(written(hours(["tue", "mon"]))).toBe("met");
    expect(written([...hours(["tue"]), ...hours(["mon"])])).toBe("met");
    expect(written(hours(["mon"]))).toBe("cannot-tell");
  });
});

describe("several of a kind", () => {
  it("are shown with the worst outcome first", () => {
    const record = recordWith() as { circuits: object[]; chargepoints: object[] };
    const thin = { ...record.circuits[0], id: "thin", cable: { table: "4D5", lineMm2: 1, lengthM: 18 } };
    const both = assessWith({
      "circuits+": thin,
      "chargepoints+": { ...record.chargepoints[0], id: "cp2", circuit: "thin", openPen: { method: null } },
    });
    expect(both.circuits.map(({ id }) => id)).toEqual(["thin", "main"]);
    expect(both.openPen.map(({ chargepoint }) => chargepoint)).toEqual(["cp2", "cp1"]);
  });
});
