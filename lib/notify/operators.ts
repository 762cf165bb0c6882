import type { IsoDate } from "@/lib/calc/parameter";
import type { OperatorView } from "./assessment";
import type { Division } from "./bank-holidays";
import { longDate } from "./calendar";
import type { Job } from "./job";
import { ownEntryWords, type OwnOperator } from "./firm-rules";
import { operatorEntry, type OperatorEntry, type OperatorTrait } from "./operator-register";
import { ruleDay } from "./rule-day";
import { parseSupplyNumber } from "./supply-number";

const nameOn = (entry: OperatorEntry, on: IsoDate): string =>
  (entry.names.find((name) => name.from <= on && (name.to === undefined || on <= name.to)) ?? entry.names[0]).value;

const unknown = (reason: string): OperatorView => ({
  id: "unknown",
  name: "Operator not known",
  kind: "unknown",
  reason,
});

function known(id: string, on: IsoDate, reason: string | null, own: readonly OwnOperator[]): OperatorView {
  const entry = operatorEntry(id);
  if (entry) return { id, name: nameOn(entry, on), kind: entry.kind, reason };
  const mine = own.find((each) => each.id === id);
  if (!mine) return unknown(`Distributor ${id} is not in the register, so the general rules are applied.`);
  if (mine.from > on)
    return unknown(
      `Distributor ${id} is not in the register, and the firm’s own entry holds from ${longDate(mine.from)} only.`,
    );
  return { id, name: mine.name, kind: mine.kind, reason: [reason, ownEntryWords(mine)].filter(Boolean).join(" ") };
}

/** The firm's own entry that names an operator; null when the register names it, or nothing does. */
export const ownEntryOf = (operatorId: string, own: readonly OwnOperator[] = []): OwnOperator | null =>
  operatorEntry(operatorId) ? null : (own.find(({ id }) => id === operatorId) ?? null);

/**
 * The operator a job's papers go to: the override when one is given with its reason, else the supply number,
 * else Northern Ireland by its territory. Unknown, with the reason in words, when none of these tells. `own` holds
 * the firm's entries for ids that the register lacks; an id in the register is never taken from them.
 */
export function operatorOf(job: Pick<Job, "site" | "dates">, own: readonly OwnOperator[] = []): OperatorView {
  const { operatorOverride, supplyNumber, territory } = job.site;
  const on = ruleDay(job.dates);
  if (operatorOverride.id && operatorOverride.reason)
    return known(operatorOverride.id, on, `Set by hand: ${operatorOverride.reason}`, own);
  if (territory === "northern-ireland") return known("ni", on, null, own);
  if (supplyNumber === null) return unknown("No supply number is recorded; its first two digits name the operator.");
  const reading = parseSupplyNumber(supplyNumber, territory);
  return reading.ok ? known(reading.operatorId, on, null, own) : unknown(reading.message);
}

/** Whether an operator keeps a practice of its own. False for an operator the register does not know. */
export const hasTrait = (operatorId: string, trait: OperatorTrait): boolean =>
  operatorEntry(operatorId)?.traits.includes(trait) ?? false;

const divisionOfTerritory: Record<NonNullable<Job["site"]["territory"]>, Division> = {
  england: "england-and-wales",
  wales: "england-and-wales",
  scotland: "scotland",
  "northern-ireland": "northern-ireland",
};

/**
 * Whose bank holidays count for an operator: its own division, by the register or by the firm's entry, else that of
 * the site. England and Wales when
 * neither is known; the paper then cannot be sealed without gaps, so no safe-by day leaves on that footing.
 */
export function divisionOf(
  operatorId: string,
  territory: Job["site"]["territory"] = null,
  own: readonly OwnOperator[] = [],
): Division {
  const division = (operatorEntry(operatorId) ?? ownEntryOf(operatorId, own))?.division;
  return division ?? (territory ? divisionOfTerritory[territory] : "england-and-wales");
}

export type Mailboxes = { notice: string; application: string; safety: string };

const domains: Record<string, string> = {
  "UK Power Networks": "ukpn",
  "National Grid Electricity Distribution": "nged",
  "SP Energy Networks": "spen",
  "Northern Powergrid": "npg",
  "Electricity North West": "enw",
  SSEN: "ssen",
  "NIE Networks": "nie",
};

/**
 * Addresses shown until the firm enters the operator's own: all at example.com, so that nothing leaves by accident.
 * Where the operator keeps one mailbox for notices and another for applications the two differ. Null when unknown.
 */
export function mailboxesOf(operatorId: string): Mailboxes | null {
  const entry = operatorEntry(operatorId);
  if (!entry) return null;
  const host = `${domains[entry.group] ?? `operator-${entry.id}`}.example.com`;
  const notice = entry.traits.includes("two-addresses") ? `notices@${host}` : `connections@${host}`;
  const application = entry.traits.includes("two-addresses") ? `applications@${host}` : `connections@${host}`;
  return { notice, application, safety: `safety@${host}` };
}
