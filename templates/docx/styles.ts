import { AlignmentType, LevelFormat, LineRuleType, type INumberingOptions, type IStylesOptions } from "docx";
import { faces, ink, quietInk } from "./measures";

const heading = { font: faces.heading, bold: true, color: ink };

/** Every style a document uses; nothing is formatted by hand that a style can say. Sizes in half points. */
export const styles: IStylesOptions = {
  default: {
    document: {
      run: { font: faces.text, size: 22, color: ink, language: { value: "en-GB" } },
      paragraph: { spacing: { after: 100, line: 276, lineRule: LineRuleType.AUTO } },
    },
    title: {
      run: { ...heading, size: 44 },
      paragraph: { spacing: { before: 120, after: 100, line: 260, lineRule: LineRuleType.AUTO }, keepNext: true },
    },
    heading1: { run: { ...heading, size: 27 }, paragraph: { spacing: { before: 300, after: 90 }, keepNext: true } },
    heading2: { run: { ...heading, size: 23 }, paragraph: { spacing: { before: 240, after: 80 }, keepNext: true } },
    heading3: { run: { ...heading, size: 22 }, paragraph: { spacing: { before: 180, after: 60 }, keepNext: true } },
  },
  paragraphStyles: [
    {
      id: "Subtitle",
      name: "Subtitle",
      basedOn: "Normal",
      next: "Normal",
      run: { size: 24, color: quietInk },
      paragraph: { spacing: { after: 120 } },
    },
    {
      id: "RunningLine",
      name: "Running line",
      basedOn: "Normal",
      run: { size: 18, color: quietInk },
      paragraph: { spacing: { after: 0 } },
    },
    {
      id: "TableText",
      name: "Table text",
      basedOn: "Normal",
      paragraph: { spacing: { before: 50, after: 50, line: 252, lineRule: LineRuleType.AUTO } },
    },
    {
      id: "DenseText",
      name: "Dense table text",
      basedOn: "TableText",
      run: { size: 20 },
      paragraph: { spacing: { before: 40, after: 40, line: 240, lineRule: LineRuleType.AUTO } },
    },
    {
      id: "ColumnHead",
      name: "Column head",
      basedOn: "DenseText",
      run: { size: 18, color: quietInk },
      paragraph: { keepNext: true },
    },
    {
      id: "Caption",
      name: "caption",
      basedOn: "Normal",
      run: { size: 19, color: quietInk },
      paragraph: { spacing: { before: 80, after: 120 } },
    },
    {
      id: "TableCaption",
      name: "Table caption",
      basedOn: "Caption",
      paragraph: { keepNext: true, spacing: { before: 140, after: 60 } },
    },
    {
      id: "SourceLine",
      name: "Source line",
      basedOn: "Normal",
      run: { size: 18, color: quietInk },
      paragraph: { spacing: { after: 50, line: 240, lineRule: LineRuleType.AUTO } },
    },
    {
      id: "CautionTitle",
      name: "Caution title",
      basedOn: "Normal",
      run: { font: faces.heading, bold: true },
      paragraph: { keepNext: true, spacing: { before: 80, after: 20 } },
    },
    {
      id: "WorkingsTitle",
      name: "Workings title",
      basedOn: "Normal",
      run: { bold: true },
      paragraph: { keepNext: true, spacing: { before: 160, after: 40 } },
    },
    {
      id: "WorkingsLine",
      name: "Workings line",
      basedOn: "Normal",
      run: { font: faces.mono, size: 19 },
      paragraph: { indent: { left: 284 }, spacing: { after: 20, line: 252, lineRule: LineRuleType.AUTO } },
    },
    {
      id: "Figure",
      name: "Figure",
      basedOn: "Normal",
      paragraph: { keepNext: true, spacing: { before: 160, after: 0, line: 240, lineRule: LineRuleType.AUTO } },
    },
    {
      id: "Gap",
      name: "Gap",
      basedOn: "Normal",
      run: { size: 8 },
      paragraph: { spacing: { before: 0, after: 0, line: 120, lineRule: LineRuleType.AUTO } },
    },
  ],
  characterStyles: [
    { id: "Identifier", name: "Identifier", run: { font: faces.mono } },
    { id: "Quiet", name: "Quiet", run: { color: quietInk } },
  ],
};

/** Bullets and numbers; each list is an instance of its own, so that numbers begin again. */
export const numbering: INumberingOptions = {
  config: [
    {
      reference: "points",
      levels: [
        {
          level: 0,
          format: LevelFormat.BULLET,
          text: "•",
          alignment: AlignmentType.LEFT,
          style: { paragraph: { indent: { left: 340, hanging: 340 } } },
        },
      ],
    },
    {
      reference: "steps",
      levels: [
        {
          level: 0,
          format: LevelFormat.DECIMAL,
          text: "%1.",
          alignment: AlignmentType.LEFT,
          style: { paragraph: { indent: { left: 400, hanging: 400 } } },
        },
      ],
    },
  ],
};
