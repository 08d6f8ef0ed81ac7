import { randomUUID } from 'node:crypto';
import type { PeerChoiceRow, PeerGroupRow } from '../../db/repositories/peers-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, Invalid, NotFound } from '../errors/app-error';

export interface PeerGroup extends PeerGroupRow {
  readonly choices: readonly PeerChoiceRow[];
}

export interface NewPeerGroup {
  readonly panelVersionId: string;
  readonly ownCompany: string;
  readonly note: string;
  readonly parentId: string | null;
  readonly peers: readonly PeerChoiceRow[];
}

/** Peer group versions: the own company, who is in and who is out, and why. */
export class PeerService {
  constructor(private readonly repositories: Repositories) {}

  async list(workspaceId: string): Promise<readonly PeerGroupRow[]> {
    return this.repositories.inWorkspace(workspaceId, (tx) => tx.peers.list());
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, id: string): Promise<PeerGroup> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findPeerGroup(tx, id));
  }

  /**
   * Saves a new version.
   *
   * @throws {Invalid} for a company that is not in the panel or named twice; {Conflict} when a newer version than the
   *   one the choice started from exists.
   */
  async save(
    actor: { readonly personId: string; readonly workspaceId: string },
    group: NewPeerGroup,
  ): Promise<PeerGroup> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      if ((await tx.panels.findVersion(group.panelVersionId)) === undefined)
        throw new NotFound('There is no such panel version.');
      assertChoice(group, new Set(await tx.panels.companyNames(group.panelVersionId)));
      await tx.members.lockWorkspace();
      const latest = await tx.peers.latest();
      if ((latest?.id ?? null) !== group.parentId) throw overtaken(latest);
      const id = randomUUID();
      const number = (latest?.number ?? 0) + 1;
      const peerCount = group.peers.filter((peer) => peer.isIncluded).length;
      const { peers, ...fields } = group;
      await tx.peers.insert({ id, number, peerCount, createdBy: actor.personId, ...fields }, peers);
      await record(tx, actor.personId, 'peer-group-saved', id, { number, peers: peerCount });
      return findPeerGroup(tx, id);
    });
  }
}

function overtaken(latest: PeerGroupRow | undefined): Conflict {
  return latest === undefined
    ? new Conflict('The version that this choice started from does not exist.', 'stale-version')
    : new Conflict(
        `${latest.createdByName} saved version ${latest.number} of the peer group meanwhile. Open it and make the change there.`,
        'stale-version',
        { latestId: latest.id },
      );
}

/** @throws {NotFound} */
export async function findPeerGroup(tx: WorkspaceRepositories, id: string): Promise<PeerGroup> {
  const found = await tx.peers.find(id);
  if (found === undefined) throw new NotFound('There is no such peer group version.');
  return { ...found, choices: await tx.peers.choices(id) };
}

function assertChoice(group: NewPeerGroup, companies: ReadonlySet<string>): void {
  const errors = [];
  if (!companies.has(group.ownCompany))
    errors.push({
      pointer: '/ownCompany',
      detail: `expected a company of the panel; found “${group.ownCompany}”`,
    });
  const seen = new Set([group.ownCompany]);
  for (const [index, peer] of group.peers.entries()) {
    const pointer = `/peers/${index}/company`;
    if (seen.has(peer.company))
      errors.push({ pointer, detail: `“${peer.company}” is named twice, or is the own company` });
    else if (!companies.has(peer.company))
      errors.push({ pointer, detail: `expected a company of the panel; found “${peer.company}”` });
    seen.add(peer.company);
  }
  if (group.peers.every((peer) => !peer.isIncluded))
    errors.push({ pointer: '/peers', detail: 'expected at least one peer that is in' });
  if (errors.length > 0) throw new Invalid('The peer group cannot be saved.', errors);
}
