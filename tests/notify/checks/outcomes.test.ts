import { describe, expect, test } from "vitest";
import { sourceOf } from "@/lib/calc/sources";
import { circuitRules } from "@/lib/notify/checks/circuit";
import { demandRules } from "@/lib/notify/checks/demand/rules";
import { openPenRules } from "@/lib/notify/checks/open-pen";
import { powerQualityRules } from "@/lib/notify/checks/power-quality";
import { supplyRules } from "@/lib/notify/checks/supply";
import type { Outcome } from "@/lib/notify/result";
import rows from "@/tests/cases/wiring/outcomes.json";
import { reasonsFor, recordWith, type Changes } from "./record";

type Row = {
  rule: string;
  outcome: Outcome;
  change: Changes;
  of?: string;
  says?: string;
  on?: string;
  operatorBuriedM?: number | null;
  source: string;
};
const cases = rows as Row[];
const rules = [...demandRules, ...supplyRules, ...circuitRules, ...openPenRules, ...powerQualityRules];
const about = new Map(rules.map((one) => [one.id, one]));

describe("each rule gives the outcome its case asks", () => {
  test.each(
    cases.map((row, index) => [`${index} ${row.rule} ${row.outcome} ${JSON.stringify(row.change)}`, row] as const),
  )("%s", (_title, row) => {
    const reasons = reasonsFor(recordWith(row.change), row.on, row.operatorBuriedM);
    const reason = reasons.find(({ rule, of }) => rule === row.rule && (row.of === undefined || of === row.of));
    expect(reason, "no such reason").toBeDefined();
    expect(`${reason!.outcome}: ${reason!.because}`).toContain(`${row.outcome}: `);
    if (row.says) expect([reason!.because, reason!.recorded, ...reason!.workings].join("\n")).toContain(row.says);
  });
});

test("every rule has a case for each outcome it declares", () => {
  const seen = new Set(cases.map(({ rule, outcome }) => `${rule} ${outcome}`));
  const declared = rules.flatMap(({ id, gives }) => gives.map((outcome) => `${id} ${outcome}`));
  expect(declared.filter((pair) => !seen.has(pair))).toEqual([]);
  expect([...seen].filter((pair) => !declared.includes(pair))).toEqual([]);
});

test("no reason gives an outcome its rule does not declare, and each is complete", () => {
  for (const row of cases)
    for (const reason of reasonsFor(recordWith(row.change), row.on, row.operatorBuriedM)) {
      const rule = about.get(reason.rule)!;
      const beforeFirstEdition = (row.on ?? "2026") < "2018-07-01" && reason.outcome === "cannot-tell";
      expect(beforeFirstEdition || rule.gives.includes(reason.outcome), `${reason.rule} ${reason.outcome}`).toBe(true);
      expect(reason.because).toMatch(/^[A-Z0-9].*\.$/s);
      expect(reason.because).not.toMatch(/NaN|undefined|null|Infinity|\[object/);
      expect(reason.workings.join("\n")).not.toMatch(/NaN|undefined|null|Infinity/);
      for (const reference of reason.sources) expect(() => sourceOf(reference)).not.toThrow();
    }
});

// What may never be said of a place, a unit or a device.
test("no sentence promises what was not looked at", () => {
  const banned = /\bis safe\b|\bsafe to use\b|\bcompliant\b|\bcomplies\b|limits? .* to 70 V/i;
  for (const row of cases)
    for (const reason of reasonsFor(recordWith(row.change), row.on))
      expect([reason.title, reason.because, ...reason.workings].join("\n")).not.toMatch(banned);
});

test("rule ids stand once, each with a title, sources and paths it reads", () => {
  expect(about.size).toBe(rules.length);
  for (const { id, group, title, reads, sources } of rules) {
    expect(id.startsWith(`${group}.`)).toBe(true);
    expect(title.length).toBeGreaterThan(0);
    expect(reads.length).toBeGreaterThan(0);
    expect(sources.length).toBeGreaterThan(0);
  }
});
