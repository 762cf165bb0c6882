import { longDate } from "../calendar";
import { isNotKnown } from "../job/facts";

/** One datum an operator receives. A value that is not recorded is null, never left out. */
export type NotificationRow = { key: string; label: string; value: string | null; unit: string | null };
export type NotificationSection = { section: string; rows: NotificationRow[] };

export const notKnownWords = "Not known";

/** A row of text; a list is joined by commas, an empty one reads "None". */
export function textRow(key: string, label: string, value: string | readonly string[] | null): NotificationRow {
  const text = typeof value === "string" || value === null ? value : value.join(", ") || "None";
  return { key, label, value: text, unit: null };
}

/** A row of one figure with its unit; looked at and not told reads "Not known" and has no unit. */
export function figureRow(key: string, label: string, value: unknown, unit: string): NotificationRow {
  if (isNotKnown(value)) return { key, label, value: notKnownWords, unit: null };
  return typeof value === "number" ? { key, label, value: String(value), unit } : { key, label, value: null, unit };
}

/** A row of one figure a phase, with as many decimals as asked. */
export const phasesRow = (
  key: string,
  label: string,
  values: readonly number[] | null,
  unit: string,
  decimals: number,
): NotificationRow => ({
  key,
  label,
  value: values?.map((each) => each.toFixed(decimals)).join(", ") ?? null,
  unit,
});

export const dateRow = (key: string, label: string, day: string | null): NotificationRow => ({
  key,
  label,
  value: day === null ? null : longDate(day),
  unit: null,
});

/** Yes, no, or not known. */
export function observedRow(key: string, label: string, value: unknown): NotificationRow {
  const words = value === true ? "Yes" : value === false ? "No" : isNotKnown(value) ? notKnownWords : null;
  return { key, label, value: words, unit: null };
}

/** The words of a choice, null while it is not made. */
export const choiceRow = <K extends string>(
  key: string,
  label: string,
  value: K | null,
  words: Record<K, string>,
): NotificationRow => ({ key, label, value: value === null ? null : words[value], unit: null });
