import { householdDemand, type Load } from "@/lib/calc/demand/diversity";
import { ampsOfHalfHour, readHalfHours } from "@/lib/calc/demand/half-hourly";
import { britishTimeText } from "@/lib/calc/demand/local-time";
import { fixed, plain } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { householdAllowances } from "@/lib/calc/parameters/demand";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import type { Missing } from "@/lib/notify/assessment";
import type { Job, JobFacts } from "@/lib/notify/job";
import { inForce, outOfForce } from "../rule";
import { phaseIndex, phaseLabel } from "./phases";

/** Demand before the work by one method. */
export type Existing = {
  /** One figure a phase, amps, full precision; null when it cannot be told. */
  perPhaseA: number[] | null;
  /** Known only as the sum over the phases, amps; null otherwise. */
  totalA: number | null;
  workings: string[];
  missing: Missing[];
};

const unknown = (missing: Missing[], workings: string[] = []): Existing => ({
  perPhaseA: null,
  totalA: null,
  workings,
  missing,
});

type Method = NonNullable<Job["demand"]["method"]>;

/** Demand before the work by the recorded method; the others, where their data is there, print beside it. */
export function existingDemand(job: JobFacts, on: IsoDate): Existing {
  const { method } = job.demand;
  const { phases } = job.supply;
  if (phases === null) return unknown([{ path: "supply.phases", needed: "The number of phases of the supply" }]);
  if (method === null) return unknown([{ path: "demand.method", needed: "How the demand before the work was found" }]);
  const chosen = byMethod(method, job, phases, on);
  return { ...chosen, workings: [...chosen.workings, ...beside(method, job, phases, on)] };
}

function byMethod(method: Method, job: JobFacts, phases: number, on: IsoDate): Existing {
  if (method === "half-hourly") return byHalfHours(job, phases, on);
  if (method === "diversity") return byAllowances(job, phases, on);
  return byFigures(job, phases, method);
}

function beside(chosen: Method, job: JobFacts, phases: number, on: IsoDate): string[] {
  const others: [Method, boolean, string][] = [
    ["measured", job.demand.existingA !== null && chosen !== "declared", "figures recorded"],
    ["half-hourly", (job.demand.halfHourKwh ?? []).length > 0, "half-hourly data"],
    ["diversity", (job.demand.loads ?? []).length > 0, "household allowances"],
  ];
  return others.flatMap(([method, there, words]) => {
    if (method === chosen || !there) return [];
    const other = byMethod(method, job, phases, on);
    if (other.perPhaseA === null) return [];
    return [`Beside it, not used: ${other.perPhaseA.map(plain).join(", ")} A by ${words}.`];
  });
}

function byFigures(job: JobFacts, phases: number, method: Method): Existing {
  const figures = job.demand.existingA;
  if (figures === null || figures.length !== phases)
    return unknown([
      {
        path: "demand.existingA",
        needed:
          phases === 1 ? "The demand before the work, amps" : `The demand before the work on each of ${phases} phases`,
      },
    ]);
  const how = method === "measured" ? "measured" : "declared";
  const workings = figures.map(
    (amps, index) => `${phaseLabel(phases, index)}demand before the work, ${how} = ${plain(amps)} A`,
  );
  return { perPhaseA: figures, totalA: null, workings, missing: [] };
}

function byHalfHours(job: JobFacts, phases: number, on: IsoDate): Existing {
  const series = readHalfHours(job.demand.halfHourKwh ?? []);
  if (series === null) return unknown([{ path: "demand.halfHourKwh", needed: "The meter's half-hourly readings" }]);
  const nominalV = inForce(() => valueAt(nominalVoltageV, on));
  if (nominalV === null) return unknown([], [outOfForce(on)]);
  const amps = ampsOfHalfHour(series.peakKwh, nominalV);
  const workings = [
    `Highest half hour ${plain(series.peakKwh)} kWh, starting ${britishTimeText(series.peakStartMs)} local time`,
    `2 × ${plain(series.peakKwh)} kWh × 1000 ÷ ${nominalV} V = ${fixed(amps, 2)} A, the half-hour average`,
    "Maximum demand is counted by half hours; the momentary current can be higher.",
  ];
  if (phases === 1) return { perPhaseA: [amps], totalA: null, workings, missing: [] };
  return {
    perPhaseA: null,
    totalA: amps,
    workings: [
      ...workings,
      `That is the sum of ${phases} phases: ${fixed(amps / phases, 2)} A a phase if balanced, ${fixed(amps, 2)} A if all on one.`,
    ],
    missing: [{ path: "demand.existingA", needed: "The demand of each phase: a total says nothing about one phase" }],
  };
}

function byAllowances(job: JobFacts, phases: number, on: IsoDate): Existing {
  const loads = job.demand.loads ?? [];
  const missing: Missing[] = loads.flatMap((load, index) => [
    ...(phaseIndex(phases, load.phase) === null
      ? [{ path: `demand.loads[${index}].phase`, needed: "The phase this load is on" }]
      : []),
    ...(load.kind === "cooking" && load.socketInControlUnit === null
      ? [
          {
            path: `demand.loads[${index}].socketInControlUnit`,
            needed: "Whether the cooker's control unit has a socket",
          },
        ]
      : []),
  ]);
  if (loads.length === 0) missing.push({ path: "demand.loads", needed: "The loads of the household, item by item" });
  if (missing.length) return unknown(missing);
  const allowances = inForce(() => valueAt(householdAllowances, on));
  if (allowances === null) return unknown([], [outOfForce(on)]);
  const perPhase = Array.from({ length: phases }, (_, index) =>
    householdDemand(loads.filter((load) => phaseIndex(phases, load.phase) === index).map(asLoad), allowances),
  );
  const workings = perPhase.flatMap(({ kinds, totalA }, index) => [
    ...kinds.map(
      ({ kind, sum, allowedA }) =>
        `${phaseLabel(phases, index)}${kind.replaceAll("-", " ")}: ${sum} = ${fixed(allowedA, 2)} A`,
    ),
    `${phaseLabel(phases, index)}demand before the work by household allowances = ${fixed(totalA, 2)} A`,
  ]);
  return { perPhaseA: perPhase.map(({ totalA }) => totalA), totalA: null, workings, missing: [] };
}

const asLoad = ({
  kind,
  ratedA,
  quantity,
  socketInControlUnit,
}: NonNullable<Job["demand"]["loads"]>[number]): Load => ({
  kind,
  ratedA,
  quantity,
  hasSocket: socketInControlUnit === true,
});
