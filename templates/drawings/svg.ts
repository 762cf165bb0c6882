import { printable } from "../printable";
import { textWidth } from "./text-width";

/** A finished drawing: SVG text, what it says in words, and its size on A4. */
export type Drawing = { svg: string; alt: string; widthMm: number; heightMm: number };

/** Ink alone for paper; the palette for a screen. Shape and hatch carry the meaning in both. */
export type Surface = "paper" | "screen";

export type Inks = Readonly<Record<"ink" | "quiet" | "rule" | "paper" | "charging" | "wrong" | "house", string>>;

export const inksOf: Readonly<Record<Surface, Inks>> = {
  paper: {
    ink: "#1b211e",
    quiet: "#4a524d",
    rule: "#b9b9b4",
    paper: "#ffffff",
    charging: "#1b211e",
    wrong: "#1b211e",
    house: "#59635d",
  },
  screen: {
    ink: "#1b211e",
    quiet: "#59635d",
    rule: "#d8d2c3",
    paper: "#fffdf8",
    charging: "#a8501f",
    wrong: "#9c2a1f",
    house: "#5c6670",
  },
};

/** Characters the drawing faces hold; others are shown as an ellipsis and stand whole in the words beside it. */
const drawable =
  /[^\u0020-\u007E\u00A0-\u017F\u2013\u2014\u2018\u2019\u201C\u201D\u2026\u03A9\u2264\u2265\u2212\u00B2]+/gu;

const escaped = (text: string) =>
  text.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");

/** Signs that the text face lacks and the fallback face lends. */
const lent = /([\u03A9\u2264\u2265\u00B2\u00B3\u00B5\u00B1\u00BD\u2212]+)/;

/**
 * The text with its lent signs each placed by itself: a renderer that meets one in the middle of a line would
 * otherwise set the whole line in the fallback face.
 */
function faced(text: string, left: number, size: number, strong: boolean): string {
  let x = left;
  return text
    .split(lent)
    .filter((part) => part !== "")
    .map((part) => {
      const at = rounded(x);
      x += textWidth(part, size, strong);
      return `<tspan x="${at}"${lent.test(part) ? ' font-family="Roboto" font-weight="400"' : ""}>${escaped(part)}</tspan>`;
    })
    .join("");
}

/** User text as a drawing can show it. */
export const drawn = (text: string): string => printable(text).replace(drawable, "...");

const rounded = (value: number) => String(Math.round(value * 100) / 100);

export type LabelOptions = {
  size?: number;
  strong?: boolean;
  anchor?: "start" | "middle" | "end";
  colour?: string;
  /** A patch of paper behind the label, for one that stands on a grid or a hatch. */
  patch?: string;
};

/** One line of text. */
export function label(x: number, y: number, text: string, options: LabelOptions = {}): string {
  const { size = 11, strong = false, anchor = "start", colour = inksOf.paper.ink, patch } = options;
  const shown = drawn(text);
  const width = textWidth(shown, size, strong);
  const left = anchor === "start" ? x : anchor === "end" ? x - width : x - width / 2;
  const behind = patch
    ? `<rect x="${rounded(left - 2)}" y="${rounded(y - size * 0.85)}" width="${rounded(width + 4)}" height="${rounded(size * 1.15)}" fill="${patch}"/>`
    : "";
  const weight = strong ? ' font-weight="600"' : "";
  const style = `font-size="${size}" fill="${colour}"${weight}`;
  if (lent.test(shown)) return `${behind}<text y="${rounded(y)}" ${style}>${faced(shown, left, size, strong)}</text>`;
  return `${behind}<text x="${rounded(x)}" y="${rounded(y)}" text-anchor="${anchor}" ${style}>${escaped(shown)}</text>`;
}

type Stroke = { colour?: string; width?: number; dash?: string; fill?: string };

const stroked = ({ colour = inksOf.paper.ink, width = 1.4, dash, fill = "none" }: Stroke) =>
  `fill="${fill}" stroke="${colour}" stroke-width="${width}"${dash ? ` stroke-dasharray="${dash}"` : ""}`;

export const path = (d: string, stroke: Stroke = {}): string => `<path d="${d}" ${stroked(stroke)}/>`;

export const line = (x1: number, y1: number, x2: number, y2: number, stroke: Stroke = {}): string =>
  path(`M${rounded(x1)} ${rounded(y1)}L${rounded(x2)} ${rounded(y2)}`, stroke);

export const box = (x: number, y: number, width: number, height: number, stroke: Stroke = {}): string =>
  `<rect x="${rounded(x)}" y="${rounded(y)}" width="${rounded(width)}" height="${rounded(height)}" ${stroked(stroke)}/>`;

export const dot = (x: number, y: number, radius = 3, stroke: Stroke = { fill: inksOf.paper.ink }): string =>
  `<circle cx="${rounded(x)}" cy="${rounded(y)}" r="${radius}" ${stroked(stroke)}/>`;

/** A hatch to fill with `url(#id)`. */
export const hatch = (id: string, angle: number, gap: number, colour: string, width = 1): string =>
  `<pattern id="${id}" width="${gap}" height="${gap}" patternUnits="userSpaceOnUse" patternTransform="rotate(${angle})"><path d="M0 0V${gap}" stroke="${colour}" stroke-width="${width}"/></pattern>`;

/** Wraps the marks as one picture whose title and description are read aloud. */
export function picture(
  widthPx: number,
  heightPx: number,
  widthMm: number,
  alt: string,
  marks: string,
  defs = "",
): Drawing {
  const words = printable(alt);
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${rounded(widthPx)} ${rounded(heightPx)}" width="${rounded(widthPx)}" height="${rounded(heightPx)}" ` +
    `font-family="Instrument Sans" role="img" aria-label="${escaped(words)}">` +
    `${defs ? `<defs>${defs}</defs>` : ""}${marks}</svg>`;
  return { svg, alt: words, widthMm, heightMm: Math.round(((widthMm * heightPx) / widthPx) * 10) / 10 };
}
