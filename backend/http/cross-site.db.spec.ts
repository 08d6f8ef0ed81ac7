import request from 'supertest';
import type { TestDatabase } from '../../db/testing/test-database';
import { type ApiRoute, apiRoutes } from '../contract';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';
import type { TestClient } from '../testing/test-client';
import { signUp } from '../testing/test-client';

describe('the guard against requests of other sites', () => {
  let database: TestDatabase;
  let server: TestServer;
  let client: TestClient;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    client = await signUp(server);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const changing = Object.entries<ApiRoute>(apiRoutes).filter(([, { method }]) => method !== 'GET');

  for (const [name, { method, path }] of changing)
    it(`refuses ${name} without a token, with a wrong one, of another session, site or body type`, async () => {
      const stranger = await signUp(server, 'Stranger');
      const send = (headers: Record<string, string>, body: string | object = {}) => {
        const lower = method.toLowerCase() as 'post' | 'put' | 'delete';
        let test = client.agent[lower](path.replace(/:\w+/g, 'x'));
        for (const [header, value] of Object.entries(headers)) test = test.set(header, value);
        return test.send(body);
      };
      const good = { Origin: server.url, 'X-XSRF-TOKEN': client.token };
      const attempts: Record<string, Promise<{ readonly status: number }>> = {
        'no token': send({ Origin: server.url }),
        'a made-up token': send({ ...good, 'X-XSRF-TOKEN': 'a.b' }),
        'another session’s token': send({ ...good, 'X-XSRF-TOKEN': stranger.token }),
        'no origin': send({ 'X-XSRF-TOKEN': client.token }),
        'another origin': send({ ...good, Origin: 'https://elsewhere.example' }),
        'a cross-site fetch': send({ ...good, 'Sec-Fetch-Site': 'cross-site' }),
        'a same-site fetch': send({ ...good, 'Sec-Fetch-Site': 'same-site' }),
        'a plain text body': send({ ...good, 'Content-Type': 'text/plain' }, 'x=1'),
        'a form body': send(
          { ...good, 'Content-Type': 'application/x-www-form-urlencoded' },
          'x=1',
        ),
      };
      for (const [what, attempt] of Object.entries(attempts)) {
        const reply = await attempt;
        expect(reply.status).withContext(what).toBe(403);
      }
    });

  it('guards the same routes under any spelling of their path', async () => {
    for (const path of ['/API/accounts', '/Api/fits', '/api/FITS']) {
      const reply = await client.agent
        .post(path)
        .set('Origin', 'https://elsewhere.example')
        .send({});
      expect(reply.status).withContext(path).toBe(403);
    }
  });

  it('gives no CORS header to anybody', async () => {
    const reply = await request(server.url)
      .get('/api/session')
      .set('Origin', 'https://elsewhere.example');
    expect(Object.keys(reply.headers).filter((name) => name.startsWith('access-control'))).toEqual(
      [],
    );
  });

  it('does not answer the API as a page', async () => {
    const reply = await request(server.url).get('/api/session').set('Sec-Fetch-Dest', 'document');
    expect(reply.status).toBe(403);
  });
});
