import type { Express } from 'express';
import type { TestDatabase } from '../db/testing/test-database';
import { type ApiRoute, apiRoutes, landingPath, maySee, pages, type Role, roles } from './contract';
import { join, signUp, TestClient } from './testing/test-client';
import { createMigratedDatabase, startTestServer, type TestServer } from './testing/test-server';

const anyId = '11111111-2222-4333-8444-555555555555';

/** The route's path with ids that do not exist. */
function addressOf(route: ApiRoute): string {
  return route.path
    .replace(':figure', 'standing')
    .replace(':format', 'csv')
    .replace(/:\w+/g, anyId);
}

function call(client: TestClient, route: ApiRoute): Promise<{ readonly status: number }> {
  const path = addressOf(route);
  switch (route.method) {
    case 'GET':
      return client.get(path);
    case 'POST':
      return client.post(path, {});
    case 'PUT':
      return client.put(path, {});
    case 'DELETE':
      return client.delete(path);
  }
}

describe('the access table', () => {
  let database: TestDatabase;
  let server: TestServer;
  const clients = new Map<Role, TestClient>();

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    const founder = await signUp(server);
    for (const role of roles) clients.set(role, await join(server, founder, [role]));
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  for (const [name, route] of Object.entries<ApiRoute>(apiRoutes)) {
    if (name === 'signOut') continue;
    it(`lets in nobody, and each role, to ${name} as it says`, async () => {
      const nobody = await call(new TestClient(server.url), route);
      if (route.allow === 'anyone') expect(nobody.status).not.toBe(403);
      else expect(nobody.status).withContext('nobody').toBe(401);
      for (const role of roles) {
        const client = clients.get(role);
        if (client === undefined) throw new Error(`no client for ${role}`);
        const { status } = await call(client, route);
        const isAllowed = typeof route.allow === 'string' || route.allow.includes(role);
        if (isAllowed) expect([401, 403]).withContext(role).not.toContain(status);
        else expect(status).withContext(role).toBe(403);
        expect(status).withContext(role).toBeLessThan(504);
        expect(status).withContext(role).not.toBe(500);
      }
    });
  }

  it('lists every route that the application answers under /api', () => {
    const listed = new Set(
      Object.values<ApiRoute>(apiRoutes).map(({ method, path }) => `${method} ${path}`),
    );
    const found = registeredRoutes(server.app).filter((route) => route.includes(' /api'));
    expect(found.length).toBe(listed.size);
    expect(found.filter((route) => !listed.has(route))).toEqual([]);
  });

  it('has no GET that changes anything by its name', () => {
    const changing = /^(start|save|change|delete|publish|sign|return|commit|invite|remove|upload)/;
    const gets = Object.entries<ApiRoute>(apiRoutes).filter(([, { method }]) => method === 'GET');
    expect(gets.filter(([name]) => changing.test(name))).toEqual([]);
  });

  it('shows each role its own pages, and lands it on one of them', () => {
    const seen = (role: Role) =>
      pages.filter((page) => maySee(page, [role])).map(({ path }) => path as string);
    expect(seen('analyst')).toEqual(['panel', 'peers', 'fit', 'scenarios', 'board']);
    expect(seen('cfo')).toEqual(['panel', 'peers', 'fit', 'scenarios', 'board']);
    expect(seen('reader')).toEqual(['board']);
    expect(seen('billing_admin')).toEqual(['seats', 'members']);
    for (const role of roles) expect(seen(role)).toContain(landingPath([role]).slice(1));
  });
});

interface Layer {
  readonly route?: { readonly path: string; readonly methods: Record<string, boolean> };
  readonly handle?: { readonly stack?: readonly Layer[] };
}

function registeredRoutes(app: Express): string[] {
  const walk = (layers: readonly Layer[]): string[] =>
    layers.flatMap(({ route, handle }) =>
      route === undefined
        ? walk(handle?.stack ?? [])
        : Object.keys(route.methods).map((method) => `${method.toUpperCase()} ${route.path}`),
    );
  return walk((app.router as unknown as { readonly stack: readonly Layer[] }).stack);
}
