import type { Option } from "./model";

/** The words of the record's choices, as a person on site would say them. */
const options = (pairs: Record<string, string>): readonly Option[] =>
  Object.entries(pairs).map(([value, word]) => ({ value, word }));

export const yesNo: readonly Option[] = [
  { value: true, word: "Yes" },
  { value: false, word: "No" },
];

export const earthings = options({ "TN-C-S": "TN-C-S (PME)", "TN-S": "TN-S", TT: "TT" });

export const cutOutEvidence = options({
  "carrier-label": "Label on the fuse carrier",
  "fuse-seen": "Fuse link seen, by an authorised person",
  "operator-statement": "Operator’s statement",
  assumed: "Assumed",
  unreadable: "Not known, cannot be read",
});

export const looped = options({
  no: "No",
  "feeds-neighbour": "Feeds next door",
  "fed-from-neighbour": "Fed by next door",
});

export const serviceConditions = options({
  sound: "Sound",
  "heat-marks": "Heat marks",
  damaged: "Damaged",
  "pitch-leak": "Pitch leaking",
  "exposed-live": "Exposed live",
  tamper: "Tampered with",
  water: "Water",
  "asbestos-suspected": "Asbestos suspected",
  "no-earth-found": "No earth found",
  "other-concern": "Another concern",
  unknown: "Not known",
});

export const referenceMethods = options({
  A: "A, in an insulated wall",
  B: "B, in conduit on a wall",
  C: "C, clipped direct",
  D: "D, in the ground",
  E: "E, in free air",
  "100": "100, above a ceiling, insulated",
  "101": "101, above a ceiling, thick insulation",
  "102": "102, in a stud wall, one side touching",
  "103": "103, in a stud wall, none touching",
});

export const tailsMethods = options({ A: "A, in insulation", B: "B, enclosed", C: "C, clipped direct" });

export const loadKinds = options({
  lighting: "Lighting",
  "heating-and-power": "Heating and power",
  cooking: "Cooking",
  "instantaneous-water-heater": "Instantaneous water heater",
  "thermostatic-water-heater": "Water heater with thermostat",
  "floor-warming": "Floor warming",
  "storage-heating": "Storage heating",
  "standard-circuit": "Ring or radial circuit",
  "socket-outlets": "Socket-outlets",
  fixed: "Other fixed appliance",
});

export const phaseNames = options({ L1: "L1", L2: "L2", L3: "L3" });

export const otherEquipment = options({
  chargepoint: "Chargepoint",
  "heat-pump": "Heat pump",
  solar: "Solar",
  battery: "Battery",
  generator: "Generator",
  other: "Other",
});

export const yesNoWords = options({ yes: "Yes", no: "No" });

export const devices = options({
  RCBO: "RCBO",
  MCB: "MCB",
  MCCB: "MCCB",
  "BS88-2": "Fuse BS 88-2",
  "BS88-3": "Fuse BS 88-3",
  BS1361: "Fuse BS 1361",
  BS3036: "Fuse BS 3036",
});

export const rcdTypes = options({ A: "A", F: "F", B: "B", AC: "AC", none: "None" });

export const rcdPlaces = options({
  "in-device": "In the device",
  separate: "Separate",
  "in-chargepoint": "In the chargepoint",
  none: "None",
});

export const cableTables = options({
  "4D2A": "PVC multicore (4D2A)",
  "4D5": "PVC flat twin and earth (4D5)",
  "4D4A": "PVC armoured (4D4A)",
  "4E4A": "XLPE armoured (4E4A)",
});

export const groupings = options({
  none: "None",
  bunched: "Bunched",
  "single-layer": "Single layer",
  "buried-touching": "Buried, touching",
  "buried-spaced": "Buried, spaced",
});

export const surge = options({
  "fitted-type-2": "Fitted, type 2",
  "fitted-type-1-2": "Fitted, type 1 and 2",
  "declined-by-owner": "Declined by the owner",
});

export const openPenMethods = options({
  "line-neutral-window-device": "Device that watches line to neutral",
  "cpc-earth-70V-device": "Device that measures earth to an electrode",
  "equivalent-device": "Another device, equal by declaration",
  "installation-electrode": "Electrode on the whole installation",
  "three-phase-balance": "Balanced three-phase load",
  tt: "TT for the chargepoint",
  separation: "Electrical separation",
  indoor: "Indoors, vehicle stays indoors",
  "private-tn-s": "Private TN-S",
});

export const recloses = options({
  "when-back-in-window": "When the voltage is back",
  "by-hand": "By hand",
  never: "Never",
  "at-once": "At once",
});

export const openPenEvidence = options({
  "maker-declaration": "Maker’s declaration",
  "operator-list": "Operator’s list",
  none: "None",
});

export const dischargeKinds = options({
  none: "Cannot",
  disabled: "Can, switched off",
  parallel: "Yes, to the grid",
  islanded: "Yes, islanded only",
  both: "Yes, both",
});

export const ownerChoices = options({
  accepted: "Kept the default",
  changed: "Set other hours",
  removed: "Removed the hours",
  pending: "Not chosen yet",
  "owner-absent": "Owner absent",
  refused: "Refused",
});

export const prompts = options({
  "with-owner-present": "Shown, owner present",
  "left-for-owner": "Left for the owner",
  "not-shown": "Not shown",
});

export const interests = options({
  owner: "Owner",
  tenant: "Tenant",
  landlord: "Landlord",
  "managing-agent": "Managing agent",
  "employee-driver": "Employee who drives",
  employer: "Employer",
  developer: "Developer",
});

export const territories = options({
  england: "England",
  wales: "Wales",
  scotland: "Scotland",
  "northern-ireland": "Northern Ireland",
});

export const premises = options({
  domestic: "Dwelling",
  "small-commercial": "Small business",
  commercial: "Commercial",
  "multi-occupied": "Several occupiers",
  "public-highway": "Public highway",
  "car-park": "Car park",
  "caravan-or-boat": "Caravan or boat",
  "fuel-filling-station": "Filling station",
  agricultural: "Farm",
});

export const buildings = options({
  house: "House",
  flat: "Flat",
  outbuilding: "Outbuilding",
  "car-park": "Car park",
  column: "Column",
  other: "Other",
});

export const buildingControl = options({
  "self-certified": "Self-certified",
  "third-party": "Third party",
  "local-authority": "Local authority",
  warrant: "Building warrant",
  "not-notifiable": "Not notifiable",
});

export const paperPurposes = options({
  "demand-notice": "Notice",
  application: "Application",
  "completion-notice": "Completion notice",
  "generation-notice": "Generation notice",
  "generation-application": "Generation application",
  "safety-report": "Safety report",
});

export const decisions = options({
  approved: "Approved",
  "approved-with-limit": "Approved with a limit",
  "approved-works-to-follow": "Approved, works to follow",
  refused: "Refused",
});

export const attachmentKinds = options({
  "operator-approval": "Operator’s approval",
  "operator-statement": "Operator’s statement",
  certificate: "Certificate",
  "statement-of-compliance": "Statement of compliance",
  "technical-file": "Technical file",
  permission: "Permission",
  "load-data": "Load data",
  "type-test": "Type test",
  other: "Other",
});
