import type { Assessment } from "@/lib/notify/assessment";
import type { Job } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { demandChart } from "@/templates/drawings/demand-chart";
import { Picture } from "./picture";

type Props = { job: Job; demand: Assessment["demand"]; noticeLimitA: number | null };

/** Demand before and after the work on each phase, against the notice limit and the cut-out. */
export function DemandPicture({ job, demand, noticeLimitA }: Props) {
  const count = Math.max(demand.existingA?.length ?? 0, demand.afterA?.length ?? 0);
  if (count === 0) return <p className="quiet">The demand is not recorded yet.</p>;
  const phases = Array.from({ length: count }, (_, index) => ({
    name: count === 1 ? "Demand" : `L${index + 1}`,
    existingA: demand.existingA?.[index] ?? null,
    afterA: demand.afterA?.[index] ?? null,
  }));
  const drawing = demandChart(
    phases,
    { noticeA: noticeLimitA, cutOutA: knownNumber(job.supply.cutOutRatingA) },
    "screen",
  );
  return <Picture drawing={drawing} caption={captionOf(demand)} />;
}

function captionOf({ afterA, afterKva, limitCounted, withLimitA }: Assessment["demand"]): string {
  if (!afterA) return "What it will be after the work cannot be told yet.";
  const after = `${afterA.join(", ")} A after the work${afterKva === null ? "" : `, ${afterKva.toFixed(2)} kVA`}.`;
  if (limitCounted) return `${after} The load limit is counted.`;
  return withLimitA ? `${after} The load limit is not counted; with it, ${withLimitA.join(", ")} A.` : after;
}
