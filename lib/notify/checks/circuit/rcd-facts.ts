import { entryAt, type IsoDate } from "@/lib/calc/parameter";
import {
  disconnectionTn,
  disconnectionTt,
  fixedCircuitUpToA,
  socketCircuitUpToA,
} from "@/lib/calc/parameters/protection";
import type { Chargepoint, Circuit, JobFacts } from "@/lib/notify/job";
import type { Earthing } from "../facts";

/** Chargepoints recorded on this very circuit. */
export const unitsOn = (job: JobFacts, circuit: Circuit): Chargepoint[] =>
  job.chargepoints.filter((unit) => unit.circuit === circuit.id);

export type RcdType = "AC" | "A" | "F" | "B";
export type CircuitRcd =
  | { standing: "there"; type: RcdType; ratedMa: number | null }
  | { standing: "none" }
  | { standing: "not told"; what: string };

const known = ["AC", "A", "F", "B"];

/** The RCD that protects a circuit's chargepoints, wherever it stands. The d.c. detector alone is none. */
export function rcdOf(job: JobFacts, circuit: Circuit): CircuitRcd {
  const { rcdPlace, rcdType, rcdMa } = circuit.device;
  if (rcdPlace === "none") return { standing: "none" };
  if (rcdPlace === null || rcdPlace === "unknown") return { standing: "not told", what: "Where the RCD stands" };
  const type = rcdPlace === "in-chargepoint" ? builtInType(unitsOn(job, circuit)) : rcdType;
  if (type === "none") return { standing: "none" };
  if (type === null || !known.includes(type)) return { standing: "not told", what: "The type of the RCD" };
  return { standing: "there", type: type as RcdType, ratedMa: rcdMa };
}

/** The type all units of the circuit have built in; `unknown` when they differ. */
function builtInType(units: readonly Chargepoint[]): Chargepoint["builtInRcd"] {
  const [first, ...rest] = units.map(({ builtInRcd }) => builtInRcd);
  if (first === undefined) return null;
  return rest.every((type) => type === first) ? first : "unknown";
}

/** Longest disconnection a circuit may take, seconds. A socket-outlet on a larger device keeps the short time. */
export function disconnectionS(job: JobFacts, circuit: Circuit, earthing: Earthing, on: IsoDate): number {
  const times = entryAt(earthing === "TT" ? disconnectionTt : disconnectionTn, on).value;
  const ratingA = circuit.device.ratingA ?? 0;
  const tethered = unitsOn(job, circuit).every(({ connection }) => connection === "tethered");
  const upToA = entryAt(tethered ? fixedCircuitUpToA : socketCircuitUpToA, on).value;
  return circuit.kind === "distribution" || ratingA > upToA ? times.longS : times.shortS;
}
