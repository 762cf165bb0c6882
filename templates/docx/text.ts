import { ImageRun, Paragraph, TextRun, type ParagraphChild } from "docx";
import type { Outcome } from "@/lib/notify/result";
import { outcomeMark, outcomeWord } from "../drawings/marks";
import type { Span, Text } from "../model";
import { printable } from "../printable";

/** Turns SVG text into PNG bytes, `widthPx` wide. Passed in, because it needs fonts from a disk. */
export type Rasterise = (svg: string, widthPx: number) => Uint8Array;

const markPx = 12;

/** The outcome's shape as a small picture in the line, described for who cannot see it. */
export const markRun = (outcome: Outcome, rasterise: Rasterise): ImageRun =>
  new ImageRun({
    type: "png",
    data: rasterise(outcomeMark(outcome), 80),
    transformation: { width: markPx, height: markPx },
    altText: { name: "Outcome", title: "Outcome", description: `Outcome: ${outcomeWord[outcome].toLowerCase()}` },
  });

function spanRuns(span: Span, rasterise: Rasterise): ParagraphChild[] {
  const run = new TextRun({
    text: span.mark ? `\u00A0${printable(span.text)}` : printable(span.text),
    bold: span.strong,
    style: span.mono ? "Identifier" : span.quiet ? "Quiet" : undefined,
  });
  return span.mark ? [markRun(span.mark, rasterise), run] : [run];
}

export const runs = (text: Text, rasterise: Rasterise): ParagraphChild[] =>
  typeof text === "string" ? [new TextRun(printable(text))] : text.flatMap((span) => spanRuns(span, rasterise));

/** One paragraph in a named style. */
export const styled = (style: string, text: Text, rasterise: Rasterise): Paragraph =>
  new Paragraph({ style, children: runs(text, rasterise) });
