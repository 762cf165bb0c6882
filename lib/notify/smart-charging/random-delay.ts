import { valueAt } from "@/lib/calc/parameter";
import { knownNumber } from "../job/facts";
import { delayDefaultS, delayStepS } from "../parameters/legislation";
import type { Reason } from "../result";
import { rule } from "../rule";
import { detailOf, photoOf, statementCovers, type Grade, type UnitFacts } from "./unit-facts";

const path = (fact: string) => `chargepoints[].smartCharging.${fact}`;

export const delaySetting = rule({
  id: "R11-2",
  group: "settings",
  title: "Random delay to 600 s, in 1 s steps",
  reads: [
    path("randomDelay.defaultMaximumS"),
    path("randomDelay.stepS"),
    path("randomDelay.active"),
    path("demandSideResponse.responseService"),
    "evidence",
  ],
  sources: ["SI 2021/1467 reg 11", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const delayExceptions = rule({
  id: "R11-5",
  group: "settings",
  title: "Delay left out only where the Regulations say",
  reads: [
    path("randomDelay.active"),
    path("demandSideResponse.responseService"),
    path("statementOfCompliance"),
    "dates.sold",
  ],
  sources: ["SI 2021/1467 reg 11", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const legalCheck = "That less than the full 600 s falls short is our reading of “up to”: pending a legal check.";

/** The delay as the unit is left: its longest default, its step, and that it works. */
export function delayCheck(facts: UnitFacts): Reason {
  if (facts.isPlanned)
    return delaySetting.says(
      "not-applicable",
      "Not yet: the delay is read when the unit is set.",
      detailOf(facts, null),
    );
  const { defaultMaximumS, stepS, active } = facts.settings.randomDelay;
  const { responseService } = facts.settings.demandSideResponse;
  const mostS = valueAt(delayDefaultS, facts.on);
  const stepBoundS = valueAt(delayStepS, facts.on);
  const longestS = knownNumber(defaultMaximumS);
  const step = knownNumber(stepS);
  const photo = photoOf(facts, "delay-screen");
  const grade: Grade = photo ? "B" : statementCovers(facts, "11") ? "A" : null;
  const detail = detailOf(
    facts,
    grade,
    { defaultMaximumS: longestS, stepS: step, active, responseService, photo },
    {
      recorded: `${longestS ?? "not known"} s, step ${step ?? "not known"} s`,
      limit: `${mostS} s, step ≤ ${stepBoundS} s`,
      workings: longestS !== null && longestS < mostS ? [legalCheck] : [],
    },
  );
  if (longestS !== null && longestS > mostS)
    return delaySetting.says(
      "not-met",
      `The longest default delay is ${longestS} s; it must be ${mostS} s as delivered.`,
      detail,
    );
  if (longestS !== null && longestS < mostS)
    return delaySetting.says("not-met", `The longest default delay is ${longestS} s, short of ${mostS} s.`, detail);
  if (step !== null && step > stepBoundS)
    return delaySetting.says(
      "not-met",
      `The delay runs in steps of ${step} s; it must be drawn to the nearest second.`,
      detail,
    );
  if (active === false)
    return responseService === true
      ? delaySetting.says(
          "cannot-tell",
          "The delay is off; it may be only while the unit gives response services.",
          detail,
        )
      : delaySetting.says(
          "not-met",
          "The delay is switched off. The owner may override it each time, not for good.",
          detail,
        );
  if (longestS === null || step === null || active !== true)
    return delaySetting.says("cannot-tell", "Longest delay, step or that it works is not known.", detail);
  return delaySetting.says(
    "met",
    `Maximum random delay recorded as ${longestS} s in steps of ${step} s, working.`,
    detail,
  );
}

/** Only an override, a delay already applied, or response services may leave the delay out. */
export function exceptionsCheck(facts: UnitFacts): Reason {
  const { active } = facts.settings.randomDelay;
  const { responseService } = facts.settings.demandSideResponse;
  const covered = statementCovers(facts, "11");
  const detail = detailOf(facts, covered ? "A" : active === true ? "B" : null, {
    active,
    responseService,
    statementCovers: covered,
  });
  if (active === false && responseService === true)
    return delayExceptions.says(
      "met",
      "The delay is left out while the unit gives response services, which the Regulations except.",
      detail,
    );
  if (active === false)
    return delayExceptions.says(
      "not-met",
      "The delay is left out although no response service is recorded; an ordinary tariff plan is no exception.",
      detail,
    );
  if (covered) return delayExceptions.says("met", "The statement of compliance covers regulation 11.", detail);
  if (facts.isPlanned) return delayExceptions.says("not-applicable", "Not yet: read when the unit is set.", detail);
  return active === true
    ? delayExceptions.says(
        "met",
        "Observed by the installer: the delay works. No statement that stands covers regulation 11.",
        detail,
      )
    : delayExceptions.says("cannot-tell", "Whether the delay works is neither observed nor stated.", detail);
}
