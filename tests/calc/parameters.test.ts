import { describe, expect, test } from "vitest";
import { entryAt, NoValueInForce, parameter, valueAt } from "@/lib/calc/parameter";
import { wiringParameters } from "@/lib/calc/parameters/register";
import { citedOn } from "@/lib/calc/parameters/wiring-edition";
import { sourceOf, sources } from "@/lib/calc/sources";
import { wiringSources } from "@/lib/calc/sources/wiring";

const dayAfter = (day: string) => new Date(Date.parse(`${day}T00:00:00Z`) + 86_400_000).toISOString().slice(0, 10);

describe("register of wiring figures", () => {
  test.each(wiringParameters.map((figure) => [figure.id, figure] as const))("%s", (_id, figure) => {
    expect(figure.meaning).toMatch(/\.$/);
    expect(figure.unit.length).toBeGreaterThan(0);
    for (const entry of figure.values) {
      expect(sourceOf(entry.source).source.title.length).toBeGreaterThan(0);
      expect(["seen", "derived", "from memory: verify"]).toContain(entry.certainty);
    }
    const sorted = [...figure.values].sort((a, b) => a.from.localeCompare(b.from));
    sorted.slice(0, -1).forEach((entry, index) => {
      expect(entry.to, `${figure.id} has an open entry before the last`).toBeDefined();
      expect(sorted[index + 1]!.from).toBe(dayAfter(entry.to!));
    });
    expect(sorted.at(-1)!.to, `${figure.id} ends`).toBeUndefined();
  });

  test("ids are its own", () => {
    const ids = wiringParameters.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test("every figure answers on the first day of the 18th edition held here, and none before", () => {
    for (const figure of wiringParameters) {
      expect(() => valueAt(figure, "2018-07-01")).not.toThrow();
      expect(() => entryAt(figure, "2018-06-30")).toThrow(NoValueInForce);
    }
  });
});

describe("sources", () => {
  test("ids stand once and each entry names a title and a publisher", () => {
    const ids = sources.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const source of wiringSources) {
      expect(source.title.length).toBeGreaterThan(0);
      expect(source.publisher.length).toBeGreaterThan(0);
      expect(source.seen === "not seen").toBe(source.seenOn === null);
    }
  });

  test("labels for tables are short and each its own", () => {
    const labels = new Map(sources.map(({ short, id }) => [short, id]));
    // Two ids stand for the program's own choices: one label serves both.
    expect(labels.size).toBe(sources.length - 1);
    for (const { short } of sources) expect(short.length, short).toBeLessThanOrEqual(30);
  });

  test("an unknown reference is an error", () => {
    expect(() => sourceOf("A book nobody holds")).toThrow(/No source/);
  });

  // BS 7671:2018+A4:2026 is required from 15 October 2026: the previous text was withdrawn that day (BSI).
  test.each([
    ["2020-07-31", "BS 7671:2018 722.531"],
    ["2020-08-01", "BS 7671:2018+A1:2020 722.531"],
    ["2022-09-28", "BS 7671:2018+A2:2022 722.531"],
    ["2026-10-14", "BS 7671:2018+A2:2022 722.531"],
    ["2026-10-15", "BS 7671:2018+A4:2026 722.531"],
  ])("work of %s cites %s", (on, cited) => {
    expect(citedOn("BS 7671 722.531", on)).toBe(cited);
    expect(citedOn("IEC 62955", on)).toBe("IEC 62955");
  });
});

test("a day between two entries is an error, never the latest entry", () => {
  const gappy = parameter({
    id: "test.gappy",
    unit: "A",
    meaning: "A figure with a gap.",
    values: [
      { from: "2019-01-01", to: "2019-12-31", value: 1, source: "IEC 60228", certainty: "seen" },
      { from: "2021-01-01", value: 2, source: "IEC 60228", certainty: "seen" },
    ],
  });
  expect(valueAt(gappy, "2019-06-01")).toBe(1);
  expect(() => valueAt(gappy, "2020-06-01")).toThrow(/no value in force on 2020-06-01/);
});
