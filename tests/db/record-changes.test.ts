import { describe, expect, it } from "vitest";
import { exampleRecord } from "./fixture";
import { applyChanges, differences, factAt, stepsOf } from "@/db/record-changes";
import { parseDraft, type Job } from "@/lib/notify/job";

/** The paths are those of job-record.md; that keys of Object.prototype are refused is OWASP's prototype pollution sheet. */
function draft(): Job {
  const parsed = parseDraft({ ...exampleRecord(), jobNumber: "T-1" });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
  return parsed.value;
}

const fresh = { stale: false, listsMoved: false };
const behind = { stale: true, listsMoved: false };

describe("paths", () => {
  it("reads names and places in lists", () => {
    expect(stepsOf("circuits[0].cable.lengthM")).toEqual(["circuits", 0, "cable", "lengthM"]);
    expect(stepsOf("supply.looped")).toEqual(["supply", "looped"]);
  });

  it.each([
    "",
    ".supply",
    "supply..looped",
    "circuits[x]",
    "circuits[-1]",
    "__proto__.x",
    "constructor",
    "a.prototype",
  ])("refuses %j", (path) => expect(stepsOf(path)).toBeNull());
});

describe("applying changes", () => {
  it("puts each fact in its place and leaves the record it was given alone", () => {
    const record = draft();
    const applied = applyChanges(
      record,
      [
        { path: "supply.looped", was: "no", value: "unknown" },
        { path: "circuits[0].cable.lengthM", was: 18, value: 21.5 },
        { path: "chargepoints[0].replaces", was: null, value: { make: "Kestrel" } },
      ],
      fresh,
    );
    if (applied.kind !== "applied") throw new Error(applied.kind);
    const steps = (path: string) => stepsOf(path) ?? [];
    expect(factAt(applied.record, steps("supply.looped"))).toBe("unknown");
    expect(factAt(applied.record, steps("circuits[0].cable.lengthM"))).toBe(21.5);
    expect(factAt(applied.record, steps("chargepoints[0].replaces.make"))).toBe("Kestrel");
    expect(record.supply.looped).toBe("no");
    expect(applied.paths).toHaveLength(3);
  });

  it("keeps both values of a fact that somebody else changed meanwhile", () => {
    const record = draft();
    const change = { path: "supply.cutOutRatingA", was: 60, value: 80 };
    expect(applyChanges(record, [change], behind)).toEqual({
      kind: "conflict",
      conflicts: [{ path: "supply.cutOutRatingA", was: 60, yours: 80, theirs: 100 }],
    });
  });

  it("is no conflict when both now say the same, or when nobody changed that fact", () => {
    const record = draft();
    const agreed = { path: "supply.cutOutRatingA", was: 60, value: 100 };
    const untouched = { path: "supply.looped", was: "no", value: "feeds-neighbour" };
    expect(applyChanges(record, [agreed, untouched], behind)).toMatchObject({
      kind: "applied",
      paths: ["supply.looped"],
    });
  });

  it("does not trust a place in a list that was reordered meanwhile", () => {
    const change = { path: "circuits[0].cable.lengthM", was: 18, value: 30 };
    expect(applyChanges(draft(), [change], { stale: true, listsMoved: true }).kind).toBe("conflict");
  });

  it("refuses the format, the number and what lies beyond the end of a list", () => {
    const changes = [
      { path: "jobNumber", was: "T-1", value: "T-2" },
      { path: "format", was: "sealwire.job/1", value: "x" },
      { path: "circuits[7].kind", was: null, value: "final" },
    ];
    const applied = applyChanges(draft(), changes, fresh);
    expect(applied.kind === "invalid" && applied.fields.map(({ path }) => path)).toEqual([
      "jobNumber",
      "format",
      "circuits[7].kind",
    ]);
  });
});

it("tells what changed leaf by leaf", () => {
  const was = draft();
  const now = structuredClone(was);
  now.supply.looped = "unknown";
  now.demand.existingA = [30];
  expect(differences(was, now)).toEqual([
    { path: "supply.looped", was: "no", now: "unknown" },
    { path: "demand.existingA[0]", was: 24.8, now: 30 },
  ]);
});
