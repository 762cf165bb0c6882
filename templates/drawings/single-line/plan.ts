import type { Board, Chargepoint, Circuit, JobFacts, Job } from "@/lib/notify/job";

/** One way out of a board: its circuit, what hangs on it, the boards it feeds in words. */
export type Way = { circuit: Circuit | null; units: readonly Chargepoint[]; feeds: readonly string[] };

export type BoardPlan = {
  key: string;
  /** Name in the record; null where the record does not say which board it is. */
  name: string | null;
  board: Board | null;
  /** The distribution circuit before it; null for a board on the tails. */
  fedBy: string | null;
  ways: readonly Way[];
};

type Drawable = Pick<Job | JobFacts, "boards" | "circuits" | "chargepoints">;

const keyOf = ({ board, fedFrom }: Circuit) => board ?? `after ${fedFrom ?? "the tails"}`;

/**
 * The boards of the record in the order the current passes them, each with its ways. Circuits whose board is not
 * recorded stand in a board without a name; units whose circuit is not recorded in a last one without a circuit.
 */
export function planOf({ boards, circuits, chargepoints }: Drawable): readonly BoardPlan[] {
  const keys = [...new Set([...boards.map(({ id }) => id), ...circuits.map(keyOf)])];
  const feedOf = (key: string) =>
    circuits.find((circuit) => keyOf(circuit) === key && circuit.fedFrom)?.fedFrom ?? null;
  const nameOf = (key: string) =>
    boards.some(({ id }) => id === key) || circuits.some(({ board }) => board === key) ? key : null;
  const plans = keys.map((key): BoardPlan => ({
    key,
    name: nameOf(key),
    board: boards.find(({ id }) => id === key) ?? null,
    fedBy: feedOf(key),
    ways: circuits
      .filter((circuit) => keyOf(circuit) === key)
      .map((circuit) => ({
        circuit,
        units: chargepoints.filter((unit) => unit.circuit === circuit.id),
        feeds: keys
          .filter((other) => other !== key && feedOf(other) === circuit.id)
          .map((other) => (nameOf(other) === null ? "a board not recorded" : `board ${other}`)),
      })),
  }));
  const loose = chargepoints.filter(({ circuit }) => circuit === null);
  const last: BoardPlan[] = loose.length
    ? [
        {
          key: "units without a circuit",
          name: null,
          board: null,
          fedBy: null,
          ways: loose.map((unit) => ({ circuit: null, units: [unit], feeds: [] })),
        },
      ]
    : [];
  return [...ordered(plans), ...last];
}

/** Boards on the tails first, then each after the board that feeds it. */
function ordered(plans: readonly BoardPlan[]): BoardPlan[] {
  const placed: BoardPlan[] = [];
  const place = (plan: BoardPlan) => {
    if (placed.includes(plan)) return;
    placed.push(plan);
    const circuits = plan.ways.map(({ circuit }) => circuit?.id);
    plans.filter(({ fedBy }) => fedBy !== null && circuits.includes(fedBy)).forEach(place);
  };
  plans.filter(({ fedBy }) => fedBy === null).forEach(place);
  plans.forEach(place);
  return placed;
}
