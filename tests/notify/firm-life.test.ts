import { describe, expect, it } from "vitest";
import { eventSchema, sentence, type FirmEvent } from "@/lib/notify/events";
import { may, permissions, type Permission } from "@/lib/notify/permissions";
import { reviewCameFrom, reviewMoves, reviewStates } from "@/lib/notify/review";
import { roles } from "@/lib/notify/roles";
import { standingOf, threadOf, type ThreadInput } from "@/lib/notify/thread";

describe("permissions", () => {
  it("give nothing to a person without a role", () => {
    for (const permission of Object.keys(permissions) as Permission[]) expect(may([], permission)).toBe(false);
  });

  it("add up over the roles of a person", () => {
    for (const permission of Object.keys(permissions) as Permission[])
      expect(may([...roles], permission)).toBe(roles.some((role) => may([role], permission)));
  });

  it("keep the judgement on settings with the compliance lead and the team with the admin", () => {
    expect(roles.filter((role) => may([role], "reviews.decide"))).toEqual(["compliance"]);
    expect(roles.filter((role) => may([role], "team.manage"))).toEqual(["admin"]);
  });
});

describe("a review", () => {
  it("is decided once, and never changed", () => {
    for (const state of reviewStates) expect(reviewMoves[state].length > 0).toBe(state === "waiting");
    expect(reviewCameFrom("approved")).toEqual(["waiting"]);
    expect(reviewCameFrom("waiting")).toEqual([]);
  });

  it("is returned only with a reason", () => {
    expect(reviewMoves.waiting.find(({ to }) => to === "returned")?.needs).toEqual(["reason"]);
  });
});

const job = { jobId: "j1", jobNumber: "FEN-0147" };
const pack = { ...job, packId: "p1", packVersion: 2 };
const paper = { ...job, submissionId: "s1", purpose: "demand-notice" as const };
const review = { ...job, reviewId: "r1" };
const v = { version: 1 as const };
const hash = "7be2c01d9f0e4a55b1c2";

const happened: [FirmEvent, string][] = [
  [{ type: "firm.created", ...v, name: "Fenwold Electrical Ltd" }, "Opened the account of Fenwold Electrical Ltd."],
  [{ type: "firm.changed", ...v, fields: ["address", "telephone"] }, "Changed the firm’s address, telephone."],
  [
    { type: "member.invited", ...v, invitationId: "i1", email: "x@fenwold.example.com", roles: ["installer"] },
    "Invited x@fenwold.example.com as installer.",
  ],
  [
    { type: "member.joined", ...v, userId: "u1", name: "Tam Orrell", roles: ["installer", "compliance"] },
    "Tam Orrell joined as installer, compliance lead.",
  ],
  [
    { type: "member.roles-set", ...v, userId: "u1", name: "Tam Orrell", was: ["installer"], now: [] },
    "Changed Tam Orrell from installer to no role.",
  ],
  [{ type: "member.suspended", ...v, userId: "u1", name: "Tam Orrell" }, "Suspended Tam Orrell."],
  [{ type: "member.reinstated", ...v, userId: "u1", name: "Tam Orrell" }, "Let Tam Orrell back in."],
  [
    { type: "invitation.withdrawn", ...v, invitationId: "i1", email: "x@fenwold.example.com" },
    "Withdrew the invitation to x@fenwold.example.com.",
  ],
  [{ type: "account.signed-in", ...v, userId: "u1" }, "Signed in."],
  [{ type: "account.session-ended", ...v, userId: "u1", sessionId: "s" }, "Ended a session."],
  [{ type: "account.password-reset", ...v, userId: "u1" }, "Set a new password."],
  [
    {
      type: "operator.settings-saved",
      ...v,
      operatorId: "23",
      operatorName: "Northern Powergrid",
      fields: ["address"],
    },
    "Changed address for Northern Powergrid.",
  ],
  [
    {
      type: "operator.entered",
      ...v,
      operatorId: "41",
      operatorName: "Fenwold Estate Networks",
      from: "2026-01-01",
      source: "a letter",
    },
    "Entered Fenwold Estate Networks as distributor 41 from 2026-01-01, which the register lacks (source: a letter).",
  ],
  [
    {
      type: "operator.entry-changed",
      ...v,
      operatorId: "41",
      operatorName: "Fenwold Estate Networks",
      fields: ["the name", "the day"],
    },
    "Changed the name, the day of the firm’s own entry for distributor 41, Fenwold Estate Networks.",
  ],
  [
    { type: "operator.entry-removed", ...v, operatorId: "41", operatorName: "Fenwold Estate Networks" },
    "Took out the firm’s own entry for distributor 41, Fenwold Estate Networks.",
  ],
  [{ type: "job.created", ...v, ...job, copiedFrom: null }, "Opened job FEN-0147."],
  [{ type: "job.created", ...v, ...job, copiedFrom: "FEN-0100" }, "Opened job FEN-0147, copied from FEN-0100."],
  [{ type: "job.saved", ...v, ...job, jobVersion: 3, paths: ["supply.looped"] }, "Recorded 1 fact on FEN-0147."],
  [
    { type: "job.conflict", ...v, ...job, jobVersion: 3, paths: ["a", "b"] },
    "2 facts on FEN-0147 had been changed by somebody else; both were kept.",
  ],
  [
    { type: "photo.added", ...v, ...job, photoId: "f", subject: "cut-out" },
    "Added a photo of the cut-out to FEN-0147.",
  ],
  [
    { type: "photo.changed", ...v, ...job, photoId: "f", subject: "cut-out" },
    "Changed a photo of the cut-out on FEN-0147.",
  ],
  [
    { type: "photo.removed", ...v, ...job, photoId: "f", subject: "cut-out" },
    "Removed a photo of the cut-out from FEN-0147.",
  ],
  [
    { type: "assessment.made", ...v, ...job, assessmentId: "a", route: "notify", ruleset: "2026-12-01.1" },
    "Assessed FEN-0147: notify, rule set 2026-12-01.1.",
  ],
  [
    { type: "pack.frozen", ...v, ...pack, gapsReason: "no signal" },
    "Froze version 2 of the pack of FEN-0147, with gaps stated.",
  ],
  [{ type: "pack.frozen", ...v, ...pack, gapsReason: null }, "Froze version 2 of the pack of FEN-0147."],
  [{ type: "pack.sealed", ...v, ...pack, sha256: hash }, "Sealed version 2 of the pack of FEN-0147, 7be2c01d."],
  [
    { type: "pack.failed", ...v, ...pack, logId: "L-1" },
    "Version 2 of the pack of FEN-0147 could not be built. Log entry L-1.",
  ],
  [{ type: "pack.downloaded", ...v, ...pack }, "Downloaded version 2 of the pack of FEN-0147."],
  [{ type: "submission.drafted", ...v, ...paper, packId: "p1" }, "Notice for FEN-0147 made ready."],
  [
    {
      type: "submission.sent",
      ...v,
      ...paper,
      channel: "e-mail",
      sentTo: "a@npg.example.com",
      sentOn: "2026-12-01",
      packId: "p1",
    },
    "Notice for FEN-0147 sent: e-mail, a@npg.example.com.",
  ],
  [
    { type: "submission.sent", ...v, ...paper, channel: "post", sentTo: null, sentOn: "2026-12-01", packId: null },
    "Notice for FEN-0147 sent: post.",
  ],
  [
    { type: "submission.moved", ...v, ...paper, from: "submitted", to: "acknowledged", reference: "26-1", on: null },
    "Notice for FEN-0147: from “No acknowledgement” to “Acknowledged”, reference 26-1.",
  ],
  [
    { type: "submission.moved", ...v, ...paper, from: "recorded", to: "closed", reference: null, on: null },
    "Notice for FEN-0147: from “Recorded by the operator” to “Closed”.",
  ],
  [
    { type: "submission.noted", ...v, ...paper, kind: "call", spokeTo: "the desk" },
    "Call on the notice for FEN-0147, spoke to the desk.",
  ],
  [{ type: "submission.noted", ...v, ...paper, kind: "note", spokeTo: null }, "Note on the notice for FEN-0147."],
  [{ type: "review.opened", ...v, ...review, packId: "p1" }, "Settings of FEN-0147 wait for review."],
  [{ type: "review.approved", ...v, ...review, packId: "p1" }, "Settings of FEN-0147: approved."],
  [
    { type: "review.returned", ...v, ...review, packId: "p1", reason: "Default hours." },
    "Settings of FEN-0147 returned: Default hours.",
  ],
  [
    { type: "review.superseded", ...v, ...review, byPackVersion: 3 },
    "Review of FEN-0147 superseded by version 3 of the pack.",
  ],
];

describe("events", () => {
  for (const [event, words] of happened)
    it(`${event.type} reads as a sentence`, () => {
      expect(eventSchema.parse(event)).toEqual(event);
      expect(sentence(event)).toBe(words);
    });

  it("all have a sentence here", () => {
    const types = eventSchema.options.map((option) => option.shape.type.value);
    expect(new Set(happened.map(([{ type }]) => type))).toEqual(new Set(types));
  });
});

const fresh: ThreadInput = {
  stage: "installed",
  factCount: 41,
  route: "notify",
  missingCount: 3,
  pack: null,
  submissions: [],
  review: null,
};
const words = (input: ThreadInput) => threadOf(input).map(({ standing, state }) => `${standing}: ${state}`);
const sealed = { version: 1, status: "sealed", sha256: hash } as const;
const notice = (state: ThreadInput["submissions"][number]["state"], reference: string | null = null) => ({
  purpose: "demand-notice" as const,
  state,
  reference,
});

describe("the thread", () => {
  it("of a job with facts missing is at its assessment", () => {
    expect(words(fresh)).toEqual([
      "passed: 41 facts recorded",
      "now: notify, 3 facts missing",
      "ahead: not sealed",
      "ahead: nothing sent",
      "ahead: waits for the pack",
    ]);
    expect(standingOf(fresh)).toBe("recording");
  });

  it("of a complete job is at its pack", () => {
    const ready = { ...fresh, missingCount: 0 };
    expect(words(ready)[2]).toBe("now: not sealed");
    expect(standingOf(ready)).toBe("ready-to-seal");
    expect(standingOf({ ...ready, route: "more-facts-needed" })).toBe("recording");
  });

  it("hangs the seal and goes on to the submission", () => {
    const done: ThreadInput = {
      ...fresh,
      missingCount: 0,
      pack: sealed,
      submissions: [notice("draft")],
      review: { state: "waiting" },
    };
    expect(threadOf(done)[2]).toEqual({
      name: "pack",
      standing: "passed",
      state: "version 1, sealed",
      hash8: "7be2c01d",
    });
    expect(words(done)[3]).toBe("now: ready, not sent");
    expect(words(done)[4]).toBe("now: in the queue");
    expect(standingOf(done)).toBe("sealed");
    expect(standingOf({ ...done, submissions: [notice("submitted")] })).toBe("sent");
    expect(standingOf({ ...done, submissions: [notice("recorded")] })).toBe("answered");
    expect(standingOf({ ...done, submissions: [notice("closed")] })).toBe("closed");
    expect(words({ ...done, submissions: [notice("acknowledged", "26-1")] })[3]).toBe("now: acknowledged, 26-1");
    expect(words({ ...done, submissions: [notice("recorded")] })[3]).toBe("passed: recorded by the operator");
    expect(words({ ...done, submissions: [notice("bounced"), notice("submitted")] })[3]).toBe("stopped: bounced");
    expect(words({ ...done, pack: { ...sealed, status: "building", sha256: null } })[2]).toBe(
      "now: version 1 is being sealed",
    );
    expect(standingOf({ ...done, pack: { ...sealed, status: "building" } })).toBe("sealing");
    expect(words({ ...done, pack: { ...sealed, status: "failed" } })[2]).toBe("stopped: version 1 could not be built");
  });

  it("has no seal to hang while a sealed pack’s hash is not known", () => {
    expect(threadOf({ ...fresh, pack: { ...sealed, sha256: null } })[2]?.hash8).toBeNull();
    expect(words({ ...fresh, factCount: 1 })[0]).toBe("passed: 1 fact recorded");
    expect(words({ ...fresh, stage: "planned", missingCount: 1 }).slice(0, 2)).toEqual([
      "passed: 41 facts recorded, planned",
      "now: notify, 1 fact missing",
    ]);
  });

  it("says what a review did", () => {
    const done: ThreadInput = { ...fresh, missingCount: 0, pack: sealed, submissions: [notice("recorded")] };
    expect(words({ ...done, review: { state: "returned" } })[4]).toBe("stopped: returned");
    expect(standingOf({ ...done, review: { state: "returned" } })).toBe("returned");
    expect(words({ ...done, review: { state: "approved" } })[4]).toBe("passed: approved");
    expect(words({ ...done, review: { state: "superseded" } })[4]).toBe("now: superseded");
    expect(words(done)[4]).toBe("now: not opened");
    expect(words({ ...done, stage: "planned" })[4]).toBe("now: after installing");
  });

  it("ends where danger or a contradiction stops it", () => {
    const stopped: ThreadInput = { ...fresh, route: "stop", missingCount: 0, factCount: null };
    expect(words(stopped).slice(0, 4)).toEqual([
      "passed: recorded",
      "stopped: stop, danger recorded",
      "ahead: safety report only",
      "ahead: nothing else may leave",
    ]);
    expect(standingOf(stopped)).toBe("stopped");
    expect(words({ ...fresh, route: null })[0]).toBe("stopped: facts contradict each other");
    expect(standingOf({ ...fresh, route: null })).toBe("recording");
  });
});
