import "server-only";
import type { z } from "zod";
import { viewerOf, type Viewer } from "./auth/viewer";
import { env } from "./env";
import { fieldErrors } from "./field-errors";
import { unfit } from "./fit-to-keep";
import { logSurprise } from "./log";
import { readJson } from "./read-body";
import { isSameOrigin } from "./same-origin";
import { dataHeaders } from "./security-headers";
import { may, type Permission } from "@/lib/notify/permissions";
import { failed, type Failure, type Result } from "@/lib/notify/result";

/** Status of an expected failure by its code; a code that is not listed is the caller's input: 422. */
const statusOf: Record<string, number> = {
  "signed-out": 401,
  forbidden: 403,
  "not-found": 404,
  conflict: 409,
  running: 409,
  "moved-on": 409,
  "too-large": 413,
  unsupported: 415,
  throttled: 429,
  "key-missing": 400,
  "bad-request": 400,
  busy: 503,
};

export const jsonAnswer = (body: unknown, status = 200): Response => Response.json(body, { status });

const failure = (error: Failure): Response => jsonAnswer({ error }, statusOf[error.code] ?? 422);

/** Add the headers of data to an answer, keeping what the route set itself. */
function sealed(response: Response): Response {
  for (const [name, value] of Object.entries(dataHeaders(env().https))) {
    if (!response.headers.has(name)) response.headers.set(name, value);
  }
  return response;
}

type Schema = z.ZodType;
type Spec<B extends Schema, Q extends Schema, P extends Schema> = { body?: B; query?: Q; params?: P };
type Parsed<B extends Schema, Q extends Schema, P extends Schema> = {
  body: z.output<B>;
  query: z.output<Q>;
  params: z.output<P>;
  request: Request;
};
type Context = { params: Promise<unknown> };
type Outcome = Result<unknown> | Response;

/** A query as an object: a name that comes twice becomes a list. */
function queryOf(request: Request): Record<string, string | string[]> {
  const found: Record<string, string | string[]> = {};
  const search = new URL(request.url).searchParams;
  for (const name of new Set(search.keys())) {
    const all = search.getAll(name);
    found[name] = all.length === 1 ? (all[0] ?? "") : all;
  }
  return found;
}

/** Each part of the input against its schema; a path that does not parse is a page that is not there. */
async function parseInput<B extends Schema, Q extends Schema, P extends Schema>(
  spec: Spec<B, Q, P>,
  request: Request,
  context: Context | undefined,
): Promise<Result<Parsed<B, Q, P>>> {
  const params = spec.params?.safeParse(await context?.params);
  if (params && !params.success) return failed("not-found", "There is nothing at this address.");
  const asked = queryOf(request);
  const wrong = unfit(asked);
  if (wrong) return failed("bad-request", "The query is not understood.", [wrong]);
  const query = spec.query?.safeParse(asked);
  if (query && !query.success) return failed("bad-request", "The query is not understood.", fieldErrors(query.error));
  let body: unknown;
  if (spec.body) {
    const read = await readJson(request);
    if (!read.ok) return read;
    const parsed = spec.body.safeParse(read.value);
    if (!parsed.success) {
      return failed("invalid", "Some values need another look. Nothing was saved.", fieldErrors(parsed.error));
    }
    body = parsed.data;
  }
  const input = { body, query: query?.data, params: params?.data, request };
  return { ok: true, value: input as Parsed<B, Q, P> };
}

async function answer(request: Request, work: () => Promise<Outcome>): Promise<Response> {
  try {
    const outcome = await work();
    if (outcome instanceof Response) return sealed(outcome);
    return sealed(outcome.ok ? jsonAnswer(outcome.value) : failure(outcome.error));
  } catch (error) {
    const id = logSurprise(error, `${request.method} ${new URL(request.url).pathname}`);
    return sealed(jsonAnswer({ error: { code: "surprise", message: `Something went wrong here. Quote ${id}.` } }, 500));
  }
}

const foreign = failed("forbidden", "This can only be done from Sealwire's own pages.");
const signedOut = failed("signed-out", "Sign in first.");

/**
 * The one door for route handlers of a firm: same-origin check, who is asking, permission, input by schema,
 * one function of the data layer, its Result as a status. `run` may return a Response for files and odd statuses.
 * An act that the person's roles do not allow is 403; where the address names a record it is 404, as a miss is.
 */
export const handler =
  <B extends Schema = z.ZodUndefined, Q extends Schema = z.ZodUndefined, P extends Schema = z.ZodUndefined>(
    spec: Spec<B, Q, P> & { permission?: Permission },
    run: (input: Parsed<B, Q, P> & { viewer: Viewer }) => Promise<Outcome>,
  ) =>
  (request: Request, context?: Context): Promise<Response> =>
    answer(request, async () => {
      if (!isSameOrigin(request, env().PUBLIC_ORIGIN)) return foreign;
      const viewer = await viewerOf(request);
      if (!viewer) return signedOut;
      const hidden = spec.params
        ? failed("not-found", "There is nothing at this address.")
        : failed("forbidden", "Your roles in the firm do not include this.");
      if (spec.permission && !may(viewer.roles, spec.permission)) return hidden;
      const input = await parseInput(spec, request, context);
      if (!input.ok) return input;
      const outcome = await run({ ...input.value, viewer });
      const forbidden = !(outcome instanceof Response) && !outcome.ok && outcome.error.code === "forbidden";
      return forbidden ? hidden : outcome;
    });

/** The same door for what anybody may read: health, the published schema. */
export const publicHandler =
  <B extends Schema = z.ZodUndefined, Q extends Schema = z.ZodUndefined, P extends Schema = z.ZodUndefined>(
    spec: Spec<B, Q, P>,
    run: (input: Parsed<B, Q, P>) => Promise<Outcome>,
  ) =>
  (request: Request, context?: Context): Promise<Response> =>
    answer(request, async () => {
      if (!isSameOrigin(request, env().PUBLIC_ORIGIN)) return foreign;
      const input = await parseInput(spec, request, context);
      return input.ok ? run(input.value) : input;
    });
