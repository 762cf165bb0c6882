"use server";

import { z } from "zod";
import { getSubmission, recordMove, recordNote, recordSent, sendByEmail } from "@/db/queries/submissions";
import { ok } from "@/lib/notify/result";
import { submissionChannels, submissionStates } from "@/lib/notify/submission";
import { viewerAction } from "@/lib/server/actions";

const id = z.uuid();
const version = z.coerce.number().int().positive();
const words = (max: number) => z.string().trim().max(max, `Use ${max} characters or fewer`);
const perhaps = (max: number) =>
  words(max)
    .nullish()
    .transform((value) => value || null);
const day = z.iso.date({ error: "Choose a day" });
const perhapsDay = z.preprocess((value) => value || null, day.nullable());
const packId = z.uuid({ error: "Seal a pack first: there is nothing to send" });

/** Puts the message and the sealed pack in the outbox. */
export const sendAct = viewerAction(
  z.object({
    submissionId: id,
    version,
    packId,
    to: z.email({ error: "Enter the operator’s e-mail address" }).max(254),
    subject: words(200).min(1, "Give the message a subject"),
    body: words(10_000).min(1, "Write the message"),
  }),
  sendByEmail,
);

/** Records what was sent outside this program. */
export const recordSentAct = viewerAction(
  z.object({
    submissionId: id,
    version,
    packId,
    channel: z.enum(submissionChannels),
    sentOn: day,
    sentTo: words(254).min(1, "Say where it was sent"),
    note: perhaps(2000),
  }),
  recordSent,
);

/** Records what the operator answered. */
export const recordMoveAct = viewerAction(
  z.object({
    submissionId: id,
    version,
    to: z.enum(submissionStates),
    on: day,
    reference: perhaps(60),
    limitA: z.preprocess(
      (value) => (value === "" || value === undefined ? null : value),
      z.coerce
        .number({ error: "Enter the limit in amps, such as 32" })
        .positive("Must be more than 0 A")
        .max(5000)
        .nullable(),
    ),
    expires: perhapsDay,
    note: perhaps(2000),
    spokeTo: perhaps(120),
  }),
  recordMove,
);

/** Records a call or a note. */
export const recordNoteAct = viewerAction(
  z.object({
    submissionId: id,
    kind: z.enum(["call", "note"]),
    text: words(2000).min(1, "Write what was said"),
    spokeTo: perhaps(120),
  }),
  recordNote,
);

const batch = z.object({
  papers: z
    .array(z.object({ submissionId: id, version, packId: id, jobNumber: words(40) }))
    .min(1)
    .max(25),
});

/** Sends several papers, each as its own e-mail; one that cannot leave does not hold back the rest. */
export const sendBatchAct = viewerAction(batch, async (viewer, { papers }) => {
  const sent: string[] = [];
  const failures: { jobNumber: string; message: string }[] = [];
  for (const { jobNumber, ...paper } of papers) {
    const found = await getSubmission(viewer, paper);
    const to = found.ok ? found.value.sendTo.email : null;
    const result = !found.ok
      ? found
      : to
        ? await sendByEmail(viewer, { ...paper, to, ...found.value.draft })
        : ({ ok: false, error: { code: "invalid", message: "no address is kept for this operator." } } as const);
    if (result.ok) sent.push(jobNumber);
    else failures.push({ jobNumber, message: result.error.message });
  }
  return ok({ sent, failed: failures });
});
