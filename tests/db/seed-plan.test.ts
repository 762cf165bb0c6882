import { describe, expect, it } from "vitest";
import { plannedJobs } from "@/db/seed/plan";
import { demoRecord } from "@/db/seed/records";
import { derive } from "@/db/job-columns";
import { noFirmRules } from "@/lib/notify/firm-rules";
import { parseDraft } from "@/lib/notify/job";
import { operatorRegister } from "@/lib/notify/operator-register";

/** The demo's rules are our own: fictional people and places, ranges reserved for drama, every operator served. */
const records = plannedJobs.map((job) => ({
  job,
  draft: parseDraft({ ...demoRecord(job, "2027-03-09"), jobNumber: "D-1" }),
}));

describe("the demo", () => {
  it("has sixty jobs under numbers of their own", () => {
    expect(plannedJobs).toHaveLength(60);
    expect(new Set(plannedJobs.map(({ number }) => number)).size).toBe(60);
  });

  it("reads as job records on any day it is seeded", () => {
    expect(records.filter(({ draft }) => !draft.ok || draft.unread.length > 0).map(({ job }) => job.number)).toEqual(
      [],
    );
  });

  it("contradicts itself nowhere and finds an operator for each job", () => {
    for (const { job, draft } of records) {
      if (!draft.ok) throw new Error(`job ${job.number} does not read`);
      const { summary, columns } = derive(draft.value, "2027-03-09", noFirmRules);
      expect(summary.fields, `job ${job.number}`).toEqual([]);
      expect(columns.operatorId, `job ${job.number}`).toBe(job.operator);
    }
  });

  it("serves every distributor and Northern Ireland", () => {
    const wanted = operatorRegister.filter(({ kind }) => kind !== "idno").map(({ id }) => id);
    const served = new Set(plannedJobs.map(({ operator }) => operator));
    expect(wanted.filter((id) => !served.has(id))).toEqual([]);
  });

  it("uses fictional postcodes, telephone numbers and addresses only", () => {
    const text = JSON.stringify(records.map(({ draft }) => draft));
    expect(text.match(/"postcode":"(?!XA)[^"]*"/g)).toBeNull();
    expect(text.match(/[\w.-]+@(?![\w.-]*example\.com)[\w.-]+/g)).toBeNull();
    expect(text.match(/"phone":"(?!01632 960|07700 900)[^"]*"/g)).toBeNull();
  });
});
