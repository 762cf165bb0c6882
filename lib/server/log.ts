import { randomUUID } from "node:crypto";
import pino, { stdTimeFunctions, type DestinationStream, type Logger } from "pino";

/** Fields that must never reach a log, at the top or one level down. */
const secrets = ["password", "token", "cookie", "authorization", "secret", "url", "sha256Token"];

type Logged = { type: string; message: string; code?: string; stack: string[]; cause?: Logged };

/**
 * An error without what people typed: a failed query carries its values in its message, and the database's own
 * detail quotes the row. The statement, the code and the places in our code are kept.
 */
function withoutValues(error: unknown, depth = 0): Logged {
  if (!(error instanceof Error)) return { type: typeof error, message: "not an error", stack: [] };
  const { code, cause, severity, constraint, table } = error as unknown as Record<string, unknown>;
  // What the database says of a wrong value quotes it; its code, table and constraint say enough.
  const ofDatabase = typeof severity === "string" ? [severity, table, constraint].filter(Boolean).join(" ") : null;
  return {
    type: error.name,
    message: ofDatabase ?? error.message.split(/\nparams:/)[0]?.slice(0, 2_000) ?? "",
    ...(typeof code === "string" ? { code } : {}),
    stack: (error.stack ?? "")
      .split("\n")
      .filter((line) => /^\s+at /.test(line))
      .slice(0, 12),
    ...(cause && depth < 3 ? { cause: withoutValues(cause, depth + 1) } : {}),
  };
}

/** Make a logger; `to` is for tests, standard output otherwise. */
export const makeLog = (level: string, to?: DestinationStream): Logger =>
  pino(
    {
      level,
      base: { app: "sealwire" },
      timestamp: stdTimeFunctions.isoTime,
      serializers: { err: (error: unknown) => withoutValues(error) },
      redact: { paths: secrets.flatMap((name) => [name, `*.${name}`, `*.*.${name}`]), censor: "[withheld]" },
    },
    ...(to ? [to] : []),
  );

/** The log of this process. Level from LOG_LEVEL, read directly so that a wrong setting can still be logged. */
export const log = makeLog(process.env["LOG_LEVEL"] || "info");

/**
 * Log something that was not expected and return an id that a person can quote.
 * The error's own text stays in the log.
 */
export function logSurprise(error: unknown, where: string): string {
  const id = randomUUID().slice(0, 8);
  log.error({ id, where, err: error }, "surprise");
  return id;
}
