import {
  AlignmentType,
  BorderStyle,
  Paragraph,
  Table,
  TableCell,
  TableLayoutType,
  TableRow,
  VerticalAlignTable,
  WidthType,
  type IBorderOptions,
  type ITableBordersOptions,
} from "docx";
import { outcomeWord } from "../drawings/marks";
import { factRows, type Laid } from "../layout";
import { ink, ruleColour, textWidthTwips, columnTwips } from "./measures";
import { runs, styled, type Rasterise } from "./text";

type Of<K extends Laid["kind"]> = Extract<Laid, { kind: K }>;

const none: IBorderOptions = { style: BorderStyle.NONE, size: 0, color: "auto" };
const hair: IBorderOptions = { style: BorderStyle.SINGLE, size: 4, color: ruleColour };
const inkLine: IBorderOptions = { style: BorderStyle.SINGLE, size: 6, color: ink };

/** Ink above, hairlines between and below: the ruling of a ledger. */
const ledger: ITableBordersOptions = {
  top: inkLine,
  bottom: hair,
  left: none,
  right: none,
  insideHorizontal: hair,
  insideVertical: none,
};

const plate: ITableBordersOptions = {
  top: inkLine,
  bottom: inkLine,
  left: inkLine,
  right: inkLine,
  insideHorizontal: inkLine,
  insideVertical: inkLine,
};

type Cell = { children: Paragraph[]; span?: number };

function row(cells: readonly Cell[], widths: readonly number[], header = false): TableRow {
  let column = 0;
  return new TableRow({
    cantSplit: true,
    tableHeader: header,
    children: cells.map(({ children, span = 1 }) => {
      const size = widths.slice(column, column + span).reduce((sum, width) => sum + width, 0);
      column += span;
      return new TableCell({
        children,
        columnSpan: span > 1 ? span : undefined,
        width: { size, type: WidthType.DXA },
        verticalAlign: VerticalAlignTable.TOP,
      });
    }),
  });
}

/** A table of fixed columns over the whole text width. */
export const fixedTable = (rows: TableRow[], widths: number[], borders: ITableBordersOptions, inset = 0): Table =>
  new Table({
    rows,
    columnWidths: widths,
    width: { size: textWidthTwips, type: WidthType.DXA },
    layout: TableLayoutType.FIXED,
    borders,
    margins: { marginUnitType: WidthType.DXA, left: inset, right: 100, top: 0, bottom: 0 },
  });

/** A ruled breath after a table, so that the next block does not sit tight under it. */
export const gap = (): Paragraph => new Paragraph({ style: "Gap" });

/** Height for a signature by hand. */
const roomToSign = (): Paragraph => new Paragraph({ style: "TableText", spacing: { before: 480 } });

const label = (text: string, rasterise: Rasterise): Cell => ({
  children: [styled("TableText", [{ text, quiet: true }], rasterise)],
});

export function factsTable({ rows, pairs = 1 }: Pick<Of<"facts">, "rows" | "pairs">, rasterise: Rasterise): Table {
  const widths = columnTwips(pairs === 2 ? [22, 28, 22, 28] : [26, 74]);
  return fixedTable(
    factRows(rows, pairs).map((facts) =>
      row(
        facts.flatMap((fact) => [
          label(fact.label, rasterise),
          {
            children: [fact.value === "" ? roomToSign() : styled("TableText", fact.value, rasterise)],
            span: pairs === 2 && facts.length === 1 ? 3 : 1,
          },
        ]),
        widths,
      ),
    ),
    widths,
    ledger,
  );
}

export function dataTable({ columns, rows }: Of<"table">, rasterise: Rasterise): Table {
  const widths = columnTwips(columns.map((column) => column.widthPercent));
  const alignment = columns.map(({ align }) => (align === "right" ? AlignmentType.RIGHT : AlignmentType.LEFT));
  const cell = (text: Parameters<typeof runs>[0], index: number, style: string): Cell => {
    const spans = typeof text === "string" && columns[index]?.mono ? [{ text, mono: true as const }] : text;
    return { children: [new Paragraph({ style, alignment: alignment[index], children: runs(spans, rasterise) })] };
  };
  const heads = columns.map((column, index) => ({
    children: [
      new Paragraph({ style: "ColumnHead", alignment: alignment[index], children: runs(column.heading, rasterise) }),
    ],
  }));
  return fixedTable(
    [
      row(heads, widths, true),
      ...rows.map((cells) =>
        row(
          cells.map((text, index) => cell(text, index, "DenseText")),
          widths,
        ),
      ),
    ],
    widths,
    ledger,
  );
}

export function outcomesTable({ lines }: Of<"outcomes">, rasterise: Rasterise): Table {
  const widths = columnTwips([24, 76]);
  return fixedTable(
    lines.map(({ outcome, title, because, sources }) =>
      row(
        [
          { children: [styled("TableText", [{ text: outcomeWord[outcome], strong: true, mark: outcome }], rasterise)] },
          {
            children: [
              styled("TableText", [{ text: title, strong: true }], rasterise),
              styled("TableText", because, rasterise),
              ...(sources.length ? [styled("SourceLine", sources.join("; "), rasterise)] : []),
            ],
          },
        ],
        widths,
      ),
    ),
    widths,
    ledger,
  );
}

/** The plate of a caution: its triangle in a cell of its own. */
export const cautionTable = (mark: Paragraph, words: Paragraph[]): Table => {
  const widths = columnTwips([8, 92]);
  return fixedTable([row([{ children: [mark] }, { children: words }], widths)], widths, plate, 120);
};
