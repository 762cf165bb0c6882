import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { longDate } from "../calendar";
import { registerYears } from "../parameters/legislation";
import type { Reason } from "../result";
import { rule } from "../rule";
import { responseAgreement } from "./default-hours";
import { detailOf, statementStands, type UnitFacts } from "./unit-facts";

const path = (fact: string) => `chargepoints[].smartCharging.${fact}`;
const statementPath = path("statementOfCompliance");

export const soldWithinRules = rule({
  id: "R4-1",
  group: "settings",
  title: "Sold only with the requirements met",
  reads: [statementPath, "dates.sold"],
  sources: ["SI 2021/1467 reg 4", "AEVA 2018 section 15"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const statementGiven = rule({
  id: "R13-1",
  group: "settings",
  title: "Statement of compliance with the sale",
  reads: [statementPath, "dates.sold"],
  sources: ["SI 2021/1467 reg 13", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const technicalFile = rule({
  id: "R13-2",
  group: "settings",
  title: "Technical file at hand",
  reads: [path("technicalFile")],
  sources: ["SI 2021/1467 reg 13", "smart-chargepoint-notes"],
  outcomes: ["met", "cannot-tell"],
});

export const statementContents = rule({
  id: "R13-3",
  group: "settings",
  title: "Contents of the statement",
  reads: [statementPath, path("demandSideResponse"), "firm.name"],
  sources: ["SI 2021/1467 reg 13", "smart-chargepoint-notes"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const registerOfSales = rule({
  id: "R14-1",
  group: "settings",
  title: "Row in the ten-year register",
  reads: [path("registerRow"), "dates.sold"],
  sources: ["SI 2021/1467 reg 14", "smart-chargepoint-notes"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

/** Last day on which the row of a sale must still be kept: ten years from the sale (the start is from memory: verify).
 * `on` picks the law, the day of sale when not given. */
export function keptUntil(sold: IsoDate, on: IsoDate = sold): IsoDate {
  const year = Number(sold.slice(0, 4)) + valueAt(registerYears, on);
  const day = sold.slice(5) === "02-29" && year % 4 !== 0 ? "02-28" : sold.slice(5);
  return `${year}-${day}`;
}

export function statementCheck(facts: UnitFacts): Reason {
  const { reference, date, namesModel, givenOn, givenHow } = facts.settings.statementOfCompliance;
  const { sold } = facts.job.dates;
  const stands = statementStands(facts);
  const detail = detailOf(
    facts,
    stands ? "A" : null,
    { reference, date, namesModel, givenOn, givenHow },
    { recorded: reference },
  );
  if (namesModel === false)
    return statementGiven.says("not-met", "The statement of compliance does not name the model.", detail);
  if (date !== null && sold !== null && date > sold)
    return statementGiven.says(
      "not-met",
      `The statement of compliance is dated ${longDate(date)}, after the sale on ${longDate(sold)}.`,
      detail,
    );
  if (!stands || reference === null)
    return statementGiven.says(
      "cannot-tell",
      "No statement of compliance that names the model and predates the sale is recorded.",
      detail,
    );
  if (facts.isPlanned)
    return statementGiven.says("met", "A statement of compliance is held; it goes with the sale.", detail);
  return givenOn && givenHow
    ? statementGiven.says("met", `Statement ${reference} given on ${longDate(givenOn)}: ${givenHow}.`, detail)
    : statementGiven.says(
        "cannot-tell",
        "A statement of compliance is held; how and when it was given is not recorded.",
        detail,
      );
}

export function technicalFileCheck(facts: UnitFacts): Reason {
  const { where, checkedOn } = facts.settings.technicalFile;
  const detail = detailOf(
    facts,
    where && checkedOn ? "B" : where ? "C" : null,
    { where, checkedOn },
    { recorded: where },
  );
  return where && checkedOn
    ? technicalFile.says(
        "met",
        `Technical file available on request from ${where}, checked on ${longDate(checkedOn)}.`,
        detail,
      )
    : technicalFile.says(
        "cannot-tell",
        "Where the technical file is, and that this was checked, is not recorded.",
        detail,
      );
}

const contentsMark = "What a statement must contain is from memory: verify.";

export function contentsCheck(facts: UnitFacts): Reason {
  const { namesModel, reference } = facts.settings.statementOfCompliance;
  const response = responseAgreement(facts);
  const detail = detailOf(
    facts,
    statementStands(facts) ? "A" : null,
    { namesModel, reference, firm: facts.job.firm.name },
    { workings: [contentsMark] },
  );
  if (namesModel === false || response.outcome === "not-met")
    return statementContents.says(
      "not-met",
      namesModel === false ? "The statement does not name the model." : response.because,
      detail,
    );
  return namesModel === true && reference !== null && facts.job.firm.name !== null && response.outcome !== "cannot-tell"
    ? statementContents.says("met", "The statement names the model; seller and reference are recorded.", detail)
    : statementContents.says("cannot-tell", "Model, seller or reference of the statement is not recorded.", detail);
}

export function registerCheck(facts: UnitFacts): Reason {
  const { registerRow } = facts.settings;
  const { sold } = facts.job.dates;
  const until = sold === null ? null : keptUntil(sold, facts.on);
  const detail = detailOf(
    facts,
    registerRow ? "B" : null,
    { registerRow, keptUntil: until },
    { recorded: registerRow },
  );
  if (registerRow)
    return registerOfSales.says("met", `Row ${registerRow}${until ? `, kept until ${longDate(until)}` : ""}.`, detail);
  return facts.isPlanned && sold === null
    ? registerOfSales.says("not-applicable", "Not yet: the row is written with the sale.", detail)
    : registerOfSales.says("cannot-tell", "No row of the register of sales is recorded for this unit.", detail);
}

/** Rules about what was done on site, after the sale. */
const afterSale = ["R10-2", "schedule-1"];

/** The duty that carries the others: what was sold had to meet them at the sale. `others` are their answers. */
export function saleCheck(facts: UnitFacts, others: readonly Reason[]): Reason {
  const failed = others
    .filter(({ rule: id, outcome }) => outcome === "not-met" && !afterSale.includes(id))
    .map(({ rule: id }) => id);
  const stands = statementStands(facts);
  const detail = detailOf(facts, stands ? "A" : null, { failed, statementStands: stands });
  if (failed.length)
    return soldWithinRules.says("not-met", `Recorded as not met at the sale: ${failed.join(", ")}.`, detail);
  return stands
    ? soldWithinRules.says(
        "met",
        "A statement of compliance that names the model was held before the sale, and nothing recorded contradicts it.",
        detail,
      )
    : soldWithinRules.says(
        "cannot-tell",
        "No statement of compliance that names the model and predates the sale is recorded.",
        detail,
      );
}
