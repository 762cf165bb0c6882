import { entryAt, type IsoDate } from "@/lib/calc/parameter";
import { insulationMohmAtLeast, insulationTestV } from "@/lib/calc/parameters/protection";
import type { Circuit, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, isPlanned, unitsFedBy } from "../facts";
import { cannotTell, mark, met, metIf, notApplicable, notMet, notYet, rule, type Answer } from "../rule";

export const insulationRule = rule({
  id: "circuit.insulation",
  group: "circuit",
  title: "Insulation resistance",
  reads: ["circuits[].measured.insulationMohm", "circuits[].measured.insulationTestV"],
  sources: ["BS 7671 643.3"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const polarityRule = rule({
  id: "circuit.polarity",
  group: "circuit",
  title: "Polarity",
  reads: ["circuits[].measured.polarityCorrect"],
  sources: ["BS 7671 643.6"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const sequenceRule = rule({
  id: "circuit.phase-sequence",
  group: "circuit",
  title: "Phase sequence",
  reads: ["circuits[].measured.phaseSequenceCorrect", "chargepoints[].phases"],
  sources: ["BS 7671 643.9"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

/** The reading and the voltage it was taken at. */
export function insulationAnswer(job: JobFacts, circuit: Circuit, on: IsoDate): Answer {
  if (isPlanned(job)) return notYet("the insulation test");
  const { insulationMohm, insulationTestV: testV } = circuit.measured;
  const mohm = knownNumber(insulationMohm);
  const used = { insulationMohm: mohm, testV };
  if (mohm === null) return cannotTell(`The insulation reading ${absent(insulationMohm)}.`, { used });
  const least = entryAt(insulationMohmAtLeast, on);
  const volts = entryAt(insulationTestV, on);
  const rest = { used, recorded: `${mohm} MΩ`, limit: `≥ ${least.value} MΩ${mark(least)}` };
  if (mohm < least.value) return notMet(`${mohm} MΩ is below ${least.value} MΩ.`, rest);
  if (testV === null || !volts.value.includes(testV))
    return cannotTell(`${mohm} MΩ read; a test at ${volts.value.join(" or ")} V is not recorded.`, rest);
  return met(`${mohm} MΩ at ${testV} V is not below ${least.value} MΩ.`, rest);
}

/** As found; wrong polarity is a danger and is also read by the route. */
export function polarityAnswer(job: JobFacts, circuit: Circuit): Answer {
  if (isPlanned(job)) return notYet("the polarity test");
  const { polarityCorrect } = circuit.measured;
  const used = { polarityCorrect };
  if (polarityCorrect === true || polarityCorrect === false)
    return metIf(polarityCorrect, polarityCorrect ? "Polarity was found right." : "Polarity was found wrong.", {
      used,
    });
  return cannotTell(`Polarity ${absent(polarityCorrect)}.`, { used });
}

/** As found, on circuits that serve three-phase units. */
export function sequenceAnswer(job: JobFacts, circuit: Circuit): Answer {
  if (isPlanned(job)) return notYet("the phase sequence test");
  const phases = unitsFedBy(job, circuit).map((unit) => unit.phases);
  const { phaseSequenceCorrect } = circuit.measured;
  const used = { phaseSequenceCorrect };
  if (phaseSequenceCorrect === true || phaseSequenceCorrect === false)
    return metIf(
      phaseSequenceCorrect,
      phaseSequenceCorrect ? "The phase sequence was found right." : "The phase sequence was found wrong.",
      { used },
    );
  if (phases.length > 0 && phases.every((count) => count === 1))
    return notApplicable("The circuit serves single-phase units only.", { used });
  return cannotTell(`The phase sequence ${absent(phaseSequenceCorrect)}.`, { used });
}
