import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import type { Assessment } from "@/lib/notify/assessment";
import { assess } from "@/lib/notify/assess";
import { parseJob } from "@/lib/notify/job";

const folder = new URL("../examples/", import.meta.url);
const read = (name: string) => JSON.parse(readFileSync(new URL(name, folder), "utf8"));
const expected: Record<string, Record<string, unknown>> = read("expected.json");

/** The value at "demand.afterA.0", "deadlines[demand-notice].lastDay" or "smartCharging[R10-1].outcome". */
function at(assessment: Assessment, path: string): unknown {
  return path
    .replace(/\[([^\]]+)\]/g, ".$1")
    .split(".")
    .reduce<unknown>((value, key) => {
      if (!Array.isArray(value)) return (value as Record<string, unknown> | undefined)?.[key];
      if (/^\d+$/.test(key)) return value[Number(key)];
      return value.find((entry) => entry.what === key || entry.rule === key);
    }, assessment);
}

describe("the worked records", () => {
  it("has an expectation for each record", () => {
    const records = readdirSync(folder).filter((name) => name.startsWith("fen-"));
    expect(records.map((name) => name.replace(".json", "")).sort()).toEqual(Object.keys(expected).sort());
  });

  for (const [name, values] of Object.entries(expected)) {
    it(`${name} holds its values`, () => {
      const parsed = parseJob(read(`${name}.json`));
      expect(parsed.ok).toBe(true);
      if (!parsed.ok) return;
      expect(parsed.unread).toEqual([]);
      const assessment = assess(parsed.value, "2026-12-01");
      for (const [path, value] of Object.entries(values)) expect.soft(at(assessment, path), path).toEqual(value);
    });
  }
});
