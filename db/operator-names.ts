import { sql } from "drizzle-orm";
import { operatorEntry } from "@/lib/notify/operator-register";

/** The operator's name today, for lists; papers carry the name of their own day. `own` is the firm's name for the id. */
export const operatorName = (id: string, own: string | null = null): string =>
  operatorEntry(id)?.name ?? own ?? "Operator not known";

/** The firm's own name for the operator of a row of `jobs` or `submissions`, null where it has entered none. */
export const ownName = (table: "jobs" | "submissions") => {
  const of = sql.identifier(table);
  return sql<
    string | null
  >`(select name from operator_entries own where own.firm_id = ${of}.firm_id and own.operator_id = ${of}.operator_id)`;
};
