import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import type { DemandAssessment } from "../checks/demand";
import { countedA } from "../checks/demand/counted-current";
import type { JobFacts } from "../job";
import { knownNumber } from "../job/facts";
import { hasTrait } from "../operators";
import { commercialShare, kvaPerAmpere, ukpnTable } from "../parameters/network";
import { rule } from "../rule";
import { chargepointCurrentA, chargepointsKept } from "../unit-current";
import { demandReads } from "./demand";
import { finding, need, type Finding } from "./finding";

/** Tests of single operators, which replace only what they speak of. */
export const supplyTable = rule({
  id: "route.ukpn-table",
  group: "route",
  title: "UK Power Networks’ table of supply and chargepoint sizes",
  reads: [...demandReads, "supply.cutOutRatingA", "site.supplyNumber"],
  sources: ["ukpn-eds-08-5050 table 5-1"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export function tableFinding(job: JobFacts, demand: DemandAssessment, operatorId: string, on: IsoDate): Finding {
  if (!hasTrait(operatorId, "supply-table"))
    return finding(
      supplyTable.says("not-applicable", "The table holds for UK Power Networks only (distributors 10, 12 and 19)."),
      "none",
    );
  const ratingA = knownNumber(job.supply.cutOutRatingA);
  const unitsA = chargepointCurrentA(job);
  const { afterKva } = demand.result;
  const { phases } = job.supply;
  const used = { cutOutRatingA: ratingA, phases, chargepointsA: unitsA, afterKva };
  if (ratingA === null || phases === null || unitsA === null)
    return finding(
      supplyTable.says("cannot-tell", "Cut-out, phases or chargepoint current are not known.", { used }),
      "hold",
    );
  const row = valueAt(ukpnTable, on).find((each) => each.cutOutA === ratingA && each.phases === phases);
  if (!row)
    return finding(
      supplyTable.says(
        "not-met",
        `A ${ratingA} A cut-out on ${phases} ${phases === 1 ? "phase" : "phases"} is not in the table of supplies that need no assessment.`,
        { used },
      ),
      "apply",
    );
  const detail = { used, recorded: `${unitsA} A a phase`, limit: `≤ ${row.freeA} A a phase` };
  if (unitsA > row.freeA)
    return finding(
      supplyTable.says(
        "not-met",
        `${unitsA} A a phase of chargepoints on a supply of ${row.supply} is above the ${row.freeA} A that needs no assessment.`,
        detail,
      ),
      "apply",
    );
  if (afterKva === null)
    return finding(supplyTable.says("cannot-tell", "The demand after the work is not known.", detail), "hold");
  return afterKva > row.upgradeAboveKva
    ? finding(
        supplyTable.says(
          "not-met",
          `${afterKva.toFixed(2)} kVA after the work is above the ${row.upgradeAboveKva} kVA at which a ${row.supply} service is upgraded.`,
          {
            ...detail,
            recorded: `${afterKva.toFixed(2)} kVA`,
            limit: `≤ ${row.upgradeAboveKva} kVA`,
          },
        ),
        "apply",
      )
    : finding(
        supplyTable.says(
          "met",
          `${unitsA} A a phase of chargepoints on a supply of ${row.supply} needs no assessment (up to ${row.freeA} A a phase).`,
          detail,
        ),
        "none",
      );
}

export const scottishShare = rule({
  id: "route.commercial-share",
  group: "route",
  title: "Chargepoints below 30 % of the site’s demand",
  reads: [...demandReads, "site.premises", "site.supplyNumber"],
  sources: ["scottish-fleet-guide page 5"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** Premises the guide speaks of: neither dwellings nor buildings of many. */
const isCommercial = (premises: JobFacts["site"]["premises"]) =>
  premises !== null && premises !== "domestic" && premises !== "multi-occupied";

export function shareFinding(job: JobFacts, demand: DemandAssessment, operatorId: string, on: IsoDate): Finding {
  if (!hasTrait(operatorId, "commercial-share") || !isCommercial(job.site.premises))
    return finding(
      scottishShare.says("not-applicable", "The share holds for commercial sites of distributors 17 and 18 only."),
      "none",
    );
  const share = valueAt(commercialShare, on);
  const { existingA } = demand.result;
  const beforeKva = existingA ? sum(existingA) * valueAt(kvaPerAmpere, on) : null;
  const unitsKva = unitsKvaOf(job, on);
  const used = { beforeKva: rounded(beforeKva), chargepointsKva: rounded(unitsKva), share };
  if (!beforeKva || unitsKva === null)
    return finding(
      scottishShare.says("cannot-tell", "The demand before the work or the chargepoints’ power is not known.", {
        used,
      }),
      "hold",
      [need("demand.existingA", "the recorded demand of the site before the work")],
    );
  const percent = (100 * unitsKva) / beforeKva;
  const limit = share * 100;
  const detail = {
    used,
    recorded: `${percent.toFixed(1)} %`,
    limit: `< ${limit} %`,
    workings: [`${unitsKva.toFixed(2)} kVA ÷ ${beforeKva.toFixed(2)} kVA = ${percent.toFixed(1)} %`],
  };
  const figure = `Chargepoints are ${percent.toFixed(1)} % of the recorded demand before the work; the guide does not say which demand is meant`;
  return percent < limit
    ? finding(scottishShare.says("met", `${figure}. Below ${limit} % they are only notified.`, detail), "none")
    : finding(
        scottishShare.says("not-met", `${figure}. At ${limit} % or more the operator is asked first.`, detail),
        "apply",
      );
}

const sum = (figures: readonly number[]) => figures.reduce((total, each) => total + each, 0);
const rounded = (value: number | null) => (value === null ? null : Number(value.toFixed(3)));

function unitsKvaOf(job: JobFacts, on: IsoDate): number | null {
  const each = [
    ...job.chargepoints.map((unit) => ({ amperes: countedA(job, unit), phases: unit.phases })),
    ...chargepointsKept(job).map(({ ratedA }) => ({ amperes: knownNumber(ratedA), phases: 1 as const })),
  ];
  if (each.some(({ amperes, phases }) => amperes === null || phases === null)) return null;
  return sum(each.map(({ amperes, phases }) => Number(amperes) * Number(phases))) * valueAt(kvaPerAmpere, on);
}

export const multiOccupied = rule({
  id: "route.multi-occupied",
  group: "route",
  title: "One household or business on the supply",
  reads: ["site.premises"],
  sources: ["ukpn-eds-08-5050 figure 4-1", "ena-guidance"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export function multiOccupiedFinding({ site }: JobFacts): Finding {
  const used = { premises: site.premises };
  if (site.premises === null)
    return finding(multiOccupied.says("cannot-tell", "The kind of premises is not recorded.", { used }), "hold");
  return site.premises === "multi-occupied"
    ? finding(
        multiOccupied.says(
          "not-met",
          "A building of many occupiers shares the supply: telephone the operator first, then apply with all load assessed.",
          { used },
        ),
        "apply",
      )
    : finding(
        multiOccupied.says("met", "The premises are not recorded as shared by many occupiers.", { used }),
        "none",
      );
}

export const highwayEarthing = rule({
  id: "route.highway-earthing",
  group: "route",
  title: "Earthing on the highway, UK Power Networks",
  reads: [
    "site.premises",
    "site.supplyNumber",
    "supply.earthing",
    "chargepoints[].openPen.method",
    "chargepoints[].openPen.device.evidence",
  ],
  sources: ["ukpn-eds-08-5050 table 7-1"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const deviceMethods = ["line-neutral-window-device", "cpc-earth-70V-device", "equivalent-device"];

/** On the highway this operator takes its own earth only with a device from its list, or an electrode instead. */
export function highwayFinding(job: JobFacts, operatorId: string): Finding {
  const { earthing } = job.supply;
  if (job.site.premises !== "public-highway" || !hasTrait(operatorId, "supply-table"))
    return finding(
      highwayEarthing.says("not-applicable", "The terms are for the highway in UK Power Networks’ areas."),
      "none",
    );
  const used = { earthing, methods: job.chargepoints.map(({ openPen }) => openPen.method) };
  if (
    earthing === null ||
    earthing === "unknown" ||
    job.chargepoints.some(({ openPen }) => openPen.method === null && earthing !== "TN-C-S")
  )
    return finding(
      highwayEarthing.says("cannot-tell", "Earthing of the supply or the measure chosen is not known.", { used }),
      "hold",
      [need("supply.earthing", "the earthing arrangement of the supply")],
    );
  const kept = job.chargepoints.filter(({ openPen }) => earthing === "TN-C-S" && openPen.method !== "tt");
  const bare = kept.filter(
    ({ openPen }) => !deviceMethods.includes(openPen.method ?? "") || openPen.device.evidence === "none",
  );
  if (bare.length)
    return finding(
      highwayEarthing.says(
        "not-met",
        "On the highway this operator’s earth may be used only with an assessed open-PEN device, or an electrode stands in its place: agree the earthing first.",
        { used },
      ),
      "apply",
    );
  const unlisted = kept.findIndex(({ openPen }) => openPen.device.evidence !== "operator-list");
  return unlisted >= 0
    ? finding(
        highwayEarthing.says(
          "cannot-tell",
          "Whether the device is on the operator’s list of assessed devices is not recorded.",
          { used },
        ),
        "hold",
        [
          need(
            `chargepoints[${job.chargepoints.indexOf(kept[unlisted]!)}].openPen.device.evidence`,
            "the device on the operator’s list",
          ),
        ],
      )
    : finding(
        highwayEarthing.says("met", "The earthing is one that the operator takes on the highway.", { used }),
        "none",
      );
}
