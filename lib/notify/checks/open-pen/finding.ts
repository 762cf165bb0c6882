import type { IsoDate } from "@/lib/calc/parameter";
import type { Chargepoint, JobFacts } from "@/lib/notify/job";
import type { Answer, Rule } from "../rule";

/** What the operator's own rules say of buried electrodes: the register holds no distance, so it is the firm's figure. */
export type OpenPenRules = {
  operatorId: string;
  buriedSeparationM: number | null;
  /** Who set the distance and when, in words. */
  buriedSeparationSaid?: string;
};

/** One chargepoint to be judged. `unlimitedA` is the worst phase at rated currents and without any load limit. */
export type OpenPenCase = {
  job: JobFacts;
  unit: Chargepoint;
  on: IsoDate;
  rules: OpenPenRules;
  unlimitedA: () => number | null;
};

/** An answer with the figures that only this family has. */
export type Finding = {
  answer: Answer;
  touchVoltageV?: number | null;
  electrodeMaxOhm?: number | null;
  imbalanceA?: number | null;
  residualRisk?: string | null;
};

export type Method = NonNullable<Chargepoint["openPen"]["method"]>;
export type MethodRule = { about: Rule; find: (given: OpenPenCase) => Finding };

export const methodName: Record<Method, string> = {
  "three-phase-balance": "three-phase balance",
  "installation-electrode": "installation electrode",
  "cpc-earth-70V-device": "device that senses protective conductor to Earth",
  "line-neutral-window-device": "line-neutral window device",
  "equivalent-device": "equivalent device",
  tt: "TT earth",
  separation: "electrical separation",
  indoor: "indoor use",
  "private-tn-s": "private TN-S supply",
};
