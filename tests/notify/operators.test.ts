import { describe, expect, it } from "vitest";
import { operatorRegister } from "@/lib/notify/operator-register";
import { divisionOf, hasTrait, mailboxesOf, operatorOf } from "@/lib/notify/operators";
import { firstDone, ruleDay, wiringDay } from "@/lib/notify/rule-day";
import { sourceOf } from "@/lib/calc/sources";
import { assessWith, jobWith, supplyNumberOf } from "./record";

describe("the register of operators", () => {
  // Ids and areas: public reference pages and the list of 2023; group names as the operators' own pages had them.
  it("holds distributors 10 to 38 and Northern Ireland, each once and with its source", () => {
    const ids = operatorRegister.map(({ id }) => id);
    expect(ids).toEqual([...Array.from({ length: 29 }, (_, index) => String(index + 10)), "ni"]);
    for (const { source, names } of operatorRegister) {
      expect(() => sourceOf(source)).not.toThrow();
      for (const name of names) expect(() => sourceOf(name.source)).not.toThrow();
    }
  });

  it("dates its names without gap or overlap", () => {
    for (const { names, name } of operatorRegister) {
      expect(names.at(-1)).toMatchObject({ value: name });
      for (const [index, entry] of names.entries())
        if (index) expect(names[index - 1]?.to && names[index - 1]!.to! < entry.from).toBe(true);
    }
  });

  // UK Power Networks EDS 08-5050: distributors 10, 12 and 19 only; 28 and 31 bear similar names and are independents.
  it("keeps an operator’s own practice to its own ids", () => {
    const having = (trait: Parameters<typeof hasTrait>[1]) =>
      operatorRegister.filter(({ id }) => hasTrait(id, trait)).map(({ id }) => id);
    expect(having("supply-table")).toEqual(["10", "12", "19"]);
    expect(having("notice-by-install-day")).toEqual(["10", "12", "19"]);
    expect(having("labels-in-doubt")).toEqual(["11", "14", "21", "22"]);
    expect(having("commercial-share")).toEqual(["17", "18"]);
    expect(having("two-addresses")).toEqual(["16"]);
    expect(having("band-above-dwelling-limit")).toEqual(["ni"]);
    expect(hasTrait("99", "supply-table")).toBe(false);
  });

  it("counts the bank holidays of the operator, else of the site", () => {
    expect(divisionOf("17")).toBe("scotland");
    expect(divisionOf("ni")).toBe("northern-ireland");
    expect(divisionOf("23", "scotland")).toBe("england-and-wales");
    expect(divisionOf("24", "scotland")).toBe("scotland");
    expect(divisionOf("24", "wales")).toBe("england-and-wales");
    expect(divisionOf("unknown")).toBe("england-and-wales");
  });

  it("shows example addresses only, and two where the operator keeps two", () => {
    for (const { id } of operatorRegister)
      for (const address of Object.values(mailboxesOf(id) ?? {})) expect(address).toMatch(/\.example\.com$/);
    expect(mailboxesOf("16")).toEqual({
      notice: "notices@enw.example.com",
      application: "applications@enw.example.com",
      safety: "safety@enw.example.com",
    });
    expect(mailboxesOf("17")?.notice).toBe("connections@ssen.example.com");
    expect(mailboxesOf("29")?.notice).toBe("connections@operator-29.example.com");
    expect(mailboxesOf("unknown")).toBeNull();
  });
});

describe("the operator of a job", () => {
  it("is named as it was called on the day", () => {
    const named = (installed: string) =>
      operatorOf(jobWith({ "site.supplyNumber": "@14", "dates.installed": installed, "dates.commissioned": installed }))
        .name;
    expect(named("2022-09-20")).toBe("Western Power Distribution");
    expect(named("2022-09-21")).toBe("National Grid Electricity Distribution");
    expect(named("2004-01-01")).toBe("Western Power Distribution");
  });

  it("can be set by hand, with a reason", () => {
    const override = { id: "31", reason: "new estate, letter of 3 March" };
    expect(operatorOf(jobWith({ "site.operatorOverride": override }))).toMatchObject({
      id: "31",
      kind: "idno",
      reason: "Set by hand: new estate, letter of 3 March",
    });
    expect(operatorOf(jobWith({ "site.operatorOverride": { id: "31", reason: null } })).id).toBe("23");
    expect(operatorOf(jobWith({ "site.operatorOverride": { id: "77", reason: "told so" } })).kind).toBe("unknown");
    const noNumber = assessWith({ "site.operatorOverride": override, "site.supplyNumber": null });
    expect(noNumber.route.demand).toBe("notify");
    expect(assessWith({ "site.operatorOverride": { id: "17", reason: "edge of the area" } }).route.demand).toBe(
      "notify",
    );
  });

  it("is not known without a number, or with one that cannot be read", () => {
    expect(operatorOf(jobWith({ "site.supplyNumber": null })).reason).toMatch(/No supply number/);
    expect(operatorOf(jobWith({ "site.supplyNumber": "123" })).kind).toBe("unknown");
    expect(operatorOf(jobWith({ "site.supplyNumber": supplyNumberOf("99") }))).toMatchObject({
      id: "unknown",
      kind: "unknown",
    });
  });
});

describe("the day whose rules apply", () => {
  const dates = jobWith().dates;
  it("is that of the work, and never the day of reading", () => {
    expect(ruleDay({ ...dates, installed: "2026-11-20" })).toBe("2026-11-20");
    expect(ruleDay({ ...dates, installed: null, commissioned: "2026-11-21" })).toBe("2026-11-21");
    expect(ruleDay({ ...dates, installed: null, commissioned: null, planned: "2027-01-04" })).toBe("2027-01-04");
    expect(ruleDay({ ...dates, installed: null, commissioned: null, planned: null })).toBe("2026-12-01");
  });

  it("is the designed one for the wiring standard, where it is recorded", () => {
    expect(wiringDay({ ...dates, designed: "2026-10-01" })).toBe("2026-10-01");
    expect(wiringDay({ ...dates, installed: null, planned: "2027-01-04" })).toBe("2027-01-04");
    expect(wiringDay({ ...dates, installed: null, planned: null })).toBe("2026-12-01");
  });

  it("counts a notice from the earlier of installed and commissioned", () => {
    expect(firstDone({ ...dates, installed: "2026-11-20", commissioned: "2026-11-18" })).toBe("2026-11-18");
    expect(firstDone({ ...dates, installed: "2026-11-20", commissioned: null })).toBe("2026-11-20");
    expect(firstDone({ ...dates, installed: null, commissioned: "2026-11-18" })).toBe("2026-11-18");
    expect(firstDone({ ...dates, installed: null, commissioned: null })).toBeNull();
  });
});
