"use client";

import { useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";

/** Ends this session. */
export function SignOut({ act }: { act: (input: unknown) => Promise<ActionState<null>> }) {
  const { run, pending, state } = useAct(act);
  return (
    <>
      <button type="button" disabled={pending} onClick={() => run({})}>
        Sign out
      </button>
      {state.status === "failed" && <p role="alert">{state.message}</p>}
    </>
  );
}
