import { and, eq, inArray } from "drizzle-orm";
import { refusal } from "../permission";
import { jobs, outbox, packs } from "../schema";
import { asFirm } from "../tenant";
import { ok, type Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";
import { deadLettersOf } from "@/lib/server/queue/dead-letters";

export type PutDownWork = { id: string; what: string; at: string };

/**
 * Work that was given up after its last try in about the last week, newest first, each in a sentence that names the
 * mail or the pack. At most three statements whatever the rows.
 */
export async function listPutDown(viewer: Viewer): Promise<Result<PutDownWork[]>> {
  const refused = refusal(viewer, "activity.read");
  if (refused) return refused;
  const letters = await deadLettersOf(viewer);
  const idsOf = (name: string) => letters.map(({ data }) => data[name]).filter((id) => id !== undefined);
  const mailIds = idsOf("outboxId");
  const packIds = idsOf("packId");
  if (letters.length === 0) return ok([]);
  return asFirm(viewer, async (tx) => {
    const mails = await tx
      .select({ id: outbox.id, to: outbox.to, subject: outbox.subject, error: outbox.lastError })
      .from(outbox)
      .where(and(eq(outbox.firmId, viewer.firmId), inArray(outbox.id, mailIds)));
    const built = await tx
      .select({ id: packs.id, version: packs.version, jobNumber: jobs.number, error: packs.error })
      .from(packs)
      .innerJoin(jobs, and(eq(jobs.firmId, packs.firmId), eq(jobs.id, packs.jobId)))
      .where(and(eq(packs.firmId, viewer.firmId), inArray(packs.id, packIds)));
    const mailWords = ({ to, subject, error }: (typeof mails)[number]) =>
      `The e-mail “${subject}” to ${to} did not leave.${error ? ` ${error}` : ""}`;
    const packWords = ({ jobNumber, version, error }: (typeof built)[number]) =>
      `Version ${version} of the pack of ${jobNumber} was not built.${error ? ` ${error}` : ""}`;
    const words = new Map([
      ...mails.map((mail) => [mail.id, mailWords(mail)] as const),
      ...built.map((pack) => [pack.id, packWords(pack)] as const),
    ]);
    return ok(
      letters.map(({ id, work, at, data }) => ({
        id,
        at,
        what:
          words.get(data.outboxId ?? data.packId ?? "") ??
          (work === "relay-mail" ? "An e-mail did not leave." : "A pack was not built."),
      })),
    );
  });
}
