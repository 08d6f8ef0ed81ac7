import { setTimeout as pause } from 'node:timers/promises';
import type { Page } from '@playwright/test';
import {
  type ApiRoute,
  FitReply,
  ImportReply,
  InvitationCreated,
  PanelCompaniesReply,
  PeerGroupReply,
  type Role,
  apiRoutes,
} from '@contract';
import type { Account } from './demo-accounts';

const sampleOwnCompany = 'Velmara';
const longestImportMs = 30_000;
const longestFitMs = 60_000;

interface CallOptions {
  readonly path?: Record<string, string>;
  readonly body?: unknown;
  readonly file?: { readonly name: string; readonly mimeType: string; readonly buffer: Buffer };
}

/**
 * The API as the signed-in browser calls it, for journeys that begin where another one ends. It shares the page's
 * cookies, so that whoever signs up or joins here is signed in on the page too.
 */
export class PreparedWorkspace {
  constructor(private readonly page: Page) {}

  /** A workspace of its own with nothing in it. */
  async signUp(founder: Account, workspaceName: string): Promise<void> {
    await this.#call(apiRoutes.readSession); // gives the token that changes are sent with
    await this.#call(apiRoutes.signUp, { body: { ...founder, workspaceName } });
  }

  /** @returns the token of the link. */
  async invite(email: string, ...roles: readonly Role[]): Promise<string> {
    const reply = await this.#call(apiRoutes.inviteMember, { body: { email, roles } });
    return InvitationCreated.parse(reply).token;
  }

  async join(token: string, { name, password }: Account): Promise<void> {
    await this.#call(apiRoutes.readSession);
    await this.#call(apiRoutes.acceptInvitation, { body: { token, name, password } });
  }

  /** Gives somebody who is in the workspace other roles. */
  async changeRoles(personId: string, ...roles: readonly Role[]): Promise<void> {
    await this.#call(apiRoutes.changeRoles, { path: { personId }, body: { roles } });
  }

  /** The sample panel, everybody in as a peer, and a fit that is done. @returns the fit's id. */
  async fitSample(): Promise<string> {
    const panelVersionId = await this.#importSample();
    return this.fitAll(panelVersionId, sampleOwnCompany);
  }

  /** Everybody in as a peer, and a fit that is done. @returns the fit's id. */
  async fitAll(panelVersionId: string, ownCompany: string): Promise<string> {
    const { companies } = PanelCompaniesReply.parse(
      await this.#call(apiRoutes.readPanelCompanies, { path: { panelVersionId } }),
    );
    const peers = companies
      .filter(({ name }) => name !== ownCompany)
      .map(({ name }) => ({ company: name, isIncluded: true, reason: 'Same end markets as ours' }));
    const saved = await this.#call(apiRoutes.savePeerGroup, {
      body: { panelVersionId, ownCompany, note: '', parentId: null, peers },
    });
    return this.#fit(PeerGroupReply.parse(saved).id);
  }

  /** A panel from a CSV file, mapped as the body says. @returns the panel version's id. */
  async importCsv(csv: string, mapping: object): Promise<string> {
    const file = { name: 'panel.csv', mimeType: 'text/csv', buffer: Buffer.from(csv) };
    const uploaded = await this.#call(apiRoutes.uploadFile, { file });
    const { id: importId } = ImportReply.parse(uploaded);
    await this.#call(apiRoutes.checkImport, { path: { importId }, body: mapping });
    return this.#commit(importId);
  }

  async #importSample(): Promise<string> {
    const { id: importId } = ImportReply.parse(await this.#call(apiRoutes.useSample));
    return this.#commit(importId);
  }

  async #commit(importId: string): Promise<string> {
    await this.#call(apiRoutes.commitImport, { path: { importId }, body: { note: '' } });
    const until = Date.now() + longestImportMs;
    while (Date.now() < until) {
      const reply = await this.#call(apiRoutes.readImport, { path: { importId } });
      const { state, failure, panelVersionId } = ImportReply.parse(reply);
      if (panelVersionId !== null) return panelVersionId;
      if (state !== 'committing') throw new Error(`the import ended ${state}: ${failure ?? ''}`);
      await pause(100);
    }
    throw new Error('the import did not end in time');
  }

  async #fit(peerGroupId: string): Promise<string> {
    const started = FitReply.parse(await this.#call(apiRoutes.startFit, { body: { peerGroupId } }));
    const fitId = started.fit.id;
    const until = Date.now() + longestFitMs;
    while (Date.now() < until) {
      await pause(200);
      const { fit } = FitReply.parse(await this.#call(apiRoutes.readFit, { path: { fitId } }));
      if (fit.state === 'done') return fitId;
      if (fit.state === 'failed' || fit.state === 'cancelled')
        throw new Error(`the fit ended ${fit.state}`);
    }
    throw new Error('the fit did not end in time');
  }

  async #call(route: ApiRoute, { path = {}, body, file }: CallOptions = {}): Promise<unknown> {
    const address = route.path.replace(/:(\w+)/g, (_, name: string) => path[name]);
    const cookies = await this.page.context().cookies();
    const token = cookies.find(({ name }) => name === '__Host-XSRF')?.value ?? '';
    const origin = process.env['KINVALE_URL'] ?? '';
    const reply = await this.page.request.fetch(address, {
      method: route.method,
      headers: { Origin: origin, 'X-XSRF-TOKEN': decodeURIComponent(token) },
      ...(body === undefined ? {} : { data: body }),
      ...(file === undefined ? {} : { multipart: { file } }),
    });
    if (!reply.ok())
      throw new Error(`${route.method} ${address}: ${reply.status()} ${await reply.text()}`);
    return (await reply.body()).length === 0 ? null : reply.json();
  }
}
