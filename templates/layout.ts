import type { Block } from "./model";
import { clockDate } from "./words/dates";
import type { DocumentModel, Text } from "./model";

/** What every renderer must do alike, so that screen, Word and PDF hold the same words in the same order. */

type Fact = Extract<Block, { kind: "facts" }>["rows"][number];

/** Longest value, in characters, that still stands in half a line. */
const halfLine = 22;

export const plain = (text: Text): string => (typeof text === "string" ? text : text.map((span) => span.text).join(""));

/** Facts laid two to a row where both are short enough; a long one takes a row of its own. */
export function factRows(rows: readonly Fact[], pairs: 1 | 2): readonly (readonly Fact[])[] {
  if (pairs === 1) return rows.map((row) => [row]);
  const laid: Fact[][] = [];
  let open = false;
  for (const row of rows) {
    const short = plain(row.value).length <= halfLine;
    const last = laid.at(-1);
    if (short && open && last) last.push(row);
    else laid.push([row]);
    open = short && !open;
  }
  return laid;
}

type Outcomes = { kind: "outcomes"; lines: readonly Extract<Block, { kind: "outcome" }>[] };
export type Laid = Exclude<Block, { kind: "outcome" }> | Outcomes;

/** Blocks with outcomes that follow each other gathered, since they are ruled as one list. */
export function laidOut(blocks: readonly Block[]): readonly Laid[] {
  const laid: Laid[] = [];
  for (const block of blocks) {
    const last = laid.at(-1);
    if (block.kind !== "outcome") laid.push(block);
    else if (last?.kind === "outcomes") laid[laid.length - 1] = { kind: "outcomes", lines: [...last.lines, block] };
    else laid.push({ kind: "outcomes", lines: [block] });
  }
  return laid;
}

export const runningHead = ({ jobNumber, version }: DocumentModel): string => `${jobNumber}, version ${version}`;

export const runningFoot = ({ issuedAt, ruleset }: DocumentModel): string =>
  `Issued ${clockDate(issuedAt)}. Rule set ${ruleset}.`;

/** The line under a declaration: who made it and when, or the space to sign. */
export const signatureLines = ({ role, name, at }: Extract<Block, { kind: "signature" }>): readonly Fact[] => [
  { label: "Name", value: name ?? "" },
  { label: "As", value: role },
  at === null ? { label: "Signature and date", value: "" } : { label: "Declared", value: clockDate(at) },
];
