import "server-only";
import { headers } from "next/headers";
import { unstable_rethrow } from "next/navigation";
import type { z } from "zod";
import { requireViewer, type Viewer } from "./auth/viewer";
import { env } from "./env";
import { fieldErrors } from "./field-errors";
import { unfit } from "./fit-to-keep";
import { logSurprise } from "./log";
import { isOwnOrigin } from "./same-origin";
import type { ActionState, Result } from "@/lib/notify/result";

export type { ActionState };

const toState = <T>(result: Result<T>): ActionState<T> =>
  result.ok
    ? { status: "done", value: result.value }
    : { status: "failed", message: result.error.message, fields: result.error.fields ?? [] };

const foreign = {
  status: "failed",
  message: "This can only be done from Sealwire's own pages.",
  fields: [],
} satisfies ActionState<never>;

/**
 * Next refuses an Origin that is not the host's, and lets a request without one pass. Browsers send it with every
 * act, so here a missing one is refused too, as in the route handlers.
 */
const isOurs = async (): Promise<boolean> => isOwnOrigin(await headers(), env().PUBLIC_ORIGIN);

async function answer<S extends z.ZodType, T>(
  schema: S,
  raw: unknown,
  run: (input: z.output<S>) => Promise<Result<T>>,
): Promise<ActionState<T>> {
  const input: unknown = raw instanceof FormData ? Object.fromEntries(raw) : raw;
  const wrong = unfit(input);
  if (wrong) return { status: "failed", message: "Some answers need another look.", fields: [wrong] };
  const parsed = schema.safeParse(input);
  if (!parsed.success) {
    return { status: "failed", message: "Some answers need another look.", fields: fieldErrors(parsed.error) };
  }
  try {
    return toState(await run(parsed.data));
  } catch (error) {
    unstable_rethrow(error); // redirects and not-found travel as exceptions
    const id = logSurprise(error, "action");
    return { status: "failed", message: `Nothing was changed: something went wrong here. Quote ${id}.`, fields: [] };
  }
}

/**
 * The one door for acts: identify the person, parse the input (every field, not only the first that is wrong),
 * call one function of the data layer, turn its result into what a form shows. An unexpected error is logged
 * under an id and never shown. Accepts a plain object or FormData.
 */
export const viewerAction =
  <S extends z.ZodType, T>(schema: S, run: (viewer: Viewer, input: z.output<S>) => Promise<Result<T>>) =>
  async (raw: unknown): Promise<ActionState<T>> => {
    if (!(await isOurs())) return foreign;
    const viewer = await requireViewer();
    return answer(schema, raw, (input) => run(viewer, input));
  };

/** The same door for those who have no session yet: sign-in, invitation, password reset. `run` must be throttled. */
export const publicAction =
  <S extends z.ZodType, T>(schema: S, run: (input: z.output<S>) => Promise<Result<T>>) =>
  async (raw: unknown): Promise<ActionState<T>> =>
    (await isOurs()) ? answer(schema, raw, run) : foreign;
