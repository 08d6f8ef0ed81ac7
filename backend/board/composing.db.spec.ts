import pg from 'pg';
import type { TestDatabase } from '../../db/testing/test-database';
import type {
  EditionHistoryReply,
  EditionPreviewReply,
  EditionReply,
  EditionVerification,
  FitReply,
} from '../contract';
import { join, signUp, type TestClient, testPassword } from '../testing/test-client';
import { importPanel, openWarnings, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

interface Problem {
  readonly type: string;
  readonly detail: string;
  readonly errors?: readonly { readonly pointer: string; readonly detail: string }[];
}

/** Standing of C06, 2,407 (1,275 to 3,539): R 4.2.2 and numpy over the same file, see stats/golden. */
describe('composing an edition', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let cfo: TestClient;
  let fit: FitReply;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server, 'Analyst');
    cfo = await join(server, analyst, ['cfo'], 'CFO');
    fit = await runFit(analyst, await savePeers(analyst, await importPanel(analyst), 'C06'));
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const composed = (change: object = {}): object => ({
    fitId: fit.fit.id,
    scenarios: [],
    confidentiality: 'confidential',
    comment: '',
    ...change,
  });
  async function preview(change: object = {}): Promise<EditionPreviewReply> {
    const reply = await analyst.post('/api/editions/preview', composed(change));
    expect(reply.status).withContext(reply.text).toBe(200);
    return reply.body as EditionPreviewReply;
  }
  async function publish(change: object = {}): Promise<EditionReply> {
    const reply = await analyst.post('/api/editions', composed(change));
    expect(reply.status).withContext(reply.text).toBe(201);
    return reply.body as EditionReply;
  }
  async function sign(id: string): Promise<void> {
    await openWarnings(cfo, id);
    const signed = await cfo.post(`/api/editions/${id}/sign`, { password: testPassword });
    expect(signed.status).withContext(signed.text).toBe(200);
  }

  it('makes the headline from the figures, in the unit asked for', async () => {
    expect((await preview()).suggestedHeadline).toBe(
      'The market values C06 2,410 (1,270 to 3,540) USD m above what capex and book equity alone would suggest against its peers',
    );
    expect((await preview({ unit: 'billions' })).suggestedHeadline).toContain(
      'C06 2.41 (1.27 to 3.54) USD bn above',
    );
  });

  it('ties the numbers of an edited headline to their figures', async () => {
    const headline = 'C06 stands 2,407 (1,275 to 3,539) USD m above its 10 peers, place 1 of 11';
    const { content, headlineProblems } = await preview({ headline });
    expect(headlineProblems).toEqual([]);
    expect(content.isHeadlineEdited).toBeTrue();
    const tied = content.headline.flatMap((part) => ('figure' in part ? [part] : []));
    expect(tied.map(({ figure, kind }) => [figure, kind])).toEqual([
      ['standing', 'money'],
      ['standing', 'money'],
      ['standing', 'money'],
      [null, 'count'],
      [null, 'count'],
      [null, 'count'],
    ]);
  });

  it('refuses a headline that says what no figure says, names each place and keeps nothing', async () => {
    const faults = async (headline: string): Promise<readonly string[]> =>
      (await preview({ headline })).headlineProblems.map(
        ({ found, detail }) => `${found}: ${detail}`,
      );
    expect(await faults('C06 stands 2,500 (1,275 to 3,539) USD m above its peers')).toEqual([
      '2,500: “2,500” is no figure of this edition. The standing is 2,410 (1,270 to 3,540).',
    ]);
    expect(await faults('C06 stands 2,407 USD m above its peers')).toEqual([
      '2,407: the standing stands with its interval: 2,410 (1,270 to 3,540).',
    ]);
    expect(await faults('C06 stands 2,407 (1,275 to 3,539) USD bn above its peers')).toEqual([
      'USD bn: Amounts of this headline are written in USD m; found “USD bn”.',
    ]);
    expect(await faults('C06 stands 2,407 (1,275 to 3,539) USD m below its peers')).toEqual([
      '2,407: The own company stands above its peers; the sentence says the opposite.',
    ]);
    const refused = await analyst.post(
      '/api/editions',
      composed({ headline: 'C06 is worth 9,999' }),
    );
    expect(refused.status).toBe(400);
    const problem = refused.body as Problem;
    expect(problem.type).toContain('headline-mismatch');
    expect(problem.errors?.[0].pointer).toBe('/headline');
  });

  it('lets nobody sign before every serious warning was opened', async () => {
    const { edition, content } = await publish();
    const serious = content.warnings.filter(({ isSerious }) => isSerious).map(({ id }) => id);
    // The panel ends in 1954; without one company or another the book equity slope changes its sign or not.
    expect(serious).toContain('stale-data');
    const path = `/api/editions/${edition.id}`;
    const early = await cfo.post(`${path}/sign`, { password: testPassword });
    expect(early.status).toBe(409);
    expect((early.body as Problem).type).toContain('warnings-unopened');
    expect((await cfo.put(`${path}/warnings/unknown`, {})).status).toBe(404);
    expect((await analyst.put(`${path}/warnings/stale-data`, {})).status).toBe(403);
    await sign(edition.id);
    const signed = (await cfo.get(path)).body as EditionReply;
    expect(signed.edition.state).toBe('signed');
    expect([...signed.openedWarnings].sort()).toEqual([...serious].sort());
  });

  it('goes on with the thread where a returned edition is answered', async () => {
    const first = await publish();
    const path = `/api/editions/${first.edition.id}`;
    await cfo.post(`${path}/comments`, { block: 'standing', text: 'Why above C05?' });
    await cfo.post(`${path}/return`, { comment: 'See my question.' });
    const second = await publish({ answersEditionId: first.edition.id });
    expect(second.content.answers).toEqual({ id: first.edition.id, number: first.edition.number });
    const answered = await analyst.post(`/api/editions/${second.edition.id}/comments`, {
      block: 'standing',
      text: 'Its slope differs.',
    });
    const { comments } = answered.body as EditionReply;
    expect(comments.map(({ text, by, editionNumber }) => [text, by, editionNumber])).toEqual([
      ['Why above C05?', 'CFO', first.edition.number],
      ['Its slope differs.', 'Analyst', second.edition.number],
    ]);
    const waiting = await analyst.post(
      '/api/editions',
      composed({ answersEditionId: second.edition.id }),
    );
    expect(waiting.status).toBe(400);
  });

  it('says what changed since the edition signed last, and keeps the standings of all signed ones', async () => {
    await sign((await publish()).edition.id);
    const next = await preview({ unit: 'millions' });
    expect(next.content.changes?.peersAdded).toEqual([]);
    expect(next.content.changes?.panelCells?.changedCells).toBe(0);
    const standing = next.content.changes?.figures.find(({ label }) => label === 'standing');
    expect(standing?.before?.estimate).toBeCloseTo(2407.024642135653, 6);
    const { editions } = (await cfo.get('/api/editions/history')).body as EditionHistoryReply;
    expect(editions.length).toBeGreaterThan(0);
    expect(editions.at(-1)?.standing?.estimate).toBeCloseTo(2407.024642135653, 6);
    expect(editions.at(-1)?.state).toBe('signed');
  });

  it('says how many groups were looked at without saving them', async () => {
    const line = async () =>
      (await preview()).content.evidence
        .at(-1)
        ?.sentence.flatMap((part) =>
          'text' in part ? [part.text] : ['value' in part ? part.value : ''],
        )
        .join('');
    expect(await line()).toContain('No other peer group was saved before this one.');
    const superuser = new pg.Client({ connectionString: database.adminUrl });
    await superuser.connect();
    await superuser.query(
      `insert into trial_fit (workspace_id, hash, outcome) select workspace_id, 'abc', '{}' from workspace`,
    );
    await superuser.query(
      `insert into trial_fit (workspace_id, hash, outcome) select workspace_id, 'abd', '{}' from workspace`,
    );
    expect(await line()).toContain('the figures of 2 groups were looked at without saving them.');
    await superuser.query('delete from trial_fit');
    await superuser.end();
  });

  it('lists who looked at it, once an hour, for analysts and CFOs alone', async () => {
    const reader = await join(server, analyst, ['reader'], 'Reader');
    const { edition } = await publish();
    await sign(edition.id);
    const path = `/api/editions/${edition.id}`;
    expect(((await reader.get(path)).body as EditionReply).access).toBeNull();
    await reader.get(path);
    const { access } = (await cfo.get(path)).body as EditionReply;
    expect(access?.filter(({ by }) => by === 'Reader').map(({ kind }) => kind)).toEqual(['viewed']);
  });

  it('names an edition whose stored content was changed from outside, even with its hash', async () => {
    const { edition } = await publish();
    await sign(edition.id);
    const verify = async () =>
      (await cfo.get(`/api/editions/${edition.id}/verification`)).body as EditionVerification;
    expect((await verify()).isUnchanged).toBeTrue();
    const superuser = new pg.Client({ connectionString: database.adminUrl });
    await superuser.connect();
    try {
      await superuser.query('alter table edition disable trigger edition_frozen');
      const change = `update edition set content = replace(content, 'C05', 'C50') where id = $1`;
      await superuser.query(change, [edition.id]);
      expect((await verify()).detail).toContain(`Edition ${edition.number} was changed`);
      await superuser.query(
        `update edition set sha256 = encode(sha256(convert_to(content, 'UTF8')), 'hex') where id = $1`,
        [edition.id],
      );
      const found = await verify();
      expect(found.isUnchanged).toBeFalse();
      expect(found.detail).toContain('others than those recorded when it was published');
    } finally {
      await superuser.query('alter table edition enable trigger edition_frozen');
      await superuser.end();
    }
  });
});
