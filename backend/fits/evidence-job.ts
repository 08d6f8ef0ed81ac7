import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import type { FitPool } from '../compute/fit-pool';
import { engineVersion } from '../stats';
import { findFit } from './fit-service';
import { readSubject } from './fit-subject';

/** Works the queued evidence of a fit in the background thread and keeps it with the fit. */
export class EvidenceJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly pool: FitPool,
  ) {}

  async run({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const subject = await this.repositories.inWorkspace(workspaceId, async (tx) =>
      (await lacksEvidence(tx, fitId)) ? readSubject(tx, await findFit(tx, fitId)) : undefined,
    );
    if (subject === undefined) return;
    const answer = await this.pool.evidence(subject);
    await this.repositories.inWorkspace(workspaceId, (tx) =>
      answer.kind === 'done'
        ? tx.evidence.insert(fitId, answer.evidence)
        : tx.evidence.insertFailure(fitId, answer.detail),
    );
  }

  /** After the last try failed: whoever waits for it is told. */
  async giveUp({ workspaceId, subjectId: fitId }: JobTicketRow): Promise<void> {
    const failure =
      'The server could not compute the evidence of this fit. Tell whoever runs the server.';
    await this.repositories.inWorkspace(workspaceId, async (tx) => {
      if (await lacksEvidence(tx, fitId)) await tx.evidence.insertFailure(fitId, failure);
    });
  }
}

/** Whether this engine's result is there and its evidence is not. */
async function lacksEvidence(tx: WorkspaceRepositories, fitId: string): Promise<boolean> {
  const fit = await tx.fits.find(fitId);
  if (fit?.state !== 'done' || fit.engine !== engineVersion) return false;
  return (await tx.evidence.find(fitId)) === undefined;
}
