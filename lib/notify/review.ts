/** The compliance lead's judgement on the settings of a sealed pack. */
export const reviewStates = ["waiting", "approved", "returned", "superseded"] as const;
export type ReviewState = (typeof reviewStates)[number];
