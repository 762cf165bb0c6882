import type { IsoDate } from "@/lib/calc/parameter";
import type { JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { judge } from "./rule";
import { assemblyAnswer, assemblyRule, waysAnswer, waysRule } from "./supply/boards";
import {
  bondingAnswer,
  bondingRule,
  earthingConductorAnswer,
  earthingConductorRule,
} from "./supply/earthing-conductors";
import { externalLoopAnswer, externalLoopRule, faultLevelAnswer, faultLevelRule } from "./supply/fault-level";
import { surgeAnswer, surgeRule } from "./supply/surge";
import { tailsAnswer, tailsRule } from "./supply/tails";

export const supplyRules = [
  tailsRule,
  earthingConductorRule,
  bondingRule,
  externalLoopRule,
  faultLevelRule,
  assemblyRule,
  waysRule,
  surgeRule,
];

/** Checks of the supply and of each board. `on` is the day whose wiring standard applies. */
export const supplyChecks = (job: JobFacts, on: IsoDate): Reason[] => [
  judge(tailsRule, null, on, () => tailsAnswer(job, on)),
  judge(earthingConductorRule, null, on, () => earthingConductorAnswer(job, on)),
  judge(bondingRule, null, on, () => bondingAnswer(job, on)),
  judge(externalLoopRule, null, on, () => externalLoopAnswer(job, on)),
  judge(faultLevelRule, null, on, () => faultLevelAnswer(job, on)),
  ...job.boards.flatMap((board) => [
    judge(assemblyRule, board.id, on, () => assemblyAnswer(job, board)),
    judge(waysRule, board.id, on, () => waysAnswer(board)),
    judge(surgeRule, board.id, on, () => surgeAnswer(job, board)),
  ]),
];
