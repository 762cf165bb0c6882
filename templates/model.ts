import type { Outcome } from "@/lib/notify/result";

/**
 * Inline text: plain, or a run of spans. `mono` is for identifiers and measured values; `mark` draws the
 * outcome's shape before the text, which must hold the outcome's word.
 */
export type Span = { text: string; strong?: true; mono?: true; quiet?: true; mark?: Outcome };
export type Text = string | readonly Span[];

export type TableColumn = {
  heading: string;
  /** Share of the text width, the columns of a table sum to 100. */
  widthPercent: number;
  align?: "left" | "right";
  mono?: true;
};

/**
 * The blocks a document may hold. Each renderer (docx, screen, PDF) has one exhaustive table over
 * `kind` and throws on a kind it does not know, so that no paragraph can silently go missing.
 */
export type Block =
  | { kind: "heading"; level: 1 | 2 | 3; text: string }
  | { kind: "paragraph"; text: Text }
  /** Label and value, two pairs to a row where they fit. Unknown values read "not recorded". */
  | { kind: "facts"; rows: readonly { label: string; value: Text }[]; pairs?: 1 | 2 }
  | { kind: "table"; caption: string; columns: readonly TableColumn[]; rows: readonly (readonly Text[])[] }
  | { kind: "list"; ordered: boolean; items: readonly Text[] }
  | { kind: "outcome"; outcome: Outcome; title: string; because: string; sources: readonly string[] }
  | { kind: "workings"; title: string; lines: readonly string[] }
  | { kind: "caution"; title: string; text: string }
  /** A drawing as SVG text with its alternative; `widthMm` on A4 (170 mm of text width). */
  | { kind: "figure"; svg: string; alt: string; caption: string; widthMm: number; heightMm: number }
  /** A ruled space to sign in, or the name and time of a declaration already made. */
  | { kind: "signature"; role: string; name: string | null; at: string | null; statement: string };

export type DocumentModel = {
  /** File stem in the pack, `01-network-notification`. */
  slug: string;
  title: string;
  subtitle: string;
  /** Running head: firm at the left, job number and version at the right. */
  firmName: string;
  jobNumber: string;
  version: number;
  /** Issue time, UTC instant. */
  issuedAt: string;
  /** Rule set that the assessment was made under; printed in the footer. */
  ruleset: string;
  blocks: readonly Block[];
};
