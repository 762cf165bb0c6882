import { describe, expect, it } from "vitest";
import { assess } from "@/lib/notify/assess";
import { parseJob } from "@/lib/notify/job";
import { rulesList } from "@/lib/notify/rules-list";
import { casesIn, getAt, recordWith, setAt, type Changes } from "./record";

/**
 * Take any fact out of a record that notifies, and it must not notify any more, unless the rule table
 * says that the fact is unused, or the list below says why its absence is the stricter reading.
 */
const stricterWithout: Record<string, string> = {
  "chargepoints[].configuredA": "without a setting the rating is counted, which is never less",
  "chargepoints[].configurationSecuredBy": "without it the rating is counted",
  "chargepoints[].model": "compared only where an approval names a model",
  "chargepoints[].flickerCondition": "asked above 16 A a phase only, and there it holds the route",
  "chargepoints[].replaces.": "only widens what is told; without it nothing is subtracted",
  "demand.loadLimit": "without a limit, or its agreement, the whole demand is counted",
  "demand.existingA": "only where another method was recorded; the figure then prints beside it",
  "demand.otherEquipment[].":
    "the whole list is required; an item without its current or kind holds the route elsewhere",
  "demand.otherEquipment[].acceptance": "wanted only of generation and of heat pumps",
  "supply.cutOutSeenUnder": "wanted only when the fuse was seen, and then it holds the route",
  "supply.authorisedCapacityKva": "wanted outside dwellings only, and there it holds the route",
  "demand.halfHourKwh": "wanted by its own method only",
  "demand.loads": "wanted by its own method only",
  "demand.measurement": "wanted by its own method only, and there it holds the route",
  "chargepoints[].phase": "wanted on a polyphase supply only, and there it holds the route",
  "chargepoints[].openPen": "read by the route at caravans and on the highway only",
  operatorRecords: "without an approval the route is the same or stricter",
  "site.operatorOverride": "without an override the supply number decides",
  kind: "without it the work counts as new",
  evidence: "a photo only ever lowers what is counted; without it the rating counts and a discharge setting holds",
  "dates.": "the day of installing is required; the others move days, not routes",
  "chargepoints[].discharge.designA": "wanted of generation only, and there it holds the route",
  "chargepoints[].discharge.registeredA": "wanted of generation only, and there it holds the route",
  "chargepoints[].discharge.exportLimitA": "wanted of some paths only",
  "chargepoints[].discharge.typeTestReference": "wanted of generation only, and there it holds the route",
  "chargepoints[].id": "renamed or dropped, the record is refused or keeps its only unit",
  "supply.lineNeutralImpedanceOhm": "read by power quality where the maker asks for an impedance",
};

const generic = (path: string) => path.replace(/\[\d+\]/g, "[]");
const covers = (reads: string, path: string) =>
  path === reads || path.startsWith(`${reads}.`) || path.startsWith(`${reads}[`);

const routeReads = rulesList
  .filter(({ id, group }) => (group === "route" && id.startsWith("route.")) || group === "generation")
  .flatMap(({ reads }) => reads);

/** Every path of a record: leaves and what holds them. */
function pathsOf(value: unknown, path = ""): string[] {
  if (value === null || typeof value !== "object") return [path];
  const inside = Object.entries(value).flatMap(([key, item]) =>
    pathsOf(item, Array.isArray(value) ? `${path}[${key}]` : path ? `${path}.${key}` : key),
  );
  return path ? [path, ...inside] : inside;
}

function routeWithout(changes: Changes, path: string): string {
  const record = recordWith(changes);
  setAt(record, path, null);
  const parsed = parseJob(record);
  return parsed.ok ? assess(parsed.value, "2026-12-01").route.demand : "refused";
}

const v2g = { kind: "parallel", designA: 16, registeredA: 16, exportLimitA: null, typeTestReference: "TT-1" };
/** Cases that differ from the ordinary home only in days or figures. */
const sameFacts = ["1", "13", "14", "16", "52"];

const records: [string, Changes][] = [
  ["the ordinary home", {}],
  [
    "a home on another method",
    {
      "demand.method": "diversity",
      "demand.existingA": null,
      "demand.loads": [{ kind: "fixed", ratedA: 8, quantity: 1 }],
    },
  ],
  ["a two-way unit under G98", { "chargepoints[0].discharge": v2g }],
  ...casesIn("network/check-cases.json")
    .filter(({ n, expect: expected }) => expected["route.demand"] === "notify" && !sameFacts.includes(n))
    .map(({ n, changes }): [string, Changes] => [`case ${n}`, changes]),
];

/** What no notice may be without, whatever the record. */
const always = [
  "site.supplyNumber",
  "site.supplyNumberKind",
  "site.territory",
  "site.premises",
  "supply.connection",
  "supply.ownedBy",
  "supply.metered",
  "supply.phases",
  "supply.cutOutRatingA",
  "supply.cutOutEvidence",
  "supply.looped",
  "supply.serviceConditions",
  "supply.earthing",
  "supply.externalLoopImpedanceOhm",
  "demand.method",
  "demand.assessor",
  "demand.otherEquipment",
  "circuits[0].measured.polarityCorrect",
  "chargepoints",
  "chargepoints[0].ratedA",
  "chargepoints[0].phases",
  "chargepoints[0].standards",
  "chargepoints[0].discharge",
  "chargepoints[0].discharge.kind",
];

describe("a fact taken out of a record that notifies", () => {
  for (const [name, changes] of records)
    it(`${name}: leaves no notice standing`, () => {
      const record = recordWith(changes);
      expect(routeWithout(changes, "notes")).toBe("notify");
      const standing = pathsOf(record).filter(
        (path) => getAt(record, path) !== null && routeWithout(changes, path) === "notify",
      );
      const unexplained = standing.filter(
        (path) =>
          routeReads.some((reads) => covers(reads, generic(path))) &&
          !Object.keys(stricterWithout).some((reads) => generic(path).startsWith(reads)),
      );
      expect(unexplained).toEqual([]);
      expect(always.filter((path) => standing.includes(path))).toEqual([]);
    });
});
