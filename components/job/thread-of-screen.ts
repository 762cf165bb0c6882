import type { StitchState } from "@/components/ui/stitch";
import type { Job } from "@/lib/notify/job";
import type { DraftState } from "../drafts/draft-state";
import { factAt } from "../drafts/facts-at";
import { standingOf } from "./answer-text";
import type { AskedQuestion } from "./questions/screens";
import type { Wire } from "./wire";

/**
 * The wire beside a screen's questions. It reaches as far as the first gap; a fact given past a gap is filled but not
 * yet threaded. An optional question left open is no gap.
 */
export function threadOfScreen(
  questions: readonly AskedQuestion[],
  record: Job,
  held: DraftState["held"],
): { stitch: StitchState; wire: Wire }[] {
  let open = false;
  return questions.map(({ at, optional }) => {
    const standing = standingOf(factAt(record, at));
    if (open) return { stitch: held[at] ? "take-again" : pastGap[standing], wire: "ahead" };
    if (held[at]) open = true;
    else if (standing === "not-known" || (standing === "not-yet" && !optional)) open = true;
    if (!open) return { stitch: standing === "not-yet" ? "not-yet" : "answered", wire: "whole" };
    return { stitch: held[at] ? "take-again" : pastGap[standing], wire: "to-here" };
  });
}

const pastGap: Record<ReturnType<typeof standingOf>, StitchState> = {
  answered: "past-a-gap",
  "not-known": "not-known",
  "not-yet": "not-yet",
};
