import { and, asc, eq, sql, type SQL } from "drizzle-orm";
import { today } from "../clock";
import type { Tx } from "../client";
import { isDay, pageOf, pageSize, readCursor } from "../keyset";
import { isRowId } from "../permission";
import { operatorName, ownName } from "../operator-names";
import { jobs, packs, submissions } from "../schema";
import { ofOperator, searchWords } from "./job-rows";
import { tabNames, tabWhere, type Tab } from "./submission-tabs";
import { nextStep } from "@/lib/notify/chase";
import type { Job } from "@/lib/notify/job";
import { divisionOf } from "@/lib/notify/operators";
import type { Page, SubmissionFilter, SubmissionRow } from "@/lib/notify/views";
import { workingDaysBetween } from "@/lib/notify/working-days";

export const submissionColumns = {
  id: submissions.id,
  jobId: submissions.jobId,
  jobNumber: jobs.number,
  site: jobs.site,
  operatorId: submissions.operatorId,
  ownOperatorName: ownName("submissions"),
  purpose: submissions.purpose,
  state: submissions.state,
  channel: submissions.channel,
  packId: submissions.packId,
  packVersion: packs.version,
  packHash: packs.sha256,
  sentOn: submissions.sentOn,
  reference: submissions.reference,
  version: submissions.version,
  lastDay: submissions.lastDay,
  heardOn: submissions.heardOn,
  expiresOn: submissions.expiresOn,
  dueKey: submissions.dueKey,
  territory: sql<Job["site"]["territory"]>`${jobs.record} -> 'site' ->> 'territory'`,
};

export const submissionRows = (tx: Tx, where: SQL | undefined) =>
  tx
    .select(submissionColumns)
    .from(submissions)
    .innerJoin(jobs, and(eq(jobs.firmId, submissions.firmId), eq(jobs.id, submissions.jobId)))
    .innerJoin(packs, and(eq(packs.firmId, submissions.firmId), eq(packs.id, submissions.packId)))
    .where(where)
    .$dynamic();

export type SubmissionRecord = Awaited<ReturnType<typeof submissionRows>>[number];

/** A stored paper as the desk shows it on the day `on`: with its next step and the working days gone by. */
export function toSubmissionRow(record: SubmissionRecord, on = today()): SubmissionRow {
  const { lastDay, heardOn, expiresOn, dueKey: _key, territory, packHash, ownOperatorName, ...row } = record;
  const division = divisionOf(row.operatorId, territory);
  const step = nextStep({
    purpose: row.purpose,
    state: row.state,
    division,
    asAt: on,
    lastDay,
    sentOn: row.sentOn,
    lastHeardOn: heardOn,
    expires: expiresOn,
  });
  return {
    ...row,
    operatorName: operatorName(row.operatorId, ownOperatorName),
    packHash8: packHash?.slice(0, 8) ?? null,
    workingDaysSinceSent: row.sentOn ? workingDaysBetween(row.sentOn, on, division) : null,
    dueOn: step.dueOn,
    daysLeft: step.daysLeft,
    nextStep: step.text,
  };
}

/** Everything a filter asks but its tab: the tabs' counts are taken over the same rows. */
const filterWhere = (firmId: string, filter: SubmissionFilter) =>
  and(
    eq(submissions.firmId, firmId),
    ofOperator(submissions.operatorId, filter.operatorId),
    filter.purpose ? eq(submissions.purpose, filter.purpose) : undefined,
    ...searchWords(jobs.search, filter.q),
  );

async function tabCounts(tx: Tx, where: SQL | undefined, on: string): Promise<Record<Tab, number>> {
  const tabs = tabWhere(on);
  const columns = Object.fromEntries(
    tabNames.map((tab) => [
      tab,
      (tabs[tab] ? sql<number>`count(*) filter (where ${tabs[tab]})` : sql<number>`count(*)`).mapWith(Number),
    ]),
  ) as Record<Tab, SQL<number>>;
  const [row] = await tx
    .select(columns)
    .from(submissions)
    .innerJoin(jobs, and(eq(jobs.firmId, submissions.firmId), eq(jobs.id, submissions.jobId)))
    .where(where);
  return row ?? (Object.fromEntries(tabNames.map((tab) => [tab, 0])) as Record<Tab, number>);
}

export type SubmissionPage = Page<SubmissionRow> & { tabs: Record<Tab, number> };

/** One page of the desk, sorted by the day the next step falls. Two statements whatever the rows. */
export async function submissionPage(tx: Tx, firmId: string, filter: SubmissionFilter): Promise<SubmissionPage> {
  const on = today();
  const where = filterWhere(firmId, filter);
  const cursor = readCursor(filter.after);
  const usable = cursor && (cursor.key === "infinity" || isDay(cursor.key)) && isRowId(cursor.id);
  const after = usable
    ? sql`(${submissions.dueKey}, ${submissions.id}) > (${cursor.key}::date, ${cursor.id}::uuid)`
    : undefined;
  const records = await submissionRows(tx, and(where, tabWhere(on)[filter.tab], after))
    .orderBy(asc(submissions.dueKey), asc(submissions.id))
    .limit(pageSize + 1);
  const tabs = await tabCounts(tx, where, on);
  const page = pageOf(records, (record) => ({ key: record.dueKey, id: record.id }));
  return {
    rows: page.rows.map((record) => toSubmissionRow(record, on)),
    next: page.next,
    total: tabs[filter.tab],
    tabs,
  };
}

/** Every row of a tab, for the export: at most 5,000. */
export async function allSubmissions(tx: Tx, firmId: string, filter: SubmissionFilter): Promise<SubmissionRow[]> {
  const on = today();
  const records = await submissionRows(tx, and(filterWhere(firmId, filter), tabWhere(on)[filter.tab]))
    .orderBy(asc(submissions.dueKey), asc(submissions.id))
    .limit(5_000);
  return records.map((record) => toSubmissionRow(record, on));
}
