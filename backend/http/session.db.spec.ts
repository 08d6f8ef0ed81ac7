import pg from 'pg';
import request, { type Response, type Test } from 'supertest';
import type { TestDatabase } from '../../db/testing/test-database';
import type { TestClient } from '../testing/test-client';
import { join, signUp, testPassword } from '../testing/test-client';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const minute = 60_000;

describe('sessions', () => {
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

  const isSignedIn = async (client: TestClient): Promise<boolean> =>
    ((await client.get('/api/session')).body as { session: unknown }).session != null;

  it('end 30 minutes after the last use', async () => {
    const client = await signUp(server);
    server.clock.advance(29 * minute);
    expect(await isSignedIn(client)).toBeTrue();
    server.clock.advance(29 * minute);
    expect(await isSignedIn(client)).toBeTrue();
    server.clock.advance(31 * minute);
    expect(await isSignedIn(client)).toBeFalse();
    expect((await client.get('/api/fits')).status).toBe(401);
  });

  it('end 8 hours after signing in, however busy', async () => {
    const client = await signUp(server);
    for (let used = 0; used < 8 * 60; used += 20) {
      expect(await isSignedIn(client))
        .withContext(`after ${used} minutes`)
        .toBeTrue();
      server.clock.advance(20 * minute);
    }
    server.clock.advance(minute);
    expect(await isSignedIn(client)).toBeFalse();
  });

  it('are destroyed by signing out: the old cookie is worth nothing', async () => {
    const client = await signUp(server);
    const cookie = cookieOf(client, server);
    expect((await request(server.url).get('/api/seats').set('Cookie', cookie)).status).not.toBe(
      401,
    );
    const reply = await client.delete('/api/session');
    expect(reply.status).toBe(204);
    expect(reply.headers['clear-site-data']).toContain('"storage"');
    expect((await request(server.url).get('/api/seats').set('Cookie', cookie)).status).toBe(401);
  });

  it('do not come back by a request that ends after they were destroyed', async () => {
    const client = await signUp(server);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      server.clock.advance(2 * minute);
      await admin.query('begin');
      await admin.query('lock table membership');
      // Has read its session, waits for the roles; its use changes the session, which is saved at the request's end.
      const slow = client.get('/api/session');
      for (let waiting = 0; waiting === 0;) {
        const found = await admin.query('select from pg_locks where not granted');
        waiting = found.rowCount ?? 0;
      }
      await admin.query('delete from session');
      await admin.query('commit');
      await slow;
      expect((await admin.query('select from session')).rowCount).toBe(0);
      expect((await client.get('/api/fits')).status).toBe(401);
    } finally {
      await admin.end();
    }
  });

  it('of a removed member end at once, and a changed role holds from the next request on', async () => {
    const founder = await signUp(server);
    const member = await join(server, founder, ['analyst']);
    expect((await member.get('/api/fits')).status).toBe(200);
    const { session } = (await member.get('/api/session')).body as {
      session: { person: { id: string } };
    };
    const path = `/api/members/${session.person.id}`;
    await founder.put(`${path}/roles`, { roles: ['reader'] });
    expect((await member.get('/api/fits')).status).toBe(403);
    await founder.delete(path);
    expect((await member.get('/api/editions')).status).toBe(401);
  });

  it('get a new id at signing in, and a cookie that scripts and other sites cannot use', async () => {
    const production = await startTestServer(database, { isLocal: false, trustProxyHops: 1 });
    try {
      const before = await overTls(production, request(production.url).get('/api/session'));
      expect(cookiesOf(before)).toEqual([
        jasmine.stringMatching(/^__Host-XSRF=[^;]+; Path=\/; Secure; SameSite=Lax$/),
      ]);
      const account = { email: 'over.tls@people.example', password: testPassword };
      const signedUp = await overTls(
        production,
        request(production.url).post('/api/accounts'),
        before,
      ).send({ ...account, name: 'Over TLS', workspaceName: 'Over TLS' });
      expect(signedUp.status).toBe(201);
      expect(sidOf(signedUp)).toMatch(
        /^__Host-sid=s%3A[^;]+; Path=\/; Expires=[^;]+; HttpOnly; Secure; SameSite=Lax$/,
      );
      const again = await overTls(
        production,
        request(production.url).post('/api/session'),
        signedUp,
      ).send(account);
      expect(again.status).toBe(200);
      expect(sidOf(again)).not.toBe(sidOf(signedUp));
      const old = await overTls(production, request(production.url).get('/api/session'), signedUp);
      expect(old.body).toEqual({ session: null });
    } finally {
      await production.close();
    }
  });

  it('keep the id alone in the cookie, and no password or token anywhere in the database', async () => {
    const founder = await signUp(server, 'Keeper');
    await join(server, founder, ['reader']);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      const hashes = await admin.query<{ password_hash: string }>(
        'select password_hash from person',
      );
      for (const { password_hash } of hashes.rows)
        expect(password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
      const dump = await admin.query(`select string_agg(p::text, '') || (
        select string_agg(i::text, '') from invitation i) as text from person p`);
      expect(JSON.stringify(dump.rows)).not.toContain(testPassword);
    } finally {
      await admin.end();
    }
  });

  it('are shared by two server processes on one database', async () => {
    const client = await signUp(server);
    const second = await startTestServer(database);
    try {
      const reply = await request(second.url)
        .get('/api/session')
        .set('Cookie', cookieOf(client, server));
      expect((reply.body as { session: unknown }).session).not.toBeNull();
    } finally {
      await second.close();
    }
  });
});

/** The session cookie as a browser would send it. */
function cookieOf(client: TestClient, server: TestServer): string {
  const { hostname } = new URL(server.url);
  const found = client.agent.jar.getCookie('sid', {
    domain: hostname,
    path: '/',
    secure: false,
    script: false,
  });
  return found === undefined ? '' : found.toValueString();
}

/** A request as it comes through a proxy that ends TLS, with the cookies and token of an earlier reply. */
function overTls(server: TestServer, test: Test, earlier?: Response): Test {
  const cookies =
    earlier === undefined ? [] : cookiesOf(earlier).map((cookie) => cookie.split(';')[0]);
  const token = cookies.find((cookie) => cookie.startsWith('__Host-XSRF='))?.split('=')[1] ?? '';
  return test
    .set('X-Forwarded-Proto', 'https')
    .set('Origin', server.url)
    .set('Cookie', cookies.join('; '))
    .set('X-XSRF-TOKEN', decodeURIComponent(token));
}

function cookiesOf(response: Response): string[] {
  return response.headers['set-cookie'] as unknown as string[];
}

function sidOf(response: Response): string | undefined {
  return cookiesOf(response).find((cookie) => cookie.startsWith('__Host-sid='));
}
