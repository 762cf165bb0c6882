import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { submissionPurposes, submissionStates } from "@/lib/notify/submission";
import { headline } from "@/lib/notify/headline";
import { photosNeeded } from "@/lib/notify/photos-needed";
import { assess } from "@/lib/notify/assess";
import { casesIn, jobWith } from "./record";

const root = new URL("../../", import.meta.url).pathname;

/** Claims the product never makes : of a place, a job or a unit, or that a device limits a voltage. */
const claims = [/\b(is|are) safe\b/i, /\bcompliant\b/i, /\blimits?\b[^.]{0,60}\bto 70 ?V/i];

/** Acts that can kill . Each may stand only where the same sentence forbids it. */
const acts =
  /\b(draw|pull|withdraw|remove|lift|open|break|unseal|unscrew)\w*\b[^.;:"'`]{0,40}\b(fuses?|covers?|seals?|lids?|cut-out|carrier)\b/i;
const forbidden = /\b(never|not|no|nothing|without|nobody|closed|un\w+ed)\b/i;

function* sourceFiles(folder: string): Generator<string> {
  for (const entry of readdirSync(join(root, folder), { withFileTypes: true })) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* sourceFiles(path);
    else if (/\.tsx?$/.test(entry.name)) yield path;
  }
}

/** Words as they stand in the sources, comments taken out: the strings and the text of pages. */
const wordsOf = (path: string) =>
  readFileSync(join(root, path), "utf8")
    .replace(/\/\*[\s\S]*?\*\//g, "")
    .replace(/^\s*\/\/.*$/gm, "");

const sentencesOf = (text: string) => text.split(/(?<=[.!?])\s|\n/);

describe("the words of the product", () => {
  const files = ["lib", "templates", "components", "app"].flatMap((folder) => [...sourceFiles(folder)]);

  it("claim nothing that a program cannot know", () => {
    const found = files.flatMap((path) =>
      sentencesOf(wordsOf(path))
        .filter((sentence) => claims.some((claim) => claim.test(sentence)))
        .map((sentence) => `${path}: ${sentence.trim()}`),
    );
    expect(found).toEqual([]);
  });

  it("never lead anyone to draw a fuse, lift a lid or break a seal", () => {
    const found = files.flatMap((path) =>
      sentencesOf(wordsOf(path))
        .filter((sentence) => acts.test(sentence) && !forbidden.test(sentence))
        .map((sentence) => `${path}: ${sentence.trim()}`),
    );
    expect(found).toEqual([]);
  });

  it("hold in every assessment of every case, too", () => {
    for (const { changes } of [
      ...casesIn("network/check-cases.json"),
      ...casesIn("legislation/check-cases.json"),
      ...casesIn("network/each-outcome.json"),
    ]) {
      const job = jobWith(changes);
      const assessment = assess(job, "2026-12-01");
      const said = JSON.stringify([assessment, headline(assessment), photosNeeded(job, assessment)]);
      expect([...claims, /undefined|NaN|\[object/].filter((claim) => claim.test(said))).toEqual([]);
    }
  });

  it("tell whoever holds the camera to look only", () => {
    const job = jobWith();
    const intake = photosNeeded(job, assess(job, "2026-12-01")).filter(({ subject }) =>
      ["intake", "cut-out", "service-head", "earth-terminal"].includes(subject),
    );
    expect(intake).toHaveLength(4);
    for (const { why } of intake) expect(why).toMatch(/Look only, open nothing\./);
  });

  it("name every state and purpose of a submission", () => {
    expect(new Set(submissionStates).size).toBe(submissionStates.length);
    expect(new Set(submissionPurposes).size).toBe(submissionPurposes.length);
  });
});
