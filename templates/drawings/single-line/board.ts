import type { Board, Circuit } from "@/lib/notify/job";
import { cableLength, cableSize, deviceName, rcdName } from "../../words/equipment";
import { amountOf } from "../../words/facts";
import { arrangementWords, rcdTypeWords, surgeWords } from "../../words/vocabulary";
import { box, dot, inksOf, label, line, type Surface } from "../svg";
import { fitted, wrapped } from "../text-width";
import { column, heights } from "./measures";
import type { BoardPlan, Way } from "./plan";
import { breakerSymbol, fuseSymbol, rcdSymbol, switchSymbol } from "./symbols";
import { unitHeight, unitMarks } from "./unit";

const fuseKinds = ["BS88-2", "BS88-3", "BS1361", "BS3036"];

export const wayHeight = ({ units }: Way): number =>
  Math.max(
    heights.way,
    units.reduce((sum, unit) => sum + unitHeight(unit) + heights.unitGap, 0),
  );

export const boardHeight = ({ ways }: Pick<BoardPlan, "ways">): number =>
  heights.boardHead + (ways.length ? ways.reduce((sum, way) => sum + wayHeight(way), 0) : 30);

export const boardTitle = ({ name, board, ways }: BoardPlan, continued: boolean): string => {
  if (name === null) return ways.some(({ circuit }) => circuit) ? "Board not recorded" : "Circuit not recorded";
  const kind = board?.arrangement ? `, ${arrangementWords[board.arrangement]}` : "";
  return `Board ${name}${kind}${continued ? ", continued" : ""}`;
};

/** "5 ways, 100 A assembly" and the surge protection, as far as recorded. */
export const boardLines = (board: Board | null): string[] =>
  board === null
    ? []
    : [
        [
          board.ways === null ? null : `${board.ways} ways`,
          board.assemblyRatingA === null ? null : `assembly ${amountOf(board.assemblyRatingA, "A")}`,
        ]
          .filter(Boolean)
          .join(", ") || "ways not recorded",
        board.surgeProtection === null ? "surge protection not recorded" : surgeWords[board.surgeProtection],
      ];

type At = { y: number; surface: Surface; continued: boolean };

/** A board with its ways, `y` its upper edge. The incoming conductor meets it at `y + incoming`. */
export function boardMarks(plan: BoardPlan, { y, surface, continued }: At): string {
  const inks = inksOf[surface];
  const height = boardHeight(plan);
  const named = plan.name !== null;
  const incoming = y + incomingAt;
  const hasCircuits = plan.ways.some(({ circuit }) => circuit);
  const titleRoom = column.boardRight - column.board - 12;
  const [first, second] = boardLines(plan.board);
  let at = y + heights.boardHead;
  let lastLevel = incoming;
  const ways = plan.ways.map((way) => {
    const level = at + wayLevel;
    if (way.circuit) lastLevel = level;
    const marks = wayMarks(way, at, level, surface);
    at += wayHeight(way);
    return marks;
  });
  return (
    box(column.board, y, column.boardRight - column.board, height, {
      colour: inks.ink,
      width: 1.5,
      dash: named ? undefined : "5 4",
    }) +
    label(column.board + 6, y + 14, fitted(boardTitle(plan, continued), 10.5, titleRoom, true), {
      size: 10.5,
      strong: true,
      colour: inks.ink,
    }) +
    (first
      ? label(column.deviceText - 18, y + 28, fitted(first, 10, column.boardRight - column.deviceText + 12), {
          size: 10,
          colour: inks.quiet,
        })
      : "") +
    (second
      ? label(column.deviceText - 18, y + 41, fitted(second, 10, column.boardRight - column.deviceText + 12), {
          size: 10,
          colour: inks.quiet,
        })
      : "") +
    (hasCircuits
      ? line(column.board, incoming, column.board + 10, incoming, { colour: inks.ink }) +
        switchSymbol(column.board + 10, incoming, inks.ink) +
        line(column.board + 29, incoming, column.busbar, incoming, { colour: inks.ink }) +
        line(column.busbar, incoming, column.busbar, lastLevel, { width: 2.4, colour: inks.ink })
      : "") +
    (plan.ways.length === 0
      ? label(column.board + 6, y + heights.boardHead + 12, "no circuit of this job recorded", {
          size: 10,
          colour: inks.quiet,
        })
      : "") +
    ways.join("")
  );
}

export const incomingAt = 36;
const wayLevel = 34;

function wayMarks(way: Way, top: number, level: number, surface: Surface): string {
  const { circuit, units, feeds } = way;
  const inks = inksOf[surface];
  let at = top + wayLevel - 31;
  const ends = units.map((unit) => {
    const marks = unitMarks(unit, at, surface);
    const middle = at + 31;
    at += unitHeight(unit) + heights.unitGap;
    return { marks, middle };
  });
  const lastMiddle = ends.at(-1)?.middle ?? level;
  const joint = column.cableRight + 20;
  const links =
    ends
      .map(({ middle }) =>
        line(joint, middle, column.unit, middle, { colour: inks.ink, dash: circuit ? undefined : "3 3" }),
      )
      .join("") + (ends.length > 1 ? line(joint, level, joint, lastMiddle, { colour: inks.ink }) : "");
  const end = ends.length ? links : circuit ? endMarks(circuit, feeds, level, surface) : "";
  return (
    (circuit ? circuitMarks(circuit, level, surface) : looseMarks(level, surface)) +
    end +
    ends.map(({ marks }) => marks).join("")
  );
}

const looseMarks = (level: number, surface: Surface) =>
  line(column.boardRight, level, column.cableRight + 20, level, { colour: inksOf[surface].ink, dash: "3 3" }) +
  label(column.board + 6, level + 4, "circuit of this unit not recorded", { size: 10, colour: inksOf[surface].quiet });

/** What stands at the end of a way without a unit: the boards it feeds, or that nothing is recorded. */
function endMarks({ kind }: Circuit, feeds: readonly string[], level: number, surface: Surface): string {
  const inks = inksOf[surface];
  const words = feeds.length
    ? `to ${feeds.join(" and ")}`
    : kind === "distribution"
      ? "board at the end not recorded"
      : "no chargepoint recorded";
  const lines = wrapped(words, 10, column.unitRight - column.unit - 10, 3);
  return (
    line(column.cableRight + 20, level, column.unit, level, { colour: inks.ink }) +
    dot(column.unit, level, 3, { fill: inks.paper, colour: inks.ink }) +
    lines
      .map((text, row) => label(column.unit + 9, level + 3.5 + row * 12, text, { size: 10, colour: inks.ink }))
      .join("")
  );
}

function circuitMarks(circuit: Circuit, level: number, surface: Surface): string {
  const inks = inksOf[surface];
  const { device, upstreamRcds, cable, isolator } = circuit;
  const fused = device.kind !== null && fuseKinds.includes(device.kind);
  const inRoom = column.boardRight - column.deviceText - 6;
  const cableRoom = column.cableRight - column.cableText;
  const upstream = upstreamRcds?.[0];
  const under = [
    ...wrapped(rcdName(device), 10, inRoom - 16, 2),
    ...(upstream
      ? [
          `before it ${amountOf(upstream.ratedMa, "mA")} ${upstream.type ? rcdTypeWords[upstream.type] : ""}${(upstreamRcds?.length ?? 0) > 1 ? " and more" : ""}`,
        ]
      : []),
  ];
  const ringed = device.rcdType !== null && device.rcdType !== "none" && device.rcdPlace !== "in-chargepoint";
  const method = cable.referenceMethod;
  const laid = method === null ? "method not recorded" : method === "unknown" ? "method not known" : `method ${method}`;
  const isolated = isolator === true ? "isolator" : isolator === null ? "isolator not recorded" : "isolator not known";
  const beneath = [cableLength(cable), laid, ...(isolator === false ? [] : [isolated])];
  return (
    dot(column.busbar, level, 2.6, { fill: inks.ink, colour: inks.ink }) +
    line(column.busbar, level, column.device, level, { colour: inks.ink }) +
    (fused ? fuseSymbol(column.device, level, inks.ink) : breakerSymbol(column.device, level, inks.ink)) +
    line(column.device + 19, level, column.cableRight, level, { colour: inks.ink }) +
    (ringed ? rcdSymbol(column.boardRight - 12, level, inks.ink) : "") +
    label(column.deviceText, level - 8, fitted(`${circuit.id}: ${deviceName(device)}`, 10, inRoom, true), {
      size: 10,
      strong: true,
      colour: inks.ink,
    }) +
    under
      .map((text, row) =>
        label(column.deviceText, level + 13 + row * 12, fitted(text, 10, inRoom - 16), {
          size: 10,
          colour: inks.quiet,
        }),
      )
      .join("") +
    label(column.cableText, level - 6, fitted(cableSize(cable), 10, cableRoom), { size: 10, colour: inks.ink }) +
    beneath
      .map((text, row) =>
        label(column.cableText, level + 13 + row * 12, fitted(text, 10, cableRoom), { size: 10, colour: inks.quiet }),
      )
      .join("") +
    (isolator === true
      ? switchSymbol(column.cableRight, level, inks.ink) +
        line(column.cableRight + 19, level, column.cableRight + 20, level, { colour: inks.ink })
      : line(column.cableRight, level, column.cableRight + 20, level, { colour: inks.ink }))
  );
}
