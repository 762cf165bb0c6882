/**
 * The record's own messages speak to whoever sends JSON and begin in the middle of a sentence. Beside a field they
 * begin with its label, and name the button instead of the stored word.
 */
export function wordsOfError(label: string, message: string | null): string | null {
  if (message === null) return null;
  const plain = message
    .replace(/ without quotation marks(, or "unknown")?/, "")
    .replace(/choose "unknown"/, "choose Not known")
    .replace(/"unknown"/g, "Not known");
  if (/^(must|has|have|is|are|cannot|needs|may|does|do)\b/.test(plain)) return `${label} ${plain}`;
  return /^[a-z]/.test(plain) ? `${label}: ${plain}` : plain;
}
