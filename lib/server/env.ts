import { createHash } from "node:crypto";
import { homedir } from "node:os";
import { basename, join } from "node:path";
import { z } from "zod";

/** An empty setting in a service file means "not set". */
const setting = (value: unknown) => (value === "" ? undefined : value);
const text = z.preprocess(setting, z.string().optional());
const flag = z.preprocess(setting, z.enum(["on", "off"]).optional());

/** Where files and caught mail are kept when nothing else is set: outside the working tree, one folder a checkout. */
export const defaultHome = (): string => {
  const root = process.getuid?.() === 0 ? "/var/lib/sealwire" : join(homedir(), ".local", "share", "sealwire");
  const here = process.cwd();
  return join(root, `${basename(here)}-${createHash("sha256").update(here).digest("hex").slice(0, 8)}`);
};

const schema = z
  .object({
    NODE_ENV: z.enum(["production", "development", "test"]).default("development"),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: "must be a postgres:// address" }),
    DATABASE_POOL: z.preprocess(setting, z.coerce.number().int().min(1).max(200).default(10)),
    /** The address people type, without a path; every link in a mail starts with it. */
    PUBLIC_ORIGIN: z.preprocess(setting, z.url({ protocol: /^https?$/ }).default("http://127.0.0.1:3000")),
    SEALWIRE_DEMO: flag.default("off"),
    SEALWIRE_WORKER: flag.default("on"),
    SEALWIRE_HOME: text,
    STORAGE_DRIVER: z.preprocess(setting, z.enum(["local", "s3"]).default("local")),
    STORAGE_DIR: text,
    S3_BUCKET: text,
    S3_REGION: text,
    S3_ENDPOINT: z.preprocess(setting, z.url().optional()),
    S3_ACCESS_KEY_ID: text,
    S3_SECRET_ACCESS_KEY: text,
    SMTP_URL: z.preprocess(setting, z.url({ protocol: /^smtps?$/, error: "must be an smtp:// address" }).optional()),
    MAIL_FROM: z.preprocess(setting, z.string().default("Sealwire <sealwire@example.com>")),
    MAIL_DIR: text,
    LOG_LEVEL: z.preprocess(setting, z.enum(["fatal", "error", "warn", "info", "debug", "silent"]).default("info")),
  })
  .superRefine((env, context) => {
    const need = (name: keyof typeof env, because: string) => {
      if (!env[name]) context.addIssue({ code: "custom", path: [name], message: because });
    };
    if (env.STORAGE_DRIVER === "s3") {
      for (const name of ["S3_BUCKET", "S3_REGION"] as const) need(name, "is needed when STORAGE_DRIVER is s3");
    }
    if (env.S3_ACCESS_KEY_ID) need("S3_SECRET_ACCESS_KEY", "is needed beside S3_ACCESS_KEY_ID");
    if (env.NODE_ENV === "production" && env.SEALWIRE_DEMO === "off") {
      need("SMTP_URL", "is needed in production; SEALWIRE_DEMO=on uses the local mail catcher instead");
    }
  });

export type Env = z.output<typeof schema> & {
  demo: boolean;
  /** Served over https, so cookies are `Secure` with the `__Host-` prefix and HSTS is sent. */
  https: boolean;
  storageDir: string;
  mailDir: string;
};

/**
 * Read and check settings. Throws one error naming every setting that is missing or wrong;
 * values are never repeated in the message, for some are secrets.
 */
export function parseEnv(source: Record<string, string | undefined>): Env {
  const parsed = schema.safeParse(source);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`Sealwire cannot start, settings are missing or wrong:\n${lines.join("\n")}`);
  }
  const env = parsed.data;
  const home = env.SEALWIRE_HOME ?? defaultHome();
  return {
    ...env,
    PUBLIC_ORIGIN: new URL(env.PUBLIC_ORIGIN).origin,
    demo: env.SEALWIRE_DEMO === "on",
    https: new URL(env.PUBLIC_ORIGIN).protocol === "https:",
    storageDir: env.STORAGE_DIR ?? join(home, "files"),
    mailDir: env.MAIL_DIR ?? join(home, "mail"),
  };
}

let parsedOnce: Env | null = null;

/** The settings of this process, read once. The first call is at boot (`instrumentation.ts`). */
export const env = (): Env => (parsedOnce ??= parseEnv(process.env));
