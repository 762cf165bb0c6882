import { longDate } from "@/lib/notify/calendar";
import { notificationData, type NotificationRow } from "@/lib/notify/notification";
import type { Reason } from "@/lib/notify/result";
import { notBeforeAcceptance } from "../cautions";
import { photosOf, type Papers } from "../issue";
import type { Block, Text } from "../model";
import { gravestFirst, reasonsTable } from "../outcomes";
import { amountOf, dayOf, notRecorded, textOf, wordOf } from "../words/facts";
import { decisionWords, purposeWords } from "../words/vocabulary";

/** Identifiers are set in the face whose figures cannot be mistaken for letters. */
const identifiers = ["site.supplyNumber", "site.uprn", "site.gridReference", "jobNumber"];
const isIdentifier = (key: string) => identifiers.includes(key) || key.endsWith(".serial");

const bareUnits = ["mode", "phases", "outlets"];

function valueOf({ key, value, unit }: NotificationRow): Text {
  if (value === null) return notRecorded;
  if (unit !== null && !bareUnits.includes(unit)) return [{ text: `${value} ${unit}`, mono: true }];
  return isIdentifier(key) ? [{ text: value, mono: true }] : value;
}

/** Everything the operator asks for, section by section; what the record does not hold reads "not recorded". */
export const dataSections = ({ job, assessment }: Papers): Block[] =>
  notificationData(job, assessment).flatMap(({ section, rows }): Block[] => [
    { kind: "heading", level: 1, text: section },
    { kind: "facts", pairs: 2, rows: rows.map((row) => ({ label: row.label, value: valueOf(row) })) },
  ]);

const isGeneration = ({ group }: Reason) => group === "generation";

/** Why the paper is what it is, what counts against it first. */
export const routeReasons = ({ assessment }: Papers): Block[] =>
  reasonsTable(
    "What was checked before choosing this paper.",
    gravestFirst(assessment.route.reasons.filter((reason) => !isGeneration(reason))),
  );

const pathWords = {
  none: null,
  g98: "Notified under EREC G98.",
  "sgi-1": "Notified under EREC G99, small generating installation 1.",
  "sgi-2": "Applied for under EREC G99, small generating installation 2.",
  "sgi-3": "Applied for under EREC G99, small generating installation 3.",
  "full-application": "Applied for under EREC G99, full application.",
  "more-facts-needed": "Which path applies cannot be told: facts are missing.",
} as const;

/** The paper for generation, beside that for demand. Empty when no unit can discharge. */
export function generationSection({ assessment }: Papers): Block[] {
  const { generation, reasons } = assessment.route;
  const path = pathWords[generation];
  const waits = generation === "sgi-2" || generation === "sgi-3" || generation === "full-application";
  return path === null
    ? []
    : [
        { kind: "heading", level: 1, text: "Why this generation path" },
        { kind: "paragraph", text: path },
        ...reasonsTable("What was checked for generation.", gravestFirst(reasons.filter(isGeneration))),
        ...(waits ? [notBeforeAcceptance] : []),
      ];
}

/** What the operator has said so far, with the words of a refusal or a limit. Empty when nothing is recorded. */
export function operatorRecords({ job }: Papers): Block[] {
  if (job.operatorRecords.length === 0) return [];
  return [
    { kind: "heading", level: 1, text: "What the operator has answered" },
    {
      kind: "table",
      caption: "Papers sent and answers received, as recorded.",
      columns: [
        { heading: "Paper", widthPercent: 18 },
        { heading: "Sent", widthPercent: 19 },
        { heading: "Reference", widthPercent: 19, mono: true },
        { heading: "Answer", widthPercent: 22 },
        { heading: "Limit and conditions", widthPercent: 22 },
      ],
      rows: job.operatorRecords.map((record) => [
        purposeWords[record.purpose],
        dayOf(record.sentOn),
        textOf(record.reference),
        record.decision === null
          ? "none recorded"
          : `${wordOf(decisionWords, record.decision)}, ${dayOf(record.decidedOn)}${record.expires ? `, until ${longDate(record.expires)}` : ""}`,
        [record.limitA === null ? null : amountOf(record.limitA, "A"), record.model, record.conditions]
          .filter(Boolean)
          .join("; ") || "–",
      ]),
    },
  ];
}

/** Which photos bear the paper out. */
export function photoEvidence({ issue }: Papers): Block[] {
  const shown = [
    ["Cut-out and its rating", photosOf(issue, ["cut-out"])],
    ["Service head, for looping", photosOf(issue, ["service-head", "intake"])],
    ["Rating plate", photosOf(issue, ["rating-plate"])],
    ["Load survey", photosOf(issue, ["load-survey"])],
    ["Limit setting", photosOf(issue, ["limit-setting"])],
    ["Discharge setting", photosOf(issue, ["discharge-setting"])],
  ] as const;
  const rows = shown.flatMap(([label, value]) => (value === null ? [] : [{ label, value }]));
  return rows.length
    ? [
        { kind: "heading", level: 1, text: "Photos in this pack" },
        { kind: "facts", pairs: 2, rows },
      ]
    : [];
}

/** Several units on one supply go as one schedule. Empty for a single one. */
export function unitSchedule({ job }: Papers): Block[] {
  if (job.chargepoints.length < 2) return [];
  return [
    { kind: "heading", level: 1, text: "Schedule of chargepoints" },
    {
      kind: "table",
      caption: "All chargepoints of this job on this supply.",
      columns: [
        { heading: "No.", widthPercent: 8, align: "right" },
        { heading: "Make and model", widthPercent: 32 },
        { heading: "Serial", widthPercent: 24, mono: true },
        { heading: "Rated", widthPercent: 12, align: "right", mono: true },
        { heading: "Phases", widthPercent: 12 },
        { heading: "Mode", widthPercent: 12 },
      ],
      rows: job.chargepoints.map(({ make, model, serial, ratedA, phases, phase, mode }, index) => [
        String(index + 1),
        [make, model].filter(Boolean).join(" ") || notRecorded,
        textOf(serial),
        amountOf(ratedA, "A"),
        phases === null ? notRecorded : `${phases}${phase ? `, ${phase}` : ""}`,
        mode === null ? notRecorded : `mode ${mode}`,
      ]),
    },
  ];
}
