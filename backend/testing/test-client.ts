import { randomBytes } from 'node:crypto';
import request, { type Agent, type Response, type Test } from 'supertest';
import type { Role } from '../contract';
import type { TestServer } from './test-server';

export const testPassword = 'a long enough passphrase';

/** A browser's worth of cookies and headers: same origin, with the token of the page. */
export class TestClient {
  readonly agent: Agent;
  #token = '';

  constructor(private readonly url: string) {
    this.agent = request.agent(url);
  }

  /** The token of the page, as its cookie last had it. */
  get token(): string {
    return this.#token;
  }

  /** The reply of a GET. */
  get(path: string): Promise<Response> {
    return this.#keepToken(this.agent.get(path));
  }

  /** A file with its bytes. */
  async download(path: string): Promise<{
    readonly status: number;
    readonly type: string;
    readonly bytes: Buffer;
  }> {
    const response = await this.#keepToken(
      this.agent
        .get(path)
        .buffer(true)
        .parse((res, done) => {
          const chunks: Buffer[] = [];
          res.on('data', (chunk: Buffer) => chunks.push(chunk));
          res.on('end', () => {
            done(null, Buffer.concat(chunks));
          });
        }),
    );
    return { status: response.status, type: response.type, bytes: response.body as Buffer };
  }

  post(path: string, body?: object): Promise<Response> {
    return this.#send(this.agent.post(path), body);
  }

  put(path: string, body?: object): Promise<Response> {
    return this.#send(this.agent.put(path), body);
  }

  delete(path: string): Promise<Response> {
    return this.#send(this.agent.delete(path));
  }

  async upload(path: string, name: string, content: string | Buffer): Promise<Response> {
    await this.#fetchToken();
    const test = this.agent.post(path).attach('file', Buffer.from(content), name);
    return this.#keepToken(this.#sameOrigin(test));
  }

  async #send(test: Test, body?: object): Promise<Response> {
    await this.#fetchToken();
    const prepared = this.#sameOrigin(test);
    return this.#keepToken(body === undefined ? prepared : prepared.send(body));
  }

  #sameOrigin(test: Test): Test {
    return test.set('Origin', this.url).set('X-XSRF-TOKEN', this.#token);
  }

  async #fetchToken(): Promise<void> {
    if (this.#token === '') await this.get('/api/session');
  }

  async #keepToken(test: Test): Promise<Response> {
    const response = await test;
    const cookies = (response.headers['set-cookie'] ?? []) as unknown as string[];
    for (const cookie of cookies) {
      const match = /^(?:__Host-)?XSRF=([^;]+)/.exec(cookie);
      if (match !== null) this.#token = decodeURIComponent(match[1]);
    }
    return response;
  }
}

/** Somebody who founded a workspace of their own: analyst and billing admin. */
export async function signUp(server: TestServer, name = 'Founder'): Promise<TestClient> {
  const client = new TestClient(server.url);
  const response = await client.post('/api/accounts', {
    name,
    email: `${randomBytes(6).toString('hex')}@people.example`,
    password: testPassword,
    workspaceName: `Workspace of ${name}`,
  });
  if (response.status !== 201) throw new Error(`signing up answered ${response.text}`);
  return client;
}

/** Somebody who joins the founder's workspace by a link, with these roles. */
export async function join(
  server: TestServer,
  founder: TestClient,
  roles: readonly Role[],
  name: string = roles.join(' and '),
): Promise<TestClient> {
  const email = `${randomBytes(6).toString('hex')}@people.example`;
  const invitation = await founder.post('/api/members/invitations', { email, roles });
  if (invitation.status !== 201) throw new Error(`inviting answered ${invitation.text}`);
  const client = new TestClient(server.url);
  const { token } = invitation.body as { token: string };
  const joined = await client.post('/api/invitations/accept', {
    token,
    name,
    password: testPassword,
  });
  if (joined.status !== 201) throw new Error(`joining answered ${joined.text}`);
  return client;
}
