import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  cameFrom,
  heldBack,
  isAnswered,
  isOver,
  isSent,
  submissionMoves,
  submissionPurposes,
  submissionStates,
  type SubmissionState,
} from "@/lib/notify/submission";

const purpose = fc.constantFrom(...submissionPurposes);
const approvals: SubmissionState[] = ["approved", "approved-with-limit", "approved-works-to-follow"];
const moves = submissionPurposes.flatMap((each) =>
  submissionStates.flatMap((from) => submissionMoves(from, each).map((move) => ({ from, purpose: each, ...move }))),
);

describe("the life of a paper", () => {
  // Silence is never taken as consent.
  it("comes to an approval only by the operator’s word, with its reference and its day", () => {
    const approving = moves.filter(({ to }) => approvals.includes(to));
    expect(approving.length).toBeGreaterThan(0);
    for (const { by, needs } of approving) {
      expect(by).toBe("reply");
      expect(needs).toEqual(expect.arrayContaining(["reference", "decision-day"]));
    }
  });

  it("never approves before it was sent, and never a notice", () => {
    for (const { from, to, purpose: each } of moves.filter((move) => approvals.includes(move.to))) {
      expect(isSent(from), `${from} to ${to}`).toBe(true);
      expect(["application", "generation-application"]).toContain(each);
    }
  });

  it("asks for the limit where a limit is approved, and for the last day of an offer", () => {
    for (const { to, needs } of moves) {
      if (to === "approved-with-limit") expect(needs).toContain("limit");
      if (to === "offer-open") expect(needs).toContain("expires");
    }
  });

  it("keeps its purpose to one move per target and never stays where it is", () => {
    fc.assert(
      fc.property(purpose, fc.constantFrom(...submissionStates), (each, from) => {
        const targets = submissionMoves(from, each).map(({ to }) => to);
        expect(new Set(targets).size).toBe(targets.length);
        expect(targets).not.toContain(from);
      }),
    );
  });

  it("can always be finished, from every state but the ends", () => {
    for (const each of submissionPurposes)
      for (const from of submissionStates) {
        const reached = new Set<SubmissionState>([from]);
        for (const state of reached) for (const { to } of submissionMoves(state, each)) reached.add(to);
        expect(reached.has("closed") || reached.has("withdrawn"), from).toBe(true);
        if (isOver(from)) expect(submissionMoves(from, each)).toEqual([]);
      }
  });

  it("guards a move with the states it may come from", () => {
    expect(cameFrom("queued")).toEqual(["draft", "bounced"]);
    expect(cameFrom("submitted")).toEqual(["draft", "queued", "bounced"]);
    expect(cameFrom("approved", "demand-notice")).toEqual([]);
    expect(cameFrom("recorded", "application")).toEqual([]);
    expect(cameFrom("approved", "application")).toEqual([
      "submitted",
      "acknowledged",
      "question",
      "works-required",
      "offer-open",
    ]);
  });

  it("counts as answered only what the operator answered", () => {
    expect(isAnswered("submitted")).toBe(false);
    expect(isAnswered("acknowledged")).toBe(false);
    expect(isAnswered("refused")).toBe(true);
  });
});

// No other paper counts as sent until the report is recorded.
describe("a stopped job", () => {
  it("lets the safety report leave and nothing else", () => {
    for (const each of submissionPurposes) {
      const held = heldBack({ purpose: each, route: "stop", safetyReport: null });
      expect(held === null).toBe(each === "safety-report");
    }
  });

  it("holds other papers while a safety report waits, also when the record no longer says stop", () => {
    for (const state of ["draft", "queued", "bounced"] as const)
      expect(heldBack({ purpose: "demand-notice", route: "notify", safetyReport: state })).toMatch(/safety report/i);
    expect(heldBack({ purpose: "demand-notice", route: "notify", safetyReport: "submitted" })).toBeNull();
    expect(heldBack({ purpose: "demand-notice", route: "notify", safetyReport: "withdrawn" })).toBeNull();
    expect(heldBack({ purpose: "demand-notice", route: "notify", safetyReport: null })).toBeNull();
    expect(heldBack({ purpose: "demand-notice", route: null, safetyReport: null })).toMatch(/contradicts/);
  });
});
