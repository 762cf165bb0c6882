import { amountOf, number } from "../words/facts";
import { box, dot, hatch, inksOf, label, line, path, picture, type Drawing, type Surface } from "./svg";
import { stepsTo } from "./scale";

export type DemandLimits = {
  /** Above it the operator is asked first; null where the rule does not apply to these premises. */
  noticeA: number | null;
  /** Rating of the cut-out; null when it is not known. */
  cutOutA: number | null;
};

export type PhaseDemand = { name: string; existingA: number | null; afterA: number | null };

const size = { width: 640, height: 300, left: 58, right: 626, top: 26, bottom: 256 } as const;

type Inks = (typeof inksOf)[Surface];
type Frame = { inks: Inks; yOf: (amps: number) => number; marks: string; names: string };

type Limit = { amps: number; words: string; stroke: { width: number; dash?: string } };

/** The limits from the higher to the lower; one line where both are the same. */
function limitsOf({ noticeA, cutOutA }: DemandLimits): Limit[] {
  const cutOut = { words: "cut-out rating", stroke: { width: 3 } };
  const notice = { words: "above this, ask the operator first", stroke: { width: 1.8, dash: "7 5" } };
  if (cutOutA !== null && cutOutA === noticeA)
    return [{ amps: cutOutA, ...cutOut, words: "cut-out rating, and above it ask first" }];
  return [
    ...(cutOutA === null ? [] : [{ amps: cutOutA, ...cutOut }]),
    ...(noticeA === null ? [] : [{ amps: noticeA, ...notice }]),
  ].sort((one, other) => other.amps - one.amps);
}

/** Two limits closer than this have the words of the lower one under its line. */
const crowdedPx = 17;

/** Scale, grid and the two limits, which every demand chart shares. `names` go on last, over the plot. */
function frame(highestA: number, limits: DemandLimits, surface: Surface): Frame {
  const inks = inksOf[surface];
  const lines = limitsOf(limits);
  const steps = stepsTo(Math.max(highestA, ...lines.map(({ amps }) => amps)) * 1.08);
  const topA = steps.at(-1) ?? 1;
  const yOf = (amps: number) => size.bottom - (amps / topA) * (size.bottom - size.top);
  const levels = lines.map((limit, index) => {
    const y = yOf(limit.amps);
    const above = lines[index - 1];
    return { ...limit, y, under: above !== undefined && y - yOf(above.amps) < crowdedPx };
  });
  const near = (amps: number) =>
    levels.some(({ y, under }) => Math.abs(y + (under ? 6 : 0) - yOf(amps)) < (under ? 20 : 13));
  const grid = steps.map(
    (amps) =>
      line(size.left, yOf(amps), size.right, yOf(amps), { colour: inks.rule, width: 0.8 }) +
      (near(amps)
        ? ""
        : label(size.left - 8, yOf(amps) + 4, number(amps), { anchor: "end", size: 11, colour: inks.quiet })),
  );
  const drawn = levels.map(
    ({ amps, y, under, stroke }) =>
      line(size.left, y, size.right, y, { colour: inks.ink, ...stroke }) +
      label(size.left - 8, y + (under ? 14 : 4), `${number(amps)} A`, {
        anchor: "end",
        size: 11.5,
        strong: true,
        colour: inks.ink,
      }),
  );
  const names = levels.map(({ words, y, under }) =>
    label(size.right - 4, y + (under ? 13 : -5), words, {
      anchor: "end",
      size: 11,
      colour: inks.ink,
      patch: inks.paper,
    }),
  );
  return { inks, yOf, marks: grid.join("") + drawn.join(""), names: names.join("") };
}

/** Demand of each phase before and after the work, as bars against the cut-out and the limit for a notice. */
export function demandChart(phases: readonly PhaseDemand[], limits: DemandLimits, surface: Surface = "paper"): Drawing {
  const highest = Math.max(1, ...phases.flatMap(({ existingA, afterA }) => [existingA ?? 0, afterA ?? 0]));
  const drawn = frame(highest, limits, surface);
  const { inks, yOf } = drawn;
  // The names of the limits stand in the last part of the width, clear of the bars.
  const room = (size.right - 190 - size.left) / Math.max(phases.length, 1);
  const bar = Math.min(64, room * 0.6);
  const bars = phases.map(({ name, existingA, afterA }, index) => {
    const middle = size.left + room * (index + 0.5);
    const x = middle - bar / 2;
    const before =
      existingA === null
        ? ""
        : box(x, yOf(existingA), bar, size.bottom - yOf(existingA), { fill: inks.house, colour: inks.house });
    const added =
      afterA === null || existingA === null || afterA <= existingA
        ? ""
        : box(x, yOf(afterA), bar, yOf(existingA) - yOf(afterA), { fill: "url(#added)", colour: inks.ink });
    const top = afterA === null ? null : yOf(Math.max(afterA, existingA ?? 0));
    return (
      before +
      added +
      (top === null
        ? label(middle, size.bottom - 8, "cannot tell", {
            anchor: "middle",
            size: 11,
            colour: inks.ink,
            patch: inks.paper,
          })
        : label(middle, top - 6, amountOf(afterA, "A", 2), {
            anchor: "middle",
            size: 12,
            strong: true,
            colour: inks.ink,
            patch: inks.paper,
          })) +
      label(middle, size.bottom + 16, name, { anchor: "middle", size: 11.5, colour: inks.ink })
    );
  });
  const marks =
    drawn.marks +
    drawn.names +
    bars.join("") +
    line(size.left, size.bottom, size.right, size.bottom, { colour: inks.ink }) +
    keys(inks, "before the work", "added by this job");
  return picture(size.width, size.height, 140, barWords(phases, limits), marks, hatch("added", 45, 6, inks.ink, 1));
}

const limitWords = ({ noticeA, cutOutA }: DemandLimits) =>
  `Cut-out rating: ${amountOf(cutOutA, "A")}.${noticeA === null ? "" : ` Above ${amountOf(noticeA, "A")} the operator is asked first.`}`;

const barWords = (phases: readonly PhaseDemand[], limits: DemandLimits) =>
  `Demand. ${phases.map(({ name, existingA, afterA }) => `${name}: ${amountOf(existingA, "A", 2)} before, ${afterA === null ? "cannot tell" : amountOf(afterA, "A", 2)} after`).join("; ")}. ${limitWords(limits)}`;

function keys(inks: Frame["inks"], house: string, added: string): string {
  const y = size.height - 8;
  const entry = (x: number, fill: string, words: string, stroke: string) =>
    box(x, y - 9, 24, 11, { fill, colour: stroke, width: 1 }) +
    label(x + 31, y, words, { size: 11.5, colour: inks.ink });
  return entry(size.left, inks.house, house, inks.house) + entry(size.left + 230, "url(#added)", added, inks.ink);
}

/**
 * The highest current in each half hour of the day with the chargepoint on top of it. `houseA` holds 48 amps, null
 * where none was given; the job adds what lies between the demand before and after it.
 */
export function demandDayChart(
  { houseA, existingA, afterA }: { houseA: readonly (number | null)[]; existingA: number; afterA: number },
  limits: DemandLimits,
  surface: Surface = "paper",
): Drawing {
  const addedA = afterA - existingA;
  const highest = Math.max(0, ...houseA.map((amps) => amps ?? 0)) + addedA;
  const drawn = frame(highest, limits, surface);
  const { inks, yOf } = drawn;
  const step = (size.right - size.left) / houseA.length;
  const column = (amps: number, base: number, index: number, fill: string, colour: string) =>
    box(size.left + index * step, yOf(amps), step, yOf(base) - yOf(amps), { fill, colour, width: 0 });
  const house = houseA
    .map((amps, index) => (amps === null ? "" : column(amps, 0, index, inks.house, inks.house)))
    .join("");
  const added = houseA
    .map((amps, index) => (amps === null ? "" : column(amps + addedA, amps, index, "url(#added)", inks.ink)))
    .join("");
  const outline = outlineOf(houseA, addedA, (index) => size.left + index * step, yOf);
  const worst = houseA.reduce<number>(
    (found, amps, index) => ((amps ?? -1) > (houseA[found] ?? -1) ? index : found),
    0,
  );
  const peakA = (houseA[worst] ?? 0) + addedA;
  const peakX = size.left + (worst + 0.5) * step;
  const clock = `${String(Math.floor(worst / 2)).padStart(2, "0")}:${worst % 2 ? "30" : "00"}`;
  const hours = [0, 6, 12, 18, 24].map((hour) =>
    label(size.left + hour * 2 * step, size.bottom + 16, `${String(hour).padStart(2, "0")}:00`, {
      anchor: hour === 24 ? "end" : hour === 0 ? "start" : "middle",
      size: 11,
      colour: inks.quiet,
    }),
  );
  const anchor = peakX > size.right - 90 ? "end" : peakX < size.left + 90 ? "start" : "middle";
  const marks =
    drawn.marks +
    house +
    added +
    path(outline, { colour: inks.ink, width: 1.4 }) +
    line(peakX, size.top - 3, peakX, yOf(peakA), { colour: inks.ink, width: 0.9 }) +
    drawn.names +
    dot(peakX, yOf(peakA), 3.5, { fill: inks.ink, colour: inks.ink }) +
    label(peakX, size.top - 8, `${amountOf(peakA, "A", 1)} at ${clock}`, {
      anchor,
      size: 12,
      strong: true,
      colour: inks.ink,
    }) +
    hours.join("") +
    line(size.left, size.bottom, size.right, size.bottom, { colour: inks.ink }) +
    keys(inks, "highest half hour, as recorded", "added by this job");
  const words = `Demand through the day. Highest: ${amountOf(peakA, "A", 1)} at ${clock}, of which ${amountOf(addedA, "A", 1)} is added by this job. ${limitWords(limits)}`;
  return picture(size.width, size.height, 140, words, marks, hatch("added", 45, 6, inks.ink, 1));
}

function outlineOf(
  houseA: readonly (number | null)[],
  addedA: number,
  xOf: (index: number) => number,
  yOf: (amps: number) => number,
): string {
  let d = "";
  houseA.forEach((amps, index) => {
    if (amps === null) return;
    const y = yOf(amps + addedA);
    d += `${houseA[index - 1] == null ? "M" : "L"}${xOf(index).toFixed(1)} ${y.toFixed(1)}H${xOf(index + 1).toFixed(1)}`;
  });
  return d || "M0 0";
}
