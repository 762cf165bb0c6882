import { describe, expect, it } from "vitest";
import { assessWith, casesIn, found } from "./record";

describe("check cases of the operators’ rules", () => {
  for (const { n, situation, source, changes, expect: expected } of casesIn("network/check-cases.json"))
    it(`${n}: ${situation} [${source}]`, () => {
      const assessment = assessWith(changes);
      for (const [path, value] of Object.entries(expected)) expect.soft(found(assessment, path), path).toEqual(value);
    });
});
