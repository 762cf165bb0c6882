import type { Job } from "@/lib/notify/job";
import { cableName, deviceName, isolatorWords, rcdName, unitName, unitRating } from "../../words/equipment";
import { amountOf, listed, notRecorded, wordOf } from "../../words/facts";
import { cutOutEvidenceWords, earthingWords, openPenWords } from "../../words/vocabulary";
import { boardLines, boardTitle } from "./board";
import type { BoardPlan, Way } from "./plan";

const phasesOf = ({ phases }: Job["supply"]) =>
  phases === null ? "phases not recorded" : phases === 1 ? "1 phase" : `${phases} phases`;

function wayWords({ circuit, units, feeds }: Way): string {
  const ends = [
    ...units.map(
      (unit) =>
        `${unitName(unit)}, ${unitRating(unit)}, open PEN: ${unit.openPen.method ? openPenWords[unit.openPen.method] : notRecorded}`,
    ),
    ...feeds,
  ];
  const end = ends.length ? listed(ends) : "no chargepoint recorded";
  if (circuit === null) return `A unit whose circuit is not recorded: ${end}.`;
  return `Circuit ${circuit.id}, ${deviceName(circuit.device)}, ${rcdName(circuit.device)}, ${cableName(circuit.cable)}, to ${end}.`;
}

/** The drawing in sentences, for who cannot see it. */
export function singleLineWords(job: Pick<Job, "supply">, operatorName: string, plans: readonly BoardPlan[]): string {
  const { supply } = job;
  const intake =
    `${operatorName} service, ${wordOf(earthingWords, supply.earthing)} earthing, ${phasesOf(supply)}, to a cut-out of ` +
    `${amountOf(supply.cutOutRatingA, "A")} (${wordOf(cutOutEvidenceWords, supply.cutOutEvidence)}), then the meter, ` +
    `${isolatorWords(supply.isolatorAfterMeter)} and tails of ${amountOf(supply.tailsMm2, "mm²")}.`;
  const boards = plans.map((plan) =>
    [
      `${[boardTitle(plan, false), ...boardLines(plan.board)].join(", ")}${plan.fedBy ? `, fed from circuit ${plan.fedBy}` : ""}.`,
      ...plan.ways.map(wayWords),
    ].join(" "),
  );
  return [intake, `Earthing conductor ${amountOf(supply.earthingConductorMm2, "mm²")}.`, ...boards].join(" ");
}
