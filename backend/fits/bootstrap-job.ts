import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories } from '../../db/repositories/repositories';
import type { FitPool } from '../compute/fit-pool';
import { randomDraws } from '../stats/slopes/bootstrap/sign-draws';
import { findFit } from './fit-service';
import { readSubject } from './fit-subject';
import { watchedRun } from '../jobs/watched-run';

/** Works one queued bootstrap in the background thread and keeps its intervals with the fit. */
export class BootstrapJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly pool: FitPool,
    private readonly now: () => Date,
  ) {}

  async run({ workspaceId, subjectId: id }: JobTicketRow): Promise<void> {
    const bootstrap = await this.repositories.inWorkspace(workspaceId, async (tx) =>
      (await tx.bootstraps.markRunning(id)) ? tx.bootstraps.find(id) : undefined,
    );
    if (bootstrap === undefined) return;
    const subject = await this.repositories.inWorkspace(workspaceId, async (tx) =>
      readSubject(tx, await findFit(tx, bootstrap.fitId)),
    );
    const answer = await watchedRun(
      (signal) => this.pool.bootstrap(subject, bootstrap.seed, signal),
      (share) => {
        const drawn = { done: Math.round(share * randomDraws), total: randomDraws };
        return this.repositories.inWorkspace(workspaceId, (tx) =>
          tx.bootstraps.saveProgress(id, drawn),
        );
      },
    );
    if (answer === undefined) return;
    await this.repositories.inWorkspace(workspaceId, (tx) =>
      answer.kind === 'done'
        ? tx.bootstraps.finish(id, answer.summary, this.now())
        : tx.bootstraps.fail(id, answer.detail, this.now()),
    );
  }

  /** After the last try failed: whoever waits for it is told. */
  async giveUp({ workspaceId, subjectId: id }: JobTicketRow): Promise<void> {
    const failure =
      'The server could not finish this bootstrap. Start it again; if that fails too, tell whoever runs the server.';
    await this.repositories.inWorkspace(workspaceId, (tx) =>
      tx.bootstraps.fail(id, failure, this.now()),
    );
  }
}
