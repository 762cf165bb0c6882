import { and, desc, eq, lt, sql } from "drizzle-orm";
import { pageOf, pageSize, readCursor } from "../keyset";
import { isRowId, notFound, refusal } from "../permission";
import { events, jobs } from "../schema";
import { asFirm } from "../tenant";
import type { EvidenceSubject } from "@/lib/notify/job/papers";
import { eventSchema, sentence } from "@/lib/notify/events";
import { ok, type Result } from "@/lib/notify/result";
import type { EventView, Page } from "@/lib/notify/views";
import { subjectWords } from "@/templates/words/vocabulary";
import type { Viewer } from "@/lib/server/auth/viewer";

type Row = { type: string; payload: Record<string, unknown> };

/** What a photo shows, in the words of the documents: the record holds the name the program knows it by. */
function photoWords({ subject }: Row["payload"]) {
  const words = typeof subject === "string" && Object.hasOwn(subjectWords, subject) ? subject : null;
  return words ? { subject: inSentence(subjectWords[words as EvidenceSubject]) } : {};
}

const inSentence = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);

/** What happened in words; an event of a shape this program no longer writes is named by its type. */
function sentenceOf({ type, payload }: Row): string {
  const read = eventSchema.safeParse({ type, ...payload, ...photoWords(payload) });
  return read.success ? sentence(read.data) : type;
}

/** The firm's activity, newest first; of one job when it is named. Two statements whatever the rows. */
export async function listEvents(
  viewer: Viewer,
  { after, jobId }: { after: string | null; jobId: string | null },
): Promise<Result<Page<EventView>>> {
  const refused = refusal(viewer, "activity.read");
  if (refused) return refused;
  if (jobId !== null && !isRowId(jobId)) return notFound("job");
  const cursor = readCursor(after);
  const seq = cursor && /^\d{1,15}$/.test(cursor.key) ? Number(cursor.key) : null;
  return asFirm(viewer, async (tx) => {
    const where = and(eq(events.firmId, viewer.firmId), jobId ? eq(events.jobId, jobId) : undefined);
    const rows = await tx
      .select({
        id: events.id,
        seq: events.seq,
        at: events.at,
        actor: events.actorName,
        type: events.type,
        payload: events.payload,
        jobId: events.jobId,
        jobNumber: jobs.number,
        hash: events.hash,
      })
      .from(events)
      .leftJoin(jobs, and(eq(jobs.firmId, events.firmId), eq(jobs.id, events.jobId)))
      .where(and(where, seq === null ? undefined : lt(events.seq, seq)))
      .orderBy(desc(events.seq))
      .limit(pageSize + 1);
    const total = await tx.$count(events, where);
    const page = pageOf(rows, (row) => ({ key: String(row.seq), id: row.id }));
    return ok({
      next: page.next,
      total,
      rows: page.rows.map((row) => ({
        id: row.id,
        at: row.at,
        actor: row.actor,
        type: row.type,
        sentence: sentenceOf(row),
        jobId: row.jobId,
        jobNumber: row.jobNumber,
        hash8: row.hash.slice(0, 8),
      })),
    });
  });
}

export type ChainCheck = {
  intact: boolean;
  count: number;
  /** Hash of the newest event, the head of the chain. */
  head: string | null;
  /** The first event that does not follow from the one before it. */
  firstBad: { id: string; number: number; at: string } | null;
};

/** Works every hash out again in the firm's order and names the first event that does not fit. */
export async function verifyChain(viewer: Viewer): Promise<Result<ChainCheck>> {
  const refused = refusal(viewer, "activity.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const { rows } = await tx.execute<{ id: string; seq: string; at: string }>(sql`
      with chain as (
        select e, e.id, e.seq, e.at, e.hash, e.previous_hash,
          lag(e.hash, 1, repeat('0', 64)) over (order by e.seq) as before,
          row_number() over (order by e.seq) as place
        from events e where e.firm_id = ${viewer.firmId})
      select id, seq, at from chain
      where previous_hash <> before or seq <> place or hash <> event_hash(before, e)
      order by seq limit 1`);
    const [head] = await tx
      .select({ seq: events.seq, hash: events.hash })
      .from(events)
      .where(eq(events.firmId, viewer.firmId))
      .orderBy(desc(events.seq))
      .limit(1);
    const [bad] = rows;
    return ok({
      intact: !bad,
      count: head?.seq ?? 0,
      head: head?.hash ?? null,
      firstBad: bad ? { id: bad.id, number: Number(bad.seq), at: new Date(bad.at).toISOString() } : null,
    });
  });
}
