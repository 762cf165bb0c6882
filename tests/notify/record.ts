import { readFileSync } from "node:fs";
import { assess } from "@/lib/notify/assess";
import type { Assessment } from "@/lib/notify/assessment";
import type { FirmRules } from "@/lib/notify/firm-rules";
import { parseJob, type JobFacts } from "@/lib/notify/job";
import { checkDigit } from "@/lib/notify/supply-number";

/** Facts to change, by path: `supply.looped`, `chargepoints[0].ratedA`. `+` at the end of a path appends to a list. */
export type Changes = Record<string, unknown>;

const text = readFileSync(new URL("../examples/fen-0147-notice.json", import.meta.url), "utf8");

/** A supply number made up for a distributor, with its check digit. */
export function supplyNumberOf(distributor: string, unique = "9900000123"): string {
  const twelve = `${distributor}${unique}`;
  return `${twelve}${checkDigit(twelve)}`;
}

const keysOf = (path: string) => path.replace(/\[(\d+)\]/g, ".$1").split(".");

/** Sets one fact of a plain record. */
export function setAt(record: object, path: string, value: unknown): void {
  const keys = keysOf(path.replace(/\+$/, ""));
  const last = keys.pop() as string;
  const parent = keys.reduce<Record<string, unknown>>(
    (at, key) => at[key] as Record<string, unknown>,
    record as Record<string, unknown>,
  );
  if (path.endsWith("+")) (parent[last] as unknown[]).push(value);
  else parent[last] = value;
}

/** The fact at a path of any value. */
export const getAt = (value: unknown, path: string): unknown =>
  keysOf(path).reduce<unknown>((at, key) => (at as Record<string, unknown> | null | undefined)?.[key], value);

/** The ordinary home of the worked example, which notifies, with some facts changed. `@12` makes a number of distributor 12. */
export function recordWith(changes: Changes = {}): Record<string, unknown> {
  const record = JSON.parse(text) as Record<string, unknown>;
  for (const [path, value] of Object.entries(changes)) {
    const made = typeof value === "string" && /^@\d\d$/.test(value) ? supplyNumberOf(value.slice(1)) : value;
    setAt(record, path, structuredClone(made));
  }
  return record;
}

/** The record read for the rules. Throws when it contradicts itself, so that a test cannot pass by accident. */
export function jobWith(changes: Changes = {}): JobFacts {
  const parsed = parseJob(recordWith(changes));
  if (!parsed.ok) throw new Error(parsed.fields.map(({ path, message }) => `${path}: ${message}`).join("\n"));
  if (parsed.unread.length) throw new Error(`not in the record: ${parsed.unread.join(", ")}`);
  return parsed.value;
}

export const assessWith = (changes: Changes = {}, asAt = "2026-12-01", firm?: FirmRules): Assessment =>
  assess(jobWith(changes), asAt, firm);

export type Case = {
  n: string;
  situation: string;
  source: string;
  changes: Changes;
  expect: Record<string, unknown>;
};

export const casesIn = (file: string): Case[] =>
  JSON.parse(readFileSync(new URL(`../cases/${file}`, import.meta.url), "utf8")) as Case[];

/** The value a case names: a path, `deadlines[what]`, `reasons[rule]`, `settings[rule]`, `checks[rule]`, `missing`. */
export function found(assessment: Assessment, path: string): unknown {
  const named = /^(deadlines|reasons|settings|checks)\[([^\]]+)\](?:\.(.+))?$/.exec(path);
  if (path === "missing") return assessment.missing.map((each) => each.path);
  if (!named) return getAt(assessment, path);
  const [, list, name, rest] = named as unknown as [string, string, string, string | undefined];
  const all = {
    deadlines: assessment.deadlines,
    reasons: assessment.route.reasons,
    settings: assessment.smartCharging,
    checks: assessment.checks,
  }[list] as { what?: string; rule?: string }[];
  const entry = all.find((each) => each.what === name || each.rule === name);
  return rest === undefined ? (entry ?? null) : getAt(entry, rest);
}
