"use client";

import type { ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";

type Props<T> = {
  act: (input: unknown) => Promise<ActionState<T>>;
  /** Sent with what is typed. */ also?: Record<string, unknown>;
  button: string;
  /** What stands in place of the form once it is done. */ done?: ReactNode;
  children: (state: ActionState<T>) => ReactNode;
};

/** A short form for somebody without a session. It posts, so that nothing typed can ever stand in an address. */
export function AccountForm<T>({ act, also, button, done, children }: Props<T>) {
  const { state, pending, run } = useAct(act);
  if (state.status === "done" && done) return <div role="status">{done}</div>;
  return (
    <form
      method="post"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run({ ...answersOf(event.currentTarget), ...also });
      }}
    >
      <Failure state={state} />
      {children(state)}
      <Button kind="act" type="submit" disabled={pending}>
        {button}
      </Button>
    </form>
  );
}
