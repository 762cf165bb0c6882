import type { z } from "zod";
import type { FieldError } from "@/lib/notify/result";

/** A path of the record as people and links write it: `circuits[0].cable.lengthM`. */
const pathText = (path: readonly PropertyKey[]): string =>
  path.reduce<string>(
    (text, part) => (typeof part === "number" ? `${text}[${part}]` : text ? `${text}.${String(part)}` : String(part)),
    "",
  );

/** Every wrong field of a failed parse, in the order of the schema, one line a field. */
export function fieldErrors(error: z.ZodError): FieldError[] {
  const seen = new Map<string, FieldError>();
  for (const issue of error.issues) {
    const path = pathText(issue.path);
    if (!seen.has(path)) seen.set(path, { path, message: issue.message });
  }
  return [...seen.values()];
}
