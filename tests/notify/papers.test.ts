import { describe, expect, it } from "vitest";
import type { Assessment } from "@/lib/notify/assessment";
import { headline, summaryOf } from "@/lib/notify/headline";
import { notificationData } from "@/lib/notify/notification";
import { documentsIn, hasGenerationPaper, notificationVariant } from "@/lib/notify/pack";
import { papersDue } from "@/lib/notify/papers-due";
import { photosNeeded } from "@/lib/notify/photos-needed";
import { assessWith, jobWith, type Changes } from "./record";

const planned: Changes = {
  stage: "planned",
  "dates.installed": null,
  "dates.commissioned": null,
  "dates.planned": "2026-12-14",
};
const approved = (more: object = {}): Changes => ({
  operatorRecords: [
    { purpose: "application", reference: "26-1", decision: "approved", decidedOn: "2026-11-10", ...more },
  ],
});
const twoWay = (designA: number, registeredA = designA): Changes => ({
  "chargepoints[0].discharge": { kind: "parallel", designA, registeredA, typeTestReference: "TT-90017" },
});
const over: Changes = { "demand.existingA": [34.6] };

type Row = {
  name: string;
  changes: Changes;
  title: string;
  variant: ReturnType<typeof notificationVariant>;
  papers: [string, string | null][];
};

// Sentences and papers are this program's own; the routes behind them are tested in the check cases.
const rows: Row[] = [
  {
    name: "a notice",
    changes: {},
    title: "Notify Northern Powergrid by Friday 18 December",
    variant: "notice",
    papers: [["demand-notice", "2026-12-18"]],
  },
  {
    name: "a notice whose day has passed",
    changes: { "site.supplyNumber": "@10" },
    title: "Notify UK Power Networks now; it was due by Friday 20 November",
    variant: "notice-by-the-day",
    papers: [["demand-notice", "2026-11-20"]],
  },
  {
    name: "a planned notice",
    changes: planned,
    title: "Notify Northern Powergrid",
    variant: "notice",
    papers: [["demand-notice", null]],
  },
  {
    name: "an application",
    changes: { ...planned, ...over },
    title: "Apply to Northern Powergrid before installing",
    variant: "application",
    papers: [["application", null]],
  },
  {
    name: "an approval held, not yet fitted",
    changes: { ...planned, ...over, ...approved() },
    title: "Northern Powergrid has approved the work",
    variant: "application",
    papers: [],
  },
  {
    name: "an approval held and fitted",
    changes: { ...over, ...approved() },
    title: "Send Northern Powergrid the completion notice by Friday 18 December",
    variant: "completion-notice",
    papers: [["completion-notice", "2026-12-18"]],
  },
  {
    name: "an approval held although none was needed",
    changes: approved(),
    title: "Send Northern Powergrid the completion notice by Friday 18 December",
    variant: "completion-notice",
    papers: [["completion-notice", "2026-12-18"]],
  },
  {
    name: "a late application",
    changes: over,
    title: "Apply to Northern Powergrid now, after the fact",
    variant: "late-application",
    papers: [["application", null]],
  },
  {
    name: "open facts",
    changes: { "supply.looped": null },
    title: "The route cannot be told yet",
    variant: "not-ready",
    papers: [],
  },
  {
    name: "danger",
    changes: { "supply.serviceConditions": ["heat-marks", "water"] },
    title: "Stop. Heat marks, water at the service position",
    variant: "safety-report",
    papers: [["safety-report", null]],
  },
  {
    name: "set above the approved limit",
    changes: approved({ decision: "approved-with-limit", limitA: 16 }),
    title: "Stop. Set above the approved limit",
    variant: "safety-report",
    papers: [["safety-report", null]],
  },
  {
    name: "a two-way unit under G98",
    changes: twoWay(16),
    title: "Notify Northern Powergrid by Thursday 17 December",
    variant: "notice",
    papers: [
      ["demand-notice", "2026-12-18"],
      ["generation-notice", "2026-12-17"],
    ],
  },
  {
    name: "a two-way unit that must be accepted first",
    changes: { ...planned, ...twoWay(32) },
    title: "Apply to Northern Powergrid before installing",
    variant: "application",
    papers: [
      ["application", null],
      ["generation-application", null],
    ],
  },
  {
    name: "an operator that is not known",
    changes: { "site.supplyNumber": "9900000000015" },
    title: "Notify the network operator by Friday 18 December",
    variant: "notice",
    papers: [["demand-notice", "2026-12-18"]],
  },
];

describe("what an assessment calls for", () => {
  for (const { name, changes, title, variant, papers } of rows)
    it(`${name}: its sentence, its document and its papers`, () => {
      const assessment = assessWith(changes);
      if (name !== "a two-way unit under G98") expect(headline(assessment).title).toBe(title);
      expect(notificationVariant(jobWith(changes), assessment)).toBe(variant);
      expect(papersDue(assessment).map(({ purpose, lastDay }) => [purpose, lastDay])).toEqual(papers);
    });

  it("names the day of the notice, and counts down to whichever paper is due first", () => {
    const assessment = assessWith(twoWay(16));
    expect(headline(assessment).title).toBe("Notify Northern Powergrid by Friday 18 December");
    expect(summaryOf(assessment, "2026-12-01")).toMatchObject({ route: "notify", lastDay: "2026-12-17", daysLeft: 16 });
  });

  it("says beside the decision what two-way units still need", () => {
    const also = (changes: Changes) => headline(assessWith(changes)).also;
    expect(also(twoWay(16))).toMatch(/generation notice goes as well/);
    expect(also({ ...planned, ...twoWay(32) })).toMatch(/do not energise before it is accepted/);
    expect(also({ "chargepoints[0].discharge.kind": null })).toMatch(/not settled yet/);
    expect(also({})).toBe("No application was needed before installing.");
    expect(also({ "supply.looped": null })).toBe("1 fact must be recorded before anything goes to Northern Powergrid.");
  });

  it("gives the accepted generation its notice, the day of commissioning counted as the first", () => {
    const accepted = {
      ...twoWay(32),
      operatorRecords: [
        { purpose: "generation-application", reference: "G-1", decision: "approved", decidedOn: "2026-11-02" },
      ],
    };
    const assessment = assessWith(accepted);
    expect(assessment.route).toMatchObject({ demand: "notify", generation: "sgi-3", approval: "held" });
    expect(papersDue(assessment).map(({ purpose, lastDay }) => [purpose, lastDay])).toEqual([
      ["demand-notice", "2026-12-18"],
      ["generation-notice", "2026-12-17"],
    ]);
    expect(hasGenerationPaper(assessment)).toBe(true);
    expect(hasGenerationPaper(assessWith())).toBe(false);
  });

  it("summarises a job without a day", () => {
    expect(summaryOf(assessWith(planned), "2026-12-01")).toMatchObject({ lastDay: null, daysLeft: null, fields: [] });
  });

  it("basis names the day it counts from and the rule set", () => {
    expect(headline(assessWith()).basis).toBe(
      "28 calendar days from installing on 20 November 2026. Rule set 2026-12-01.1, as at 1 December 2026.",
    );
    expect(headline(assessWith(planned)).basis).toBe("Rule set 2026-12-01.1, as at 1 December 2026.");
    const bare = {
      ...assessWith({ "supply.serviceConditions": ["water"] }),
      route: { ...assessWith().route, demand: "stop" },
    };
    expect(headline(bare as Assessment).title).toBe("Stop. Danger recorded");
  });
});

describe("the documents of a pack", () => {
  it("are six for an installed job, without the handover while it is planned", () => {
    expect(documentsIn(jobWith(), assessWith())).toHaveLength(6);
    expect(documentsIn(jobWith(planned), assessWith(planned))).not.toContain("05-handover");
  });

  it("are the cover and the safety report when the job is stopped, the cover and the notice for a removal", () => {
    const danger = { "supply.serviceConditions": ["tamper"] };
    expect(documentsIn(jobWith(danger), assessWith(danger))).toEqual(["00-cover", "01-network-notification"]);
    const removal = { kind: "removal", chargepoints: [] };
    expect(documentsIn(jobWith(removal), assessWith(removal))).toEqual(["00-cover", "01-network-notification"]);
    const empty = { chargepoints: [] };
    expect(documentsIn(jobWith(empty), assessWith(empty))).toHaveLength(2);
  });
});

describe("the data an operator receives", () => {
  const data = (changes: Changes = {}) => notificationData(jobWith(changes), assessWith(changes));
  const row = (changes: Changes, key: string) =>
    data(changes)
      .flatMap(({ rows: all }) => all)
      .find((each) => each.key === key);

  it("stands in the order it is asked, with every key once", () => {
    expect(data().map(({ section }) => section)).toEqual([
      "Premises",
      "Customer and installer",
      "Supply",
      "Demand",
      "Chargepoint",
      "Dates",
    ]);
    const keys = data({ chargepoints: [jobWith().chargepoints[0], { ...jobWith().chargepoints[0], id: "cp2" }] })
      .flatMap(({ rows: all }) => all)
      .map(({ key }) => key);
    expect(new Set(keys).size).toBe(keys.length);
  });

  it("keeps a row for what is not recorded, and says what was looked at and not told", () => {
    expect(row({ "customer.phone": null }, "customer.phone")).toMatchObject({ value: null });
    expect(row({ "supply.cutOutRatingA": "unreadable" }, "supply.cutOutRatingA")).toMatchObject({
      value: "Not known",
      unit: null,
    });
    expect(row({ "supply.looped": "unknown" }, "supply.looped")).toMatchObject({ value: "Not known" });
    expect(row({ "supply.metered": "unknown" }, "supply.metered")).toMatchObject({ value: "Not known" });
    expect(row({ "supply.metered": false }, "supply.metered")).toMatchObject({ value: "No" });
    expect(row({ "supply.metered": null }, "supply.metered")).toMatchObject({ value: null });
    expect(row({ "supply.serviceConditions": null }, "supply.serviceConditions")).toMatchObject({ value: null });
    expect(row({ "supply.cutOutRatingA": null }, "supply.cutOutRatingA")).toMatchObject({ value: null });
  });

  it("gives figures with their unit and phase by phase", () => {
    expect(row({}, "supply.cutOutRatingA")).toMatchObject({ value: "100", unit: "A" });
    expect(row({}, "demand.afterA")).toMatchObject({ value: "56.8", unit: "A" });
    expect(row({}, "demand.afterKva")).toMatchObject({ value: "13.06", unit: "kVA" });
    expect(row({ "demand.existingA": null }, "demand.afterKva")).toMatchObject({ value: null });
    expect(row({}, "site.supplyNumber")).toMatchObject({ value: "23 9923 2323 236" });
    expect(row({ "site.supplyNumber": "12" }, "site.supplyNumber")).toMatchObject({ value: "12" });
    expect(row({ "site.supplyNumber": null }, "site.supplyNumber")).toMatchObject({ value: null });
    expect(row({ "site.supplyNumber": null }, "operator")).toMatchObject({ value: null });
    expect(row({}, "supply.isolatorAfterMeter")).toMatchObject({ value: "Yes" });
    expect(row({ "supply.isolatorAfterMeter": "unknown" }, "supply.isolatorAfterMeter")).toMatchObject({
      value: "Not known",
    });
    expect(row({ "supply.isolatorAfterMeter": null }, "supply.isolatorAfterMeter")).toMatchObject({ value: null });
  });

  it("lists other equipment, a replaced unit and a limit in words", () => {
    const heatPump = {
      kind: "heat-pump",
      make: "Example",
      model: "Nine",
      ratedA: 9,
      phase: "L1",
      inExistingDemand: "yes",
    };
    expect(row({ "demand.otherEquipment": [heatPump] }, "demand.otherEquipment")).toMatchObject({
      value: "Heat pump Example Nine, 9 A, L1",
    });
    expect(row({ "demand.otherEquipment": [{ kind: "other" }] }, "demand.otherEquipment")).toMatchObject({
      value: "Other",
    });
    expect(row({}, "demand.otherEquipment")).toMatchObject({ value: "None" });
    expect(row({ "demand.otherEquipment": null }, "demand.otherEquipment")).toMatchObject({ value: null });
    const replaces = { make: "Kestrel", model: "Dock 7", serial: "KD7-1", ratedA: 32, removedOn: "2026-11-20" };
    expect(row({ "chargepoints[0].replaces": replaces }, "chargepoints[0].replaces")).toMatchObject({
      value: "Kestrel Dock 7, KD7-1, removed on 20 November 2026",
    });
    expect(row({ "chargepoints[0].replaces": {} }, "chargepoints[0].replaces")).toMatchObject({
      value: "A unit not described",
    });
    const limit = { kind: "site", limitA: 60, operatorAgreement: "LA-1" };
    expect(row({ "demand.loadLimit": limit }, "demand.limitCounted")).toMatchObject({ value: "Yes" });
    expect(row({}, "demand.limitCounted")).toMatchObject({ value: "No" });
    expect(row({ "demand.loadLimit": {} }, "demand.limitCounted")).toMatchObject({ value: null });
  });

  it("adds generation only where it is in question", () => {
    expect(data(twoWay(16)).map(({ section }) => section)).toContain("Generation");
    expect(row(twoWay(16), "route.generation")).toMatchObject({ value: "EREC G98" });
    const units = [
      { ...jobWith(twoWay(16)).chargepoints[0] },
      { ...jobWith().chargepoints[0], id: "cp2", serial: "KD7-2" },
    ];
    expect(row({ chargepoints: units }, "chargepoints[0].discharge.designA")).toMatchObject({
      label: "Design capacity a phase, cp1",
    });
    expect(row({ chargepoints: units }, "chargepoints[1].discharge.designA")).toBeUndefined();
  });

  it("has no installed day on a planned job", () => {
    expect(row(planned, "dates.installed")).toBeUndefined();
    expect(row(planned, "dates.planned")).toMatchObject({ value: "14 December 2026" });
  });
});

describe("the photos a job needs", () => {
  const needed = (changes: Changes = {}) => photosNeeded(jobWith(changes), assessWith(changes));
  const subjects = (changes: Changes = {}) => needed(changes).map(({ subject }) => subject);

  it("are those of the intake, the unit and its settings, and what is there already is ticked", () => {
    expect(needed().find(({ subject }) => subject === "cut-out")).toMatchObject({ of: null, have: true });
    expect(needed().find(({ subject }) => subject === "rating-plate")).toMatchObject({ of: "cp1", have: false });
    expect(subjects({ "chargepoints[0].smartCharging.users": "public" })).not.toContain("delay-screen");
  });

  it("grow with what was chosen", () => {
    const chosen = subjects({
      "chargepoints[0].configuredA": 20,
      "chargepoints[0].discharge.kind": "disabled",
      "chargepoints[0].openPen.method": "tt",
      "chargepoints[0].openPen.device.position": "separate",
    });
    for (const subject of ["limit-setting", "discharge-setting", "electrode", "neighbour-earths", "open-pen-device"])
      expect(chosen).toContain(subject);
    expect(subjects({ "site.supplyNumber": null, "demand.method": "declared" })).not.toContain("supply-number");
  });

  it("are of the damage alone when the job is stopped, and leave the unit out while it is planned", () => {
    expect(subjects({ "supply.serviceConditions": ["water"] })).toEqual(["damage"]);
    expect(subjects(planned)).not.toContain("rating-plate");
  });
});
