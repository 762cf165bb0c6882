import type { ActionState } from "@/lib/notify/result";

/** The sentence beside one field, or null. */
export const errorAt = (state: ActionState<unknown>, path: string) =>
  state.status === "failed" ? (state.fields.find((field) => field.path === path)?.message ?? null) : null;
