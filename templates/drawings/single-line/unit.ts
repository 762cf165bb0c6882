import type { Chargepoint } from "@/lib/notify/job";
import { absence, amountOf } from "../../words/facts";
import { unitName, unitRating } from "../../words/equipment";
import { box, inksOf, label, line, type Surface } from "../svg";
import { fitted } from "../text-width";
import { column, heights } from "./measures";

/** The open-PEN measure in the few words a box holds; the document says the rest. */
const shortMethod: Readonly<Record<NonNullable<Chargepoint["openPen"]["method"]>, string>> = {
  "three-phase-balance": "open PEN: phase balance",
  "installation-electrode": "open PEN: electrode",
  "cpc-earth-70V-device": "open PEN: earth device",
  "line-neutral-window-device": "open PEN: L-N device",
  "equivalent-device": "open PEN: other device",
  tt: "own electrode, TT",
  separation: "open PEN: separation",
  indoor: "indoors",
  "private-tn-s": "private TN-S",
};

const methodLine = ({ method, device }: Chargepoint["openPen"]) => {
  if (method === null) return "open PEN: not recorded";
  return device.position === "separate" ? shortMethod[method].replace("open PEN:", "separate") : shortMethod[method];
};

function protectionLine({ builtInRcd, dcFaultProtection }: Chargepoint): string {
  const rcd = builtInRcd && builtInRcd !== "none" && builtInRcd !== "unknown" ? `RCD type ${builtInRcd}` : null;
  const dc = dcFaultProtection === "rdc-dd" ? "RDC-DD" : dcFaultProtection === "type-b" ? "type B for d.c." : null;
  return [rcd, dc].filter(Boolean).join(", ") || "d.c. fault: not recorded";
}

/** A unit with an electrode of its own needs room for it below. */
export const unitHeight = ({ openPen }: Chargepoint): number =>
  heights.unit + (openPen.method === "tt" ? heights.electrode : 0);

/** The unit's box, `y` its upper edge, with what protects it; under it the electrode of a TT unit. */
export function unitMarks(unit: Chargepoint, y: number, surface: Surface): string {
  const inks = inksOf[surface];
  const width = column.unitRight - column.unit;
  const room = width - 12;
  const x = column.unit + 6;
  const written = (text: string, row: number, strong = false) =>
    label(x, y + 15 + row * 13.5, fitted(text, strong ? 10.5 : 10, room, strong), {
      size: strong ? 10.5 : 10,
      strong,
      colour: strong ? inks.ink : inks.quiet,
    });
  return (
    box(column.unit, y, width, heights.unit, { width: 2, colour: inks.ink, fill: inks.paper }) +
    written(unitName(unit), 0, true) +
    written(unitRating(unit), 1) +
    written(methodLine(unit.openPen), 2) +
    written(protectionLine(unit), 3) +
    (unit.openPen.method === "tt" ? electrodeMarks(column.unit + 14, y + heights.unit, unit, inks.ink) : "")
  );
}

function electrodeMarks(x: number, y: number, { openPen }: Chargepoint, colour: string): string {
  const missing = absence(openPen.electrodeOhm);
  const words = missing ? `electrode ${missing}` : `electrode ${amountOf(openPen.electrodeOhm, "Ω")}`;
  return (
    electrodeSymbol(x, y, 14, colour) +
    label(x + 14, y + 22, fitted(words, 10, column.unitRight - x - 16), { size: 10, colour })
  );
}

/** The sign for Earth, `drop` below the point it hangs from. */
export const electrodeSymbol = (x: number, y: number, drop: number, colour: string): string =>
  line(x, y, x, y + drop, { dash: "7 3 2 3", colour }) +
  line(x - 9, y + drop, x + 9, y + drop, { width: 2, colour }) +
  line(x - 5.5, y + drop + 4.5, x + 5.5, y + drop + 4.5, { width: 2, colour }) +
  line(x - 2, y + drop + 9, x + 2, y + drop + 9, { width: 2, colour });
