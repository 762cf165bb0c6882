import type { OperatorView } from "../assessment";
import type { JobFacts } from "../job";
import { ownEntryWords, type OwnOperator } from "../firm-rules";
import { operatorEntry } from "../operator-register";
import type { FactLog } from "../result";
import { rule } from "../rule";
import { parseSupplyNumber } from "../supply-number";
import { finding, need, type Finding } from "./finding";

export const supplyNumberRead = rule({
  id: "route.supply-number",
  group: "route",
  title: "Supply number names the operator",
  reads: ["site.supplyNumber", "site.supplyNumberKind", "site.territory", "site.operatorOverride"],
  sources: ["supply-number-structure", "nie-lct"],
  outcomes: ["met", "cannot-tell"],
});

const path = "site.supplyNumber";
const generating = ["solar", "battery", "generator"];

/** Whether the number can be read, is that of the import, and belongs where the site is. */
export function supplyNumberFinding(job: JobFacts, operator: OperatorView, ownEntry: OwnOperator | null): Finding {
  const { supplyNumber, territory } = job.site;
  const hold = (because: string, at: string, needed: string) =>
    finding(supplyNumberRead.says("cannot-tell", because, { used: { supplyNumber, operator: operator.id } }), "hold", [
      need(at, needed),
    ]);
  if (territory === null)
    return hold(
      "The territory of the site is not recorded.",
      "site.territory",
      "England, Wales, Scotland or Northern Ireland",
    );
  if (supplyNumber === null)
    return isOverridden(job)
      ? accepted(job, operator, ownEntry, null)
      : hold("The supply number is not recorded.", path, "the supply number from the bill");
  const reading = parseSupplyNumber(supplyNumber, territory);
  if (!reading.ok) return hold(reading.message, path, "a supply number that can be read");
  return (
    kindOf(job, hold) ??
    placeOf(job, reading.operatorId, ownEntry, hold) ??
    accepted(job, operator, ownEntry, reading.printed)
  );
}

type Hold = (because: string, at: string, needed: string) => Finding;

function kindOf({ site, demand, chargepoints }: JobFacts, hold: Hold): Finding | null {
  const at = "site.supplyNumberKind";
  if (site.supplyNumberKind === "export")
    return hold(
      "This is the number of an export. A chargepoint is notified under the import number of the same supply.",
      path,
      "the import supply number",
    );
  if (site.supplyNumberKind === null)
    return hold(
      "Whether the number is of the import or of an export is not recorded.",
      at,
      "whether the number is of the import",
    );
  const exports =
    (demand.otherEquipment ?? []).some(({ kind }) => generating.includes(kind)) ||
    chargepoints.some(({ discharge }) => discharge.kind === "parallel" || discharge.kind === "both");
  return site.supplyNumberKind === "unknown" && exports
    ? hold(
        "A site that can export may have two numbers, and which one this is could not be told.",
        at,
        "whether the number is of the import",
      )
    : null;
}

/** Scottish distributors work in Scotland and the others outside it: a mismatch is a misread number until explained. */
function placeOf(job: JobFacts, operatorId: string, ownEntry: OwnOperator | null, hold: Hold): Finding | null {
  const { site } = job;
  const entry = operatorEntry(operatorId) ?? ownEntry;
  if (!entry?.division || isOverridden(job)) return null;
  const isScottish = entry.division === "scotland";
  const area =
    "area" in entry ? entry.area : `${entry.name}, ${isScottish ? "in" : "outside"} Scotland by the firm’s own entry`;
  return isScottish === (site.territory === "scotland")
    ? null
    : hold(
        `Distributor ${operatorId} is ${area}, but the site is recorded in ${site.territory}. Read the number again, or set the operator by hand with the reason.`,
        path,
        "the supply number, compared with the bill",
      );
}

const isOverridden = ({ site }: JobFacts) => Boolean(site.operatorOverride.id && site.operatorOverride.reason);

function accepted(
  job: JobFacts,
  operator: OperatorView,
  ownEntry: OwnOperator | null,
  printed: string | null,
): Finding {
  const mine: FactLog = ownEntry ? { inRegister: false, firmEntryFrom: ownEntry.from } : {};
  const detail = { used: { operator: operator.id, ...mine }, recorded: printed };
  if (operator.kind === "unknown")
    return finding(supplyNumberRead.says("met", `The number can be read. ${operator.reason}`, detail), "none");
  const because = isOverridden(job)
    ? `${operator.name}, set by hand: ${job.site.operatorOverride.reason}.`
    : `The first two digits name ${operator.name}.`;
  const own = ownEntry ? ` ${ownEntryWords(ownEntry)}` : "";
  return finding(supplyNumberRead.says("met", `${because}${own}`, detail), "none");
}
