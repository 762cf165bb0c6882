import Link from "next/link";
import { withQuery, type Query } from "./query-link";

type Props = { path: string; query: Query; seen: number; shown: number; next: string | null };

/** Keyset pages: on to the next rows, or back to the first. */
export function Pager({ path, query, seen, shown, next }: Props) {
  if (!next && seen === 0) return null;
  return (
    <nav className="pager" aria-label="Pages">
      {seen > 0 && <Link href={withQuery(path, query)}>First page</Link>}
      {next && <Link href={withQuery(path, query, { after: next, seen: String(seen + shown) })}>Next page</Link>}
    </nav>
  );
}

/** "1 to 25 of 143", "none" */
export const rangeInWords = (seen: number, shown: number, total: number) =>
  shown === 0 ? "none" : `${seen + 1} to ${seen + shown} of ${Math.max(total, seen + shown).toLocaleString("en-GB")}`;
