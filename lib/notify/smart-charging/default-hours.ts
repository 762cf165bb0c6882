import type { IsoDate } from "@/lib/calc/parameter";
import type { ChargingWindow } from "../job/chargepoint";
import { longDate } from "../calendar";
import type { Outcome, Reason } from "../result";
import { rule, type Detail } from "../rule";
import { detailOf, photoOf, statementCovers, type Grade, type UnitFacts } from "./unit-facts";
import { chargingWeek, spanText, windowsText } from "./week";

const path = (fact: string) => `chargepoints[].smartCharging.${fact}`;

export const defaultHours = rule({
  id: "R10-1",
  group: "settings",
  title: "Default hours outside peak hours",
  reads: [path("factoryDefault"), path("clock"), path("demandSideResponse"), "dates.sold", "evidence"],
  sources: ["SI 2021/1467 reg 10", "smart-chargepoint-notes", "Summer Time Act 1972"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const firstUse = rule({
  id: "R10-2",
  group: "settings",
  title: "Accept, remove or change at first use",
  reads: [path("firstUsePrompt"), path("ownerChoice"), path("atHandover"), path("factoryDefault"), "evidence"],
  sources: ["SI 2021/1467 reg 10", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const overrideDefault = rule({
  id: "R10-4",
  group: "settings",
  title: "Owner can override the default mode",
  reads: [path("overrideShown"), path("statementOfCompliance")],
  sources: ["SI 2021/1467 reg 10", "smart-chargepoint-notes"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

export const demandSideResponse = rule({
  id: "R10-5",
  group: "settings",
  title: "Demand-side response agreement",
  reads: [path("demandSideResponse"), path("statementOfCompliance"), "dates.sold"],
  sources: ["SI 2021/1467 reg 10", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const conditionsMark = "That the agreement must be named in the statement of compliance is from memory: verify.";

/** Whether an agreement of the owner takes the place of default hours. */
export function responseAgreement(facts: UnitFacts): { outcome: Outcome; because: string } {
  const { agreementDate, namedInStatement, provider } = facts.settings.demandSideResponse;
  const { sold } = facts.job.dates;
  if (agreementDate === null)
    return { outcome: "not-applicable", because: "No demand-side response agreement is recorded." };
  if (sold === null)
    return {
      outcome: "cannot-tell",
      because: "The agreement cannot be compared with the sale: its day is not recorded.",
    };
  if (agreementDate > sold)
    return {
      outcome: "not-met",
      because: `The agreement of ${longDate(agreementDate)} is later than the sale on ${longDate(sold)}.`,
    };
  if (namedInStatement === false)
    return { outcome: "not-met", because: "The statement of compliance does not name the agreement." };
  if (namedInStatement !== true || provider === null)
    return {
      outcome: "cannot-tell",
      because: "An agreement is recorded; that it is named in the statement, and with whom, is not.",
    };
  return {
    outcome: "met",
    because: `Agreement with ${provider} of ${longDate(agreementDate)}, on or before the sale and named in the statement.`,
  };
}

export function responseCheck(facts: UnitFacts): Reason {
  const { outcome, because } = responseAgreement(facts);
  const { agreementDate, provider } = facts.settings.demandSideResponse;
  const grade: Grade = outcome === "met" ? "A" : null;
  return demandSideResponse.says(
    outcome,
    because,
    detailOf(
      facts,
      grade,
      { agreementDate, provider },
      { workings: outcome === "not-applicable" ? [] : [conditionsMark] },
    ),
  );
}

function gradeOf(facts: UnitFacts): Grade {
  if (photoOf(facts, "default-hours-screen")) return "B";
  return statementCovers(facts, "10") ? "A" : null;
}

/** Judges the hours the unit leaves the factory with, in a winter and a summer week by the wall clock. */
export function defaultHoursCheck(facts: UnitFacts): Reason {
  const { factoryDefault, clock } = facts.settings;
  if (factoryDefault === null)
    return defaultHours.says(
      "cannot-tell",
      "The default hours of the factory are not recorded.",
      detailOf(facts, null),
    );
  if (factoryDefault.length === 0) return withoutHours(facts);
  const local = chargingWeek(factoryDefault, "local", "winter", facts.on);
  const summerUtc = chargingWeek(factoryDefault, "utc", "summer", facts.on);
  const winterMinutes = local.minutesInPeak;
  const summerMinutes = clock === "local" ? winterMinutes : summerUtc.minutesInPeak;
  const words = windowsText(factoryDefault);
  const detail = detailOf(
    facts,
    gradeOf(facts),
    { winterMinutes, summerMinutes, clock, photo: photoOf(facts, "default-hours-screen") },
    {
      recorded: `${words}, clock ${clock ?? "not recorded"}`,
      limit: "0 minutes a week in peak hours",
      workings: [
        `Winter week: ${winterMinutes} minutes inside 08:00 to 11:00 and 16:00 to 22:00, Monday to Friday, Europe/London`,
        `Summer week: ${summerMinutes} minutes`,
      ],
    },
  );
  if (winterMinutes > 0)
    return defaultHours.says(
      "not-met",
      `Default hours ${words} hold ${winterMinutes} minutes a week inside peak hours, first ${spanText(local.inPeak[0]!)}.`,
      detail,
    );
  if (summerMinutes === 0)
    return defaultHours.says(
      "met",
      `Factory default hours recorded as ${words}; none fall in 08:00 to 11:00 or 16:00 to 22:00 on weekdays (Europe/London).`,
      detail,
    );
  const trap = `In summer ${words} by a clock on UTC is an hour later on the wall: ${summerMinutes} minutes a week inside peak hours, first ${spanText(summerUtc.inPeak[0]!)}.`;
  return clock === "utc"
    ? defaultHours.says("not-met", trap, detail)
    : defaultHours.says("cannot-tell", `Whether the unit keeps local time or UTC is not known. ${trap}`, detail);
}

function withoutHours(facts: UnitFacts): Reason {
  const { outcome, because } = responseAgreement(facts);
  const detail = detailOf(
    facts,
    outcome === "met" ? "A" : gradeOf(facts),
    { winterMinutes: 0, summerMinutes: 0 },
    { recorded: "none" },
  );
  if (outcome === "met") return defaultHours.says("met", `No default hours, and none are required: ${because}`, detail);
  return outcome === "cannot-tell"
    ? defaultHours.says("cannot-tell", `No default hours. ${because}`, detail)
    : defaultHours.says("not-met", `No default hours, and no agreement that stands in their place. ${because}`, detail);
}

/** Whether two sets of windows cover other hours, however they are written down. */
function coversOtherHours(a: readonly ChargingWindow[], b: readonly ChargingWindow[], on: IsoDate): boolean {
  const hours = (windows: readonly ChargingWindow[]) => chargingWeek(windows, "local", "winter", on).charging;
  return JSON.stringify(hours(a)) !== JSON.stringify(hours(b));
}

/** Judges the owner's choice. Hours the owner chose are never held against the job. */
export function firstUseCheck(facts: UnitFacts): Reason {
  if (facts.isPlanned)
    return firstUse.says("not-applicable", "Not yet: the owner is asked at first use.", detailOf(facts, null));
  const { firstUsePrompt, ownerChoice, atHandover, factoryDefault } = facts.settings;
  const photo = photoOf(facts, "first-use-prompt");
  const differs =
    atHandover !== null && factoryDefault !== null && coversOtherHours(atHandover, factoryDefault, facts.on);
  const detail: Detail = detailOf(
    facts,
    firstUsePrompt.how === null ? null : "B",
    { how: firstUsePrompt.how, on: firstUsePrompt.on, ownerChoice, photo },
    { recorded: ownerChoice, limit: null },
  );
  if (firstUsePrompt.how === "not-shown")
    return firstUse.says("not-met", "The owner was not offered the choice at first use.", detail);
  if (firstUsePrompt.how === null || firstUsePrompt.how === "unknown")
    return firstUse.says("cannot-tell", "How the owner was offered the choice is not known.", detail);
  if (firstUsePrompt.on === null)
    return firstUse.says("cannot-tell", "The day on which the owner was offered the choice is not recorded.", detail);
  if (differs && ownerChoice !== "changed" && ownerChoice !== "removed")
    return firstUse.says(
      "cannot-tell",
      `The hours at handover differ from the default (${windowsText(atHandover)}), and no choice of the owner is recorded.`,
      detail,
    );
  if (firstUsePrompt.how === "with-owner-present" && ownerChoice === null)
    return firstUse.says("cannot-tell", "The owner was present, but what the owner chose is not recorded.", detail);
  const by = firstUsePrompt.by ? ` by ${firstUsePrompt.by}` : "";
  const chosen = differs ? ` The owner’s own hours: ${windowsText(atHandover)}.` : "";
  return firstUse.says(
    "met",
    `The owner was offered the choice to accept, change or remove the default hours on ${longDate(firstUsePrompt.on)}${by}.${chosen}`,
    detail,
  );
}

export function overrideCheck(facts: UnitFacts): Reason {
  const covered = statementCovers(facts, "10");
  const shown = facts.settings.overrideShown;
  const detail = detailOf(facts, covered ? "A" : shown === true ? "B" : null, {
    overrideShown: shown,
    statementCovers: covered,
  });
  if (covered || shown === true) {
    const where = shown === true ? "and the owner was shown how" : "and showing it to the owner is not recorded";
    return overrideDefault.says(
      "met",
      covered
        ? `The statement of compliance covers regulation 10, ${where}.`
        : "The owner was shown the override on this unit.",
      detail,
    );
  }
  return facts.isPlanned
    ? overrideDefault.says("not-applicable", "Not yet: the override is shown at handover.", detail)
    : overrideDefault.says(
        "cannot-tell",
        "That the owner can override the default mode is neither shown nor stated.",
        detail,
      );
}
