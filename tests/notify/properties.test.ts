import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { assess } from "@/lib/notify/assess";
import { addDays } from "@/lib/notify/calendar";
import { weekdays } from "@/lib/notify/job/chargepoint";
import { chargingWeek, minutesOf, peakWeek } from "@/lib/notify/smart-charging/week";
import { assessWith, casesIn, jobWith, type Changes } from "./record";

const changesOf = (file: string) => casesIn(file).map(({ changes }) => changes);
const anyCase = fc.constantFrom(
  ...changesOf("network/check-cases.json"),
  ...changesOf("legislation/check-cases.json"),
  ...changesOf("network/each-outcome.json"),
);
const day = fc.nat(800).map((offset) => addDays("2026-01-01", offset));
const severity = ["notify", "more-facts-needed", "apply", "stop"];
const rank = (route: string) => severity.indexOf(route === "late-application" ? "apply" : route);

describe("an assessment", () => {
  it("does not change its route with the day of reading", () => {
    fc.assert(
      fc.property(anyCase, day, day, (changes, one, other) => {
        const job = jobWith(changes);
        const { asAt: _one, ...first } = assess(job, one);
        const { asAt: _other, ...second } = assess(job, other);
        expect(second).toEqual(first);
      }),
      { numRuns: 40 },
    );
  });

  it("leaves its record as it was", () => {
    fc.assert(
      fc.property(anyCase, (changes) => {
        const job = jobWith(changes);
        const before = JSON.stringify(job);
        assess(job, "2026-12-01");
        expect(JSON.stringify(job)).toBe(before);
      }),
      { numRuns: 40 },
    );
  });

  it("never grows milder when the demand grows", () => {
    const amperes = fc.integer({ min: 0, max: 1200 }).map((tenths) => tenths / 10);
    fc.assert(
      fc.property(amperes, amperes, fc.constantFrom("@10", "@16", "@23"), (a, b, supplyNumber) => {
        const route = (beforeA: number) =>
          rank(assessWith({ "demand.existingA": [beforeA], "site.supplyNumber": supplyNumber }).route.demand);
        expect(route(Math.max(a, b))).toBeGreaterThanOrEqual(route(Math.min(a, b)));
      }),
      { numRuns: 60 },
    );
  });

  it("is stopped by danger whatever else is recorded", () => {
    fc.assert(
      fc.property(
        anyCase,
        fc.constantFrom("exposed-live", "heat-marks", "damaged", "tamper", "water", "no-earth-found"),
        (changes, danger) => {
          const dates: Changes = { "supply.serviceConditions": [danger] };
          const assessment = assessWith({ ...changes, ...dates });
          if (assessment.route.reasons[0]?.rule === "route.rules-held") return;
          expect(assessment.route.demand).toBe("stop");
          expect(assessment.deadlines.filter(({ what }) => what !== "building-control")).toEqual([]);
        },
      ),
      { numRuns: 60 },
    );
  });

  it("judges a three-phase supply alike however its phases are named", () => {
    const loads = fc.tuple(fc.nat(90), fc.nat(90), fc.nat(90));
    const base: Changes = {
      "site.premises": "small-commercial",
      "supply.phases": 3,
      "supply.authorisedCapacityKva": 69,
      "chargepoints[0].phases": 3,
    };
    fc.assert(
      fc.property(loads, ([a, b, c]) => {
        const route = (existingA: number[]) => assessWith({ ...base, "demand.existingA": existingA }).route.demand;
        expect(route([b, c, a])).toBe(route([a, b, c]));
        expect(route([c, b, a])).toBe(route([a, b, c]));
      }),
      { numRuns: 30 },
    );
  });
});

const clock = fc
  .nat(1439)
  .map((minute) => `${String(Math.floor(minute / 60)).padStart(2, "0")}:${String(minute % 60).padStart(2, "0")}`);
const window = fc.record({
  days: fc.uniqueArray(fc.constantFrom(...weekdays), { minLength: 1 }),
  from: clock,
  to: clock,
});
const windows = fc.array(window, { maxLength: 4 });

/** The same week minute by minute, by another way: a table of 10,080 minutes. */
function minuteByMinute(list: readonly { days: readonly string[]; from: string; to: string }[], shift: number): number {
  const charging = new Uint8Array(10_080);
  for (const { days, from, to } of list)
    for (const each of days) {
      const start = weekdays.indexOf(each as (typeof weekdays)[number]) * 1440 + minutesOf(from) + shift;
      const length = (minutesOf(to) - minutesOf(from) + 1440) % 1440 || 1440;
      for (let minute = 0; minute < length; minute += 1) charging[(start + minute) % 10_080] = 1;
    }
  return charging.reduce((total, on, minute) => {
    const ofDay = minute % 1440;
    const peak = minute < 5 * 1440 && ((ofDay >= 480 && ofDay < 660) || (ofDay >= 960 && ofDay < 1320));
    return total + (on && peak ? 1 : 0);
  }, 0);
}

describe("the charging week", () => {
  it("agrees with a count minute by minute, in both seasons and by both clocks", () => {
    fc.assert(
      fc.property(
        windows,
        fc.constantFrom("local", "utc"),
        fc.constantFrom("winter", "summer"),
        (list, unitClock, season) => {
          const shift = unitClock === "utc" && season === "summer" ? 60 : 0;
          expect(chargingWeek(list, unitClock, season, "2026-11-20").minutesInPeak).toBe(minuteByMinute(list, shift));
        },
      ),
    );
  });

  it("has 45 hours of peak", () => {
    expect(peakWeek("2026-11-20").reduce((total, { from, to }) => total + to - from, 0)).toBe(45 * 60);
  });

  // Against the time-zone database of the machine: 13 January and 13 July 2026 are Mondays or near them in London.
  it("shifts by what the time-zone database says", () => {
    const hourIn = (instant: string) =>
      Number(
        new Intl.DateTimeFormat("en-GB", { timeZone: "Europe/London", hour: "2-digit", hour12: false }).format(
          new Date(instant),
        ),
      );
    expect(hourIn("2026-01-13T08:00:00Z")).toBe(8);
    expect(hourIn("2026-07-13T08:00:00Z")).toBe(9);
    const night = [{ days: [...weekdays], from: "22:00", to: "08:00" }];
    expect(chargingWeek(night, "utc", "summer", "2026-11-20").inPeak[0]).toEqual({ day: 0, from: 480, to: 540 });
    expect(chargingWeek(night, "utc", "winter", "2026-11-20").inPeak).toEqual([]);
  });
});
