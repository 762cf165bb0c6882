import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { assessWith, type Changes } from "./record";

type Home = {
  name: string;
  road: "logged" | "half-hourly" | "allowances";
  beforeA?: number;
  peakKwh?: number;
  loads?: object[];
  cutOutA: number;
  unitA: 16 | 32;
  looped: string;
  afterA: number;
  route: string;
  source: string;
};

const homes: Home[] = JSON.parse(
  readFileSync(new URL("../cases/network/ordinary-homes.json", import.meta.url), "utf8"),
);

/** A whole winter of half hours, November to February, quiet but for one evening in January. */
function winter(peakKwh: number) {
  const start = Date.UTC(2025, 10, 1);
  const end = Date.UTC(2026, 2, 1);
  const peakAt = Date.UTC(2026, 0, 14, 18);
  return Array.from({ length: (end - start) / 1_800_000 }, (_, index) => {
    const at = start + index * 1_800_000;
    return { start: new Date(at).toISOString(), kwh: at === peakAt ? peakKwh : 0.2 };
  });
}

const unit = (unitA: 16 | 32): Changes => ({
  "chargepoints[0].ratedA": unitA,
  "chargepoints[0].configuredA": unitA,
  "chargepoints[0].standards": unitA > 16 ? ["61000-3-11", "61000-3-12"] : ["61000-3-2", "61000-3-3"],
  "chargepoints[0].flickerCondition": "none",
});

const demand: Record<Home["road"], (home: Home) => Changes> = {
  logged: ({ beforeA }) => ({ "demand.existingA": [beforeA] }),
  "half-hourly": ({ peakKwh }) => ({
    "demand.method": "half-hourly",
    "demand.existingA": null,
    "demand.halfHourKwh": winter(peakKwh as number),
  }),
  allowances: ({ loads }) => ({ "demand.method": "diversity", "demand.existingA": null, "demand.loads": loads }),
};

// Thirty homes of three kinds, surveyed before the work. Routes: ENA combined form; a practitioner would call them so.
describe("ordinary homes", () => {
  it("are ten of each road", () => {
    for (const road of ["logged", "half-hourly", "allowances"])
      expect(homes.filter((home) => home.road === road)).toHaveLength(10);
  });

  for (const home of homes)
    it(`${home.road}: ${home.name}`, () => {
      const assessment = assessWith({
        stage: "planned",
        "dates.installed": null,
        "dates.commissioned": null,
        "dates.planned": "2026-12-14",
        "supply.cutOutRatingA": home.cutOutA,
        "supply.cutOutEvidence": "operator-statement",
        "supply.looped": home.looped,
        ...unit(home.unitA),
        ...demand[home.road](home),
      });
      expect(assessment.demand.afterA?.[0]).toBeCloseTo(home.afterA, 2);
      expect(assessment.route.demand).toBe(home.route);
    });
});
