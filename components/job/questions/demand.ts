import type { Job } from "@/lib/notify/job";
import type { Group } from "./model";
import { loadKinds, otherEquipment, phaseNames, yesNo, yesNoWords } from "./words";

const byMethod =
  (...methods: Job["demand"]["method"][]) =>
  (job: Job) =>
    methods.includes(job.demand.method);
const limited = (job: Job) => job.demand.loadLimit.kind !== null && job.demand.loadLimit.kind !== "none";

/** What the site takes before the work, and how anybody knows. */
export const demand: readonly Group[] = [
  {
    subject: "demand",
    title: "Demand",
    lead: "What the site takes before the work.",
    questions: [
      {
        path: "demand.method",
        label: "How is the demand known?",
        short: "Method",
        kind: "choice",
        options: [
          { value: "measured", word: "Logger" },
          { value: "half-hourly", word: "Half-hourly data" },
          { value: "diversity", word: "Load survey" },
          { value: "declared", word: "Declared" },
        ],
        consequence: (value, job) =>
          value === "diversity" && job.site.premises !== "domestic" && job.site.premises !== null
            ? { rule: "Household allowances are for households.", then: "Use a logger or the half-hourly data." }
            : null,
      },
      {
        path: "demand.existingA",
        label: "Highest demand before the work",
        short: "Before",
        hint: "One figure a phase.",
        kind: "figures",
        unit: "A",
        applies: byMethod("measured", "declared"),
      },
      {
        path: "demand.measurement.from",
        label: "Logged from",
        kind: "date",
        applies: byMethod("measured", "half-hourly"),
      },
      {
        path: "demand.measurement.to",
        label: "Logged to",
        kind: "date",
        applies: byMethod("measured", "half-hourly"),
        hint: "Seven days with a weekend in it for a logger.",
      },
      {
        path: "demand.measurement.resolutionS",
        label: "A reading every",
        short: "Resolution",
        kind: "number",
        unit: "s",
        usual: [1, 60, 1800],
        applies: byMethod("measured"),
      },
      {
        path: "demand.measurement.perPhase",
        label: "Was each phase logged by itself?",
        short: "Each phase",
        kind: "choice",
        options: yesNo,
        applies: (job) => byMethod("measured", "half-hourly")(job) && job.supply.phases !== 1,
      },
      {
        path: "demand.loads",
        label: "Loads on the site",
        short: "Loads",
        hint: "Rated current of each; the household allowances are applied by the assessment.",
        kind: "rows",
        noun: "load",
        none: "Looked, none",
        applies: byMethod("diversity"),
        cells: [
          { key: "kind", label: "Kind", kind: "choice", required: true, options: loadKinds },
          { key: "ratedA", label: "Rated", kind: "number", unit: "A", required: true },
          { key: "quantity", label: "How many", kind: "number" },
          { key: "phase", label: "Phase, if three", kind: "choice", options: phaseNames },
          { key: "socketInControlUnit", label: "Socket in the cooker unit", kind: "choice", options: yesNo },
        ],
      },
      {
        path: "demand.halfHourKwh",
        label: "Half-hourly readings",
        short: "Half hours",
        hint: "A file or lines of start and kWh, such as 2026-01-05T18:00:00Z, 3.2",
        kind: "half-hours",
        applies: byMethod("half-hourly"),
      },
    ],
  },
  {
    subject: "demand",
    title: "Other equipment",
    lead: "What else is on site, any limit, and who worked it out.",
    questions: [
      {
        path: "demand.otherEquipment",
        label: "Other low-carbon equipment on site",
        short: "Other plant",
        kind: "rows",
        noun: "item",
        none: "Looked, none",
        cells: [
          { key: "kind", label: "Kind", kind: "choice", required: true, options: otherEquipment },
          { key: "make", label: "Make", kind: "text" },
          { key: "model", label: "Model", kind: "text" },
          { key: "ratedA", label: "Rated", kind: "number", unit: "A", notKnown: true },
          {
            key: "inExistingDemand",
            label: "In the demand above?",
            kind: "choice",
            options: yesNoWords,
            notKnown: true,
          },
          { key: "phase", label: "Phase, if three", kind: "choice", options: phaseNames },
          { key: "designA", label: "Export, design", kind: "number", unit: "A", notKnown: true },
          { key: "registeredA", label: "Export, registered", kind: "number", unit: "A", notKnown: true },
          { key: "exportLimitA", label: "Export limit", kind: "number", unit: "A", notKnown: true },
          { key: "acceptance", label: "Operator’s acceptance", kind: "text" },
        ],
      },
      {
        path: "demand.loadLimit.kind",
        label: "Load limit",
        kind: "choice",
        options: [
          { value: "none", word: "None" },
          { value: "chargepoint", word: "In the chargepoint" },
          { value: "site", word: "For the site" },
          { value: "operator-scheme", word: "Operator’s scheme" },
        ],
        consequence: (value, job) =>
          value !== null && value !== "none" && value !== "operator-scheme" && !job.demand.loadLimit.operatorAgreement
            ? { rule: "The limit is not counted yet.", then: "It counts once the operator has agreed to it." }
            : null,
      },
      { path: "demand.loadLimit.limitA", label: "Limit set to", kind: "number", unit: "A", applies: limited },
      {
        path: "demand.loadLimit.operatorAgreement",
        label: "The operator’s agreement to the limit",
        short: "Agreed as",
        hint: "Reference or letter. Leave empty if there is none.",
        kind: "text",
        optional: true,
        applies: limited,
      },
      {
        path: "demand.loadLimit.failSafeTested",
        label: "Was it tested with the sensor unplugged?",
        short: "Fail-safe test",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "Recorded as not known.", then: "Unplug the sensor and watch the current fall." },
        applies: limited,
      },
      {
        path: "demand.loadLimit.sealedBy",
        label: "Who sealed the setting",
        short: "Sealed by",
        kind: "text",
        optional: true,
        applies: limited,
      },
      { path: "demand.assessor", label: "Who worked out the demand", short: "Assessor", kind: "text" },
      { path: "demand.assessedOn", label: "Worked out on", short: "Assessed on", kind: "date", optional: true },
    ],
  },
];
