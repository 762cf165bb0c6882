import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { expect, test } from "vitest";

/**
 * A rule holds no figure of its own: each is a dated, cited parameter. What may stand in the code is counting
 * (0, 1, 2, 3), decimals to print, percent and thousands, milliseconds of a day, and half an edge of the triangle.
 */
const allowed = new Set(["0", "1", "2", "3", "4", "9", "100", "1000", "86_400_000"]);
/** 70 and 90 are the names of the insulation's temperature in the record, not limits; "10" begins a method's name. */
const byFile: Record<string, string[]> = {
  "circuit/capacity.ts": ["70", "90"],
  "circuit/loop.ts": ["90"],
};

const folder = "lib/notify/checks";
const files = readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith(".ts"));

/** Code without comments, plain strings and the words of templates; what templates compute stays. */
const codeOf = (text: string) =>
  text
    .replace(/\/\*[\s\S]*?\*\//g, "")
    .replace(/\/\/.*$/gm, "")
    .replace(/"(?:[^"\\]|\\.)*"/g, '""')
    .replace(/`(?:[^`\\]|\\.)*`/g, (template) =>
      [...template.matchAll(/\$\{([^}]*)\}/g)].map(([, inner]) => inner).join(" ; "),
    );

test.each(files)("%s", (name) => {
  const code = codeOf(readFileSync(join(folder, name), "utf8"));
  const figures = [...code.matchAll(/(?<![\w.$])\d[\d_]*(?:\.\d+)?(?:e-?\d+)?\b/g)].map(([figure]) => figure);
  const others = figures.filter((figure) => !allowed.has(figure) && !byFile[name]?.includes(figure));
  expect(others, `put these into lib/calc/parameters`).toEqual([]);
});
