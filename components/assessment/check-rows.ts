import type { Assessment } from "@/lib/notify/assessment";
import type { Group, Outcome, Reason } from "@/lib/notify/result";
import { citeAll, citeShort } from "@/templates/words/sources";

/** One check as a row of the table, its sources already in words. */
export type CheckRow = {
  key: string;
  outcome: Outcome;
  title: string;
  /** The circuit, board or chargepoint, where there are several. */
  of: string | null;
  because: string;
  recorded: string | null;
  limit: string | null;
  source: string;
  sources: string[];
  workings: readonly string[];
};

export type CheckGroup = { name: string; rows: CheckRow[]; tally: Record<Outcome, number>; isSettled: boolean };

const groupOrder: readonly [Group, string][] = [
  ["demand", "Demand"],
  ["supply", "Supply"],
  ["circuit", "Circuit"],
  ["open-pen", "Open PEN"],
  ["power-quality", "Power quality"],
  ["generation", "Generation"],
  ["settings", "Settings"],
];
const gravity: Record<Outcome, number> = { "not-met": 0, "cannot-tell": 1, met: 2, "not-applicable": 3 };

export const tallyOf = (reasons: readonly { outcome: Outcome }[]): Record<Outcome, number> => {
  const tally = { met: 0, "not-met": 0, "cannot-tell": 0, "not-applicable": 0 };
  for (const { outcome } of reasons) tally[outcome] += 1;
  return tally;
};

/** A reason as a row; `several` when the item it speaks of must be named. */
export const rowOf = (reason: Reason, index: number, several: boolean): CheckRow => ({
  key: `${reason.rule}-${reason.of ?? ""}-${index}`,
  outcome: reason.outcome,
  title: reason.title,
  of: several ? reason.of : null,
  because: reason.because,
  recorded: reason.recorded,
  limit: reason.limit,
  source: citeShort(reason.sources.slice(0, 1)),
  sources: citeAll(reason.sources),
  workings: reason.workings,
});

/** Every check of an assessment by group, in the fixed order, what has to be looked at first. */
export function checkGroups({ checks, smartCharging }: Assessment): CheckGroup[] {
  const all: readonly Reason[] = [...checks, ...smartCharging];
  return groupOrder.flatMap(([group, name]) => {
    const reasons = all.filter((reason) => reason.group === group);
    if (reasons.length === 0) return [];
    const several = new Set(reasons.map(({ of }) => of)).size > 1;
    const rows = reasons
      .map((reason, index) => rowOf(reason, index, several))
      .sort((one, other) => gravity[one.outcome] - gravity[other.outcome]);
    const tally = tallyOf(reasons);
    return [{ name, rows, tally, isSettled: tally["not-met"] + tally["cannot-tell"] === 0 }];
  });
}

/** The reasons of the route as rows, what decides it first. */
export const reasonRows = ({ route }: Assessment): CheckRow[] =>
  route.reasons
    .map((reason, index) => rowOf(reason, index, false))
    .sort((one, other) => gravity[one.outcome] - gravity[other.outcome]);
