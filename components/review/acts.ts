import type { ActionState } from "@/lib/notify/result";

type Act = (input: unknown) => Promise<ActionState<unknown>>;

/** The server actions of a review. */
export type ReviewActs = {
  /** {reviewId, version, note} */ approve: Act;
  /** {reviewId, version, reason} */ giveBack: Act;
};
