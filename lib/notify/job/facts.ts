import { z } from "zod";

/** Somebody looked and could not tell. Not the same as not asked yet (`null`). */
export const notKnown = z.enum(["unknown", "unreadable"]);
export type NotKnown = z.infer<typeof notKnown>;

/** A fact that may not have been asked yet: omitted and `null` both read as `null`. */
export const fact = <S extends z.ZodType>(schema: S) => schema.nullable().default(null);

/** One line of text. */
export const text = (most = 200) => z.string().trim().max(most, `use at most ${most} characters`);

/** One of a list of words; the message names them. */
export const word = <const W extends readonly [string, ...string[]]>(words: W) =>
  z.enum(words, { error: () => `choose one of: ${words.join(", ")}` });

/** A figure inside its believable range, in the unit of its name, or not known. */
export const amount = (least: number, most: number, unit: string) =>
  z.union(
    [
      z
        .number()
        .min(least, `must be at least ${least} ${unit}; read it again or choose "unknown"`)
        .max(most, `must be at most ${most} ${unit}; read it again or choose "unknown"`),
      notKnown,
    ],
    { error: (issue) => rangeMessage(issue, least, most, unit) },
  );

function rangeMessage(issue: { input?: unknown }, least: number, most: number, unit: string): string {
  if (typeof issue.input === "number")
    return `must be between ${least} and ${most} ${unit}; read it again or choose "unknown"`;
  return `must be a number in ${unit} without quotation marks, or "unknown"`;
}

/** A plain figure, for what the firm decides or declares and so always knows. */
export const figure = (least: number, most: number, unit: string) =>
  z
    .number({ error: () => `must be a number in ${unit} without quotation marks` })
    .min(least, `must be at least ${least} ${unit}`)
    .max(most, `must be at most ${most} ${unit}`);

/** Something seen on site: yes, no, or looked and could not tell. */
export const observed = z.union([z.boolean(), notKnown], {
  error: () => 'must be true, false or "unknown"',
});

const isRealDay = (value: string) => {
  const day = new Date(`${value}T00:00:00Z`);
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(value);
};

/** A calendar day between 2000 and 2049, local to Europe/London. */
export const isoDate = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}$/, "write the date as YYYY-MM-DD, for example 2026-12-01")
  .refine(isRealDay, "is not a day in the calendar; check the day and the month")
  .refine((value) => value >= "2000-01-01" && value <= "2049-12-31", "check the year: it must lie from 2000 to 2049");

/** An instant in UTC. */
export const instant = z.iso.datetime({ offset: true, error: () => "write the time as 2026-12-01T09:00:00Z" });

/** Clock time, 24 hours, local. */
export const clockTime = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "write the time as HH:MM, from 00:00 to 23:59");

export const itemId = z
  .string()
  .regex(/^[A-Za-z0-9][A-Za-z0-9-]{0,39}$/, "use letters, figures and hyphens, at most 40 characters");

/** The number when there is one, else null: for sums, which treat "unknown" and "not asked" alike. */
export const knownNumber = (value: number | NotKnown | null | undefined): number | null =>
  typeof value === "number" ? value : null;

export const isNotKnown = (value: unknown): value is NotKnown => value === "unknown" || value === "unreadable";
