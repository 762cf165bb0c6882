import { valueAt } from "@/lib/calc/parameter";
import { longDate } from "../calendar";
import { securityFrom } from "../parameters/legislation";
import type { Reason } from "../result";
import { rule } from "../rule";
import { detailOf, statementStands, type UnitFacts } from "./unit-facts";

const path = (fact: string) => `chargepoints[].smartCharging.${fact}`;

export const securityStated = rule({
  id: "R12-1",
  group: "settings",
  title: "Security requirements of Schedule 1",
  reads: [path("statementOfCompliance"), path("undertaking"), "dates.sold"],
  sources: ["SI 2021/1467 reg 12", "opss-enforcement-actions", "govuk-smart-chargepoints"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const securityOnSite = rule({
  id: "schedule-1",
  group: "settings",
  title: "Security points that can be seen on site",
  reads: [path("defaultPasswordRemoved"), path("updateCheckDone"), path("firmware"), "dates.sold"],
  sources: ["SI 2021/1467 Schedule 1", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

function tooEarly(facts: UnitFacts): string | null {
  const { sold } = facts.job.dates;
  const from = valueAt(securityFrom, sold ?? facts.on);
  return sold !== null && sold < from
    ? `Sold on ${longDate(sold)}, before the security requirements on ${longDate(from)}.`
    : null;
}

/** Cover by a statement of compliance, or an undertaking that had not run out at the sale. */
export function securityCheck(facts: UnitFacts): Reason {
  const { statementOfCompliance: statement, undertaking } = facts.settings;
  const covered = statementStands(facts) && statement.coversSchedule1 === true;
  const detail = detailOf(facts, covered ? "A" : null, {
    coversSchedule1: statement.coversSchedule1,
    undertaking: undertaking.reference,
    expires: undertaking.expires,
  });
  const early = tooEarly(facts);
  if (early) return securityStated.says("not-applicable", early, detail);
  if (covered)
    return securityStated.says("met", "The statement of compliance names the model and covers Schedule 1.", detail);
  if (undertaking.reference !== null) return byUndertaking(facts, detail);
  return statement.coversSchedule1 === false
    ? securityStated.says(
        "not-met",
        "The statement of compliance does not cover Schedule 1, and no undertaking is recorded.",
        detail,
      )
    : securityStated.says("cannot-tell", "No statement that stands covers Schedule 1.", detail);
}

function byUndertaking(facts: UnitFacts, detail: ReturnType<typeof detailOf>): Reason {
  const { reference, expires } = facts.settings.undertaking;
  const { sold } = facts.job.dates;
  if (expires !== null && sold !== null && expires < sold)
    return securityStated.says(
      "not-met",
      `Undertaking ${reference} ran out on ${longDate(expires)}, before the sale.`,
      detail,
    );
  const until = expires === null ? "without its last day" : `open until ${longDate(expires)}`;
  return securityStated.says(
    "cannot-tell",
    `Undertaking ${reference} is recorded, ${until}: a person judges what it covers.`,
    detail,
  );
}

/** What an installer can see of Schedule 1: no default password left, the update check made, the firmware noted. */
export function onSiteCheck(facts: UnitFacts): Reason {
  const { defaultPasswordRemoved, updateCheckDone, firmware } = facts.settings;
  const detail = detailOf(
    facts,
    firmware === null ? null : "B",
    { defaultPasswordRemoved, updateCheckDone, firmware },
    { recorded: firmware },
  );
  const early = tooEarly(facts);
  if (early) return securityOnSite.says("not-applicable", early, detail);
  if (facts.isPlanned) return securityOnSite.says("not-applicable", "Not yet: seen when the unit is set.", detail);
  if (defaultPasswordRemoved === false)
    return securityOnSite.says("not-met", "A default password is recorded as still in place.", detail);
  if (updateCheckDone === false)
    return securityOnSite.says("not-met", "The update check is recorded as not made.", detail);
  return defaultPasswordRemoved === true && updateCheckDone === true && firmware !== null
    ? securityOnSite.says(
        "met",
        `No default password remains, the update check was made, firmware ${firmware}.`,
        detail,
      )
    : securityOnSite.says("cannot-tell", "Password, update check or firmware is not recorded.", detail);
}
