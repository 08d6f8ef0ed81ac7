import { randomBytes } from 'node:crypto';
import { setTimeout as wait } from 'node:timers/promises';
import { ImportReply } from '../../backend/contract';

const lookEveryMs = 50;
const longestMs = 180_000;

/** An analyst in a workspace of their own, who brings files in through the API as the browser does. */
export class ImportClient {
  readonly #cookies = new Map<string, string>();

  constructor(private readonly url: string) {}

  async signUp(): Promise<void> {
    await this.#call('GET', '/api/session');
    await this.#call('POST', '/api/accounts', {
      name: 'Analyst',
      email: `${randomBytes(6).toString('hex')}@people.example`,
      password: 'a long enough passphrase',
      workspaceName: 'Imports',
    });
  }

  /** @returns the import's id. */
  async upload(csv: string): Promise<string> {
    const form = new FormData();
    form.append('file', new Blob([csv]), 'panel.csv');
    return ImportReply.parse(await this.#call('POST', '/api/imports', form)).id;
  }

  /** @throws {Error} when something keeps the file from becoming a panel. */
  async check(id: string, mapping: object): Promise<void> {
    const reply = await this.#call('PUT', `/api/imports/${id}/mapping`, mapping);
    const { check } = ImportReply.parse(reply);
    if (check?.blockingCount !== 0)
      throw new Error(`the check found: ${check?.findings[0]?.detail ?? 'nothing at all'}`);
  }

  async commit(id: string): Promise<void> {
    await this.#call('POST', `/api/imports/${id}/commit`, { note: '' });
  }

  /** Waits until the import is a panel version. @returns its id. */
  async committed(id: string): Promise<string> {
    for (const until = Date.now() + longestMs; Date.now() < until;) {
      const reply = ImportReply.parse(await this.#call('GET', `/api/imports/${id}`));
      if (reply.panelVersionId !== null) return reply.panelVersionId;
      if (reply.state !== 'committing')
        throw new Error(`the import ended ${reply.state}: ${reply.failure ?? ''}`);
      await wait(lookEveryMs);
    }
    throw new Error(`the import did not end within ${longestMs / 1000} seconds`);
  }

  /** @throws {Error} with the reply's text for any status that is no success. */
  async #call(method: string, path: string, body?: object): Promise<unknown> {
    const token = [...this.#cookies].find(([name]) => name.endsWith('XSRF'))?.[1] ?? '';
    const reply = await fetch(new URL(path, this.url), {
      method,
      headers: {
        Origin: this.url,
        Cookie: [...this.#cookies].map((cookie) => cookie.join('=')).join('; '),
        'X-XSRF-TOKEN': decodeURIComponent(token),
        ...(body === undefined || body instanceof FormData
          ? {}
          : { 'Content-Type': 'application/json' }),
      },
      ...(body === undefined
        ? {}
        : { body: body instanceof FormData ? body : JSON.stringify(body) }),
    });
    for (const cookie of reply.headers.getSetCookie()) {
      const [, name, value] = /^([^=]+)=([^;]*)/.exec(cookie) ?? [];
      this.#cookies.set(name, value);
    }
    const text = await reply.text();
    if (!reply.ok) throw new Error(`${method} ${path} answered ${reply.status}: ${text}`);
    return text === '' ? null : JSON.parse(text);
  }
}
