import { plain } from "@/lib/calc/exact";
import type { JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { supplyEarthing } from "../facts";

/** Line-neutral impedance; on TN-C-S the line-earth reading stands for it, as the two nearly agree there only. */
export function supplyImpedance(job: JobFacts): { ohm: number; text: string } | null {
  const ohm = knownNumber(job.supply.lineNeutralImpedanceOhm);
  if (ohm !== null) return { ohm, text: `line-neutral ${plain(ohm)} Ω` };
  const loopOhm = knownNumber(job.supply.externalLoopImpedanceOhm);
  if (loopOhm === null || supplyEarthing(job) !== "TN-C-S") return null;
  return { ohm: loopOhm, text: `line-earth ${plain(loopOhm)} Ω in place of line-neutral, on TN-C-S` };
}
