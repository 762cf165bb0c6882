import { failed, ok, type Failure, type Result } from "@/lib/notify/result";
import { tidyPostcode } from "./postcode";

type Ids = { id: string; saveId: string };
type FirstFacts = {
  stage: string;
  day: string;
  customer: string;
  phone: string;
  address: string;
  postcode: string;
  supplyNumber: string;
  territory: string;
  premises: string;
};

const patienceMs = 20_000;
const orNull = (text: string) => text.trim() || null;

/** The record a new job begins with: what was typed, one chargepoint on one circuit, and nothing supposed. */
export const firstRecord = (typed: FirstFacts) => ({
  stage: typed.stage,
  dates: typed.stage === "installed" ? { installed: orNull(typed.day) } : { planned: orNull(typed.day) },
  customer: { name: orNull(typed.customer), phone: orNull(typed.phone) },
  site: {
    address: typed.address.trim() ? typed.address.split("\n").filter((line) => line.trim()) : null,
    postcode: orNull(tidyPostcode(typed.postcode)),
    supplyNumber: orNull(typed.supplyNumber),
    territory: orNull(typed.territory),
    premises: orNull(typed.premises),
  },
  circuits: [{ id: "main" }],
  chargepoints: [{ id: "cp1", circuit: "main" }],
});

/** Opens a job under ids made here, so that asking twice opens it once. Never throws. */
export async function openJob({ id, saveId }: Ids, typed: FirstFacts): Promise<Result<{ id: string; number: string }>> {
  const lost = "No answer from the server. What you typed is still here; try again.";
  try {
    const response = await fetch("/api/v1/jobs", {
      method: "POST",
      headers: { "content-type": "application/json", "idempotency-key": saveId },
      body: JSON.stringify({ id, record: firstRecord(typed) }),
      signal: AbortSignal.timeout(patienceMs),
    });
    const body = (await response.json()) as { id?: string; number?: string; error?: Failure };
    if (response.ok && body.id && body.number) return ok({ id: body.id, number: body.number });
    return failed(body.error?.code ?? "lost", body.error?.message ?? lost, body.error?.fields);
  } catch (error) {
    console.warn("The job could not be opened.", error);
    return failed("lost", lost);
  }
}
