import { assessCircuits } from "@/lib/notify/checks/circuit";
import { assessDemand } from "@/lib/notify/checks/demand";
import { assessOpenPen } from "@/lib/notify/checks/open-pen";
import { powerQualityChecks } from "@/lib/notify/checks/power-quality";
import { supplyChecks } from "@/lib/notify/checks/supply";
import { parseJob, type JobFacts } from "@/lib/notify/job";
import type { Reason } from "@/lib/notify/result";
import base from "@/tests/cases/wiring/base-record.json";

export type Changes = Record<string, unknown>;

function setAt(target: unknown, path: readonly string[], value: unknown): void {
  const [head, ...rest] = path;
  const holder = target as Record<string, unknown>;
  if (head === undefined) return;
  if (rest.length === 0) holder[head] = value;
  else {
    holder[head] ??= {};
    setAt(holder[head], rest, value);
  }
}

/** The base record with facts changed: `supply.phases`, `circuits.0.device.rcdMa`. Throws when it contradicts itself. */
export function recordWith(changes: Changes = {}): JobFacts {
  const record: unknown = structuredClone(base);
  for (const [path, value] of Object.entries(changes)) setAt(record, path.split("."), structuredClone(value));
  const parsed = parseJob(record);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
  return parsed.value;
}

/** Every reason of the wiring families for a record. */
export function reasonsFor(job: JobFacts, on = "2026-11-20", buriedSeparationM: number | null = 3.5): Reason[] {
  return [
    ...assessDemand(job, on).checks,
    ...supplyChecks(job, on),
    ...assessCircuits(job, on).checks,
    ...assessOpenPen(job, on, { operatorId: "23", buriedSeparationM }).checks,
    ...powerQualityChecks(job, on),
  ];
}
