import { describe, expect, test } from "vitest";
import { parseJob } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { reasonsFor, recordWith, type Changes } from "./record";

/** Paths of every fact in a record, lists included. */
function paths(value: unknown, at = ""): string[] {
  if (value === null || typeof value !== "object") return [at];
  const inner = Object.entries(value).flatMap(([key, item]) => paths(item, at ? `${at}.${key}` : key));
  return at ? [at, ...inner] : inner;
}

function without(record: unknown, path: string): unknown {
  const copy = structuredClone(record) as Record<string, unknown>;
  const keys = path.split(".");
  const last = keys.pop()!;
  let holder: Record<string, unknown> = copy;
  for (const key of keys) holder = holder[key] as Record<string, unknown>;
  if (Array.isArray(holder)) holder.splice(Number(last), 1);
  else delete holder[last];
  return copy;
}

const key = ({ rule, of }: Reason) => `${rule} ${of}`;

const records: [string, Changes][] = [
  ["one phase", {}],
  [
    "three phases, TT, a distribution circuit",
    {
      "supply.phases": 3,
      "supply.earthing": "TT",
      "demand.existingA": [31, 26, 24],
      "chargepoints.0.phases": 3,
      "chargepoints.0.openPen": {
        method: "tt",
        electrodeOhm: 90,
        separationFromOtherEarthsM: 3,
        buriedSeparationM: 4,
      },
      "circuits.0.upstreamRcds": [{ type: "B", ratedMa: 100, delayed: true }],
      evidence: [{ subject: "neighbour-earths", file: "earths.jpg" }],
    },
  ],
  [
    "installation electrode, loads listed",
    {
      "demand.method": "diversity",
      "demand.loads": [{ kind: "cooking", ratedA: 30, socketInControlUnit: false }],
      "chargepoints.0.openPen": { method: "installation-electrode", electrodeOhm: 1 },
    },
  ],
];

describe.each(records)("a fact taken away: %s", (_name, changes) => {
  const job = recordWith(changes);
  const before = new Map(reasonsFor(job).map((reason) => [key(reason), reason.outcome]));
  const record = JSON.parse(JSON.stringify(job)) as unknown;

  test.each(paths(record).filter((path) => !/^(format|jobNumber|stage)/.test(path)))("%s", (path) => {
    const parsed = parseJob(without(record, path));
    if (!parsed.ok) return;
    for (const reason of reasonsFor(parsed.value)) {
      const was = before.get(key(reason));
      // A rule that could not pass with the fact may not pass for want of it.
      if (reason.outcome === "met" && was !== undefined) expect(was, `${path}: ${reason.rule}`).toBe("met");
    }
  });
});

describe("a record in which much is wrong", () => {
  const wrong = recordWith({
    "boards.0.surgeProtection": "declined-by-owner",
    "boards.0.assemblyRatingA": 80,
    "boards.0.arrangement": "existing",
    "chargepoints.0.access": "public",
    "chargepoints.0.dcFaultProtection": "none",
    "chargepoints.0.discharge": { kind: "parallel" },
    "chargepoints.0.flickerCondition": "max-impedance",
    "chargepoints.0.maximumSystemImpedanceOhm": 0.1,
    "chargepoints.0.minimumShortCircuitPowerKva": 900,
    "chargepoints.0.openPen.device.opensEarth": false,
    "chargepoints.0.openPen.functionTest": "failed",
    "circuits.0.cable.referenceMethod": "103",
    "circuits.0.cable.lengthM": 60,
    "circuits.0.device.bidirectional": false,
    "circuits.0.device.doublePole": false,
    "circuits.0.device.rcdMa": 100,
    "circuits.0.device.sharedRcd": true,
    "circuits.0.isolator": false,
    "circuits.0.measured": {
      zsOhm: 600,
      rcdTripMs: 400,
      rcdTestMultiple: 1,
      dcTripMa: 9,
      insulationMohm: 0.2,
      insulationTestV: 500,
      polarityCorrect: false,
    },
    "circuits.0.upstreamRcds": [{ type: "AC", ratedMa: 30, delayed: false }],
    "supply.earthingConductorMm2": 6,
    "supply.bonding": [{ service: "gas", mm2: 4, seen: true }],
    "supply.externalLoopImpedanceOhm": 0.6,
    "supply.prospectiveFaultCurrentKa": 20,
    "supply.tailsMm2": 16,
    "supply.tailsReferenceMethod": "A",
    "demand.loadLimit": { kind: "site", limitA: 90 },
  });
  const before = new Map(reasonsFor(wrong).map((reason) => [key(reason), reason.outcome]));
  const record = JSON.parse(JSON.stringify(wrong)) as unknown;
  /** Facts whose absence itself answers: another reading stands in, or a list is shorter because nothing was found. */
  const answered = new Set([
    "supply.prospectiveFaultCurrentKa circuit.breaking-capacity",
    "supply.prospectiveFaultCurrentKa supply.fault-level",
    "circuits.0.upstreamRcds.0 circuit.rcd-upstream",
    "chargepoints.0 supply.surge-protection",
    "chargepoints supply.surge-protection",
  ]);

  test("most of it is not met", () => {
    expect([...before.values()].filter((outcome) => outcome === "not-met").length).toBeGreaterThan(20);
  });

  test.each(paths(record).filter((path) => !/^(format|jobNumber|stage|kind)/.test(path)))(
    "without %s nothing passes",
    (path) => {
      const parsed = parseJob(without(record, path));
      if (!parsed.ok) return;
      for (const reason of reasonsFor(parsed.value))
        if (reason.outcome === "met" && before.has(key(reason)) && !answered.has(`${path} ${reason.rule}`))
          expect(before.get(key(reason)), `${path}: ${reason.rule}`).toBe("met");
    },
  );
});

describe("facts that a passing rule reads", () => {
  const needed: [string, string][] = [
    ["circuits.0.cable.referenceMethod", "circuit.overload"],
    ["circuits.0.cable.grouping", "circuit.overload"],
    ["circuits.0.cable.ambientC", "circuit.overload"],
    ["circuits.0.device.rcdType", "circuit.rcd-type"],
    ["circuits.0.device.sharedRcd", "circuit.rcd-rating"],
    ["circuits.0.upstreamRcds", "circuit.rcd-upstream"],
    ["circuits.0.measured.zsOhm", "circuit.loop-measured"],
    ["circuits.0.measured.polarityCorrect", "circuit.polarity"],
    ["chargepoints.0.openPen.device.opensEarth", "open-pen.line-neutral-window-device"],
    ["chargepoints.0.openPen.functionTest", "open-pen.line-neutral-window-device"],
    ["chargepoints.0.dcFaultProtection", "circuit.rcd-type"],
    ["supply.phases", "open-pen.line-neutral-window-device"],
    ["supply.earthing", "open-pen.line-neutral-window-device"],
    ["supply.cutOutRatingA", "supply.tails"],
    ["supply.tailsReferenceMethod", "supply.tails"],
    ["demand.existingA", "demand.per-phase"],
    ["demand.assessor", "demand.evidence"],
    ["demand.measurement.resolutionS", "demand.evidence"],
    ["demand.otherEquipment", "demand.per-phase"],
    ["chargepoints.0.ratedA", "demand.per-phase"],
    ["chargepoints.0.phases", "demand.per-phase"],
  ];
  test.each(needed)("without %s, %s cannot tell", (path, rule) => {
    const changes = path.endsWith("ratedA") ? { [path]: null, "chargepoints.0.configuredA": null } : { [path]: null };
    expect(reasonsFor(recordWith(changes)).find((reason) => reason.rule === rule)?.outcome).toBe("cannot-tell");
  });
});
