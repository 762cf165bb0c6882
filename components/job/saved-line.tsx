"use client";

import { useSyncExternalStore } from "react";
import type { DraftStore, DraftView } from "@/components/drafts/draft-store";
import { TickIcon } from "@/components/ui/icons";

const tickMs = 30_000;
const everyHalfMinute = (listener: () => void) => {
  const timer = setInterval(listener, tickMs);
  return () => clearInterval(timer);
};
/** The time to the half minute, so that two reads in one drawing agree. */
const halfMinute = () => Math.floor(Date.now() / tickMs) * tickMs;

/** "just now", "4 min", "2 h" */
function ageInWords(since: number, now: number): string {
  const minutes = Math.floor((now - since) / 60_000);
  if (minutes < 1) return "just now";
  return minutes < 60 ? `${minutes} min` : `${Math.floor(minutes / 60)} h`;
}

/** Whether all that was typed is on the server, or how much waits here and for how long. */
export function SavedLine({ draft }: { draft: DraftView & { store: DraftStore } }) {
  const now = useSyncExternalStore(everyHalfMinute, halfMinute, () => 0);
  const { standing, unsent, since, kept, conflicts, held, store } = draft;
  const waiting = unsent - conflicts.length - Object.keys(held).length;
  const again = (
    <button type="button" className="saved-again" onClick={() => void store.sendNow()}>
      Send now
    </button>
  );
  return (
    <span className="site__saved" role="status">
      {standing === "gone" ? (
        <span>This job is not here any more</span>
      ) : standing === "signed-out" ? (
        <a href="/sign-in">Sign in to send {waiting}</a>
      ) : standing === "unreachable" ? (
        <>
          <span>
            {waiting} to send{since ? `, ${ageInWords(since, now)}` : ""}
          </span>
          {again}
        </>
      ) : waiting > 0 && !kept ? (
        <span>No room to keep this here</span>
      ) : waiting > 0 ? (
        <>
          <TickIcon /> Saved on this device
        </>
      ) : unsent > 0 ? (
        <span>{unsent} not saved</span>
      ) : (
        <>
          <TickIcon /> Saved
        </>
      )}
    </span>
  );
}
