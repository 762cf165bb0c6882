import { hotLoopOhm, longestByLoopM, loopMilliohmPerM } from "@/lib/calc/circuit/loop";
import { fixed, plain } from "@/lib/calc/exact";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { conductorMilliohmPerM, hotMultiplier70, hotMultiplier90 } from "@/lib/calc/parameters/protection";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { circuitsBefore, isTtIsland } from "../facts";
import { conductorC } from "./capacity";
import type { Gap } from "./load";
import { loopLimits } from "./loop-limits";
import { unitsOn } from "./rcd-facts";

type Run = { ohm: number; milliohmPerM: number | null; hot: number; working: string };

const hotMultiplier = (circuit: Circuit, on: IsoDate) =>
  valueAt(conductorC(circuit.cable) === 90 ? hotMultiplier90 : hotMultiplier70, on);

function tableMilliohm({ cable }: Circuit, on: IsoDate): number | null {
  const copper = valueAt(conductorMilliohmPerM, on);
  const line = cable.lineMm2 === null ? undefined : copper[cable.lineMm2];
  const cpcMm2 = knownNumber(cable.cpcMm2);
  const core = cpcMm2 === null ? undefined : copper[cpcMm2];
  const protective = cable.cpcKind === "armour" ? knownNumber(cable.armourMilliohmPerM) : core;
  return line === undefined || protective === undefined || protective === null || cable.cpcKind === null
    ? null
    : loopMilliohmPerM(line, protective);
}

/** Hot R1 + R2 of a circuit: from the reading when there is one, else from the table. */
function runOf(circuit: Circuit, on: IsoDate): Run | Gap {
  const hot = hotMultiplier(circuit, on);
  const milliohmPerM = tableMilliohm(circuit, on);
  const readOhm = knownNumber(circuit.measured.r1r2Ohm);
  if (readOhm !== null) {
    const ohm = readOhm * hot;
    return {
      ohm,
      milliohmPerM,
      hot,
      working: `R1+R2 = ${plain(readOhm)} Ω read × ${hot} = ${fixed(ohm, 3)} Ω hot`,
    };
  }
  const lengthM = knownNumber(circuit.cable.lengthM);
  if (milliohmPerM === null || lengthM === null)
    return { gap: `R1+R2 of circuit ${circuit.id} needs a reading, or the sizes of both conductors and the length.` };
  const ohm = hotLoopOhm(milliohmPerM, lengthM, hot);
  return {
    ohm,
    milliohmPerM,
    hot,
    working: `R1+R2 = ${plain(milliohmPerM)} mΩ/m × ${plain(lengthM)} m × ${hot} ÷ 1000 = ${fixed(ohm, 3)} Ω hot, from the table`,
  };
}

export type Loop = { ohm: number; longestM: number | null; workings: string[] };

/** The loop at the end of a circuit, hot: the supply's own, then every run from the origin. */
export function calculatedLoop(job: JobFacts, circuit: Circuit, on: IsoDate): Loop | Gap {
  const start = startOhm(job, circuit);
  if ("gap" in start) return start;
  const runs: Run[] = [];
  for (const part of [...circuitsBefore(job, circuit).reverse(), circuit]) {
    const run = runOf(part, on);
    if ("gap" in run) return run;
    runs.push(run);
  }
  const ohm = runs.reduce((sum, run) => sum + run.ohm, start.ohm);
  const own = runs.at(-1);
  const { hotOhm } = loopLimits(job, circuit, on);
  return {
    ohm,
    longestM:
      own?.milliohmPerM && hotOhm !== null
        ? longestByLoopM({
            limitOhm: hotOhm,
            externalOhm: ohm - own.ohm,
            milliohmPerM: own.milliohmPerM,
            hotMultiplier: own.hot,
          })
        : null,
    workings: [
      start.working,
      ...runs.map(({ working }) => working),
      `Zs = ${[plain(start.ohm), ...runs.map((run) => fixed(run.ohm, 3))].join(" + ")} = ${fixed(ohm, 3)} Ω`,
    ],
  };
}

function startOhm(job: JobFacts, circuit: Circuit): { ohm: number; working: string } | Gap {
  if (isTtIsland(job, circuit)) {
    const ohm = unitsOn(job, circuit)
      .map(({ openPen }) => knownNumber(openPen.electrodeOhm))
      .find((value) => value !== null);
    return ohm === undefined || ohm === null
      ? { gap: "The resistance of the chargepoint's electrode is needed." }
      : { ohm, working: `RA = ${plain(ohm)} Ω, the chargepoint's own electrode` };
  }
  const ohm = knownNumber(job.supply.externalLoopImpedanceOhm);
  return ohm === null ? { gap: "The external loop impedance is needed." } : { ohm, working: `Ze = ${plain(ohm)} Ω` };
}
