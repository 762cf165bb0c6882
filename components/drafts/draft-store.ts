import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import {
  absorbed,
  chosen,
  currentRecord,
  type DraftState,
  edited,
  held,
  inConflict,
  newDraft,
  refused,
  saved,
  unsentCount,
  withBatch,
} from "./draft-state";
import { keep, keptDraft } from "./draft-storage";
import { fetchJob, sendBatch } from "./save-request";

/** How the sending stands, for the line at the top of a screen. */
export type Standing = "saved" | "waiting" | "sending" | "unreachable" | "signed-out" | "gone";

export type DraftView = DraftState & {
  record: Job;
  standing: Standing;
  unsent: number;
  /** False when this device cannot keep what is typed. */
  kept: boolean;
  /** A refusal that belongs to no field. */
  message: string | null;
};

export type DraftStore = ReturnType<typeof createDraftStore>;

const quietMs = 600;
const longestWaitMs = 30_000;

type Options = { jobId: string; userId: string; record: Job; version: number; summary: AssessmentSummary | null };

/**
 * Holds one job's draft: keeps each change on the device at once, sends them in batches one at a time, waits longer
 * after each failure, and starts again when the network or the tab comes back.
 */
export function createDraftStore({ jobId, userId, record, version, summary }: Options) {
  let state = newDraft(record, version, summary);
  let standing: Standing = "saved";
  let keptHere = true;
  let message: string | null = null;
  let failures = 0;
  let timer: ReturnType<typeof setTimeout> | null = null;
  let busy = false;
  let view = look();
  const listeners = new Set<() => void>();

  function look(): DraftView {
    return { ...state, record: currentRecord(state), standing, unsent: unsentCount(state), kept: keptHere, message };
  }
  function set(next: DraftState, now: Standing = standing) {
    state = next;
    standing = now;
    keptHere = keep(userId, jobId, state);
    view = look();
    for (const listener of listeners) listener();
  }
  function later(ms: number) {
    if (timer) clearTimeout(timer);
    timer = setTimeout(() => void send(), ms);
  }

  async function send(): Promise<void> {
    if (timer) clearTimeout(timer);
    timer = null;
    if (busy) return;
    const next = withBatch(state, crypto.randomUUID());
    if (!next.sending) return;
    busy = true;
    set(next, "sending");
    const answer = await sendBatch(jobId, next.sending);
    busy = false;
    message = null;
    if (answer.kind === "saved") {
      failures = 0;
      set(saved(state, answer.reply.version, answer.reply.assessment), state.pending.length ? "waiting" : "saved");
      if (state.pending.length) later(0);
    } else if (answer.kind === "conflict") {
      set(inConflict(state, answer.reply), "waiting");
      await readAgain();
      if (state.pending.length) later(0);
    } else if (answer.kind === "refused") {
      takeRefusal(answer);
    } else if (answer.kind === "unreachable") {
      failures += 1;
      set(state, "unreachable");
      later(Math.min(longestWaitMs, 1000 * 2 ** (failures - 1)));
    } else set(state, answer.kind);
  }

  function takeRefusal({ message: said, fields }: { message: string; fields: Parameters<typeof refused>[1] }) {
    const before = Object.keys(state.held).length;
    const after = refused(state, fields);
    const named = Object.keys(after.held).length > before;
    if (!named) message = said;
    set(after, after.pending.length && named ? "waiting" : "saved");
    if (named && state.pending.length) later(0);
  }

  async function readAgain() {
    const job = await fetchJob(jobId);
    if (job) set(absorbed(state, job.record, job.version));
  }

  return {
    jobId,
    subscribe(listener: () => void) {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
    view: () => view,
    /** Takes up what an earlier visit left, sends it, and follows the network; returns how to stop following. */
    start() {
      const kept = keptDraft(userId, jobId);
      if (kept && unsentCount(state) === 0) set({ ...state, ...kept }, "waiting");
      if (state.sending || state.pending.length) later(0);
      const wake = () => {
        if (document.visibilityState === "visible" && (state.sending || state.pending.length)) later(0);
      };
      const leave = () => {
        if (document.visibilityState === "hidden") void send();
      };
      window.addEventListener("online", wake);
      document.addEventListener("visibilitychange", wake);
      document.addEventListener("visibilitychange", leave);
      return () => {
        window.removeEventListener("online", wake);
        document.removeEventListener("visibilitychange", wake);
        document.removeEventListener("visibilitychange", leave);
      };
    },
    edit(path: string, value: unknown) {
      message = null;
      set(edited(state, path, value, Date.now()), standing === "saved" ? "waiting" : standing);
      if (state.pending.length) later(quietMs);
      else if (!state.sending) set(state, "saved");
    },
    hold(path: string, typed: unknown, why: string) {
      set(held(state, path, typed, why));
    },
    choose(path: string, whose: "yours" | "theirs") {
      set(chosen(state, path, whose, Date.now()));
      if (state.pending.length) later(0);
    },
    sendNow: () => send(),
    /** The server's own copy, when a page was drawn from a newer one. */
    absorb(base: Job, newer: number) {
      if (newer > state.version) set(absorbed(state, base, newer));
    },
  };
}
