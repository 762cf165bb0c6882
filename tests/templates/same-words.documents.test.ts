import mammoth from "mammoth";
import { createElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { beforeAll, describe, expect, it } from "vitest";
import { DocumentView } from "@/components/document-view/document-view";
import { rasterise } from "@/lib/server/rasterise";
import { documentsFor } from "@/templates/documents";
import type { Block, DocumentModel } from "@/templates/model";
import { toDocx } from "@/templates/to-docx";
import { everyBlock } from "./every-block";
import { example, exampleNames, samples } from "./generated-jobs";

/** Word files read by mammoth, a reader that is not ours, beside the text of the page. */

function modelsOf(name: string): DocumentModel[] {
  const { job, assessment, issue } = example(name);
  return documentsFor(job, assessment, issue);
}

const empty = /\bundefined\b|\bnull\b|\bNaN\b|\[object/;

/** Blanks differ between the readers; words and their order may not. */
const bare = (text: string) => text.replace(/\s+/g, "");
const entities: Record<string, string> = { "&amp;": "&", "&lt;": "<", "&gt;": ">", "&quot;": '"', "&#x27;": "'" };

function screenText(model: DocumentModel): string {
  const html = renderToStaticMarkup(createElement(DocumentView, { document: model }));
  return html
    .replace(/<header.*?<\/header>/s, "")
    .replace(/<footer.*?<\/footer>/s, "")
    .replace(/<svg.*?<\/svg>/gs, "")
    .replace(/<[^>]*>/g, "")
    .replace(/&(amp|lt|gt|quot|#x27);/g, (entity) => entities[entity] ?? entity);
}

const wordText = async (model: DocumentModel) =>
  (await mammoth.extractRawText({ buffer: Buffer.from(await toDocx(model, rasterise)) })).value;

describe("screen and Word", () => {
  const documents = [
    everyBlock,
    ...exampleNames.flatMap((name) => modelsOf(name)),
    ...samples(6, 7).flatMap(({ job, assessment, issue }) => documentsFor(job, assessment, issue)),
  ];
  const read: { screen: string; word: string }[] = [];
  beforeAll(async () => {
    for (const model of documents) read.push({ screen: screenText(model), word: await wordText(model) });
  }, 120_000);

  it("hold the same words in the same order", () => {
    expect(read.length).toBeGreaterThan(30);
    for (const { screen, word } of read) expect(bare(screen)).toBe(bare(word));
  });

  it("hold no empty value", () => {
    for (const { word } of read) expect(word).not.toMatch(empty);
  });

  it("a kind of block without a view is refused by name", () => {
    const unknown = { kind: "hologram" } as unknown as Block;
    expect(() => screenText({ ...everyBlock, blocks: [unknown] })).toThrow(/hologram/);
  });
});
