import type { Board, Chargepoint, Circuit, Job } from "@/lib/notify/job";
import type { EvidenceSubject } from "@/lib/notify/job/papers";

/** The record's words as they are printed. Each table is exhaustive, so a new word is a failed build. */
type Words<W> = Readonly<Record<Extract<W, string>, string>>;
type Supply = Job["supply"];
type Site = Job["site"];

export const stageWords: Words<Job["stage"]> = { planned: "planned", installed: "installed" };

export const kindWords: Words<Job["kind"]> = {
  new: "new installation",
  replacement: "replacement",
  "change-after-commissioning": "change after commissioning",
  removal: "removal",
};

export const territoryWords: Words<Site["territory"]> = {
  england: "England",
  wales: "Wales",
  scotland: "Scotland",
  "northern-ireland": "Northern Ireland",
};

export const premisesWords: Words<Site["premises"]> = {
  domestic: "domestic",
  "small-commercial": "small commercial",
  commercial: "commercial",
  "multi-occupied": "multi-occupied building",
  "public-highway": "public highway",
  "car-park": "car park",
  "caravan-or-boat": "caravan or boat",
  "fuel-filling-station": "fuel filling station",
  agricultural: "agricultural",
};

export const interestWords: Words<Job["customer"]["interest"]> = {
  owner: "owner",
  tenant: "tenant",
  landlord: "landlord",
  "managing-agent": "managing agent",
  "employee-driver": "employee driver",
  employer: "employer",
  developer: "developer",
};

export const cutOutEvidenceWords: Words<Supply["cutOutEvidence"]> = {
  "operator-statement": "operator's statement",
  "fuse-seen": "fuse link seen",
  "carrier-label": "carrier label",
  assumed: "assumed",
  unreadable: "label could not be read",
};

export const loopedWords: Words<Supply["looped"]> = {
  no: "no",
  "feeds-neighbour": "yes, feeds a neighbour",
  "fed-from-neighbour": "yes, fed from a neighbour",
  unknown: "not known",
};

export const conditionWords: Words<NonNullable<Supply["serviceConditions"]>[number]> = {
  sound: "sound",
  damaged: "damaged",
  "heat-marks": "heat marks",
  "exposed-live": "exposed live parts",
  "pitch-leak": "leaking pitch",
  tamper: "signs of tampering",
  water: "water",
  "asbestos-suspected": "asbestos suspected",
  "no-earth-found": "no earth found",
  "other-concern": "another concern",
  unknown: "not known",
};

export const earthingWords: Words<Supply["earthing"]> = {
  "TN-C-S": "TN-C-S",
  "TN-S": "TN-S",
  TT: "TT",
  unknown: "not known",
};

export const loopObtainedWords: Words<Supply["externalLoopObtained"]> = {
  measured: "measured",
  declared: "declared by the operator",
  enquiry: "by enquiry",
};

export const answerWords: Words<Supply["isolatorAfterMeter"]> = { yes: "yes", no: "no", unknown: "not known" };

export const demandMethodWords: Words<Job["demand"]["method"]> = {
  measured: "measured with a logger",
  "half-hourly": "the meter's half hours",
  diversity: "connected load with allowances for diversity",
  declared: "declared by the customer",
};

export const loadKindWords: Words<NonNullable<Job["demand"]["loads"]>[number]["kind"]> = {
  lighting: "lighting",
  "heating-and-power": "heating and power",
  cooking: "cooking",
  "instantaneous-water-heater": "instantaneous water heater",
  "thermostatic-water-heater": "water heater with thermostat",
  "floor-warming": "floor warming",
  "storage-heating": "storage heating",
  "standard-circuit": "standard circuit",
  "socket-outlets": "socket outlets",
  fixed: "fixed equipment",
};

export const equipmentKindWords: Words<NonNullable<Job["demand"]["otherEquipment"]>[number]["kind"]> = {
  chargepoint: "chargepoint",
  "heat-pump": "heat pump",
  solar: "solar panels",
  battery: "battery",
  generator: "generator",
  other: "other equipment",
};

export const loadLimitWords: Words<Job["demand"]["loadLimit"]["kind"]> = {
  none: "none",
  chargepoint: "by the chargepoint",
  site: "by a controller for the site",
  "operator-scheme": "under a scheme agreed with the operator",
};

export const arrangementWords: Words<Board["arrangement"]> = {
  existing: "existing",
  additional: "additional",
  replaced: "replaced",
};

export const surgeWords: Words<Board["surgeProtection"]> = {
  "fitted-type-1-2": "surge protection type 1 and 2",
  "fitted-type-2": "surge protection type 2",
  "declined-by-owner": "surge protection declined by the owner",
  unknown: "surge protection not known",
};

export const rcdPlaceWords: Words<Circuit["device"]["rcdPlace"]> = {
  "in-device": "in the same device",
  separate: "a separate RCD",
  "in-chargepoint": "in the chargepoint",
  none: "none",
  unknown: "not known",
};

export const rcdTypeWords: Words<Circuit["device"]["rcdType"]> = {
  AC: "type AC",
  A: "type A",
  F: "type F",
  B: "type B",
  none: "no RCD",
  unknown: "type not known",
};

export const groupingWords: Words<Circuit["cable"]["grouping"]> = {
  none: "not grouped",
  bunched: "bunched",
  "single-layer": "in one layer",
  "buried-touching": "buried, touching",
  "buried-spaced": "buried, spaced",
};

export const cpcKindWords: Words<Circuit["cable"]["cpcKind"]> = {
  core: "a core of the cable",
  armour: "the armour",
  separate: "a separate conductor",
};

export const locationWords: Words<Chargepoint["location"]> = {
  outdoor: "outdoors",
  "indoor-vehicle-outdoor": "indoors, the vehicle may stand outdoors",
  indoor: "indoors",
};

export const accessWords: Words<Chargepoint["access"]> = { private: "private", shared: "shared", public: "public" };

export const connectionWords: Words<Chargepoint["connection"]> = {
  tethered: "tethered cable",
  socket: "socket outlet",
};

export const securedWords: Words<Chargepoint["configurationSecuredBy"]> = {
  key: "a key",
  tool: "a tool",
  "installer-code": "an installer code",
  none: "nothing",
  unknown: "not known",
};

export const dischargeWords: Words<Chargepoint["discharge"]["kind"]> = {
  none: "cannot discharge",
  disabled: "can discharge, disabled",
  parallel: "can run in parallel with the network",
  islanded: "can run as an island only",
  both: "can run in parallel and as an island",
  unknown: "not known",
};

export const dcFaultWords: Words<Chargepoint["dcFaultProtection"]> = {
  "rdc-dd": "RDC-DD in the unit",
  "type-b": "type B RCD",
  none: "none",
  unknown: "not known",
};

export const openPenWords: Words<Chargepoint["openPen"]["method"]> = {
  "three-phase-balance": "balance of a three-phase installation",
  "installation-electrode": "earth electrode for the installation",
  "cpc-earth-70V-device": "device that watches the protective conductor against Earth",
  "line-neutral-window-device": "device that watches line to neutral voltage",
  "equivalent-device": "equivalent device",
  tt: "part of the installation made TT",
  separation: "electrical separation",
  indoor: "chargepoint and vehicle indoors",
  "private-tn-s": "TN-S from the customer's own transformer",
};

export const devicePositionWords: Words<Chargepoint["openPen"]["device"]["position"]> = {
  "built-in": "built into the chargepoint",
  separate: "separate",
  none: "none",
  unknown: "not known",
};

export const reclosesWords: Words<Chargepoint["openPen"]["device"]["recloses"]> = {
  "when-back-in-window": "when the voltage is back in its window",
  "by-hand": "by hand",
  never: "never",
  "at-once": "at once",
  unknown: "not known",
};

export const deviceEvidenceWords: Words<Chargepoint["openPen"]["device"]["evidence"]> = {
  "maker-declaration": "maker's declaration",
  "operator-list": "operator's list of devices",
  none: "none",
};

export const functionTestWords: Words<Chargepoint["openPen"]["functionTest"]> = {
  passed: "passed",
  failed: "failed",
  "not-done": "not done",
  unknown: "not known",
};

type Smart = Chargepoint["smartCharging"];

export const transferWords: Words<Smart["transfer"]> = {
  sale: "sale",
  hire: "hire",
  loan: "loan",
  gift: "gift",
  none: "not supplied by the firm",
};

export const usersWords: Words<Smart["users"]> = { private: "private", workplace: "workplace", public: "public" };

export const clockWords: Words<Smart["clock"]> = { local: "local time", utc: "UTC", unknown: "not known" };

export const ownerChoiceWords: Words<Smart["ownerChoice"]> = {
  accepted: "kept the default hours",
  changed: "changed the hours",
  removed: "removed the hours",
  pending: "not yet chosen",
  "owner-absent": "owner not present",
  refused: "declined to choose",
};

export const promptWords: Words<Smart["firstUsePrompt"]["how"]> = {
  "with-owner-present": "shown with the owner present",
  "left-for-owner": "left for the owner",
  "not-shown": "not shown",
  unknown: "not known",
};

export const weekdayWords = {
  mon: "Monday",
  tue: "Tuesday",
  wed: "Wednesday",
  thu: "Thursday",
  fri: "Friday",
  sat: "Saturday",
  sun: "Sunday",
} as const;

export const subjectWords: Words<EvidenceSubject> = {
  intake: "Intake",
  "cut-out": "Cut-out",
  "service-head": "Service head",
  meter: "Meter",
  "earth-terminal": "Earthing terminal",
  bonding: "Bonding",
  "consumer-unit": "Consumer unit",
  "rating-plate": "Rating plate",
  chargepoint: "Chargepoint",
  isolator: "Isolator",
  "limit-setting": "Limit setting",
  "default-hours-screen": "Hours screen",
  "delay-screen": "Delay screen",
  "first-use-prompt": "First-use prompt",
  "discharge-setting": "Discharge setting",
  "open-pen-device": "Open-PEN device",
  electrode: "Electrode",
  "neighbour-earths": "Neighbouring earths",
  damage: "Damage",
  "supply-number": "Supply number",
  "load-survey": "Load survey",
  "test-instrument-screen": "Instrument screen",
  other: "Other",
};

export const certificateWords: Words<Job["certificate"]["kind"]> = {
  installation: "installation certificate",
  "minor-works": "minor works certificate",
};

export const buildingControlWords: Words<Job["buildingControl"]["route"]> = {
  "self-certified": "self-certified",
  "third-party": "certified by a third party",
  "local-authority": "local authority",
  warrant: "building warrant",
  "not-notifiable": "not notifiable",
  unknown: "not known",
};

export const purposeWords: Words<Job["operatorRecords"][number]["purpose"]> = {
  "demand-notice": "notice",
  application: "application",
  "completion-notice": "completion notice",
  "generation-notice": "generation notice",
  "generation-application": "generation application",
  "safety-report": "safety report",
};

export const decisionWords: Words<Job["operatorRecords"][number]["decision"]> = {
  approved: "agreed",
  "approved-with-limit": "agreed with a limit",
  "approved-works-to-follow": "agreed, works to follow",
  refused: "refused",
};
