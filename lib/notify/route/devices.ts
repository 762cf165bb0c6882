import type { Chargepoint, JobFacts } from "../job";
import { isNotKnown } from "../job/facts";
import type { Reason } from "../result";
import { rule } from "../rule";
import { finding, need, type Finding } from "./finding";

/** R9 to R12 and replacements: what is being connected, rather than to what. */
export const deviceStandards = rule({
  id: "route.device-standards",
  group: "route",
  title: "Declared to the standards for its current",
  reads: ["chargepoints[].standards", "chargepoints[].flickerCondition", "chargepoints[].ratedA"],
  sources: ["ena-lct-form section B"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const declarations = ["power-quality.harmonics", "power-quality.flicker"];
const deciding = [...declarations, "power-quality.flicker-condition"];

/**
 * Reads the answers of the power-quality family: a unit that fails any of them is asked about first, and so is one
 * whose condition could not be told; a declaration or condition that was not recorded holds the route; above the
 * reach of the standards the operator decides.
 */
export function standardsFinding(job: JobFacts, powerQuality: readonly Reason[]): Finding {
  const failed = powerQuality.find(({ outcome }) => outcome === "not-met");
  if (failed)
    return finding(
      deviceStandards.says("not-met", `${failed.because} The operator is asked first.`, {
        of: failed.of,
        used: failed.used,
      }),
      "apply",
    );
  const told = powerQuality.filter(({ rule: id, outcome }) => deciding.includes(id) && outcome !== "not-applicable");
  const unsure = told.find(({ outcome }) => outcome === "cannot-tell");
  if (unsure) return undeclared(job, unsure);
  return told.length
    ? finding(deviceStandards.says("met", told.map(({ because }) => because).join(" ")), "none")
    : finding(deviceStandards.says("not-applicable", "No chargepoint is recorded."), "none");
}

/** Whether somebody looked for the condition, or for what it compares, and could not tell. */
const isConditionUntold = ({ supply }: JobFacts, unit: Chargepoint): boolean =>
  unit.flickerCondition === "unknown" ||
  (unit.flickerCondition === "max-impedance" &&
    (isNotKnown(unit.maximumSystemImpedanceOhm) || isNotKnown(supply.lineNeutralImpedanceOhm)));

function undeclared(job: JobFacts, unsure: Reason): Finding {
  const { chargepoints } = job;
  const index = chargepoints.findIndex(({ id }) => id === unsure.of);
  const unit = chargepoints[index];
  const answer = deviceStandards.says("cannot-tell", unsure.because, { of: unsure.of, used: unsure.used });
  const isDeclaration = declarations.includes(unsure.rule);
  if (isDeclaration && unit?.standards && typeof unsure.used.ratedA === "number") return finding(answer, "apply");
  if (!isDeclaration && unit && isConditionUntold(job, unit)) return finding(answer, "apply");
  return finding(answer, "hold", [
    isDeclaration
      ? need(`chargepoints[${index}].standards`, "the standards the maker declares for disturbance of the supply")
      : need(
          `chargepoints[${index}].flickerCondition`,
          "the condition the maker sets on the supply, and what it compares",
        ),
  ]);
}

export const heatPumps = rule({
  id: "route.heat-pump",
  group: "route",
  title: "Heat pump added on the same visit",
  reads: ["demand.otherEquipment"],
  sources: ["nie-lct", "ena-lct-form"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export function heatPumpFinding({ demand }: JobFacts): Finding {
  const equipment = demand.otherEquipment ?? [];
  const isPump = ({ kind }: (typeof equipment)[number]) => kind === "heat-pump";
  const fresh = equipment.filter((each) => isPump(each) && each.inExistingDemand === "no");
  const unsure = equipment.findIndex((each) => isPump(each) && !["yes", "no"].includes(each.inExistingDemand ?? ""));
  if (unsure >= 0)
    return finding(
      heatPumps.says("cannot-tell", "Whether the heat pump is already in the recorded demand is not known."),
      "hold",
      [need(`demand.otherEquipment[${unsure}].inExistingDemand`, "whether the heat pump is in the recorded demand")],
    );
  if (fresh.length === 0)
    return finding(heatPumps.says("not-applicable", "No heat pump is added on this visit."), "none");
  return fresh.every(({ acceptance }) => acceptance)
    ? finding(
        heatPumps.says(
          "met",
          `The heat pump has an entry recorded: ${fresh.map(({ acceptance }) => acceptance).join(", ")}.`,
        ),
        "none",
      )
    : finding(
        heatPumps.says(
          "not-met",
          "The heat pump has no register entry recorded, so the operator is asked first, on one combined form.",
        ),
        "apply",
      );
}

export const schedule = rule({
  id: "route.schedule",
  group: "route",
  title: "Several chargepoints go as one schedule",
  reads: ["chargepoints[].id"],
  sources: ["ena-lct-form"],
  outcomes: ["met", "not-applicable"],
});

export function scheduleFinding({ chargepoints }: JobFacts): Finding {
  return chargepoints.length > 1
    ? finding(
        schedule.says(
          "met",
          `${chargepoints.length} chargepoints on one supply go to the operator as one schedule; each is assessed by itself.`,
          {
            used: { chargepoints: chargepoints.length },
          },
        ),
        "none",
      )
    : finding(schedule.says("not-applicable", "The job has one chargepoint."), "none");
}

export const replacement = rule({
  id: "route.replacement",
  group: "route",
  title: "Replacement, change or removal is told as well",
  reads: ["kind", "chargepoints[].replaces"],
  sources: ["our-practice", "g98-single-premises"],
  outcomes: ["met", "cannot-tell", "not-applicable"],
});

export function replacementFinding({ kind, chargepoints }: JobFacts): Finding {
  if (kind === "new") return finding(replacement.says("not-applicable", "The job is new work."), "none");
  if (kind === "removal")
    return finding(
      replacement.says("met", "The removal is told to the operator, so that its records stay right."),
      "none",
    );
  if (kind === "change-after-commissioning")
    return finding(
      replacement.says("met", "The change is judged as if it were new, and told to the operator."),
      "none",
    );
  const index = chargepoints.findIndex(({ replaces }) => replaces === null);
  return index >= 0
    ? finding(
        replacement.says("cannot-tell", "The job is a replacement, but what it replaces is not recorded."),
        "hold",
        [need(`chargepoints[${index}].replaces`, "make, model and serial of the unit taken out, and the day")],
      )
    : finding(
        replacement.says(
          "met",
          "A like-for-like replacement is told like new work; no source says that it need not be.",
        ),
        "none",
      );
}

export const programme = rule({
  id: "route.programme",
  group: "route",
  title: "Several sites planned close together",
  reads: [],
  sources: ["ena-guidance"],
  outcomes: ["not-applicable"],
});

/** A record is of one supply, so the rule can only remind. */
export const programmeFinding = (): Finding =>
  finding(
    programme.says(
      "not-applicable",
      "The record is of one supply. Where more are planned nearby, the operator is told well before, with the list and the days.",
    ),
    "none",
  );
