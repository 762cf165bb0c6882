import type { Job } from "@/lib/notify/job";
import { parseSupplyNumber } from "@/lib/notify/supply-number";
import { isWholePostcode } from "../postcode";
import type { Consequence, Group } from "./model";
import {
  attachmentKinds,
  buildingControl,
  buildings,
  decisions,
  interests,
  paperPurposes,
  premises,
  territories,
  yesNo,
} from "./words";

const installed = (job: Job) => job.stage === "installed";
const notOwner = (job: Job) => job.customer.interest !== null && job.customer.interest !== "owner";

/** A number the rules cannot read counts as missing: said where it is typed, with what is wrong with it. */
function supplyNumberLeadsTo(value: unknown, job: Job): Consequence | null {
  if (typeof value !== "string" || value === "unknown") return null;
  const reading = parseSupplyNumber(value, job.site.territory);
  return reading.ok ? null : { rule: "It counts as missing.", then: reading.message };
}

/** Whose site it is, where it is, and when things happened. */
export const people: readonly Group[] = [
  {
    subject: "people",
    title: "People and dates",
    lead: "The customer, as the operator will ask.",
    questions: [
      { path: "customer.name", label: "Customer’s name", short: "Customer", kind: "text", complete: "name" },
      {
        path: "customer.phone",
        label: "Customer’s telephone",
        short: "Telephone",
        kind: "text",
        input: "tel",
        mono: true,
        complete: "tel",
      },
      {
        path: "customer.email",
        label: "Customer’s e-mail",
        short: "E-mail",
        kind: "text",
        input: "email",
        complete: "email",
      },
      {
        path: "customer.interest",
        label: "The customer is",
        short: "Interest",
        kind: "choice",
        options: interests,
        asList: true,
      },
      {
        path: "customer.permission.from",
        label: "Who gave permission",
        short: "Permission",
        hint: "The owner, or whoever may give it.",
        kind: "text",
        applies: notOwner,
      },
      {
        path: "customer.permission.on",
        label: "Permission given on",
        short: "Permitted",
        kind: "date",
        applies: notOwner,
      },
    ],
  },
  {
    subject: "people",
    title: "Site",
    lead: "Where the supply is.",
    questions: [
      {
        path: "site.address",
        label: "Address",
        hint: "Street first, town last, without the postcode.",
        kind: "lines",
        complete: "street-address",
      },
      {
        path: "site.postcode",
        label: "Postcode",
        kind: "text",
        mono: true,
        complete: "postal-code",
        consequence: (value) =>
          typeof value === "string" && !isWholePostcode(value)
            ? { rule: "This is not a whole postcode.", then: "It is printed as typed." }
            : null,
      },
      {
        path: "site.supplyNumber",
        label: "Supply number",
        hint: "On the bill, beside the S. Spaces do not matter.",
        kind: "text",
        mono: true,
        consequence: supplyNumberLeadsTo,
      },
      {
        path: "site.supplyNumberKind",
        label: "The supply number is for",
        short: "Number for",
        kind: "choice",
        columns: 3,
        options: [
          { value: "import", word: "Import" },
          { value: "export", word: "Export" },
        ],
        notKnown: { rule: "Recorded as not known.", then: "Look at the bill." },
      },
      { path: "site.territory", label: "Country", kind: "choice", options: territories },
      { path: "site.premises", label: "Premises", kind: "choice", options: premises, asList: true },
      {
        path: "site.chargepointPosition",
        label: "Where the unit stands on the site",
        short: "Position",
        hint: "For example left of the garage door.",
        kind: "text",
      },
    ],
  },
  {
    subject: "people",
    title: "Dates",
    lead: "The last day to notify runs from these.",
    questions: [
      {
        path: "stage",
        label: "The job is",
        short: "Stage",
        kind: "choice",
        options: [
          { value: "planned", word: "Planned" },
          { value: "installed", word: "Installed" },
        ],
      },
      {
        path: "dates.planned",
        label: "Planned for",
        short: "Planned",
        kind: "date",
        applies: (job) => job.stage === "planned",
      },
      { path: "dates.installed", label: "Installed on", short: "Installed", kind: "date", applies: installed },
      { path: "dates.commissioned", label: "Commissioned on", short: "Commissioned", kind: "date", applies: installed },
      { path: "dates.sold", label: "Unit sold on", short: "Sold", kind: "date" },
      {
        path: "dates.completed",
        label: "Work completed on",
        short: "Completed",
        kind: "date",
        optional: true,
        applies: installed,
      },
      {
        path: "dates.handedOver",
        label: "Handed over on",
        short: "Handed over",
        kind: "date",
        optional: true,
        applies: installed,
      },
    ],
  },
  {
    subject: "people",
    title: "Certificate and building control",
    lead: "What else was issued.",
    more: (job) => !installed(job),
    questions: [
      {
        path: "certificate.kind",
        label: "Certificate",
        kind: "choice",
        options: [
          { value: "installation", word: "Installation" },
          { value: "minor-works", word: "Minor works" },
        ],
      },
      { path: "certificate.number", label: "Certificate number", short: "Number", kind: "text", mono: true },
      { path: "certificate.issuedOn", label: "Certificate issued on", short: "Issued", kind: "date" },
      {
        path: "buildingControl.route",
        label: "Building control",
        kind: "choice",
        options: buildingControl,
        notKnown: { rule: "The building-control day cannot be told.", then: "Ask whoever certifies the work." },
      },
      {
        path: "buildingControl.reference",
        label: "Building-control reference",
        short: "Reference",
        kind: "text",
        mono: true,
        optional: true,
      },
      {
        path: "buildingControl.notifiedOn",
        label: "Building control told on",
        short: "Told",
        kind: "date",
        optional: true,
      },
      {
        path: "buildingControl.occupierCopyOn",
        label: "Copy given to the occupier on",
        short: "Copy given",
        kind: "date",
        optional: true,
      },
    ],
  },
  {
    subject: "people",
    title: "Competent person",
    lead: "Who declares the work.",
    more: ({ competentPerson }) => Boolean(competentPerson.name && competentPerson.registration),
    questions: [
      { path: "competentPerson.name", label: "Competent person", short: "Competent", kind: "text" },
      {
        path: "competentPerson.registration",
        label: "Their registration",
        short: "Registration",
        kind: "text",
        mono: true,
      },
    ],
  },
  {
    subject: "people",
    title: "What the operator has said",
    more: () => true,
    questions: [
      {
        path: "operatorRecords",
        label: "Papers and answers before this job",
        short: "Answers",
        hint: "An approval counts only for what it names.",
        kind: "rows",
        noun: "paper",
        none: "None",
        cells: [
          { key: "purpose", label: "Paper", kind: "choice", required: true, options: paperPurposes },
          { key: "reference", label: "Their reference", kind: "text" },
          { key: "decision", label: "Decision", kind: "choice", options: decisions },
          { key: "decidedOn", label: "Decided on", kind: "date" },
          { key: "expires", label: "Ends", kind: "date" },
          { key: "limitA", label: "Limit", kind: "number", unit: "A", notKnown: true },
          { key: "model", label: "Model named", kind: "text" },
          { key: "conditions", label: "Conditions", kind: "text" },
          { key: "sentOn", label: "Sent on", kind: "date" },
          { key: "sentTo", label: "Sent to", kind: "text" },
        ],
      },
    ],
  },
  {
    subject: "people",
    title: "More of the site",
    more: () => true,
    questions: [
      { path: "site.building", label: "Building", kind: "choice", columns: 3, options: buildings },
      {
        path: "site.operatorOverride.id",
        label: "Operator, if the number is wrong about it",
        short: "Operator",
        hint: "Two figures, such as 23, or ni.",
        kind: "text",
        mono: true,
        optional: true,
      },
      {
        path: "site.operatorOverride.reason",
        label: "Why another operator",
        short: "Because",
        kind: "text",
        lines: 2,
        optional: true,
      },
      {
        path: "site.uprn",
        label: "Unique property reference",
        short: "UPRN",
        kind: "text",
        mono: true,
        optional: true,
      },
      { path: "site.gridReference", label: "Grid reference", short: "Grid", kind: "text", mono: true, optional: true },
      {
        path: "customer.address",
        label: "Customer’s address, if not the site",
        short: "Address",
        kind: "lines",
        optional: true,
      },
    ],
  },
  {
    subject: "people",
    title: "More of the job",
    more: () => true,
    questions: [
      {
        path: "kind",
        label: "Kind of job",
        short: "Kind",
        kind: "choice",
        columns: 1,
        options: [
          { value: "new", word: "New unit" },
          { value: "replacement", word: "Replacement" },
          { value: "change-after-commissioning", word: "Change after commissioning" },
          { value: "removal", word: "Removal" },
        ],
      },
      {
        path: "follows",
        label: "Follows job",
        hint: "The number of the earlier job here.",
        kind: "text",
        mono: true,
        optional: true,
      },
      { path: "dates.surveyed", label: "Surveyed on", short: "Surveyed", kind: "date", optional: true },
      {
        path: "dates.designed",
        label: "Designed on",
        short: "Designed",
        hint: "Picks the edition of the wiring standard.",
        kind: "date",
        optional: true,
      },
      { path: "notes", label: "Notes", kind: "text", lines: 4, optional: true },
    ],
  },
  {
    subject: "people",
    title: "On behalf of",
    more: () => true,
    questions: [
      {
        path: "onBehalfOf.name",
        label: "Retailer, landlord body or contractor",
        short: "On behalf of",
        kind: "text",
        optional: true,
      },
      {
        path: "onBehalfOf.reference",
        label: "Their reference",
        short: "Reference",
        kind: "text",
        mono: true,
        optional: true,
      },
      {
        path: "onBehalfOf.isSeller",
        label: "Are they the seller?",
        short: "Seller",
        kind: "choice",
        options: yesNo,
        applies: (job) => Boolean(job.onBehalfOf.name),
      },
      {
        path: "attachments",
        label: "Other files kept with the job",
        short: "Files",
        kind: "rows",
        noun: "file",
        none: "None",
        cells: [
          { key: "kind", label: "Kind", kind: "choice", required: true, options: attachmentKinds },
          { key: "file", label: "File name", kind: "text" },
        ],
      },
    ],
  },
];
