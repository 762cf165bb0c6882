import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import type { DemandAssessment } from "../checks/demand";
import type { Missing } from "../assessment";
import { ownFigure, type OperatorRules } from "../firm-rules";
import type { JobFacts } from "../job";
import { knownNumber } from "../job/facts";
import { hasTrait } from "../operators";
import { dwellingLimitA, nieBandA } from "../parameters/network";
import { registerFigure } from "../register-figures";
import type { FactLog } from "../result";
import { rule } from "../rule";
import { finding, need, unique, type Finding } from "./finding";

/** Whether the most loaded phase stays within a limit: proven above it by its least, within it only when all is told. */
function against(limitA: number, { result, leastWorstAfterA }: DemandAssessment) {
  const worstA = result.afterA ? Math.max(...result.afterA) : null;
  const aboveA = worstA ?? leastWorstAfterA;
  if (aboveA !== null && aboveA > limitA)
    return { verdict: "above", figureA: aboveA, atLeast: worstA === null } as const;
  return worstA === null ? null : ({ verdict: "within", figureA: worstA, atLeast: false } as const);
}

/** What the demand after the work is worked out from. */
export const demandReads = [
  "demand.method",
  "demand.existingA",
  "demand.halfHourKwh",
  "demand.loads",
  "demand.otherEquipment",
  "demand.loadLimit",
  "supply.phases",
  "chargepoints[].ratedA",
  "chargepoints[].configuredA",
  "chargepoints[].phases",
  "chargepoints[].phase",
] as const;

export const demandKnown = rule({
  id: "route.demand-known",
  group: "route",
  title: "Demand after the work known, with evidence",
  reads: [...demandReads, "demand.assessor", "demand.measurement"],
  sources: ["ena-lct-form", "our-practice"],
  outcomes: ["met", "cannot-tell"],
});

export function demandFinding(job: JobFacts, demand: DemandAssessment): Finding {
  const { result, evidence } = demand;
  const used = { afterA: result.afterA };
  const gaps = unique([...demand.missing, ...askedAlways(job)]);
  if (result.afterA === null || !demand.everyPhaseKnown || gaps.length)
    return finding(
      demandKnown.says("cannot-tell", "The demand after the work cannot be worked out from what is recorded.", {
        used,
      }),
      "hold",
      gaps.length ? gaps : [need("demand.existingA", "the demand before the work, one figure a phase")],
    );
  if (evidence.outcome !== "met")
    return finding(demandKnown.says("cannot-tell", evidence.because, { used, sources: evidence.sources }), "hold", [
      need(evidencePath(job), "a demand survey that carries the figure"),
    ]);
  return finding(
    demandKnown.says("met", `${amperes(result.afterA)} A after the work, with its survey on record.`, {
      used,
      recorded: `${amperes(result.afterA)} A`,
    }),
    "none",
  );
}

const amperes = (perPhase: readonly number[]) => perPhase.map((each) => each.toFixed(1)).join(", ");

/** What a notice always needs beside the figure itself. */
function askedAlways({ demand, supply }: JobFacts): Missing[] {
  const gaps: Missing[] = [];
  if (supply.phases === null) gaps.push(need("supply.phases", "the number of phases of the supply"));
  if (demand.method === null) gaps.push(need("demand.method", "how the demand was found"));
  if (demand.assessor === null) gaps.push(need("demand.assessor", "who assessed the demand"));
  if (demand.otherEquipment === null)
    gaps.push(
      need(
        "demand.otherEquipment",
        "other chargepoints, heat pumps, solar panels or batteries, or that there are none",
      ),
    );
  return gaps;
}

function evidencePath({ demand }: JobFacts): string {
  if (demand.method === "measured") return "demand.measurement";
  if (demand.method === "half-hourly") return "demand.halfHourKwh";
  if (demand.method === "declared") return "supply.authorisedCapacityKva";
  return "demand.loads";
}

export const withinCutOut = rule({
  id: "route.demand-over-cut-out",
  group: "route",
  title: "Demand not above the cut-out rating",
  reads: [...demandReads, "supply.cutOutRatingA"],
  sources: ["ena-lct-form section B", "npg-lct"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export function cutOutLimit(job: JobFacts, demand: DemandAssessment): Finding {
  const ratingA = knownNumber(job.supply.cutOutRatingA);
  const compared = ratingA === null ? null : against(ratingA, demand);
  const used = { afterA: compared?.figureA ?? null, cutOutRatingA: ratingA };
  if (compared === null)
    return finding(withinCutOut.says("cannot-tell", "Demand or cut-out rating is not known.", { used }), "hold");
  const figure = figureWords(compared);
  const detail = { used, recorded: figure, limit: `≤ ${ratingA} A` };
  return compared.verdict === "above"
    ? finding(
        withinCutOut.says("not-met", `${figure} after the work is above the cut-out rating of ${ratingA} A.`, detail),
        "apply",
      )
    : finding(
        withinCutOut.says("met", `${figure} after the work is within the cut-out rating of ${ratingA} A.`, detail),
        "none",
      );
}

const figureWords = ({ figureA, atLeast }: { figureA: number; atLeast: boolean }) =>
  `${atLeast ? "At least " : ""}${figureA.toFixed(1)} A`;

export const withinDwellingLimit = rule({
  id: "route.demand-over-60A",
  group: "route",
  title: "Demand of a dwelling not above 60 A",
  reads: [...demandReads, "site.premises"],
  sources: ["ena-lct-form section B", "nie-lct", "ukpn-eds-08-5050 table 5-1"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export function dwellingLimit(
  job: JobFacts,
  demand: DemandAssessment,
  operatorId: string,
  rules: OperatorRules,
  on: IsoDate,
): Finding {
  const own = ownFigure(rules, "asksFirstAboveA");
  const register = registerFigure("asksFirstAboveA", operatorId, on);
  const limitA = own?.value ?? valueAt(dwellingLimitA, on);
  const compared = against(limitA, demand);
  const both: FactLog = own ? { registerLimitA: register.value, firmLimitA: own.value } : {};
  const used: FactLog = { afterA: compared?.figureA ?? null, limitA, ...both };
  const limitWords = own ? `${limitA} A, ${own.said} where the register has ${register.words}` : `${limitA} A`;
  const spare = (because: string) => finding(withinDwellingLimit.says("not-applicable", because, { used }), "none");
  if (job.site.premises === null)
    return finding(withinDwellingLimit.says("cannot-tell", "The kind of premises is not recorded.", { used }), "hold", [
      need("site.premises", "the kind of premises"),
    ]);
  if (job.site.premises !== "domestic") return spare(`The ${limitA} A test is for dwellings.`);
  if (!own && hasTrait(operatorId, "supply-table"))
    return spare("UK Power Networks sets its own table in place of the 60 A test.");
  if (compared === null)
    return finding(
      withinDwellingLimit.says("cannot-tell", "The demand after the work is not known.", { used }),
      "hold",
    );
  const figure = figureWords(compared);
  const detail = { used, recorded: figure, limit: `≤ ${limitA} A` };
  if (compared.verdict === "within")
    return finding(
      withinDwellingLimit.says(
        "met",
        `${figure} after the work is within ${limitWords}, so the operator is told after fitting.`,
        detail,
      ),
      "none",
    );
  return finding(
    withinDwellingLimit.says(
      "not-met",
      `${figure} after the work is above ${limitWords}, ${form(operatorId, compared.figureA, on)}`,
      detail,
    ),
    "apply",
  );
}

function form(operatorId: string, worstA: number, on: IsoDate): string {
  if (!hasTrait(operatorId, "band-above-dwelling-limit")) return "so the operator is asked before fitting.";
  const topA = valueAt(nieBandA, on);
  return worstA <= topA
    ? `up to ${topA} A: NIE Networks takes the application on the same form, before fitting.`
    : `and above ${topA} A: NIE Networks asks for the data of an alteration, before fitting.`;
}

export const withinCapacity = rule({
  id: "route.authorised-capacity",
  group: "route",
  title: "Demand not above the authorised capacity",
  reads: [...demandReads, "supply.authorisedCapacityKva", "site.premises"],
  sources: ["ena-guidance", "scottish-fleet-guide page 5"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export function capacityLimit(job: JobFacts, demand: DemandAssessment): Finding {
  const { premises } = job.site;
  const capacity = job.supply.authorisedCapacityKva;
  const capacityKva = knownNumber(capacity);
  const afterKva = demand.result.afterKva;
  const used = { afterKva, authorisedCapacityKva: capacityKva };
  if (premises === null || premises === "domestic")
    return finding(
      withinCapacity.says("not-applicable", "A dwelling has no authorised capacity to compare.", { used }),
      "none",
    );
  const missing = [
    need("supply.authorisedCapacityKva", "the authorised capacity from the connection agreement, in kVA"),
  ];
  if (capacity === null)
    return finding(
      withinCapacity.says("cannot-tell", "Outside dwellings the authorised capacity decides, and none is recorded.", {
        used,
      }),
      "hold",
      missing,
    );
  if (capacityKva === null)
    return finding(
      withinCapacity.says("cannot-tell", "The authorised capacity could not be told, so the operator is asked first.", {
        used,
      }),
      "apply",
      missing,
    );
  if (afterKva === null)
    return finding(withinCapacity.says("cannot-tell", "The demand after the work is not known.", { used }), "hold");
  const detail = { used, recorded: `${afterKva.toFixed(2)} kVA`, limit: `≤ ${capacityKva} kVA` };
  return afterKva > capacityKva
    ? finding(
        withinCapacity.says(
          "not-met",
          `${afterKva.toFixed(2)} kVA after the work is above the authorised ${capacityKva} kVA.`,
          detail,
        ),
        "apply",
      )
    : finding(
        withinCapacity.says(
          "met",
          `${afterKva.toFixed(2)} kVA after the work is within the authorised ${capacityKva} kVA.`,
          detail,
        ),
        "none",
      );
}
