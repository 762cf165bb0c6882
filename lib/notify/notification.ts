import type { Assessment } from "./assessment";
import { longDate } from "./calendar";
import type { Chargepoint, Job } from "./job";
import { knownNumber } from "./job/facts";
import {
  choiceRow,
  dateRow,
  figureRow,
  observedRow,
  phasesRow,
  textRow,
  type NotificationRow,
  type NotificationSection,
} from "./notification/row";
import {
  conditionWords,
  connectionWords,
  cutOutEvidenceWords,
  dischargeWords,
  earthingWords,
  equipmentWords,
  interestWords,
  kindWords,
  limitWords,
  loopedWords,
  methodWords,
  openPenWords,
  premisesWords,
} from "./notification/words";
import { parseSupplyNumber } from "./supply-number";

export type { NotificationRow, NotificationSection } from "./notification/row";

/**
 * Everything an operator asks for, in the order it is asked: one list for the document, the CSV and the copy sheet.
 * Each row stands whether or not its fact is recorded; a value that is not recorded is null.
 */
export function notificationData(job: Job, assessment: Assessment): NotificationSection[] {
  return [
    { section: "Premises", rows: premises(job, assessment) },
    { section: "Customer and installer", rows: people(job) },
    { section: "Supply", rows: supply(job) },
    { section: "Demand", rows: demand(job, assessment) },
    ...job.chargepoints.map((unit, index) => ({
      section: job.chargepoints.length === 1 ? "Chargepoint" : `Chargepoint ${index + 1} of ${job.chargepoints.length}`,
      rows: chargepoint(unit, `chargepoints[${index}]`),
    })),
    ...generation(job, assessment),
    { section: "Dates", rows: dates(job) },
  ];
}

function printedNumber({ site }: Job): string | null {
  if (site.supplyNumber === null) return null;
  const reading = parseSupplyNumber(site.supplyNumber, site.territory);
  return reading.ok ? reading.printed : site.supplyNumber;
}

const kindOfNumber = { import: "Import", export: "Export", unknown: "Not known" } as const;

function premises(job: Job, { operator }: Assessment): NotificationRow[] {
  const {
    site,
    supply: { connection },
  } = job;
  return [
    textRow("operator", "Network operator", operator.kind === "unknown" ? null : operator.name),
    textRow("site.supplyNumber", "Supply number", printedNumber(job)),
    choiceRow("site.supplyNumberKind", "Kind of supply number", site.supplyNumberKind, kindOfNumber),
    textRow("site.address", "Address", site.address),
    textRow("site.postcode", "Postcode", site.postcode),
    textRow("site.uprn", "Unique property reference", site.uprn),
    textRow("site.gridReference", "Grid reference", site.gridReference),
    choiceRow("site.premises", "Premises", site.premises, premisesWords),
    choiceRow("supply.connection", "Connection", connection, connectionWords),
    textRow("site.chargepointPosition", "Position of the chargepoint", site.chargepointPosition),
  ];
}

function people({ customer, firm, competentPerson, onBehalfOf, jobNumber }: Job): NotificationRow[] {
  return [
    textRow("customer.name", "Customer", customer.name),
    textRow("customer.phone", "Customer’s telephone", customer.phone),
    textRow("customer.email", "Customer’s e-mail", customer.email),
    textRow("customer.address", "Customer’s address, if not the site", customer.address),
    choiceRow("customer.interest", "Customer’s interest in the site", customer.interest, interestWords),
    textRow("customer.permission.from", "Permission given by", customer.permission.from),
    dateRow("customer.permission.on", "Permission given on", customer.permission.on),
    textRow("firm.name", "Installer", firm.name),
    textRow("firm.contactName", "Contact", firm.contactName),
    textRow("firm.phone", "Installer’s telephone", firm.phone),
    textRow("firm.email", "Installer’s e-mail", firm.email),
    textRow("firm.address", "Installer’s address", firm.address),
    textRow("firm.registration", "Installer’s registration", firm.registration),
    textRow("competentPerson.name", "Competent person", competentPerson.name),
    textRow("competentPerson.registration", "Competent person’s registration", competentPerson.registration),
    textRow("onBehalfOf.name", "On behalf of", onBehalfOf.name),
    textRow("onBehalfOf.reference", "Their reference", onBehalfOf.reference),
    textRow("jobNumber", "Installer’s reference", jobNumber),
  ];
}

const obtainedWords = { measured: "Measured", declared: "Declared", enquiry: "By enquiry" } as const;

function supply({ supply: facts }: Job): NotificationRow[] {
  return [
    figureRow("supply.phases", "Phases", facts.phases, "phases"),
    observedRow("supply.metered", "Metered", facts.metered),
    textRow("supply.meter.kind", "Meter", facts.meter.kind),
    observedRow("supply.meter.currentTransformers", "Meter on current transformers", facts.meter.currentTransformers),
    figureRow("supply.cutOutRatingA", "Cut-out rating", facts.cutOutRatingA, "A"),
    choiceRow("supply.cutOutEvidence", "How the rating is known", facts.cutOutEvidence, cutOutEvidenceWords),
    textRow("supply.cutOutSeenUnder.authority", "Seen under the authority of", facts.cutOutSeenUnder.authority),
    choiceRow("supply.looped", "Looped service", facts.looped, loopedWords),
    textRow(
      "supply.serviceConditions",
      "Condition of cut-out and service head",
      facts.serviceConditions?.map((each) => conditionWords[each]) ?? null,
    ),
    choiceRow("supply.earthing", "Earthing of the supply", facts.earthing, earthingWords),
    figureRow("supply.externalLoopImpedanceOhm", "External loop impedance", facts.externalLoopImpedanceOhm, "Ω"),
    choiceRow("supply.externalLoopObtained", "How it was obtained", facts.externalLoopObtained, obtainedWords),
    figureRow("supply.prospectiveFaultCurrentKa", "Prospective fault current", facts.prospectiveFaultCurrentKa, "kA"),
    figureRow("supply.authorisedCapacityKva", "Authorised capacity", facts.authorisedCapacityKva, "kVA"),
    textRow("supply.isolatorAfterMeter", "Isolator after the meter", capital(facts.isolatorAfterMeter)),
  ];
}

const capital = (word: string | null) =>
  word === "unknown" ? "Not known" : word && word.charAt(0).toUpperCase() + word.slice(1);

function demand(job: Job, { demand: result }: Assessment): NotificationRow[] {
  const { demand: facts } = job;
  const { loadLimit } = facts;
  return [
    phasesRow("demand.existingA", "Demand before, a phase", result.existingA, "A", 1),
    phasesRow("demand.afterA", "Demand after, a phase", result.afterA, "A", 1),
    phasesRow("demand.afterKva", "Demand after", result.afterKva === null ? null : [result.afterKva], "kVA", 2),
    choiceRow("demand.method", "How the demand was found", facts.method, methodWords),
    dateRow("demand.measurement.from", "Measured from", facts.measurement.from),
    dateRow("demand.measurement.to", "Measured to", facts.measurement.to),
    textRow("demand.assessor", "Assessed by", facts.assessor),
    dateRow("demand.assessedOn", "Assessed on", facts.assessedOn),
    textRow("demand.otherEquipment", "Other equipment", facts.otherEquipment?.map(equipmentText) ?? null),
    choiceRow("demand.loadLimit.kind", "Load limit", loadLimit.kind, limitWords),
    figureRow("demand.loadLimit.limitA", "Limit set", loadLimit.limitA, "A"),
    textRow("demand.loadLimit.operatorAgreement", "Operator’s agreement to the limit", loadLimit.operatorAgreement),
    textRow(
      "demand.limitCounted",
      "Limit counted in the demand",
      loadLimit.kind === null ? null : result.limitCounted ? "Yes" : "No",
    ),
  ];
}

type Equipment = NonNullable<Job["demand"]["otherEquipment"]>[number];

function equipmentText({ kind, make, model, ratedA, phase }: Equipment): string {
  const name = [equipmentWords[kind], make, model].filter(Boolean).join(" ");
  const current = knownNumber(ratedA);
  return [name, current === null ? null : `${current} A`, phase].filter(Boolean).join(", ");
}

const connectorWords = { tethered: "Tethered", socket: "Socket" } as const;

function chargepoint(unit: Chargepoint, at: string): NotificationRow[] {
  const row = (key: string) => `${at}.${key}`;
  return [
    textRow(row("make"), "Maker", unit.make),
    textRow(row("model"), "Model", unit.model),
    textRow(row("serial"), "Serial number", unit.serial),
    textRow(row("registerReference"), "Register reference", unit.registerReference),
    figureRow(row("mode"), "Charging mode", unit.mode, "mode"),
    figureRow(row("phases"), "Phases used", unit.phases, "phases"),
    textRow(row("phase"), "Phase, if single-phase", unit.phase),
    figureRow(row("ratedA"), "Rated current a phase", unit.ratedA, "A"),
    figureRow(row("smartCharging.maximumPowerKw"), "Largest power", unit.smartCharging.maximumPowerKw, "kW"),
    figureRow(row("configuredA"), "Current as set", unit.configuredA, "A"),
    figureRow(row("outlets"), "Outlets", unit.outlets, "outlets"),
    choiceRow(row("connection"), "Connection to the vehicle", unit.connection, connectorWords),
    textRow(row("standards"), "Standards declared", unit.standards),
    choiceRow(row("openPen.method"), "Earthing of the chargepoint", unit.openPen.method, openPenWords),
    choiceRow(row("discharge.kind"), "Discharge", unit.discharge.kind, dischargeWords),
    textRow(row("replaces"), "Replaces", unit.replaces && replacedText(unit.replaces)),
  ];
}

function replacedText({ make, model, serial, removedOn }: NonNullable<Chargepoint["replaces"]>): string {
  const removed = removedOn ? `removed on ${longDate(removedOn)}` : null;
  return (
    [[make, model].filter(Boolean).join(" "), serial, removed].filter(Boolean).join(", ") || "A unit not described"
  );
}

/** A section only when generation is in question: a unit that cannot discharge has nothing to say here. */
function generation(job: Job, { route }: Assessment): NotificationSection[] {
  if (route.generation === "none") return [];
  const rows = job.chargepoints.flatMap(({ discharge, id }, index) => {
    if (discharge.kind === "none" || discharge.kind === "disabled") return [];
    const at = `chargepoints[${index}].discharge`;
    const suffix = job.chargepoints.length === 1 ? "" : `, ${id}`;
    return [
      figureRow(`${at}.designA`, `Design capacity a phase${suffix}`, discharge.designA, "A"),
      figureRow(`${at}.registeredA`, `Registered capacity a phase${suffix}`, discharge.registeredA, "A"),
      figureRow(`${at}.exportLimitA`, `Export limit a phase${suffix}`, discharge.exportLimitA, "A"),
      textRow(`${at}.typeTestReference`, `Type-test reference${suffix}`, discharge.typeTestReference),
    ];
  });
  const path = { key: "route.generation", label: "Path", value: pathWords[route.generation], unit: null };
  return [{ section: "Generation", rows: [path, ...rows] }];
}

const pathWords = {
  g98: "EREC G98",
  "sgi-1": "EREC G99, SGI-1",
  "sgi-2": "EREC G99, SGI-2",
  "sgi-3": "EREC G99, SGI-3",
  "full-application": "EREC G99, full application",
  "more-facts-needed": null,
} as const;

function dates({ dates: facts, kind, stage }: Job): NotificationRow[] {
  const installed = [
    dateRow("dates.installed", "Installed on", facts.installed),
    dateRow("dates.commissioned", "Commissioned on", facts.commissioned),
  ];
  return [
    textRow("kind", "Kind of work", kindWords[kind]),
    dateRow("dates.planned", "Planned for", facts.planned),
    ...(stage === "installed" ? installed : []),
  ];
}
