import { describe, expect, it } from "vitest";
import { ownFigure, rulesFor, type Ground, type OperatorRules } from "@/lib/notify/firm-rules";
import { isLooser, registerFigure } from "@/lib/notify/register-figures";
import { firmCases, firmWith } from "./firm-cases";
import { assessWith, found, type Changes } from "./record";

/**
 * A firm's figure may tighten; one that loosens is used, answers as looser and is printed. The register's figures are
 * those of the ENA form (28 days, 60 A), UKPN EDS 08-5050 (day of installing, its table), the 80 A refits of National
 * Grid, and BS 7671 411.3.1.1 (2.5 m).
 */
const asAt = "2026-12-01";
const ground: Ground = { from: null, source: "letter of 3 March", setOn: "2026-12-01" };
const said = "set by this firm on 1 December 2026 (source: letter of 3 March)";

const withFigure = (rules: Partial<OperatorRules>, changes: Changes = {}, id = "23") =>
  assessWith(changes, asAt, firmWith(rules, id));
const reason = (assessment: ReturnType<typeof assessWith>, rule: string) =>
  found(assessment, `reasons[${rule}]`) as { outcome: string; because: string; used: Record<string, unknown> };
const firmReason = (assessment: ReturnType<typeof assessWith>) => reason(assessment, "route.firm-figure");
const printed = (assessment: ReturnType<typeof assessWith>) => assessment.cautions.join("\n");

describe("a firm’s figure", () => {
  it("says nothing where none is set", () => {
    expect(firmReason(assessWith())).toBeNull();
    expect(ownFigure(rulesFor({ operators: {} }, "23", asAt), "noticeDays")).toBeNull();
  });

  it("names the day it was set and its source, or only the firm where neither was asked for", () => {
    expect(
      ownFigure({ noticeDays: 7, buriedSeparationM: null, grounds: { noticeDays: ground } }, "noticeDays"),
    ).toEqual({
      value: 7,
      said,
    });
    expect(ownFigure({ noticeDays: 7, buriedSeparationM: null }, "noticeDays")?.said).toBe("set by this firm");
    const bare = { ...ground, source: null };
    expect(ownFigure({ noticeDays: 0, buriedSeparationM: null, grounds: { noticeDays: bare } }, "noticeDays")).toEqual({
      value: 0,
      said: "set by this firm on 1 December 2026",
    });
  });

  it("holds for work from its own day on, and the register’s before", () => {
    const from = (day: string) => ({ noticeDays: 7, grounds: { noticeDays: { ...ground, from: day } } });
    const lastDay = (day: string) => withFigure(from(day)).deadlines[0]?.lastDay;
    expect(lastDay("2026-11-20")).toBe("2026-11-27");
    expect(lastDay("2026-11-21")).toBe("2026-12-18");
    expect(firmReason(withFigure(from("2026-11-21")))).toBeNull();
  });

  it("is of its own operator only", () => {
    expect(withFigure({ noticeDays: 7 }, {}, "15").deadlines[0]?.lastDay).toBe("2026-12-18");
  });

  it("gives each outcome of its rule", () => {
    expect(firmCases.map(({ changes, firm }) => firmReason(assessWith(changes, asAt, firm)).outcome)).toEqual([
      "met",
      "not-met",
    ]);
  });
});

describe("days for the notice", () => {
  it("say in the basis whose they are and what the register has", () => {
    const tight = withFigure({ noticeDays: 7, grounds: { noticeDays: ground } });
    expect(tight.deadlines[0]).toMatchObject({ what: "demand-notice", lastDay: "2026-11-27" });
    expect(tight.deadlines[0]?.basis).toContain(`, as ${said}. The register has 28 days.`);
    expect(firmReason(tight)).toMatchObject({ outcome: "met", used: { register: 28, firm: 7, leadsTo: "none" } });
    expect(printed(tight)).not.toContain("This firm");
  });

  it("loosened are used, answered as looser and printed", () => {
    const loose = withFigure({ noticeDays: 40, grounds: { noticeDays: ground } });
    expect(loose.deadlines[0]?.lastDay).toBe("2026-12-30");
    expect(firmReason(loose)).toMatchObject({ outcome: "not-met", used: { register: 28, firm: 40 } });
    expect(printed(loose)).toContain(
      `This firm allows 40 days for the notice, ${said}, where the register has 28 days. The firm answers for the difference.`,
    );
    expect(loose.route.demand).toBe("notify");
  });

  it("of one day are looser where the operator wants the notice by the day", () => {
    const one = withFigure({ noticeDays: 1 }, { "site.supplyNumber": "@12" }, "12");
    expect(printed(one)).toMatch(/allows 1 day for the notice.*0 days, by the day of installing/);
    expect(withFigure({ noticeDays: 0 }).deadlines[0]?.basis).toMatch(/^By the day of installing.*set by this firm/);
  });
});

describe("the demand above which an operator is asked first", () => {
  const homeOf = (existingA: number): Changes => ({ "demand.existingA": [existingA] });

  it("tightens the 60 A test of dwellings", () => {
    const asked = withFigure({ asksFirstAboveA: 50, grounds: { asksFirstAboveA: ground } });
    expect(asked.route.demand).toBe("late-application");
    expect(reason(asked, "route.demand-over-60A")).toMatchObject({
      outcome: "not-met",
      used: { limitA: 50, registerLimitA: 60, firmLimitA: 50, leadsTo: "apply" },
    });
    expect(reason(asked, "route.demand-over-60A").because).toContain(
      `above 50 A, ${said} where the register has 60 A,`,
    );
    expect(firmReason(asked).outcome).toBe("met");
  });

  it("takes exactly its own figure as within, as the register does with 60 A", () => {
    const base = assessWith().demand;
    const afterA = base.afterA?.[0] ?? Number.NaN;
    expect(withFigure({ asksFirstAboveA: afterA }).route.demand).toBe("notify");
    expect(withFigure({ asksFirstAboveA: afterA - 0.1 }).route.demand).toBe("late-application");
  });

  it("loosened lets a dwelling notify, says by whose figure, and is printed", () => {
    expect(assessWith(homeOf(32)).route.demand).toBe("late-application");
    const loose = withFigure({ asksFirstAboveA: 70, grounds: { asksFirstAboveA: ground } }, homeOf(32));
    expect(loose.route.demand).toBe("notify");
    expect(reason(loose, "route.demand-over-60A")).toMatchObject({
      outcome: "met",
      used: { limitA: 70, registerLimitA: 60, firmLimitA: 70 },
    });
    expect(reason(loose, "route.demand-over-60A").because).toContain(said);
    expect(printed(loose)).toContain(`This firm asks first above 70 A a phase at a dwelling, ${said}`);
    expect(firmReason(loose).outcome).toBe("not-met");
  });

  it("is a further test beside UK Power Networks’ table, never a looser one", () => {
    const ukpn: Changes = { "site.supplyNumber": "@12" };
    expect(reason(assessWith(ukpn), "route.demand-over-60A").outcome).toBe("not-applicable");
    const asked = withFigure({ asksFirstAboveA: 50 }, ukpn, "12");
    expect(reason(asked, "route.demand-over-60A")).toMatchObject({
      outcome: "not-met",
      used: { registerLimitA: null, firmLimitA: 50 },
    });
    expect(firmReason(withFigure({ asksFirstAboveA: 90 }, ukpn, "12")).outcome).toBe("met");
  });

  it("keeps silent outside dwellings", () => {
    const shop = withFigure({ asksFirstAboveA: 50 }, { "site.premises": "small-commercial" });
    expect(reason(shop, "route.demand-over-60A").outcome).toBe("not-applicable");
  });
});

describe("the fuse an operator refits", () => {
  const label: Changes = { "supply.cutOutEvidence": "carrier-label" };

  it("makes a label alone an open fact", () => {
    expect(reason(assessWith(label), "route.cut-out-known").outcome).toBe("met");
    const doubted = withFigure({ assumesFuseA: 60, grounds: { assumesFuseA: ground } }, label);
    expect(doubted.route.demand).toBe("more-facts-needed");
    expect(doubted.missing.map(({ path }) => path)).toContain("supply.cutOutEvidence");
    expect(reason(doubted, "route.cut-out-known")).toMatchObject({
      outcome: "cannot-tell",
      used: { registerFuseA: null, firmFuseA: 60, leadsTo: "hold" },
    });
    expect(reason(doubted, "route.cut-out-known").because).toContain(`60 A fuses, ${said} where the register has none`);
    expect(firmReason(doubted).outcome).toBe("met");
  });

  it("stands in place of the register’s 80 A where labels are in doubt already", () => {
    const midlands: Changes = { ...label, "site.supplyNumber": "@11" };
    const register = reason(assessWith(midlands), "route.cut-out-known");
    expect(register.because).toContain("with 80 A fuses.");
    expect(register.used).not.toHaveProperty("firmFuseA");
    const own = reason(withFigure({ assumesFuseA: 60 }, midlands, "11"), "route.cut-out-known");
    expect(own).toMatchObject({ outcome: "cannot-tell", used: { registerFuseA: 80, firmFuseA: 60 } });
  });

  it("leaves better evidence alone", () => {
    const stated = withFigure({ assumesFuseA: 60 }, { "supply.cutOutEvidence": "operator-statement" });
    expect(reason(stated, "route.cut-out-known")).toMatchObject({ outcome: "met" });
    expect(reason(stated, "route.cut-out-known").used).not.toHaveProperty("firmFuseA");
  });
});

describe("the distance between buried metalwork", () => {
  const earth = (buriedM: number): Changes => ({
    "chargepoints[0].openPen.method": "tt",
    "chargepoints[0].openPen.electrodeOhm": 80,
    "chargepoints[0].openPen.separationFromOtherEarthsM": 3,
    "chargepoints[0].openPen.buriedSeparationM": buriedM,
  });
  const check = (assessment: ReturnType<typeof assessWith>) =>
    found(assessment, "checks[open-pen.tt]") as { outcome: string; because: string; used: Record<string, unknown> };

  it("is the firm’s own in the answer, whichever way it goes", () => {
    const rules = { buriedSeparationM: 4, grounds: { buriedSeparationM: ground } };
    expect(check(withFigure({}, earth(4))).outcome).toBe("cannot-tell");
    const near = check(withFigure(rules, earth(3.9)));
    expect(near).toMatchObject({
      outcome: "not-met",
      used: { registerBuriedSeparationM: null, firmBuriedSeparationM: 4 },
    });
    expect(near.because).toContain(`nearer than the operator's 4 m, ${said}`);
    expect(check(withFigure(rules, earth(4))).outcome).toBe("met");
    expect(check(withFigure(rules, earth(4))).because).toContain(said);
  });

  it("is looser when nearer than the register allows above ground", () => {
    expect(firmReason(withFigure({ buriedSeparationM: 2.5 })).outcome).toBe("met");
    const near = withFigure({ buriedSeparationM: 2.4 });
    expect(firmReason(near)).toMatchObject({ outcome: "not-met", used: { register: null, firm: 2.4 } });
    expect(printed(near)).toContain("none below ground; 2.5 m above it");
  });
});

describe("what the register says beside a firm’s figure", () => {
  it.each([
    ["noticeDays", "23", "28 days"],
    ["noticeDays", "12", "0 days, by the day of installing"],
    ["buriedSeparationM", "23", "none below ground; 2.5 m above it"],
    ["asksFirstAboveA", "23", "60 A"],
    ["asksFirstAboveA", "10", "this operator’s table of supplies in place of such a figure"],
    ["assumesFuseA", "22", "80 A"],
    ["assumesFuseA", "23", "none, so a label is taken as read"],
  ] as const)("%s of %s: %s", (name, id, words) => {
    expect(registerFigure(name, id, asAt).words).toBe(words);
  });

  it("never takes an expected fuse as looser", () => {
    expect(isLooser("assumesFuseA", 100, "11", asAt)).toBe(false);
  });
});
