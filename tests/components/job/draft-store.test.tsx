import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { createDraftStore } from "@/components/drafts/draft-store";
import { parseDraft, type Job } from "@/lib/notify/job";
import type { SaveRequest } from "@/lib/notify/views";

function record(): Job {
  const parsed = parseDraft({ format: "sealwire.job/1", jobNumber: "FEN-0001", stage: "planned" });
  if (!parsed.ok) throw new Error("the record does not parse");
  return parsed.value;
}
const assessment = { route: null, headline: "", missing: [], lastDay: null, daysLeft: null, fields: [] };
const open = (userId = "u1") => createDraftStore({ jobId: "j1", userId, record: record(), version: 1, summary: null });

const sent: SaveRequest[] = [];
/** A server that answers each request with the next of a list of answers. */
function serverAnswering(...answers: ((request: SaveRequest) => Response | Promise<Response>)[]) {
  let turn = 0;
  vi.stubGlobal(
    "fetch",
    vi.fn(async (address: string, init?: RequestInit) => {
      if (!address.endsWith("/saves")) return Response.json({}, { status: 404 });
      const request = JSON.parse(String(init?.body)) as SaveRequest;
      sent.push(request);
      const answer = answers[Math.min(turn, answers.length - 1)];
      turn += 1;
      if (!answer) throw new Error("no answer");
      return answer(request);
    }),
  );
}
const accept = ({ baseVersion }: SaveRequest) =>
  Response.json({ saved: true, version: baseVersion + 1, savedAt: "2026-12-01T09:00:00Z", assessment });
const lost = () => Promise.reject(new TypeError("network down"));

beforeEach(() => {
  vi.useFakeTimers();
  vi.spyOn(console, "warn").mockImplementation(() => undefined);
  window.localStorage.clear();
  sent.length = 0;
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe("saving a draft", () => {
  it("waits for quiet, then sends what changed in one batch", async () => {
    serverAnswering(accept);
    const store = open();
    store.edit("supply.phases", 1);
    store.edit("supply.looped", "no");
    expect(sent).toEqual([]);
    await vi.advanceTimersByTimeAsync(700);
    expect(sent.map(({ changes }) => changes.length)).toEqual([2]);
    expect(store.view()).toMatchObject({ standing: "saved", unsent: 0, version: 2 });
    expect(window.localStorage.length).toBe(0);
  });

  it("sends the same batch under the same id until it is answered", async () => {
    serverAnswering(lost, lost, accept);
    const store = open();
    store.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(700);
    expect(store.view()).toMatchObject({ standing: "unreachable", unsent: 1 });
    store.edit("supply.looped", "no");
    await vi.advanceTimersByTimeAsync(10_000);
    expect(new Set(sent.slice(0, 3).map(({ saveId }) => saveId)).size).toBe(1);
    expect(sent[2]?.changes).toEqual([{ path: "supply.phases", was: null, value: 1 }]);
    expect(sent[3]?.changes).toEqual([{ path: "supply.looped", was: null, value: "no" }]);
    expect(store.view().unsent).toBe(0);
  });

  it("finds what a closed tab left unsent, and sends it under its old id", async () => {
    serverAnswering(lost);
    const before = open();
    before.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(700);
    const id = sent[0]?.saveId;
    serverAnswering(accept);
    const after = open();
    const stop = after.start();
    expect(after.view().record.supply.phases).toBe(1);
    await vi.advanceTimersByTimeAsync(10);
    expect(sent.at(-1)?.saveId).toBe(id);
    stop();
  });

  it("never sends another person’s draft on the same device", () => {
    serverAnswering(lost);
    open("u1").edit("supply.phases", 1);
    const other = open("u2");
    other.start();
    expect(other.view()).toMatchObject({ unsent: 0 });
    expect(other.view().record.supply.phases).toBeNull();
  });

  it("starts again when the network comes back", async () => {
    serverAnswering(lost, lost, lost, lost, accept);
    const store = open();
    const stop = store.start();
    store.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(8_000);
    expect(store.view().standing).toBe("unreachable");
    window.dispatchEvent(new Event("online"));
    await vi.advanceTimersByTimeAsync(10);
    expect(store.view().standing).toBe("saved");
    stop();
  });

  it("sets aside a refused field and saves the rest", async () => {
    const fields = [{ path: "supply.cutOutRatingA", message: "must be between 5 and 800 A" }];
    const refuse = () => Response.json({ error: { code: "invalid", message: "Look again.", fields } }, { status: 422 });
    serverAnswering(refuse, accept);
    const store = open();
    store.edit("supply.cutOutRatingA", 1000);
    store.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(2_000);
    expect(store.view().held["supply.cutOutRatingA"]).toEqual({ typed: 1000, message: "must be between 5 and 800 A" });
    expect(sent[1]?.changes.map(({ path }) => path)).toEqual(["supply.phases"]);
    expect(store.view().base.supply.phases).toBe(1);
  });

  it("shows both values of a conflict and sends the one that was chosen", async () => {
    const conflict = { path: "supply.phases", was: null, yours: 1, theirs: 3 };
    const dispute = () =>
      Response.json(
        { saved: false, reason: "conflict", version: 7, conflicts: [conflict], changedBy: "Nia Beckwith" },
        { status: 409 },
      );
    serverAnswering(dispute, accept);
    const store = open();
    store.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(700);
    expect(store.view()).toMatchObject({ conflicts: [conflict], changedBy: "Nia Beckwith", unsent: 1 });
    store.choose("supply.phases", "yours");
    await vi.advanceTimersByTimeAsync(10);
    expect(sent[1]).toMatchObject({ baseVersion: 7, changes: [{ path: "supply.phases", was: 3, value: 1 }] });
  });

  it("keeps everything when the person is signed out", async () => {
    serverAnswering(() => Response.json({ error: {} }, { status: 401 }));
    const store = open();
    store.edit("supply.phases", 1);
    await vi.advanceTimersByTimeAsync(700);
    expect(store.view()).toMatchObject({ standing: "signed-out", unsent: 1 });
    expect(window.localStorage.length).toBe(1);
  });

  it("says so and still works when the device has no room", () => {
    serverAnswering(lost);
    vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("full", "QuotaExceededError");
    });
    const store = open();
    store.edit("supply.phases", 1);
    expect(store.view()).toMatchObject({ kept: false, unsent: 1 });
    expect(store.view().record.supply.phases).toBe(1);
  });
});
