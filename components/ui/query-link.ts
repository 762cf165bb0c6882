import type { Route } from "next";

export type Query = Readonly<Record<string, string | null | undefined>>;

/** An address with its query; blank values are left out, so that an unfiltered page has a plain address. */
export function withQuery(path: string, ...queries: Query[]): Route {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(Object.assign({}, ...queries) as Query))
    if (value) search.set(name, value);
  const text = search.toString();
  return (text ? `${path}?${text}` : path) as Route;
}

/** The first value of a search parameter, trimmed; null when absent or blank. */
export function oneOf(value: string | string[] | undefined): string | null {
  const first = (Array.isArray(value) ? value[0] : value)?.trim();
  return first ? first.slice(0, 200) : null;
}

/** The value if it could be one of our ids, else null. */
export function idOf(value: string | string[] | undefined): string | null {
  const text = oneOf(value);
  return text && /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text) ? text : null;
}

/** The value if it is one of the allowed words, else null: what stands in an address is anybody's typing. */
export const wordOf = <T extends string>(value: string | string[] | undefined, allowed: readonly T[]): T | null =>
  allowed.find((word) => word === oneOf(value)) ?? null;
