import type { TestDatabase } from '../../db/testing/test-database';
import {
  type CellHistoryReply,
  type PanelCompaniesReply,
  type PanelDifferencesReply,
  type PanelVersionReply,
  type PanelVersionSummary,
  SaveCorrections,
} from '../contract';
import { join, signUp, type TestClient } from '../testing/test-client';
import { idOf, importPanel, referenceMapping } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const text = [
  'company,year,value,inv,capital,sector',
  'Arvo,2001,10,1,5,Steel',
  'Arvo,2002,11,1.5,5.5,Steel',
  'Birk,2001,20,2,,Paper',
  'Birk,2003,0.1,2.5,7,Paper',
].join('\n');
const mapping = { ...referenceMapping, attributes: ['sector'] };
const [marketValue, capex, bookEquity] = [0, 1, 2];

interface Edit {
  readonly note?: string;
  readonly cells?: readonly object[];
  readonly addedRows?: readonly object[];
  readonly removedRows?: readonly object[];
}

describe('corrections', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let first: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
  });

  beforeEach(async () => {
    analyst = await signUp(server);
    first = await importPanel(analyst, text, mapping);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const cell = (company: string, year: number, column: number, value: number | null) => ({
    ...{ company, year, column, value },
    reason: 'Misread',
    source: value === null ? '' : 'Annual report, page 12',
  });
  const send = (id: string, edit: Edit) =>
    analyst.post(`/api/panel-versions/${id}/corrections`, {
      note: 'second look',
      cells: [],
      addedRows: [],
      removedRows: [],
      ...edit,
    });
  const correct = async (id: string, edit: Edit) => idOf(await send(id, edit), 201);
  const restore = async (id: string) =>
    idOf(await analyst.post(`/api/panel-versions/${id}/restore`, { note: 'as it was' }), 201);
  const read = async (id: string) =>
    (await analyst.get(`/api/panel-versions/${id}`)).body as PanelVersionReply;
  const differences = async (id: string, other: string) =>
    (await analyst.get(`/api/panel-versions/${id}/differences/${other}`))
      .body as PanelDifferencesReply;
  const history = async (id: string, company: string, year: number, column: number) => {
    const query = `company=${company}&year=${year}&column=${column}`;
    const reply = await analyst.get(`/api/panel-versions/${id}/cell-history?${query}`);
    expect(reply.status).toBe(200);
    return (reply.body as CellHistoryReply).entries;
  };

  it('become the next version of the panel, which holds all other rows bit by bit', async () => {
    const saved = await send(first, {
      cells: [
        cell('Arvo', 2001, marketValue, 12.25),
        cell('Birk', 2001, bookEquity, 6),
        cell('Arvo', 2002, capex, null),
        cell('Cala', 2000, marketValue, 3),
      ],
      addedRows: [{ company: 'Cala', year: 2000 }],
      removedRows: [{ company: 'Birk', year: 2003 }],
    });
    expect(saved.status).toBe(201);
    const summary = saved.body as PanelVersionSummary;
    const before = (await read(first)).version;
    expect(summary).toEqual({
      ...before,
      id: summary.id,
      parentId: first,
      origin: 'correction',
      number: 2,
      note: 'second look',
      companies: 3,
      rows: 4,
      firstYear: 2000,
      lastYear: 2002,
      createdAt: summary.createdAt,
    });
    expect((await read(summary.id)).rows).toEqual({
      company: ['Arvo', 'Arvo', 'Birk', 'Cala'],
      year: [2001, 2002, 2001, 2000],
      fileRow: [2, 3, 4, 0],
      values: [
        [12.25, 11, 20, 3],
        [1, null, 2, null],
        [5, 5.5, 6, null],
      ],
    });
    expect((await read(first)).rows.values[marketValue]).toEqual([10, 11, 20, 0.1]);
  });

  it('keep what describes the companies that stay', async () => {
    const both = [2001, 2003].map((year) => ({ company: 'Birk', year }));
    const id = await correct(first, { removedRows: both });
    const { companies } = (await analyst.get(`/api/panel-versions/${id}/companies`))
      .body as PanelCompaniesReply;
    expect(companies.map(({ name, attributes }) => [name, attributes])).toEqual([
      ['Arvo', { sector: 'Steel' }],
    ]);
  });

  it('are refused one by one where the panel is not as they say, and then nothing is made', async () => {
    const reply = await send(first, {
      cells: [
        cell('Arvo', 2001, marketValue, 10),
        cell('Arvo', 2001, capex, 4),
        cell('Arvo', 2001, capex, 5),
        cell('Arvo', 2001, 3, 5),
        cell('Nobody', 2001, capex, 5),
        cell('Birk', 2003, capex, 5),
        cell('Birk', 2001, bookEquity, null),
      ],
      addedRows: [
        { company: 'Arvo', year: 2001 },
        { company: 'Cala', year: 2001 },
        { company: 'Cala', year: 2001 },
      ],
      removedRows: [
        { company: 'Birk', year: 2003 },
        { company: 'Birk', year: 2004 },
      ],
    });
    expect(reply.status).toBe(400);
    expect((reply.body as { errors: unknown }).errors).toEqual([
      { pointer: '/removedRows/1', detail: 'the panel has no row Birk 2004' },
      { pointer: '/addedRows/0', detail: 'the panel has a row Arvo 2001 already' },
      { pointer: '/addedRows/2', detail: 'Cala 2001 is added twice' },
      { pointer: '/cells/0/value', detail: '“value” of Arvo 2001 is 10 already' },
      { pointer: '/cells/2', detail: '“inv” of Arvo 2001 is named twice' },
      { pointer: '/cells/3/column', detail: 'expected one of 3 columns, counted from 0; found 3' },
      { pointer: '/cells/4', detail: '“inv” of Nobody 2001: the panel has no such row' },
      { pointer: '/cells/5', detail: '“inv” of Birk 2003: its row is removed' },
      { pointer: '/cells/6/value', detail: '“capital” of Birk 2001 is missing already' },
    ]);
    expect((await send(first, {})).status).toBe(400);
    const every = (await read(first)).rows;
    const all = every.company.map((company, row) => ({ company, year: every.year[row] }));
    expect((await send(first, { removedRows: all })).status).toBe(400);
    expect((await analyst.get('/api/panel-versions')).body).toEqual({
      versions: [jasmine.objectContaining({ id: first })],
    });
  });

  it('need a reason and, for every value, where it was found', async () => {
    const silent = { ...cell('Arvo', 2001, marketValue, 12), source: ' ' };
    const without = await send(first, { cells: [silent] });
    expect(without.status).toBe(400);
    expect(
      (without.body as { errors: { pointer: string }[] }).errors.map((e) => e.pointer),
    ).toEqual(['/cells/0/source']);
    const aimless = { ...cell('Arvo', 2001, marketValue, null), reason: '' };
    expect((await send(first, { cells: [aimless] })).status).toBe(400);
    const emptied = cell('Arvo', 2001, marketValue, null);
    expect((await send(first, { cells: [emptied] })).status).toBe(201);
    const infinite = { ...cell('Arvo', 2001, marketValue, Infinity), reason: 'x' };
    const edit = { note: 'x', cells: [infinite], addedRows: [], removedRows: [] };
    expect(SaveCorrections.safeParse(edit).success).toBeFalse();
  });

  it('are refused on any version but the newest, and name it; of two at once, one goes through', async () => {
    const edits = [12, 13].map((value) => ({ cells: [cell('Arvo', 2001, marketValue, value)] }));
    const replies = await Promise.all(edits.map((edit) => send(first, edit)));
    expect(replies.map(({ status }) => status).sort()).toEqual([201, 409]);
    const won = replies.find(({ status }) => status === 201)?.body as PanelVersionSummary;
    const lost = replies.find(({ status }) => status === 409)?.body as {
      type: string;
      latestId: string;
    };
    expect(lost.type).toContain('stale-version');
    expect(lost.latestId).toBe(won.id);
    expect(won.number).toBe(2);
  });

  it('are put back by a version that holds what an older one holds', async () => {
    const second = await correct(first, {
      cells: [cell('Arvo', 2001, marketValue, 12)],
      removedRows: [{ company: 'Birk', year: 2003 }],
    });
    const third = await restore(first);
    const [before, after] = [await read(first), await read(third)];
    expect(after.rows).toEqual(before.rows);
    expect(after.version).toEqual({
      ...before.version,
      id: third,
      parentId: second,
      origin: 'restore',
      restoredNumber: 1,
      number: 3,
      note: 'as it was',
      createdAt: after.version.createdAt,
    });
    expect(await differences(first, third)).toEqual({
      ...comparison,
      addedRows: 0,
      removedRows: 0,
      changedCells: 0,
      listed: [],
    });
    const again = await analyst.post(`/api/panel-versions/${third}/restore`, { note: 'x' });
    expect(again.status).toBe(409);
    await correct(third, { cells: [cell('Arvo', 2001, marketValue, 13)] });
  });

  it('show what changed between two versions of a panel, and nothing across panels', async () => {
    const second = await correct(first, {
      cells: [cell('Arvo', 2001, marketValue, 12), cell('Cala', 2000, capex, 1)],
      addedRows: [{ company: 'Cala', year: 2000 }],
      removedRows: [{ company: 'Birk', year: 2003 }],
    });
    const place = { before: null, after: null, column: null };
    expect(await differences(first, second)).toEqual({
      ...comparison,
      addedRows: 1,
      removedRows: 1,
      changedCells: 1,
      listed: [
        {
          ...{ company: 'Arvo', year: 2001, kind: 'changed-cell' as const, column: 'value' },
          ...{ before: 10, after: 12 },
        },
        { company: 'Birk', year: 2003, kind: 'removed-row', ...place },
        { company: 'Cala', year: 2000, kind: 'added-row', ...place },
      ],
    });
    const other = await importPanel(analyst, text, { ...mapping, panelName: 'Another' });
    const across = await analyst.get(`/api/panel-versions/${first}/differences/${other}`);
    expect(across.status).toBe(404);
  });

  it('tell of a cell who changed it in which version, why, and where the value was found', async () => {
    const second = await correct(first, { cells: [cell('Arvo', 2001, marketValue, 12)] });
    const third = await correct(second, { cells: [cell('Birk', 2001, bookEquity, 6)] });
    const fourth = await correct(third, { removedRows: [{ company: 'Arvo', year: 2001 }] });
    await restore(first);
    const found = await history(fourth, 'Arvo', 2001, marketValue);
    expect(found.map(({ at: _, panelVersionId: __, ...entry }) => entry)).toEqual([
      { ...entry(1, 10, 'first'), hasRow: true },
      {
        ...entry(2, 12, 'second look'),
        reason: 'Misread',
        source: 'Annual report, page 12',
        hasRow: true,
      },
      { ...entry(4, null, 'second look'), hasRow: false },
      { ...entry(5, 10, 'as it was'), hasRow: true },
    ]);
    expect(await history(first, 'Nobody', 2001, marketValue)).toEqual([]);
    const column = await analyst.get(
      `/api/panel-versions/${first}/cell-history?company=Arvo&year=2001&column=3`,
    );
    expect(column.status).toBe(400);
  });

  const entry = (number: number, value: number | null, note: string) => ({
    ...{ number, value, note, by: 'Founder', reason: null, source: null },
    ...{ header: 'value', currency: 'USD', unit: 'millions' as const },
  });
  const comparison = {
    columns: [
      { name: 'value', role: 'marketValue' as const },
      { name: 'inv', role: 'capex' as const },
      { name: 'capital', role: 'bookEquity' as const },
    ],
    renamed: [],
    money: { currency: 'USD', unit: 'millions' as const },
  };

  it('stand in a version as long as no import and no older version took their place', async () => {
    const { session } = (await analyst.get('/api/session')).body as {
      session: { workspace: { id: string } };
    };
    const standing = (id: string) =>
      server.composition.services.repositories.inWorkspace(session.workspace.id, async (tx) =>
        (await tx.panelCorrections.standing(id, ['Arvo'])).map(({ before, value }) => [
          before,
          value,
        ]),
      );
    const second = await correct(first, { cells: [cell('Arvo', 2001, marketValue, 12)] });
    const third = await correct(second, { cells: [cell('Arvo', 2001, marketValue, 13)] });
    expect(await standing(first)).toEqual([]);
    expect(await standing(third)).toEqual([[12, 13]]);
    const restored = await restore(second);
    expect(await standing(restored)).toEqual([[10, 12]]);
    const row = { company: 'Arvo', year: 2001 };
    const emptied = await correct(restored, { cells: [cell('Arvo', 2001, marketValue, null)] });
    const removed = await correct(emptied, { removedRows: [row] });
    expect(await standing(await correct(removed, { addedRows: [row] }))).toEqual([]);
    expect(await standing(await restore(first))).toEqual([]);
    expect(await standing(await importPanel(analyst, text, mapping))).toEqual([]);
  });

  it('are for analysts; the CFO reads what changed', async () => {
    const cfo = await join(server, analyst, ['cfo']);
    const body = { note: 'x', cells: [cell('Arvo', 2001, marketValue, 12)] };
    const refused = await cfo.post(`/api/panel-versions/${first}/corrections`, body);
    expect(refused.status).toBe(403);
    const seen = await cfo.get(`/api/panel-versions/${first}/differences/${first}`);
    expect(seen.status).toBe(200);
  });

  it('of many cells may take more room than other requests', async () => {
    const reason = 'x'.repeat(500);
    const cells = Array.from({ length: 5000 }, (_, row) => ({
      ...cell('Cala', 2000 + row, marketValue, row),
      reason,
    }));
    const addedRows = cells.map(({ company, year }) => ({ company, year }));
    const id = await correct(first, { cells, addedRows });
    expect((await read(id)).version.rows).toBe(5004);
  });
});
