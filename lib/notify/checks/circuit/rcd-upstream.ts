import type { Circuit, JobFacts } from "@/lib/notify/job";
import { absent, circuitEarthing } from "../facts";
import { cannotTell, met, notMet, rule, type Answer } from "../rule";
import { rcdOf, unitsOn } from "./rcd-facts";

export const upstreamRule = rule({
  id: "circuit.rcd-upstream",
  group: "circuit",
  title: "RCDs before this circuit",
  reads: [
    "circuits[].upstreamRcds",
    "circuits[].device.rcdType",
    "chargepoints[].dcFaultProtection",
    "chargepoints[].builtInRcd",
    "supply.earthing",
  ],
  sources: ["BS 7671 722.531", "BS 7671 531.3"],
  gives: ["met", "not-met", "cannot-tell"],
});

type Upstream = NonNullable<Circuit["upstreamRcds"]>[number];

const isDcBlind = ({ type }: Upstream) => type === "A" || type === "F";

/** Number of charging points with a detector of direct current behind type A devices, on this circuit and on all. */
function detectorsBehindTypeA(job: JobFacts, circuit: Circuit): { here: number; everywhere: number } {
  const count = (one: Circuit) =>
    unitsOn(job, one).filter(({ dcFaultProtection }) => dcFaultProtection === "rdc-dd").length;
  const behind = job.circuits.filter(({ upstreamRcds }) => (upstreamRcds ?? []).some(isDcBlind));
  return { here: count(circuit), everywhere: behind.reduce((sum, one) => sum + count(one), 0) };
}

/** Type B anywhere on the circuit: its device, or built into the chargepoint. */
function typeBStands(job: JobFacts, circuit: Circuit): "device" | "chargepoint" | null {
  const rcd = rcdOf(job, circuit);
  if (rcd.standing === "there" && rcd.type === "B" && circuit.device.rcdPlace !== "in-chargepoint") return "device";
  const inUnit = unitsOn(job, circuit).some(
    ({ builtInRcd, dcFaultProtection }) => builtInRcd === "B" || dcFaultProtection === "type-b",
  );
  return inUnit ? "chargepoint" : null;
}

/** What direct current could do to the devices before this one, worst first. */
export function upstreamAnswer(job: JobFacts, circuit: Circuit): Answer {
  const { upstreamRcds, device } = circuit;
  const typeB = typeBStands(job, circuit);
  const ownType = device.rcdPlace === "in-chargepoint" || device.rcdPlace === "none" ? null : device.rcdType;
  const used = {
    upstream: upstreamRcds?.map(({ type, ratedMa, delayed }) => `${type} ${ratedMa} mA, delayed ${delayed}`) ?? null,
    ownType,
    typeB,
  };
  if (typeB === "chargepoint" && (ownType === "A" || ownType === "F" || ownType === "AC"))
    return notMet(`A type B device in the chargepoint stands after the circuit's own type ${ownType}.`, { used });
  if (upstreamRcds === null)
    return cannotTell("Whether other RCDs stand before this circuit is not recorded.", { used });
  if (upstreamRcds.length === 0) return met("No other RCD stands before this circuit.", { used, recorded: "none" });
  const rest = { used, recorded: upstreamRcds.map(({ type, ratedMa }) => `${type} ${ratedMa ?? "?"} mA`).join(", ") };
  if (upstreamRcds.some(({ type }) => type === "AC"))
    return notMet("A type AC device stands before this circuit; a vehicle's direct current can blind it.", rest);
  if (typeB !== null && upstreamRcds.some(isDcBlind))
    return notMet("A type B device stands after a type A or F device, which its direct current can blind.", rest);
  const detectors = detectorsBehindTypeA(job, circuit);
  if (upstreamRcds.some(isDcBlind) && detectors.here > 1)
    return notMet(
      `${detectors.here} charging points behind one type A device can together pass more direct current than it bears.`,
      rest,
    );
  const tt = circuitEarthing(job, circuit) === "TT";
  if (tt && upstreamRcds.some(({ delayed }) => delayed === false))
    return notMet("On a TT earth the RCD before this circuit needs a delay, and it has none.", rest);
  const open = upstreamRcds.find(({ type }) => type === null || type === "unknown" || type === "none");
  if (open) return cannotTell(`The type of an RCD before this circuit ${absent(open.type)}.`, rest);
  if (upstreamRcds.some(isDcBlind) && detectors.everywhere > 1)
    return cannotTell(
      "Several circuits have a type A device before them; whether it is the same one is not told.",
      rest,
    );
  if (tt && upstreamRcds.some(({ delayed }) => delayed !== true))
    return cannotTell("On a TT earth the RCD before this circuit needs a delay; whether it has one is not told.", rest);
  return met("The RCDs before this circuit stand in an order that direct current does not upset.", rest);
}
