import type { JobFacts } from "../job";
import { knownNumber } from "../job/facts";

/** A source that may run in parallel with the network: what decides is that, not whether it exports. */
export type GeneratingUnit = {
  /** Path of the unit in the record. */
  path: string;
  id: string;
  designA: number | null;
  registeredA: number | null;
  exportLimitA: number | null;
  phases: 1 | 2 | 3 | null;
  phase: "L1" | "L2" | "L3" | null;
  typeTest: string | null;
  /** New on this job, so that its papers go with it. */
  isNew: boolean;
};

const generating = ["solar", "battery", "generator"];
const parallel = ["parallel", "both"];

/** Every unit on the supply that runs in parallel: bidirectional chargepoints, solar, batteries and generators. */
export function generatingUnits(job: JobFacts): GeneratingUnit[] {
  const units = job.chargepoints.flatMap((unit, index): GeneratingUnit[] =>
    parallel.includes(unit.discharge.kind ?? "")
      ? [
          {
            path: `chargepoints[${index}].discharge`,
            id: unit.id,
            designA: knownNumber(unit.discharge.designA),
            registeredA: knownNumber(unit.discharge.registeredA),
            exportLimitA: knownNumber(unit.discharge.exportLimitA),
            phases: unit.phases,
            phase: unit.phase,
            typeTest: unit.discharge.typeTestReference,
            isNew: true,
          },
        ]
      : [],
  );
  const others = (job.demand.otherEquipment ?? []).flatMap((each, index): GeneratingUnit[] =>
    generating.includes(each.kind)
      ? [
          {
            path: `demand.otherEquipment[${index}]`,
            id: each.kind,
            designA: knownNumber(each.designA),
            registeredA: knownNumber(each.registeredA),
            exportLimitA: knownNumber(each.exportLimitA),
            phases: each.phase === null ? null : 1,
            phase: each.phase,
            typeTest: each.acceptance,
            isNew: false,
          },
        ]
      : [],
  );
  return [...units, ...others];
}

/** Registered capacity on each phase of the supply, A; a unit without a phase on all of them, the worst case. */
export function registeredPerPhaseA(units: readonly GeneratingUnit[], phases: 1 | 2 | 3): number[] {
  return Array.from({ length: phases }, (_, index) =>
    units.reduce(
      (total, { phase, registeredA }) =>
        phase === null || phase === `L${index + 1}` ? total + (registeredA ?? 0) : total,
      0,
    ),
  );
}
