import { neededTabulatedA } from "@/lib/calc/circuit/capacity";
import { fixed, plain } from "@/lib/calc/exact";
import type { IsoDate } from "@/lib/calc/parameter";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { cannotTell, metIf, rule, type Answer } from "../rule";
import { capacityOf } from "./capacity";
import { circuitLoad } from "./load";

export const overloadRule = rule({
  id: "circuit.overload",
  group: "circuit",
  title: "Load, device and cable: Ib ≤ In ≤ Iz",
  reads: [
    "circuits[].device.kind",
    "circuits[].device.ratingA",
    "circuits[].cable",
    "chargepoints[].ratedA",
    "chargepoints[].phases",
  ],
  sources: ["BS 7671 433.1", "BS 7671 appendix 4"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** The design current within the device's rating, and that within the cable's current as installed. */
export function overloadAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  const load = circuitLoad(job, circuit);
  if ("gap" in load) return cannotTell(load.gap);
  const { ratingA } = circuit.device;
  const used = { ibA: load.currentA, inA: ratingA, phases: load.phases };
  if (ratingA === null) return cannotTell("The rating of the protective device is not recorded.", { used });
  const ibText = `${plain(load.currentA)} A`;
  if (load.currentA > ratingA)
    return metIf(false, `The load of ${ibText} is above the device's ${ratingA} A.`, {
      used,
      recorded: `${ibText}, ${ratingA} A`,
      limit: "Ib ≤ In",
      workings: [load.working],
    });
  const capacity = capacityOf(circuit, load.phases, on);
  if ("gap" in capacity) return cannotTell(capacity.gap, { used, workings: [load.working] });
  const izText = `${fixed(capacity.izA, 1)} A`;
  const passes = ratingA <= capacity.izA;
  return metIf(
    passes,
    passes
      ? `Load ${ibText}, device ${ratingA} A, cable ${izText}: each not above the next.`
      : `The device of ${ratingA} A is above the cable's ${izText} as installed.`,
    {
      used: { ...used, izA: capacity.izA },
      recorded: `${ibText} ≤ ${ratingA} A`,
      limit: `≤ ${izText}`,
      workings: [
        load.working,
        `In = ${ratingA} A`,
        ...capacity.workings,
        ...(passes ? [] : [`It needed for ${ratingA} A: ${fixed(neededTabulatedA(ratingA, capacity.factors), 1)} A`]),
      ],
    },
  );
}
