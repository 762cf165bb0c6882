import { sources } from "@/lib/calc/sources";
import type { Source } from "@/lib/calc/sources";

const byLength = [...sources].sort((a, b) => b.id.length - a.id.length);

type Cited = { source: Source | null; clause: string };

function cited(reference: string): Cited {
  const source = byLength.find(({ id }) => reference === id || reference.startsWith(`${id} `)) ?? null;
  return { source, clause: source ? reference.slice(source.id.length).trim() : reference };
}

/** Standards and instruments are known by their designation; our own ids are not for a reader. */
const isDesignation = (id: string) => /^[A-Z]/.test(id);

const nameOf = (source: Source) => (isDesignation(source.id) ? source.id : source.title);

/** References with the clauses of one source gathered: "BS 7671:2018+A4:2026, 433.1, 722.311". */
function gathered(references: readonly string[], name: (source: Source) => string): string[] {
  const clauses = new Map<string, Set<string>>();
  for (const reference of references) {
    const { source, clause } = cited(reference);
    const key = source === null ? reference : name(source);
    const known = clauses.get(key) ?? new Set();
    if (source !== null && clause) known.add(clause);
    clauses.set(key, known);
  }
  return [...clauses].map(([key, each]) => [key, ...each].join(", "));
}

/** The sources of an answer as a document cites them. */
export const citeAll = (references: readonly string[]): string[] => gathered(references, nameOf);

/** The same, shorter, for a table. */
export const citeShort = (references: readonly string[]): string =>
  gathered(references, ({ short }) => short).join("; ");

const howSeen: Readonly<Record<Source["seen"], string>> = {
  primary: "read in the source itself",
  secondary: "read in another's account of it",
  "not seen": "cited from memory, to be verified",
};

/** Every source behind the references, once, in full, with how it was read. */
export function sourceList(references: readonly string[]): string[] {
  const found = new Map<string, string>();
  for (const reference of references) {
    const { source } = cited(reference);
    if (source === null) found.set(reference, reference);
    else {
      const name =
        isDesignation(source.id) && !source.title.startsWith(source.id)
          ? `${source.id}: ${source.title}`
          : source.title;
      const edition = source.edition ? `, ${source.edition}` : "";
      found.set(source.id, `${name}. ${source.publisher}${edition}; ${howSeen[source.seen]}.`);
    }
  }
  return [...found.values()].sort();
}
