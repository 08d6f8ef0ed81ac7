import { randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../db/errors';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, NotFound, TooManyRequests } from '../errors/app-error';
import type { JobQueue } from '../jobs/job-queue';
import { findPeerGroup, type PeerGroup } from '../peers/peer-service';
import { engineVersion, type FitResult } from '../stats';
import { type StoredFit, toStoredFit } from './fit-view';
import { type AskedSpecification, specificationOf } from './specification-of';
import { toFitResult } from './stored-result';

export interface FitRequest extends AskedSpecification {
  readonly peerGroupId: string;
}

/** A fit with what it stands on; without a result until it is done. */
export interface FitOnGround {
  readonly fit: StoredFit;
  readonly result: FitResult | undefined;
  readonly peerGroup: PeerGroup;
  readonly panelVersion: PanelVersionRow;
  /** The newest version of its panel, where that is another one. */
  readonly newerPanelVersion: { readonly id: string; readonly number: number } | null;
}

/** A fit that is done. */
export interface FinishedFit extends FitOnGround {
  readonly result: FitResult;
}

const mostListed = 200;
/** Of a workspace, queued or running. */
const mostUnfinished = 20;
const retryAfterSeconds = 30;

export class FitService {
  constructor(
    private readonly repositories: Repositories,
    private readonly queue: JobQueue,
  ) {}

  /**
   * Queues a fit; the same peer group and specification by the same engine answer with the fit that exists.
   *
   * @throws {NotFound} for an unknown peer group; {Invalid} for a column the panel does not have; {TooManyRequests} while
   *   the workspace has many fits under way.
   */
  async start(
    actor: { readonly personId: string; readonly workspaceId: string },
    request: FitRequest,
  ): Promise<FitOnGround> {
    const id = await this.repositories
      .inWorkspace(actor.workspaceId, (tx) => this.#queue(tx, actor.personId, request))
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation) return undefined;
        throw error;
      });
    this.queue.wake('fit');
    // Somebody else asked for the same fit in the same moment: theirs is the one.
    if (id === undefined) return this.start(actor, request);
    return this.find(actor.workspaceId, id);
  }

  async #queue(tx: WorkspaceRepositories, personId: string, request: FitRequest): Promise<string> {
    const group = await findPeerGroup(tx, request.peerGroupId);
    const version = await tx.panels.findVersion(group.panelVersionId);
    if (version === undefined) throw new NotFound('There is no such panel version.');
    const specification = specificationOf(request, version);
    const specificationKey = JSON.stringify([engineVersion, specification]);
    await tx.fits.lockCount();
    const same = await tx.fits.findSame(group.id, specificationKey);
    if (same !== undefined) return same.id;
    if ((await tx.fits.unfinished()) >= mostUnfinished)
      throw new TooManyRequests(
        `${mostUnfinished} fits of this workspace are queued or running. Wait for one to end, or cancel one.`,
        retryAfterSeconds,
      );
    const id = randomUUID();
    await tx.fits.insert({
      id,
      panelVersionId: version.id,
      peerGroupId: group.id,
      specification,
      specificationKey,
      createdBy: personId,
    });
    await this.queue.enqueue(tx, 'fit', id);
    await record(tx, personId, 'fit-started', id);
    return id;
  }

  async list(workspaceId: string): Promise<readonly StoredFit[]> {
    const rows = await this.repositories.inWorkspace(workspaceId, (tx) => tx.fits.list(mostListed));
    return rows.map(toStoredFit);
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, id: string): Promise<FitOnGround> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findFit(tx, id));
  }

  /** Stops a fit that is queued or running. @throws {NotFound}; {Conflict} when it has ended. */
  async cancel(
    actor: { readonly personId: string; readonly workspaceId: string },
    id: string,
    now: Date,
  ): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await findFit(tx, id);
      if (!(await tx.fits.cancel(id, now)))
        throw new Conflict('This fit has ended already; it stays as it is.');
      await record(tx, actor.personId, 'fit-cancelled', id);
    });
  }
}

/** @throws {NotFound} */
export async function findFit(tx: WorkspaceRepositories, id: string): Promise<FitOnGround> {
  const row = await tx.fits.find(id);
  if (row === undefined) throw new NotFound('There is no such fit.');
  const panelVersion = await tx.panels.findVersion(row.panelVersionId);
  if (panelVersion === undefined) throw new NotFound('There is no such panel version.');
  const result = await tx.fits.result(id);
  return {
    fit: toStoredFit(row),
    result: result === undefined ? undefined : toFitResult(result),
    panelVersion,
    newerPanelVersion: (await tx.panels.newerThan(panelVersion.id)) ?? null,
    peerGroup: await findPeerGroup(tx, row.peerGroupId),
  };
}

/** The newest fit that is done. */
export async function findLatestFit(tx: WorkspaceRepositories): Promise<StoredFit | undefined> {
  const row = await tx.fits.latestDone();
  return row === undefined ? undefined : toStoredFit(row);
}

/** @throws {NotFound}; {Conflict} while it is not done. */
export async function findFinishedFit(tx: WorkspaceRepositories, id: string): Promise<FinishedFit> {
  const found = await findFit(tx, id);
  if (found.result === undefined)
    throw new Conflict('This fit has no result. Wait for it, or start another.');
  return { ...found, result: found.result };
}
