import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { entryAt, NoValueInForce, type Parameter } from "@/lib/calc/parameter";
import { sourceOf, sources } from "@/lib/calc/sources";
import * as legislation from "@/lib/notify/parameters/legislation";
import * as network from "@/lib/notify/parameters/network";
import * as practice from "@/lib/notify/parameters/practice";

const parameters = [network, legislation, practice].flatMap((file) => Object.values(file)) as Parameter<unknown>[];

describe("figures of the operators’ rules and of the law", () => {
  it("each have an id of their own, a unit, a meaning, and dated values without gap or overlap", () => {
    const ids = parameters.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const { id, unit, meaning, values } of parameters) {
      expect(unit && meaning, id).toBeTruthy();
      for (const [index, entry] of values.entries()) {
        expect(() => sourceOf(entry.source), `${id}: ${entry.source}`).not.toThrow();
        expect(["seen", "derived", "from memory: verify"]).toContain(entry.certainty);
        if (index) expect(values[index - 1]?.to !== undefined && values[index - 1]!.to! < entry.from, id).toBe(true);
      }
      expect(values.at(-1)?.to, `${id} still holds`).toBeUndefined();
    }
  });

  it("are an error on a day that none covers", () => {
    expect(() => entryAt(network.noticeDays, "2019-12-31")).toThrow(NoValueInForce);
  });

  // A figure that only memory vouches for alone never gives met in route and generation rules.
  it("rest a notice on nothing remembered", () => {
    const remembered = parameters.filter(({ values }) =>
      values.some(({ certainty }) => certainty === "from memory: verify"),
    );
    expect(remembered.map(({ id }) => id)).toEqual(["network.generation-notice-days", "network.lost-earth"]);
  });

  it("stand in parameters, not in rules: no rule compares with a bare figure", () => {
    const folder = new URL("../../lib/notify/", import.meta.url);
    const files = ["route", "smart-charging"].flatMap((each) =>
      readdirSync(new URL(`${each}/`, folder)).map((name) => `${each}/${name}`),
    );
    const bare = files.flatMap((name) =>
      [...readFileSync(new URL(name, folder), "utf8").matchAll(/[<>]=? ?(\d+(?:\.\d+)?)\b/g)]
        .filter(([, figure]) => !["0", "1", "2", "3"].includes(figure as string))
        .map(([text]) => `${name}: ${text}`),
    );
    expect(bare).toEqual([]);
  });
});

describe("the register of sources", () => {
  it("has each id once, and says what was seen of it and when", () => {
    const ids = sources.map(({ id }) => id);
    expect(ids.filter((id, index) => ids.indexOf(id) !== index)).toEqual([]);
    for (const { id, title, publisher, seen, seenOn } of sources) {
      expect(title && publisher, id).toBeTruthy();
      expect(seen === "not seen", id).toBe(seenOn === null);
    }
  });

  it("refuses a source it does not hold", () => {
    expect(() => sourceOf("a note on a wall")).toThrow(/No source/);
  });
});
