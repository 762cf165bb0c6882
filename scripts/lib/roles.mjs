/**
 * Make the two working roles and the database, where missing: `sealwire_owner` owns and migrates, `sealwire_app` owns
 * nothing and may not pass row-level security by.
 * @param {string} adminUrl
 * @param {{ owner: string, app: string }} passwords
 */
export async function ensureRoles(adminUrl, passwords) {
  const { default: pg } = await import("pg");
  const client = new pg.Client({ connectionString: adminUrl });
  await client.connect();
  try {
    for (const role of /** @type {const} */ (["owner", "app"])) {
      const known = await client.query("select 1 from pg_roles where rolname = $1", [`sealwire_${role}`]);
      const verb = known.rowCount ? "alter" : "create";
      const password = client.escapeLiteral(passwords[role]);
      await client.query(
        `${verb} role sealwire_${role} login nosuperuser nocreatedb nocreaterole nobypassrls password ${password}`,
      );
    }
    const database = await client.query("select 1 from pg_database where datname = 'sealwire'");
    if (!database.rowCount) await client.query("create database sealwire owner sealwire_owner");
    await client.query("revoke all on database sealwire from public");
    await client.query("grant connect on database sealwire to sealwire_app");
  } finally {
    await client.end();
  }
}
