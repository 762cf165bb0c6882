import { describe, expect, it } from "vitest";
import type { FirmRules, OwnOperator } from "@/lib/notify/firm-rules";
import { divisionOf, operatorOf, ownEntryOf } from "@/lib/notify/operators";
import { entered } from "./firm-cases";
import { assessWith, found, jobWith, type Changes } from "./record";

/** Ids above 38 exist or may be issued, so the table is the firm's to complete: national list of distributor ids, 2023. */
const of41: Changes = { "site.supplyNumber": "@41" };
const firm = (...own: OwnOperator[]): FirmRules => ({ operators: {}, own });
const words =
  "Distributor 41 is not in the register: this is the firm’s own entry, set on 1 December 2026 (source: the developer’s letter of 4 March).";

const supplyNumber = (assessment: ReturnType<typeof assessWith>) =>
  found(assessment, "reasons[route.supply-number]") as { outcome: string; because: string; used: object };

describe("a firm’s own entry of an operator", () => {
  it("names it in place of unknown, and says whose entry it is", () => {
    expect(assessWith(of41).operator.id).toBe("unknown");
    const assessment = assessWith(of41, "2026-12-01", firm(entered));
    expect(assessment.operator).toEqual({ id: "41", name: "Fenwold Estate Networks", kind: "idno", reason: words });
    expect(supplyNumber(assessment)).toMatchObject({
      outcome: "met",
      because: `The first two digits name Fenwold Estate Networks. ${words}`,
      used: { operator: "41", inRegister: false, firmEntryFrom: "2026-01-01" },
    });
  });

  it("keeps the general rules and 28 days, with a caution of its own for the register’s", () => {
    const bare = { ...of41, evidence: [] };
    const known = assessWith(bare, "2026-12-01", firm(entered));
    const unknown = assessWith(bare);
    expect(known.deadlines).toEqual(unknown.deadlines);
    expect(known.route.demand).toBe(unknown.route.demand);
    const cautions = known.cautions.join("\n");
    expect(cautions).toContain(`Fenwold Estate Networks: ${words} The general rules and 28 days are applied.`);
    expect(cautions).not.toContain("find out who runs the network");
    expect(unknown.cautions.join("\n")).toContain("find out who runs the network");
  });

  it("takes the firm’s own figures like any other operator", () => {
    const rules = { ...firm(entered), operators: { "41": { noticeDays: 5, buriedSeparationM: null } } };
    expect(assessWith(of41, "2026-12-01", rules).deadlines[0]?.lastDay).toBe("2026-11-25");
  });

  it("holds from its own day", () => {
    const later = assessWith(of41, "2026-12-01", firm({ ...entered, from: "2026-11-21" }));
    expect(later.operator).toMatchObject({
      id: "unknown",
      reason: "Distributor 41 is not in the register, and the firm’s own entry holds from 21 November 2026 only.",
    });
    expect(assessWith(of41, "2026-12-01", firm({ ...entered, from: "2026-11-20" })).operator.id).toBe("41");
  });

  it("is never taken for an id that the register holds", () => {
    const mine = { ...entered, id: "23" };
    expect(assessWith({}, "2026-12-01", firm(mine)).operator.name).toBe("Northern Powergrid");
    expect(ownEntryOf("23", [mine])).toBeNull();
    expect(ownEntryOf("41")).toBeNull();
    expect(operatorOf(jobWith(of41), [mine]).kind).toBe("unknown");
  });

  it("may be named by hand, with both reasons", () => {
    const byHand: Changes = { "site.operatorOverride": { id: "41", reason: "The estate’s own network" } };
    const assessment = assessWith(byHand, "2026-12-01", firm(entered));
    expect(assessment.operator.reason).toBe(`Set by hand: The estate’s own network ${words}`);
    expect(supplyNumber(assessment).because).toBe(
      `Fenwold Estate Networks, set by hand: The estate’s own network. ${words}`,
    );
  });

  it("brings its own holidays, else those of the site", () => {
    expect(divisionOf("41", "england", [{ ...entered, division: "scotland" }])).toBe("scotland");
    expect(divisionOf("41", "scotland", [entered])).toBe("scotland");
    expect(divisionOf("41", "scotland", [])).toBe("scotland");
  });

  it("of another part of the country is asked about, as one of the register is", () => {
    const at = (division: OwnOperator["division"], territory: string) =>
      supplyNumber(assessWith({ ...of41, "site.territory": territory }, "2026-12-01", firm({ ...entered, division })));
    expect(at("scotland", "england")).toMatchObject({ outcome: "cannot-tell" });
    expect(at("scotland", "england").because).toContain("in Scotland by the firm’s own entry");
    expect(at("england-and-wales", "scotland").because).toContain("outside Scotland by the firm’s own entry");
    expect(at("england-and-wales", "england").outcome).toBe("met");
  });
});
