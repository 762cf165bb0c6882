import type { Chargepoint } from "@/lib/notify/job";
import type { OpenPenResult } from "@/lib/notify/assessment";
import { laterMetalworkCaution, leaveSealsCaution } from "./cautions";
import { singleLineSheets } from "./drawings/single-line";
import { figure } from "./figures";
import { documentOf, operatorName, photosOf, siteOf, type Papers } from "./issue";
import type { Block, DocumentModel } from "./model";
import { checksTable, gravestFirst, outcomeLine, sourcesSection } from "./outcomes";
import { reachBetweenEarths, touchVoltageFigure } from "./open-pen-figures";
import { unitName } from "./words/equipment";
import { amountOf, listed, notRecorded, wordOf, yesNo } from "./words/facts";
import {
  deviceEvidenceWords,
  devicePositionWords,
  earthingWords,
  functionTestWords,
  locationWords,
  loopObtainedWords,
  openPenWords,
  reclosesWords,
} from "./words/vocabulary";

/** The arrangement, the measure against an open PEN for each chargepoint, its workings and the risk that remains. */
export function earthingAndOpenPen(papers: Papers): DocumentModel {
  const { job, assessment } = papers;
  const results = gravestFirst(assessment.openPen);
  const checks = assessment.checks.filter(({ group }) => group === "open-pen");
  const units = results.flatMap((result, index) => unitBlocks(papers, result, index, results.length > 1));
  const unjudged = job.chargepoints.filter(({ id }) => !results.some(({ chargepoint }) => chargepoint === id));
  const drawings = singleLineSheets(job, operatorName(assessment));
  const firstFigure = units.filter(({ kind }) => kind === "figure").length + 1;
  return documentOf(
    papers,
    { slug: "02-earthing-and-open-pen", title: "Earthing and open PEN", subtitle: siteOf(job) },
    [
      { kind: "heading", level: 1, text: "Arrangement" },
      arrangement(papers),
      ...units,
      ...unjudged.map((unit): Block => ({
        kind: "paragraph",
        text: `${unitName(unit)} was not assessed for an open PEN.`,
      })),
      ...(checks.length
        ? [
            { kind: "heading", level: 1, text: "Checks" } as const,
            ...checksTable("Checks of the earthing and of the measure against an open PEN.", gravestFirst(checks)),
          ]
        : []),
      { kind: "heading", level: 1, text: "Single-line diagram" },
      ...drawings.map((drawing, index) =>
        figure(
          firstFigure + index,
          drawing,
          `The intake and the circuits of this job, drawn from the job record${drawings.length > 1 ? `, sheet ${index + 1} of ${drawings.length}` : ""}.`,
        ),
      ),
      { kind: "heading", level: 1, text: "Cautions" },
      laterMetalworkCaution(reachBetweenEarths(job)),
      leaveSealsCaution,
      ...sourcesSection([...results.flatMap(({ sources }) => sources), ...checks.flatMap(({ sources }) => sources)]),
    ],
  );
}

function arrangement({ job, issue }: Papers): Block {
  const { supply } = job;
  const bonding = supply.bonding;
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      {
        label: "Supply earthing",
        value: `${wordOf(earthingWords, supply.earthing)}${supply.earthing === "TN-C-S" ? ", taken as PME" : ""}`,
      },
      { label: "Earthing conductor", value: [{ text: amountOf(supply.earthingConductorMm2, "mm²"), mono: true }] },
      {
        label: `Ze${supply.externalLoopObtained ? `, ${loopObtainedWords[supply.externalLoopObtained]}` : ""}`,
        value: [{ text: amountOf(supply.externalLoopImpedanceOhm, "Ω"), mono: true }],
      },
      { label: "Supply neutral", value: [{ text: amountOf(supply.supplyNeutralMm2, "mm²"), mono: true }] },
      {
        label: "Prospective fault current",
        value: [{ text: amountOf(supply.prospectiveFaultCurrentKa, "kA"), mono: true }],
      },
      {
        label: "Customer's own transformer",
        value: yesNo(supply.earthingConfirmedPrivate, "yes, confirmed", "no"),
      },
      {
        label: "Main bonding",
        value:
          bonding === null
            ? notRecorded
            : bonding.length === 0
              ? "none found"
              : listed(
                  bonding.map(
                    ({ service, mm2, seen }) => `${service} ${amountOf(mm2, "mm²")}${seen === true ? ", seen" : ""}`,
                  ),
                ),
      },
      {
        label: "Photos",
        value: photosOf(issue, ["earth-terminal", "bonding", "intake"]) ?? "none in this pack",
      },
    ],
  };
}

function unitBlocks(
  { job, issue, assessment }: Papers,
  result: OpenPenResult,
  index: number,
  several: boolean,
): Block[] {
  const unit = job.chargepoints.find(({ id }) => id === result.chargepoint);
  const method = unit?.openPen.method ? openPenWords[unit.openPen.method] : null;
  const title = method === null ? "Method not recorded" : method.charAt(0).toUpperCase() + method.slice(1);
  const drawing = touchVoltageFigure(job, assessment, result);
  return [
    {
      kind: "heading",
      level: 1,
      text: several ? `Method chosen, chargepoint ${result.chargepoint}` : "Method chosen",
    },
    outcomeLine({ outcome: result.outcome, title: `${title}.`, because: result.because, sources: result.sources }),
    ...(unit ? [unitFacts(unit, photosOf(issue, ["open-pen-device", "electrode", "neighbour-earths"]))] : []),
    ...figuresOf(result),
    ...(result.workings.length ? [{ kind: "workings", title: "Workings", lines: result.workings } as const] : []),
    ...(drawing ? [figure(index + 1, drawing, "Touch voltage with the PEN open, drawn for the whole demand.")] : []),
    ...(result.residualRisk
      ? [
          { kind: "heading", level: 2, text: "The risk that remains" } as const,
          { kind: "paragraph", text: result.residualRisk } as const,
        ]
      : []),
  ];
}

/** What the rule worked out, as far as the method has such figures. */
function figuresOf({ touchVoltageV, electrodeMaxOhm, imbalanceA }: OpenPenResult): Block[] {
  const rows = [
    { label: "Touch voltage worked out", value: touchVoltageV, unit: "V", decimals: 1 },
    { label: "Electrode, at most", value: electrodeMaxOhm, unit: "Ω", decimals: 2 },
    { label: "Imbalance, worst state", value: imbalanceA, unit: "A", decimals: 1 },
  ].filter(({ value }) => value !== null);
  if (rows.length === 0) return [];
  return [
    {
      kind: "facts",
      pairs: 2,
      rows: rows.map(({ label, value, unit, decimals }) => ({
        label,
        value: [{ text: amountOf(value, unit, decimals), mono: true as const }],
      })),
    },
  ];
}

function unitFacts(unit: Chargepoint, photos: string | null): Block {
  const { device, functionTest, electrodeOhm, separationFromOtherEarthsM, buriedSeparationM, method } = unit.openPen;
  const usesDevice = method?.includes("device") ?? false;
  const usesElectrode = method === "installation-electrode" || method === "tt" || electrodeOhm !== null;
  const named = [device.make, device.model].filter(Boolean).join(" ");
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      {
        label: "Chargepoint",
        value: [{ text: unitName(unit) }, { text: unit.serial ? `, ${unit.serial}` : "", mono: true }],
      },
      { label: "Place", value: wordOf(locationWords, unit.location) },
      ...(usesDevice
        ? [
            { label: "Device", value: `${wordOf(devicePositionWords, device.position)}${named ? `, ${named}` : ""}` },
            { label: "Standard declared", value: device.standard ?? notRecorded },
            { label: "Opens the earth too", value: yesNo(device.opensEarth) },
            { label: "Opens within", value: [{ text: amountOf(device.opensWithinS, "s"), mono: true as const }] },
            { label: "Closes again", value: wordOf(reclosesWords, device.recloses) },
            { label: "Evidence", value: wordOf(deviceEvidenceWords, device.evidence) },
            { label: "Watches every line", value: yesNo(device.watchesEveryLine) },
            { label: "Function test", value: wordOf(functionTestWords, functionTest) },
          ]
        : []),
      ...(usesElectrode
        ? [
            { label: "Electrode, measured", value: [{ text: amountOf(electrodeOhm, "Ω"), mono: true as const }] },
            {
              label: "From other earths, above ground",
              value: [{ text: amountOf(separationFromOtherEarthsM, "m"), mono: true as const }],
            },
            { label: "From buried metal", value: [{ text: amountOf(buriedSeparationM, "m"), mono: true as const }] },
          ]
        : []),
      { label: "Photos", value: photos ?? "none in this pack" },
    ],
  };
}
