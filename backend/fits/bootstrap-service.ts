import { randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../db/errors';
import type { BootstrapRow } from '../../db/repositories/bootstraps-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, NotFound } from '../errors/app-error';
import type { JobQueue } from '../jobs/job-queue';
import { engineVersion } from '../stats';
import { findEvidence } from './evidence-service';

interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

/** Bootstraps of the slopes that somebody asks for after a fit. */
export class BootstrapService {
  constructor(
    private readonly repositories: Repositories,
    private readonly queue: JobQueue,
  ) {}

  /**
   * Queues a bootstrap; asked for again with the same seed, it answers the one that exists.
   *
   * @throws {NotFound}; {Conflict} while another is under way, and where the evidence has nothing to add it to.
   */
  async start(actor: Actor, fitId: string, seed: number): Promise<BootstrapRow> {
    const id = await this.repositories
      .inWorkspace(actor.workspaceId, (tx) => this.#queue(tx, { actor, fitId, seed }))
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation) return undefined;
        throw error;
      });
    this.queue.wake('bootstrap');
    // Somebody else asked in the same moment: theirs is looked at.
    if (id === undefined) return this.start(actor, fitId, seed);
    const found = await this.repositories.inWorkspace(actor.workspaceId, (tx) =>
      tx.bootstraps.find(id),
    );
    if (found === undefined) throw new NotFound('There is no such bootstrap.');
    return found;
  }

  async #queue(
    tx: WorkspaceRepositories,
    { actor, fitId, seed }: { actor: Actor; fitId: string; seed: number },
  ): Promise<string> {
    const view = await findEvidence(tx, fitId);
    if (view.state === 'computing')
      throw new Conflict(
        'The evidence of this fit is still being computed. Start the bootstrap when it is there.',
      );
    if (view.state !== 'ready')
      throw new Conflict('This fit has no evidence that a bootstrap could be added to.');
    const { engine } = view.evidence;
    if (engine !== engineVersion)
      throw new Conflict(
        `This fit was made by engine ${engine}, and a bootstrap would be by ${engineVersion}: fit again.`,
      );
    const known = await tx.bootstraps.ofFit(fitId);
    const same = known.find((row) => row.seed === seed && isKept(row));
    if (same !== undefined) return same.id;
    if (known.some(isUnderWay))
      throw new Conflict('A bootstrap of this fit is under way. Wait for it, or cancel it.');
    const wild = view.evidence.covariances.find(({ code }) => code === 'wild');
    if (!known.some(({ state }) => state === 'done') && (wild?.slopes ?? null) !== null)
      throw new Conflict('The bootstrap’s intervals of this fit are there already.');
    const id = randomUUID();
    await tx.bootstraps.insert({ id, fitId, seed, createdBy: actor.personId });
    await this.queue.enqueue(tx, 'bootstrap', id);
    await record(tx, actor.personId, 'bootstrap-started', fitId, { seed });
    return id;
  }

  /** Stops the one that is queued or running. @throws {NotFound}; {Conflict} when there is none. */
  async cancel(actor: Actor, fitId: string, now: Date): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      if ((await tx.fits.find(fitId)) === undefined) throw new NotFound('There is no such fit.');
      const underWay = (await tx.bootstraps.ofFit(fitId)).find(isUnderWay);
      if (underWay === undefined || !(await tx.bootstraps.cancel(underWay.id, now)))
        throw new Conflict('No bootstrap of this fit is under way.');
      await record(tx, actor.personId, 'bootstrap-cancelled', fitId, { seed: underWay.seed });
    });
  }
}

function isUnderWay({ state }: BootstrapRow): boolean {
  return state === 'queued' || state === 'running';
}

function isKept(row: BootstrapRow): boolean {
  return isUnderWay(row) || row.state === 'done';
}
