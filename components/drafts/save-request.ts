import type { FieldError } from "@/lib/notify/result";
import type { JobView, SaveReply } from "@/lib/notify/views";
import type { Batch } from "./draft-state";

/** What became of one save, told apart by what the person can do about it. */
export type SaveAnswer =
  | { kind: "saved"; reply: Extract<SaveReply, { saved: true }> }
  | { kind: "conflict"; reply: Extract<SaveReply, { saved: false }> }
  | { kind: "refused"; message: string; fields: readonly FieldError[] }
  | { kind: "signed-out" }
  | { kind: "gone" }
  | { kind: "unreachable" };

const patienceMs = 15_000;

type Body = { error?: { message?: string; fields?: FieldError[] }; message?: string; fields?: FieldError[] };

/** Sends one batch. Never throws: a lost connection, a slow server and rubbish in the answer are all `unreachable`. */
export async function sendBatch(jobId: string, batch: Batch): Promise<SaveAnswer> {
  try {
    const response = await fetch(`/api/v1/jobs/${jobId}/saves`, {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify(batch),
      signal: AbortSignal.timeout(patienceMs),
    });
    if (response.status === 401) return { kind: "signed-out" };
    if (response.status === 404) return { kind: "gone" };
    const body: unknown = await response.json();
    if (response.ok || response.status === 409) {
      const reply = body as SaveReply;
      if (reply.saved === true) return { kind: "saved", reply };
      if (reply.saved === false) return { kind: "conflict", reply };
    }
    if (response.status >= 500 || response.status === 429) return { kind: "unreachable" };
    const said = body as Body;
    return {
      kind: "refused",
      message: said.error?.message ?? said.message ?? "The change could not be saved.",
      fields: said.error?.fields ?? said.fields ?? [],
    };
  } catch (error) {
    console.warn("The save did not reach the server.", error);
    return { kind: "unreachable" };
  }
}

/** The job as the server has it now; null when it cannot be had. */
export async function fetchJob(jobId: string): Promise<JobView | null> {
  try {
    const response = await fetch(`/api/v1/jobs/${jobId}`, { signal: AbortSignal.timeout(patienceMs) });
    return response.ok ? ((await response.json()) as JobView) : null;
  } catch (error) {
    console.warn("The job could not be read again.", error);
    return null;
  }
}
