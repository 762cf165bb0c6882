import { longDate } from "@/lib/notify/calendar";
import { standingCaution } from "@/lib/notify/cautions";
import { headline } from "@/lib/notify/headline";
import type { Group } from "@/lib/notify/result";
import { changesSection } from "./changes";
import { emergencyLine, leaveSealsCaution } from "./cautions";
import { documentOf, operatorName, siteOf, supplyNumberOf, type Papers } from "./issue";
import type { Block, DocumentModel } from "./model";
import { outcomeLines, reasonsTable, tallyTable } from "./outcomes";
import { clockDate } from "./words/dates";
import { unitName, unitRating } from "./words/equipment";
import { dayOf, notRecorded, textOf, wordOf } from "./words/facts";
import { kindWords, stageWords, subjectWords } from "./words/vocabulary";

/** A document or drawing of this pack, for the index. */
export type Listed = { name: string; title: string };

/** Index, summary, what was sealed and by whom, gaps, changes, and everything that is not met or cannot be told. */
export function cover(papers: Papers, contents: readonly Listed[]): DocumentModel {
  const { job, assessment } = papers;
  const { title, also, basis } = headline(assessment);
  const stopped = assessment.route.demand === "stop";
  return documentOf(papers, { slug: "00-cover", title: "Cover and index", subtitle: siteOf(job) }, [
    { kind: "heading", level: 1, text: title },
    { kind: "paragraph", text: also },
    { kind: "paragraph", text: [{ text: basis, quiet: true }] },
    ...(stopped ? stopPlate(papers) : []),
    ...gaps(papers),
    ...changesSection(papers.issue),
    { kind: "heading", level: 1, text: "The job" },
    jobFacts(papers),
    { kind: "heading", level: 1, text: "What was sealed" },
    sealFacts(papers),
    ...notes(papers),
    ...(stopped ? [] : [...deadlines(papers), ...attention(papers)]),
    ...contentsTable(contents),
    ...photosTable(papers),
    { kind: "heading", level: 1, text: "How to read this pack" },
    {
      kind: "paragraph",
      text: "It says what was recorded, which rule was applied and what is missing. It does not judge the installation: the wiring standard, the network operator and a competent person prevail over it.",
    },
    {
      kind: "paragraph",
      text: "The hash of every file stands in MANIFEST.json and in SHA256SUMS. A file that was altered after sealing no longer matches its hash.",
    },
    leaveSealsCaution,
    ...declarations(papers),
  ]);
}

/** A stopped job carries its danger on the cover and holds every other finding back. */
const stopPlate = ({ job, assessment }: Papers): Block[] => [
  {
    kind: "caution",
    title: `Ring ${emergencyLine(job.site.territory)} first`,
    text: "Make safe: load off, touch nothing. The new work stays off until the operator has attended and a competent person clears it. This pack holds a safety report and nothing else that could be sent.",
  },
  ...outcomeLines(assessment.route.reasons.filter(({ used }) => used.leadsTo === "stop")),
];

function gaps({ assessment, issue }: Papers): Block[] {
  const missing: Block[] = assessment.missing.length
    ? [
        { kind: "heading", level: 2, text: "Missing for this route" },
        {
          kind: "list",
          ordered: false,
          items: assessment.missing.map(({ path, needed }) => [{ text: needed }, { text: ` (${path})`, quiet: true }]),
        },
      ]
    : [];
  if (issue.gapsReason === null) return missing;
  return [
    { kind: "caution", title: "Sealed with facts missing", text: `Reason given: ${issue.gapsReason}` },
    ...missing,
  ];
}

function jobFacts({ job, assessment }: Papers): Block {
  const number = supplyNumberOf(job);
  return {
    kind: "facts",
    rows: [
      {
        label: "Job",
        value: `${job.jobNumber}, ${kindWords[job.kind]}, ${stageWords[job.stage]}${job.follows ? `, follows ${job.follows}` : ""}`,
      },
      { label: "Site", value: siteOf(job) },
      { label: "Supply number", value: [{ text: number ?? notRecorded, mono: true }] },
      {
        label: "Network operator",
        value: `${operatorName(assessment)}${assessment.operator.reason ? `. ${assessment.operator.reason}` : ""}`,
      },
      { label: "Customer", value: textOf(job.customer.name) },
      ...job.chargepoints.map((unit) => ({
        label: job.chargepoints.length > 1 ? `Chargepoint ${unit.id}` : "Chargepoint",
        value: [
          { text: `${unitName(unit)}, ${unitRating(unit)}` },
          { text: unit.serial ? `, ${unit.serial}` : "", mono: true as const },
        ],
      })),
      job.stage === "planned"
        ? { label: "Planned for", value: dayOf(job.dates.planned) }
        : {
            label: "Installed",
            value: `${dayOf(job.dates.installed)}; commissioned ${dayOf(job.dates.commissioned)}`,
          },
      { label: "Installer", value: `${textOf(job.firm.name)}, ${textOf(job.firm.registration)}` },
      {
        label: "Competent person",
        value: `${textOf(job.competentPerson.name)}, ${textOf(job.competentPerson.registration)}`,
      },
    ],
  };
}

function sealFacts({ assessment, issue }: Papers): Block {
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Version", value: String(issue.version) },
      { label: "Sealed", value: clockDate(issue.issuedAt) },
      { label: "By", value: issue.sealedBy },
      { label: "Rule set", value: [{ text: assessment.ruleset, mono: true }] },
      { label: "Assessed as at", value: longDate(assessment.asAt) },
      {
        label: "Facts missing",
        value: assessment.missing.length ? String(assessment.missing.length) : "none for this route",
      },
    ],
  };
}

/** What to know before acting; the standing caution has a plate of its own at the end. */
function notes({ assessment }: Papers): Block[] {
  const items = assessment.cautions.filter((text) => text !== standingCaution);
  return items.length
    ? [
        { kind: "heading", level: 1, text: "Before acting on this" },
        { kind: "list", ordered: false, items },
      ]
    : [];
}

const deadlineWords: Readonly<Record<Papers["assessment"]["deadlines"][number]["what"], string>> = {
  "demand-notice": "Notice to the network operator",
  "completion-notice": "Completion notice to the network operator",
  "generation-notice": "Generation notice to the network operator",
  "building-control": "Building control",
};

function deadlines({ assessment }: Papers): Block[] {
  if (assessment.deadlines.length === 0) return [];
  return [
    {
      kind: "table",
      caption: "Last days.",
      columns: [
        { heading: "What", widthPercent: 26 },
        { heading: "Last day", widthPercent: 21 },
        { heading: "Send by, working day", widthPercent: 23 },
        { heading: "Because", widthPercent: 30 },
      ],
      rows: assessment.deadlines.map(({ what, lastDay, safeBy, basis }) => [
        deadlineWords[what],
        longDate(lastDay),
        longDate(safeBy),
        basis,
      ]),
    },
  ];
}

const groupNames: Readonly<Record<Exclude<Group, "route" | "generation">, string>> = {
  demand: "Demand",
  supply: "Supply",
  circuit: "Circuit",
  "open-pen": "Open PEN",
  "power-quality": "Power quality",
  settings: "Settings",
};

function attention({ assessment }: Papers): Block[] {
  const groups = (Object.keys(groupNames) as (keyof typeof groupNames)[]).map((group) => ({
    name: groupNames[group],
    reasons:
      group === "settings" ? assessment.smartCharging : assessment.checks.filter((check) => check.group === group),
  }));
  const open = [...assessment.route.reasons, ...assessment.checks, ...assessment.smartCharging];
  const notMet = open.filter(({ outcome }) => outcome === "not-met");
  const cannotTell = open.filter(({ outcome }) => outcome === "cannot-tell");
  return [
    { kind: "heading", level: 1, text: "Outcomes" },
    tallyTable("How the checks came out.", groups),
    ...reasonsTable("Not met.", notMet),
    ...reasonsTable("Cannot tell.", cannotTell),
  ];
}

const contentsTable = (contents: readonly Listed[]): Block[] => [
  { kind: "heading", level: 1, text: "In this pack" },
  {
    kind: "table",
    caption: "Files, in reading order.",
    columns: [
      { heading: "File", widthPercent: 46, mono: true },
      { heading: "What it is", widthPercent: 54 },
    ],
    rows: contents.map(({ name, title }) => [name, title]),
  },
];

function photosTable({ issue }: Papers): Block[] {
  const leftOut: Block[] = issue.photosLeftOut?.length
    ? [{ kind: "paragraph", text: `Named in the record and not in this pack: ${issue.photosLeftOut.join(", ")}.` }]
    : [];
  if (issue.photos.length === 0) return [{ kind: "paragraph", text: "No photo is in this pack." }, ...leftOut];
  return [
    {
      kind: "table",
      caption: "Photos, by the number the documents cite.",
      columns: [
        { heading: "Photo", widthPercent: 10, align: "right" },
        { heading: "Shows", widthPercent: 24 },
        { heading: "Caption", widthPercent: 38 },
        { heading: "Taken", widthPercent: 28 },
      ],
      rows: issue.photos.map(({ number, subject, caption, takenAt }) => [
        String(number),
        subjectWords[subject],
        caption ?? "–",
        takenAt === null ? notRecorded : clockDate(takenAt),
      ]),
    },
    ...leftOut,
  ];
}

const roleWords = { "competent-person": "competent person", designer: "designer", customer: "customer" } as const;

const declarations = ({ job }: Papers): Block[] =>
  job.declarations.length === 0
    ? []
    : [
        { kind: "heading", level: 1, text: "Declarations" },
        ...job.declarations.map(({ role, name, at, statement }): Block => ({
          kind: "signature",
          role: wordOf(roleWords, role),
          name,
          at,
          statement: statement ?? "No statement is recorded.",
        })),
      ];
