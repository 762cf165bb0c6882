import { and, count, eq, ne, sql } from "drizzle-orm";
import { londonDay, nowInstant, today } from "../clock";
import { groundsOf, ownOperators } from "../firm-rules";
import { operatorName } from "../operator-names";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { jobs, operatorSettings, submissions } from "../schema";
import { asFirm } from "../tenant";
import { needsSomeone } from "./submission-tabs";
import {
  ownFigureNames,
  type Ground,
  type Grounds,
  type OwnFigureName,
  type OwnOperator,
} from "@/lib/notify/firm-rules";
import { operatorEntry, operatorRegister, type OperatorEntry } from "@/lib/notify/operator-register";
import { mailboxesOf, ownEntryOf, type Mailboxes } from "@/lib/notify/operators";
import { ok, type Result } from "@/lib/notify/result";
import type { OperatorSettings } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";

type ListedOperator = {
  /** As the register has it; of an operator the firm has entered itself, `own` and what it says. */
  entry: Omit<OperatorEntry, "names" | "traits">;
  own: OwnOperator | null;
  /** Where papers go while the firm has set nothing. */
  mailboxes: Mailboxes | null;
  settings: OperatorSettings;
  /** Papers that need somebody, and jobs not closed. */
  openPapers: number;
  openJobs: number;
};

/** An own entry in the shape of the register's. */
function entryOf({ setOn: _setOn, ...own }: OwnOperator): ListedOperator["entry"] {
  return { ...own, area: "not in the register, entered by this firm", group: own.name };
}

const nothingSet = (operatorId: string): OperatorSettings => ({
  operatorId,
  noticeEmail: null,
  applicationEmail: null,
  phone: null,
  page: null,
  noticeDays: null,
  buriedSeparationM: null,
  asksFirstAboveA: null,
  assumesFuseA: null,
  grounds: {},
  note: null,
});

function settingsOf(row: typeof operatorSettings.$inferSelect): OperatorSettings {
  const { firmId: _firm, updatedAt: _at, ...settings } = row;
  return { ...settings, grounds: groundsOf(row) };
}

/**
 * Every operator of the register, then those the firm has entered itself, with what the firm has set for each and how
 * much is open. Three statements.
 */
export async function listOperators(viewer: Viewer): Promise<Result<ListedOperator[]>> {
  const refused = refusal(viewer, "operators.read");
  if (refused) return refused;
  const { firmId } = viewer;
  return asFirm(viewer, async (tx) => {
    const set = await tx.select().from(operatorSettings).where(eq(operatorSettings.firmId, firmId));
    const entered = (await ownOperators(tx, firmId)).filter(({ id }) => !operatorEntry(id));
    const open = await tx
      .select({ id: submissions.operatorId, what: sql<"papers" | "jobs">`'papers'`, held: count() })
      .from(submissions)
      .where(and(eq(submissions.firmId, firmId), needsSomeone(today())))
      .groupBy(submissions.operatorId)
      .unionAll(
        tx
          .select({ id: jobs.operatorId, what: sql<"papers" | "jobs">`'jobs'`, held: count() })
          .from(jobs)
          .where(and(eq(jobs.firmId, firmId), ne(jobs.standing, "closed")))
          .groupBy(jobs.operatorId),
      );
    const openOf = (what: "papers" | "jobs", id: string) =>
      open.find((row) => row.what === what && row.id === id)?.held ?? 0;
    const of = (id: string) => {
      const row = set.find(({ operatorId }) => operatorId === id);
      return {
        mailboxes: mailboxesOf(id),
        settings: row ? settingsOf(row) : nothingSet(id),
        openPapers: openOf("papers", id),
        openJobs: openOf("jobs", id),
      };
    };
    return ok([
      ...operatorRegister.map((entry) => ({ entry, own: null, ...of(entry.id) })),
      ...entered.map((own) => ({ entry: entryOf(own), own, ...of(own.id) })),
    ]);
  });
}

/** What a person enters of an operator. The day a figure was set is the program's to say; what is left out is not set. */
export type OperatorInput = Omit<OperatorSettings, "grounds" | "asksFirstAboveA" | "assumesFuseA"> &
  Partial<Pick<OperatorSettings, "asksFirstAboveA" | "assumesFuseA">> & {
    grounds?: Partial<Record<OwnFigureName, Omit<Ground, "setOn">>>;
  };

const fieldWords = {
  noticeEmail: "the address for notices",
  applicationEmail: "the address for applications",
  phone: "the telephone number",
  page: "the page",
  noticeDays: "the days for a notice",
  buriedSeparationM: "the distance between buried electrodes",
  asksFirstAboveA: "the demand above which it is asked first",
  assumesFuseA: "the fuse it refits",
  note: "the note",
} as const;
type Field = keyof typeof fieldWords;

/** A figure keeps the day it was set while neither it nor what it rests on changes. */
function groundsAfter(input: OperatorInput, was: OperatorSettings): Grounds {
  const set = ownFigureNames.filter((name) => (input[name] ?? null) !== null);
  return Object.fromEntries(
    set.map((name) => {
      const { from = null, source = null } = input.grounds?.[name] ?? {};
      const before = was.grounds[name];
      const same = was[name] === input[name] && before?.from === from && before.source === source;
      return [name, { from, source, setOn: same ? before.setOn : londonDay(nowInstant()) }];
    }),
  );
}

const groundWords = ({ grounds }: OperatorSettings, name: Field) =>
  name in grounds ? JSON.stringify(grounds[name as OwnFigureName]) : "";

/**
 * Keeps what the firm has learned of an operator, each figure with the day it was set. Failure: `not-found` for one
 * that neither the register nor the firm's own entries hold.
 */
export async function saveOperatorSettings(viewer: Viewer, input: OperatorInput): Promise<Result<OperatorSettings>> {
  const refused = refusal(viewer, "operators.manage");
  if (refused) return refused;
  const { operatorId, noticeEmail, applicationEmail, phone, page, noticeDays, buriedSeparationM, note } = input;
  const { asksFirstAboveA = null, assumesFuseA = null } = input;
  return asFirm(viewer, async (tx) => {
    const own = ownEntryOf(operatorId, await ownOperators(tx, viewer.firmId));
    if (!operatorEntry(operatorId) && !own) return notFound("operator");
    const mine = and(eq(operatorSettings.firmId, viewer.firmId), eq(operatorSettings.operatorId, operatorId));
    const [before] = await tx.select().from(operatorSettings).where(mine).for("update");
    const was = before ? settingsOf(before) : nothingSet(operatorId);
    const set = {
      ...{ noticeEmail, applicationEmail, phone, page, note },
      ...{ noticeDays, buriedSeparationM, asksFirstAboveA, assumesFuseA },
      grounds: groundsAfter(input, was),
      updatedAt: nowInstant(),
    };
    const [row] = await tx
      .insert(operatorSettings)
      .values({ firmId: viewer.firmId, operatorId, ...set })
      .onConflictDoUpdate({ target: [operatorSettings.firmId, operatorSettings.operatorId], set })
      .returning();
    if (!row) throw new Error("operator settings were not stored");
    const after = settingsOf(row);
    const fields = (Object.keys(fieldWords) as Field[])
      .filter((name) => was[name] !== after[name] || groundWords(was, name) !== groundWords(after, name))
      .map((name) => fieldWords[name]);
    const about = { operatorId, operatorName: own?.name ?? operatorName(operatorId), fields };
    if (fields.length) await recordEvent(tx, viewer, { type: "operator.settings-saved", version: 1, ...about });
    return ok(after);
  });
}
