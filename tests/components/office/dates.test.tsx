import { describe, expect, it } from "vitest";
import {
  clockTime,
  dayOf,
  daysBetween,
  daysLeftInWords,
  leftInWords,
  longMoment,
  shortDate,
  weekdayDate,
} from "@/components/ui/dates";

// Calendar facts: 18 December 2026 is a Friday; summer time in the United Kingdom ran to 25 October 2026
// (Summer Time Act 1972, last Sunday of October).
describe("dates in words", () => {
  it("names the weekday without a comma", () => expect(weekdayDate("2026-12-18")).toBe("Friday 18 December"));
  it("leaves out the year only while it is this year", () => {
    expect(shortDate("2026-12-18", "2026-12-01")).toBe("18 Dec");
    expect(shortDate("2027-01-04", "2026-12-01")).toBe("4 Jan 2027");
  });
  it("reads an instant by the clock on the wall, winter and summer", () => {
    expect(clockTime("2026-12-01T14:20:00Z")).toBe("14:20");
    expect(clockTime("2026-07-01T14:20:00Z")).toBe("15:20");
    expect(longMoment("2026-12-01T09:00:00Z")).toBe("1 December 2026, 09:00");
  });
  it("takes the London day of an instant near midnight in summer", () =>
    expect(dayOf("2026-06-30T23:30:00Z")).toBe("2026-07-01"));
  it("counts days over the end of summer time", () => expect(daysBetween("2026-10-24", "2026-10-26")).toBe(2));
  it("says late, today and left", () => {
    expect([-11, 0, 1, 17].map(leftInWords)).toEqual(["11 late", "today", "1 day", "17 days"]);
    expect([-1, 0, 1, 28].map(daysLeftInWords)).toEqual(["1 day late", "last day today", "1 day left", "28 days left"]);
  });
});
