/** A4 in twentieths of a point, as Word measures it. */
export const page = {
  width: 11906,
  height: 16838,
  side: 1134,
  top: 1900,
  bottom: 1500,
  header: 720,
  footer: 620,
} as const;

export const textWidthTwips = page.width - 2 * page.side;

/** Millimetres to the pixels of 1/96 inch that the drawing size is given in. */
export const mmToPx = (mm: number): number => (mm * 96) / 25.4;

export const percentToTwips = (percent: number): number => Math.floor((textWidthTwips * percent) / 100);

/** Column widths in twips that sum to the text width; the last column takes what rounding leaves. */
export function columnTwips(percents: readonly number[]): number[] {
  const widths = percents.map(percentToTwips);
  const rest = textWidthTwips - widths.reduce((sum, width) => sum + width, 0);
  return widths.map((width, index) => (index === widths.length - 1 ? width + rest : width));
}

export const ink = "1B211E";
export const quietInk = "59635D";
export const ruleColour = "C9C5BA";

export const faces = { heading: "Bitter", text: "Instrument Sans", mono: "Spline Sans Mono" } as const;

/** What a reader's machine uses where a face is not installed. */
export const standIns: Readonly<Record<keyof typeof faces, string>> = {
  heading: "Georgia",
  text: "Arial",
  mono: "Consolas",
};
