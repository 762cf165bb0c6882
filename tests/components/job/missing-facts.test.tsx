import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { placeOf } from "@/components/job/questions/screens";
import { assess } from "@/lib/notify/assess";
import { parseJob } from "@/lib/notify/job";

const folder = "db/seed/examples";
const records = readdirSync(folder)
  .filter((name) => /fen-(0125|0147|0151)/.test(name))
  .map((name) => JSON.parse(readFileSync(`${folder}/${name}`, "utf8")) as Record<string, unknown>);

type Node = Record<string, unknown>;

/** The record with each of its facts taken out in turn, and bare ones with almost none. */
function* lacking(record: Node): Generator<Node> {
  yield {
    format: "sealwire.job/1",
    jobNumber: "FEN-0001",
    stage: "installed",
    dates: { installed: "2026-11-20" },
    circuits: [{ id: "main" }],
    chargepoints: [{ id: "cp1", circuit: "main" }],
  };
  yield { format: "sealwire.job/1", jobNumber: "FEN-0001", stage: "planned", chargepoints: [{ id: "cp1" }] };
  const paths: (string | number)[][] = [];
  const visit = (node: unknown, path: (string | number)[]) => {
    if (node !== null && typeof node === "object")
      for (const [key, value] of Object.entries(node)) visit(value, [...path, Array.isArray(node) ? Number(key) : key]);
    else paths.push(path);
  };
  visit(record, []);
  for (const path of paths) {
    const copy = structuredClone(record);
    let at: Node = copy;
    for (const step of path.slice(0, -1)) at = at[step as string] as Node;
    at[path.at(-1) as string] = null;
    yield copy;
  }
}

/** The firm's own facts are kept with the firm; an operator's answer is asked only when a rule wants it, by its link. */
const elsewhere = /^(firm\..*|operatorRecords)$/;

describe("what the rules find missing", () => {
  it("is asked on a screen of the walk, whichever fact of the worked examples is taken out", () => {
    const unasked = new Set<string>();
    let seen = 0;
    for (const record of records)
      for (const lack of lacking(record)) {
        const facts = parseJob(lack);
        if (!facts.ok) continue;
        for (const { path } of assess(facts.value, "2026-12-01").missing) {
          seen += 1;
          if (elsewhere.test(path)) continue;
          const place = placeOf(path, facts.value);
          if (!place) unasked.add(`${path}: nowhere`);
          else if (place.screen?.more) unasked.add(`${path}: only by a link, ${place.screen.title}`);
          else if (!place.screen && place.subject !== "photos") unasked.add(`${path}: no field`);
        }
      }
    expect(seen).toBeGreaterThan(50);
    expect([...unasked].sort()).toEqual([]);
  }, 60_000);
});
