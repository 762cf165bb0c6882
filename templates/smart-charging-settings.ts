import type { SmartChargingResult } from "@/lib/notify/assessment";
import type { Chargepoint } from "@/lib/notify/job";
import { figure } from "./figures";
import { documentOf, photosOf, siteOf, type Papers } from "./issue";
import type { Block, DocumentModel, Text } from "./model";
import { gravestFirst, outcomeText, sourcesSection, tallyTable, workingsOf } from "./outcomes";
import { weekFigures } from "./week-figures";
import { unitName } from "./words/equipment";
import { amountOf, dayOf, notRecorded, textOf, wordOf, yesNo } from "./words/facts";
import { clockWords, ownerChoiceWords, promptWords, transferWords, usersWords } from "./words/vocabulary";
import { windowsWords } from "./words/windows";
import { citeAll } from "./words/sources";

/** Each requirement beside the recorded setting and its evidence, with the week of default hours and the owner's choice. */
export function smartChargingSettings(papers: Papers): DocumentModel {
  const { job, assessment } = papers;
  let figures = 0;
  const units = job.chargepoints.flatMap((unit) => {
    const drawings = defaultWeek(papers, unit, figures);
    figures += drawings.filter(({ kind }) => kind === "figure").length;
    return unitBlocks(papers, unit, drawings, job.chargepoints.length > 1);
  });
  return documentOf(
    papers,
    { slug: "03-smart-charging-settings", title: "Smart-charging settings", subtitle: siteOf(job) },
    [
      {
        kind: "paragraph",
        text: "The rules are those of the Electric Vehicles (Smart Charge Points) Regulations 2021, as they stood on the day of sale. They bind who sells a chargepoint. This document says what was recorded of each requirement; a tick typed on a form is the installer's observation, a maker's statement is evidence of the design.",
      },
      {
        kind: "facts",
        pairs: 2,
        rows: [
          { label: "Sold", value: dayOf(job.dates.sold) },
          { label: "Handed over", value: dayOf(job.dates.handedOver) },
        ],
      },
      ...(job.chargepoints.length > 1 ? [tallyOf(papers)] : []),
      ...units,
      ...(job.chargepoints.length === 0 ? [{ kind: "paragraph", text: "No chargepoint is recorded." } as const] : []),
      ...sourcesSection(assessment.smartCharging.flatMap(({ sources }) => sources)),
    ],
  );
}

const tallyOf = ({ job, assessment }: Papers): Block =>
  tallyTable(
    "How the requirements came out, chargepoint by chargepoint.",
    job.chargepoints.map((unit) => ({
      name: `${unitName(unit)} (${unit.id})`,
      reasons: assessment.smartCharging.filter(({ chargepoint }) => chargepoint === unit.id),
    })),
  );

function unitBlocks(papers: Papers, unit: Chargepoint, week: Block[], several: boolean): Block[] {
  const results = papers.assessment.smartCharging.filter(({ chargepoint }) => chargepoint === unit.id);
  const scope = results.find(({ rule }) => rule === "scope");
  const rules = gravestFirst(results.filter(({ rule }) => rule !== "scope"));
  const heading = several ? `${unitName(unit)}, chargepoint ${unit.id}` : unitName(unit);
  return [
    { kind: "heading", level: 1, text: heading },
    unitFacts(unit),
    ...(scope
      ? [
          {
            kind: "outcome",
            outcome: scope.outcome,
            title: scope.title,
            because: scope.because,
            sources: citeAll(scope.sources),
          } as const,
        ]
      : []),
    { kind: "heading", level: 2, text: "Default hours and the owner's choice" },
    choiceFacts(unit),
    ...week,
    { kind: "heading", level: 2, text: "Evidence" },
    evidenceFacts(papers, unit),
    ...requirementsTable(unit, rules),
    ...workingsOf(rules),
  ];
}

function unitFacts(unit: Chargepoint): Block {
  const smart = unit.smartCharging;
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Serial", value: [{ text: textOf(unit.serial), mono: true }] },
      { label: "Power, at most", value: [{ text: amountOf(smart.maximumPowerKw, "kW"), mono: true }] },
      { label: "Sold by the firm", value: yesNo(smart.soldByFirm) },
      { label: "Supplied by", value: wordOf(transferWords, smart.transfer) },
      { label: "Users", value: wordOf(usersWords, smart.users) },
      { label: "Clock", value: wordOf(clockWords, smart.clock) },
      { label: "Firmware", value: [{ text: textOf(smart.firmware), mono: true }] },
      { label: "Row in the register of sales", value: textOf(smart.registerRow) },
    ],
  };
}

function choiceFacts({ smartCharging: smart }: Chargepoint): Block {
  const { firstUsePrompt: prompt, randomDelay: delay } = smart;
  const handover: Text =
    smart.atHandover === null ? "as delivered" : smart.atHandover.length ? windowsWords(smart.atHandover) : "removed";
  return {
    kind: "facts",
    rows: [
      {
        label: "As delivered",
        value: smart.factoryDefault === null ? notRecorded : windowsWords(smart.factoryDefault),
      },
      {
        label: "At handover",
        value: smart.factoryDefault === null && smart.atHandover === null ? notRecorded : handover,
      },
      { label: "Owner's choice", value: wordOf(ownerChoiceWords, smart.ownerChoice) },
      {
        label: "First-use prompt",
        value: `${wordOf(promptWords, prompt.how)}; on ${dayOf(prompt.on)}; by ${textOf(prompt.by)}`,
      },
      {
        label: "Random delay",
        value: `default at most ${amountOf(delay.defaultMaximumS, "s")}, capable of ${amountOf(delay.capabilityS, "s")}, in steps of ${amountOf(delay.stepS, "s")}`,
      },
    ],
  };
}

function defaultWeek({ job }: Papers, unit: Chargepoint, before: number): Block[] {
  const windows = unit.smartCharging.factoryDefault;
  if (windows === null || windows.length === 0) return [];
  return weekFigures(job, unit, windows).map(({ season, drawing }, index) =>
    figure(
      before + index + 1,
      drawing,
      season === "all year"
        ? "The default hours as delivered, against peak hours."
        : `The default hours as delivered, against peak hours, in ${season}: the unit keeps UTC.`,
    ),
  );
}

function evidenceFacts({ issue }: Papers, { smartCharging: smart }: Chargepoint): Block {
  const { statementOfCompliance: statement, technicalFile, undertaking } = smart;
  return {
    kind: "facts",
    rows: [
      {
        label: "Maker's statement",
        value: statement.reference
          ? `${statement.reference}, dated ${dayOf(statement.date)}; names the model: ${yesNo(statement.namesModel)}; covers regulations ${statement.coversRegulations?.join(", ") || notRecorded}; covers Schedule 1: ${yesNo(statement.coversSchedule1)}`
          : notRecorded,
      },
      { label: "Statement given", value: `${dayOf(statement.givenOn)}, ${textOf(statement.givenHow)}` },
      { label: "Technical file", value: `${textOf(technicalFile.where)}, looked at ${dayOf(technicalFile.checkedOn)}` },
      ...(undertaking.reference
        ? [{ label: "Undertaking", value: `${undertaking.reference}, to ${dayOf(undertaking.expires)}` }]
        : []),
      {
        label: "Photos",
        value:
          photosOf(issue, ["default-hours-screen", "delay-screen", "first-use-prompt", "rating-plate"]) ??
          "none in this pack",
      },
    ],
  };
}

const requirement = ({ title, because }: SmartChargingResult): Text => [
  { text: `${title}. `, strong: true },
  { text: because },
];

/** Rule by rule, gravest first, with what was recorded. Empty when none was judged. */
function requirementsTable(unit: Chargepoint, rules: readonly SmartChargingResult[]): Block[] {
  if (rules.length === 0) return [];
  return [
    {
      kind: "table",
      caption: `Requirements, ${unitName(unit)}.`,
      columns: [
        { heading: "Outcome", widthPercent: 18 },
        { heading: "Rule", widthPercent: 10, mono: true },
        { heading: "Requirement and finding", widthPercent: 53 },
        { heading: "Recorded", widthPercent: 19 },
      ],
      rows: rules.map((result) => [
        outcomeText(result.outcome),
        result.rule === "schedule-1" ? "Sch. 1" : result.rule,
        requirement(result),
        result.recorded ?? "–",
      ]),
    },
  ];
}
