import { plain } from "../exact";
import type { HouseholdAllowances } from "../parameters/demand";

/** Kinds of load the household table tells apart; `fixed` is anything else, taken in full. */
export type LoadKind =
  | "lighting"
  | "heating-and-power"
  | "cooking"
  | "instantaneous-water-heater"
  | "thermostatic-water-heater"
  | "floor-warming"
  | "storage-heating"
  | "standard-circuit"
  | "socket-outlets"
  | "fixed";

/** `ratedA` is one item's current; `hasSocket` says whether its control unit holds a socket-outlet. */
export type Load = { kind: LoadKind; ratedA: number; quantity: number; hasSocket: boolean };

export type Allowed = { kind: LoadKind; allowedA: number; sum: string };

const sumOf = (items: readonly number[]) => items.reduce((total, item) => total + item, 0);

/** The first `full` items whole, largest first, and a share of the rest. */
function largestFirst(items: readonly number[], full: number, restShare: number): { allowedA: number; sum: string } {
  const sorted = [...items].sort((a, b) => b - a);
  const whole = sorted.slice(0, full);
  const restA = sumOf(sorted.slice(full));
  return {
    allowedA: sumOf(whole) + restShare * restA,
    sum: `${whole.map(plain).join(" + ")}${restA > 0 ? ` + ${restShare} × ${plain(restA)}` : ""}`,
  };
}

/** A first amount whole and a share of what is above it. */
function firstThenShare(totalA: number, firstA: number, restShare: number): { allowedA: number; sum: string } {
  if (totalA <= firstA) return { allowedA: totalA, sum: plain(totalA) };
  return {
    allowedA: firstA + restShare * (totalA - firstA),
    sum: `${firstA} + ${restShare} × ${plain(totalA - firstA)}`,
  };
}

function cooking(loads: readonly Load[], totalA: number, allowances: HouseholdAllowances) {
  const base = firstThenShare(totalA, allowances.cookingFirstA, allowances.cookingRestShare);
  const sockets = sumOf(loads.filter((load) => load.hasSocket).map((load) => load.quantity));
  if (sockets === 0) return base;
  return {
    allowedA: base.allowedA + sockets * allowances.cookingSocketA,
    sum: `${base.sum} + ${sockets} × ${allowances.cookingSocketA} for the socket`,
  };
}

function allowed(kind: LoadKind, loads: readonly Load[], allowances: HouseholdAllowances) {
  const items = loads.flatMap((load) => Array<number>(load.quantity).fill(load.ratedA));
  const totalA = sumOf(items);
  switch (kind) {
    case "lighting":
      return {
        allowedA: allowances.lightingShare * totalA,
        sum: `${allowances.lightingShare} × ${plain(totalA)}`,
      };
    case "heating-and-power":
      return firstThenShare(totalA, allowances.heatingFirstA, allowances.heatingRestShare);
    case "cooking":
      return cooking(loads, totalA, allowances);
    case "instantaneous-water-heater":
      return largestFirst(items, 2, allowances.waterHeaterRestShare);
    case "standard-circuit":
      return largestFirst(items, 1, allowances.standardCircuitRestShare);
    case "socket-outlets":
      return largestFirst(items, 1, allowances.socketOutletRestShare);
    default:
      return { allowedA: totalA, sum: plain(totalA) };
  }
}

/** Demand of one phase of an individual household by the allowances, amps, with a sum for each kind of load. */
export function householdDemand(
  loads: readonly Load[],
  allowances: HouseholdAllowances,
): { totalA: number; kinds: Allowed[] } {
  const kinds = [...new Set(loads.map((load) => load.kind))].map((kind) => ({
    kind,
    ...allowed(
      kind,
      loads.filter((load) => load.kind === kind),
      allowances,
    ),
  }));
  return { totalA: sumOf(kinds.map((kind) => kind.allowedA)), kinds };
}
