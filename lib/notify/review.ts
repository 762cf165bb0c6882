/** The compliance lead's judgement on the settings of a sealed pack. */
export const reviewStates = ["waiting", "approved", "returned", "superseded"] as const;
export type ReviewState = (typeof reviewStates)[number];

export const reviewStateName: Record<ReviewState, string> = {
  waiting: "Waiting",
  approved: "Approved",
  returned: "Returned",
  superseded: "Superseded",
};

export type ReviewMove = {
  to: ReviewState;
  label: string;
  /** What the person must give. */
  needs: readonly ("note" | "reason")[];
  /** `person` for a decision, `system` for what a newer pack brings about. */
  by: "person" | "system";
};

const fromWaiting: readonly ReviewMove[] = [
  { to: "approved", label: "Approve", needs: [], by: "person" },
  { to: "returned", label: "Return with a reason", needs: ["reason"], by: "person" },
  { to: "superseded", label: "Superseded by a newer pack", needs: [], by: "system" },
];

/** Every way out of a state. A decision is never changed: a newer pack brings a new review. */
export const reviewMoves: Record<ReviewState, readonly ReviewMove[]> = {
  waiting: fromWaiting,
  approved: [],
  returned: [],
  superseded: [],
};

/** States from which a review may come to `to`, for the guard of an update. */
export const reviewCameFrom = (to: ReviewState): ReviewState[] =>
  reviewStates.filter((from) => reviewMoves[from].some((move) => move.to === to));
