import { describe, expect, it } from "vitest";
import {
  chosen,
  currentRecord,
  edited,
  held,
  inConflict,
  newDraft,
  refused,
  saved,
  unsentCount,
  withBatch,
} from "@/components/drafts/draft-state";
import { factAt } from "@/components/drafts/facts-at";
import { parseDraft, type Job } from "@/lib/notify/job";

function record(): Job {
  const parsed = parseDraft({
    format: "sealwire.job/1",
    jobNumber: "FEN-0001",
    stage: "planned",
    circuits: [{ id: "main" }],
    chargepoints: [{ id: "cp1" }],
  });
  if (!parsed.ok) throw new Error("the record does not parse");
  return parsed.value;
}
const summary = { route: null, headline: "", missing: [], lastDay: null, daysLeft: null, fields: [] };
const begun = () => newDraft(record(), 4);

describe("a draft", () => {
  it("remembers what a fact was when the person began, however often it is changed", () => {
    const state = edited(edited(begun(), "supply.tailsMm2", 16, 1), "supply.tailsMm2", 25, 2);
    expect(state.pending).toEqual([{ path: "supply.tailsMm2", was: null, value: 25 }]);
    expect(state.since).toBe(1);
  });

  it("has nothing to send once a fact is what it was", () => {
    const state = edited(edited(begun(), "supply.tailsMm2", 25, 1), "supply.tailsMm2", null, 2);
    expect(state.pending).toEqual([]);
  });

  it("folds a change inside a new item into the item", () => {
    const added = edited(begun(), "chargepoints[1]", { id: "cp2", make: null }, 1);
    const named = edited(added, "chargepoints[1].make", "Kestrel", 2);
    expect(named.pending).toEqual([{ path: "chargepoints[1]", was: null, value: { id: "cp2", make: "Kestrel" } }]);
    expect(factAt(currentRecord(named), "chargepoints[1].make")).toBe("Kestrel");
  });

  it("takes in what waits below when a whole list changes", () => {
    const state = edited(edited(begun(), "chargepoints[0].make", "Kestrel", 1), "chargepoints", [], 2);
    expect(state.pending.map(({ path }) => path)).toEqual(["chargepoints"]);
  });

  it("keeps a batch whole with its id until there is an answer", () => {
    const sending = withBatch(edited(begun(), "supply.phases", 1, 1), "save-1");
    expect(withBatch(edited(sending, "supply.looped", "no", 2), "save-2").sending?.saveId).toBe("save-1");
    const done = saved(sending, 5, summary);
    expect(done).toMatchObject({ version: 5, sending: null, since: null });
    expect(done.base.supply.phases).toBe(1);
  });

  it("counts a change made while its batch is on the way against what was sent", () => {
    const sending = withBatch(edited(begun(), "supply.phases", 1, 1), "save-1");
    expect(edited(sending, "supply.phases", 3, 2).pending).toEqual([{ path: "supply.phases", was: 1, value: 3 }]);
  });

  it("holds what was refused with its sentence and lets the rest go", () => {
    const two = edited(edited(begun(), "supply.cutOutRatingA", 1000, 1), "supply.phases", 1, 2);
    const state = refused(withBatch(two, "save-1"), [
      { path: "supply.cutOutRatingA", message: "must be at most 800 A" },
    ]);
    expect(state.held["supply.cutOutRatingA"]).toEqual({ typed: 1000, message: "must be at most 800 A" });
    expect(state.pending.map(({ path }) => path)).toEqual(["supply.phases"]);
  });

  it("lets go of what was held once it is answered again", () => {
    const wrong = held(begun(), "supply.externalLoopImpedanceOhm", "o.21", "must be a number");
    expect(unsentCount(wrong)).toBe(1);
    expect(edited(wrong, "supply.externalLoopImpedanceOhm", 0.21, 1).held).toEqual({});
  });

  it("keeps both values of a conflict until one is chosen", () => {
    const sending = withBatch(edited(edited(begun(), "supply.phases", 1, 1), "supply.looped", "no", 2), "save-1");
    const conflict = { path: "supply.phases", was: null, yours: 1, theirs: 3 };
    const state = inConflict(sending, { version: 6, conflicts: [conflict], changedBy: "Nia Beckwith" });
    expect(currentRecord(state).supply.phases).toBe(3);
    expect(state.pending.map(({ path }) => path)).toEqual(["supply.looped"]);
    expect(chosen(state, "supply.phases", "theirs", 3).conflicts).toEqual([]);
    const mine = chosen(state, "supply.phases", "yours", 3);
    expect(mine.pending).toContainEqual({ path: "supply.phases", was: 3, value: 1 });
    expect(currentRecord(mine).supply.phases).toBe(1);
  });
});
