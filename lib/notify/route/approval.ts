import type { ApprovalStanding, Missing } from "../assessment";
import type { Chargepoint, JobFacts } from "../job";
import { knownNumber } from "../job/facts";
import type { Reason } from "../result";
import { rule } from "../rule";
import { countedA } from "../checks/demand/counted-current";
import { need } from "./finding";

type OperatorRecord = JobFacts["operatorRecords"][number];
type ApplicationPurpose = "application" | "generation-application";

export type Approval = { standing: ApprovalStanding; reason: Reason; missing: Missing[] };

const titles = { application: "Approval of the application", "generation-application": "Approval of the generation" };

const declared = <const I extends string>(id: I, purpose: ApplicationPurpose) =>
  rule({
    id,
    group: purpose === "application" ? "route" : "generation",
    title: titles[purpose],
    reads: [
      "operatorRecords",
      "dates.installed",
      "dates.planned",
      "chargepoints[].model",
      "chargepoints[].configuredA",
    ],
    sources: ["ena-guidance", "our-practice"],
    outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
  });

export const demandApproval = declared("route.approval", "application");
export const generationApproval = declared("generation.approval", "generation-application");

type Verdict = { standing: ApprovalStanding; outcome: Reason["outcome"]; because: string; missing?: Missing[] };

/**
 * Compares what the operator approved with what was fitted, field by field: its day, its limit, its model and
 * its last day. Only a decision with its day counts; a reference, a telephone call or silence is no approval.
 */
export function approvalOf(job: JobFacts, purpose: ApplicationPurpose): Approval {
  const about = purpose === "application" ? demandApproval : generationApproval;
  const indexed = job.operatorRecords.map((record, index) => ({ record, index }));
  const decided = indexed
    .filter(({ record }) => record.purpose === purpose && record.decision !== null)
    .sort((a, b) => (a.record.decidedOn ?? "").localeCompare(b.record.decidedOn ?? ""))
    .at(-1);
  const verdict = decided ? compare(job, decided.record, decided.index) : unanswered(job, purpose);
  return {
    standing: verdict.standing,
    missing: verdict.missing ?? [],
    reason: about.says(verdict.outcome, verdict.because, {
      used: decided ? used(decided.record, job) : { decision: null },
      recorded: decided?.record.reference ?? null,
    }),
  };
}

const used = (record: OperatorRecord, job: JobFacts) => ({
  decision: record.decision,
  decidedOn: record.decidedOn,
  expires: record.expires,
  limitA: record.limitA,
  model: record.model,
  installed: job.dates.installed,
});

function unanswered(job: JobFacts, purpose: ApplicationPurpose): Verdict {
  const sent = job.operatorRecords.find((record) => record.purpose === purpose);
  return {
    standing: "none",
    outcome: "not-applicable",
    because: sent
      ? "An application is recorded without a decision. No answer is not an approval."
      : "No application is recorded.",
  };
}

function compare(job: JobFacts, record: OperatorRecord, index: number): Verdict {
  if (record.decision === "refused")
    return { standing: "none", outcome: "not-met", because: "The operator refused the application as it stood." };
  if (record.decidedOn === null)
    return {
      standing: "none",
      outcome: "cannot-tell",
      because: "A decision is recorded without its day, so it cannot be compared with the work.",
      missing: [need(`operatorRecords[${index}].decidedOn`, "the day of the operator’s decision")],
    };
  return limitOf(job, record, index) ?? dayOf(job, record) ?? modelOf(job, record) ?? held(job, record);
}

function limitOf(job: JobFacts, record: OperatorRecord, index: number): Verdict | null {
  const limitA = knownNumber(record.limitA);
  if (limitA === null)
    return record.decision === "approved-with-limit"
      ? {
          standing: "none",
          outcome: "cannot-tell",
          because: "An approval with a limit is recorded without the limit.",
          missing: [need(`operatorRecords[${index}].limitA`, "the limit the operator approved, in amperes")],
        }
      : null;
  const over = job.chargepoints.find((unit) => (setCurrentA(unit) ?? 0) > limitA);
  if (!over) return null;
  return {
    standing: "exceeded",
    outcome: "not-met",
    because: `Chargepoint ${over.id} is set to ${setCurrentA(over)} A, above the ${limitA} A the operator approved.`,
  };
}

/** What the unit is set to, A: its setting, else its rating. */
const setCurrentA = (unit: Chargepoint) => knownNumber(unit.configuredA) ?? knownNumber(unit.ratedA);

function dayOf({ dates }: JobFacts, { decidedOn, expires }: OperatorRecord): Verdict | null {
  if (dates.installed && decidedOn && decidedOn > dates.installed)
    return {
      standing: "after-install",
      outcome: "not-met",
      because: `The approval is of ${decidedOn}, after the installing on ${dates.installed}.`,
    };
  const done = dates.installed ?? dates.planned;
  if (expires && done && done > expires)
    return {
      standing: "expired",
      outcome: "not-met",
      because: `The approval ran out on ${expires}, before ${dates.installed ? "the installing" : "the planned day"} ${done}.`,
    };
  return null;
}

const plainName = (name: string) => name.toLowerCase().replace(/[^a-z0-9]/g, "");

function modelOf({ chargepoints }: JobFacts, { model }: OperatorRecord): Verdict | null {
  if (model === null) return null;
  const approved = plainName(model);
  const other = chargepoints.find(
    (unit) =>
      unit.model !== null && ![plainName(unit.model), plainName(`${unit.make ?? ""}${unit.model}`)].includes(approved),
  );
  return other
    ? {
        standing: "other-equipment",
        outcome: "not-met",
        because: `The approval is for ${model}; chargepoint ${other.id} is ${other.model}.`,
      }
    : null;
}

function held(job: JobFacts, record: OperatorRecord): Verdict {
  const limitA = knownNumber(record.limitA);
  const loose = limitA === null ? -1 : job.chargepoints.findIndex((unit) => isOnlySetting(unit, limitA, job));
  const words = `Approved on ${record.decidedOn}${record.reference ? `, reference ${record.reference}` : ""}`;
  if (loose >= 0)
    return {
      standing: "held",
      outcome: "cannot-tell",
      because: `${words}, with a limit of ${limitA} A; the setting that keeps to it is not secured and photographed.`,
      missing: [need(`chargepoints[${loose}].configurationSecuredBy`, "how the setting is secured, with its photo")],
    };
  const unnamed = record.model !== null && job.chargepoints.some(({ model }) => model === null);
  return unnamed
    ? {
        standing: "held",
        outcome: "cannot-tell",
        because: `${words}, for ${record.model}; the model fitted is not recorded.`,
      }
    : { standing: "held", outcome: "met", because: `${words}; nothing recorded departs from it.` };
}

/** Whether only an unsecured setting keeps the unit within the limit. */
const isOnlySetting = (unit: Chargepoint, limitA: number, job: JobFacts) => (countedA(job, unit) ?? 0) > limitA;
