import type { PlannedJob } from "./cases";
import { finishedJobs } from "./closed-jobs";
import { freshJobs } from "./fresh-jobs";
import { openJobs } from "./open-jobs";

/** Sixty jobs of the demo firm, in every state, over every operator, in the order of their numbers. */
export const plannedJobs: readonly PlannedJob[] = [...finishedJobs, ...openJobs, ...freshJobs];
