import type { Chargepoint, Circuit, Job } from "@/lib/notify/job";

/** A circuit as designed: everything that will be measured on the other site is left out. */
const circuitAsDesigned = ({ measured: _measured, ...circuit }: Circuit) => ({
  ...circuit,
  cable: { ...circuit.cable, lengthM: null },
});

/** A chargepoint of the same make and model: serial, tests and everything settled at handover are left out. */
function sameModel({ openPen, smartCharging, ...unit }: Chargepoint) {
  return {
    ...unit,
    serial: null,
    registerReference: null,
    configuredA: null,
    configurationSecuredBy: null,
    replaces: null,
    openPen: { method: openPen.method, device: openPen.device },
    smartCharging: {
      ...smartCharging,
      atHandover: null,
      ownerChoice: null,
      firstUsePrompt: undefined,
      demandSideResponse: undefined,
      ownerHoldsAccount: null,
      overrideShown: null,
      defaultPasswordRemoved: null,
      updateCheckDone: null,
      registerRow: null,
      randomDelay: { ...smartCharging.randomDelay, active: null },
      statementOfCompliance: { ...smartCharging.statementOfCompliance, givenOn: null, givenHow: null },
    },
  };
}

/**
 * What one job may lend to another at a different site: how the work is designed and which equipment is fitted.
 * Nothing seen, measured, agreed, dated or signed on the first site goes along.
 */
export function copyForAnotherSite(record: Job): Record<string, unknown> {
  return {
    format: record.format,
    stage: "planned",
    kind: record.kind,
    competentPerson: record.competentPerson,
    onBehalfOf: { name: record.onBehalfOf.name, isSeller: record.onBehalfOf.isSeller, reference: null },
    boards: record.boards,
    circuits: record.circuits.map(circuitAsDesigned),
    chargepoints: record.chargepoints.map(sameModel),
  };
}
