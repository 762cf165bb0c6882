import { randomUUID } from "node:crypto";
import type { Tx } from "./client";
import { events } from "./schema";
import { eventSchema, type FirmEvent } from "@/lib/notify/events";

/** Who did it. `userId` is null when the program acted by itself. */
export type Actor = { readonly firmId: string; readonly userId: string | null; readonly name: string };

/**
 * Writes what happened, in the transaction of the act itself: both stand or neither does. It takes the firm's
 * chain until the transaction ends, so it comes after the locks on rows, never before them.
 */
export async function recordEvent(tx: Tx, actor: Actor, happened: FirmEvent): Promise<void> {
  const { type, ...payload } = eventSchema.parse(happened);
  await tx.insert(events).values({
    firmId: actor.firmId,
    id: randomUUID(),
    actorId: actor.userId,
    actorName: actor.name,
    type,
    jobId: "jobId" in payload ? payload.jobId : null,
    payload,
  });
}
