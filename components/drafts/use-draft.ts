"use client";

import { useEffect, useState, useSyncExternalStore } from "react";
import type { AssessmentSummary, JobView } from "@/lib/notify/views";
import { createDraftStore, type DraftStore, type DraftView } from "./draft-store";

/** One store a job for as long as the tab lives, so that moving between screens neither loses nor sends twice. */
const stores = new Map<string, DraftStore>();

function storeFor(job: JobView, userId: string, summary: AssessmentSummary | null): DraftStore {
  const make = () => createDraftStore({ jobId: job.id, userId, record: job.record, version: job.version, summary });
  if (typeof window === "undefined") return make();
  const key = `${userId}/${job.id}`;
  const store = stores.get(key) ?? make();
  stores.set(key, store);
  return store;
}

/**
 * The draft of a job on this device: what the record is with everything typed, and the ways to change it.
 * @param userId whose draft it is; another person signed in on the same device never sends it.
 */
export function useDraft(
  job: JobView,
  userId: string,
  summary: AssessmentSummary | null,
): DraftView & { store: DraftStore } {
  const [store] = useState(() => storeFor(job, userId, summary));
  const [atFirst] = useState(() => store.view());
  const view = useSyncExternalStore(store.subscribe, store.view, () => atFirst);
  useEffect(() => store.start(), [store]);
  useEffect(() => store.absorb(job.record, job.version), [store, job.record, job.version]);
  return { ...view, store };
}
