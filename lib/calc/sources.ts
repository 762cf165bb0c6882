import { legislationSources } from "./sources/legislation";
import { networkSources } from "./sources/network";
import { wiringSources } from "./sources/wiring";

export type Source = {
  /** Stable id; a reference is the id alone or the id, a space and a clause. */
  id: string;
  /** Label for a table, where the title is too long: "ENA form", "BS 7671", "Our practice". */
  short: string;
  title: string;
  publisher: string;
  edition: string | null;
  /** Day the source was last read, or null when it was never seen and is cited from memory. */
  seenOn: string | null;
  /** What was seen: the text itself, another's account of it, or nothing. */
  seen: "primary" | "secondary" | "not seen";
};

/** Every source a rule or a figure may cite. */
export const sources: readonly Source[] = [...wiringSources, ...networkSources, ...legislationSources];

const byLength = [...sources].sort((a, b) => b.id.length - a.id.length);

/**
 * Resolves a reference such as `SI 2021/1467 reg 10` to its register entry and clause.
 * @throws Error when the register does not hold the source.
 */
export function sourceOf(reference: string): { source: Source; clause: string | null } {
  const source = byLength.find((entry) => reference === entry.id || reference.startsWith(`${entry.id} `));
  if (!source) throw new Error(`No source in the register for "${reference}".`);
  return { source, clause: reference.slice(source.id.length).trim() || null };
}
