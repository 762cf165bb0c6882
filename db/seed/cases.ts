import type { ChangeName, Example } from "./recipes";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import type { SubmissionChannel, SubmissionState } from "@/lib/notify/submission";

/** What happens to a paper or a review, so many days before the day of seeding. */
export type Act =
  | { act: "seal"; ago: number; gaps?: string }
  | { act: "sent"; ago: number; by: SubmissionChannel }
  | {
      act: "move";
      ago: number;
      to: SubmissionState;
      reference?: string;
      limitA?: number;
      expiresIn?: number;
      note?: string;
    }
  | { act: "call"; ago: number; spokeTo: string; text: string }
  | { act: "approve"; ago: number }
  | { act: "return"; ago: number; reason: string };

export type PlannedJob = {
  number: number;
  place: [line: string, town: string, postcode: string];
  customer: string;
  operator: string;
  example: Example;
  change: ChangeName;
  installer: "tam" | "joss" | "sole";
  /** Days ago that the job was opened. */
  opened: number;
  /** Days ago that it was installed; negative for a planned day ahead. */
  day: number;
  photos: readonly EvidenceSubject[];
  acts: readonly Act[];
};

export const standard: EvidenceSubject[] = ["intake", "cut-out", "service-head", "rating-plate"];
export const whole: EvidenceSubject[] = [
  ...standard,
  "meter",
  "earth-terminal",
  "consumer-unit",
  "chargepoint",
  "isolator",
  "default-hours-screen",
  "delay-screen",
  "first-use-prompt",
];
const two: EvidenceSubject[] = ["cut-out", "service-head"];

export const seal = (ago: number, gaps?: string): Act => ({ act: "seal", ago, ...(gaps ? { gaps } : {}) });
export const sent = (ago: number, by: SubmissionChannel = "e-mail"): Act => ({ act: "sent", ago, by });
export const move = (
  ago: number,
  to: SubmissionState,
  more: Omit<Extract<Act, { act: "move" }>, "act" | "ago" | "to"> = {},
): Act => ({
  act: "move",
  ago,
  to,
  ...more,
});
export const heard = (ago: number, reference: string) => move(ago, "acknowledged", { reference });
export const recorded = (ago: number, reference: string) => move(ago, "recorded", { reference });
export const call = (ago: number, spokeTo: string, text: string): Act => ({ act: "call", ago, spokeTo, text });
export const approve = (ago: number): Act => ({ act: "approve", ago });

export const job = (
  number: number,
  place: PlannedJob["place"],
  customer: string,
  operator: string,
  opened: number,
  day: number,
  acts: readonly Act[],
  more: Partial<PlannedJob> = {},
): PlannedJob => ({
  number,
  place,
  customer,
  operator,
  example: "notice",
  change: "none",
  installer: number % 3 === 0 ? "joss" : "tam",
  opened,
  day,
  photos: two,
  acts,
  ...more,
});

/** A notice that went its whole way: sealed, sent, recorded, closed, settings approved. */
export const done = (day: number, reference: string) => [
  seal(day),
  sent(day - 1, "operator-page"),
  heard(day - 3, reference),
  approve(day - 4),
  recorded(day - 6, reference),
  move(day - 8, "closed"),
];

export const planned = { change: "planned" } as const;
export const apply = { change: "heavyPlanned" } as const;
