import type { JobTicketRow } from '../../../db/repositories/jobs-repository';
import type { Repositories } from '../../../db/repositories/repositories';
import type { FitPool } from '../../compute/fit-pool';
import type { FitSubject } from '../../compute/messages';
import { watchedRun } from '../../jobs/watched-run';
import { readTrialGround, type TrialGround, trialSubject } from './trial-ground';
import { groupsOf } from './trial-groups';
import { toRefusedOutcome, toTrialOutcome, type TrialOutcome } from './trial-outcome';
import { toStoredTrial } from './trial-view';

/** Works one queued trial: fits its groups one after the other in the background thread, those alone not fitted before. */
export class TrialJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly pool: FitPool,
    private readonly now: () => Date,
  ) {}

  async run({ workspaceId, subjectId: id }: JobTicketRow): Promise<void> {
    const trial = await this.#inWorkspace(workspaceId, async (tx) => {
      if (!(await tx.peerTrials.markRunning(id))) return undefined;
      const row = await tx.peerTrials.find(id);
      return row === undefined ? undefined : toStoredTrial(row);
    });
    if (trial === undefined) return;
    const ground = await this.#inWorkspace(workspaceId, (tx) => readTrialGround(tx, trial.request));
    // An earlier try may have been cut off: it goes on from there.
    const outcomes = [...trial.outcomes];
    const groups = groupsOf(trial.request);
    const answer = await watchedRun(
      (signal) => ({
        answer: this.#fitAll(workspaceId, ground, { outcomes, signal }),
        progress: () => outcomes.length / groups.length,
      }),
      () => this.#inWorkspace(workspaceId, (tx) => tx.peerTrials.saveOutcomes(id, outcomes)),
    );
    if (answer === undefined) return;
    await this.#inWorkspace(workspaceId, (tx) => tx.peerTrials.finish(id, answer, this.now()));
  }

  /** After the last try failed: whoever waits for it is told. */
  async giveUp({ workspaceId, subjectId: id }: JobTicketRow): Promise<void> {
    const failure =
      'The server could not finish computing this. Start it again; if that fails too, tell whoever runs the server.';
    await this.#inWorkspace(workspaceId, (tx) => tx.peerTrials.fail(id, failure, this.now()));
  }

  /** Adds the outcomes that lack, in the order of the groups. */
  async #fitAll(
    workspaceId: string,
    ground: TrialGround,
    { outcomes, signal }: { readonly outcomes: TrialOutcome[]; readonly signal: AbortSignal },
  ): Promise<readonly TrialOutcome[]> {
    for (const group of groupsOf(ground.request).slice(outcomes.length)) {
      signal.throwIfAborted();
      outcomes.push(await this.#fit(workspaceId, trialSubject(ground, group), signal));
    }
    return outcomes;
  }

  async #fit(workspaceId: string, subject: FitSubject, signal: AbortSignal): Promise<TrialOutcome> {
    const hashed = await this.pool.hash(subject, signal);
    if (hashed.kind === 'refused') return toRefusedOutcome(hashed);
    const kept = await this.#inWorkspace(workspaceId, (tx) => tx.peerTrials.fitted(hashed.hash));
    if (kept !== undefined) return kept as TrialOutcome;
    const outcome = toTrialOutcome(await this.pool.trial(subject, signal));
    await this.#inWorkspace(workspaceId, (tx) => tx.peerTrials.keepFitted(hashed.hash, outcome));
    return outcome;
  }

  readonly #inWorkspace: Repositories['inWorkspace'] = (workspaceId, work) =>
    this.repositories.inWorkspace(workspaceId, work);
}
