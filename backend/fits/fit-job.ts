import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import type { FitPool } from '../compute/fit-pool';
import type { FitAnswer } from '../compute/messages';
import type { JobQueue } from '../jobs/job-queue';
import { failureOf } from './fit-failure';
import { findFit } from './fit-service';
import { readSubject } from './fit-subject';
import type { FitFailure, FitProgress } from './fit-view';
import { watchedRun } from '../jobs/watched-run';

/** Works one queued fit: has a worker thread estimate, keeps the result and queues the evidence with it. */
export class FitJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly queue: JobQueue,
    private readonly pool: FitPool,
    private readonly now: () => Date,
  ) {}

  async run({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const isWanted = await this.#inWorkspace(workspaceId, (tx) =>
      tx.fits.markRunning(fitId, progress('Reading rows', 0, 0)),
    );
    if (!isWanted) return;
    // A transaction of its own: whoever cancels the fit need not wait for its rows.
    const subject = await this.#inWorkspace(workspaceId, async (tx) =>
      readSubject(tx, await findFit(tx, fitId)),
    );
    const rows = subject.columns.year.length;
    const answer = await watchedRun(
      (signal) => this.pool.run(subject, signal),
      async (share) => {
        const estimating = progress('Estimating', Math.round(share * rows), rows);
        return this.#inWorkspace(workspaceId, (tx) => tx.fits.saveProgress(fitId, estimating));
      },
    );
    if (answer === undefined) return;
    await this.#inWorkspace(workspaceId, (tx) => this.#keep(tx, fitId, answer));
    this.queue.wake('evidence');
  }

  /** After the last try failed: whoever waits for the fit is told. */
  async giveUp({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const failure: FitFailure = {
      code: 'ended',
      detail:
        'The server could not finish this fit. Start it again; if that fails too, tell whoever runs the server.',
      subjects: [],
    };
    await this.#inWorkspace(workspaceId, (tx) => tx.fits.fail(fitId, failure, this.now()));
  }

  async #keep(tx: WorkspaceRepositories, fitId: string, answer: FitAnswer): Promise<void> {
    if (answer.kind === 'refused') {
      await tx.fits.fail(fitId, failureOf(answer), this.now());
      return;
    }
    const { result } = answer;
    // A fit that was cancelled in its last moment keeps no result, so there is nothing that evidence could be of.
    if (await tx.fits.finish(fitId, result.hash, result, this.now()))
      await this.queue.enqueue(tx, 'evidence', fitId);
  }

  readonly #inWorkspace: Repositories['inWorkspace'] = (workspaceId, work) =>
    this.repositories.inWorkspace(workspaceId, work);
}

function progress(phase: string, done: number, total: number): FitProgress {
  return { phase, done, total };
}
