import {
  AlignmentType,
  BorderStyle,
  Document,
  Footer,
  Header,
  HeadingLevel,
  HorizontalPositionRelativeFrom,
  ImageRun,
  LineRuleType,
  Packer,
  PageNumber,
  Paragraph,
  TabStopType,
  TextRun,
  VerticalPositionRelativeFrom,
  type FileChild,
} from "docx";
import { cautionMark, headerWire } from "./drawings/marks";
import { faces, ink, mmToPx, page, ruleColour, textWidthTwips } from "./docx/measures";
import { normalised } from "./docx/normalise";
import { numbering, styles } from "./docx/styles";
import { cautionTable, dataTable, factsTable, gap, outcomesTable } from "./docx/tables";
import { runs, styled, type Rasterise } from "./docx/text";
import { laidOut, runningFoot, runningHead, signatureLines, type Laid } from "./layout";
import type { DocumentModel } from "./model";
import { printable } from "./printable";

type Writers = {
  [K in Laid["kind"]]: (block: Extract<Laid, { kind: K }>, rasterise: Rasterise, index: number) => FileChild[];
};

const headingLevels = { 1: HeadingLevel.HEADING_1, 2: HeadingLevel.HEADING_2, 3: HeadingLevel.HEADING_3 } as const;

/** Pixels of a drawing for each millimetre on paper: 300 to the inch. */
const pxPerMm = 11.8;

/** One writer for each kind of block; a kind without one is a failed build. */
const writers: Writers = {
  heading: ({ level, text }) => [
    new Paragraph({ heading: headingLevels[level], children: [new TextRun(printable(text))] }),
  ],
  paragraph: ({ text }, rasterise) => [new Paragraph({ children: runs(text, rasterise) })],
  facts: (block, rasterise) => [factsTable(block, rasterise), gap()],
  table: (block, rasterise) => [styled("TableCaption", block.caption, rasterise), dataTable(block, rasterise), gap()],
  list: ({ ordered, items }, rasterise, index) =>
    items.map(
      (item) =>
        new Paragraph({
          numbering: { reference: ordered ? "steps" : "points", level: 0, instance: index },
          children: runs(item, rasterise),
        }),
    ),
  outcomes: (block, rasterise) => [outcomesTable(block, rasterise), gap()],
  workings: ({ title, lines }, rasterise) => [
    styled("WorkingsTitle", title, rasterise),
    ...lines.map((line) => styled("WorkingsLine", line, rasterise)),
  ],
  caution: ({ title, text }, rasterise) => [
    gap(),
    cautionTable(cautionPicture(rasterise), [
      styled("CautionTitle", title, rasterise),
      styled("TableText", text, rasterise),
    ]),
    gap(),
  ],
  figure: ({ svg, alt, caption, widthMm, heightMm }, rasterise) => [
    new Paragraph({
      style: "Figure",
      children: [
        new ImageRun({
          type: "png",
          data: rasterise(svg, Math.round(widthMm * pxPerMm)),
          transformation: { width: mmToPx(widthMm), height: mmToPx(heightMm) },
          altText: { name: "Drawing", title: printable(caption), description: printable(alt) },
        }),
      ],
    }),
    styled("Caption", caption, rasterise),
  ],
  signature: (block, rasterise) => [
    new Paragraph({ keepNext: true, children: runs(block.statement, rasterise) }),
    factsTable({ rows: signatureLines(block), pairs: 1 }, rasterise),
    gap(),
  ],
};

const cautionPicture = (rasterise: Rasterise) =>
  new Paragraph({
    spacing: { before: 90 },
    alignment: AlignmentType.CENTER,
    children: [
      new ImageRun({
        type: "png",
        data: rasterise(cautionMark, 160),
        transformation: { width: 22, height: 22 },
        altText: { name: "Caution", title: "Caution", description: "Caution" },
      }),
    ],
  });

function written(block: Laid, rasterise: Rasterise, index: number): FileChild[] {
  const writer = writers[block.kind] as ((block: Laid, rasterise: Rasterise, index: number) => FileChild[]) | undefined;
  if (!writer) throw new Error(`No Word writer for a block of kind "${(block as { kind: string }).kind}".`);
  return writer(block, rasterise, index);
}

/** Runs to the page's left edge and ends in the eyelet, on the level of the header rule. */
const wire = (rasterise: Rasterise) =>
  new ImageRun({
    type: "png",
    data: rasterise(headerWire, 608),
    transformation: { width: mmToPx(19.6), height: mmToPx(4.13) },
    altText: { name: "Thread", title: "Thread", description: "A copper wire through an eyelet" },
    floating: {
      horizontalPosition: { relative: HorizontalPositionRelativeFrom.PAGE, offset: 0 },
      verticalPosition: { relative: VerticalPositionRelativeFrom.PARAGRAPH, offset: 198000 },
      behindDocument: true,
    },
  });

const rightEdge = [{ type: TabStopType.RIGHT, position: textWidthTwips }];

const header = (model: DocumentModel, rasterise: Rasterise) =>
  new Header({
    children: [
      new Paragraph({
        style: "RunningLine",
        tabStops: rightEdge,
        // An exact height, so that the wire meets the rule whatever face the reader's machine has.
        spacing: { line: 320, lineRule: LineRuleType.EXACT, after: 0 },
        border: { bottom: { style: BorderStyle.SINGLE, size: 6, color: ink, space: 6 } },
        children: [
          wire(rasterise),
          new TextRun({ text: printable(model.firmName), font: faces.heading, bold: true, color: ink, size: 20 }),
          new TextRun({ text: `\t${printable(runningHead(model))}` }),
        ],
      }),
    ],
  });

const footer = (model: DocumentModel) =>
  new Footer({
    children: [
      new Paragraph({
        style: "RunningLine",
        tabStops: rightEdge,
        border: { top: { style: BorderStyle.SINGLE, size: 4, color: ruleColour, space: 6 } },
        children: [
          new TextRun(printable(runningFoot(model))),
          new TextRun({ children: ["\tPage ", PageNumber.CURRENT, " of ", PageNumber.TOTAL_PAGES] }),
        ],
      }),
    ],
  });

/**
 * The model as a Word document: A4, en-GB, real styles, the same bytes for the same model on any machine.
 * `rasterise` turns drawings and outcome shapes into PNG.
 * @throws Error on a kind of block it does not know.
 */
export async function toDocx(model: DocumentModel, rasterise: Rasterise): Promise<Uint8Array> {
  const drawn = remembered(rasterise);
  const file = new Document({
    title: printable(`${model.title}, ${model.jobNumber}, version ${model.version}`),
    subject: printable(model.subtitle),
    creator: printable(model.firmName),
    lastModifiedBy: printable(model.firmName),
    description: printable(runningFoot(model)),
    revision: 1,
    compatabilityModeVersion: 15,
    styles,
    numbering,
    sections: [
      {
        properties: {
          page: {
            size: { width: page.width, height: page.height },
            margin: {
              top: page.top,
              bottom: page.bottom,
              left: page.side,
              right: page.side,
              header: page.header,
              footer: page.footer,
            },
          },
        },
        headers: { default: header(model, drawn) },
        footers: { default: footer(model) },
        children: [
          new Paragraph({ heading: HeadingLevel.TITLE, children: [new TextRun(printable(model.title))] }),
          styled("Subtitle", model.subtitle, drawn),
          ...laidOut(model.blocks).flatMap((block, index) => written(block, drawn, index)),
        ],
      },
    ],
  });
  return normalised(await Packer.toArrayBuffer(file), model.issuedAt);
}

/** A document repeats its few marks many times; each is drawn once. */
function remembered(rasterise: Rasterise): Rasterise {
  const pictures = new Map<string, Uint8Array>();
  return (svg, widthPx) => {
    const known = pictures.get(svg);
    if (known) return known;
    const picture = rasterise(svg, widthPx);
    pictures.set(svg, picture);
    return picture;
  };
}
