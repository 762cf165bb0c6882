import { and, asc, count, desc, eq, like, lt, sql, type SQL } from "drizzle-orm";
import type { AnyPgColumn } from "drizzle-orm/pg-core";
import type { Tx } from "../client";
import { isDay, isInstant, readCursor, pageOf, pageSize, type Cursor } from "../keyset";
import { operatorName, ownName } from "../operator-names";
import { isRowId } from "../permission";
import { jobs, users } from "../schema";
import type { JobFilter, JobRow, Page } from "@/lib/notify/views";
import { isFitText } from "@/lib/server/fit-to-keep";

export const jobRowColumns = {
  id: jobs.id,
  number: jobs.number,
  stage: jobs.stage,
  site: jobs.site,
  postcode: jobs.postcode,
  operatorId: jobs.operatorId,
  ownOperatorName: ownName("jobs"),
  unit: jobs.unit,
  route: jobs.route,
  standing: jobs.standing,
  installerName: users.name,
  installedOn: jobs.installedOn,
  plannedOn: jobs.plannedOn,
  lastDay: jobs.lastDay,
  missingCount: jobs.missingCount,
  version: jobs.version,
  updatedAt: jobs.updatedAt,
};

export const toJobRow = ({
  ownOperatorName,
  ...row
}: Omit<JobRow, "operatorName"> & { ownOperatorName: string | null }): JobRow => ({
  ...row,
  operatorName: operatorName(row.operatorId, ownOperatorName),
});

/** Rows of an operator. A text that the database could not hold names none. */
export const ofOperator = (column: AnyPgColumn, operatorId: string | null): SQL | undefined => {
  if (!operatorId) return undefined;
  return isFitText(operatorId) ? eq(column, operatorId) : sql`false`;
};

/** Each word must stand somewhere in the job's search text; `%` and `_` are letters like any other. */
export const searchWords = (column: SQL | typeof jobs.search, q: string | null): SQL[] =>
  (q ?? "")
    .toLowerCase()
    .split(/\s+/)
    .filter(Boolean)
    .slice(0, 8)
    .map((word) => (isFitText(word) ? word : ""))
    .map((word) => like(column, `%${word.replace(/[\\%_]/g, "\\$&")}%`));

const noDay = "infinity";

type Order = { by: SQL[]; after: (cursor: Cursor) => SQL | undefined; keyOf: (row: JobRow) => string };

const orders: Record<JobFilter["sort"], Order> = {
  "last-day": {
    by: [asc(jobs.lastDayKey), asc(jobs.id)],
    after: ({ key, id }) => sql`(${jobs.lastDayKey}, ${jobs.id}) > (${key}::date, ${id}::uuid)`,
    keyOf: (row) => row.lastDay ?? noDay,
  },
  updated: {
    by: [desc(jobs.updatedAt), desc(jobs.id)],
    after: ({ key, id }) => sql`(${jobs.updatedAt}, ${jobs.id}) < (${key}::timestamptz, ${id}::uuid)`,
    keyOf: (row) => row.updatedAt,
  },
  number: {
    by: [desc(jobs.number)],
    after: ({ key }) => lt(jobs.number, key),
    keyOf: (row) => row.number,
  },
};

/** A cursor that is not of this order would be a wrong cast in the database; it starts the list at its head. */
const fits: Record<JobFilter["sort"], (key: string) => boolean> = {
  "last-day": (key) => key === noDay || isDay(key),
  updated: isInstant,
  number: (key) => /^[A-Za-z0-9/-]{1,30}$/.test(key),
};

/** One page of a firm's jobs: two statements whatever the rows. */
export async function jobPage(tx: Tx, firmId: string, filter: JobFilter): Promise<Page<JobRow>> {
  const order = orders[filter.sort];
  const cursor = readCursor(filter.after);
  const usable = cursor && fits[filter.sort](cursor.key) && isRowId(cursor.id) ? cursor : null;
  const asked = and(
    eq(jobs.firmId, firmId),
    filter.stage ? eq(jobs.stage, filter.stage) : undefined,
    filter.standing ? eq(jobs.standing, filter.standing) : undefined,
    ofOperator(jobs.operatorId, filter.operatorId),
    filter.route ? eq(jobs.route, filter.route) : undefined,
    filter.installerId ? eq(jobs.installerId, filter.installerId) : undefined,
    ...searchWords(jobs.search, filter.q),
  );
  const rows = await tx
    .select(jobRowColumns)
    .from(jobs)
    .leftJoin(users, eq(users.id, jobs.installerId))
    .where(and(asked, usable ? order.after(usable) : undefined))
    .orderBy(...order.by)
    .limit(pageSize + 1);
  const [all] = await tx.select({ total: count() }).from(jobs).where(asked);
  const page = pageOf(rows.map(toJobRow), (row) => ({ key: order.keyOf(row), id: row.id }));
  return { ...page, total: all?.total ?? 0 };
}
