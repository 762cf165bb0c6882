import { DrizzleQueryError, sql } from "drizzle-orm";
import { DatabaseError } from "pg";
import { fixedTime } from "./clock";
import { db, type Tx } from "./client";

type InFirm = { readonly firmId: string };

/**
 * A transaction whose failure tells no values: the driver's error quotes the statement's parameters and the row, and
 * the framework prints the whole error when a page cannot be made. Statement, code, table and constraint stay.
 */
async function inTransaction<T>(act: (tx: Tx) => Promise<T>): Promise<T> {
  try {
    return await db.transaction(act);
  } catch (error) {
    if (error instanceof DrizzleQueryError) withhold(error);
    throw error;
  }
}

function withhold(error: DrizzleQueryError): void {
  error.message = `Failed query: ${error.query}`;
  error.params = [];
  const { cause } = error;
  if (cause instanceof DatabaseError) {
    cause.message = [cause.severity, cause.code, cause.table, cause.constraint].filter(Boolean).join(" ");
    cause.detail = undefined;
    cause.where = undefined;
  }
}

/**
 * Runs a transaction that sees one firm's rows. The firm is set for this transaction only (third argument of
 * set_config), so a pooled connection carries nothing over.
 */
export const asFirm = <T>(viewer: InFirm, act: (tx: Tx) => Promise<T>): Promise<T> =>
  inTransaction(async (tx) => {
    const clock = fixedTime() ?? "";
    await tx.execute(
      sql`select set_config('app.firm_id', ${viewer.firmId}, true), set_config('app.clock', ${clock}, true)`,
    );
    return act(tx);
  });

/** For work no person does: the queue's worker names the firm that the job was put down for. */
export const asFirmId = <T>(firmId: string, act: (tx: Tx) => Promise<T>): Promise<T> => asFirm({ firmId }, act);

/** Sees a person's own memberships in every firm, to read only: for sign-in, before a firm is chosen. */
export const asUser = <T>(userId: string, act: (tx: Tx) => Promise<T>): Promise<T> =>
  inTransaction(async (tx) => {
    await tx.execute(sql`select set_config('app.user_id', ${userId}, true)`);
    return act(tx);
  });

/** Sees the one invitation whose token has this hash, to read only. */
export const asTokenHolder = <T>(tokenHash: string, act: (tx: Tx) => Promise<T>): Promise<T> =>
  inTransaction(async (tx) => {
    await tx.execute(sql`select set_config('app.token_hash', ${tokenHash}, true)`);
    return act(tx);
  });

/** Within the same transaction, changes from token holder or person to a firm, once it is known which. */
export const enterFirm = (tx: Tx, firmId: string) => tx.execute(sql`select set_config('app.firm_id', ${firmId}, true)`);
