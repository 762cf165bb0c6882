"use client";

import { useEffect, useState } from "react";
import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import type { DraftView } from "./draft-store";

type Here = { record: Job; summary: AssessmentSummary };

/**
 * What the rules say of the record on the screen. The server says it with each save; while it cannot be reached the
 * rules run on this device, fetched only then, for they are larger than a whole screen.
 */
export function useSummary(draft: DraftView, atFirst: AssessmentSummary, today: string): AssessmentSummary {
  const [here, setHere] = useState<Here | null>(null);
  const { record, standing } = draft;
  const isAway = standing === "unreachable";
  useEffect(() => {
    if (!isAway) return;
    let isWanted = true;
    import("./rules-here")
      .then(({ summaryHere }) => isWanted && setHere({ record, summary: summaryHere(record, today) }))
      .catch((error: unknown) => console.warn("The rules could not be fetched; the last answer stands.", error));
    return () => {
      isWanted = false;
    };
  }, [isAway, record, today]);
  return isAway && here?.record === record ? here.summary : (draft.summary ?? atFirst);
}
