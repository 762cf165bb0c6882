import { describe, expect, it } from "vitest";
import { completedOn } from "@/lib/notify/deadlines";
import type { FirmRules } from "@/lib/notify/firm-rules";
import { assessWith, jobWith, type Changes } from "./record";

const day = (assessment: ReturnType<typeof assessWith>, what: string) =>
  assessment.deadlines.find((each) => each.what === what);
const firm = (noticeDays: number | null): FirmRules => ({
  operators: { "23": { noticeDays, buriedSeparationM: null } },
});

describe("last days", () => {
  it("tighten by the firm’s setting, and say so", () => {
    const notice = day(assessWith({}, "2026-12-01", firm(7)), "demand-notice");
    expect(notice).toMatchObject({ lastDay: "2026-11-27" });
    expect(notice?.basis).toMatch(/as set by this firm\. The register has 28 days\./);
    expect(day(assessWith({}, "2026-12-01", firm(null)), "demand-notice")?.lastDay).toBe("2026-12-18");
    expect(day(assessWith({}, "2026-12-01", firm(1)), "demand-notice")?.basis).toMatch(/^1 calendar day /);
  });

  it("loosen only with a caution that is printed", () => {
    const loose = assessWith({}, "2026-12-01", firm(40));
    expect(day(loose, "demand-notice")?.lastDay).toBe("2026-12-30");
    expect(loose.cautions.join(" ")).toMatch(/allows 40 days .* has 28/);
    expect(assessWith({}, "2026-12-01", firm(7)).cautions.join(" ")).not.toMatch(/The firm allows/);
  });

  it("say where the bank-holiday list ends", () => {
    const late = assessWith({ "dates.installed": "2028-12-20", "dates.commissioned": "2028-12-20" });
    expect(day(late, "demand-notice")).toMatchObject({ lastDay: "2029-01-17" });
    expect(day(late, "demand-notice")?.basis).toMatch(/2028-12-31/);
    expect(late.cautions.join(" ")).toMatch(/2028-12-31/);
  });

  it("stand while facts are open, as the day it would be", () => {
    const open = day(assessWith({ "supply.looped": null }), "demand-notice");
    expect(open?.lastDay).toBe("2026-12-18");
    expect(open?.basis).toMatch(/if the open facts make it a notice/);
  });

  it("are none on a planned job, on a late application and, but for building control, on a stopped one", () => {
    const planned: Changes = {
      stage: "planned",
      "dates.installed": null,
      "dates.commissioned": null,
      "dates.planned": "2026-12-14",
    };
    expect(assessWith(planned).deadlines).toEqual([]);
    expect(
      assessWith({ "demand.existingA": [40], "site.premises": "domestic" }).deadlines.map(({ what }) => what),
    ).toEqual(["building-control"]);
    expect(assessWith({ "supply.serviceConditions": ["water"] }).deadlines.map(({ what }) => what)).toEqual([
      "building-control",
    ]);
  });

  it("count building control from completion, else from the later day", () => {
    const of = (changes: Changes) => completedOn(jobWith(changes));
    expect(of({ "dates.completed": "2026-11-30" })).toBe("2026-11-30");
    expect(of({ "dates.commissioned": "2026-11-24" })).toBe("2026-11-24");
    expect(of({ "dates.commissioned": null })).toBe("2026-11-20");
    expect(of({ stage: "planned", "dates.installed": null, "dates.commissioned": "2026-11-24" })).toBeNull();
    expect(completedOn({ ...jobWith(), dates: { ...jobWith().dates, installed: null } })).toBe("2026-11-20");
    expect(completedOn({ ...jobWith(), dates: { ...jobWith().dates, installed: "2026-11-25" } })).toBe("2026-11-25");
  });
});

describe("cautions", () => {
  const cautions = (changes: Changes) => assessWith(changes).cautions.join("\n");

  it("always leave covers and seals as found", () => {
    expect(cautions({})).toMatch(/Leave covers and seals as found/);
  });

  it("name the emergency line by territory, and only when the job is stopped", () => {
    const danger = { "supply.serviceConditions": ["exposed-live"] };
    expect(cautions(danger)).toMatch(/\b105\b/);
    expect(cautions({ ...danger, "site.territory": "northern-ireland", "site.supplyNumber": "81123456789" })).toMatch(
      /Northern Ireland has an emergency number of its own/,
    );
    expect(cautions({})).not.toMatch(/\b105\b/);
  });

  it("ask for a second look at a number that no digit can protect, until a photo of the bill is there", () => {
    expect(cautions({ "site.supplyNumber": "1099000000061" })).toMatch(/last two digits/);
    expect(cautions({ "evidence+": { subject: "supply-number", of: null, file: "bill.jpg" } })).not.toMatch(
      /last two digits/,
    );
    expect(cautions({ "site.supplyNumber": "12" })).not.toMatch(/last two digits/);
    expect(cautions({ "site.supplyNumber": "9900000000015" })).toMatch(/general rules and 28 days/);
  });

  it("urge a planned job to send before the day where the operator wants it by the day", () => {
    const planned: Changes = {
      stage: "planned",
      "dates.installed": null,
      "dates.commissioned": null,
      "dates.planned": "2026-12-14",
    };
    expect(cautions({ ...planned, "site.supplyNumber": "@10" })).toMatch(/seal and send it before/);
    expect(cautions(planned)).not.toMatch(/seal and send it before/);
  });
});
