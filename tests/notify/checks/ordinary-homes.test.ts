import { describe, expect, test } from "vitest";
import { assess } from "@/lib/notify/assess";
import homes from "@/tests/cases/wiring/ordinary-homes.json";
import { recordWith, type Changes } from "./record";

type Series = { from: string; to: string; peakKwh: number };

/** Half hours of a steady small load with one high evening. */
function halfHours({ from, to, peakKwh }: Series) {
  const series: { start: string; kwh: number }[] = [];
  const firstEvening = Date.parse(`${from}T18:00:00Z`) + 2 * 86_400_000;
  for (let ms = Date.parse(from); ms < Date.parse(to); ms += 1_800_000)
    series.push({ start: new Date(ms).toISOString(), kwh: ms === firstEvening ? peakKwh : 0.3 });
  return series;
}

// Thirty homes a practitioner would know, and what is done with each.
describe("ordinary homes", () => {
  test.each(homes)("$id: $what", ({ change, afterA, route }) => {
    const { series, ...facts } = change as Changes & { series?: Series };
    const job = recordWith({
      "site.supplyNumber": "2399232323236",
      "site.supplyNumberKind": "import",
      "chargepoints.0.standards": ["61000-3-2", "61000-3-3", "61000-3-11", "61000-3-12"],
      ...facts,
      ...(series ? { "demand.halfHourKwh": halfHours(series) } : {}),
    });
    const assessment = assess(job, "2026-12-01");
    expect(assessment.demand.afterA).toHaveLength(afterA.length);
    assessment.demand.afterA!.forEach((amps, index) => expect(amps).toBeCloseTo(afterA[index]!, 2));
    expect(assessment.route.demand).toBe(route);
  });
});
