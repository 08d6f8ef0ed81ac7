import { slopeTerms, type DecompositionTerm } from './decomposition';
import { inModelScale, inPanelMeasure } from './model-scale';
import { lastInModelScale } from './planned-contrast';
import type { PeerYear, PredictionBasis } from './prediction-basis';
import type { TQuantile } from './two-sided-quantile';

/**
 * Own market value against a peer's in the own company's last year, taken apart: `total` is the sum of `intercepts`,
 * the terms and `residuals`. In the model's scale; in log form the factors multiply. A year effect falls out.
 */
export interface PeerDifference {
  /** a_own − a_peer; its interval is that of the pair or, against all peers, of the standing. */
  readonly intercepts: number;
  /** b_k·(x_own − x_peer). */
  readonly terms: readonly DecompositionTerm[];
  /** e_own − e_peer. */
  readonly residuals: number;
  readonly total: number;
}

/** The own company against one peer, or against `peersMean`. */
export function differenceToPeer(
  basis: PredictionBasis,
  peer: PeerYear,
  tQuantile: TQuantile,
): PeerDifference {
  const own = lastInModelScale(basis);
  const theirs = inModelScale(basis, peer.regressors);
  const { terms, total } = slopeTerms(
    basis,
    own.map((value, k) => value - theirs[k]),
    tQuantile,
  );
  const intercepts = peer.interceptGap;
  const residuals = basis.last.residual - peer.residual;
  return { intercepts, terms, residuals, total: intercepts + total + residuals };
}

/**
 * The mean of the peers with a row in the own company's last year, unweighted; of logs in log form, so that regressors are
 * geometric means there. Null where there is none.
 */
export function peersMean(basis: PredictionBasis, name: string): PeerYear | null {
  const peers = basis.peers ?? [];
  if (peers.length === 0) return null;
  const values = peers.map(({ regressors }) => inModelScale(basis, regressors));
  const mean = (figures: readonly number[]): number =>
    figures.reduce((sum, figure) => sum + figure, 0) / figures.length;
  return {
    company: name,
    interceptGap: mean(peers.map(({ interceptGap }) => interceptGap)),
    regressors: inPanelMeasure(
      basis,
      basis.regressors.map((_, k) => mean(values.map((row) => row[k]))),
    ),
    residual: mean(peers.map(({ residual }) => residual)),
  };
}
