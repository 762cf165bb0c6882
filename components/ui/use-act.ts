"use client";

import { unstable_rethrow, useRouter } from "next/navigation";
import { useState, useTransition } from "react";
import type { ActionState } from "@/lib/notify/result";

type Act<T> = (input: unknown) => Promise<ActionState<T>>;

/**
 * Runs a server action from a form that keeps what was typed. `run(input)` sends it; `state` is the last answer.
 * When it is done the page's data is read again, then `onDone` is called. A lost connection is a failure with a
 * sentence, not an exception.
 */
export function useAct<T>(act: Act<T>, onDone?: (value: T) => void) {
  const router = useRouter();
  const [state, setState] = useState<ActionState<T>>({ status: "idle" });
  const [pending, start] = useTransition();
  const run = (input: unknown) =>
    start(async () => {
      const answer = await answerOf(act, input);
      setState(answer);
      if (answer.status !== "done") return;
      router.refresh();
      onDone?.(answer.value);
    });
  return { state, pending, run, forget: () => setState({ status: "idle" }) };
}

async function answerOf<T>(act: Act<T>, input: unknown): Promise<ActionState<T>> {
  try {
    return await act(input);
  } catch (error) {
    unstable_rethrow(error); // a redirect travels as an exception
    console.error(error);
    return {
      status: "failed",
      message: "No answer from the server. What you typed is still here; try again.",
      fields: [],
    };
  }
}

/** The answers of a form as an object; a name that stands more than once becomes a list. */
export function answersOf(form: HTMLFormElement): Record<string, unknown> {
  const answers: Record<string, unknown> = {};
  const data = new FormData(form);
  for (const name of new Set(data.keys())) {
    const values = data.getAll(name);
    answers[name] = values.length > 1 ? values : values[0];
  }
  return answers;
}
