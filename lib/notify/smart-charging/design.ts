import { valueAt, type IsoDate, type Parameter } from "@/lib/calc/parameter";
import { knownNumber, type NotKnown } from "../job/facts";
import { accuracyPercent, delayCapabilityS, historyMonths, powerEveryS } from "../parameters/legislation";
import type { Reason } from "../result";
import { rule, type Rule } from "../rule";
import { detailOf, statementCovers, type UnitFacts } from "./unit-facts";

/**
 * Duties of design. They cannot be proved on site: a statement of compliance that stands and covers the regulation
 * makes them met (grade A); what the installer saw is shown as an observation (grade B); a contrary observation
 * outweighs the statement.
 */
const settingPath = (fact: string) => `chargepoints[].smartCharging.${fact}`;
const statementReads = [settingPath("statementOfCompliance"), "dates.sold"] as const;

const duty = <const I extends string>(id: I, title: string, reads: readonly string[], regulation: string) =>
  rule({
    id,
    group: "settings",
    title,
    reads: [...reads.map(settingPath), ...statementReads],
    sources: [`SI 2021/1467 reg ${regulation}`, "smart-chargepoint-notes"],
    outcomes: ["met", "not-met", "cannot-tell"],
  });

export const designRules = {
  "R5-1": duty("R5-1", "Sends and receives information", ["canSendAndReceive"], "5"),
  "R5-2": duty("R5-2", "Responds to signals by rate and by time", ["respondsToSignals"], "5"),
  "R5-3": duty("R5-3", "Gives the owner an interface of their own", ["ownerInterface", "ownerHoldsAccount"], "5"),
  "R6-1": duty("R6-1", "Keeps its functions when the supplier changes", ["survivesSupplierChange"], "6"),
  "R7-1": duty("R7-1", "Charges without a network", ["worksOffline"], "7"),
  "R8-1": duty("R8-1", "Refuses an input that would be a danger", ["blocksUnsafeInput"], "8"),
  "R9-1": duty("R9-1", "Records energy and times of each use", ["recordsSessions"], "9"),
  "R9-2": duty("R9-2", "Shows the owner twelve months of use", ["historyMonths"], "9"),
  "R9-3": duty("R9-3", "Measures power every second", ["powerResolutionS"], "9"),
  "R9-4": duty("R9-4", "Measures within 10 %", ["accuracyPercent"], "9"),
  "R10-3": duty("R10-3", "Owner can change or remove the hours later", ["ownerCanChangeLater"], "10"),
  "R11-1": duty("R11-1", "Capable of a random delay of 1,800 s", ["randomDelay.capabilityS"], "11"),
  "R11-3": duty("R11-3", "Delay adjustable from afar", ["randomDelay.remotelyAdjustable"], "11"),
  "R11-4": duty("R11-4", "Owner can override the delay", ["randomDelay.ownerOverride"], "11"),
  "R11-6": duty("R11-6", "Delays a change of rate as well as a start", ["randomDelay.onRateChange"], "11"),
} as const;

type DutyId = keyof typeof designRules;
type Duty = Rule<(typeof designRules)[DutyId]>;
type Seen = { verdict: "yes" | "no" | "open"; recorded: string | null; limit?: string };

const fromMemory: Partial<Record<DutyId, string>> = {
  "R8-1": "Which inputs are meant is from memory: verify.",
  "R10-3": "That the owner can also set hours when none are set is from memory: verify.",
};

const observed = (value: boolean | NotKnown | null): Seen => ({
  verdict: value === true ? "yes" : value === false ? "no" : "open",
  recorded: value === true ? "yes" : value === false ? "no" : null,
});

function measured(
  value: number | NotKnown | null,
  bound: Parameter<number>,
  on: IsoDate,
  sense: "at-least" | "at-most",
): Seen {
  const figure = knownNumber(value);
  const limit = valueAt(bound, on);
  const words = `${sense === "at-least" ? "≥" : "≤"} ${limit} ${bound.unit}`;
  if (figure === null) return { verdict: "open", recorded: null, limit: words };
  const within = sense === "at-least" ? figure >= limit : figure <= limit;
  return { verdict: within ? "yes" : "no", recorded: `${figure} ${bound.unit}`, limit: words };
}

function interfaceOf({ settings }: UnitFacts): Seen {
  const { ownerInterface, ownerHoldsAccount } = settings;
  if (ownerInterface === "none" || ownerHoldsAccount === false)
    return { verdict: "no", recorded: ownerInterface === "none" ? "no interface" : "the owner has no account" };
  return ownerInterface !== null && ownerHoldsAccount === true
    ? { verdict: "yes", recorded: ownerInterface }
    : { verdict: "open", recorded: ownerInterface };
}

const seenBy: Record<DutyId, (facts: UnitFacts) => Seen> = {
  "R5-1": ({ settings }) => observed(settings.canSendAndReceive),
  "R5-2": ({ settings }) => observed(settings.respondsToSignals),
  "R5-3": interfaceOf,
  "R6-1": ({ settings }) => observed(settings.survivesSupplierChange),
  "R7-1": ({ settings }) => observed(settings.worksOffline),
  "R8-1": ({ settings }) => observed(settings.blocksUnsafeInput),
  "R9-1": ({ settings }) => observed(settings.recordsSessions),
  "R9-2": ({ settings, on }) => measured(settings.historyMonths, historyMonths, on, "at-least"),
  "R9-3": ({ settings, on }) => measured(settings.powerResolutionS, powerEveryS, on, "at-most"),
  "R9-4": ({ settings, on }) => measured(settings.accuracyPercent, accuracyPercent, on, "at-most"),
  "R10-3": ({ settings }) => observed(settings.ownerCanChangeLater),
  "R11-1": ({ settings, on }) => measured(settings.randomDelay.capabilityS, delayCapabilityS, on, "at-least"),
  "R11-3": ({ settings }) => observed(settings.randomDelay.remotelyAdjustable),
  "R11-4": ({ settings }) => observed(settings.randomDelay.ownerOverride),
  "R11-6": ({ settings }) => observed(settings.randomDelay.onRateChange),
};

/** Judges one duty of design on one unit. */
export function designCheck(id: DutyId, facts: UnitFacts): Reason {
  const about: Duty = designRules[id];
  const { verdict, recorded, limit } = seenBy[id](facts);
  const regulation = /\d+/.exec(id)?.[0] as string;
  const covered = statementCovers(facts, regulation);
  const grade = covered ? "A" : verdict === "open" ? null : "B";
  const memory = fromMemory[id];
  const detail = detailOf(
    facts,
    verdict === "no" ? "B" : grade,
    { observed: recorded, statementCovers: covered },
    { recorded, limit: limit ?? null, workings: memory ? [memory] : [] },
  );
  const figure = recorded && limit ? `: ${recorded}, asked ${limit}` : "";
  if (verdict === "no") return about.says("not-met", `Recorded as not so on this unit${figure}.`, detail);
  if (covered)
    return about.says(
      "met",
      `The statement of compliance names the model, predates the sale and covers regulation ${regulation}.`,
      detail,
    );
  return verdict === "yes"
    ? about.says(
        "met",
        `Observed by the installer${figure}; no statement of compliance that stands covers regulation ${regulation}.`,
        detail,
      )
    : about.says("cannot-tell", `Neither observed nor covered by a statement of compliance that stands.`, detail);
}
