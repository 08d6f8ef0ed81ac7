import type { PeerTrialRow } from '../../../db/repositories/peer-trials-repository';
import type { TrialRequest } from './trial-groups';
import type { TrialOutcome } from './trial-outcome';

/** A trial's row with its JSON columns under their types. */
export interface StoredTrial extends Omit<PeerTrialRow, 'request' | 'outcomes'> {
  readonly request: TrialRequest;
  /** As many as are fitted, in the order of the groups. */
  readonly outcomes: readonly TrialOutcome[];
}

export function toStoredTrial(row: PeerTrialRow): StoredTrial {
  return {
    ...row,
    request: row.request as TrialRequest,
    outcomes: row.outcomes as readonly TrialOutcome[],
  };
}
