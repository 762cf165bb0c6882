/** A cell that a spreadsheet would run as a formula is given an apostrophe, so that it stays text. */
const guarded = (text: string): string => (/^[=+\-@\t\r\n\u0000-\u001f]/.test(text) ? `'${text}` : text);

const cell = (text: string): string => {
  const safe = guarded(text);
  return /[",\r\n]/.test(safe) ? `"${safe.replace(/"/g, '""')}"` : safe;
};

/** Comma-separated rows after RFC 4180, with the byte order mark by which a spreadsheet knows UTF-8. */
export const csv = (rows: readonly (readonly string[])[]): string =>
  `\uFEFF${rows.map((row) => row.map(cell).join(",")).join("\r\n")}\r\n`;
