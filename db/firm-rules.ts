import { eq } from "drizzle-orm";
import { londonDay } from "./clock";
import type { Tx } from "./client";
import { operatorEntries, operatorSettings } from "./schema";
import { ownFigureNames, type FirmRules, type Grounds, type OwnOperator } from "@/lib/notify/firm-rules";

type Stored = Pick<
  typeof operatorSettings.$inferSelect,
  "noticeDays" | "buriedSeparationM" | "asksFirstAboveA" | "assumesFuseA" | "grounds" | "updatedAt"
>;

/** What each figure rests on. One kept before its grounds were asked for was set when the row was last saved. */
export const groundsOf = (row: Stored): Grounds =>
  Object.fromEntries(
    ownFigureNames
      .filter((name) => row[name] !== null)
      .map((name) => [name, row.grounds[name] ?? { from: null, source: null, setOn: londonDay(row.updatedAt) }]),
  );

/** A firm's own entries for distributor ids that the register lacks, by id. */
export async function ownOperators(tx: Tx, firmId: string): Promise<OwnOperator[]> {
  const rows = await tx
    .select()
    .from(operatorEntries)
    .where(eq(operatorEntries.firmId, firmId))
    .orderBy(operatorEntries.operatorId);
  return rows.map(({ operatorId, name, kind, division, fromDay, source, setAt }) => ({
    id: operatorId,
    name,
    kind,
    division,
    from: fromDay,
    source,
    setOn: londonDay(setAt),
  }));
}

/** What this firm has set for each operator, and the operators it has entered, in the shape the rules read. */
export async function firmRules(tx: Tx, firmId: string): Promise<FirmRules> {
  const rows = await tx.select().from(operatorSettings).where(eq(operatorSettings.firmId, firmId));
  const operators = rows.map(({ operatorId, ...row }) => {
    const { noticeDays, buriedSeparationM, asksFirstAboveA, assumesFuseA } = row;
    const figures = { noticeDays, buriedSeparationM, asksFirstAboveA, assumesFuseA };
    return [operatorId, { ...figures, grounds: groundsOf(row) }] as const;
  });
  return { operators: Object.fromEntries(operators), own: await ownOperators(tx, firmId) };
}
