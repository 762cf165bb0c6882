import type { Issue } from "./issue";
import type { Block } from "./model";
import { absence } from "./words/facts";

/** A changed value in a few words; lists and groups as their JSON, which is what the record holds. */
function shown(value: unknown): string {
  const missing = absence(value);
  if (missing) return missing;
  if (typeof value === "boolean") return value ? "yes" : "no";
  return typeof value === "string" || typeof value === "number" ? String(value) : cut(JSON.stringify(value));
}

const longest = 160;
const cut = (text: string) => (text.length > longest ? `${text.slice(0, longest)} ...` : text);

/** What differs from the version before, field by field; dates first, each with its old value and its new one. */
export function changesSection({ version, changes }: Issue): Block[] {
  if (changes.length === 0) return [];
  const dates = changes.filter(({ path }) => path.startsWith("dates."));
  const others = changes.filter(({ path }) => !path.startsWith("dates."));
  return [
    { kind: "heading", level: 1, text: `Changes since version ${version - 1}` },
    ...(dates.length
      ? [
          {
            kind: "caution",
            title: "A date was changed",
            text: dates.map(({ path, was, now }) => `${path}: was ${shown(was)}, now ${shown(now)}.`).join(" "),
          } as const,
        ]
      : []),
    {
      kind: "table",
      caption: "Fields of the job record that differ.",
      columns: [
        { heading: "Field", widthPercent: 34, mono: true },
        { heading: "Was", widthPercent: 33 },
        { heading: "Now", widthPercent: 33 },
      ],
      rows: [...dates, ...others].map(({ path, was, now }) => [path, shown(was), shown(now)]),
    },
  ];
}
