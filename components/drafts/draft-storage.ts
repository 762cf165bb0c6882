import type { DraftState } from "./draft-state";

/** What is kept on the device until the server has it: only what was typed, never the whole job. */
type Kept = Pick<DraftState, "sending" | "pending" | "held" | "conflicts" | "since">;

const prefix = "sealwire.draft";
const keyOf = (userId: string, jobId: string) => `${prefix}/${userId}/${jobId}`;

const isEmpty = ({ sending, pending, held, conflicts }: Kept) =>
  !sending && pending.length === 0 && conflicts.length === 0 && Object.keys(held).length === 0;

/**
 * Keeps what is unsent. Written at once on each change, so that a closed tab loses nothing; cleared when all is sent.
 * Returns whether it could be kept: a full or forbidden store is said on the screen, and the form still works.
 */
export function keep(userId: string, jobId: string, state: DraftState): boolean {
  const { sending, pending, held, conflicts, since } = state;
  const kept: Kept = { sending, pending, held, conflicts, since };
  try {
    if (isEmpty(kept)) window.localStorage.removeItem(keyOf(userId, jobId));
    else window.localStorage.setItem(keyOf(userId, jobId), JSON.stringify(kept));
    return true;
  } catch (error) {
    console.warn("The draft could not be kept on this device.", error);
    return false;
  }
}

/** What an earlier visit left unsent for this person and job; null when there is nothing or it cannot be read. */
export function keptDraft(userId: string, jobId: string): Kept | null {
  try {
    const text = window.localStorage.getItem(keyOf(userId, jobId));
    if (!text) return null;
    const read = JSON.parse(text) as Partial<Kept>;
    return {
      sending: read.sending ?? null,
      pending: read.pending ?? [],
      held: read.held ?? {},
      conflicts: read.conflicts ?? [],
      since: read.since ?? null,
    };
  } catch (error) {
    console.warn("A kept draft could not be read.", error);
    return null;
  }
}

/** The jobs of this person that have something unsent on this device. */
export function keptJobs(userId: string): string[] {
  try {
    const mine = `${prefix}/${userId}/`;
    return Object.keys(window.localStorage)
      .filter((key) => key.startsWith(mine))
      .map((key) => key.slice(mine.length));
  } catch (error) {
    console.warn("The drafts on this device could not be listed.", error);
    return [];
  }
}
