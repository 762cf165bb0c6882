import applicationBeforeWork from "./examples/fen-0125-application-before-work.json";
import clockOnUtc from "./examples/fen-0139-clock-on-utc.json";
import noticeDueOnTheDay from "./examples/fen-0142-notice-due-on-the-day.json";
import notice from "./examples/fen-0147-notice.json";
import twoWay from "./examples/fen-0151-two-way.json";
import stop from "./examples/fen-0153-stop.json";

/**
 * Records of the demo, each made from a worked example by changing what the case is about. The examples are
 * dated as at `writtenOn`; every day in them moves with the day of seeding.
 */
export const writtenOn = "2026-12-01";

export type DraftRecord = typeof notice;
type Change = (record: DraftRecord) => void;

const examples = {
  notice,
  "notice-due-on-the-day": noticeDueOnTheDay,
  "application-before-work": applicationBeforeWork,
  "clock-on-utc": clockOnUtc,
  "two-way": twoWay,
  stop,
} as unknown as Record<string, DraftRecord>;

const first = <T>(list: T[]): T => {
  const [item] = list;
  if (item === undefined) throw new Error("the example has lost its first item");
  return item;
};

/** Before the work: what is measured, set and handed over does not exist yet. */
const notYetDone: Change = (record) => {
  record.stage = "planned";
  Object.assign(record.dates, { sold: null, installed: null, commissioned: null });
  Object.assign(record.certificate, { kind: null, number: null, issuedOn: null });
  for (const circuit of record.circuits)
    circuit.measured = Object.fromEntries(
      Object.keys(circuit.measured).map((key) => [key, null]),
    ) as unknown as DraftRecord["circuits"][number]["measured"];
  for (const unit of record.chargepoints) {
    Object.assign(unit, { serial: null });
    Object.assign(unit.openPen, { functionTest: null });
    Object.assign(unit.smartCharging, { ownerChoice: null, overrideShown: null, defaultPasswordRemoved: null });
    Object.assign(unit.smartCharging.firstUsePrompt, { how: null, on: null, by: null });
    Object.assign(unit.smartCharging.statementOfCompliance, { givenOn: null, givenHow: null });
  }
};

const changes = {
  none: () => undefined,
  planned: notYetDone,
  /** Existing demand high enough that 32 A more passes the dwelling limit. */
  heavy: (record) => {
    record.demand.existingA = [37.6];
  },
  heavyPlanned: (record) => {
    notYetDone(record);
    record.demand.existingA = [38.2];
    record.supply.cutOutEvidence = "operator-statement";
  },
  looped: (record) => {
    notYetDone(record);
    record.supply.looped = "feeds-neighbour";
  },
  smallFuse: (record) => {
    notYetDone(record);
    record.supply.cutOutRatingA = 60;
    record.supply.cutOutEvidence = "operator-statement";
  },
  /** Halfway down the drive: no telephone, no readings yet, nobody has looked at the service head. */
  halfFinished: (record) => {
    Object.assign(record.customer, { phone: null });
    const { measured } = first(record.circuits);
    Object.assign(measured, { zsOhm: null, rcdTripMs: null, insulationMohm: null });
    record.supply.externalLoopImpedanceOhm = 0.19;
    record.demand.existingA = [21.6];
    first(record.circuits).cable.lengthM = 14;
    Object.assign(first(record.chargepoints).smartCharging, { firmware: null, historyMonths: null });
    Object.assign(record.certificate, { kind: null, number: null, issuedOn: null });
  },
  /** The walk has only begun: the intake is known, nothing behind it. */
  intakeOnly: (record) => {
    record.demand.existingA = null as unknown as number[];
    Object.assign(record.demand, { method: null, assessedOn: null });
    record.circuits = [];
    record.boards = [];
    record.chargepoints = [];
    Object.assign(record.certificate, { kind: null, number: null, issuedOn: null });
  },
  loopNotLookedAt: (record) => {
    Object.assign(record.supply, { looped: null, cutOutEvidence: null });
  },
  loadNotMeasured: (record) => {
    Object.assign(record.demand, { method: null, existingA: null });
  },
  twoWayNotice: (record) => {
    Object.assign(first(record.chargepoints).discharge, { designA: 32, registeredA: 16, exportLimitA: null });
  },
  twoWayPlanned: (record) => {
    notYetDone(record);
  },
  /** A workplace whose agreement with the operator is at hand. */
  withCapacity: (record) => {
    Object.assign(record.supply, { authorisedCapacityKva: 69 });
  },
  workplacePlanned: (record) => {
    notYetDone(record);
    Object.assign(record.supply, { authorisedCapacityKva: 69 });
  },
} as const satisfies Record<string, Change>;

export type Example =
  "notice" | "notice-due-on-the-day" | "application-before-work" | "clock-on-utc" | "two-way" | "stop";
export type ChangeName = keyof typeof changes;

/** A fresh copy of an example with a case's changes made. */
export function recordOf(example: Example, change: ChangeName): DraftRecord {
  const found = examples[example];
  if (!found) throw new Error(`there is no example ${example}`);
  const record = structuredClone(found);
  record.evidence = [];
  changes[change](record);
  return record;
}
