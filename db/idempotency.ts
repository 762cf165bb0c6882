import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { nowInstant } from "./clock";
import type { Tx } from "./client";
import { idempotencyKeys } from "./schema";
import { failed, ok, type Result } from "@/lib/notify/result";

/** JSON with its keys in order, so that the same request always reads the same. */
const inOrder = (value: unknown): string =>
  JSON.stringify(value, (_key, item: unknown) =>
    item !== null && typeof item === "object" && !Array.isArray(item)
      ? Object.fromEntries(Object.entries(item).sort(([one], [other]) => (one < other ? -1 : 1)))
      : item,
  );

type Once<T> = {
  key: string;
  act: string;
  request: unknown;
  /** Whether an answer is final; one that wrote nothing may be asked for again under the same key. */
  keep: (value: T) => boolean;
};

/**
 * Runs a write once for each key. The same key and the same request again: the stored answer, nothing written.
 * The same key with another request: `key-reused`. A second request while the first still runs waits for it.
 */
export async function once<T>(
  tx: Tx,
  firmId: string,
  { key, act, request, keep }: Once<T>,
  run: () => Promise<Result<T>>,
): Promise<Result<T>> {
  const requestHash = createHash("sha256")
    .update(`${act}\n${inOrder(request)}`)
    .digest("hex");
  const mine = and(eq(idempotencyKeys.firmId, firmId), eq(idempotencyKeys.key, key));
  const made = await tx
    .insert(idempotencyKeys)
    .values({ firmId, key, act, requestHash, createdAt: nowInstant() })
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key });
  if (made.length === 0) {
    const [before] = await tx.select().from(idempotencyKeys).where(mine);
    if (before?.requestHash !== requestHash)
      return failed("key-reused", "This key was used before for another request. Send the change with a new key.");
    return ok(before.reply as T);
  }
  const result = await run();
  if (result.ok && keep(result.value)) await tx.update(idempotencyKeys).set({ reply: result.value }).where(mine);
  else await tx.delete(idempotencyKeys).where(mine);
  return result;
}
