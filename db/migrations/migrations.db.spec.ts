import { randomUUID } from 'node:crypto';
import { Kysely, Migrator, PostgresDialect } from 'kysely';
import pg from 'pg';
import { migrate } from '../migrate';
import { createEmptyDatabase, type TestDatabase } from '../testing/test-database';
import { Migrations } from './migrations';

/** Tables of the schema that hold no single workspace's data, each with its reason. */
const exceptions: Readonly<Record<string, string>> = {
  person: 'a person signs in before any workspace is known, and may belong to several',
  session: 'kept by the session store; ends with the person, not the workspace',
  sign_in_throttle: 'counts failed sign-ins before anybody is known',
  job_ticket: 'tells a worker which workspace a job belongs to',
  mail_due: 'tells the round which workspace a waiting mail belongs to, and nothing of the mail',
  kysely_migration: 'the migrator’s own',
  kysely_migration_lock: 'the migrator’s own',
};

describe('migrations', () => {
  let database: TestDatabase & { readonly appRole: string };
  let client: pg.Client;

  beforeAll(async () => {
    database = await createEmptyDatabase();
    const options = { ownerUrl: database.ownerUrl, appRole: database.appRole };
    const both = await Promise.all([migrate(options), migrate(options)]);
    expect(both.flat().length)
      .withContext('two at once run each migration once')
      .toBe(new Set(both.flat()).size);
    expect(await migrate(options))
      .withContext('a second run changes nothing')
      .toEqual([]);
    client = new pg.Client({ connectionString: database.adminUrl });
    await client.connect();
  });

  afterAll(async () => {
    await client.end();
    await database.drop();
  });

  async function rows(sql: string): Promise<Record<string, unknown>[]> {
    return (await client.query<Record<string, unknown>>(sql)).rows;
  }

  it('give every table a workspace_id, but for the listed exceptions', async () => {
    const tables = await rows(`select relname from pg_class c
      where relkind in ('r', 'p') and relnamespace = 'public'::regnamespace
        and not exists (select from pg_attribute a
          where a.attrelid = c.oid and a.attname = 'workspace_id' and a.attnum > 0)`);
    const without = tables.map((table) => table['relname'] as string);
    expect(without.filter((name) => !(name in exceptions))).toEqual([]);
  });

  it('enable and force row level security on every table with a workspace_id', async () => {
    const open = await rows(`select relname from pg_class c
      join pg_attribute a on a.attrelid = c.oid and a.attname = 'workspace_id'
      where relkind in ('r', 'p') and relnamespace = 'public'::regnamespace
        and relname not in ('job_ticket', 'mail_due')
        and not (relrowsecurity and relforcerowsecurity)`);
    expect(open).toEqual([]);
  });

  it('put one restrictive policy of the workspace and one permissive policy on each of them', async () => {
    const policies = await rows(`select tablename,
        count(*) filter (where permissive = 'RESTRICTIVE') as walls,
        count(*) filter (where permissive = 'PERMISSIVE') as doors,
        bool_and(with_check is not null or cmd in ('SELECT', 'DELETE')) as checked
      from pg_policies group by tablename`);
    expect(policies.length).toBeGreaterThan(18);
    for (const policy of policies) {
      // A person reads memberships of their own in any workspace, and changes them in one alone.
      const walls = policy['tablename'] === 'membership' ? '4' : '1';
      expect(policy).toEqual(jasmine.objectContaining({ walls, doors: '1', checked: true }));
    }
  });

  it('put workspace_id first in every key and unique index of workspace data', async () => {
    const keys = await rows(`select i.indexrelid::regclass::text as name from pg_index i
      join pg_class c on c.oid = i.indrelid and c.relnamespace = 'public'::regnamespace
      join pg_attribute a on a.attrelid = c.oid and a.attname = 'workspace_id'
      where i.indisunique and i.indkey[0] <> a.attnum and c.relname <> 'job_ticket'`);
    expect(keys).toEqual([]);
  });

  it('name the workspace in every foreign key between tables of workspace data', async () => {
    const loose = await rows(`select conname from pg_constraint k
      join pg_attribute a on a.attrelid = k.conrelid and a.attname = 'workspace_id'
      join pg_attribute b on b.attrelid = k.confrelid and b.attname = 'workspace_id'
      where k.contype = 'f' and not (a.attnum = any (k.conkey) and b.attnum = any (k.confkey))`);
    expect(loose).toEqual([]);
  });

  it('make no view without the rights of its caller, and no function with its owner’s', async () => {
    const views = await rows(`select relname from pg_class where relkind = 'v'
      and relnamespace = 'public'::regnamespace
      and not coalesce(reloptions @> array['security_invoker=true'], false)`);
    const definers = await rows(`select proname from pg_proc
      where pronamespace = 'public'::regnamespace and prosecdef`);
    expect([...views, ...definers]).toEqual([]);
  });

  it('leave the application role without ownership, DDL and rights to rewrite what is immutable', async () => {
    const owned = await rows(
      `select relname from pg_class where relowner = '${database.appRole}'::regrole`,
    );
    expect(owned).toEqual([]);
    const app = new pg.Client({ connectionString: database.appUrl });
    await app.connect();
    try {
      for (const statement of [
        'create table extra (id integer)',
        'alter table edition add column extra integer',
        'truncate activity',
        'update activity set action = action',
        'delete from activity',
        'update panel_row set company = company',
        'delete from panel_version',
        `update panel_version set origin = 'import'`,
        'update panel_company set attributes = attributes',
        'delete from panel_company',
        'update panel_correction set reason = reason',
        'delete from panel_correction',
        'update flag_dismissal set reason = reason',
        'update edition set content = content',
        'update mail set recipient = recipient',
        'delete from mail',
        'delete from edition',
      ])
        await expectAsync(app.query(statement)).withContext(statement).toBeRejectedWithError();
    } finally {
      await app.end();
    }
  });
});

describe('the migration of the panel desk', () => {
  it('has open imports of before checked again, in every workspace', async () => {
    const database = await createEmptyDatabase();
    const pool = new pg.Pool({ connectionString: database.ownerUrl, max: 2 });
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    const db = new Kysely<unknown>({ dialect: new PostgresDialect({ pool }) });
    try {
      const migrator = new Migrator({ db, provider: new Migrations(database.appRole) });
      await migrator.migrateTo('0004-evidence-and-bootstraps');
      const [id, other] = [randomUUID(), randomUUID()];
      await admin.query(`insert into person (id, email, name, password_hash, preferences)
        values ('${id}', 'a@people.example', 'A', 'x', '{}')`);
      for (const workspace of [id, other])
        await admin.query(`insert into workspace (workspace_id, name) values ('${workspace}', 'W');
          insert into stored_file (workspace_id, id, name, byte_size, sha256, content, created_by)
            values ('${workspace}', '${id}', 'f.csv', 1, 'x', 'x', '${id}');
          insert into import_draft
              (workspace_id, id, file_id, state, preview, mapping, findings, created_by)
            values ('${workspace}', '${id}', '${id}', 'checked',
              '{"headers":["a"]}', '{}', '{"rows":1}', '${id}')`);
      await migrate({ ownerUrl: database.ownerUrl, appRole: database.appRole });
      const drafts = await admin.query<Record<string, unknown>>(
        'select state, findings, preview from import_draft',
      );
      expect(drafts.rows.length).toBe(2);
      for (const { state, findings, preview } of drafts.rows) {
        expect([state, findings]).toEqual(['mapped', null]);
        expect(preview).toEqual(
          jasmine.objectContaining({ headers: ['a'], sheets: [], topLines: [] }),
        );
      }
    } finally {
      await db.destroy();
      await admin.end();
      await database.drop();
    }
  });
});
