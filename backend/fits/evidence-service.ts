import type { BootstrapRow } from '../../db/repositories/bootstraps-repository';
import type { SingleFitRow } from '../../db/repositories/fits-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { NotFound } from '../errors/app-error';
import { type CovarianceSummary, engineVersion, type Evidence } from '../stats';
import { randomDraws } from '../stats/slopes/bootstrap/sign-draws';

/** The evidence of a fit, or why there is none. */
export type EvidenceView =
  | {
      readonly state: 'ready';
      readonly evidence: Evidence;
      /** The newest that was asked for. */
      readonly bootstrap: BootstrapRow | null;
    }
  | { readonly state: 'computing' }
  | { readonly state: 'unavailable'; readonly reason: string };

export interface EvidenceState {
  readonly state: EvidenceView['state'];
  /** The newest that was asked for. */
  readonly bootstrap: BootstrapRow | null;
}

export class EvidenceService {
  constructor(private readonly repositories: Repositories) {}

  /** @throws {NotFound} */
  async find(workspaceId: string, fitId: string): Promise<EvidenceView> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findEvidence(tx, fitId));
  }

  /** How far it is, without reading it. @throws {NotFound} */
  async state(workspaceId: string, fitId: string): Promise<EvidenceState> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const fit = await findRow(tx, fitId);
      const isThere = await tx.evidence.isThere(fitId);
      if (isThere === undefined) return { state: withoutEvidence(fit).state, bootstrap: null };
      if (!isThere) return { state: 'unavailable', bootstrap: null };
      return { state: 'ready', bootstrap: (await tx.bootstraps.ofFit(fitId))[0] ?? null };
    });
  }
}

async function findRow(tx: WorkspaceRepositories, fitId: string): Promise<SingleFitRow> {
  const fit = await tx.fits.find(fitId);
  if (fit === undefined) throw new NotFound('There is no such fit.');
  return fit;
}

/** @throws {NotFound} */
export async function findEvidence(
  tx: WorkspaceRepositories,
  fitId: string,
): Promise<EvidenceView> {
  const fit = await findRow(tx, fitId);
  const stored = await tx.evidence.find(fitId);
  if (stored === undefined) return withoutEvidence(fit);
  if (stored.evidence === null)
    return { state: 'unavailable', reason: stored.failure ?? 'The evidence is not there.' };
  const bootstraps = await tx.bootstraps.ofFit(fitId);
  return {
    state: 'ready',
    evidence: withBootstrap(stored.evidence as Evidence, bootstraps),
    bootstrap: bootstraps[0] ?? null,
  };
}

function withoutEvidence({ state, engine }: SingleFitRow): EvidenceView {
  if (state === 'queued' || state === 'running') return { state: 'computing' };
  if (state !== 'done')
    return { state: 'unavailable', reason: 'This fit has no result, so there is no evidence.' };
  if (engine === engineVersion) return { state: 'computing' };
  const reason = `Made by engine ${engine}, which wrote no evidence: fit again.`;
  return { state: 'unavailable', reason };
}

/** Puts the intervals of the newest bootstrap that is done into the bootstrap's row. */
function withBootstrap(evidence: Evidence, bootstraps: readonly BootstrapRow[]): Evidence {
  const done = bootstraps.find(({ result }) => result !== null);
  if (done === undefined) return evidence;
  const { slopes, reason, notes } = done.result as CovarianceSummary;
  const drawn = { slopes, reason, notes, seed: done.seed, draws: randomDraws };
  return {
    ...evidence,
    covariances: evidence.covariances.map((row) =>
      row.code === 'wild' ? { ...row, ...drawn } : row,
    ),
  };
}
