import { boardsTable } from "./boards-table";
import { leaveSealsCaution } from "./cautions";
import { circuitBlocks } from "./demand-and-circuit/circuit";
import { demandDrawings, demandFacts, equipmentTable, loadsTable } from "./demand-and-circuit/demand";
import { documentOf, siteOf, type Papers } from "./issue";
import type { Block, DocumentModel } from "./model";
import { checksTable, gravestFirst, sourcesSection, workingsOf } from "./outcomes";
import { amountOf, notRecorded } from "./words/facts";

/** The load survey, the supply, and each circuit with its design checks and their workings. */
export function demandAndCircuit(papers: Papers): DocumentModel {
  const { job, assessment } = papers;
  const of = (...groups: string[]) => gravestFirst(assessment.checks.filter(({ group }) => groups.includes(group)));
  const demandChecks = of("demand");
  const supplyChecks = of("supply");
  const powerQuality = of("power-quality");
  const circuitChecks = of("circuit");
  const cited = [...demandChecks, ...supplyChecks, ...powerQuality, ...circuitChecks].flatMap(({ sources }) => sources);
  return documentOf(papers, { slug: "04-demand-and-circuit", title: "Demand and circuit", subtitle: siteOf(job) }, [
    { kind: "heading", level: 1, text: "Demand" },
    demandFacts(papers),
    ...demandDrawings(papers),
    ...(assessment.demand.workings.length
      ? [{ kind: "workings", title: "How the demand was worked out", lines: assessment.demand.workings } as const]
      : []),
    ...loadsTable(papers),
    ...equipmentTable(papers),
    ...checksTable("Checks of the demand.", demandChecks),
    ...workingsOf(demandChecks, assessment.demand.workings),
    { kind: "heading", level: 1, text: "Supply" },
    supplyFacts(papers),
    ...checksTable("Checks of the supply.", supplyChecks),
    ...workingsOf(supplyChecks),
    ...(powerQuality.length
      ? [
          { kind: "heading", level: 1, text: "Power quality" } as const,
          ...checksTable("Checks of the power quality.", powerQuality),
          ...workingsOf(powerQuality),
        ]
      : []),
    ...boardsTable(job.boards),
    { kind: "heading", level: 1, text: "Circuits" },
    ...(job.circuits.length ? [] : [{ kind: "paragraph", text: "No circuit is recorded." } as const]),
    ...job.circuits.flatMap((circuit) => circuitBlocks(papers, circuit)),
    ...checksTable(
      "Checks that speak of no single circuit.",
      circuitChecks.filter(({ of: subject }) => !job.circuits.some(({ id }) => id === subject)),
    ),
    leaveSealsCaution,
    ...sourcesSection(cited),
  ]);
}

function supplyFacts({ job }: Papers): Block {
  const { supply } = job;
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Tails", value: [{ text: amountOf(supply.tailsMm2, "mm²"), mono: true }] },
      { label: "Tails, method", value: supply.tailsReferenceMethod ?? notRecorded },
      { label: "Fault current", value: [{ text: amountOf(supply.prospectiveFaultCurrentKa, "kA"), mono: true }] },
      { label: "Loop, line to neutral", value: [{ text: amountOf(supply.lineNeutralImpedanceOhm, "Ω"), mono: true }] },
      { label: "Authorised capacity", value: [{ text: amountOf(supply.authorisedCapacityKva, "kVA"), mono: true }] },
      { label: "Site demand", value: [{ text: amountOf(supply.siteDemandKva, "kVA"), mono: true }] },
    ],
  };
}
