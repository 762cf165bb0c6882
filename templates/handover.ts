import type { Chargepoint } from "@/lib/notify/job";
import { emergencyLine, laterMetalworkCaution } from "./cautions";
import { figure } from "./figures";
import { documentOf, operatorName, siteOf, type Papers } from "./issue";
import type { Block, DocumentModel, Text } from "./model";
import { reachBetweenEarths } from "./open-pen-figures";
import { weekFigures } from "./week-figures";
import { unitName, unitRating } from "./words/equipment";
import { absence, amountOf, dayOf, listed, notRecorded, textOf, wordOf } from "./words/facts";
import { connectionWords } from "./words/vocabulary";
import { windowsWords } from "./words/windows";

/** For the customer, in plain English: what was fitted, when it charges, what they may change, whom to call. */
export function handover(papers: Papers): DocumentModel {
  const { job, assessment } = papers;
  return documentOf(papers, { slug: "05-handover", title: "Your chargepoint", subtitle: siteOf(job) }, [
    { kind: "heading", level: 1, text: "What was fitted" },
    ...job.chargepoints.map((unit) => fitted(papers, unit)),
    {
      kind: "facts",
      rows: [
        { label: "Fitted by", value: `${textOf(job.firm.name)}, ${dayOf(job.dates.installed)}` },
        { label: "Tested by", value: textOf(job.competentPerson.name) },
        { label: "Network", value: operatorName(assessment) },
        { label: "Network told", value: told(papers) },
      ],
    },
    ...hours(papers),
    ...rights(papers),
    { kind: "heading", level: 1, text: "Switching off" },
    {
      kind: "paragraph",
      text: "Stop the charge first, on the unit or in its app. Then turn off the switch marked for the chargepoint in your consumer unit.",
    },
    {
      kind: "caution",
      title: "Leave the sealed box alone",
      text: "The cut-out, where the supply comes in, belongs to the network. Never open it or break its seal.",
    },
    {
      kind: "caution",
      title: "A tingle from the car or from a tap?",
      text: `Do not touch it again, keep others away and call ${emergencyLine(job.site.territory)}. A device in a chargepoint cannot notice every fault of a shared network cable.`,
    },
    laterMetalworkCaution(reachBetweenEarths(job)),
    { kind: "heading", level: 1, text: "Whom to call" },
    callsTable(papers),
    { kind: "heading", level: 1, text: "Your papers" },
    ...paperList(papers),
    { kind: "heading", level: 1, text: "Handed over" },
    {
      kind: "signature",
      role: "customer",
      ...declared(papers),
      statement: "I have these papers. I was shown the default hours, the short wait and how to skip each of them.",
    },
  ]);
}

function fitted({ job }: Papers, unit: Chargepoint): Block {
  const place = job.site.chargepointPosition;
  const limit =
    absence(unit.configuredA) === null && unit.configuredA !== unit.ratedA
      ? `, set to ${amountOf(unit.configuredA, "A")}`
      : "";
  return {
    kind: "facts",
    rows: [
      {
        label: "Chargepoint",
        value: `${unitName(unit)}, ${wordOf(connectionWords, unit.connection)}${place ? `, ${place}` : ""}`,
      },
      { label: "Serial", value: [{ text: textOf(unit.serial), mono: true }] },
      {
        label: "Power",
        value: `up to ${amountOf(unit.smartCharging.maximumPowerKw, "kW")}, ${unitRating(unit)}${limit}`,
      },
    ],
  };
}

function told({ job, assessment }: Papers): string {
  const sent = job.operatorRecords.find(({ sentOn }) => sentOn !== null);
  if (sent?.sentOn) return `sent ${dayOf(sent.sentOn)}${sent.reference ? `, reference ${sent.reference}` : ""}`;
  const due = assessment.deadlines.find(({ what }) => what === "demand-notice" || what === "completion-notice");
  return due ? `to be told by ${dayOf(due.lastDay)}` : "not yet recorded";
}

/** Hours in force at handover: changed or removed ones count before those the unit came with. */
const inForce = ({ smartCharging }: Chargepoint) => smartCharging.atHandover ?? smartCharging.factoryDefault;

function hours({ job }: Papers): Block[] {
  const several = job.chargepoints.length > 1;
  const blocks: Block[] = [{ kind: "heading", level: 1, text: "When it charges" }];
  let figures = 0;
  for (const unit of job.chargepoints) {
    const windows = inForce(unit);
    const name = several ? `${unitName(unit)} (${unit.id}): ` : "";
    if (windows === null) {
      blocks.push({
        kind: "paragraph",
        text: `${name}the hours set in the unit were ${notRecorded}. Ask ${textOf(job.firm.name)}.`,
      });
    } else if (windows.length === 0) {
      blocks.push({ kind: "paragraph", text: `${name}no default hours are set. It charges when it is plugged in.` });
    } else {
      blocks.push(
        {
          kind: "paragraph",
          text: [{ text: `${name}${windowsWords(windows)}, unless you say otherwise.`, strong: true }],
        },
        {
          kind: "paragraph",
          text: "You can plug in at any time. To charge at once, start the charge on the unit or in its app.",
        },
        ...(unit.smartCharging.clock === "utc"
          ? [
              {
                kind: "paragraph",
                text: "The unit keeps UTC. In summer these hours come one hour later on your own clock.",
              } as const,
            ]
          : []),
        ...weekFigures(job, unit, windows).map(({ season, drawing }) =>
          figure(
            ++figures,
            drawing,
            season === "all year" ? "The hours in which it charges." : `The hours in which it charges, in ${season}.`,
          ),
        ),
      );
    }
  }
  return [...blocks, ...shortWait(job.chargepoints)];
}

function shortWait(units: readonly Chargepoint[]): Block[] {
  const longest = units
    .map(({ smartCharging }) => smartCharging.randomDelay.defaultMaximumS)
    .filter((seconds) => typeof seconds === "number");
  const wait = longest.length
    ? `a random time of up to ${number(longest)} seconds`
    : "a short random time, whose longest setting was not recorded";
  return [
    { kind: "heading", level: 1, text: "The short wait" },
    {
      kind: "paragraph",
      text: `When a charge is due to start, or its speed is to change, the unit first waits ${wait}. That keeps many cars from starting in the same second.`,
    },
    {
      kind: "paragraph",
      text: [
        { text: "To skip it, ", strong: true },
        { text: "start the charge by hand while it waits. That skips this wait only; the next charge waits again." },
      ],
    },
  ];
}

const number = (seconds: readonly number[]): string => String(Math.max(...seconds));

/** Rights under the 2021 Regulations, where the assessment found them to apply; else that they were judged not to. */
function rights({ job, assessment }: Papers): Block[] {
  const scopes = assessment.smartCharging.filter(({ rule }) => rule === "scope");
  const outside = scopes.find(({ outcome }) => outcome === "not-applicable");
  if (scopes.length > 0 && scopes.every(({ outcome }) => outcome === "not-applicable") && outside)
    return [
      { kind: "heading", level: 1, text: "Your choices" },
      {
        kind: "paragraph",
        text: `The smart-charging rules of 2021 were judged not to apply here: ${outside.because} You can still set the hours on the unit or in its app.`,
      },
    ];
  const months = job.chargepoints[0]?.smartCharging.historyMonths;
  const items: Text[] = [
    "Keep, change or remove the default hours, today and at any later time.",
    "Charge outside them whenever you choose.",
    "Change electricity supplier and keep the smart functions.",
    typeof months === "number"
      ? `See your use for the last ${months} months.`
      : "See your use over the months the unit keeps.",
    "Have the maker's statement of compliance, and its technical file when you ask.",
  ];
  return [
    { kind: "heading", level: 1, text: "Your choices" },
    { kind: "list", ordered: false, items },
  ];
}

function callsTable({ job, assessment }: Papers): Block {
  return {
    kind: "table",
    caption: "Keep this where you can find it.",
    columns: [
      { heading: "What happened", widthPercent: 40 },
      { heading: "Whom", widthPercent: 35 },
      { heading: "Call", widthPercent: 25 },
    ],
    rows: [
      ["Fire, smoke, sparks: everyone out first", "Emergency services", [{ text: "999", strong: true }]],
      [
        "Shock, tingle, heat at the intake, no supply",
        operatorName(assessment),
        [{ text: emergencyLine(job.site.territory), strong: true }],
      ],
      ["It will not charge", textOf(job.firm.name), [{ text: textOf(job.firm.phone), strong: true }]],
    ],
  };
}

function paperList({ job }: Papers): Block[] {
  const { certificate, buildingControl, chargepoints } = job;
  const statements = chargepoints
    .map(({ smartCharging }) => smartCharging.statementOfCompliance.reference)
    .filter((reference) => reference !== null);
  return [
    {
      kind: "facts",
      rows: [
        {
          label: "Electrical certificate",
          value: [{ text: textOf(certificate.number), mono: true }, { text: `, ${dayOf(certificate.issuedOn)}` }],
        },
        { label: "Building control", value: buildingControl.reference ?? notRecorded },
        { label: "Maker's statement", value: statements.length ? listed(statements) : notRecorded },
      ],
    },
  ];
}

function declared({ job }: Papers): { name: string | null; at: string | null } {
  const declaration = job.declarations.find(({ role }) => role === "customer");
  return { name: declaration?.name ?? job.customer.name, at: declaration?.at ?? null };
}
