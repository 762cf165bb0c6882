import { describe, expect, it } from "vitest";
import { rangeInWords } from "@/components/ui/pager";
import { oneOf, withQuery, wordOf } from "@/components/ui/query-link";

describe("what stands in an address", () => {
  it("leaves blanks out, later values over earlier", () => {
    expect(withQuery("/jobs", { q: "", sort: null })).toBe("/jobs");
    expect(withQuery("/jobs", { q: "quay", after: "x" }, { after: null, sort: "number" })).toBe(
      "/jobs?q=quay&sort=number",
    );
  });
  it("is anybody's typing: only allowed words pass, the rest is cut and trimmed", () => {
    expect(wordOf("chase-due", ["all", "chase-due"])).toBe("chase-due");
    expect(wordOf("'; drop table", ["all"])).toBeNull();
    expect(oneOf(["  a ", "b"])).toBe("a");
    expect(oneOf("x".repeat(900))).toHaveLength(200);
    expect(oneOf("   ")).toBeNull();
  });
  it("says which rows are shown", () => {
    expect(rangeInWords(0, 25, 143)).toBe("1 to 25 of 143");
    expect(rangeInWords(25, 6, 31)).toBe("26 to 31 of 31");
    expect(rangeInWords(0, 0, 0)).toBe("none");
  });
});
