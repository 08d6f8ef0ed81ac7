import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import type { FitPool, FitRun } from '../compute/fit-pool';
import type { FitAnswer, Refusal } from '../compute/messages';
import { engineVersion } from '../stats';
import { findFit } from './fit-service';
import { readSubject } from './fit-subject';
import type { FitFailure, FitProgress } from './fit-view';
import { watchedRun } from './watched-run';

/** Works one queued fit: has a worker thread estimate, keeps the result, then the evidence. */
export class FitJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly pool: FitPool,
    private readonly now: () => Date,
  ) {}

  async run({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const isWanted = await this.#inWorkspace(workspaceId, async (tx) =>
      (await tx.fits.markRunning(fitId, progress('Reading rows', 0, 0)))
        ? 'result'
        : (await lacksEvidence(tx, fitId))
          ? 'evidence'
          : undefined,
    );
    if (isWanted === undefined) return;
    const subject = await this.#inWorkspace(workspaceId, async (tx) =>
      readSubject(tx, await findFit(tx, fitId)),
    );
    const rows = subject.columns.year.length;
    const ended = await watchedRun<FitAnswer, FitRun>(
      (signal) => this.pool.run(subject, signal),
      async (share) => {
        if (isWanted === 'evidence') return true;
        const estimating = progress('Estimating', Math.round(share * rows), rows);
        return this.#inWorkspace(workspaceId, (tx) => tx.fits.saveProgress(fitId, estimating));
      },
    );
    if (ended === undefined) return;
    if (isWanted === 'result') await this.#keepResult(workspaceId, fitId, ended.answer);
    if (ended.answer.kind === 'done') await this.#keepEvidence(workspaceId, fitId, ended.run);
  }

  /** After the last try failed: whoever waits for the fit is told. */
  async giveUp({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const failure: FitFailure = {
      code: 'ended',
      detail:
        'The server could not finish this fit. Start it again; if that fails too, tell whoever runs the server.',
      subjects: [],
    };
    await this.#inWorkspace(workspaceId, async (tx) => {
      if (await tx.fits.fail(fitId, failure, this.now())) return;
      if (await lacksEvidence(tx, fitId))
        await tx.evidence.insertFailure(
          fitId,
          'The server could not compute the evidence of this fit. Tell whoever runs the server.',
        );
    });
  }

  async #keepResult(workspaceId: string, fitId: string, answer: FitAnswer): Promise<void> {
    await this.#inWorkspace(workspaceId, (tx) =>
      answer.kind === 'done'
        ? tx.fits.finish(fitId, answer.result.hash, answer.result, this.now())
        : tx.fits.fail(fitId, failureOf(answer), this.now()),
    );
  }

  async #keepEvidence(workspaceId: string, fitId: string, run: FitRun): Promise<void> {
    const answer = await run.evidence;
    await this.#inWorkspace(workspaceId, async (tx) => {
      // A fit that was cancelled in its last moment has no result, so nothing that evidence could be of.
      if (!(await lacksEvidence(tx, fitId))) return;
      if (answer.kind === 'done') await tx.evidence.insert(fitId, answer.evidence);
      else await tx.evidence.insertFailure(fitId, answer.detail);
    });
  }

  readonly #inWorkspace: Repositories['inWorkspace'] = (workspaceId, work) =>
    this.repositories.inWorkspace(workspaceId, work);
}

/** Whether this engine's result is there and its evidence is not. */
async function lacksEvidence(tx: WorkspaceRepositories, fitId: string): Promise<boolean> {
  const fit = await tx.fits.find(fitId);
  if (fit?.state !== 'done' || fit.engine !== engineVersion) return false;
  return (await tx.evidence.find(fitId)) === undefined;
}

function progress(phase: string, done: number, total: number): FitProgress {
  return { phase, done, total };
}

function failureOf({ code, detail, data }: Refusal): FitFailure {
  const { rows = [], columns = [], companies = [] } = data;
  return {
    code,
    detail,
    subjects: [...columns, ...companies, ...rows.slice(0, 50).map(({ row }) => `row ${row}`)],
  };
}
