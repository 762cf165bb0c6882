import { describe, expect, test } from "vitest";
import checkTable from "@/tests/cases/wiring/check-table.json";
import workedExamples from "@/tests/cases/wiring/worked-examples.json";
import { sums } from "./sums";

type Case = {
  id: string;
  sum: string;
  input: Record<string, unknown>;
  expected: number | boolean | null;
  tolerance: number | null;
  source: string;
};

const sets: [string, Case[]][] = [
  ["check table", checkTable as Case[]],
  ["worked examples", workedExamples as Case[]],
];

describe.each(sets)("%s", (_name, cases) => {
  test.each(cases)("$id: $sum", ({ sum, input, expected, tolerance, source }) => {
    expect(source.length).toBeGreaterThan(0);
    const result = sums[sum]!(input);
    if (typeof expected !== "number") expect(result).toBe(expected);
    else expect(Math.abs((result as number) - expected)).toBeLessThanOrEqual(tolerance ?? 0);
  });
});

test("every sum has a case", () => {
  const used = new Set(sets.flatMap(([, cases]) => cases.map((one) => one.sum)));
  expect(Object.keys(sums).filter((name) => !used.has(name))).toEqual([]);
});
