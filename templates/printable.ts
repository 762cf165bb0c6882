import type { DocumentModel } from "./model";

/**
 * Characters that may not stand in a document: those XML 1.0 forbids, lone surrogates, and the marks that turn
 * the direction of all text after them, which could make a figure read backwards.
 */
const unprintable =
  /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F-\u009F\u202A-\u202E\u2066-\u2069\uFEFF\uFFF9-\uFFFB\uFFFE\uFFFF]|[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/g;

/** Text as it may be printed: without characters that XML forbids, blanks and line ends as single spaces. */
export const printable = (text: string): string => text.replace(unprintable, "").replace(/\s+/g, " ");

/** The same model with every text made printable. Drawings keep their line ends; they escape text themselves. */
export const printableModel = (model: DocumentModel): DocumentModel => cleaned(model) as DocumentModel;

function cleaned(value: unknown, key = ""): unknown {
  if (typeof value === "string") return key === "svg" ? value : printable(value);
  if (Array.isArray(value)) return value.map((item) => cleaned(item, key));
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(Object.entries(value).map(([name, item]) => [name, cleaned(item, name)]));
}
