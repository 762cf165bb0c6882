import { rowAtOrAbove } from "@/lib/calc/circuit/capacity";
import { entryAt, type IsoDate } from "@/lib/calc/parameter";
import { tailCapacities, type Cores } from "@/lib/calc/parameters/cables";
import type { JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent } from "../facts";
import { cannotTell, mark, metIf, rule, type Answer } from "../rule";

export const tailsRule = rule({
  id: "supply.tails",
  group: "supply",
  title: "Meter tails carry the service fuse",
  reads: ["supply.tailsMm2", "supply.tailsReferenceMethod", "supply.cutOutRatingA", "supply.phases"],
  sources: ["BS 7671 Table 4D1A", "BS 7671 433.1"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** Tails by the two-cable column on one phase and the three-or-four-cable column on three. */
export function tailsAnswer({ supply }: JobFacts, on: IsoDate): Answer {
  const { tailsReferenceMethod: method, phases } = supply;
  const mm2 = knownNumber(supply.tailsMm2);
  const fuseA = knownNumber(supply.cutOutRatingA);
  const used = { tailsMm2: mm2, referenceMethod: method, cutOutRatingA: fuseA, phases };
  if (mm2 === null) return cannotTell(`The size of the tails ${absent(supply.tailsMm2)}.`, { used });
  if (method === null || method === "unknown")
    return cannotTell("How the tails are run is not told, so their current cannot be read from the table.", { used });
  if (phases === null) return cannotTell("The number of phases is not recorded.", { used });
  const cores: Cores = phases === 1 ? "two-core" : "three-core";
  const table = tailCapacities.get(`${method} ${cores}`);
  const entry = table && entryAt(table, on);
  const row = entry && rowAtOrAbove(entry.value, mm2);
  if (!entry || !row || row.row !== mm2)
    return cannotTell(`The table held here has no row for tails of ${mm2} mm².`, { used });
  const column = cores === "two-core" ? "two cables" : "three or four cables";
  const workings = [
    `Table 4D1A, ${mm2} mm², method ${method}, ${column}: ${row.figure} A${mark(entry)}`,
    ...(fuseA === null ? [] : [`${row.figure} A against the service fuse of ${fuseA} A`]),
  ];
  const rest = { used: { ...used, tailsA: row.figure }, recorded: `${mm2} mm², ${row.figure} A`, workings };
  if (fuseA === null)
    return cannotTell(
      `The tails carry ${row.figure} A; the rating of the service fuse ${absent(supply.cutOutRatingA)}.`,
      rest,
    );
  return metIf(
    row.figure >= fuseA,
    row.figure >= fuseA
      ? `Tails of ${mm2} mm² carry ${row.figure} A, not less than the service fuse of ${fuseA} A.`
      : `Tails of ${mm2} mm² carry ${row.figure} A, less than the service fuse of ${fuseA} A.`,
    { ...rest, limit: `≥ ${fuseA} A` },
  );
}
