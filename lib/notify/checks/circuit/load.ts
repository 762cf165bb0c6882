import { plain } from "@/lib/calc/exact";
import type { Chargepoint, Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { addAt, phasesOf, zeros } from "../demand/phases";
import { unitsFedBy } from "../facts";

/** What a circuit carries by design: the rated current of its chargepoints, never a lower setting. */
export type CircuitLoad = { currentA: number; phases: 1 | 3; working: string };
export type Gap = { gap: string };

/** Design current of the worst phase and the number of phases, or the sentence that says what is missing. */
export function circuitLoad(job: JobFacts, circuit: Circuit): CircuitLoad | Gap {
  const units = unitsFedBy(job, circuit);
  if (units.length === 0) return { gap: "No chargepoint is recorded on this circuit." };
  if (units.some((unit) => knownNumber(unit.ratedA) === null))
    return { gap: "The rated current of the chargepoint is not known." };
  const phases = phasesCarried(job, circuit, units);
  if (phases === null) return { gap: "How many phases the circuit takes cannot be told from the chargepoints on it." };
  const currentA = phases === 1 ? sumA(units) : worstPhaseA(units);
  const others = circuit.kind === "distribution" ? "; other loads on it are not in the record" : "";
  return { currentA, phases, working: `Ib = ${ratings(units, currentA)} A${others}` };
}

/** Told for every unit once `circuitLoad` has asked. */
const ratedA = (unit: Chargepoint) => unit.ratedA as number;
const sumA = (units: readonly Chargepoint[]) => units.reduce((sum, unit) => sum + ratedA(unit), 0);

const ratings = (units: readonly Chargepoint[], currentA: number) =>
  units.length === 1
    ? plain(currentA)
    : `worst phase of ${units.map((unit) => plain(ratedA(unit))).join(", ")} A = ${plain(currentA)}`;

function phasesCarried(job: JobFacts, circuit: Circuit, units: readonly Chargepoint[]): 1 | 3 | null {
  if (units.some(({ phases }) => phases === null || phases === 2)) return null;
  if (units.some(({ phases }) => phases === 3)) return 3;
  if (circuit.kind === "final" || job.supply.phases === 1) return 1;
  const taken = new Set(units.map(({ phase }) => phase));
  return taken.size > 1 && !taken.has(null) ? 3 : null;
}

/** A single-phase unit whose phase is not told is taken to share the worst phase. */
function worstPhaseA(units: readonly Chargepoint[]): number {
  const threePhases = 3;
  const placed = units.reduce((sum, unit) => {
    const indexes = phasesOf(unit, threePhases);
    return indexes === null ? sum : addAt(sum, indexes, ratedA(unit));
  }, zeros(threePhases));
  const loose = units.filter((unit) => phasesOf(unit, threePhases) === null);
  return Math.max(...placed) + sumA(loose);
}
