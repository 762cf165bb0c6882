import { largestUnseenShiftV } from "@/lib/calc/open-pen/line-neutral";
import { fixed } from "@/lib/calc/exact";
import { entryAt, valueAt, type IsoDate, type Parameter } from "@/lib/calc/parameter";
import {
  deviceMethodsListed,
  earthDeviceOpensWithinS,
  earthDeviceRidesThroughS,
  touchLimitV,
  windowDeviceOpensWithinS,
  windowHighV,
  windowLowV,
} from "@/lib/calc/parameters/open-pen";
import { nominalVoltageV } from "@/lib/calc/parameters/voltage";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, isPlanned, supplyEarthing } from "../facts";
import { cannotTell, mark, met, notMet, rule, type Answer } from "../rule";
import { methodName, type Finding, type MethodRule, type OpenPenCase } from "./finding";

type DeviceMethod = "cpc-earth-70V-device" | "line-neutral-window-device" | "equivalent-device";

const deviceRule = (method: DeviceMethod) =>
  rule({
    id: `open-pen.${method}`,
    group: "open-pen",
    title: `Open PEN: ${methodName[method]}, opens every conductor`,
    reads: [
      "chargepoints[].openPen.method",
      "chargepoints[].openPen.device",
      "chargepoints[].openPen.functionTest",
      "supply.earthing",
      "supply.phases",
    ],
    sources: ["BS 7671 722.411.4.1", "BS 7671 543.3.3.101", "IET 01:2024"],
    gives: ["met", "not-met", "cannot-tell"],
  });

const opensWithin: Record<DeviceMethod, Parameter<number>> = {
  "cpc-earth-70V-device": earthDeviceOpensWithinS,
  "line-neutral-window-device": windowDeviceOpensWithinS,
  "equivalent-device": windowDeviceOpensWithinS,
};

/** Facts that rule the device out, each a clause of one sentence. */
function faults({ job, unit, on }: OpenPenCase, method: DeviceMethod): string[] {
  const { device, functionTest } = unit.openPen;
  const opensS = knownNumber(device.opensWithinS);
  const limitS = valueAt(opensWithin[method], on);
  return [
    supplyEarthing(job) === "TT" &&
      `the supply is recorded as TT, which has no PEN for a ${methodName[method]} to watch`,
    device.position === "none" && `the method is a ${methodName[method]} but no device is recorded`,
    !valueAt(deviceMethodsListed, on).includes(method) && `the edition of ${on} did not list this method`,
    device.opensEarth === false && "the device does not open the protective conductor",
    opensS !== null && opensS > limitS && `it opens within ${opensS} s, later than ${limitS} s`,
    device.recloses === "at-once" && "it closes again at once, whatever the voltage",
    !isPlanned(job) && functionTest === "failed" && "its function test failed",
  ].filter((clause) => typeof clause === "string");
}

/** Facts that are missing, each a clause of one sentence. */
function gaps({ job, unit }: OpenPenCase, method: DeviceMethod): string[] {
  const { device, functionTest } = unit.openPen;
  const { phases } = job.supply;
  return [
    supplyEarthing(job) === null && `the earthing of the supply ${absent(job.supply.earthing)}`,
    (device.position === null || device.position === "unknown") && "where the device stands is not told",
    device.opensEarth !== true && "whether it opens the protective conductor is not told",
    knownNumber(device.opensWithinS) === null && "how soon it opens is not told",
    (device.recloses === null || device.recloses === "unknown") && "how it closes again is not told",
    (device.evidence === null || device.evidence === "none") &&
      "no declaration of the maker or list of the operator stands behind it",
    !isPlanned(job) && functionTest !== "passed" && "its function test is not recorded as passed",
    method === "line-neutral-window-device" && phases === null && "the number of phases is not recorded",
    method === "line-neutral-window-device" &&
      phases !== null &&
      phases > 1 &&
      device.watchesEveryLine !== true &&
      "on a supply of several phases it has to declare more than one line-neutral measurement, and none is recorded",
    method === "equivalent-device" &&
      device.standard === null &&
      "the standard that shows it to be no less protective is not recorded",
  ].filter((clause) => typeof clause === "string");
}

/** What stays open even when every condition is met: part of the answer, sealed with it. */
function residualRisk(method: DeviceMethod, on: IsoDate): string {
  const limitS = valueAt(opensWithin[method], on);
  if (method === "cpc-earth-70V-device")
    return `Up to ${valueAt(touchLimitV, on)} V may stand on the vehicle without the device opening, and more for up to ${limitS} s; it need not act within ${valueAt(earthDeviceRidesThroughS, on)} s. Its reference must be an electrode outside the influence of buried metalwork, or a star point of three lines: the record does not show which.`;
  const [lowV, highV, nominalV] = [valueAt(windowLowV, on), valueAt(windowHighV, on), valueAt(nominalVoltageV, on)];
  const shiftV = fixed(largestUnseenShiftV(nominalV, highV), 0);
  if (method === "equivalent-device")
    return `What this device leaves standing, and for how long, is as its maker declares; up to ${limitS} s may pass before it opens.`;
  return `The device watches line to neutral, not the vehicle to Earth. On a network shared by three phases up to ${shiftV} V can stand on the vehicle while this line reads within ${lowV} to ${highV} V, and any voltage can stand for up to ${limitS} s before it opens.`;
}

/** The steps shown. No voltage on the vehicle is printed: the window does not bound one on a shared network. */
function workings(method: DeviceMethod, on: IsoDate): string[] {
  const opens = entryAt(opensWithin[method], on);
  const opening = `Opens line, neutral and protective conductor within ${opens.value} s${mark(opens)}`;
  if (method !== "line-neutral-window-device") return [opening];
  const [lowV, highV, nominalV] = [valueAt(windowLowV, on), valueAt(windowHighV, on), valueAt(nominalVoltageV, on)];
  return [
    `Window ${lowV} to ${highV} V, line to neutral`,
    opening,
    `Shared three-phase network: √(${fixed(nominalV / 2, 0)}² + (${highV} − ${fixed((nominalV * Math.sqrt(3)) / 2, 1)})²) = ${fixed(largestUnseenShiftV(nominalV, highV), 0)} V unseen`,
  ];
}

const sentence = (clauses: readonly string[]) => {
  const text = clauses.join("; ");
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
};

function deviceAnswer(given: OpenPenCase, method: DeviceMethod): Answer {
  const { unit, job, on } = given;
  const { device, functionTest } = unit.openPen;
  const { position, opensEarth, opensWithinS, recloses, evidence, standard, watchesEveryLine } = device;
  const rest = {
    used: {
      position,
      opensEarth,
      opensWithinS,
      recloses,
      evidence,
      standard,
      watchesEveryLine,
      functionTest,
      earthing: job.supply.earthing,
      phases: job.supply.phases,
    },
    recorded: standard ?? position,
    limit:
      method === "line-neutral-window-device"
        ? `${valueAt(windowLowV, on)} to ${valueAt(windowHighV, on)} V`
        : `≤ ${valueAt(opensWithin[method], on)} s`,
    workings: workings(method, on),
  };
  const wrong = faults(given, method);
  if (wrong.length > 0) return notMet(sentence(wrong), rest);
  const open = gaps(given, method);
  if (open.length > 0) return cannotTell(sentence(open), rest);
  const test = isPlanned(job) ? "its function test comes after fitting" : "its function test passed";
  return met(
    `A ${methodName[method]} is recorded that opens the protective conductor with the live ones within ${opensWithinS} s; ${test}.`,
    rest,
  );
}

const deviceMethod = (method: DeviceMethod): MethodRule => ({
  about: deviceRule(method),
  find: (given): Finding => ({
    answer: deviceAnswer(given, method),
    residualRisk: residualRisk(method, given.on),
  }),
});

export const earthDevice = deviceMethod("cpc-earth-70V-device");
export const windowDevice = deviceMethod("line-neutral-window-device");
export const equivalentDevice = deviceMethod("equivalent-device");
