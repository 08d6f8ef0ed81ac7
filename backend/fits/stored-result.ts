import type { FitResult } from '../stats';

/**
 * A result as it is stored, whichever engine made it: engines before 2 knew neither logs nor years, and said nothing of
 * them. Dropped rows of older results lack their company and year, which nothing on the server reads.
 */
export function toFitResult(stored: object): FitResult {
  return { smearing: null, ...stored } as FitResult;
}
