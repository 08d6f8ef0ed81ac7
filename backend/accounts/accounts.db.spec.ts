import type { TestDatabase } from '../../db/testing/test-database';
import type { InvitationCreated, InvitationView, MembersReply } from '../contract';
import { join, signUp, TestClient, testPassword } from '../testing/test-client';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const hour = 3_600_000;

describe('accounts', () => {
  let database: TestDatabase;
  let server: TestServer;

  beforeAll(async () => {
    database = await createMigratedDatabase();
  });

  beforeEach(async () => {
    server = await startTestServer(database);
  });

  afterEach(async () => {
    await server.close();
  });

  afterAll(async () => {
    await database.drop();
  });

  const emailOf = async (client: TestClient): Promise<string> =>
    ((await client.get('/api/session')).body as { session: { person: { email: string } } }).session
      .person.email;

  it('sign in by address in any case, and not with another password or its prefix', async () => {
    const email = await emailOf(await signUp(server));
    const client = new TestClient(server.url);
    const prefix = testPassword.slice(0, -1);
    expect((await client.post('/api/session', { email, password: prefix })).status).toBe(401);
    const reply = await client.post('/api/session', {
      email: email.toUpperCase(),
      password: testPassword,
    });
    expect(reply.status).toBe(200);
  });

  it('slow guessing down and let the owner in after the wait; other accounts are untouched', async () => {
    server.clock.stop();
    const email = await emailOf(await signUp(server));
    const guesser = new TestClient(server.url);
    for (let guess = 0; guess < 5; guess++)
      await guesser.post('/api/session', { email, password: 'not this one either' });
    const right = { email, password: testPassword };
    const tooSoon = await guesser.post('/api/session', right);
    expect(tooSoon.status).toBe(429);
    expect(Number(tooSoon.headers['retry-after'])).toBeGreaterThan(0);
    server.clock.advance(61_000);
    expect((await guesser.post('/api/session', right)).status).toBe(200);
  });

  it('let no more guesses through at once than one after the other', async () => {
    server.clock.stop();
    const email = await emailOf(await signUp(server));
    const guesses = await Promise.all(
      Array.from({ length: 20 }, async () => {
        const guesser = new TestClient(server.url);
        return guesser.post('/api/session', { email, password: 'not this one either' });
      }),
    );
    expect(guesses.filter(({ status }) => status === 401).length).toBe(5);
    expect(guesses.filter(({ status }) => status === 429).length).toBe(15);
  });

  it('are one for each address', async () => {
    const email = await emailOf(await signUp(server));
    const reply = await new TestClient(server.url).post('/api/accounts', {
      name: 'Second',
      email,
      password: testPassword,
      workspaceName: 'Second',
    });
    expect(reply.status).toBe(409);
  });

  it('join by a link once, within 72 hours, with the roles it names', async () => {
    const founder = await signUp(server);
    const invite = async (email: string): Promise<string> => {
      const reply = await founder.post('/api/members/invitations', { email, roles: ['cfo'] });
      return (reply.body as InvitationCreated).token;
    };
    const token = await invite('first@join.example');
    const view = await new TestClient(server.url).post('/api/invitations/view', { token });
    expect((view.body as InvitationView).roles).toEqual(['cfo']);
    expect((view.body as InvitationView).hasAccount).toBeFalse();
    const body = { token, name: 'First', password: testPassword };
    const both = await Promise.all([
      new TestClient(server.url).post('/api/invitations/accept', body),
      new TestClient(server.url).post('/api/invitations/accept', body),
    ]);
    expect(both.map(({ status }) => status).filter((status) => status === 201).length).toBe(1);
    const used = await new TestClient(server.url).post('/api/invitations/view', { token });
    expect(used.status).toBe(410);

    const late = await invite('late@join.example');
    server.clock.advance(72 * hour + 1);
    const expired = await new TestClient(server.url).post('/api/invitations/accept', {
      token: late,
      name: 'Late',
      password: testPassword,
    });
    expect(expired.status).toBe(410);
    const garbage = await new TestClient(server.url).post('/api/invitations/view', {
      token: 'x.y',
    });
    expect(garbage.status).toBe(410);
  });

  it('that exist join another workspace with their own password', async () => {
    const founder = await signUp(server);
    const other = await signUp(server, 'Other');
    const email = await emailOf(other);
    const reply = await founder.post('/api/members/invitations', { email, roles: ['reader'] });
    const { token } = reply.body as InvitationCreated;
    const client = new TestClient(server.url);
    const wrong = { token, password: 'some other passphrase' };
    expect((await client.post('/api/invitations/accept', wrong)).status).toBe(401);
    const right = { token, password: testPassword };
    expect((await client.post('/api/invitations/accept', right)).status).toBe(201);
    expect((await client.get('/api/editions')).status).toBe(200);
  });

  it('keep the last billing admin, in role and in membership', async () => {
    const founder = await signUp(server);
    const members = (await founder.get('/api/members')).body as MembersReply;
    const path = `/api/members/${members.members[0].personId}`;
    expect((await founder.put(`${path}/roles`, { roles: ['analyst'] })).status).toBe(409);
    expect((await founder.delete(path)).status).toBe(409);
    await join(server, founder, ['billing_admin']);
    expect((await founder.put(`${path}/roles`, { roles: ['analyst'] })).status).toBe(204);
  });
});
