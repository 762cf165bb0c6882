import type { Drawing } from "./drawings/svg";
import type { Block } from "./model";

/** A drawing with its number and what it shows. */
export const figure = (number: number, { svg, alt, widthMm, heightMm }: Drawing, shows: string): Block => ({
  kind: "figure",
  svg,
  alt,
  caption: `Figure ${number}. ${shows}`,
  widthMm,
  heightMm,
});
