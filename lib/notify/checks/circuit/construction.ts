import type { Circuit, JobFacts } from "@/lib/notify/job";
import { absent, unitsFedBy } from "../facts";
import { cannotTell, met, metIf, notApplicable, notMet, rule, type Answer } from "../rule";
import { unitsOn } from "./rcd-facts";

export const dedicatedRule = rule({
  id: "circuit.dedicated",
  group: "circuit",
  title: "A final circuit for each charging point",
  reads: ["chargepoints[].circuit", "circuits[].kind"],
  sources: ["BS 7671 722.533.101"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const bidirectionalRule = rule({
  id: "circuit.bidirectional-device",
  group: "circuit",
  title: "Protective device where power flows both ways",
  reads: ["circuits[].device.bidirectional", "circuits[].device.kind", "chargepoints[].discharge.kind"],
  sources: ["BS 7671 530.3.201"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const isolatorRule = rule({
  id: "circuit.isolator",
  group: "circuit",
  title: "Means of isolation",
  reads: ["circuits[].isolator", "circuits[].device.doublePole"],
  sources: ["BS 7671 462"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** One charging point to a final circuit. */
export function dedicatedAnswer(job: JobFacts, circuit: Circuit): Answer {
  if (circuit.kind === "distribution") return notApplicable("A distribution circuit may feed several final circuits.");
  const count = unitsOn(job, circuit).length;
  const used = { chargepoints: count };
  if (count === 0) return cannotTell("No chargepoint is recorded on this circuit.", { used });
  return metIf(
    count === 1,
    count === 1
      ? "One charging point has this circuit to itself."
      : `${count} charging points share this circuit (from memory: verify).`,
    { used, recorded: `${count}`, limit: "1" },
  );
}

const givesBack = ["parallel", "islanded", "both"];
const fuses = ["BS88-2", "BS88-3", "BS1361", "BS3036"];

/** A device that acts in one direction only may not stand where power flows both ways. */
export function bidirectionalAnswer(job: JobFacts, circuit: Circuit): Answer {
  const kinds = unitsFedBy(job, circuit).map(({ discharge }) => discharge.kind);
  const { bidirectional, kind } = circuit.device;
  const used = { discharge: kinds, bidirectional, device: kind };
  if (!kinds.some((discharge) => givesBack.includes(discharge ?? ""))) {
    if (kinds.length === 0 || kinds.some((discharge) => discharge === null || discharge === "unknown"))
      return cannotTell("Whether the chargepoint can give power back is not told.", { used });
    return notApplicable("No chargepoint on this circuit gives power back.", { used });
  }
  if (kind !== null && fuses.includes(kind)) return notApplicable("A fuse acts in either direction.", { used });
  if (bidirectional === true) return met("The device is recorded as acting in both directions.", { used });
  if (bidirectional === false)
    return notMet("The device acts in one direction only, and the chargepoint gives power back.", { used });
  return cannotTell(`Whether the device acts in both directions ${absent(bidirectional)}.`, { used });
}

/** An isolator, or a device that breaks every live conductor. */
export function isolatorAnswer({ isolator, device }: Circuit): Answer {
  const used = { isolator, doublePole: device.doublePole };
  if (isolator === true) return met("An isolator for the circuit is recorded.", { used, recorded: "isolator" });
  if (isolator === null) return cannotTell("The means of isolation is not recorded.", { used });
  if (device.doublePole === true)
    return met("No isolator beside the unit; the device breaks every live conductor.", { used, recorded: "device" });
  if (isolator === false && device.doublePole === false)
    return notMet("No isolator is recorded, and the device does not break every live conductor.", { used });
  return cannotTell("The means of isolation could not be told.", { used });
}
