import pg from 'pg';
import type { EditionReply } from '../../backend/contract';
import { join, signUp, type TestClient, testPassword } from '../../backend/testing/test-client';
import { importPanel, openWarnings, runFit, savePeers } from '../../backend/testing/test-model';
import {
  createMigratedDatabase,
  startTestServer,
  type TestServer,
} from '../../backend/testing/test-server';
import type { TestDatabase } from '../../db/testing/test-database';
import { verifyEditions } from './verify-editions';

describe('verifyEditions', () => {
  let database: TestDatabase;
  let server: TestServer;
  let edition: EditionReply['edition'];

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    const analyst: TestClient = await signUp(server);
    const cfo = await join(server, analyst, ['cfo']);
    const { fit } = await runFit(
      analyst,
      await savePeers(analyst, await importPanel(analyst), 'C06'),
    );
    const published = await analyst.post('/api/editions', {
      fitId: fit.id,
      scenarios: [],
      confidentiality: 'confidential',
      comment: '',
    });
    edition = (published.body as EditionReply).edition;
    await openWarnings(cfo, edition.id);
    await cfo.post(`/api/editions/${edition.id}/sign`, { password: testPassword });
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  it('finds nothing wrong with what nobody touched, and names what a superuser changed', async () => {
    const [untouched] = await verifyEditions(database.adminUrl, undefined);
    expect(untouched).toEqual({
      workspace: 'Workspace of Founder',
      number: 1,
      state: 'signed',
      sha256: edition.sha256,
      fault: null,
    });
    expect(await verifyEditions(database.adminUrl, 7)).toEqual([]);
    const superuser = new pg.Client({ connectionString: database.adminUrl });
    await superuser.connect();
    await superuser.query('alter table edition disable trigger edition_frozen');
    await superuser.query(`update edition set content = replace(content, 'C05', 'C50')`);
    await superuser.query('alter table edition enable trigger edition_frozen');
    await superuser.end();
    const [changed] = await verifyEditions(database.adminUrl, 1);
    expect(changed.fault).toContain('Edition 1 was changed');
  });
});
