import type { Job } from "@/lib/notify/job";
import type { Question } from "./model";
import { yesNo } from "./words";

/** The settings of the unit a question is about; undefined when it has been taken out. */
export const smart = (job: Job, index: number) => job.chargepoints[index]?.smartCharging;
/** Nothing is set or handed over before the day of installing. */
const installed = (job: Job) => job.stage === "installed";
/** The unit was sold for private use, so the 2021 Regulations reach it, or nobody has said otherwise. */
export const inScope = (job: Job, index: number) => {
  const { users, cable, soldByFirm } = smart(job, index) ?? {};
  return users !== "public" && cable !== true && soldByFirm !== false;
};
/** In scope, and installed: what is set and handed over can be asked. */
export const both = (job: Job, index: number) => installed(job) && inScope(job, index);

/** A yes or no about the unit; `then` says where to look when it is not known. */
export const seen = (path: string, label: string, short: string, then: string): Question => ({
  path: `smartCharging.${path}`,
  label,
  short,
  kind: "choice",
  columns: 3,
  options: yesNo,
  notKnown: { rule: "The requirement cannot be told.", then },
  applies: inScope,
});
