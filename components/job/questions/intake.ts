import type { Job } from "@/lib/notify/job";
import type { Consequence, Group } from "./model";
import { cutOutEvidence, earthings, looped, serviceConditions, tailsMethods, yesNo, yesNoWords } from "./words";

const stopping = ["exposed-live", "heat-marks", "damaged", "tamper", "water", "no-earth-found"];
const reporting = ["pitch-leak", "asbestos-suspected", "other-concern", "unknown"];

function conditionLeadsTo(value: unknown): Consequence | null {
  if (!Array.isArray(value)) return null;
  if (value.some((word) => stopping.includes(word)))
    return {
      rule: "This stops the job.",
      then: "Touch nothing, leave it off, and open the assessment for what to do.",
    };
  if (value.some((word) => reporting.includes(word)))
    return { rule: "This means apply first.", then: "The operator is told what you saw." };
  return null;
}

const privateNetwork = (job: Job) => job.supply.ownedBy === "private-network";
const domestic = (job: Job) => job.site.premises === "domestic" || job.site.premises === null;

/** What can be seen at the service head without opening anything. */
export const intake: readonly Group[] = [
  {
    subject: "intake",
    title: "Intake",
    lead: "Look only, open nothing.",
    questions: [
      {
        path: "supply.cutOutRatingA",
        label: "Cut-out rating, as marked",
        short: "Cut-out",
        kind: "number",
        unit: "A",
        usual: [60, 80, 100],
        notKnown: {
          rule: "Not known means apply first.",
          then: "Look for a label on the carrier, or ask the operator.",
        },
      },
      {
        path: "supply.cutOutEvidence",
        label: "How it was read",
        short: "Read from",
        kind: "choice",
        options: cutOutEvidence,
        asList: true,
        consequence: (value) =>
          value === "assumed" || value === "unreadable"
            ? { rule: "The rating counts as not known.", then: "Find a label, or ask the operator for its figure." }
            : null,
      },
      {
        path: "supply.looped",
        label: "Is the service looped?",
        short: "Looped",
        kind: "choice",
        options: looped,
        notKnown: { rule: "Not known means apply first.", then: "Count the cables at the service head." },
        consequence: (value) =>
          value === "feeds-neighbour" || value === "fed-from-neighbour"
            ? { rule: "A looped service means apply first.", then: "The operator may have to separate it." }
            : null,
      },
      {
        path: "supply.serviceConditions",
        label: "Condition of the service equipment",
        short: "Condition",
        kind: "several",
        options: serviceConditions,
        alone: ["sound", "unknown"],
        consequence: conditionLeadsTo,
      },
      {
        path: "supply.earthing",
        label: "Earthing",
        kind: "choice",
        options: earthings,
        notKnown: {
          rule: "The earthing checks cannot tell.",
          then: "Follow the main earthing conductor to where it ends, or ask the operator.",
        },
      },
      {
        path: "supply.externalLoopImpedanceOhm",
        label: "External loop impedance, Ze",
        short: "Ze",
        hint: "Measured, or as the operator declared.",
        kind: "number",
        unit: "Ω",
        notKnown: {
          rule: "The loop check cannot tell.",
          then: "Measure Ze, or use the operator’s written figure.",
        },
      },
      {
        path: "supply.tailsMm2",
        label: "Meter tails",
        short: "Tails",
        kind: "number",
        unit: "mm²",
        notKnown: { rule: "The check of the tails cannot tell.", then: "Read the size printed on the sheath." },
      },
    ],
  },
  {
    subject: "intake",
    title: "Supply",
    lead: "How the supply comes in.",
    questions: [
      {
        path: "supply.phases",
        label: "Phases of the supply",
        short: "Phases",
        kind: "choice",
        columns: 3,
        options: [
          { value: 1, word: "One" },
          { value: 2, word: "Split" },
          { value: 3, word: "Three" },
        ],
      },
      {
        path: "supply.connection",
        label: "The connection",
        kind: "choice",
        columns: 3,
        options: [
          { value: "existing", word: "Existing" },
          { value: "alteration", word: "Altered" },
          { value: "new", word: "New" },
        ],
        consequence: (value) =>
          value === "new" || value === "alteration"
            ? { rule: "This means apply first.", then: "The operator makes or changes the connection." }
            : null,
      },
      {
        path: "supply.ownedBy",
        label: "Whose network is it?",
        short: "Network",
        kind: "choice",
        options: [
          { value: "distributor", word: "The operator’s" },
          { value: "private-network", word: "Private" },
        ],
        notKnown: { rule: "The earthing and route checks cannot tell.", then: "Ask whoever pays for the supply." },
      },
      {
        path: "supply.metered",
        label: "Is the supply metered?",
        short: "Metered",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "The route needs this.", then: "Look for the meter." },
      },
      {
        path: "supply.externalLoopObtained",
        label: "How Ze was obtained",
        short: "Ze from",
        kind: "choice",
        columns: 3,
        options: [
          { value: "measured", word: "Measured" },
          { value: "declared", word: "Declared" },
          { value: "enquiry", word: "Enquiry" },
        ],
        applies: (job) => typeof job.supply.externalLoopImpedanceOhm === "number",
      },
      {
        path: "supply.prospectiveFaultCurrentKa",
        label: "Prospective fault current",
        short: "Fault current",
        kind: "number",
        unit: "kA",
        notKnown: {
          rule: "The breaking-capacity check cannot tell.",
          then: "Measure it at the origin, or ask for the operator’s figure.",
        },
      },
      {
        path: "supply.earthingConductorMm2",
        label: "Earthing conductor",
        kind: "number",
        unit: "mm²",
        usual: [6, 10, 16],
        notKnown: { rule: "The earthing-conductor check cannot tell.", then: "Read the size printed on the sheath." },
      },
      {
        path: "supply.bonding",
        label: "Main bonding",
        short: "Bonding",
        hint: "One line a service: gas, water, oil, steel.",
        kind: "rows",
        noun: "service",
        none: "Looked, none needed",
        cells: [
          { key: "service", label: "Service", kind: "text", required: true },
          { key: "mm2", label: "Size", kind: "number", unit: "mm²", notKnown: true },
          { key: "seen", label: "Seen", kind: "choice", options: yesNo, notKnown: true },
        ],
      },
      {
        path: "supply.cutOutSeenUnder.authority",
        label: "Who authorised looking at the fuse",
        short: "Fuse seen under",
        kind: "text",
        applies: (job) => job.supply.cutOutEvidence === "fuse-seen",
      },
      {
        path: "supply.cutOutSeenUnder.on",
        label: "Day of that authority",
        short: "Authority of",
        kind: "date",
        applies: (job) => job.supply.cutOutEvidence === "fuse-seen",
      },
    ],
  },
  {
    subject: "intake",
    title: "Connection",
    lead: "New, altered or private supplies.",
    more: (job) => !privateNetwork(job),
    questions: [
      {
        path: "supply.earthingConfirmedPrivate",
        label: "Is the TN-S from the customer’s own transformer?",
        short: "Private TN-S",
        kind: "choice",
        options: yesNo,
        applies: (job) => job.supply.earthing === "TN-S",
      },
      {
        path: "supply.lineNeutralImpedanceOhm",
        label: "Line to neutral impedance at the origin",
        short: "Line to neutral",
        kind: "number",
        unit: "Ω",
        notKnown: {
          rule: "The flicker check cannot tell.",
          then: "Measure it between line and neutral at the origin.",
        },
      },
      {
        path: "supply.supplyNeutralMm2",
        label: "Supply neutral",
        kind: "number",
        unit: "mm²",
        notKnown: { rule: "The bonding-size check cannot tell.", then: "Ask the operator; do not open the cut-out." },
      },
      {
        path: "supply.tailsReferenceMethod",
        label: "How the tails run",
        short: "Tails run",
        kind: "choice",
        options: tailsMethods,
        notKnown: { rule: "The check of the tails cannot tell.", then: "Follow them from the meter to the board." },
      },
      {
        path: "supply.isolatorAfterMeter",
        label: "Isolator after the meter?",
        short: "Isolator",
        kind: "choice",
        columns: 3,
        options: yesNoWords,
        notKnown: { rule: "Recorded as not known.", then: "Look between the meter and the board." },
      },
    ],
  },
  {
    subject: "intake",
    title: "Meter and capacity",
    lead: "From the meter, or the agreement with the operator.",
    more: domestic,
    questions: [
      {
        path: "supply.meter.kind",
        label: "Kind of meter",
        short: "Meter",
        kind: "choice",
        columns: 3,
        options: [
          { value: "smart", word: "Smart" },
          { value: "traditional", word: "Traditional" },
          { value: "half-hourly", word: "Half-hourly" },
        ],
        applies: (job) => job.supply.metered !== false,
      },
      {
        path: "supply.meter.serial",
        label: "Meter serial number",
        short: "Meter serial",
        kind: "text",
        mono: true,
        optional: true,
        applies: (job) => job.supply.metered !== false,
      },
      {
        path: "supply.meter.currentTransformers",
        label: "Does it use current transformers?",
        short: "Transformers",
        kind: "choice",
        columns: 3,
        options: yesNo,
        notKnown: { rule: "Recorded as not known.", then: "Look at the meter’s rating plate." },
        applies: (job) => job.supply.metered !== false,
      },
      {
        path: "supply.authorisedCapacityKva",
        label: "Authorised capacity",
        hint: "From the connection agreement.",
        kind: "number",
        unit: "kVA",
        notKnown: {
          rule: "The capacity test cannot tell.",
          then: "Ask the customer for the connection agreement, or the operator.",
        },
      },
      {
        path: "supply.siteDemandKva",
        label: "Present demand of the site",
        short: "Site demand",
        kind: "number",
        unit: "kVA",
        notKnown: { rule: "The capacity test cannot tell.", then: "Take it from the half-hourly data." },
        applies: (job) => !domestic(job),
      },
    ],
  },
];
