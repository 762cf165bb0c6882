import type { Missing } from "../assessment";
import type { Reason } from "../result";

/**
 * What an answer does to the route: `stop` for danger, `apply` for a proven trigger, `hold` for a fact that
 * was not asked, `none` when the rule leaves the way to a notice open.
 */
export type Effect = "stop" | "apply" | "hold" | "none";

export type Finding = { reason: Reason; effect: Effect; missing: readonly Missing[] };

/** Joins an answer to its effect, which is also kept among the figures so that a screen can show what it leads to. */
export const finding = (reason: Reason, effect: Effect, missing: readonly Missing[] = []): Finding => ({
  reason: { ...reason, used: { ...reason.used, leadsTo: effect } },
  effect,
  missing,
});

export const need = (path: string, needed: string): Missing => ({ path, needed });

/** One entry a path: the first reason to ask for a fact is the one shown. */
export function unique(missing: readonly Missing[]): Missing[] {
  const seen = new Set<string>();
  return missing.filter(({ path }) => !seen.has(path) && seen.add(path));
}
