import fc from "fast-check";
import { readFileSync } from "node:fs";
import { assess } from "@/lib/notify/assess";
import type { Assessment } from "@/lib/notify/assessment";
import { parseJob, type JobFacts } from "@/lib/notify/job";
import { openPenMethods } from "@/lib/notify/job/chargepoint";
import { evidenceSubjects } from "@/lib/notify/job/papers";
import { serviceConditions } from "@/lib/notify/job/site";
import type { Issue } from "@/templates/issue";

/** Records far from the ordinary, and texts that a careless writer would break on. */

type Json = Record<string, unknown>;

const base = JSON.parse(readFileSync("tests/examples/fen-0147-notice.json", "utf8")) as Json & {
  circuits: Json[];
  chargepoints: Json[];
  boards: Json[];
};

export const hostileTexts = [
  "]]>",
  "{{x}} ${y} <%= z %>",
  "a\u0000b\u0007c\u001Fd\u009Fe",
  "<w:p><w:t>&amp; & < > \"'</w:t></w:p>",
  "\uD800 lone surrogate \uDC00",
  "\u202Eesrever\u202C and \u2066isolate\u2069",
  "مقبس الشحن رقم ٧",
  "שקע טעינה",
  "Zoë Ångström-Łukasz Ŵyn",
  "🔌 plug ⚡",
  '=HYPERLINK("http://example.com")',
  "W".repeat(200),
  "word ".repeat(40).trim(),
  "\\u0041 %s %n \r\n two lines",
] as const;

const text = (most = 200) =>
  fc.oneof(fc.constantFrom(...hostileTexts), fc.string({ maxLength: 40 })).map((value) => value.slice(0, most));
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: null, freq: 5 });
const amountOr = (...values: number[]) => fc.constantFrom<number | string | null>(...values, "unknown", null);
const one = <T>(...values: T[]) => fc.constantFrom(...values);

const board = (id: string) =>
  fc.record({
    id: fc.constant(id),
    arrangement: maybe(one("existing", "additional", "replaced")),
    ways: maybe(fc.integer({ min: 0, max: 200 })),
    assemblyRatingA: amountOr(63, 100),
    surgeProtection: maybe(one("fitted-type-1-2", "fitted-type-2", "declined-by-owner", "unknown")),
  });

const circuit = (id: string, boards: readonly string[], before: readonly string[]) =>
  fc.record({
    id: fc.constant(id),
    board: maybe(one(...(boards.length ? boards : [null]))),
    fedFrom: before.length ? maybe(one(...before)) : fc.constant(null),
    kind: one("final", "distribution"),
    isolator: one<unknown>(true, false, "unknown", null),
    upstreamRcds: one(null, [], [{ type: "AC", ratedMa: 100, delayed: true }]),
    device: fc.record({
      kind: maybe(one("MCB", "RCBO", "BS88-3", "BS3036")),
      curve: maybe(one("B", "C")),
      ratingA: maybe(one(16, 32, 40, 1600)),
      rcdType: maybe(one("AC", "A", "B", "none", "unknown")),
      rcdMa: maybe(one(30, 300)),
      rcdPlace: maybe(one("in-device", "separate", "in-chargepoint", "none")),
    }),
    cable: fc.record({
      table: maybe(one("4D2A", "4D4A", "4D5")),
      lineMm2: maybe(one(2.5, 6, 10, 400)),
      cpcMm2: amountOr(1.5, 2.5),
      cpcKind: maybe(one("core", "armour")),
      lengthM: amountOr(0.5, 18, 1999.5),
      referenceMethod: maybe(one("C", "D", "unknown")),
    }),
    measured: fc.record({ zsOhm: amountOr(0.41, 1600), rcdTripMs: amountOr(24), r1r2Ohm: amountOr(0.2) }),
  });

const windows = one(
  null,
  [],
  [{ days: ["mon", "sun"], from: "22:00", to: "08:00" }],
  [
    { days: ["sat"], from: "00:00", to: "00:00" },
    { days: ["fri"], from: "07:59", to: "16:01" },
  ],
);

const unit = (id: string, circuits: readonly string[], phases: number) =>
  fc.record({
    id: fc.constant(id),
    circuit: maybe(one(...(circuits.length ? circuits : [null]))),
    make: maybe(text()),
    model: maybe(text()),
    serial: maybe(text(60)),
    mode: maybe(one(2, 3, 4)),
    phases: maybe(one(...[1, 2, 3].filter((count) => count <= phases))),
    phase: maybe(one("L1", "L2", "L3")),
    ratedA: amountOr(16, 32, 63),
    configuredA: amountOr(10, 32),
    location: maybe(one("outdoor", "indoor")),
    builtInRcd: maybe(one("A", "none")),
    dcFaultProtection: maybe(one("rdc-dd", "type-b", "none")),
    discharge: fc.record({
      kind: maybe(one("none", "disabled", "parallel", "islanded", "unknown")),
      registeredA: amountOr(16, 32),
    }),
    openPen: fc.record({
      method: maybe(one(...openPenMethods)),
      electrodeOhm: amountOr(0.1, 12.4, 200, 20000),
      device: fc.record({ position: maybe(one("built-in", "separate", "none")), opensEarth: one(true, false, null) }),
    }),
    smartCharging: fc.record({
      soldByFirm: maybe(fc.boolean()),
      users: maybe(one("private", "workplace", "public")),
      clock: maybe(one("local", "utc", "unknown")),
      factoryDefault: windows,
      atHandover: windows,
    }),
  });

const names = (word: string, count: number) => Array.from({ length: count }, (_, index) => `${word}-${index + 1}`);

/** Any believable record: every arrangement of boards, circuits and units, any fact missing, hostile text anywhere. */
const record = fc
  .record({
    boards: fc.integer({ min: 0, max: 4 }),
    circuits: fc.integer({ min: 0, max: 7 }),
    units: fc.integer({ min: 0, max: 9 }),
    phases: one(1, 2, 3),
    planned: fc.boolean(),
  })
  .chain(({ boards, circuits, units, phases, planned }) => {
    const boardIds = names("board", boards);
    const circuitIds = names("circuit", circuits);
    return fc.record({
      ...Object.fromEntries(Object.entries(base).map(([key, value]) => [key, fc.constant(value)])),
      stage: fc.constant(planned ? "planned" : "installed"),
      kind: one("new", "replacement", "removal"),
      dates: fc.constant(planned ? { planned: "2026-12-14" } : base.dates),
      boards: fc.tuple(...boardIds.map(board)),
      circuits: fc.tuple(...circuitIds.map((id, index) => circuit(id, boardIds, circuitIds.slice(0, index)))),
      chargepoints: fc.tuple(...names("unit", units).map((id) => unit(id, circuitIds, phases))),
      customer: fc.record({ name: maybe(text()), phone: maybe(text(40)), interest: maybe(one("owner", "tenant")) }),
      firm: fc.record({
        name: maybe(text()),
        phone: maybe(text(40)),
        email: maybe(text()),
        contactName: maybe(text()),
      }),
      site: fc.record({
        address: maybe(fc.array(text(), { maxLength: 4 })),
        postcode: maybe(text(10)),
        territory: maybe(one("england", "scotland", "northern-ireland")),
        premises: maybe(one("domestic", "commercial", "multi-occupied")),
        supplyNumber: maybe(one("2399232323236", "not a number", "1099000000016")),
        chargepointPosition: maybe(text(400)),
      }),
      supply: fc.record({
        phases: fc.constant(phases),
        cutOutRatingA: amountOr(60, 80, 100),
        cutOutEvidence: maybe(one("operator-statement", "carrier-label", "fuse-seen", "assumed")),
        looped: maybe(one("no", "feeds-neighbour", "unknown")),
        serviceConditions: maybe(fc.subarray([...serviceConditions])),
        earthing: maybe(one("TN-C-S", "TN-S", "TT", "unknown")),
        externalLoopImpedanceOhm: amountOr(0.21),
        isolatorAfterMeter: maybe(one("yes", "no", "unknown")),
        tailsMm2: amountOr(16, 25),
        bonding: one(
          null,
          [],
          [
            { service: "gas", mm2: 10, seen: true },
            { service: "an oil line under the floor of the extension", mm2: "unknown", seen: null },
          ],
        ),
      }),
      demand: fc.record({
        method: maybe(one("measured", "half-hourly", "diversity", "declared")),
        existingA: maybe(fc.array(one(0, 24.8, 63.25), { minLength: phases === 1 ? 1 : phases, maxLength: phases })),
        halfHourKwh: one(null, [
          { start: "2026-01-05T18:00:00Z", kwh: 3.2 },
          { start: "2026-07-05T18:30:00Z", kwh: 6.9 },
        ]),
        loads: one(null, [], [{ kind: "cooking", ratedA: 58.7 }]),
        otherEquipment: maybe(one([], [{ kind: "heat-pump", make: "]]>", ratedA: 16 }])),
      }),
      operatorRecords: one(
        [],
        [
          {
            purpose: "application",
            reference: "=1+1",
            decision: "approved-with-limit",
            decidedOn: "2026-11-01",
            limitA: 32,
            conditions: hostileTexts[3],
          },
        ],
      ),
      declarations: one(
        [],
        [{ role: "customer", name: hostileTexts[6], at: "2026-11-20T10:00:00Z", statement: hostileTexts[0] }],
      ),
      notes: maybe(one("n ".repeat(1000), hostileTexts[4])),
    });
  });

export type Sample = { job: JobFacts; assessment: Assessment; issue: Issue };

/** An issue with every field in use: gaps, photos with hostile captions, changes. */
export const fullIssue = (count = 12): Issue => ({
  version: 3,
  issuedAt: "2026-07-01T23:30:00.000Z",
  sealedBy: hostileTexts[8],
  gapsReason: `The customer was away. ${hostileTexts[0]} ${hostileTexts[2]}`,
  photos: Array.from({ length: count }, (_, index) => ({
    file: `p${index}.jpg`,
    subject: evidenceSubjects[index % evidenceSubjects.length] ?? "other",
    caption: hostileTexts[index % hostileTexts.length] ?? null,
    takenAt: index % 2 ? null : "2026-11-20T10:00:00Z",
    number: index + 1,
  })),
  changes: [
    { path: "dates.installed", was: "2026-11-19", now: "2026-11-20" },
    { path: "supply.looped", was: null, now: "no" },
    { path: "chargepoints[0].smartCharging.atHandover", was: undefined, now: [] },
  ],
});

/** The same records in every run: `count` that parse, from a fixed seed. */
export function samples(count: number, seed = 20261201): Sample[] {
  const found: Sample[] = [];
  for (const input of fc.sample(record, { numRuns: count * 3, seed })) {
    const parsed = parseJob(input);
    if (!parsed.ok) continue;
    const issue = fullIssue(found.length % 3 === 0 ? 0 : found.length % 3 === 1 ? 12 : 30);
    found.push({ job: parsed.value, assessment: assess(parsed.value, "2026-12-01"), issue });
    if (found.length === count) return found;
  }
  throw new Error(`Only ${found.length} of ${count} generated records parse.`);
}

/** A record of the examples with its assessment. */
export function example(name: string): Sample {
  const parsed = parseJob(JSON.parse(readFileSync(`tests/examples/${name}.json`, "utf8")));
  if (!parsed.ok) throw new Error(parsed.fields.map(({ path, message }) => `${path}: ${message}`).join("\n"));
  return {
    job: parsed.value,
    assessment: assess(parsed.value, "2026-12-01"),
    issue: {
      version: 1,
      issuedAt: "2026-12-01T09:00:00.000Z",
      sealedBy: "Tam Orrell",
      gapsReason: null,
      photos: [
        {
          file: "cut-out.jpg",
          subject: "cut-out",
          caption: "Rating label",
          takenAt: "2026-11-20T10:00:00Z",
          number: 1,
        },
        { file: "head.jpg", subject: "service-head", caption: null, takenAt: null, number: 2 },
      ],
      changes: [],
    },
  };
}

export const exampleNames = [
  "fen-0147-notice",
  "fen-0142-notice-due-on-the-day",
  "fen-0125-application-before-work",
  "fen-0139-clock-on-utc",
  "fen-0151-two-way",
  "fen-0153-stop",
] as const;
