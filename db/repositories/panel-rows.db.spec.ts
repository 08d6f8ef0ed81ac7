import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import type pg from 'pg';
import { createDatabase, createPool } from '../connect';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import type { PanelBlockRows } from './panel-rows-repository';
import { Repositories, type WorkspaceRepositories } from './repositories';

describe('rows of a panel version as columns', () => {
  let database: TestDatabase;
  let pool: pg.Pool;
  let repositories: Repositories;
  const workspaceId = randomUUID();
  const personId = randomUUID();
  const panelId = randomUUID();
  const fileId = randomUUID();
  let number = 0;

  beforeAll(async () => {
    database = await createTestDatabase();
    pool = createPool({
      connectionString: database.appUrl,
      max: 3,
      applicationName: 'spec',
      statementTimeoutMs: 20_000,
      onConnectionError: fail,
      onWarning: fail,
    });
    repositories = new Repositories(createDatabase(pool));
    await pool.query(
      `insert into person (id, email, name, password_hash, preferences)
        values ($1, 'a@people.example', 'A', 'x', '{}')`,
      [personId],
    );
    await repositories.inWorkspace(workspaceId, async (tx) => {
      await tx.members.insertWorkspace('W');
      const content = Buffer.from('x');
      const file = { id: fileId, name: 'f.csv', byteSize: 1, sha256: 'x', content };
      await tx.files.insert({ ...file, createdBy: personId });
      await tx.panels.insertPanel(panelId, 'P');
    });
  });

  afterAll(async () => {
    await pool.end();
    await database.drop();
  });

  async function insertVersion(tx: WorkspaceRepositories): Promise<string> {
    const id = randomUUID();
    await tx.panels.insertVersion({
      id,
      panelId,
      number: ++number,
      parentId: null,
      fileId,
      origin: 'import',
      recipe: null,
      currency: 'EUR',
      unit: 'millions',
      companyHeader: 'company',
      yearHeader: 'year',
      columns: [],
      note: '',
      companies: 1,
      rowCount: 1,
      firstYear: 2000,
      lastYear: 2000,
      createdBy: personId,
    });
    return id;
  }

  function within<T>(work: (tx: WorkspaceRepositories) => Promise<T>): Promise<T> {
    return repositories.inWorkspace(workspaceId, work);
  }

  const odd: PanelBlockRows = {
    companies: ['Zeta "quoted" \\ {a,b}', 'Ärmel, Ltd'],
    company: Int32Array.of(0, 1, 0),
    year: Int32Array.of(2001, 2000, 2000),
    fileRow: Int32Array.of(2, 3, 70_000),
    values: [
      Float64Array.of(0.1 + 0.2, NaN, -1e-300),
      Float64Array.of(NaN, Number.MAX_VALUE, 12_345_678.9),
    ],
    currency: ['EUR', null, 'USD'],
  };

  it('are read as they were written, in order of company and year, to the last bit', async () => {
    const read = await within(async (tx) => {
      const id = await insertVersion(tx);
      await tx.panelRows.insert(id, odd);
      return tx.panelRows.block(id, 2);
    });
    expect(read.companies).toEqual(['Zeta "quoted" \\ {a,b}', 'Ärmel, Ltd']);
    expect([...read.company]).toEqual([0, 0, 1]);
    expect([...read.year]).toEqual([2000, 2001, 2000]);
    expect([...read.fileRow]).toEqual([70_000, 2, 3]);
    expect([...read.values[0]]).toEqual([-1e-300, 0.1 + 0.2, NaN]);
    expect([...read.values[1]]).toEqual([12_345_678.9, NaN, Number.MAX_VALUE]);
    expect(read.currency).toEqual(['USD', 'EUR', null]);
  });

  it('are none of a version without rows, and without currencies where no row has one', async () => {
    const [none, plain] = await within(async (tx) => {
      const first = await insertVersion(tx);
      const second = await insertVersion(tx);
      await tx.panelRows.insert(second, { ...odd, currency: null });
      return [await tx.panelRows.block(first, 3), await tx.panelRows.block(second, 2)];
    });
    expect(none.year.length).toBe(0);
    expect(none.values.map(({ length }) => length)).toEqual([0, 0, 0]);
    expect(plain.currency).toBeNull();
  });

  it('are read without keeping others of this process waiting', async () => {
    const [rows, columns] = [40_000, 12];
    const wide: PanelBlockRows = {
      companies: ['A'],
      company: new Int32Array(rows),
      year: Int32Array.from({ length: rows }, (_, row) => 1000 + row),
      fileRow: new Int32Array(rows).fill(2),
      values: Array.from({ length: columns }, () =>
        Float64Array.from({ length: rows }, (_, row) => row / 3),
      ),
      currency: null,
    };
    const id = await within(async (tx) => {
      const made = await insertVersion(tx);
      await tx.panelRows.insert(made, wide);
      return made;
    });
    const started = performance.now();
    let [lastLook, longestWaitMs] = [started, 0];
    const looks = setInterval(() => {
      longestWaitMs = Math.max(longestWaitMs, performance.now() - lastLook);
      lastLook = performance.now();
    }, 1);
    const read = await within((tx) => tx.panelRows.block(id, columns));
    const tookMs = performance.now() - started;
    await pause(5);
    clearInterval(looks);
    expect(read.values).toEqual(wide.values);
    expect(read.year).toEqual(wide.year);
    // In time of the reading, since machines differ: most of it is PostgreSQL's.
    expect(longestWaitMs).toBeLessThan(tookMs / 2);
  });

  it('are told of as they are written, and end with the signal, leaving nothing', async () => {
    const rows = 12_000;
    const long: PanelBlockRows = {
      companies: Array.from({ length: rows }, (_, code) => `C${code}`),
      company: Int32Array.from({ length: rows }, (_, row) => row),
      year: new Int32Array(rows).fill(2000),
      fileRow: new Int32Array(rows).fill(1),
      values: [new Float64Array(rows)],
      currency: null,
    };
    const abort = new AbortController();
    const told: number[] = [];
    let id = '';
    const cut = within(async (tx) => {
      id = await insertVersion(tx);
      await tx.panelRows.insert(id, long, {
        signal: abort.signal,
        onWritten: (done) => {
          told.push(done);
          if (done > 5000) abort.abort(new Error('enough'));
        },
      });
    });
    await expectAsync(cut).toBeRejectedWithError('enough');
    expect(told).toEqual([5000, 10_000]);
    expect(await within((tx) => tx.panels.findVersion(id))).toBeUndefined();
  });

  it('name a version of their own workspace, or are refused', async () => {
    const id = await within(insertVersion);
    const other = randomUUID();
    const foreign = repositories.inWorkspace(other, async (tx) => {
      await tx.members.insertWorkspace('Other');
      await tx.panelRows.insert(id, odd);
    });
    await expectAsync(foreign).toBeRejectedWithError(/names no version/);
    const unknown = within((tx) => tx.panelRows.insert(randomUUID(), odd));
    await expectAsync(unknown).toBeRejectedWithError(/names no version/);
  });

  it('give a company and year once', async () => {
    const twice = within(async (tx) => {
      const id = await insertVersion(tx);
      await tx.panelRows.insert(id, { ...odd, year: Int32Array.of(2000, 2000, 2000) });
    });
    await expectAsync(twice).toBeRejectedWithError(/panel_row_pkey/);
  });

  it('keep a file in slices exactly', async () => {
    const content = Buffer.alloc((1 << 20) * 2 + 17, 'abc');
    const id = randomUUID();
    const read = await within(async (tx) => {
      const file = { id, name: 'f.csv', byteSize: content.length, sha256: 'x', content };
      await tx.files.insert({ ...file, createdBy: personId });
      return tx.files.find(id);
    });
    expect(read?.content.equals(content)).toBeTrue();
    expect(await within((tx) => tx.files.usage())).toEqual({
      files: 2,
      bytes: content.length + 1,
    });
  });
});
