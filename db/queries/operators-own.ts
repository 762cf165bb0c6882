import { and, count, eq, sql } from "drizzle-orm";
import { nowInstant } from "../clock";
import type { Tx } from "../client";
import { ownOperators } from "../firm-rules";
import { operatorName } from "../operator-names";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { jobs, operatorEntries, operatorSettings, submissions } from "../schema";
import { asFirm } from "../tenant";
import type { OwnOperator } from "@/lib/notify/firm-rules";
import { operatorEntry } from "@/lib/notify/operator-register";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

export type OwnOperatorInput = Omit<OwnOperator, "id" | "setOn"> & { operatorId: string };

const refusedId = (message: string): Result<never> => failed("invalid", message, [{ path: "operatorId", message }]);

const entryOf = (firmId: string, operatorId: string) =>
  and(eq(operatorEntries.firmId, firmId), eq(operatorEntries.operatorId, operatorId));

const columnsOf = ({ name, kind, division, from, source }: OwnOperatorInput) => ({
  name,
  kind,
  division,
  fromDay: from,
  source,
  setAt: nowInstant(),
});

async function stored(tx: Tx, firmId: string, operatorId: string): Promise<OwnOperator> {
  const entry = (await ownOperators(tx, firmId)).find(({ id }) => id === operatorId);
  if (!entry) throw new Error("the firm's entry of an operator was not stored");
  return entry;
}

/** Jobs whose readable supply number begins with the id are listed under the new name at once. */
const nameItsJobs = (tx: Tx, firmId: string, operatorId: string) =>
  tx
    .update(jobs)
    .set({ operatorId })
    .where(
      and(
        eq(jobs.firmId, firmId),
        eq(jobs.operatorId, "unknown"),
        sql`${jobs.supplyCore} ~ ${`^${operatorId}[0-9]{11}$`}`,
        sql`${jobs.record} -> 'site' ->> 'territory' is distinct from 'northern-ireland'`,
      ),
    );

/**
 * Enters an operator for a distributor id that the register lacks. Failures: `invalid` for an id of another shape or
 * one the register holds, `conflict` for one the firm has entered already.
 */
export async function addOperator(viewer: Viewer, input: OwnOperatorInput): Promise<Result<OwnOperator>> {
  const refused = refusal(viewer, "operators.manage");
  if (refused) return refused;
  const { operatorId } = input;
  if (!/^\d{2}$/.test(operatorId) || operatorId === "00")
    return refusedId("A distributor id is two digits, from 01 to 99");
  if (operatorEntry(operatorId))
    return refusedId(`${operatorId} is ${operatorName(operatorId)} in the register, whose name stands`);
  return asFirm(viewer, async (tx) => {
    const { firmId } = viewer;
    const added = await tx
      .insert(operatorEntries)
      .values({ firmId, operatorId, ...columnsOf(input) })
      .onConflictDoNothing()
      .returning({ id: operatorEntries.operatorId });
    if (!added.length) return failed("conflict", `This firm has entered ${operatorId} already. Open it to change it.`);
    await nameItsJobs(tx, firmId, operatorId);
    const about = { operatorId, operatorName: input.name, from: input.from, source: input.source };
    await recordEvent(tx, viewer, { type: "operator.entered", version: 1, ...about });
    return ok(await stored(tx, firmId, operatorId));
  });
}

const fieldWords = {
  name: "the name",
  kind: "the kind",
  division: "the holidays",
  from: "the day",
  source: "the source",
};

/** Changes the firm's own entry of an operator. Failure: `not-found`. */
export async function changeOperator(viewer: Viewer, input: OwnOperatorInput): Promise<Result<OwnOperator>> {
  const refused = refusal(viewer, "operators.manage");
  if (refused) return refused;
  const { operatorId } = input;
  return asFirm(viewer, async (tx) => {
    const { firmId } = viewer;
    const [before] = await tx.select().from(operatorEntries).where(entryOf(firmId, operatorId)).for("update");
    if (!before) return notFound("entry of an operator");
    const was = { ...before, from: before.fromDay };
    const fields = (Object.keys(fieldWords) as (keyof typeof fieldWords)[]).filter((name) => was[name] !== input[name]);
    if (!fields.length) return ok(await stored(tx, firmId, operatorId));
    await tx.update(operatorEntries).set(columnsOf(input)).where(entryOf(firmId, operatorId));
    const about = { operatorId, operatorName: input.name, fields: fields.map((name) => fieldWords[name]) };
    await recordEvent(tx, viewer, { type: "operator.entry-changed", version: 1, ...about });
    return ok(await stored(tx, firmId, operatorId));
  });
}

/**
 * Takes the firm's own entry out again, with what was set for it. Failures: `not-found`; `conflict` while a job or a
 * paper is under its name.
 */
export async function removeOperator(viewer: Viewer, { operatorId }: { operatorId: string }): Promise<Result<null>> {
  const refused = refusal(viewer, "operators.manage");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const { firmId } = viewer;
    const [entry] = await tx.select().from(operatorEntries).where(entryOf(firmId, operatorId)).for("update");
    if (!entry) return notFound("entry of an operator");
    const of = (table: typeof jobs | typeof submissions) =>
      tx
        .select({ held: count() })
        .from(table)
        .where(and(eq(table.firmId, firmId), eq(table.operatorId, operatorId)));
    const [work, papers] = [await of(jobs), await of(submissions)];
    if ((work[0]?.held ?? 0) + (papers[0]?.held ?? 0) > 0)
      return failed(
        "conflict",
        `Jobs or papers of this firm are under ${entry.name}, so its entry stays. Change it instead.`,
      );
    const mine = and(eq(operatorSettings.firmId, firmId), eq(operatorSettings.operatorId, operatorId));
    await tx.delete(operatorSettings).where(mine);
    await tx.delete(operatorEntries).where(entryOf(firmId, operatorId));
    const about = { operatorId, operatorName: entry.name };
    await recordEvent(tx, viewer, { type: "operator.entry-removed", version: 1, ...about });
    return ok(null);
  });
}
