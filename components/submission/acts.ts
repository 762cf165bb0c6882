import type { ActionState } from "@/lib/notify/result";

type Act = (input: unknown) => Promise<ActionState<unknown>>;

/** The server actions a submission is worked with; pages pass them in. */
export type SubmissionActs = {
  /** {submissionId, version, packId, to, subject, body} */ send: Act;
  /** {submissionId, version, packId, channel, sentOn, sentTo, note} */ recordSent: Act;
  /** {submissionId, version, to, on, reference, limitA, expires, note, spokeTo} */ recordMove: Act;
  /** {submissionId, kind, text, spokeTo} */ recordNote: Act;
};
