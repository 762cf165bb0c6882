import { expect, test } from "vitest";
import { inForce, judge, met, rule } from "@/lib/notify/checks/rule";

const about = rule({
  id: "supply.example",
  group: "supply",
  title: "An example",
  reads: ["supply.phases"],
  sources: ["BS 7671 313.1", "IEC 60228"],
  gives: ["met"],
});

test("a day before the first edition gives cannot-tell and the bare references", () => {
  const reason = judge(about, null, "2018-01-01", () => met("It holds."));
  expect(reason).toMatchObject({ outcome: "met", sources: ["BS 7671 313.1", "IEC 60228"], used: {}, workings: [] });
});

test("the edition of the day is cited", () => {
  expect(judge(about, null, "2026-12-01", () => met("It holds.")).sources[0]).toBe("BS 7671:2018+A4:2026 313.1");
});

test("only a figure out of force is caught", () => {
  const broken = () => {
    throw new TypeError("a fault in the code");
  };
  expect(() => judge(about, null, "2026-12-01", broken)).toThrow(TypeError);
  expect(() => inForce(broken)).toThrow(TypeError);
});
