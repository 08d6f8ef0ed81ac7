import request from 'supertest';
import type { TestDatabase } from '../../db/testing/test-database';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

describe('every reply', () => {
  let database: TestDatabase;
  let server: TestServer;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database, { isLocal: false });
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  for (const path of ['/livez', '/api/session', '/api/fits', '/no/such/page', '/api/none'])
    it(`carries the security headers at ${path}`, async () => {
      const { headers } = await request(server.url).get(path);
      const policy = headers['content-security-policy'];
      for (const rule of [
        "default-src 'none'",
        "script-src 'self'",
        "style-src-attr 'none'",
        "connect-src 'self'",
        "frame-ancestors 'none'",
        "base-uri 'none'",
        "object-src 'none'",
        'upgrade-insecure-requests',
      ])
        expect(policy.split(';')).withContext(rule).toContain(rule);
      expect(policy).toMatch(/style-src 'self' 'nonce-[\w+/=]{24}'/);
      expect(policy).not.toContain('unsafe-eval');
      expect(headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains');
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['cross-origin-opener-policy']).toBe('same-origin');
      expect(headers['x-powered-by']).toBeUndefined();
    });

  it('of the API is never stored, and an unknown address answers a problem with the request’s id', async () => {
    const reply = await request(server.url).get('/api/none');
    expect(reply.status).toBe(404);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.headers['cache-control']).toBe('no-store');
    expect((reply.body as { instance: string }).instance).toMatch(/^[0-9a-f-]{36}$/);
    const line = server.log.find((each) =>
      each.includes((reply.body as { instance: string }).instance),
    );
    expect(line).toBeDefined();
  });

  it('names what is wrong with a body, field by field', async () => {
    const agent = request.agent(server.url);
    const cookies = (await agent.get('/api/session')).headers['set-cookie'];
    const token = decodeURIComponent(/__Host-XSRF=([^;]+)/.exec(cookies)?.[1] ?? '');
    const send = (body: string) =>
      request(server.url)
        .post('/api/accounts')
        .set('Origin', server.url)
        .set('X-XSRF-TOKEN', token)
        .set('Content-Type', 'application/json')
        .send(body);
    const reply = await send(
      '{"name":"","email":"x","password":"short","workspaceName":"W","role":"cfo"}',
    );
    expect(reply.status).toBe(400);
    const { errors } = reply.body as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer)).toEqual(
      jasmine.arrayWithExactContents(['/name', '/email', '/password', '/']),
    );
    expect((await send('{"name":')).status).toBe(400);
    expect((await send('{"__proto__":{"x":1}}')).status).toBe(400);
    expect((await send('1e309')).status).toBe(400);
  });

  it('logs no query string and no header', async () => {
    await request(server.url)
      .get('/api/session?secret=canary-in-the-query')
      .set('Authorization', 'canary-in-a-header');
    expect(server.log.join('')).not.toContain('canary-in');
  });

  it('says ready only when the database answers with this build’s schema', async () => {
    const reply = await request(server.url).get('/readyz');
    expect(reply.body).toEqual({ ready: true, reasons: [] });
  });
});
