import type { Outcome, Reason } from "@/lib/notify/result";
import { outcomeWord } from "./drawings/marks";
import type { Block, Text } from "./model";
import { citeAll, citeShort, sourceList } from "./words/sources";

/** What has to be looked at stands first; within an outcome the order of the rules is kept. */
const gravity: Readonly<Record<Outcome, number>> = { "not-met": 0, "cannot-tell": 1, met: 2, "not-applicable": 3 };

export const gravestFirst = <R extends { outcome: Outcome }>(reasons: readonly R[]): R[] =>
  [...reasons].sort((a, b) => gravity[a.outcome] - gravity[b.outcome]);

type Said = Pick<Reason, "outcome" | "title" | "because" | "sources">;

/** One rule's answer as a line of its own. */
export const outcomeLine = ({ outcome, title, because, sources }: Said): Block => ({
  kind: "outcome",
  outcome,
  title,
  because,
  sources: citeAll(sources),
});

export const outcomeLines = (reasons: readonly Said[]): Block[] => reasons.map(outcomeLine);

export const outcomeText = (outcome: Outcome): Text => [{ text: outcomeWord[outcome], strong: true, mark: outcome }];

const finding = ({ title, because, sources }: Reason): Text => [
  { text: `${title}. `, strong: true },
  { text: because },
  ...(sources.length ? [{ text: ` ${citeShort(sources)}.`, quiet: true as const }] : []),
];

/** Many rules' answers as a table: outcome, finding with its sources, what was recorded and the limit. Empty when none. */
export const checksTable = (caption: string, reasons: readonly Reason[]): Block[] =>
  reasons.length === 0
    ? []
    : [
        {
          kind: "table",
          caption,
          columns: [
            { heading: "Outcome", widthPercent: 18 },
            { heading: "Check", widthPercent: 50 },
            { heading: "Recorded", widthPercent: 16 },
            { heading: "Limit", widthPercent: 16 },
          ],
          rows: reasons.map((reason) => [
            outcomeText(reason.outcome),
            finding(reason),
            reason.recorded ?? "–",
            reason.limit ?? "–",
          ]),
        },
      ];

/**
 * The answers behind a decision as a table: those that speak first, then in one row the rules that do not apply
 * here. For a reader who has to act on the decision.
 */
export function reasonsTable(caption: string, reasons: readonly Reason[]): Block[] {
  const silent = reasons.filter(({ outcome }) => outcome === "not-applicable");
  const speaking = reasons.filter(({ outcome }) => outcome !== "not-applicable");
  if (reasons.length === 0) return [];
  return [
    {
      kind: "table",
      caption,
      columns: [
        { heading: "Outcome", widthPercent: 18 },
        { heading: "Because", widthPercent: 82 },
      ],
      rows: [
        ...speaking.map((reason): Text[] => [outcomeText(reason.outcome), finding(reason)]),
        ...(silent.length
          ? [[outcomeText("not-applicable"), `${silent.map(({ title }) => title).join("; ")}.`] satisfies Text[]]
          : []),
      ],
    },
  ];
}

/**
 * The sums behind the answers, each under the name of its check. A sum of which every line stands elsewhere already
 * is left out; one of which a line is new is printed whole, since a single line of a sum says nothing.
 */
export const workingsOf = (reasons: readonly Reason[], elsewhere: readonly string[] = []): Block[] =>
  reasons
    .filter(({ workings }) => workings.some((line) => !elsewhere.includes(line)))
    .map(({ title, workings }) => ({ kind: "workings", title, lines: workings }));

const order: readonly Outcome[] = ["met", "not-met", "cannot-tell", "not-applicable"];

const count = (reasons: readonly { outcome: Outcome }[], outcome: Outcome) =>
  String(reasons.filter((reason) => reason.outcome === outcome).length);

/** How many checks of each kind came out how. */
export const tallyTable = (
  caption: string,
  groups: readonly { name: string; reasons: readonly { outcome: Outcome }[] }[],
): Block => ({
  kind: "table",
  caption,
  columns: [
    { heading: "Checks", widthPercent: 36 },
    ...order.map((outcome) => ({ heading: outcomeWord[outcome], widthPercent: 16, align: "right" as const })),
  ],
  rows: groups.map(({ name, reasons }) => [name, ...order.map((outcome) => count(reasons, outcome))]),
});

/** The sources a document rests on, in full, as its last section. Empty when it cites none. */
export function sourcesSection(references: readonly string[]): Block[] {
  const items = sourceList(references);
  return items.length === 0
    ? []
    : [
        { kind: "heading", level: 1, text: "Sources" },
        { kind: "list", ordered: false, items },
      ];
}
