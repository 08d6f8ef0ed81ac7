import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { migrate, type OwnerSql } from '../migrate';
import { latestMigration } from '../migrations/migrations';

/** A database of its own for one spec file. */
export interface TestDatabase {
  /** Signs in as the application role. */
  readonly appUrl: string;
  /** Signs in as the owner of the schema. */
  readonly ownerUrl: string;
  /** Signs in as the cluster's administrator: to look at what no role of ours may. */
  readonly adminUrl: string;
  drop(): Promise<void>;
}

export interface Packaged {
  readonly schema: string;
  readonly install: (owner: OwnerSql) => Promise<void>;
}

const ownerRole = 'kinvale_spec_owner';
const appRole = 'kinvale_spec_app';
const password = 'spec-only';

/**
 * Clones a migrated template on the cluster that KINVALE_TEST_CLUSTER names (`npm test` starts one and sets it).
 */
export async function createTestDatabase(packaged?: Packaged): Promise<TestDatabase> {
  const clusterUrl = process.env['KINVALE_TEST_CLUSTER'];
  if (clusterUrl === undefined)
    throw new Error('KINVALE_TEST_CLUSTER is not set; run the specs by `npm test -- db`');
  const template = await ensureTemplate(clusterUrl, packaged);
  const name = `spec_${randomBytes(6).toString('hex')}`;
  await onCluster(clusterUrl, async (client) => {
    await locked(client, () => client.query(`create database ${name} template ${template}`));
  });
  return {
    appUrl: urlFor(clusterUrl, name, appRole),
    ownerUrl: urlFor(clusterUrl, name, ownerRole),
    adminUrl: databaseUrl(clusterUrl, name),
    drop: () =>
      onCluster(clusterUrl, async (client) => {
        await client.query(`drop database ${name} with (force)`);
      }),
  };
}

/** An empty database owned by the owner role: for specs of the migrations themselves. */
export async function createEmptyDatabase(): Promise<TestDatabase & { readonly appRole: string }> {
  const clusterUrl = process.env['KINVALE_TEST_CLUSTER'] ?? '';
  const name = `spec_${randomBytes(6).toString('hex')}`;
  await onCluster(clusterUrl, async (client) => {
    await locked(client, async () => {
      await createRoles(client);
      await client.query(`create database ${name} owner ${ownerRole}`);
    });
  });
  return {
    appRole,
    appUrl: urlFor(clusterUrl, name, appRole),
    ownerUrl: urlFor(clusterUrl, name, ownerRole),
    adminUrl: databaseUrl(clusterUrl, name),
    drop: () =>
      onCluster(clusterUrl, async (client) => {
        await client.query(`drop database ${name} with (force)`);
      }),
  };
}

async function ensureTemplate(clusterUrl: string, packaged?: Packaged): Promise<string> {
  const suffix = packaged === undefined ? '' : `_${packaged.schema}`;
  const name = `template_${latestMigration.replaceAll('-', '_')}${suffix}_${String(process.ppid)}`;
  await onCluster(clusterUrl, (client) =>
    locked(client, async () => {
      const found = await client.query('select from pg_database where datname = $1', [name]);
      if (found.rowCount !== 0) return;
      await createRoles(client);
      await client.query(`create database ${name}_making owner ${ownerRole}`);
      await migrate({
        ownerUrl: urlFor(clusterUrl, `${name}_making`, ownerRole),
        appRole,
        ...(packaged === undefined ? {} : { packaged }),
      });
      await client.query(`alter database ${name}_making rename to ${name}`);
    }),
  );
  return name;
}

async function createRoles(client: pg.Client): Promise<void> {
  for (const role of [ownerRole, appRole]) {
    const found = await client.query('select from pg_roles where rolname = $1', [role]);
    if (found.rowCount === 0)
      await client.query(`create role ${role} login password '${password}'`);
  }
}

/** Two spec processes must not make the template, or clone it, at the same time. */
async function locked(client: pg.Client, work: () => Promise<unknown>): Promise<void> {
  await client.query('select pg_advisory_lock(4711)');
  try {
    await work();
  } finally {
    await client.query('select pg_advisory_unlock(4711)');
  }
}

async function onCluster(url: string, work: (client: pg.Client) => Promise<void>): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}

function urlFor(clusterUrl: string, database: string, role: string): string {
  const url = new URL(databaseUrl(clusterUrl, database));
  url.username = role;
  url.password = password;
  return url.href;
}

function databaseUrl(clusterUrl: string, database: string): string {
  const url = new URL(clusterUrl);
  url.pathname = `/${database}`;
  return url.href;
}
