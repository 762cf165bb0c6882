import type { Job } from "@/lib/notify/job";
import type { Group, Question } from "./model";
import { cableTables, devices, groupings, rcdPlaces, rcdTypes, referenceMethods, yesNo } from "./words";

const circuitAt = (job: Job, index: number) => job.circuits[index];
const hasRcd = (job: Job, index: number) => {
  const type = circuitAt(job, index)?.device.rcdType;
  return type !== null && type !== "none";
};
const breaker = (job: Job, index: number) => {
  const kind = circuitAt(job, index)?.device.kind;
  return kind === null || kind === "MCB" || kind === "RCBO" || kind === "MCCB";
};
const buried = (job: Job, index: number) => circuitAt(job, index)?.cable.referenceMethod === "D";
const armoured = (job: Job, index: number) => {
  const table = circuitAt(job, index)?.cable.table;
  return table === "4D4A" || table === "4E4A";
};
/** Before installing there is nothing to test. */
const installed = (job: Job) => job.stage === "installed";

const measuredAs = (path: string, label: string, short: string, unit: string, check: string): Question => ({
  path: `measured.${path}`,
  label,
  short,
  kind: "number",
  unit,
  applies: installed,
  notKnown: { rule: `${check} cannot tell.`, then: "Test it, or leave it not known and say why in the notes." },
});

/** The circuit from the board to the unit: device, cable, tests. */
export const circuit: readonly Group[] = [
  {
    subject: "circuit",
    title: "Circuit",
    lead: "The device that protects it.",
    each: "circuits",
    questions: [
      {
        path: "device.kind",
        label: "Protective device",
        short: "Device",
        kind: "choice",
        options: devices,
        asList: true,
      },
      {
        path: "device.curve",
        label: "Curve",
        kind: "choice",
        columns: 3,
        options: ["B", "C", "D"].map((value) => ({ value, word: value })),
        applies: breaker,
      },
      { path: "device.ratingA", label: "Rating", short: "Rating", kind: "number", unit: "A", usual: [20, 32, 40] },
      {
        path: "device.breakingCapacityKa",
        label: "Breaking capacity",
        kind: "number",
        unit: "kA",
        usual: [6, 10],
        notKnown: { rule: "The breaking-capacity check cannot tell.", then: "It is printed on the device." },
      },
      {
        path: "device.rcdType",
        label: "RCD type",
        kind: "choice",
        columns: 3,
        options: rcdTypes,
        notKnown: { rule: "The RCD check cannot tell.", then: "Read the symbol on the device." },
      },
      { path: "device.rcdMa", label: "RCD rating", kind: "number", unit: "mA", usual: [30, 100], applies: hasRcd },
      {
        path: "device.rcdPlace",
        label: "Where the RCD is",
        short: "RCD place",
        kind: "choice",
        options: rcdPlaces,
        notKnown: { rule: "The RCD check cannot tell.", then: "Look at the board and inside the unit." },
        applies: hasRcd,
      },
    ],
  },
  {
    subject: "circuit",
    title: "Cable",
    lead: "As run.",
    each: "circuits",
    questions: [
      { path: "cable.table", label: "Cable", kind: "choice", columns: 1, options: cableTables },
      { path: "cable.lineMm2", label: "Line conductor", short: "Line", kind: "number", unit: "mm²", usual: [4, 6, 10] },
      {
        path: "cable.cpcMm2",
        label: "Protective conductor",
        short: "cpc",
        kind: "number",
        unit: "mm²",
        notKnown: { rule: "The protective-conductor check cannot tell.", then: "It follows from the cable’s size." },
      },
      {
        path: "cable.cpcKind",
        label: "Protective conductor is",
        short: "cpc is",
        kind: "choice",
        columns: 3,
        options: [
          { value: "core", word: "A core" },
          { value: "armour", word: "Armour" },
          { value: "separate", word: "Separate" },
        ],
        applies: armoured,
      },
      {
        path: "cable.lengthM",
        label: "Length of run",
        short: "Length",
        kind: "number",
        unit: "m",
        notKnown: { rule: "The voltage-drop check cannot tell.", then: "Pace it or measure it." },
      },
      {
        path: "cable.referenceMethod",
        label: "How it runs, at its worst",
        short: "Method",
        kind: "choice",
        options: referenceMethods,
        asList: true,
        notKnown: { rule: "The cable-rating check cannot tell.", then: "Follow the run." },
      },
      {
        path: "isolator",
        label: "Isolator at the unit?",
        short: "Isolator",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The isolation check cannot tell.", then: "Look beside the unit." },
      },
    ],
  },
  {
    subject: "circuit",
    title: "Tests",
    lead: "As the instrument showed them.",
    each: "circuits",
    questions: [
      measuredAs("r1r2Ohm", "R1 + R2", "R1 + R2", "Ω", "The calculated loop check"),
      measuredAs("zsOhm", "Zs at the unit", "Zs", "Ω", "The measured loop check"),
      measuredAs("rcdTripMs", "RCD trip time", "RCD", "ms", "The RCD check"),
      measuredAs("insulationMohm", "Insulation resistance", "Insulation", "MΩ", "The insulation check"),
      {
        path: "measured.polarityCorrect",
        label: "Is polarity correct?",
        short: "Polarity",
        kind: "choice",
        columns: 3,
        options: [
          { value: true, word: "Correct" },
          { value: false, word: "Wrong" },
        ],
        applies: installed,
        notKnown: { rule: "The polarity check cannot tell.", then: "Test it before the unit is used." },
        consequence: (value) =>
          value === false
            ? { rule: "Wrong polarity stops the job.", then: "Leave it off and open the assessment." }
            : null,
      },
      { path: "measured.testedOn", label: "Tested on", short: "Tested", kind: "date", applies: installed },
    ],
  },
  {
    subject: "circuit",
    title: "More of the device",
    each: "circuits",
    more: () => true,
    questions: [
      {
        path: "device.doublePole",
        label: "Does it open line and neutral?",
        short: "Double pole",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The isolation check cannot tell.", then: "Read the symbol on the device." },
      },
      {
        path: "device.bidirectional",
        label: "Is it bidirectional?",
        short: "Bidirectional",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The check for exporting units cannot tell.", then: "Look for marked line and load ends." },
      },
      {
        path: "device.sharedRcd",
        label: "Does the RCD serve other circuits?",
        short: "Shared RCD",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The RCD check cannot tell.", then: "Look at the board." },
      },
      {
        path: "upstreamRcds",
        label: "RCDs before this one",
        short: "RCDs before",
        kind: "rows",
        noun: "RCD",
        none: "Looked, none",
        cells: [
          { key: "type", label: "Type", kind: "choice", options: rcdTypes, notKnown: true },
          { key: "ratedMa", label: "Rated", kind: "number", unit: "mA" },
          { key: "delayed", label: "Time-delayed", kind: "choice", options: yesNo, notKnown: true },
        ],
      },
      {
        path: "measured.rcdTestMultiple",
        label: "RCD tested at",
        kind: "choice",
        columns: 3,
        options: [1, 2, 5].map((value) => ({ value, word: `${value} × IΔn` })),
        applies: installed,
      },
      measuredAs("dcTripMa", "dc trip current", "dc trip", "mA", "The dc test"),
      {
        path: "measured.insulationTestV",
        label: "Insulation tested at",
        kind: "choice",
        columns: 3,
        options: [250, 500, 1000].map((value) => ({ value, word: `${value} V` })),
        applies: installed,
      },
    ],
  },
  {
    subject: "circuit",
    title: "More of the cable",
    each: "circuits",
    more: () => true,
    questions: [
      {
        path: "cable.ambientC",
        label: "Air around it",
        short: "Ambient",
        kind: "number",
        unit: "°C",
        notKnown: { rule: "The cable-rating check cannot tell.", then: "Take the warmest place on the run." },
      },
      {
        path: "cable.groundC",
        label: "Ground",
        kind: "number",
        unit: "°C",
        applies: buried,
        notKnown: { rule: "The cable-rating check cannot tell.", then: "Ask the designer." },
      },
      {
        path: "cable.groupedCircuits",
        label: "Circuits run together, this one counted",
        short: "Grouped",
        kind: "number",
        unit: "no.",
        whole: true,
      },
      {
        path: "cable.grouping",
        label: "How they lie together",
        short: "Grouping",
        kind: "choice",
        options: groupings,
        applies: (job, index) => (circuitAt(job, index)?.cable.groupedCircuits ?? 1) > 1,
      },
      {
        path: "cable.insulationMm",
        label: "Length inside thermal insulation",
        short: "In insulation",
        kind: "number",
        unit: "mm",
        notKnown: { rule: "The cable-rating check cannot tell.", then: "Follow the run." },
      },
      {
        path: "cable.terminationC",
        label: "Terminals rated for",
        short: "Terminals",
        kind: "choice",
        options: [70, 90].map((value) => ({ value, word: `${value} °C` })),
      },
      {
        path: "cable.armourMilliohmPerM",
        label: "Armour resistance",
        short: "Armour",
        kind: "number",
        unit: "mΩ/m",
        applies: (job, index) => circuitAt(job, index)?.cable.cpcKind === "armour",
        notKnown: { rule: "The loop check cannot tell.", then: "Look in the cable maker’s sheet." },
      },
    ],
  },
  {
    subject: "circuit",
    title: "Place in the installation",
    each: "circuits",
    more: () => true,
    questions: [
      {
        path: "kind",
        label: "Kind of circuit",
        short: "Kind",
        kind: "choice",
        options: [
          { value: "final", word: "Final" },
          { value: "distribution", word: "Distribution" },
        ],
      },
      {
        path: "board",
        label: "From board",
        short: "Board",
        hint: "The name of a board of this job.",
        kind: "text",
        optional: true,
      },
      {
        path: "fedFrom",
        label: "Fed from circuit",
        short: "Fed from",
        hint: "The name of the circuit nearer the supply.",
        kind: "text",
        optional: true,
      },
      {
        path: "measured.phaseSequenceCorrect",
        label: "Is phase sequence correct?",
        short: "Sequence",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The sequence check cannot tell.", then: "Test it." },
        applies: (job) => installed(job) && job.supply.phases === 3,
      },
    ],
  },
];
