import type { Job } from "@/lib/notify/job";
import type { Consequence, Group } from "./model";
import { openPenEvidence, openPenMethods, recloses, yesNo } from "./words";

const openPen = (job: Job, index: number) => job.chargepoints[index]?.openPen;
const usesDevice = (job: Job, index: number) =>
  ["line-neutral-window-device", "cpc-earth-70V-device", "equivalent-device"].includes(
    openPen(job, index)?.method ?? "",
  );
const by =
  (...methods: string[]) =>
  (job: Job, index: number) =>
    methods.includes(openPen(job, index)?.method ?? "");

function methodLeadsTo(value: unknown, job: Job): Consequence | null {
  if (value === "tt" && job.supply.earthing !== "TT" && job.supply.earthing !== null)
    return {
      rule: "Two separations are needed.",
      then: "Above ground and below it, from everything on the other earth.",
    };
  if (value === "line-neutral-window-device" && job.supply.phases === 3)
    return {
      rule: "One line alone cannot tell on three phases.",
      then: "The maker must declare that it watches every line.",
    };
  return null;
}

/** What protects against a broken PEN conductor, unit by unit. */
export const earthing: readonly Group[] = [
  {
    subject: "earthing",
    title: "Earthing",
    lead: "What protects against a broken PEN.",
    each: "chargepoints",
    questions: [
      {
        path: "openPen.method",
        label: "Method for an open PEN",
        short: "Method",
        kind: "choice",
        options: openPenMethods,
        asList: true,
        consequence: methodLeadsTo,
      },
      {
        path: "openPen.device.position",
        label: "Where the device is",
        short: "Device",
        kind: "choice",
        options: [
          { value: "built-in", word: "In the unit" },
          { value: "separate", word: "Separate" },
          { value: "none", word: "None" },
        ],
        notKnown: { rule: "The open-PEN check cannot tell.", then: "Look in the maker’s sheet." },
        applies: usesDevice,
      },
      {
        path: "openPen.device.standard",
        label: "Standard declared for the device",
        short: "Standard",
        hint: "For example IET 01:2024.",
        kind: "text",
        mono: true,
        applies: usesDevice,
      },
      {
        path: "openPen.device.opensEarth",
        label: "Does it open the earth too?",
        short: "Opens earth",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The open-PEN check cannot tell.", then: "Look in the maker’s sheet." },
        applies: usesDevice,
      },
      {
        path: "openPen.device.opensWithinS",
        label: "Opens within",
        kind: "number",
        unit: "s",
        notKnown: { rule: "The open-PEN check cannot tell.", then: "Look in the maker’s sheet." },
        applies: usesDevice,
      },
      {
        path: "openPen.device.recloses",
        label: "When does it close again?",
        short: "Closes",
        kind: "choice",
        options: recloses,
        notKnown: { rule: "The open-PEN check cannot tell.", then: "Look in the maker’s sheet." },
        applies: usesDevice,
      },
      {
        path: "openPen.device.evidence",
        label: "Evidence for the device",
        short: "Evidence",
        kind: "choice",
        columns: 1,
        options: openPenEvidence,
        applies: usesDevice,
      },
      {
        path: "openPen.functionTest",
        label: "Function test",
        kind: "choice",
        options: [
          { value: "passed", word: "Passed" },
          { value: "failed", word: "Failed" },
          { value: "not-done", word: "Not done" },
        ],
        notKnown: { rule: "Recorded as not known.", then: "Press the test button as the maker says." },
        applies: (job, index) => usesDevice(job, index) && job.stage === "installed",
      },
      {
        path: "openPen.electrodeOhm",
        label: "Electrode resistance",
        short: "Electrode",
        kind: "number",
        unit: "Ω",
        notKnown: { rule: "The touch-voltage check cannot tell.", then: "Measure it with the electrode on its own." },
        applies: by("tt", "installation-electrode", "cpc-earth-70V-device"),
      },
      {
        path: "openPen.separationFromOtherEarthsM",
        label: "Distance from metal on another earth, above ground",
        short: "Separation",
        kind: "number",
        unit: "m",
        notKnown: { rule: "The separation check cannot tell.", then: "Measure to the nearest tap, light or fence." },
        applies: by("tt"),
      },
      {
        path: "openPen.buriedSeparationM",
        label: "Distance between buried earths",
        short: "Below ground",
        kind: "number",
        unit: "m",
        notKnown: {
          rule: "The separation check cannot tell.",
          then: "Ask the operator for its figure and the cable’s place.",
        },
        applies: by("tt"),
      },
      {
        path: "openPen.worstLoadsA",
        label: "Worst loads, chargepoint included",
        short: "Worst loads",
        hint: "One line a state: amps on L1, L2, L3.",
        kind: "triples",
        applies: by("three-phase-balance"),
      },
    ],
  },
  {
    subject: "earthing",
    title: "More of the device",
    each: "chargepoints",
    more: (job, index) => !(usesDevice(job, index) && job.supply.phases === 3),
    questions: [
      {
        path: "openPen.device.watchesEveryLine",
        label: "Does the maker declare that it watches every line?",
        short: "Every line",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The open-PEN check cannot tell on three phases.", then: "Look in the maker’s sheet." },
      },
      { path: "openPen.device.make", label: "Make of the device", short: "Device make", kind: "text", optional: true },
      {
        path: "openPen.device.model",
        label: "Model of the device",
        short: "Device model",
        kind: "text",
        optional: true,
      },
    ],
  },
];
