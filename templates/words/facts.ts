import { longDate } from "@/lib/notify/calendar";
import { isNotKnown, type NotKnown } from "@/lib/notify/job/facts";

/** What is printed for a fact that was never asked; it must not look like an answer. */
export const notRecorded = "not recorded";

type Maybe<T> = T | NotKnown | null | undefined;

/** The three ways of not having a fact, each in its own words; null when there is one. */
export function absence(value: unknown): string | null {
  if (value === null || value === undefined || value === "") return notRecorded;
  if (isNotKnown(value)) return value === "unreadable" ? "could not be read" : "not known";
  return null;
}

/** A number as people write it: thousands parted by commas, no more than `decimals` places, none that say nothing. */
export function number(value: number, decimals = 3): string {
  const [whole = "0", part] = String(Number(value.toFixed(decimals))).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, ",");
  return part ? `${grouped}.${part}` : grouped;
}

/** A number with its unit, "0.21 Ω", or the words for not having it. */
export const amountOf = (value: Maybe<number>, unit: string, decimals = 3): string =>
  absence(value) ?? `${number(value as number, decimals)}${unit === "%" ? "" : " "}${unit}`;

/** Amps a phase: "24.8 A", or "63 A, 58 A, 56 A". */
export const phaseAmps = (values: readonly number[] | null | undefined): string =>
  values?.length ? values.map((value) => amountOf(value, "A", 2)).join(", ") : notRecorded;

export const yesNo = (value: Maybe<boolean>, yes = "yes", no = "no"): string => absence(value) ?? (value ? yes : no);

export const dayOf = (value: Maybe<string>): string => absence(value) ?? longDate(value as string);

export const textOf = (value: Maybe<string>): string => absence(value) ?? (value as string);

/** A word of the record in its printed form, from the table for that fact. */
export const wordOf = <W extends string>(table: Readonly<Record<W, string>>, value: W | null | undefined): string =>
  value === null || value === undefined ? notRecorded : table[value];

/** "a, b and c". */
export function listed(items: readonly string[]): string {
  const last = items.at(-1);
  if (last === undefined) return "none";
  return items.length === 1 ? last : `${items.slice(0, -1).join(", ")} and ${last}`;
}

/** Address lines and postcode on one line. */
export const addressOf = (lines: readonly string[] | null | undefined, postcode?: string | null): string => {
  const parts = [...(lines ?? []), postcode].filter((part): part is string => Boolean(part));
  return parts.length ? parts.join(", ") : notRecorded;
};
