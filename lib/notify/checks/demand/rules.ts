import { rule } from "../rule";

export const evidenceRule = rule({
  id: "demand.evidence",
  group: "demand",
  title: "How the demand before the work is known",
  reads: [
    "demand.method",
    "demand.assessor",
    "demand.measurement",
    "demand.halfHourKwh",
    "demand.loads",
    "site.premises",
    "supply.phases",
    "supply.authorisedCapacityKva",
  ],
  sources: ["Own proposal", "IET On-Site Guide appendix A", "BS 7671 311.1"],
  gives: ["met", "cannot-tell"],
});

export const perPhaseRule = rule({
  id: "demand.per-phase",
  group: "demand",
  title: "Demand after the work, a figure for each phase",
  reads: [
    "supply.phases",
    "demand.existingA",
    "chargepoints[].ratedA",
    "chargepoints[].phases",
    "chargepoints[].phase",
  ],
  sources: ["BS 7671 311.1", "BS 7671 722.311"],
  gives: ["met", "cannot-tell"],
});

export const currentRule = rule({
  id: "demand.chargepoint-current",
  group: "demand",
  title: "Current counted for the chargepoint",
  reads: [
    "chargepoints[].ratedA",
    "chargepoints[].configuredA",
    "chargepoints[].configurationSecuredBy",
    "evidence[].subject",
  ],
  sources: ["BS 7671 722.311"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const limitRule = rule({
  id: "demand.load-limit",
  group: "demand",
  title: "Load limit counted in the demand",
  reads: ["demand.loadLimit.kind", "demand.loadLimit.limitA", "demand.loadLimit.operatorAgreement"],
  sources: ["BS 7671 722.311"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const otherEquipmentRule = rule({
  id: "demand.other-equipment",
  group: "demand",
  title: "Other large equipment and the demand before the work",
  reads: ["demand.otherEquipment"],
  sources: ["BS 7671 311.1"],
  gives: ["met", "cannot-tell", "not-applicable"],
});

export const replacedRule = rule({
  id: "demand.replaced-unit",
  group: "demand",
  title: "Replaced unit taken out of the demand",
  reads: ["chargepoints[].replaces", "demand.otherEquipment[].inExistingDemand"],
  sources: ["BS 7671 311.1"],
  gives: ["met", "cannot-tell", "not-applicable"],
});

/** In the order they are printed. */
export const demandRules = [evidenceRule, perPhaseRule, currentRule, limitRule, otherEquipmentRule, replacedRule];
