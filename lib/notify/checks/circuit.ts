import { fixed, roundTo, tidy } from "@/lib/calc/exact";
import type { IsoDate } from "@/lib/calc/parameter";
import type { CircuitResult } from "@/lib/notify/assessment";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { gravity, type Reason } from "@/lib/notify/result";
import { capacityOf } from "./circuit/capacity";
import {
  bidirectionalAnswer,
  bidirectionalRule,
  dedicatedAnswer,
  dedicatedRule,
  isolatorAnswer,
  isolatorRule,
} from "./circuit/construction";
import {
  breakingCapacityAnswer,
  breakingCapacityRule,
  protectiveConductorAnswer,
  protectiveConductorRule,
} from "./circuit/fault";
import { circuitLoad, type Gap } from "./circuit/load";
import { calculatedLoop } from "./circuit/loop";
import { loopLimits } from "./circuit/loop-limits";
import { calculatedLoopAnswer, calculatedLoopRule, measuredLoopAnswer, measuredLoopRule } from "./circuit/loop-answers";
import { overloadAnswer, overloadRule } from "./circuit/overload";
import {
  directCurrentAnswer,
  directCurrentRule,
  rcdPolesAnswer,
  rcdPolesRule,
  rcdRatingAnswer,
  rcdRatingRule,
  rcdTripAnswer,
  rcdTripRule,
  rcdTypeAnswer,
  rcdTypeRule,
} from "./circuit/rcd";
import { upstreamAnswer, upstreamRule } from "./circuit/rcd-upstream";
import {
  insulationAnswer,
  insulationRule,
  polarityAnswer,
  polarityRule,
  sequenceAnswer,
  sequenceRule,
} from "./circuit/readings";
import { voltDropAnswer, voltDropFromOrigin, voltDropRule } from "./circuit/volt-drop";
import { inForce, judge, outOfForce, type Answer, type Rule } from "./rule";

type CircuitRule = readonly [Rule, (job: JobFacts, circuit: Circuit, on: IsoDate) => Answer];

const everyCircuit: readonly CircuitRule[] = [
  [overloadRule, overloadAnswer],
  [voltDropRule, voltDropAnswer],
  [calculatedLoopRule, calculatedLoopAnswer],
  [measuredLoopRule, measuredLoopAnswer],
  [breakingCapacityRule, breakingCapacityAnswer],
  [protectiveConductorRule, protectiveConductorAnswer],
  [dedicatedRule, dedicatedAnswer],
  [bidirectionalRule, bidirectionalAnswer],
  [isolatorRule, (_job, circuit) => isolatorAnswer(circuit)],
  [insulationRule, insulationAnswer],
  [polarityRule, polarityAnswer],
  [sequenceRule, sequenceAnswer],
];

/** Rules of the circuit that ends at a charging point. */
const finalCircuits: readonly CircuitRule[] = [
  [rcdRatingRule, rcdRatingAnswer],
  [rcdTypeRule, rcdTypeAnswer],
  [rcdPolesRule, rcdPolesAnswer],
  [upstreamRule, upstreamAnswer],
  [rcdTripRule, rcdTripAnswer],
  [directCurrentRule, directCurrentAnswer],
];

export const circuitRules = [...everyCircuit, ...finalCircuits].map(([about]) => about);

const worstOf = (checks: readonly Reason[]) => Math.min(...checks.map(({ outcome }) => gravity(outcome)));

/** Results, the circuit with the worst check first, and checks of every circuit. `on` is the day whose wiring standard applies. */
export function assessCircuits(job: JobFacts, on: IsoDate): { results: CircuitResult[]; checks: Reason[] } {
  const judged = job.circuits.map((circuit) => {
    const rules = circuit.kind === "final" ? [...everyCircuit, ...finalCircuits] : everyCircuit;
    const checks = rules.map(([about, answer]) => judge(about, circuit.id, on, () => answer(job, circuit, on)));
    return { result: resultOf(job, circuit, on), checks, worst: worstOf(checks) };
  });
  return {
    results: [...judged].sort((a, b) => a.worst - b.worst).map(({ result }) => result),
    checks: judged.flatMap(({ checks }) => checks),
  };
}

const orNull = <T extends object>(value: T | Gap | null): T | null => (value === null || "gap" in value ? null : value);

const optional = <T, R>(value: T | null, from: (value: T) => R): R | null => (value === null ? null : from(value));

function resultOf(job: JobFacts, circuit: Circuit, on: IsoDate): CircuitResult {
  const load = orNull(circuitLoad(job, circuit));
  const capacity = load && orNull(inForce(() => capacityOf(circuit, load.phases, on)));
  const drop = orNull(inForce(() => voltDropFromOrigin(job, circuit, on)));
  const loop = orNull(inForce(() => calculatedLoop(job, circuit, on)));
  const limits = inForce(() => loopLimits(job, circuit, on));
  const longest = [drop?.longestM, loop?.longestM].filter((metres) => typeof metres === "number");
  return {
    id: circuit.id,
    iz: optional(capacity, ({ izA }) => tidy(izA)),
    voltDropV: optional(drop, ({ volts }) => tidy(volts)),
    voltDropPercent: optional(drop, ({ share }) => roundTo(share * 100, 2)),
    zsCalculatedOhm: optional(loop, ({ ohm }) => tidy(ohm)),
    zsLimitHotOhm: limits?.hotOhm ?? null,
    zsLimitColdOhm: limits?.coldOhm ?? null,
    zsLimitRcdOhm: optional(limits?.rcdOhm ?? null, (ohm) => roundTo(ohm, 0)),
    workings: [
      ...(load ? [load.working] : []),
      ...(capacity?.workings ?? []),
      ...(drop?.workings ?? []),
      ...(loop?.workings ?? []),
      ...(limits?.workings ?? []),
      ...(longest.length
        ? [
            `Longest run by ${longest.length === 2 ? "voltage drop and loop" : "what is known"}: ${fixed(Math.min(...longest), 1)} m`,
          ]
        : []),
      ...(limits === null ? [outOfForce(on)] : []),
    ],
  };
}
