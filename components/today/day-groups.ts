import type { JobRow } from "@/lib/notify/views";

export type DayGroups = { today: JobRow[]; unfinished: JobRow[]; coming: JobRow[] };

/** The day a job is done on, as far as it is known. */
export const dayOfWork = ({ installedOn, plannedOn }: JobRow) => installedOn ?? plannedOn;

export const isThrough = ({ standing }: JobRow) => standing === "sealing" || standing === "sealed";

/** What is on today; what was left unfinished, the soonest last day first; what is to come, the soonest first. */
export function dayGroups(jobs: readonly JobRow[], today: string): DayGroups {
  const groups: DayGroups = { today: [], unfinished: [], coming: [] };
  for (const job of jobs) {
    const on = dayOfWork(job);
    if (on === today) groups.today.push(job);
    else if (on !== null && on > today) groups.coming.push(job);
    else groups.unfinished.push(job);
  }
  const soonest = (key: (job: JobRow) => string | null) => (a: JobRow, b: JobRow) =>
    (key(a) ?? "9999").localeCompare(key(b) ?? "9999");
  groups.unfinished.sort(soonest(({ lastDay }) => lastDay));
  groups.coming.sort(soonest(dayOfWork));
  return groups;
}

/** The job to go on with: today's first that is not sealed, else what was left unfinished, else the next to come. */
export const jobInHand = ({ today, unfinished, coming }: DayGroups): JobRow | null =>
  [...today, ...unfinished, ...coming].find((job) => !isThrough(job)) ?? null;
