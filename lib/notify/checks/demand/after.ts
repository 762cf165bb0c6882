import { demandUnderLimitA } from "@/lib/calc/demand/curtailment";
import { roundTo } from "@/lib/calc/exact";
import type { IsoDate } from "@/lib/calc/parameter";
import type { Missing } from "@/lib/notify/assessment";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { addedUnits, leftOut, unsettled, type Added } from "./added";
import { limitLines, offeredLines, sumLines, takenOffLines } from "./after-lines";
import { countedA } from "./counted-current";
import { existingDemand, type Existing } from "./existing";
import { countedLimitA, statedLimitA } from "./load-limit";
import { sumByPhase, zeros } from "./phases";
import { takenOffA } from "./replaced";

export type After = {
  existing: Existing;
  /** Amps a phase with the limit when it counts; null when a phase cannot be told. */
  afterA: number[] | null;
  /** The same were the stated limit counted; null without a limit. */
  withLimitA: number[] | null;
  /** The least and the most that the worst phase can be, amps; `mostA` null when there is no upper bound. */
  leastA: number | null;
  mostA: number | null;
  /** The most the worst phase can be at rated currents and without any limit, amps. */
  unlimitedA: number | null;
  missing: Missing[];
  workings: string[];
};

/** Sums carry no float dust: nine decimals are far below any reading. */
const dustless = (amps: number) => roundTo(Math.max(0, amps), 9);

type Base = { perPhaseA: number[] | null; totalA: number };

/** Before the work, with what the figure left out and without what was taken away. */
function baseOf(existing: Existing, outside: Added, offA: readonly number[]): Base {
  const change = sumByPhase(
    outside.placedA,
    offA.map((amps) => -amps),
  );
  return {
    perPhaseA: existing.perPhaseA && sumByPhase(existing.perPhaseA, change).map(dustless),
    totalA: existing.totalA ?? 0,
  };
}

/** Bounds of the worst phase when some items have no phase yet. */
function bounds(phases: number, base: Base, units: Added, outside: Added, complete: boolean) {
  const loose = [...units.unplacedA, ...outside.unplacedA];
  const placed = sumByPhase(base.perPhaseA ?? outside.placedA, units.placedA);
  const looseTotal = loose.reduce((sum, amps) => sum + amps, 0) + base.totalA;
  const evenly = (placed.reduce((sum, amps) => sum + amps, 0) + looseTotal) / phases;
  const biggestLoose = loose.length ? Math.min(...placed) + Math.max(...loose) : 0;
  const known = base.perPhaseA !== null || base.totalA > 0;
  return {
    leastA: dustless(Math.max(...placed, evenly, biggestLoose)),
    mostA: known && complete ? dustless(Math.max(...placed) + looseTotal) : null,
  };
}

const limited = (amps: number | null, baseWorstA: number, limitA: number | null): number | null =>
  amps === null || limitA === null ? amps : Math.max(baseWorstA, Math.min(amps, limitA));

/** Demand after the work, with its bounds where a phase or a current is not told. */
export function demandAfter(job: JobFacts, on: IsoDate): After {
  const existing = existingDemand(job, on);
  const { phases } = job.supply;
  if (phases === null)
    return {
      existing,
      afterA: null,
      withLimitA: null,
      leastA: null,
      mostA: null,
      unlimitedA: null,
      missing: existing.missing,
      workings: existing.workings,
    };
  const currentOf = (unit: Chargepoint) => countedA(job, unit);
  const units = addedUnits(job, phases, currentOf);
  const outside = leftOut(job, phases);
  const base = baseOf(existing, outside, takenOffA(job, phases));
  const missing = [...existing.missing, ...units.missing, ...outside.missing, ...unsettledMissing(job)];
  const currentsKnown = [...units.missing, ...outside.missing].every(({ path }) => !path.endsWith(".ratedA"));
  const unlimited = bounds(phases, base, units, outside, currentsKnown);
  const told = units.missing.length === 0 && outside.missing.length === 0 ? base.perPhaseA : null;
  const afterA = told && sumByPhase(told, units.placedA).map(dustless);
  const underLimit = (limitA: number) =>
    told &&
    sumByPhase(told, units.placedA).map((sumA, index) => {
      const beforeA = told[index] as number;
      return dustless(demandUnderLimitA(beforeA, sumA - beforeA, limitA));
    });
  const statedLimit = statedLimitA(job);
  const withLimitA = statedLimit === null ? null : underLimit(statedLimit);
  const countedLimit = countedLimitA(job);
  const worstBaseA = Math.max(...(base.perPhaseA ?? zeros(phases)));
  const ratedUnits = addedUnits(job, phases, (unit) => knownNumber(unit.ratedA));
  const ratedKnown = [...ratedUnits.missing, ...outside.missing].every(({ path }) => !path.endsWith(".ratedA"));
  return {
    existing,
    afterA: countedLimit === null ? afterA : withLimitA,
    withLimitA,
    leastA: limited(unlimited.leastA, worstBaseA, countedLimit),
    mostA: limited(unlimited.mostA, worstBaseA, countedLimit),
    unlimitedA: bounds(phases, base, ratedUnits, outside, ratedKnown).mostA,
    missing,
    workings: [
      ...existing.workings,
      ...units.workings,
      ...outside.workings,
      ...takenOffLines(job, phases),
      ...(told ? sumLines(told, units.placedA) : []),
      ...(withLimitA ? limitLines(withLimitA, statedLimit, countedLimit !== null) : []),
      ...(statedLimit === null ? [] : offeredLines(statedLimit, base.perPhaseA, units.placedA, on)),
    ],
  };
}

const unsettledMissing = (job: JobFacts): Missing[] => [
  ...(job.demand.otherEquipment === null
    ? [{ path: "demand.otherEquipment", needed: "Other large equipment on the supply, or that there is none" }]
    : []),
  ...unsettled(job).map((index) => ({
    path: `demand.otherEquipment[${index}].inExistingDemand`,
    needed: "Whether the demand before the work includes this equipment",
  })),
];
