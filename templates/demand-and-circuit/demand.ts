import { demandDayFigure, demandFigure } from "../demand-figures";
import { figure } from "../figures";
import type { Papers } from "../issue";
import type { Block } from "../model";
import { amountOf, dayOf, notRecorded, number, phaseAmps, textOf, wordOf, yesNo } from "../words/facts";
import { demandMethodWords, equipmentKindWords, loadKindWords, loadLimitWords } from "../words/vocabulary";

/** Demand before and after with its method, the load limit with both figures. */
export function demandFacts({ job, assessment }: Papers): Block {
  const { demand, supply } = job;
  const result = assessment.demand;
  const { measurement, loadLimit } = demand;
  const limited = loadLimit.kind !== null && loadLimit.kind !== "none";
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Demand before", value: [{ text: phaseAmps(result.existingA), mono: true }] },
      {
        label: "Demand after",
        value: [
          { text: result.afterA ? phaseAmps(result.afterA) : "cannot tell", mono: true },
          { text: result.afterKva === null ? "" : `, ${amountOf(result.afterKva, "kVA", 2)}`, mono: true },
        ],
      },
      { label: "Method", value: wordOf(demandMethodWords, demand.method) },
      { label: "Assessed", value: `${textOf(demand.assessor)}, ${dayOf(demand.assessedOn)}` },
      ...(demand.method === "measured"
        ? [
            {
              label: "Measured",
              value: `${dayOf(measurement.from)} to ${dayOf(measurement.to)}, every ${amountOf(measurement.resolutionS, "s")}, each phase: ${yesNo(measurement.perPhase)}`,
            },
          ]
        : []),
      { label: "Cut-out", value: [{ text: amountOf(supply.cutOutRatingA, "A"), mono: true as const }] },
      { label: "Load limit", value: wordOf(loadLimitWords, loadLimit.kind) },
      ...(limited
        ? [
            { label: "Limit set", value: [{ text: amountOf(loadLimit.limitA, "A"), mono: true as const }] },
            { label: "Counted in the demand", value: yesNo(result.limitCounted) },
            {
              label: "With the limit it would be",
              value: [{ text: phaseAmps(result.withLimitA), mono: true as const }],
            },
            { label: "Operator's agreement", value: textOf(loadLimit.operatorAgreement) },
            { label: "Fail-safe tested", value: yesNo(loadLimit.failSafeTested) },
            { label: "Sealed by", value: textOf(loadLimit.sealedBy) },
          ]
        : []),
    ],
  };
}

/** The demand of each phase, and through the day where there are half hours. */
export function demandDrawings({ job, assessment }: Papers): Block[] {
  const day = demandDayFigure(job, assessment);
  const phases = demandFigure(job, assessment);
  return [
    ...(phases ? [figure(1, phases, "Demand of each phase before and after the work.")] : []),
    ...(day
      ? [
          figure(
            phases ? 2 : 1,
            day,
            "Highest half hour at each time of day. A half hour is an average; a shorter moment may be higher.",
          ),
        ]
      : []),
  ];
}

/** The load survey. */
export function loadsTable({ job }: Papers): Block[] {
  const { loads } = job.demand;
  if (!loads?.length) return [];
  return [
    {
      kind: "table",
      caption: "Loads found in the survey.",
      columns: [
        { heading: "Load", widthPercent: 46 },
        { heading: "Rated", widthPercent: 18, align: "right", mono: true },
        { heading: "Number", widthPercent: 18, align: "right" },
        { heading: "Phase", widthPercent: 18 },
      ],
      rows: loads.map(({ kind, ratedA, quantity, phase, socketInControlUnit }) => [
        `${loadKindWords[kind]}${socketInControlUnit === true ? ", with a socket in its control unit" : ""}`,
        amountOf(ratedA, "A"),
        number(quantity),
        phase ?? "–",
      ]),
    },
  ];
}

/** Heat pumps, solar panels, batteries and other chargepoints on the same supply. */
export function equipmentTable({ job }: Papers): Block[] {
  const { otherEquipment } = job.demand;
  if (otherEquipment === null) return [{ kind: "paragraph", text: "Other low-carbon equipment: not recorded." }];
  if (otherEquipment.length === 0) return [{ kind: "paragraph", text: "Other low-carbon equipment: none found." }];
  return [
    {
      kind: "table",
      caption: "Other low-carbon equipment on the same supply.",
      columns: [
        { heading: "Equipment", widthPercent: 38 },
        { heading: "Rated", widthPercent: 14, align: "right", mono: true },
        { heading: "Phase", widthPercent: 12 },
        { heading: "In the demand before", widthPercent: 18 },
        { heading: "Accepted under", widthPercent: 18 },
      ],
      rows: otherEquipment.map(({ kind, make, model, ratedA, phase, inExistingDemand, acceptance }) => [
        [equipmentKindWords[kind], [make, model].filter(Boolean).join(" ")].filter(Boolean).join(", "),
        amountOf(ratedA, "A"),
        phase ?? "–",
        inExistingDemand === null ? notRecorded : inExistingDemand === "unknown" ? "not known" : inExistingDemand,
        textOf(acceptance),
      ]),
    },
  ];
}
