import { describe, expect, it } from "vitest";
import { jobJsonSchema, parseDraft, parseJob } from "@/lib/notify/job";

// The record's own contract: our design, no outside source.
const record = (changes: Record<string, unknown> = {}) => ({
  format: "sealwire.job/1",
  jobNumber: "FEN-0001",
  stage: "installed",
  dates: { installed: "2026-11-20" },
  ...changes,
});

const fieldsOf = (input: unknown, parse = parseJob) => {
  const parsed = parse(input);
  return parsed.ok ? [] : parsed.fields;
};

describe("reading a record", () => {
  it("reads omitted, null and blank facts as not asked, and keeps unknown and empty lists apart", () => {
    const parsed = parseDraft(
      record({
        supply: { cutOutRatingA: "unknown", looped: null, bonding: [] },
        customer: { name: "  " },
        cutOutSeenUnder: undefined,
      }),
    );
    expect(parsed.ok && parsed.value.supply).toMatchObject({
      cutOutRatingA: "unknown",
      looped: null,
      bonding: [],
      phases: null,
    });
    expect(parsed.ok && parsed.value.customer.name).toBeNull();
    expect(parsed.ok && parsed.value.supply.cutOutSeenUnder).toEqual({ authority: null, on: null });
  });

  it("refuses a null inside a list, so that no phase drops out unseen", () => {
    expect(fieldsOf(record({ demand: { existingA: [20, null, 18] } }))).toEqual([
      { path: "demand.existingA[1]", message: expect.stringContaining("must be a number in A") },
    ]);
  });

  it("names the facts it did not read", () => {
    const parsed = parseDraft(
      record({ suply: { phases: 1 }, supply: { phase: 1 }, circuits: [{ id: "a", cabel: 1 }] }),
    );
    expect(parsed.ok && parsed.unread).toEqual(["suply", "supply.phase", "circuits[0].cabel"]);
  });

  it("says one line a field, with the remedy", () => {
    const fields = fieldsOf(
      record({
        supply: { cutOutRatingA: 1000, looped: "maybe", phases: "1" },
        dates: { installed: "2062-01-01", sold: "2026-02-30" },
      }),
    );
    expect(fields.map(({ path }) => path).sort()).toEqual(
      ["dates.installed", "dates.sold", "supply.cutOutRatingA", "supply.looped", "supply.phases"].sort(),
    );
    for (const { message } of fields) expect(message.length).toBeGreaterThan(10);
  });

  it.each([null, 3, "text", []])("refuses %j with a sentence", (input) => {
    expect(fieldsOf(input)).toHaveLength(1);
  });

  it.each([
    [{ dates: {} }, "dates.installed"],
    [{ dates: { installed: "2026-11-20", commissioned: "2026-11-19" } }, "dates.commissioned"],
    [{ supply: { phases: 1 }, chargepoints: [{ id: "a", phases: 3 }] }, "chargepoints[0].phases"],
    [
      { chargepoints: [{ id: "a", smartCharging: { soldByFirm: true, transfer: "none" } }] },
      "chargepoints[0].smartCharging.transfer",
    ],
    [{ chargepoints: [{ id: "a" }, { id: "a" }] }, "chargepoints[1].id"],
    [{ chargepoints: [{ id: "a", circuit: "no" }] }, "chargepoints[0].circuit"],
    [{ circuits: [{ id: "a", board: "no" }] }, "circuits[0].board"],
    [{ circuits: [{ id: "a", fedFrom: "a" }] }, "circuits[0].fedFrom"],
  ])("refuses facts that contradict each other: %j", (changes, path) => {
    expect(fieldsOf(record(changes)).map((field) => field.path)).toEqual([path]);
    expect(fieldsOf(record(changes), parseDraft as typeof parseJob)).toEqual([]);
  });

  it("finds a ring of circuits that feed each other", () => {
    const ring = record({
      circuits: [
        { id: "a", fedFrom: "b" },
        { id: "b", fedFrom: "a" },
        { id: "c", fedFrom: "b" },
      ],
    });
    expect(fieldsOf(ring).map(({ path }) => path)).toEqual(["circuits[0].fedFrom", "circuits[1].fedFrom"]);
  });

  it("serves a JSON Schema that asks only for what a record cannot be without", () => {
    const schema = jobJsonSchema() as { required: string[]; properties: Record<string, unknown> };
    expect(schema.required.sort()).toEqual(["format", "jobNumber", "stage"]);
    expect(Object.keys(schema.properties)).toContain("chargepoints");
  });
});
