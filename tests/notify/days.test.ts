import Holidays from "date-holidays";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bankHolidays, divisions, holidayCalendar, type Division } from "@/lib/notify/bank-holidays";
import { addDays, dayInLondon, dayName, daysBetween, isWeekend, longDate, weekdayDate } from "@/lib/notify/calendar";
import {
  addWorkingDays,
  calendarLimit,
  isWorkingDay,
  lastWorkingDayOnOrBefore,
  workingDaysBetween,
} from "@/lib/notify/working-days";

const regionOf: Record<Division, string> = {
  "england-and-wales": "ENG",
  scotland: "SCT",
  "northern-ireland": "NIR",
};

/** The one weekday on which the package and gov.uk differ: the Scottish holiday of 15 June 2026, appointed in February 2026. */
const knownDifference = ["scotland 2026-06-15"];

const day = fc.integer({ min: 0, max: 1400 }).map((offset) => addDays("2025-01-15", offset));
const division = fc.constantFrom(...divisions);

describe("bank holidays", () => {
  // Against the date-holidays package, an independent list.
  it("agree with an independent list on every weekday, the known difference apart", () => {
    const differences: string[] = [];
    for (const each of divisions) {
      const independent = new Set<string>();
      for (let year = 2025; year <= 2028; year += 1)
        for (const { date, type } of new Holidays("GB", regionOf[each]).getHolidays(year))
          if (type === "public") independent.add(date.slice(0, 10));
      for (let at = holidayCalendar.from as string; at <= holidayCalendar.to; at = addDays(at, 1))
        if (!isWeekend(at) && independent.has(at) !== bankHolidays[each].has(at)) differences.push(`${each} ${at}`);
    }
    expect(differences).toEqual(knownDifference);
  });

  // Counts of the gov.uk data, snapshot of 21 August 2026.
  it("number 8 a year in England and Wales, 9 and once 10 in Scotland, 10 in Northern Ireland", () => {
    const count = (each: Division, year: number) =>
      [...bankHolidays[each]].filter((at) => at.startsWith(String(year))).length;
    const years = [2025, 2026, 2027, 2028];
    expect(years.map((year) => count("england-and-wales", year))).toEqual([8, 8, 8, 8]);
    expect(years.map((year) => count("scotland", year))).toEqual([9, 10, 9, 9]);
    expect(years.map((year) => count("northern-ireland", year))).toEqual([10, 10, 10, 10]);
  });

  it("lie on weekdays", () => {
    for (const each of divisions) for (const at of bankHolidays[each]) expect(isWeekend(at), at).toBe(false);
  });
});

describe("working days", () => {
  // Worked from the gov.uk list: 15 June 2026 is a holiday in Scotland only; 13 July 2026 in Northern Ireland only.
  it("count by division", () => {
    expect(addWorkingDays("2026-06-08", 5, "england-and-wales")).toBe("2026-06-15");
    expect(addWorkingDays("2026-06-08", 5, "northern-ireland")).toBe("2026-06-15");
    expect(addWorkingDays("2026-06-08", 5, "scotland")).toBe("2026-06-16");
    expect(addWorkingDays("2026-07-10", 2, "england-and-wales")).toBe("2026-07-14");
    expect(addWorkingDays("2026-07-10", 2, "scotland")).toBe("2026-07-14");
    expect(addWorkingDays("2026-07-10", 2, "northern-ireland")).toBe("2026-07-15");
  });

  it("count back what they counted on", () => {
    fc.assert(
      fc.property(day, fc.nat(25), division, (from, count, each) => {
        expect(workingDaysBetween(from, addWorkingDays(from, count, each), each)).toBe(count);
      }),
    );
  });

  it("never land the safe day later, nor on a day off", () => {
    fc.assert(
      fc.property(day, division, (at, each) => {
        const safe = lastWorkingDayOnOrBefore(at, each);
        expect(safe <= at && isWorkingDay(safe, each)).toBe(true);
        expect(workingDaysBetween(safe, at, each)).toBe(0);
      }),
    );
  });

  it("say where the calendar ends", () => {
    expect(calendarLimit("2028-12-31")).toBeNull();
    expect(calendarLimit("2029-01-01")).toMatch(/2028-12-31/);
    expect(workingDaysBetween("2026-12-02", "2026-12-01", "scotland")).toBe(0);
  });
});

describe("calendar days", () => {
  it("are not shifted by a clock change or a leap day", () => {
    expect(addDays("2026-03-28", 28)).toBe("2026-04-25");
    expect(addDays("2024-02-01", 28)).toBe("2024-02-29");
    expect(daysBetween("2026-10-24", "2026-10-26")).toBe(2);
    expect(dayName("2026-12-18")).toBe("Friday");
  });

  it("are written as people write them", () => {
    expect(longDate("2026-12-01")).toBe("1 December 2026");
    expect(weekdayDate("2026-12-18", "2026-12-01")).toBe("Friday 18 December");
    expect(weekdayDate("2027-01-21", "2026-12-01")).toBe("Thursday 21 January 2027");
  });

  it("are those of London, not of the machine", () => {
    expect(dayInLondon(new Date("2026-06-30T23:30:00Z"))).toBe("2026-07-01");
    expect(dayInLondon(new Date("2026-12-01T23:30:00Z"))).toBe("2026-12-01");
  });
});
