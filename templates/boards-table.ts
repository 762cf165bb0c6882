import type { Board } from "@/lib/notify/job";
import type { Block } from "./model";
import { amountOf, notRecorded, number, wordOf } from "./words/facts";
import { arrangementWords, surgeWords } from "./words/vocabulary";

const reasonWords: Readonly<Record<NonNullable<Board["reason"]>, string>> = {
  "existing-full": "the existing one is full",
  "existing-unsuitable": "the existing one is not suitable",
  "customer-choice": "the customer's choice",
  none: "no reason given",
};

const modulesOf = ({ modules }: Board): string => {
  const counts = [
    ["main switch", modules.mainSwitch],
    ["surge protection", modules.surgeProtection],
    ["circuits", modules.circuitProtection],
    ["other", modules.other],
  ] as const;
  return counts.map(([name, count]) => `${name} ${count === null ? notRecorded : number(count)}`).join(", ");
};

/** The boards of the job with what they hold, under their own heading. */
export const boardsTable = (boards: readonly Board[]): Block[] => [
  { kind: "heading", level: 1, text: "Boards" },
  boards.length === 0
    ? { kind: "paragraph", text: "No board is recorded." }
    : {
        kind: "table",
        caption: "Boards, with their modules.",
        columns: [
          { heading: "Board", widthPercent: 24 },
          { heading: "Ways", widthPercent: 10, align: "right" },
          { heading: "Modules", widthPercent: 32 },
          { heading: "Assembly", widthPercent: 16 },
          { heading: "Surge protection", widthPercent: 18 },
        ],
        rows: boards.map((board) => [
          `${board.id}, ${wordOf(arrangementWords, board.arrangement)}${board.reason && board.reason !== "none" ? `: ${reasonWords[board.reason]}` : ""}`,
          board.ways === null ? notRecorded : number(board.ways),
          modulesOf(board),
          `${amountOf(board.assemblyRatingA, "A")}, ${amountOf(board.conditionalFaultRatingKa, "kA")}`,
          wordOf(surgeWords, board.surgeProtection),
        ]),
      },
];
