import type { IsoDate } from "@/lib/calc/parameter";
import type { JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import { flickerConditionAnswer, flickerConditionRule } from "./power-quality/flicker-condition";
import { shortCircuitAnswer, shortCircuitRule } from "./power-quality/short-circuit";
import { standardAnswer, standardPairs } from "./power-quality/standards";
import { judge } from "./rule";

export const powerQualityRules = [...standardPairs.map(({ about }) => about), flickerConditionRule, shortCircuitRule];

/** Checks of each chargepoint against the supply. `on` is the day whose wiring standard applies. */
export const powerQualityChecks = (job: JobFacts, on: IsoDate): Reason[] =>
  job.chargepoints.flatMap((unit) => [
    ...standardPairs.map((pair) => judge(pair.about, unit.id, on, () => standardAnswer(unit, pair, on))),
    judge(flickerConditionRule, unit.id, on, () => flickerConditionAnswer(job, unit, on)),
    judge(shortCircuitRule, unit.id, on, () => shortCircuitAnswer(job, unit, on)),
  ]);
