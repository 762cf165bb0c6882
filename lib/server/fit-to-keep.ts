import type { FieldError } from "@/lib/notify/result";

/** The fullest record has about 12 levels and 20,000 values; beyond these it is not one of ours. */
const most = { levels: 40, values: 50_000 } as const;

/** Text that PostgreSQL can hold: no NUL, no half of a surrogate pair (its text and jsonb refuse both). */
export const isFitText = (text: string): boolean => !/[\0\p{Surrogate}]/u.test(text);

type Open = { value: unknown; path: string; level: number };

const within = ({ value, path, level }: Open): Open[] => {
  if (Array.isArray(value)) {
    return value.map((item: unknown, index) => ({ value: item, path: `${path}[${index}]`, level: level + 1 }));
  }
  const prototype: unknown = value !== null && typeof value === "object" ? Object.getPrototypeOf(value) : undefined;
  if (prototype !== Object.prototype && prototype !== null) return []; // text, numbers, files
  return Object.entries(value as object).map(([key, item]: [string, unknown]) => ({
    value: item,
    path: path ? `${path}.${key}` : key,
    level: level + 1,
  }));
};

/**
 * What makes an input impossible to keep, as a field error, or null. Looked at before any schema is, in a loop and
 * not by recursion, so that nesting cannot exhaust the stack and size cannot hold the process.
 */
export function unfit(input: unknown): FieldError | null {
  const open: Open[] = [{ value: input, path: "", level: 0 }];
  let seen = 0;
  for (let here = open.pop(); here; here = open.pop()) {
    seen += 1;
    if (seen > most.values) return { path: "", message: "holds more values than a record can" };
    if (here.level > most.levels) return { path: "", message: "is nested deeper than a record can be" };
    const texts = [here.value, here.path].filter((text) => typeof text === "string");
    if (!texts.every(isFitText)) {
      const path = isFitText(here.path) ? here.path : "";
      return { path, message: "holds a character that cannot be kept; type it again" };
    }
    const inside = within(here);
    if (open.length + inside.length > most.values) {
      return { path: "", message: "holds more values than a record can" };
    }
    for (const item of inside) open.push(item);
  }
  return null;
}
