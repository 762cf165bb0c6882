import type { Board, JobFacts } from "@/lib/notify/job";
import { absent } from "../facts";
import { cannotTell, met, notMet, rule, type Answer } from "../rule";

export const surgeRule = rule({
  id: "supply.surge-protection",
  group: "supply",
  title: "Surge protection",
  reads: ["boards[].surgeProtection", "chargepoints[].access", "customer.interest"],
  sources: ["BS 7671 443.4.1"],
  gives: ["met", "not-met", "cannot-tell"],
});

/** Fitted, or declined by the owner where the public has no access. */
export function surgeAnswer(job: JobFacts, board: Board): Answer {
  const { surgeProtection } = board;
  const { interest } = job.customer;
  const publicAccess = job.chargepoints.some(({ access }) => access === "public");
  const used = { surgeProtection, publicAccess, interest };
  if (surgeProtection === null || surgeProtection === "unknown")
    return cannotTell(`Whether surge protection is fitted ${absent(surgeProtection)}.`, { used });
  if (surgeProtection !== "declined-by-owner")
    return met(`Surge protection is fitted: ${surgeProtection === "fitted-type-2" ? "type 2" : "type 1 and 2"}.`, {
      used,
      recorded: "fitted",
    });
  if (publicAccess)
    return notMet(
      "A chargepoint open to the public needs surge protection; it cannot be declined (from memory: verify).",
      {
        used,
      },
    );
  if (interest !== "owner" && interest !== "landlord")
    return cannotTell("Only the owner can decline surge protection; the customer is not recorded as the owner.", {
      used,
    });
  if (job.chargepoints.some(({ access }) => access === null))
    return cannotTell("Whether the public can reach the chargepoint is not recorded.", { used });
  return met("Surge protection was declined by the owner, who takes the risk.", { used, recorded: "declined" });
}
