/**
 * The two roles of an installation: `owner` owns database and schema and migrates; `app` serves requests, owns
 * nothing and is subject to row level security. Passwords are set afresh every time, so a lost secrets file heals.
 *
 * @param adminUrl  URL of a role that may create roles and databases.
 */
export async function ensureRolesAndDatabase(adminUrl, { database, owner, app }) {
  const { default: pg } = await import('pg'); // not at the top: npm packages may not be there yet
  await withClient(pg, adminUrl, async (client) => {
    for (const { name, password } of [owner, app]) {
      const role = client.escapeIdentifier(name);
      const known = await client.query('select 1 from pg_roles where rolname = $1', [name]);
      if (known.rowCount === 0) await client.query(`create role ${role}`);
      await client.query(
        `alter role ${role} login nosuperuser nobypassrls nocreatedb nocreaterole noreplication password ${client.escapeLiteral(password)}`,
      );
    }
    const [name, ownerName, appName] = [database, owner.name, app.name].map((it) =>
      client.escapeIdentifier(it),
    );
    const known = await client.query('select 1 from pg_database where datname = $1', [database]);
    if (known.rowCount === 0) await client.query(`create database ${name} owner ${ownerName}`);
    await client.query(`revoke all on database ${name} from public`);
    await client.query(`grant connect on database ${name} to ${appName}`);
  });
  const within = new URL(adminUrl);
  within.pathname = `/${database}`;
  await withClient(pg, within.href, async (client) => {
    await client.query(`alter schema public owner to ${client.escapeIdentifier(owner.name)}`);
    await client.query('revoke create on schema public from public');
  });
}

async function withClient(pg, connectionString, work) {
  const client = new pg.Client({ connectionString });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}
