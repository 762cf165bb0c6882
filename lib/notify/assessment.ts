import type { Outcome, Reason } from "./result";

export type DemandRoute = "notify" | "apply" | "late-application" | "more-facts-needed" | "stop";
export type GenerationRoute = "none" | "g98" | "sgi-1" | "sgi-2" | "sgi-3" | "full-application" | "more-facts-needed";
export type ApprovalStanding = "none" | "held" | "after-install" | "exceeded" | "expired" | "other-equipment";

export type OperatorView = {
  /** Distributor id of two digits, `ni` in Northern Ireland, or `unknown`. */
  id: string;
  name: string;
  kind: "dno" | "idno" | "ni" | "unknown";
  /** Why the operator could not be told, or why it was overridden; null otherwise. */
  reason: string | null;
};

export type Deadline = {
  what: "demand-notice" | "completion-notice" | "generation-notice" | "building-control";
  /** Last day allowed, calendar days. */
  lastDay: string;
  /** Last working day of the division on or before the last day. */
  safeBy: string;
  basis: string;
};

export type Missing = { path: string; needed: string };

export type DemandResult = {
  /** One number a phase, amps, before the work; null where it cannot be told. */
  existingA: number[] | null;
  /** One number a phase, amps, after the work. */
  afterA: number[] | null;
  afterKva: number | null;
  limitCounted: boolean;
  /** What the demand would be were the load limit counted, amps a phase; null when there is no limit. */
  withLimitA: number[] | null;
  workings: string[];
};

export type CircuitResult = {
  id: string;
  iz: number | null;
  voltDropV: number | null;
  voltDropPercent: number | null;
  zsCalculatedOhm: number | null;
  zsLimitHotOhm: number | null;
  zsLimitColdOhm: number | null;
  zsLimitRcdOhm: number | null;
  workings: string[];
};

export type OpenPenResult = {
  chargepoint: string;
  outcome: Outcome;
  method: string | null;
  because: string;
  touchVoltageV: number | null;
  electrodeMaxOhm: number | null;
  imbalanceA: number | null;
  residualRisk: string | null;
  workings: string[];
  sources: string[];
};

export type SmartChargingResult = Reason & { chargepoint: string };

/** `sealwire.assessment/1`: what the rules say of one record on one day. Never stored over. */
export type Assessment = {
  format: "sealwire.assessment/1";
  asAt: string;
  ruleset: string;
  operator: OperatorView;
  route: {
    demand: DemandRoute;
    generation: GenerationRoute;
    approval: ApprovalStanding;
    reasons: Reason[];
  };
  deadlines: Deadline[];
  missing: Missing[];
  demand: DemandResult;
  circuits: CircuitResult[];
  openPen: OpenPenResult[];
  checks: Reason[];
  smartCharging: SmartChargingResult[];
  cautions: string[];
};
