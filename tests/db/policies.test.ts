import { describe, expect, it } from "vitest";
import { connected, openJob, soleTrader } from "./fixture";
import { asUser } from "@/db/tenant";
import { members } from "@/db/schema";

/** OWASP ASVS 5.0 level 2, chapter 8, and the PostgreSQL 15 manual, section 5.8 (row security policies). */
const firmTables = () =>
  connected("owner", async (client) => {
    const { rows } = await client.query<{ name: string; enabled: boolean; forced: boolean }>(`
      select c.relname as name, c.relrowsecurity as enabled, c.relforcerowsecurity as forced
      from pg_class c join pg_namespace n on n.oid = c.relnamespace
      where n.nspname = 'public' and c.relkind = 'r' and (c.relname = 'firms' or exists (
        select 1 from pg_attribute a where a.attrelid = c.oid and a.attname = 'firm_id' and not a.attisdropped))
      order by 1`);
    return rows;
  });

describe("row-level security", () => {
  it("is enabled and forced on every table that holds a firm's rows", async () => {
    const tables = await firmTables();
    expect(tables.length).toBeGreaterThanOrEqual(14);
    expect(tables.filter(({ enabled, forced }) => !enabled || !forced)).toEqual([]);
  });

  it("shows nothing of any firm while no firm is set", async () => {
    await openJob(await soleTrader());
    for (const { name } of await firmTables()) {
      const count = await connected("app", async (client) => {
        await client.query("begin; select set_config('app.firm_id', gen_random_uuid()::text, true); commit");
        return (await client.query<{ rows: string }>(`select count(*) as rows from ${name}`)).rows[0]?.rows;
      });
      expect(count, name).toBe("0");
    }
  });

  it("holds the owner to the policies too", async () => {
    await openJob(await soleTrader());
    const { rows } = await connected("owner", (client) => client.query("select count(*)::int as jobs from jobs"));
    expect(rows).toEqual([{ jobs: 0 }]);
  });

  it("refuses a row written for another firm", async () => {
    const [one, other] = [await soleTrader(), await soleTrader()];
    await connected("app", async (client) => {
      await client.query("begin");
      await client.query("select set_config('app.firm_id', $1, true)", [one.firmId]);
      const write = client.query("insert into operator_settings (firm_id, operator_id) values ($1, '10')", [
        other.firmId,
      ]);
      await expect(write).rejects.toMatchObject({ code: "42501" });
    });
  });

  it("lets a person read their own places and nobody else's before a firm is chosen", async () => {
    const [one] = [await soleTrader(), await soleTrader()];
    const places = await asUser(one.userId, (tx) => tx.select({ userId: members.userId }).from(members));
    expect(places).toEqual([{ userId: one.userId }]);
  });
});

describe("the program's role", () => {
  it("owns nothing and may not pass row-level security by", async () => {
    const { rows } = await connected("app", (client) =>
      client.query(`
        select r.rolsuper, r.rolbypassrls,
          (select count(*)::int from pg_class c where c.relowner = r.oid) as owned
        from pg_roles r where r.rolname = current_user`),
    );
    expect(rows).toEqual([{ rolsuper: false, rolbypassrls: false, owned: 0 }]);
  });

  it.each(["events", "assessments", "submission_entries"])("may add to %s and change nothing there", async (table) => {
    const { rows } = await connected("app", (client) =>
      client.query(
        `select has_table_privilege($1, 'INSERT') as add, has_table_privilege($1, 'UPDATE') as change,
          has_table_privilege($1, 'DELETE') as remove, has_table_privilege($1, 'TRUNCATE') as empty`,
        [table],
      ),
    );
    expect(rows).toEqual([{ add: true, change: false, remove: false, empty: false }]);
  });
});
