import { amountOf, number } from "../words/facts";
import { dot, hatch, inksOf, label, line, path, picture, type Drawing, type Surface } from "./svg";
import { textWidth } from "./text-width";

export type TouchVoltage = {
  /** Voltage for each resistance, in rising order, from the rule's own formula. */
  curve: readonly { ohm: number; volts: number }[];
  limitV: number;
  /** Largest resistance that keeps to the limit. */
  mostOhm: number | null;
  /** The electrode as measured, with the voltage the rule worked out. */
  measured: { ohm: number; volts: number } | null;
  /** Demand the curve is drawn for: the whole of it, no limit counted. */
  demandA: number;
};

const size = { width: 640, height: 320, left: 62, right: 622, top: 26, bottom: 258 } as const;
const decades = { from: -1, to: 2 } as const;

const xOf = (ohm: number) => {
  const along = (Math.log10(Math.max(ohm, 10 ** decades.from)) - decades.from) / (decades.to - decades.from);
  return size.left + Math.min(1, along) * (size.right - size.left);
};

/** Touch voltage with the PEN open against the resistance of the electrode, on a scale of tens. */
export function touchVoltage(chart: TouchVoltage, surface: Surface = "paper"): Drawing {
  const inks = inksOf[surface];
  const { curve, limitV, mostOhm, measured, demandA } = chart;
  const topV = Math.max(limitV, ...curve.map(({ volts }) => volts)) * 1.05;
  const yOf = (volts: number) => size.bottom - (volts / topV) * (size.bottom - size.top);
  const points = curve.map(({ ohm, volts }) => `${xOf(ohm).toFixed(1)} ${yOf(volts).toFixed(1)}`);
  const above = curve
    .filter(({ volts }) => volts >= limitV)
    .map(({ ohm, volts }) => `${xOf(ohm).toFixed(1)} ${yOf(volts).toFixed(1)}`);
  const crossing = mostOhm === null ? null : { x: xOf(mostOhm), y: yOf(limitV) };
  const over = [
    ...(crossing ? [`${crossing.x.toFixed(1)} ${crossing.y.toFixed(1)}`] : []),
    ...above,
    `${size.right} ${yOf(limitV).toFixed(1)}`,
  ];
  const tens = Array.from({ length: decades.to - decades.from + 1 }, (_, index) => 10 ** (decades.from + index));
  const grid = tens.map(
    (ohm, index) =>
      line(xOf(ohm), size.top, xOf(ohm), size.bottom, { colour: inks.rule, width: 0.8 }) +
      label(xOf(ohm), size.bottom + 16, `${number(ohm)}${index === 0 || index === tens.length - 1 ? " Ω" : ""}`, {
        anchor: index === tens.length - 1 ? "end" : "middle",
        size: 11,
        colour: inks.quiet,
      }),
  );
  const volts = [0, 140, 210]
    .filter((value) => value <= topV)
    .map(
      (value) =>
        line(size.left, yOf(value), size.right, yOf(value), { colour: inks.rule, width: 0.8 }) +
        label(size.left - 8, yOf(value) + 4, `${value} V`, { anchor: "end", size: 11, colour: inks.quiet }),
    );
  const marks =
    grid.join("") +
    volts.join("") +
    (above.length ? path(`M${over.join("L")}Z`, { colour: "none", width: 0, fill: "url(#over)" }) : "") +
    path(`M${points.join("L")}`, { colour: inks.ink, width: 2.2 }) +
    line(size.left, yOf(limitV), size.right, yOf(limitV), { colour: inks.ink, width: 3 }) +
    label(size.left - 8, yOf(limitV) + 4, `${number(limitV)} V`, {
      anchor: "end",
      size: 11.5,
      strong: true,
      colour: inks.ink,
    }) +
    (crossing && mostOhm !== null ? crossingMarks(crossing.x, crossing.y, mostOhm, inks) : "") +
    (measured ? measuredMarks(measured, yOf, inks) : "") +
    label((size.left + size.right) / 2, size.height - 10, "resistance of the electrode, each step ten times", {
      anchor: "middle",
      size: 11,
      colour: inks.quiet,
    });
  return picture(size.width, size.height, 140, words(chart, demandA), marks, hatch("over", 45, 6, inks.quiet, 0.9));
}

type Ink = (typeof inksOf)[Surface];

/** The open dot where the curve meets the limit; its words stand low, under the limit's line. */
const crossingMarks = (x: number, y: number, mostOhm: number, inks: Ink): string => {
  const words = `${amountOf(mostOhm, "Ω", 2)} at most`;
  const wide = textWidth(words, 11.5, true);
  return (
    line(x, y, x, size.bottom, { colour: inks.ink, width: 1.1, dash: "3 3" }) +
    dot(x, y, 4.5, { fill: inks.paper, colour: inks.ink, width: 1.8 }) +
    label(x + 8 + wide > size.right ? size.right : x + 8, size.bottom - 8, words, {
      size: 11.5,
      strong: true,
      colour: inks.ink,
      patch: inks.paper,
      anchor: x + 8 + wide > size.right ? "end" : "start",
    })
  );
};

function measuredMarks(
  { ohm, volts }: { ohm: number; volts: number },
  yOf: (volts: number) => number,
  inks: Ink,
): string {
  const words = `measured ${amountOf(ohm, "Ω", 2)}, ${amountOf(volts, "V", 0)}`;
  const x = xOf(ohm);
  const leftward = x - 10 - textWidth(words, 11.5, true) > size.left;
  // Over the plot, where neither the curve nor the words of the crossing reach.
  return (
    line(x, size.top - 4, x, size.bottom, { colour: inks.ink, width: 1 }) +
    dot(x, yOf(volts), 4.5, { fill: inks.ink, colour: inks.ink }) +
    label(leftward ? x + 4 : size.left, size.top - 10, words, {
      anchor: leftward ? "end" : "start",
      size: 11.5,
      strong: true,
      colour: inks.ink,
    })
  );
}

const words = ({ limitV, mostOhm, measured }: TouchVoltage, demandA: number): string =>
  `Touch voltage with the PEN open against electrode resistance, for a demand of ${amountOf(demandA, "A", 1)}. ` +
  `The limit of ${amountOf(limitV, "V")} is met up to ${mostOhm === null ? "a resistance that cannot be told" : amountOf(mostOhm, "Ω", 2)}. ` +
  (measured
    ? `Measured: ${amountOf(measured.ohm, "Ω", 2)}, which gives ${amountOf(measured.volts, "V", 0)}.`
    : "No measured resistance is recorded.");
