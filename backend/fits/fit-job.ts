import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories } from '../../db/repositories/repositories';
import type { FitPool, FitRun } from '../compute/fit-pool';
import type { FitAnswer } from '../compute/messages';
import type { FitFailure, FitProgress } from './fit-view';
import { findFit, type FitOnGround } from './fit-service';
import { toPanelColumns } from './panel-columns';

const watchEveryMs = 500;

/** Works one queued fit: reads its rows, has a worker thread estimate, keeps the result. */
export class FitJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly pool: FitPool,
    private readonly now: () => Date,
  ) {}

  async run(ticket: JobTicketRow): Promise<void> {
    const { workspaceId, subjectId: fitId } = ticket;
    const isTaken = await this.#inWorkspace(workspaceId, (tx) =>
      tx.fits.markRunning(fitId, progress('Reading rows', 0, 0)),
    );
    if (!isTaken) return;
    const answer = await this.#estimate(workspaceId, fitId);
    if (answer === undefined) return;
    await this.#inWorkspace(workspaceId, (tx) =>
      answer.kind === 'done'
        ? tx.fits.finish(fitId, answer.result.hash, answer.result, this.now())
        : tx.fits.fail(fitId, failureOf(answer), this.now()),
    );
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

  /** Undefined when the fit was cancelled on the way. */
  async #estimate(workspaceId: string, fitId: string): Promise<FitAnswer | undefined> {
    const found = await this.#inWorkspace(workspaceId, (tx) => findFit(tx, fitId));
    const members = memberNames(found);
    const rows = await this.#inWorkspace(workspaceId, (tx) =>
      tx.panels.rows(found.panelVersion.id, members),
    );
    const { outcome, regressors, ...specification } = found.fit.specification;
    const columns = toPanelColumns(found.panelVersion, rows, {
      ...specification,
      outcome,
      regressors,
    });
    const abort = new AbortController();
    const run = this.pool.run(
      { columns, specification, own: found.peerGroup.ownCompany, members },
      abort.signal,
    );
    const watch = setInterval(() => {
      void this.#watch(workspaceId, fitId, run, rows.company.length, abort);
    }, watchEveryMs);
    try {
      return await run.answer;
    } catch (error) {
      if (abort.signal.aborted) return undefined;
      throw error;
    } finally {
      clearInterval(watch);
    }
  }

  /** Tells how far the fit is, and ends it when somebody cancelled it, on this server or another. */
  async #watch(
    workspaceId: string,
    fitId: string,
    run: FitRun,
    rows: number,
    abort: AbortController,
  ): Promise<void> {
    const done = Math.round(run.progress() * rows);
    const isRunning = await this.#inWorkspace(workspaceId, (tx) =>
      tx.fits.saveProgress(fitId, progress('Estimating', done, rows)),
    ).catch(() => true); // The database is away for a moment: the fit goes on, the next look tells.
    if (!isRunning) abort.abort();
  }

  readonly #inWorkspace: Repositories['inWorkspace'] = (workspaceId, work) =>
    this.repositories.inWorkspace(workspaceId, work);
}

/** The own company first, then the peers that are in. */
export function memberNames({ peerGroup }: Pick<FitOnGround, 'peerGroup'>): readonly string[] {
  const peers = peerGroup.choices.filter((choice) => choice.isIncluded);
  return [peerGroup.ownCompany, ...peers.map((choice) => choice.company)];
}

function progress(phase: string, done: number, total: number): FitProgress {
  return { phase, done, total };
}

function failureOf(answer: Extract<FitAnswer, { readonly kind: 'refused' }>): FitFailure {
  const { rows = [], columns = [], companies = [] } = answer.data;
  return {
    code: answer.code,
    detail: answer.detail,
    subjects: [...columns, ...companies, ...rows.slice(0, 50).map(({ row }) => `row ${row}`)],
  };
}
