import { sql } from "drizzle-orm";
import type { JobName } from "./jobs";
import { db } from "@/db/client";
import type { Viewer } from "../auth/viewer-of-session";
import { may } from "@/lib/notify/permissions";

export type DeadLetter = { id: string; work: JobName; at: string; data: Record<string, string> };

/**
 * Work of the firm that failed at its last try in about the last week, newest first. The queue's tables carry no
 * policy of their own, so the firm is in the question. Empty for somebody who may not read the firm's activity.
 */
export async function deadLettersOf(viewer: Viewer): Promise<DeadLetter[]> {
  if (!may(viewer.roles, "activity.read")) return [];
  const { rows } = await db.execute<DeadLetter>(sql`
    select id, replace(name, '-dead', '') as work, data,
      to_char(created_on at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"') as at
    from (
      select id, name, data, created_on from pgboss.job
      union all
      select id, name, data, created_on from pgboss.archive
    ) as work_put_down
    where name in ('build-pack-dead', 'relay-mail-dead') and data ->> 'firmId' = ${viewer.firmId}
    order by created_on desc
    limit 50`);
  return rows;
}
