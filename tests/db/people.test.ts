import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, colleague, openJob, sealAndBuild, soleTrader, value } from "./fixture";
import { endSession, listSessions } from "@/db/queries/account";
import { getFirm, saveFirm } from "@/db/queries/firms";
import { counts } from "@/db/queries/jobs";
import { listOperators, saveOperatorSettings } from "@/db/queries/operators";
import { approveReview, getReview, listReviews, returnReview, reviewOfJob } from "@/db/queries/reviews";
import { inviteMember, listTeam, setRoles, setStatus, withdrawInvitation } from "@/db/queries/team";
import { today } from "@/db/queries/today";
import { startSession } from "@/lib/server/auth/lucia";
import { tokenHash } from "@/lib/server/auth/tokens";
import { viewerOfToken } from "@/lib/server/auth/viewer-of-session";
import type { Viewer } from "@/lib/server/auth/viewer";

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

const reviewed = async () => {
  const jobId = await openJob(viewer);
  await sealAndBuild(viewer, jobId);
  const review = value(await reviewOfJob(viewer, { jobId }));
  if (!review) throw new Error("the pack has no review");
  return review;
};

describe("a review", () => {
  it("is decided once, by a compliance lead, as it stands", async () => {
    const { id: reviewId, version } = await reviewed();
    const installer = await colleague(viewer, ["installer"]);
    expect(codeOf(await approveReview(installer, { reviewId, version, note: null }))).toBe("forbidden");
    const decide = () => approveReview(viewer, { reviewId, version, note: null });
    expect((await Promise.all([decide(), decide()])).map(codeOf).toSorted()).toEqual(["conflict", "ok"]);
    expect(value(await getReview(viewer, { reviewId }))).toMatchObject({ state: "approved", decidedBy: viewer.name });
  });

  it("is returned only with a reason, which the installer then finds under today", async () => {
    const { id: reviewId, version, jobNumber } = await reviewed();
    expect(codeOf(await returnReview(viewer, { reviewId, version, reason: "  " }))).toBe("invalid");
    value(await returnReview(viewer, { reviewId, version, reason: "Photograph the hours again." }));
    const { installer } = value(await today(viewer));
    expect(installer?.returned).toContainEqual(
      expect.objectContaining({ jobNumber, reason: "Photograph the hours again.", by: viewer.name }),
    );
  });

  it("waits in the queue with its tally, the longest waiting first", async () => {
    await reviewed();
    const page = value(await listReviews(viewer, { state: "waiting", after: null }));
    const [first] = page.rows;
    expect(page.total).toBe(page.rows.length);
    expect(Object.values(first?.tally ?? {}).reduce((sum, count) => sum + count, 0)).toBeGreaterThan(20);
    expect(value(await counts(viewer)).reviews).toBe(page.total);
  });
});

describe("the team", () => {
  it("never loses its last admin", async () => {
    const firm = await soleTrader();
    const other = await colleague(firm, ["installer"]);
    const { userId } = firm;
    expect(codeOf(await setRoles(firm, { userId, roles: ["installer"] }))).toBe("invalid");
    expect(codeOf(await setStatus(firm, { userId, status: "suspended" }))).toBe("invalid");
    value(await setRoles(firm, { userId: other.userId, roles: ["admin"] }));
    expect(codeOf(await setRoles(firm, { userId, roles: ["installer"] }))).toBe("ok");
  });

  it("ends a suspended person's sessions at once", async () => {
    const other = await colleague(viewer, ["installer"]);
    const token = await startSession(other.userId, "Firefox on Linux");
    expect((await viewerOfToken(token))?.viewer.userId).toBe(other.userId);
    value(await setStatus(viewer, { userId: other.userId, status: "suspended" }));
    expect(await viewerOfToken(token)).toBeNull();
  });

  it("invites an address once; inviting it again takes the first invitation back", async () => {
    const email = "new.hand@thrale.example.com";
    value(await inviteMember(viewer, { email, roles: ["installer"] }));
    const { id } = value(await inviteMember(viewer, { email: email.toUpperCase(), roles: ["installer", "admin"] }));
    const open = value(await listTeam(viewer)).invitations;
    expect(open).toMatchObject([{ id, roles: ["installer", "admin"], invitedBy: viewer.name }]);
    value(await withdrawInvitation(viewer, { id }));
    expect(value(await listTeam(viewer)).invitations).toEqual([]);
    expect(codeOf(await withdrawInvitation(viewer, { id }))).toBe("not-found");
    expect(codeOf(await inviteMember(viewer, { email: viewer.email, roles: ["admin"] }))).toBe("invalid");
  });

  it("is managed by admins alone", async () => {
    const installer = await colleague(viewer, ["installer"]);
    expect(codeOf(await inviteMember(installer, { email: "a@thrale.example.com", roles: ["admin"] }))).toBe(
      "forbidden",
    );
    expect(codeOf(await setRoles(installer, { userId: viewer.userId, roles: ["installer"] }))).toBe("forbidden");
  });
});

describe("one's own sessions", () => {
  it("are listed and ended by their owner alone", async () => {
    const token = await startSession(viewer.userId, "Chrome on Android");
    const id = tokenHash(token);
    const other = await colleague(viewer, ["admin"]);
    expect(codeOf(await endSession(other, { id }))).toBe("not-found");
    expect(value(await listSessions(viewer, { currentId: id }))).toContainEqual(
      expect.objectContaining({ id, current: true, device: "Chrome on Android" }),
    );
    value(await endSession(viewer, { id }));
    expect(await viewerOfToken(token)).toBeNull();
  });
});

it("keeps what the firm sets for an operator, and refuses one the register does not know", async () => {
  const nothing = { noticeEmail: null, applicationEmail: null, phone: null, page: null, note: null };
  const settings = { operatorId: "17", ...nothing, noticeDays: 14, buriedSeparationM: 4 };
  value(await saveOperatorSettings(viewer, settings));
  const rows = value(await listOperators(viewer));
  expect(rows.find(({ entry }) => entry.id === "17")?.settings).toMatchObject(settings);
  expect(codeOf(await saveOperatorSettings(viewer, { ...settings, operatorId: "99" }))).toBe("not-found");
});

it("changes the firm's facts under a version", async () => {
  const { id: _id, numberPrefix: _prefix, ...facts } = value(await getFirm(viewer));
  value(await saveFirm(viewer, { ...facts, phone: "01632 960301" }));
  expect(codeOf(await saveFirm(viewer, { ...facts, phone: "01632 960302" }))).toBe("conflict");
  expect(value(await getFirm(viewer)).phone).toBe("01632 960301");
});
