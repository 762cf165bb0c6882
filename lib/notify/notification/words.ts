import type { Job } from "../job";

/** Words for the record's choices as an operator reads them. Each table is complete: the type sees to it. */
type Words<K extends string | null> = Record<NonNullable<K>, string>;

export const premisesWords: Words<Job["site"]["premises"]> = {
  domestic: "Domestic",
  "small-commercial": "Small commercial",
  commercial: "Commercial",
  "multi-occupied": "Multi-occupied",
  "public-highway": "Public highway",
  "car-park": "Car park",
  "caravan-or-boat": "Caravan pitch or mooring",
  "fuel-filling-station": "Fuel filling station",
  agricultural: "Agricultural",
};

export const connectionWords: Words<Job["supply"]["connection"]> = {
  existing: "Existing",
  alteration: "Alteration",
  new: "New",
};

export const interestWords: Words<Job["customer"]["interest"]> = {
  owner: "Owner",
  tenant: "Tenant",
  landlord: "Landlord",
  "managing-agent": "Managing agent",
  "employee-driver": "Employee who drives the car",
  employer: "Employer",
  developer: "Developer",
};

export const cutOutEvidenceWords: Words<Job["supply"]["cutOutEvidence"]> = {
  "operator-statement": "Operator’s statement",
  "fuse-seen": "Fuse link seen under the operator’s authority",
  "carrier-label": "Label on the carrier",
  assumed: "Assumed",
  unreadable: "Could not be read",
};

export const loopedWords: Words<Job["supply"]["looped"]> = {
  no: "No",
  "feeds-neighbour": "Yes, feeds a neighbour",
  "fed-from-neighbour": "Yes, fed from a neighbour",
  unknown: "Not known",
};

export const conditionWords: Words<NonNullable<Job["supply"]["serviceConditions"]>[number]> = {
  sound: "Sound",
  damaged: "Damaged",
  "heat-marks": "Heat marks",
  "exposed-live": "Exposed live parts",
  "pitch-leak": "Leaking pitch",
  tamper: "Signs of tampering",
  water: "Water",
  "asbestos-suspected": "Suspected asbestos",
  "no-earth-found": "No earth found",
  "other-concern": "Another concern",
  unknown: "Not known",
};

export const earthingWords: Words<Job["supply"]["earthing"]> = {
  "TN-C-S": "TN-C-S",
  "TN-S": "TN-S",
  TT: "TT",
  unknown: "Not known",
};

export const methodWords: Words<Job["demand"]["method"]> = {
  measured: "Measured by a logger",
  "half-hourly": "Half-hourly meter readings",
  diversity: "Household allowances",
  declared: "Declared",
};

export const openPenWords: Words<Job["chargepoints"][number]["openPen"]["method"]> = {
  "three-phase-balance": "Balanced three-phase load",
  "installation-electrode": "Electrode of the installation",
  "cpc-earth-70V-device": "Device watching the protective conductor against earth",
  "line-neutral-window-device": "Device watching line to neutral",
  "equivalent-device": "Equivalent device",
  tt: "Own electrode, TT",
  separation: "Electrical separation",
  indoor: "Indoors",
  "private-tn-s": "TN-S from the customer’s own transformer",
};

export const dischargeWords: Words<Job["chargepoints"][number]["discharge"]["kind"]> = {
  none: "Cannot discharge",
  disabled: "Kept from discharging by its setting",
  parallel: "In parallel with the network",
  islanded: "Only apart from the network",
  both: "In parallel and apart from the network",
  unknown: "Not known",
};

export const kindWords: Record<Job["kind"], string> = {
  new: "New",
  replacement: "Replacement",
  "change-after-commissioning": "Change after commissioning",
  removal: "Removal",
};

export const limitWords: Words<Job["demand"]["loadLimit"]["kind"]> = {
  none: "None",
  chargepoint: "Limit of the chargepoint",
  site: "Site controller",
  "operator-scheme": "Operator’s scheme",
};

export const equipmentWords: Words<NonNullable<Job["demand"]["otherEquipment"]>[number]["kind"]> = {
  chargepoint: "Chargepoint",
  "heat-pump": "Heat pump",
  solar: "Solar panels",
  battery: "Battery",
  generator: "Generator",
  other: "Other",
};
