import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, colleague, exampleRecord, openJob, soleTrader, value } from "./fixture";
import { atTime } from "@/db/clock";
import { assessJob } from "@/db/queries/assessments";
import { listEvents } from "@/db/queries/events";
import { listJobs } from "@/db/queries/jobs";
import { listOperators, saveOperatorSettings, type OperatorInput } from "@/db/queries/operators";
import { addOperator, changeOperator, removeOperator } from "@/db/queries/operators-own";
import { supplyNumberOf } from "@/tests/notify/record";
import type { JobFilter } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

/** Issue of the rules: operators, overlays and distributor ids are a firm's to edit, without code, and said as such. */
const entry = {
  operatorId: "41",
  name: "Fenwold Estate Networks",
  kind: "idno" as const,
  division: null,
  from: "2026-01-01",
  source: "the developer’s letter of 4 March",
};

const allJobs: JobFilter = {
  q: null,
  stage: null,
  standing: null,
  operatorId: null,
  route: null,
  installerId: null,
  sort: "number",
  after: null,
};

const settings = (operatorId: string, more: Partial<OperatorInput> = {}): OperatorInput => ({
  operatorId,
  noticeEmail: null,
  applicationEmail: null,
  phone: null,
  page: null,
  noticeDays: null,
  buriedSeparationM: null,
  note: null,
  ...more,
});

const rowOf = async (viewer: Viewer, id: string) =>
  value(await listOperators(viewer)).find((row) => row.entry.id === id);
const lastSentence = async (viewer: Viewer) =>
  value(await listEvents(viewer, { after: null, jobId: null })).rows[0]?.sentence;

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

describe("a firm's figures for an operator", () => {
  it("keep the day each was set, while neither it nor its grounds change", async () => {
    const rules = { asksFirstAboveA: 50, grounds: { asksFirstAboveA: { from: "2026-02-01", source: "a letter" } } };
    const first = await atTime("2026-11-02T09:00:00.000Z", () =>
      saveOperatorSettings(viewer, settings("23", { ...rules, noticeDays: 14 })),
    );
    expect(value(first).grounds).toEqual({
      noticeDays: { from: null, source: null, setOn: "2026-11-02" },
      asksFirstAboveA: { from: "2026-02-01", source: "a letter", setOn: "2026-11-02" },
    });
    const second = await atTime("2026-11-09T09:00:00.000Z", () =>
      saveOperatorSettings(viewer, settings("23", { ...rules, noticeDays: 7, phone: "01632 960155" })),
    );
    expect(value(second)).toMatchObject({
      noticeDays: 7,
      asksFirstAboveA: 50,
      assumesFuseA: null,
      grounds: { noticeDays: { setOn: "2026-11-09" }, asksFirstAboveA: { setOn: "2026-11-02" } },
    });
    expect((await rowOf(viewer, "23"))?.settings).toEqual(value(second));
    expect(await lastSentence(viewer)).toBe(
      "Changed the telephone number, the days for a notice for Northern Powergrid.",
    );
  });

  it("record a change of what one rests on, and nothing when nothing changed", async () => {
    const fuse = (source: string) =>
      settings("15", { assumesFuseA: 60, grounds: { assumesFuseA: { from: null, source } } });
    value(await saveOperatorSettings(viewer, fuse("their page")));
    value(await saveOperatorSettings(viewer, fuse("their letter")));
    expect(await lastSentence(viewer)).toBe("Changed the fuse it refits for Northern Powergrid.");
    const before = value(await listEvents(viewer, { after: null, jobId: null })).rows[0]?.id;
    value(await saveOperatorSettings(viewer, fuse("their letter")));
    expect(value(await listEvents(viewer, { after: null, jobId: null })).rows[0]?.id).toBe(before);
  });

  it("reach the assessment, which says so", async () => {
    const other = await soleTrader();
    const jobId = await openJob(other, exampleRecord());
    expect(value(await assessJob(other, { jobId })).body.route.demand).toBe("notify");
    value(await saveOperatorSettings(other, settings("23", { asksFirstAboveA: 40 })));
    const { body } = value(await assessJob(other, { jobId }));
    expect(body.route.demand).toBe("late-application");
    expect(body.route.reasons.find(({ rule }) => rule === "route.demand-over-60A")).toMatchObject({
      used: { registerLimitA: 60, firmLimitA: 40 },
    });
  });

  it("go when they are cleared", async () => {
    value(await saveOperatorSettings(viewer, settings("13", { buriedSeparationM: 4 })));
    expect(value(await saveOperatorSettings(viewer, settings("13"))).grounds).toEqual({});
  });
});

describe("a distributor id that the register lacks", () => {
  it("is entered by the firm, listed after the register, and names the jobs that waited for it", async () => {
    const firm = await soleTrader();
    const listed = async () => value(await listJobs(firm, allJobs)).rows;
    const jobId = await openJob(
      firm,
      exampleRecord((record) => void (record.site.supplyNumber = supplyNumberOf("41"))),
    );
    expect(await listed()).toMatchObject([{ operatorId: "unknown", operatorName: "Operator not known" }]);
    const made = value(await addOperator(firm, entry));
    expect(made).toMatchObject({ id: "41", name: "Fenwold Estate Networks", from: "2026-01-01" });
    const rows = value(await listOperators(firm));
    expect(rows.at(-1)).toMatchObject({ entry: { id: "41", kind: "idno" }, own: made, openJobs: 1 });
    expect(await listed()).toMatchObject([{ operatorId: "41", operatorName: "Fenwold Estate Networks" }]);
    const { body } = value(await assessJob(firm, { jobId }));
    expect(body.operator).toMatchObject({ id: "41", name: "Fenwold Estate Networks" });
    expect(body.cautions.join("\n")).toContain("the firm’s own entry");
    value(await saveOperatorSettings(firm, settings("41", { noticeDays: 5 })));
    expect(codeOf(await removeOperator(firm, { operatorId: "41" }))).toBe("conflict");
  });

  it("is changed and taken out again, each act on the record", async () => {
    value(await addOperator(viewer, { ...entry, operatorId: "42" }));
    expect(await lastSentence(viewer)).toMatch(/^Entered Fenwold Estate Networks as distributor 42 from 2026-01-01/);
    value(await changeOperator(viewer, { ...entry, operatorId: "42", name: "Thrale Networks", kind: "dno" }));
    expect(await lastSentence(viewer)).toBe(
      "Changed the name, the kind of the firm’s own entry for distributor 42, Thrale Networks.",
    );
    const last = value(await listEvents(viewer, { after: null, jobId: null })).rows[0]?.id;
    value(await changeOperator(viewer, { ...entry, operatorId: "42", name: "Thrale Networks", kind: "dno" }));
    expect(value(await listEvents(viewer, { after: null, jobId: null })).rows[0]?.id).toBe(last);
    value(await saveOperatorSettings(viewer, settings("42", { phone: "01632 960156" })));
    expect(await lastSentence(viewer)).toBe("Changed the telephone number for Thrale Networks.");
    expect(value(await removeOperator(viewer, { operatorId: "42" }))).toBeNull();
    expect(await lastSentence(viewer)).toMatch(/^Took out .* 42, Thrale Networks\.$/);
    expect(await rowOf(viewer, "42")).toBeUndefined();
    value(await addOperator(viewer, { ...entry, operatorId: "42" }));
    expect((await rowOf(viewer, "42"))?.settings.phone).toBeNull();
  });

  it.each([
    ["23", "invalid"],
    ["00", "invalid"],
    ["4", "invalid"],
    ["ni", "invalid"],
    ["041", "invalid"],
  ])("is refused as %s: %s", async (operatorId, code) => {
    expect(codeOf(await addOperator(viewer, { ...entry, operatorId }))).toBe(code);
  });

  it("is entered once, and not there to change before", async () => {
    expect(codeOf(await changeOperator(viewer, { ...entry, operatorId: "57" }))).toBe("not-found");
    expect(codeOf(await removeOperator(viewer, { operatorId: "57" }))).toBe("not-found");
    value(await addOperator(viewer, { ...entry, operatorId: "57" }));
    expect(codeOf(await addOperator(viewer, { ...entry, operatorId: "57" }))).toBe("conflict");
  });

  it("is an admin’s to enter, a member’s to read, and no other firm’s to see", async () => {
    const installer = await colleague(viewer, ["installer"]);
    value(await addOperator(viewer, { ...entry, operatorId: "66" }));
    expect(codeOf(await addOperator(installer, { ...entry, operatorId: "67" }))).toBe("forbidden");
    expect(codeOf(await changeOperator(installer, { ...entry, operatorId: "66" }))).toBe("forbidden");
    expect(codeOf(await removeOperator(installer, { operatorId: "66" }))).toBe("forbidden");
    expect((await rowOf(installer, "66"))?.own?.name).toBe(entry.name);
    const stranger = await soleTrader();
    expect(await rowOf(stranger, "66")).toBeUndefined();
    expect(codeOf(await saveOperatorSettings(stranger, settings("66", { note: randomUUID() })))).toBe("not-found");
  });
});
