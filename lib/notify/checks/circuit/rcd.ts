import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { directCurrentTripMa, pointRcdMa, rcdTripLimitMs } from "@/lib/calc/parameters/protection";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, circuitEarthing, isPlanned } from "../facts";
import { cannotTell, met, metIf, notApplicable, notMet, notYet, rule, type Answer } from "../rule";
import { disconnectionS, rcdOf, unitsOn } from "./rcd-facts";

const device = ["circuits[].device.rcdPlace", "circuits[].device.rcdType", "circuits[].device.rcdMa"];

export const rcdRatingRule = rule({
  id: "circuit.rcd-rating",
  group: "circuit",
  title: "An RCD of 30 mA for each charging point",
  reads: [...device, "circuits[].device.sharedRcd", "chargepoints[].builtInRcd", "chargepoints[].openPen.method"],
  sources: ["BS 7671 722.531"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const rcdTypeRule = rule({
  id: "circuit.rcd-type",
  group: "circuit",
  title: "RCD type and direct current",
  reads: [...device, "chargepoints[].dcFaultProtection", "chargepoints[].builtInRcd", "chargepoints[].openPen.method"],
  sources: ["BS 7671 722.531", "IEC 62955"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const rcdPolesRule = rule({
  id: "circuit.rcd-poles",
  group: "circuit",
  title: "The RCD breaks every live conductor",
  reads: ["circuits[].device.doublePole", ...device],
  sources: ["BS 7671 722.531"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const rcdTripRule = rule({
  id: "circuit.rcd-trip",
  group: "circuit",
  title: "Trip time of the RCD",
  reads: ["circuits[].measured.rcdTripMs", "circuits[].measured.rcdTestMultiple", "supply.earthing", ...device],
  sources: ["BS EN 61008-1", "BS 7671 Table 41.1"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const directCurrentRule = rule({
  id: "circuit.direct-current-trip",
  group: "circuit",
  title: "Trip on smooth direct current",
  reads: ["circuits[].measured.dcTripMa"],
  sources: ["IEC 62955"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const separated = (job: JobFacts, circuit: Circuit) => {
  const units = unitsOn(job, circuit);
  return units.length > 0 && units.every(({ openPen }) => openPen.method === "separation");
};
const bySeparation = "Electrical separation is the measure here, so no RCD is asked.";

/** The rated residual current, and that no other circuit or point shares the device. */
export function rcdRatingAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  if (separated(job, circuit)) return notApplicable(bySeparation);
  const rcd = rcdOf(job, circuit);
  const { sharedRcd } = circuit.device;
  const mostMa = valueAt(pointRcdMa, on);
  const limit = `≤ ${mostMa} mA`;
  if (rcd.standing === "none")
    return notMet("No RCD protects the charging point; the direct-current detector alone is none.", { limit });
  if (rcd.standing === "not told") return cannotTell(`${rcd.what} is not told.`, { limit });
  const used = { rcdMa: rcd.ratedMa, rcdType: rcd.type, sharedRcd };
  if (rcd.ratedMa === null)
    return cannotTell("The rated residual current of the RCD is not recorded.", { used, limit });
  const rest = { used, limit, recorded: `${rcd.ratedMa} mA` };
  if (rcd.ratedMa > mostMa) return notMet(`The RCD of ${rcd.ratedMa} mA is above ${mostMa} mA.`, rest);
  if (sharedRcd === true) return notMet("The RCD is shared with other circuits; each point needs its own.", rest);
  if (sharedRcd !== false) return cannotTell(`Whether the RCD is shared ${absent(sharedRcd)}.`, rest);
  if (unitsOn(job, circuit).length > 1 && circuit.device.rcdPlace !== "in-chargepoint")
    return notMet("One RCD stands before several charging points; each needs its own.", rest);
  return met(`An RCD of ${rcd.ratedMa} mA protects this circuit alone.`, rest);
}

/** Type B, or type A or F with a detector of direct current. */
export function rcdTypeAnswer(job: JobFacts, circuit: Circuit): Answer {
  if (separated(job, circuit)) return notApplicable(bySeparation);
  const rcd = rcdOf(job, circuit);
  if (rcd.standing === "none") return notMet("No RCD protects the charging point.");
  if (rcd.standing === "not told") return cannotTell(`${rcd.what} is not told.`);
  const units = unitsOn(job, circuit);
  const detection = units.map(({ dcFaultProtection }) => dcFaultProtection);
  const rest = { used: { rcdType: rcd.type, dcFaultProtection: detection }, recorded: `type ${rcd.type}` };
  if (rcd.type === "AC") return notMet("The RCD is type AC, which a vehicle's direct current can blind.", rest);
  if (rcd.type === "B") return met("The RCD is type B, which acts on direct current itself.", rest);
  if (units.length === 0) return cannotTell("No chargepoint is recorded on this circuit.", rest);
  if (detection.includes("none"))
    return notMet(`The RCD is type ${rcd.type} and the chargepoint has no detector of direct current.`, rest);
  if (detection.some((kind) => kind === null || kind === "unknown"))
    return cannotTell(`The RCD is type ${rcd.type}; what the chargepoint does on direct current is not told.`, rest);
  return met(`The RCD is type ${rcd.type} and the chargepoint itself acts on direct current.`, rest);
}

/** Line and neutral together, or all lines and neutral. */
export function rcdPolesAnswer(job: JobFacts, circuit: Circuit): Answer {
  if (separated(job, circuit)) return notApplicable(bySeparation);
  const { doublePole } = circuit.device;
  const used = { doublePole };
  if (doublePole === true) return met("It is recorded as breaking every live conductor.", { used });
  if (doublePole === false) return notMet("It does not break every live conductor.", { used });
  return cannotTell(`Whether it breaks every live conductor ${absent(doublePole)}.`, { used });
}

/** The product limit of the test made; on TT a slow reading at one times needs a second test. */
export function rcdTripAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  if (isPlanned(job)) return notYet("the test of the RCD");
  if (separated(job, circuit)) return notApplicable(bySeparation);
  const { rcdTripMs, rcdTestMultiple } = circuit.measured;
  const ms = knownNumber(rcdTripMs);
  const used = { tripMs: ms, testMultiple: rcdTestMultiple };
  if (ms === null) return cannotTell(`The trip time ${absent(rcdTripMs)}.`, { used });
  if (rcdTestMultiple === null) return cannotTell("The multiple of the test is not recorded.", { used });
  const limitMs = valueAt(rcdTripLimitMs, on)[rcdTestMultiple];
  const rest = { used, recorded: `${ms} ms at ${rcdTestMultiple} × IΔn`, limit: `≤ ${limitMs} ms` };
  if (ms > limitMs) return notMet(`${ms} ms at ${rcdTestMultiple} times is above ${limitMs} ms.`, rest);
  const earthing = circuitEarthing(job, circuit);
  const requiredMs = 1000 * disconnectionS(job, circuit, earthing ?? "TT", on);
  if (ms > requiredMs)
    return cannotTell(
      `${ms} ms is within the RCD's own ${limitMs} ms but above the ${requiredMs} ms this circuit needs: test again at 2 or 5 times.`,
      rest,
    );
  return met(`${ms} ms at ${rcdTestMultiple} times is not above ${limitMs} ms.`, rest);
}

/** A test on direct current, where one was made. */
export function directCurrentAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  if (isPlanned(job)) return notYet("a test on direct current");
  const { dcTripMa } = circuit.measured;
  if (dcTripMa === null) return notApplicable("No test on direct current is recorded, and none is asked.");
  const ma = knownNumber(dcTripMa);
  if (ma === null) return cannotTell("The direct current at which it trips could not be told.");
  const mostMa = valueAt(directCurrentTripMa, on);
  return metIf(
    ma <= mostMa,
    `It trips at ${ma} mA of direct current, ${ma <= mostMa ? "not above" : "above"} ${mostMa} mA.`,
    {
      used: { dcTripMa: ma },
      recorded: `${ma} mA`,
      limit: `≤ ${mostMa} mA (from memory: verify)`,
    },
  );
}
