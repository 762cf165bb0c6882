import { box, line, path } from "../svg";

/** Signs after IEC 60617, drawn on a level line from `x` to `x + 20`. */
export const switchSymbol = (x: number, y: number, colour: string): string =>
  line(x, y, x + 17, y - 9, { width: 1.7, colour });

/** A switch whose cross shows that it opens by itself. */
export const breakerSymbol = (x: number, y: number, colour: string): string =>
  switchSymbol(x, y, colour) + path(`M${x + 16} ${y - 4}l6 8M${x + 22} ${y - 4}l-6 8`, { width: 1.3, colour });

export const fuseSymbol = (x: number, y: number, colour: string): string =>
  box(x, y - 5, 20, 10, { colour }) + line(x, y, x + 20, y, { colour });

/** The ring of a residual current device round the conductor. */
export const rcdSymbol = (x: number, y: number, colour: string): string =>
  `<ellipse cx="${x}" cy="${y}" rx="4" ry="8" fill="none" stroke="${colour}" stroke-width="1.3"/>`;
