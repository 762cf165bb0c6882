"use client";

import type { ActionState } from "@/lib/notify/result";
import { ErrorSummary } from "./error-summary";

/** The summary above a form whose act failed; nothing while it has not. */
export function Failure({ state, idOf }: { state: ActionState<unknown>; idOf?: (path: string) => string }) {
  if (state.status !== "failed") return null;
  return (
    <ErrorSummary errors={state.fields} idOf={idOf} title={state.fields.length === 0 ? state.message : undefined} />
  );
}
