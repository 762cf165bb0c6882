import type { Assessment } from "@/lib/notify/assessment";
import { assess } from "@/lib/notify/assess";
import type { FirmRules } from "@/lib/notify/firm-rules";
import { summaryOf } from "@/lib/notify/headline";
import { parseJob, type Job } from "@/lib/notify/job";
import { operatorOf } from "@/lib/notify/operators";
import { parseSupplyNumber } from "@/lib/notify/supply-number";
import type { AssessmentSummary } from "@/lib/notify/views";

/** "4 Ropewalk Lane, Oxcombe": the first line and the town. */
export function siteOf(record: Job): string {
  const lines = (record.site.address ?? []).map((line) => line?.trim() ?? "").filter(Boolean);
  const [first] = lines;
  const last = lines.at(-1);
  if (!first) return record.site.postcode ?? "No address yet";
  return last && last !== first ? `${first}, ${last}` : first;
}

/** "Kestrel Dock 7", "2 chargepoints". */
export function unitOf({ chargepoints }: Job): string {
  const [only, ...others] = chargepoints;
  if (!only) return "No chargepoint yet";
  if (others.length) return `${chargepoints.length} chargepoints`;
  return [only.make, only.model].filter(Boolean).join(" ") || "Chargepoint, make not recorded";
}

/** The supply number as it is compared between jobs: the core where it can be read, else as typed without spaces. */
export function supplyCoreOf({ site }: Job): string | null {
  if (!site.supplyNumber) return null;
  const reading = parseSupplyNumber(site.supplyNumber, site.territory);
  return reading.ok ? reading.core : site.supplyNumber.replace(/[\s-]/g, "").toUpperCase();
}

const searchText = (record: Job, core: string | null): string =>
  [
    record.jobNumber,
    record.site.address?.join(" "),
    record.site.postcode,
    record.site.postcode?.replace(/\s/g, ""),
    record.site.supplyNumber,
    core,
    record.customer.name,
    record.onBehalfOf.reference,
    ...record.chargepoints.flatMap(({ make, model, serial }) => [make, model, serial]),
  ]
    .filter(Boolean)
    .join(" ")
    .toLowerCase();

export type Derived = {
  /** Null when the record contradicts itself. */
  assessment: Assessment | null;
  summary: AssessmentSummary;
  columns: ReturnType<typeof columnsFrom>;
};

function columnsFrom(record: Job, summary: AssessmentSummary, rules: FirmRules) {
  const core = supplyCoreOf(record);
  return {
    stage: record.stage,
    site: siteOf(record),
    postcode: record.site.postcode,
    supplyCore: core,
    serials: record.chargepoints.flatMap(({ serial }) => (serial ? [serial.toUpperCase()] : [])),
    operatorId: operatorOf(record, rules.own).id,
    unit: unitOf(record),
    route: summary.route ?? ("more-facts-needed" as const),
    contradicts: summary.route === null,
    installedOn: record.dates.installed,
    plannedOn: record.dates.planned,
    lastDay: summary.lastDay,
    missingCount: summary.missing.length + summary.fields.length,
    search: searchText(record, core),
  };
}

/** Runs the rules over a record and works out what the lists show of it. `on` is today. */
export function derive(record: Job, on: string, rules: FirmRules): Derived {
  const facts = parseJob(record);
  if (!facts.ok) {
    const summary: AssessmentSummary = {
      route: null,
      headline: "The record contradicts itself",
      missing: [],
      lastDay: null,
      daysLeft: null,
      fields: facts.fields,
    };
    return { assessment: null, summary, columns: columnsFrom(record, summary, rules) };
  }
  const assessment = assess(facts.value, on, rules);
  const summary = summaryOf(assessment, on);
  return { assessment, summary, columns: columnsFrom(record, summary, rules) };
}
