import type { FitRow } from '../../db/repositories/fits-repository';
import type { Specification, Standing } from '../stats';

/** What a fit's row keeps of its specification: the engine's, and which columns go in. */
export interface StoredSpecification extends Specification {
  readonly outcome: string;
  readonly regressors: readonly string[];
}

export interface FitProgress {
  readonly phase: string;
  readonly done: number;
  readonly total: number;
}

export interface FitFailure {
  readonly code: string;
  readonly detail: string;
  readonly subjects: readonly string[];
}

/** A fit's row with its JSON columns under their types. */
export interface StoredFit extends Omit<
  FitRow,
  'specification' | 'progress' | 'standing' | 'failure'
> {
  readonly specification: StoredSpecification;
  readonly progress: FitProgress | null;
  readonly standing: Standing | null;
  readonly failure: FitFailure | null;
}

export function toStoredFit(row: FitRow): StoredFit {
  return {
    ...row,
    specification: row.specification as StoredSpecification,
    progress: row.progress as FitProgress | null,
    standing: row.standing as Standing | null,
    failure: row.failure as FitFailure | null,
  };
}
