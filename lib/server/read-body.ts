import { unfit } from "./fit-to-keep";
import { failed, ok, type Result } from "@/lib/notify/result";

/** A job record with every list full is about 200 kB; ten times that is not a record. */
export const jsonLimitBytes = 2 * 1024 * 1024;

const tooLarge = failed("too-large", "This is larger than the 2 MB a record may be. Nothing was saved.");

/**
 * The body as JSON, read no further than the limit. Failures: `too-large`, `unsupported` (not sent as JSON),
 * `invalid` (not JSON, or JSON that could not be kept: see `unfit`).
 */
export async function readJson(request: Request, limit = jsonLimitBytes): Promise<Result<unknown>> {
  const type = request.headers.get("content-type") ?? "";
  if (!/^application\/json\s*(;|$)/i.test(type)) {
    return failed("unsupported", "Send this as JSON, with content-type application/json.");
  }
  if (Number(request.headers.get("content-length") ?? 0) > limit) return tooLarge;
  const parts: Uint8Array[] = [];
  let size = 0;
  for await (const part of request.body ?? []) {
    size += part.byteLength;
    if (size > limit) return tooLarge;
    parts.push(part);
  }
  try {
    const value: unknown = JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(parts)));
    const wrong = unfit(value);
    return wrong ? failed("invalid", "Some values cannot be kept. Nothing was saved.", [wrong]) : ok(value);
  } catch (error) {
    if (error instanceof SyntaxError || error instanceof TypeError) return failed("invalid", "This is not JSON.");
    throw error;
  }
}
