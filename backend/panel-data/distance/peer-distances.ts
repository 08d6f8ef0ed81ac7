import { EigenvalueDecomposition, type Matrix } from 'ml-matrix';
import { type Scatter, classicalScatter, robustScatter } from './scatter';

export interface PeerDistance {
  readonly company: string;
  /** Mahalanobis distance to the own company, in standard deviations. */
  readonly distance: number;
  /** Each measure's part of the squared distance, in the order of the measures; they add up to it and may be negative. */
  readonly parts: readonly number[];
}

export type PeerDistances =
  | {
      readonly kind: 'found';
      readonly distances: readonly PeerDistance[];
      readonly left: readonly string[];
    }
  /** Measures that are (nearly) a combination of others, or the same for (half of) the companies. */
  | { readonly kind: 'dependent'; readonly measures: readonly number[] }
  | { readonly kind: 'too-few'; readonly needed: number; readonly found: number }
  | { readonly kind: 'own-unknown'; readonly measures: readonly number[] };

/** Below this share of the largest, an eigenvalue of the measures' correlation is none. */
const leastEigenvalue = 1e-8;

/**
 * Mahalanobis distances d = √((x − o)'S⁻¹(x − o)) of companies to the own one (Mahalanobis 1936), S the scatter of all
 * companies that have every measure, the own one among them. Part k of d² is (x − o)_k · (S⁻¹(x − o))_k.
 *
 * @param companies  with one value a measure, null where unknown; such a company has no distance and is listed as left.
 */
export function peerDistances(
  companies: readonly { readonly company: string; readonly values: readonly (number | null)[] }[],
  ownCompany: string,
  scatter: Scatter,
): PeerDistances {
  const own = companies.find(({ company }) => company === ownCompany);
  const unknown = (own?.values ?? []).flatMap((value, k) => (value === null ? [k] : []));
  if (own === undefined || unknown.length > 0) return { kind: 'own-unknown', measures: unknown };
  const known = companies.filter(isKnown);
  const measures = own.values.length;
  const needed = 2 * measures + 1;
  if (known.length < needed) return { kind: 'too-few', needed, found: known.length };
  const points = known.map(({ values }) => values);
  const matrix = scatter === 'robust' ? robustScatter(points) : classicalScatter(points);
  const inverse = inverseOf(matrix);
  if (!('mmul' in inverse)) return { kind: 'dependent', measures: inverse };
  const origin = own.values as readonly number[];
  return {
    kind: 'found',
    distances: known
      .filter(({ company }) => company !== ownCompany)
      .map(({ company, values }) => toDistance(company, values, origin, inverse))
      .sort((a, b) => a.distance - b.distance || a.company.localeCompare(b.company, 'en')),
    left: companies.filter((candidate) => !isKnown(candidate)).map(({ company }) => company),
  };
}

function isKnown<T extends { readonly values: readonly (number | null)[] }>(
  candidate: T,
): candidate is T & { readonly values: readonly number[] } {
  return candidate.values.every((value) => value !== null);
}

/** The inverse; or the measures that stand in a direction without scatter. Judged on the correlations, free of units. */
function inverseOf(matrix: Matrix): Matrix | readonly number[] {
  const scales = matrix.diagonal().map(Math.sqrt);
  const still = scales.flatMap((scale, k) => (scale > 0 ? [] : [k]));
  if (still.length > 0) return still;
  const correlation = matrix.clone().divRowVector(scales).divColumnVector(scales);
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(correlation, {
    assumeSymmetric: true,
  });
  const largest = Math.max(...realEigenvalues);
  const flat = realEigenvalues.findIndex((value) => !(value > leastEigenvalue * largest));
  if (flat !== -1)
    return eigenvectorMatrix
      .getColumn(flat)
      .flatMap((weight, k) => (Math.abs(weight) > 0.1 ? [k] : []));
  const inverted = eigenvectorMatrix
    .clone()
    .divRowVector(realEigenvalues)
    .mmul(eigenvectorMatrix.transpose());
  return inverted.divRowVector(scales).divColumnVector(scales);
}

function toDistance(
  company: string,
  values: readonly number[],
  origin: readonly number[],
  inverse: Matrix,
): PeerDistance {
  const away = values.map((value, k) => value - origin[k]);
  const parts = away.map(
    (step, k) => step * inverse.getRow(k).reduce((sum, weight, j) => sum + weight * away[j], 0),
  );
  const squared = parts.reduce((sum, part) => sum + part, 0);
  return { company, distance: Math.sqrt(Math.max(0, squared)), parts };
}
