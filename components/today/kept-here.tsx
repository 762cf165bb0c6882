"use client";

import type { Route } from "next";
import Link from "next/link";
import { useSyncExternalStore } from "react";
import { keptDraft, keptJobs } from "@/components/drafts/draft-storage";
import { counted } from "@/components/ui/counted";

/** What is kept on this device and not yet sent: how many jobs, how old, and the way to the first of them. */
export function KeptHere({ userId }: { userId: string }) {
  const kept = useSyncExternalStore(
    subscribe,
    () => snapshotOf(userId),
    () => nothing,
  );
  const { jobIds, since } = JSON.parse(kept) as Kept;
  const first = jobIds[0];
  if (!first) return null;
  return (
    <div className="unsent">
      <p role="status">
        <b className="strong">Changes to {counted(jobIds.length, "job")} are kept here, not sent</b>
        {since !== null && <>, the oldest since {new Date(since).toLocaleTimeString("en-GB", clock)}</>}.
      </p>
      <Link className="btn" href={`/jobs/${first}` as Route}>
        Send
      </Link>
    </div>
  );
}

type Kept = { jobIds: string[]; since: number | null };

const clock = { hour: "2-digit", minute: "2-digit" } as const;
const nothing = JSON.stringify({ jobIds: [], since: null } satisfies Kept);

/** As text, so that two readings of the same drafts are the same value. */
function snapshotOf(userId: string) {
  const jobIds = keptJobs(userId).sort();
  const begun = jobIds.map((jobId) => keptDraft(userId, jobId)?.since ?? null).filter((since) => since !== null);
  return JSON.stringify({ jobIds, since: begun.length > 0 ? Math.min(...begun) : null } satisfies Kept);
}

function subscribe(changed: () => void) {
  const events = ["storage", "online", "focus"] as const;
  for (const event of events) window.addEventListener(event, changed);
  return () => {
    for (const event of events) window.removeEventListener(event, changed);
  };
}
