import { z } from "zod";

export const pageSize = 25;

const cursorSchema = z.tuple([z.string().max(100), z.string().max(100)]);

/** A place in an ordered list: the sort key and the id of the last row shown. */
export type Cursor = { key: string; id: string };

export const cursorText = ({ key, id }: Cursor): string =>
  Buffer.from(JSON.stringify([key, id]), "utf8").toString("base64url");

/** A day that is in the calendar, `YYYY-MM-DD`; the database refuses any other. */
export const isDay = (text: string): boolean => {
  const at = /^[12]\d{3}-\d{2}-\d{2}$/.test(text) ? new Date(`${text}T00:00:00Z`) : null;
  return at !== null && !Number.isNaN(at.getTime()) && at.toISOString().startsWith(text);
};

/** An instant as our own columns write it, UTC to the millisecond. */
export const isInstant = (text: string): boolean => isDay(text.slice(0, 10)) && isoInstant(text) === text;

const isoInstant = (text: string): string | null => {
  const at = new Date(text);
  return Number.isNaN(at.getTime()) ? null : at.toISOString();
};

/** Reads a cursor from a URL; null for none and for one that is not ours, which starts the list at its head. */
export function readCursor(text: string | null): Cursor | null {
  if (!text) return null;
  try {
    const parsed = cursorSchema.safeParse(JSON.parse(Buffer.from(text, "base64url").toString("utf8")));
    return parsed.success ? { key: parsed.data[0], id: parsed.data[1] } : null;
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}

/** Cuts the one row read beyond the page and says where the next page starts. */
export function pageOf<R>(rows: R[], cursorOf: (row: R) => Cursor): { rows: R[]; next: string | null } {
  const shown = rows.slice(0, pageSize);
  const last = shown.at(-1);
  return { rows: shown, next: rows.length > pageSize && last ? cursorText(cursorOf(last)) : null };
}
