import { daysFrom, moveDays } from "./days";
import type { PlannedJob } from "./cases";
import { recordOf, writtenOn } from "./recipes";
import { addDays } from "@/lib/notify/calendar";
import { hasTrait } from "@/lib/notify/operators";
import { checkDigit } from "@/lib/notify/supply-number";

const territories: Record<string, string> = {
  "17": "scotland",
  "18": "scotland",
  "21": "wales",
  ni: "northern-ireland",
};

/** Synthetic: the operator's id, 99, the job's number and the check digit. No real supply has it. */
function supplyNumberOf({ operator, number }: PlannedJob): string {
  if (operator === "ni") return `81999000${String(number).padStart(3, "0")}`;
  const twelve = `${operator}99${String(number).padStart(8, "0")}`;
  return `${twelve}${checkDigit(twelve)}`;
}

const kept = new Set([125, 139, 142, 147, 151, 153]); // the worked examples keep their own supply numbers and serials

/** The days of a case: sold eight days before it was fitted, assessed three days before that. */
function datesOf({ day }: PlannedJob, today: string) {
  const on = addDays(today, -day);
  if (day < 0) return { surveyed: null, designed: null, planned: on, sold: null, installed: null, commissioned: null };
  return { surveyed: null, designed: null, planned: null, sold: addDays(on, -8), installed: on, commissioned: on };
}

/** The record of one planned job, as its installer had recorded it on the day it was opened. */
export function demoRecord(job: PlannedJob, today: string) {
  const by = daysFrom(writtenOn, today);
  const record = moveDays(recordOf(job.example, job.change), by);
  const [line, town, postcode] = job.place;
  record.site.address = [line, town];
  record.site.postcode = postcode;
  record.site.territory = territories[job.operator] ?? "england";
  if (!kept.has(job.number) || job.operator === "ni") record.site.supplyNumber = supplyNumberOf(job);
  record.customer.name = job.customer;
  record.customer.email = `customer-${job.number}@example.com`;
  if (record.customer.phone) record.customer.phone = `07700 900${String(job.number).padStart(3, "0")}`;
  if (!kept.has(job.number)) {
    const dates = datesOf(job, today);
    Object.assign(record.dates, dates);
    const first = dates.sold ?? dates.planned ?? today;
    if (record.demand.assessedOn) record.demand.assessedOn = addDays(first, -3);
    if (record.demand.measurement.from)
      Object.assign(record.demand.measurement, { from: addDays(first, -26), to: addDays(first, -10) });
    if (dates.installed) datedAfterInstalling(record, dates.installed);
    for (const unit of record.chargepoints) if (unit.serial) unit.serial = `${unit.serial.slice(0, 4)}000${job.number}`;
  }
  // Where the operator no longer trusts the label, the firm has asked for its statement.
  if (record.supply.cutOutEvidence === "carrier-label" && hasTrait(job.operator, "labels-in-doubt"))
    record.supply.cutOutEvidence = "operator-statement";
  record.operatorRecords = job.acts.length ? [] : record.operatorRecords;
  return record;
}

function datedAfterInstalling(record: ReturnType<typeof recordOf>, installed: string): void {
  for (const { measured } of record.circuits) if (measured.testedOn) measured.testedOn = installed;
  for (const { smartCharging } of record.chargepoints) {
    if (smartCharging.firstUsePrompt.on) smartCharging.firstUsePrompt.on = installed;
    if (smartCharging.statementOfCompliance.givenOn) smartCharging.statementOfCompliance.givenOn = installed;
  }
  if (record.certificate.issuedOn) record.certificate.issuedOn = addDays(installed, 1);
}
