import { eventually } from '../../db/testing/eventually';
import type { TestDatabase } from '../../db/testing/test-database';
import type { CapturedMail } from '../../stubs/smtp/mailbox';
import { noFaults } from '../../stubs/smtp/faults';
import { SmtpStubClient } from '../../stubs/smtp/testing/stub-client';
import type { EditionReply, FitReply, SessionReply } from '../contract';
import { join, signUp, type TestClient, testPassword } from '../testing/test-client';
import { importPanel, openWarnings, runFit, savePeers } from '../testing/test-model';
import {
  createMigratedDatabase,
  startTestServer,
  testOrigin,
  type TestServer,
} from '../testing/test-server';

describe('mail about editions', () => {
  let database: TestDatabase;
  let stub: SmtpStubClient;
  let server: TestServer;
  let fit: FitReply;
  let analyst: TestClient;
  /** Analyst and CFO: may publish and sign, not the same edition. */
  let both: TestClient;
  let cfo: TestClient;
  const addresses = new Map<TestClient, string>();

  beforeAll(async () => {
    database = await createMigratedDatabase();
    stub = await SmtpStubClient.start();
    const mail = { url: stub.smtpUrl, from: 'kinvale@velmara.example', silenceMs: 2000 };
    server = await startTestServer(database, { mail });
    analyst = await signUp(server, 'Ana');
    both = await join(server, analyst, ['analyst', 'cfo'], 'Bea');
    cfo = await join(server, analyst, ['cfo'], 'Cid <b>');
    await join(server, analyst, ['reader', 'billing_admin'], 'Rea');
    for (const client of [analyst, both, cfo]) {
      const { session } = (await client.get('/api/session')).body as SessionReply;
      addresses.set(client, session?.person.email ?? '');
    }
    const panelVersionId = await importPanel(analyst);
    fit = await runFit(analyst, await savePeers(analyst, panelVersionId, 'C06'));
  });

  afterEach(() => stub.fail(noFaults));

  afterAll(async () => {
    await server.close();
    await stub.stop();
    await database.drop();
  });

  async function publish(by: TestClient): Promise<EditionReply['edition']> {
    const reply = await by.post('/api/editions', {
      fitId: fit.fit.id,
      scenarios: [],
      confidentiality: 'inside-information',
      comment: 'Mind the levies.',
    });
    expect(reply.status).toBe(201);
    return (reply.body as EditionReply).edition;
  }

  /** All mail that somebody got of an edition, once there is as much of it. */
  const mailsOf = (client: TestClient, editionId: string, count = 1): Promise<CapturedMail[]> =>
    eventually(`${count} mails`, async () => {
      const found = await stub.mailsTo(addresses.get(client) ?? '');
      const mails = found.filter(({ text }) => text.includes(`${testOrigin}/board/${editionId}`));
      return mails.length >= count ? mails : undefined;
    });

  it('goes to every CFO but the publisher when one waits, and to the publisher when it is signed', async () => {
    const { id, number } = await publish(both);
    const [waiting] = await mailsOf(cfo, id);
    const workspace = 'Workspace of Ana';
    expect(waiting.subject).toBe(`Edition ${number} waits for your decision (${workspace})`);
    expect(waiting.text).toContain(`Bea published edition ${number} in ${workspace}.`);
    await openWarnings(cfo, id);
    const signed = await cfo.post(`/api/editions/${id}/sign`, { password: testPassword });
    expect(signed.status).toBe(200);
    const mails = await mailsOf(both, id);
    expect(mails.map(({ subject }) => subject)).toEqual([
      `Edition ${number} is signed (${workspace})`,
    ]);
    expect(mails[0].html).toContain('Cid &lt;b&gt; signed edition');
    expect((await mailsOf(cfo, id)).length).toBe(1);
  });

  it('tells the publisher of a return, and neither figures, companies nor comments', async () => {
    const { id, number } = await publish(analyst);
    await Promise.all([mailsOf(cfo, id), mailsOf(both, id)]);
    const returned = await cfo.post(`/api/editions/${id}/return`, { comment: 'Explain C05.' });
    expect(returned.status).toBe(200);
    const mails = [...(await mailsOf(analyst, id)), ...(await mailsOf(cfo, id))];
    expect(mails.map(({ subject }) => subject.split(' (')[0])).toEqual([
      `Edition ${number} is returned`,
      `Edition ${number} waits for your decision`,
    ]);
    for (const { text, html, subject } of mails) {
      const words = [subject, text, html].join('\n').replaceAll(id, '');
      expect(words).not.toMatch(/C0\d|Explain|levies|Reference/);
      expect(new Set(words.replace(/<[^>]+>/g, '').match(/\d+/g))).toEqual(
        new Set([String(number)]),
      );
    }
  });

  it('keeps no request waiting for a mail server that fell silent, and is sent when it speaks again', async () => {
    await stub.fail({ hangs: 'at-greeting' });
    const { id } = await publish(analyst);
    const returned = await cfo.post(`/api/editions/${id}/return`, { comment: 'Again.' });
    expect(returned.status).toBe(200);
    expect(
      (await stub.mailsTo(addresses.get(analyst) ?? '')).map(({ text }) => text),
    ).not.toContain(jasmine.stringContaining(id));
    await stub.fail({ hangs: 'never' });
    expect((await mailsOf(analyst, id)).length).toBe(1);
    expect((await mailsOf(cfo, id)).length).toBe(1);
  });
});
