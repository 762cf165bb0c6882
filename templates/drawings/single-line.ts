import type { Job } from "@/lib/notify/job";
import { dot, inksOf, label, line, picture, type Drawing, type Surface } from "./svg";
import { fitted } from "./text-width";
import { boardHeight, boardMarks, incomingAt, wayHeight } from "./single-line/board";
import { intakeHeight, intakeMarks, levels } from "./single-line/intake";
import { column, heights, sheet } from "./single-line/measures";
import { planOf, type BoardPlan } from "./single-line/plan";
import { singleLineWords } from "./single-line/words";

type Drawable = Pick<Job, "supply" | "boards" | "circuits" | "chargepoints">;

type Placed = { plan: BoardPlan; y: number; continued: boolean };

const widthMm = 170;

/**
 * The intake and every circuit of the job as one single-line diagram, however tall. `operatorName` is printed over
 * the service. For paper use `singleLineSheets`.
 */
export const singleLine = (job: Drawable, operatorName: string, surface: Surface = "paper"): Drawing =>
  drawSheet(job, operatorName, placed(planOf(job), Infinity)[0] ?? [], surface, "");

/** The same diagram parted into sheets that each fit a page of A4, the intake repeated on each. */
export function singleLineSheets(job: Drawable, operatorName: string, surface: Surface = "paper"): Drawing[] {
  const sheets = placed(planOf(job), sheet.tallest);
  if (sheets.length === 0) return [drawSheet(job, operatorName, [], surface, "")];
  return sheets.map((boards, index) =>
    drawSheet(job, operatorName, boards, surface, sheets.length > 1 ? `Sheet ${index + 1} of ${sheets.length}. ` : ""),
  );
}

/** Boards laid down the sheet; one too long for what is left goes on, named again, on the next. */
function placed(plans: readonly BoardPlan[], tallest: number): Placed[][] {
  const sheets: Placed[][] = [];
  let y = tallest;
  for (const plan of plans) {
    let rest = plan.ways;
    let continued = false;
    do {
      const first = rest[0];
      const least = heights.boardHead + (first ? wayHeight(first) : 30);
      if (sheets.length === 0 || y + least > tallest) {
        sheets.push([]);
        y = top;
      }
      let taken = rest.length ? 1 : 0;
      while (taken < rest.length && y + boardHeight({ ways: rest.slice(0, taken + 1) }) <= tallest) taken += 1;
      const part = { ...plan, ways: rest.slice(0, taken) };
      sheets.at(-1)?.push({ plan: part, y, continued });
      y += boardHeight(part) + heights.boardGap;
      rest = rest.slice(taken);
      continued = true;
    } while (rest.length);
  }
  return sheets;
}

const top = 22;

function drawSheet(
  job: Drawable,
  operatorName: string,
  boards: Placed[],
  surface: Surface,
  sheetWords: string,
): Drawing {
  const inks = inksOf[surface];
  const last = boards.at(-1);
  const height = Math.max(intakeHeight(job), last ? last.y + boardHeight(last.plan) + 12 : 0);
  const alt = `Single-line diagram. ${sheetWords}${singleLineWords(
    job,
    operatorName,
    boards.map(({ plan }) => plan),
  )}`;
  const marks =
    intakeMarks(job, operatorName, surface) +
    lanes(boards, inks.ink) +
    boards
      .map(({ plan, y, continued }) => boardMarks(plan, { y, surface, continued }) + feedMarks(plan, y, inks.ink))
      .join("");
  return picture(sheet.width, height, widthMm, alt, marks);
}

const incomingOf = ({ y }: Placed) => y + incomingAt;
const earthOf = ({ y }: Placed) => y + incomingAt + 14;

/** Tails and protective conductors down beside the boards that hang on the tails. */
function lanes(boards: readonly Placed[], ink: string): string {
  const onTails = boards.filter(
    ({ plan }) => plan.fedBy === null && plan.ways.every(({ circuit }) => circuit !== null),
  );
  if (onTails.length === 0) return "";
  const wires = onTails.map(incomingOf);
  const earths = onTails.map(earthOf);
  const right = column.intakeRight - 4;
  return (
    line(column.tails, Math.min(levels.tails, ...wires), column.tails, Math.max(levels.tails, ...wires), {
      colour: ink,
      width: 1.8,
    }) +
    onTails
      .map(
        (board) =>
          line(column.tails, incomingOf(board), column.board, incomingOf(board), { colour: ink }) +
          dot(column.tails, incomingOf(board), 2.6, { fill: ink, colour: ink }) +
          line(column.earth, earthOf(board), column.board, earthOf(board), { colour: ink, dash: "7 3 2 3" }),
      )
      .join("") +
    line(right, levels.terminal, column.earth, levels.terminal, { colour: ink, dash: "7 3 2 3" }) +
    line(column.earth, Math.min(levels.terminal, ...earths), column.earth, Math.max(levels.terminal, ...earths), {
      colour: ink,
      dash: "7 3 2 3",
    })
  );
}

/** A board behind another one says which circuit it is fed from, over its upper edge. */
function feedMarks({ fedBy }: BoardPlan, y: number, ink: string): string {
  if (fedBy === null) return "";
  return (
    label(column.board + 6, y - 6, fitted(`from circuit ${fedBy}`, 10, column.boardRight - column.board - 12), {
      size: 10,
      colour: ink,
    }) +
    line(column.board - 8, y + incomingAt, column.board, y + incomingAt, { colour: ink }) +
    dot(column.board - 11, y + incomingAt, 3, { colour: ink, fill: inksOf.paper.paper })
  );
}
