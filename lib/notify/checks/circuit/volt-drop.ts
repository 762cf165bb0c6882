import { coolerRunningFactor, longestByVoltDropM, voltDropV } from "@/lib/calc/circuit/volt-drop";
import { fixed, plain } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate } from "@/lib/calc/parameter";
import { voltDropLimitPrivateShare, voltDropLimitShare } from "@/lib/calc/parameters/cable-factors";
import { voltDrops } from "@/lib/calc/parameters/cables";
import { lineVoltageV, nominalVoltageV } from "@/lib/calc/parameters/voltage";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { circuitsBefore } from "../facts";
import { cannotTell, mark, metIf, rule, type Answer } from "../rule";
import { capacityOf } from "./capacity";
import { circuitLoad, type Gap } from "./load";

export const voltDropRule = rule({
  id: "circuit.volt-drop",
  group: "circuit",
  title: "Voltage drop from the origin",
  reads: [
    "circuits[].cable.table",
    "circuits[].cable.lineMm2",
    "circuits[].cable.lengthM",
    "circuits[].fedFrom",
    "chargepoints[].ratedA",
    "supply.earthingConfirmedPrivate",
  ],
  sources: ["BS 7671 Table 4Ab"],
  gives: ["met", "not-met", "cannot-tell"],
});

export type VoltDrop = { volts: number; share: number; baseV: number; longestM: number; workings: string[] };

function ownDrop(job: JobFacts, circuit: Circuit, on: IsoDate): VoltDrop | Gap {
  const load = circuitLoad(job, circuit);
  if ("gap" in load) return load;
  const { table, lineMm2 } = circuit.cable;
  const lengthM = knownNumber(circuit.cable.lengthM);
  if (table === null || lineMm2 === null || lengthM === null)
    return { gap: `The table, size and length of the cable of circuit ${circuit.id} are needed.` };
  const cores = load.phases === 1 ? "two-core" : "three-core";
  const column = voltDrops.get(`${table} ${cores}`);
  const entry = column && entryAt(column, on);
  const milliVolt = entry?.value[lineMm2];
  if (!entry || milliVolt === undefined)
    return { gap: `No voltage-drop figure is held for Table ${table}, ${lineMm2} mm², ${cores}.` };
  const baseV = valueAt(load.phases === 1 ? nominalVoltageV : lineVoltageV, on);
  const volts = voltDropV(milliVolt, load.currentA, lengthM);
  const share = volts / baseV;
  return {
    volts,
    share,
    baseV,
    longestM: longestByVoltDropM(milliVolt, load.currentA, limitShare(job, on) * baseV),
    workings: [
      `Vd = ${milliVolt} mV/A/m × ${plain(load.currentA)} A × ${plain(lengthM)} m ÷ 1000 = ${fixed(volts, 2)} V (${percent(share)} of ${baseV} V), Table ${table}${mark(entry)}`,
      ...refinement(circuit, load.phases, load.currentA, volts, on),
    ],
  };
}

/** What the drop would be at the cable's true temperature: printed beside, never used to pass. */
function refinement(circuit: Circuit, phases: 1 | 3, loadA: number, volts: number, on: IsoDate): string[] {
  const capacity = capacityOf(circuit, phases, on);
  if ("gap" in capacity) return [];
  const factor = coolerRunningFactor({
    conductorC: capacity.conductorC,
    loadA,
    tabulatedA: capacity.tabulatedA,
    ambientFactor: capacity.ambientFactor,
    groupFactor: capacity.groupFactor,
  });
  return [
    `Cooler running, Ct = ${fixed(factor, 3)}: ${fixed(volts * factor, 2)} V, beside, not used (from memory: verify)`,
  ];
}

/** Drop from the origin to the end of a circuit, with the distribution circuits before it. */
export function voltDropFromOrigin(job: JobFacts, circuit: Circuit, on: IsoDate): VoltDrop | Gap {
  const own = ownDrop(job, circuit, on);
  if ("gap" in own) return own;
  const before: { id: string; drop: VoltDrop }[] = [];
  for (const feeder of circuitsBefore(job, circuit)) {
    const drop = ownDrop(job, feeder, on);
    if ("gap" in drop) return drop;
    before.push({ id: feeder.id, drop });
  }
  if (before.length === 0) return own;
  const share = own.share + before.reduce((sum, { drop }) => sum + drop.share, 0);
  return {
    ...own,
    share,
    volts: share * own.baseV,
    workings: [
      ...before.flatMap(({ id, drop }) => drop.workings.map((line) => `Circuit ${id}: ${line}`)),
      ...own.workings,
      `From the origin: ${[...before.map(({ drop }) => percent(drop.share)), percent(own.share)].join(" + ")} = ${percent(share)}`,
    ],
  };
}

const percent = (share: number) => `${fixed(share * 100, 2)} %`;

/** Higher only where the customer's own transformer feeds the site. */
const limitShare = (job: JobFacts, on: IsoDate): number =>
  valueAt(job.supply.earthingConfirmedPrivate === true ? voltDropLimitPrivateShare : voltDropLimitShare, on);

/** The drop from the origin against the share of nominal voltage. */
export function voltDropAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  const drop = voltDropFromOrigin(job, circuit, on);
  if ("gap" in drop) return cannotTell(drop.gap);
  const share = limitShare(job, on);
  const limitV = share * drop.baseV;
  const passes = drop.share <= share;
  const value = `${fixed(drop.volts, 2)} V`;
  return metIf(
    passes,
    `${value}, ${percent(drop.share)} of ${drop.baseV} V, is ${passes ? "not above" : "above"} ${fixed(limitV, 1)} V.`,
    {
      used: { voltDropV: drop.volts, share: drop.share, limitShare: share },
      recorded: value,
      limit: `≤ ${fixed(limitV, 1)} V`,
      workings: drop.workings,
    },
  );
}
