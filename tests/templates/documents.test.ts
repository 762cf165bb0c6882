import { describe, expect, it } from "vitest";
import { documentsFor } from "@/templates/documents";
import { plain } from "@/templates/layout";
import type { Block, DocumentModel } from "@/templates/model";
import { example, fullIssue, samples } from "./generated-jobs";

const textsOf = (value: unknown, key = ""): string[] => {
  if (typeof value === "string") return key === "svg" || key === "kind" || key === "mark" ? [] : [value];
  if (Array.isArray(value)) return value.flatMap((item) => textsOf(item, key));
  return value === null || typeof value !== "object"
    ? []
    : Object.entries(value).flatMap(([name, item]) => textsOf(item, name));
};

/** Everything a model says, for a search; spans joined as they are read. */
const wordsOf = (blocks: readonly Block[]): string => textsOf(blocks).join(" ");
const models = (name: string, issue = example(name).issue) => {
  const { job, assessment } = example(name);
  return documentsFor(job, assessment, issue);
};
const modelOf = (name: string, slug: string): DocumentModel =>
  models(name).find((model) => model.slug === slug) ?? expect.unreachable();
const factOf = ({ blocks }: DocumentModel, label: string) =>
  blocks.flatMap((block) => (block.kind === "facts" ? block.rows : [])).find((row) => row.label === label);

describe("documents of the examples", () => {
  it("are those the route calls for", () => {
    expect(models("fen-0147-notice").map(({ slug }) => slug)).toEqual([
      "00-cover",
      "01-network-notification",
      "02-earthing-and-open-pen",
      "03-smart-charging-settings",
      "04-demand-and-circuit",
      "05-handover",
    ]);
    expect(models("fen-0125-application-before-work").map(({ slug }) => slug)).not.toContain("05-handover");
    expect(models("fen-0153-stop").map(({ slug }) => slug)).toEqual(["00-cover", "01-network-notification"]);
  });

  /** Titles of the variants in the order of `expected.json`: notice, notice by the day, application, open, late, stop. */
  it.each([
    [
      "fen-0147-notice",
      "Network notification",
      "To Northern Powergrid. Notice after installing one electric vehicle chargepoint. No application was needed before installing.",
    ],
    ["fen-0142-notice-due-on-the-day", "Network notification", "The operator asks for it by the day of installing."],
    [
      "fen-0125-application-before-work",
      "Application to connect",
      "Nothing is fitted until the operator has answered in writing.",
    ],
    ["fen-0151-two-way", "Late application to connect", "It should have been made before."],
    ["fen-0153-stop", "Safety report", "This is no notice and no application."],
  ])("%s is headed %s", (name, title, says) => {
    const model = modelOf(name, "01-network-notification");
    expect(model.title).toBe(title);
    expect(model.subtitle).toContain(says);
  });

  it("a late application says so before anything else and names the rule", () => {
    const [first, second] = modelOf("fen-0151-two-way", "01-network-notification").blocks;
    expect(first).toMatchObject({ kind: "caution", title: "This application is late" });
    expect(wordsOf(first ? [first] : [])).toContain("20 November 2026");
    expect(wordsOf(second ? [second] : [])).toContain("It should have been applied for first because:");
  });

  it("a two-way unit carries its generation section and is not to be energised", () => {
    const words = wordsOf(modelOf("fen-0151-two-way", "01-network-notification").blocks);
    expect(words).toContain("EREC G99, small generating installation 3");
    expect(words).toContain("Do not energise before acceptance");
  });

  it("a stopped job names the danger and the emergency line on cover and report, and holds the rest back", () => {
    for (const model of models("fen-0153-stop")) {
      const words = wordsOf(model.blocks);
      expect(words).toContain("Ring 105 first");
      expect(words).toContain("Heat marks");
      expect(words).not.toContain("Voltage drop");
    }
  });

  /** Figures of `tests/examples/expected.json`. */
  it("prints the figures of the worked example", () => {
    const notification = modelOf("fen-0147-notice", "01-network-notification");
    expect(plain(factOf(notification, "Supply number")?.value ?? "")).toBe("23 9923 2323 236");
    expect(plain(factOf(notification, "Demand after, a phase")?.value ?? "")).toBe("56.8 A");
    expect(plain(factOf(notification, "Demand after")?.value ?? "")).toBe("13.06 kVA");
    expect(plain(factOf(notification, "Cut-out rating")?.value ?? "")).toBe("100 A");
    expect(plain(factOf(notification, "External loop impedance")?.value ?? "")).toBe("0.21 Ω");
    expect(plain(factOf(notification, "Installed on")?.value ?? "")).toBe("20 November 2026");
    const cover = wordsOf(modelOf("fen-0147-notice", "00-cover").blocks);
    expect(cover).toContain("18 December 2026");
    expect(cover).toContain("photos/FEN-0147-01-cut-out.jpg");
  });

  it("a fact that was never asked reads not recorded", () => {
    expect(factOf(modelOf("fen-0147-notice", "01-network-notification"), "Unique property reference")?.value).toBe(
      "not recorded",
    );
  });

  it("a window device never comes with a touch voltage, always with the risk that remains", () => {
    const model = modelOf("fen-0147-notice", "02-earthing-and-open-pen");
    expect(factOf(model, "Touch voltage worked out")).toBeUndefined();
    expect(wordsOf(model.blocks)).toContain("The risk that remains");
  });

  it("a unit on UTC has its week drawn for winter and for summer", () => {
    const captions = modelOf("fen-0139-clock-on-utc", "03-smart-charging-settings").blocks.flatMap((block) =>
      block.kind === "figure" ? [block.caption] : [],
    );
    expect(captions).toHaveLength(2);
    expect(captions[1]).toContain("summer time");
  });

  it("the cover says why it was sealed with gaps and what changed, dates first", () => {
    const words = wordsOf(models("fen-0147-notice", fullIssue())[0]?.blocks ?? []);
    expect(words).toContain("Sealed with facts missing");
    expect(words).toContain("Reason given: The customer was away.");
    expect(words).toContain("Changes since version 2");
    expect(words).toContain("dates.installed: was 2026-11-19, now 2026-11-20.");
  });

  /** A clock on British Summer Time: 23:30 UTC on 1 July is 00:30 on 2 July. */
  it("prints the issue time by the clock of London", () => {
    expect(wordsOf(models("fen-0147-notice", fullIssue())[0]?.blocks ?? [])).toContain("2 July 2026, 00:30");
  });
});

/** What may never be said of an installation, from the project's wording rules and `domain` section on wording. */
const banned = [
  /\bis safe\b/i,
  /(?<!statement of )\bcompliant\b/i,
  /limits? .* to 70 V/i,
  /legal requirement under ESQCR/i,
  /approved by the DNO/i,
];
const empty = /\bundefined\b|\bnull\b|\bNaN\b|\[object/;

describe("documents of generated records", () => {
  const all = samples(200).map(({ job, assessment, issue }) => ({
    job,
    documents: documentsFor(job, assessment, issue),
  }));

  it("hold no empty value, no banned claim and no character that XML forbids", () => {
    for (const { documents } of all)
      for (const model of documents) {
        const words = `${model.title} ${model.subtitle} ${wordsOf(model.blocks)}`;
        expect(words).not.toMatch(empty);
        for (const claim of banned) expect(words).not.toMatch(claim);
        expect(words).not.toMatch(/[\u0000-\u0008\u000B\u000C\u000E-\u001F\u202A-\u202E\u2066-\u2069\uFFFE\uFFFF]/);
      }
  });

  it("have one title each, headings that skip no level and numbered figures in order", () => {
    for (const { documents } of all)
      for (const { title, blocks } of documents) {
        expect(title).not.toBe("");
        let level = 0;
        for (const block of blocks)
          if (block.kind === "heading") {
            expect(block.level).toBeLessThanOrEqual(level + 1);
            level = block.level;
          }
        const numbers = blocks.flatMap((block) =>
          block.kind === "figure" ? [Number(/^Figure (\d+)/.exec(block.caption)?.[1])] : [],
        );
        expect(numbers).toEqual(numbers.map((_, index) => index + 1));
      }
  });

  it("have tables whose columns share the width and whose rows fill them", () => {
    for (const { documents } of all)
      for (const { blocks } of documents)
        for (const block of blocks)
          if (block.kind === "table") {
            expect(block.columns.reduce((sum, { widthPercent }) => sum + widthPercent, 0)).toBe(100);
            for (const row of block.rows) expect(row).toHaveLength(block.columns.length);
          }
  });

  it("name every chargepoint, circuit and board of the record", () => {
    for (const { job, documents } of all) {
      const earthing = documents.find(({ slug }) => slug === "02-earthing-and-open-pen");
      const circuits = documents.find(({ slug }) => slug === "04-demand-and-circuit");
      if (!earthing || !circuits) continue;
      const words = wordsOf(circuits.blocks);
      for (const { id } of [...job.circuits, ...job.boards]) expect(words).toContain(id);
      for (const { id } of job.chargepoints)
        expect(wordsOf(earthing.blocks)).toContain(job.chargepoints.length > 1 ? id : "Method chosen");
    }
  });
});
