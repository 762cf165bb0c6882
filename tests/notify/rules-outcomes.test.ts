import { describe, expect, it } from "vitest";
import { rulesList } from "@/lib/notify/rules-list";
import { sourceOf } from "@/lib/calc/sources";
import { assess } from "@/lib/notify/assess";
import type { FirmRules } from "@/lib/notify/firm-rules";
import { firmCases } from "./firm-cases";
import { casesIn, jobWith, type Changes } from "./record";

const own = rulesList.filter(({ group }) => group === "route" || group === "generation" || group === "settings");

/** Further cases, each for an outcome that no other check case gives. Common practice, no source. */
const further: readonly Changes[] = casesIn("network/each-outcome.json").map(({ changes }) => changes);

const given = new Map<string, Set<string>>();
const cases: { changes: Changes; firm?: FirmRules }[] = [
  { changes: {} },
  ...casesIn("network/check-cases.json"),
  ...casesIn("legislation/check-cases.json"),
  ...further.map((changes) => ({ changes })),
  ...firmCases,
];
for (const { changes, firm } of cases) {
  const { route, checks, smartCharging } = assess(jobWith(changes), "2026-12-01", firm);
  for (const { rule, outcome } of [...route.reasons, ...checks, ...smartCharging])
    given.set(rule, (given.get(rule) ?? new Set()).add(outcome));
}

describe("the rules list", () => {
  it("has each id once, a source known to the register and something it reads", () => {
    const ids = rulesList.map(({ id }) => id);
    expect(ids.filter((id, index) => ids.indexOf(id) !== index)).toEqual([]);
    for (const { id, sources } of rulesList) {
      expect(sources.length, id).toBeGreaterThan(0);
      for (const source of sources) expect(() => sourceOf(source), `${id}: ${source}`).not.toThrow();
    }
  });

  it("lists every rule that ever answered", () => {
    const ids = new Set(rulesList.map(({ id }) => id));
    expect([...given.keys()].filter((id) => !ids.has(id))).toEqual([]);
  });

  for (const { id, outcomes, group } of own)
    it(`${id} has a case for each outcome it declares, and gives no other`, () => {
      const seen = given.get(id) ?? new Set();
      const allowed = group === "settings" ? new Set([...outcomes, "not-applicable"]) : new Set<string>(outcomes);
      expect([...seen].filter((outcome) => !allowed.has(outcome))).toEqual([]);
      expect(outcomes.filter((outcome) => !seen.has(outcome))).toEqual([]);
    });
});
