import { timesVector } from '../../linear-algebra/square-matrix';
import type { SlopeGround } from '../slope-ground';
import type { SignDraws } from './sign-draws';

/**
 * One slope's companies in the measure of its `cr0` standard error. For the value b0 that is imposed stands τ, the data's
 * own t statistic of it: b0 = b − τ·se. With a the slope's row of R⁻¹, scaled to length 1, company i's score of the
 * restricted residuals is g_i + τ·q_i, q_i = S_i·a; on the slope itself it is α_i + τ·κ_i.
 */
export interface SlopeScores {
  /** P, the length of g_i and q_i. */
  readonly size: number;
  /** N × P, row-major. */
  readonly g: Float64Array;
  readonly q: Float64Array;
  /** N; Σα = 0, Σα² = 1. */
  readonly alpha: Float64Array;
  /** N; Σκ = 1. */
  readonly kappa: Float64Array;
}

/**
 * @param slope  0 … K − 1.
 * @param standardError  its `cr0` root, above 0.
 */
export function slopeScores(
  { fit, products }: SlopeGround,
  slope: number,
  standardError: number,
): SlopeScores {
  const size = fit.coefficients.length;
  const from = (fit.yearColumns + slope) * size;
  const row = fit.inverseR.slice(from, from + size);
  const length = Math.sqrt(row.reduce((sum, value) => sum + value * value, 0));
  const unit = row.map((value) => value / length);
  const g = new Float64Array(products.length * size);
  const q = new Float64Array(products.length * size);
  const alpha = new Float64Array(products.length);
  const kappa = new Float64Array(products.length);
  products.forEach(({ cross, score }, company) => {
    const shared = timesVector(cross, unit);
    q.set(shared, company * size);
    for (let k = 0; k < size; k += 1) {
      const scaled = (score[k] * length) / standardError;
      g[company * size + k] = scaled;
      alpha[company] += unit[k] * scaled;
      kappa[company] += unit[k] * shared[k];
    }
  });
  return { size, g, q, alpha, kappa };
}

/** Numbers a draw in `drawStatistics`. */
export const drawWidth = 5;

/**
 * Every draw's t statistic as a function of τ. With signs v its refit has the slope's estimate less b0 at
 * n₀ + n₁τ = Σv_i(α_i + τκ_i) and the squared `cr0` error Σ(v_i(α_i + τκ_i) − q_i'z)² = c₀ + c₁τ + c₂τ²,
 * z = Σv_i(g_i + τq_i), both in the measure of the data's own: no residual is ever written out.
 *
 * @returns n₀, n₁, c₀, c₁, c₂ of each draw; cost draws · N · 4P.
 * @see Cameron, Gelbach & Miller (2008), Review of Economics and Statistics 90, 414–427.
 */
export function drawStatistics(
  scores: SlopeScores,
  draws: SignDraws,
  onProgress: (share: number) => void,
): Float64Array {
  const companies = scores.alpha.length;
  const statistics = new Float64Array(draws.count * drawWidth);
  const signs = new Int8Array(companies);
  const totals = {
    g: new Float64Array(scores.size),
    q: new Float64Array(scores.size),
  };
  const step = Math.ceil(draws.count / mostReports);
  for (let draw = 0; draw < draws.count; draw += 1) {
    draws.next(signs);
    addTotals(scores, signs, totals);
    writeStatistics(scores, signs, totals, statistics.subarray(draw * drawWidth));
    if (draw % step === 0) onProgress(draw / draws.count);
  }
  return statistics;
}

/** Of one slope's draws; the caller thins them out over the slopes. */
const mostReports = 100;

interface Totals {
  readonly g: Float64Array;
  readonly q: Float64Array;
}

/** Σv_ig_i and Σv_iq_i. */
function addTotals({ g, q, size }: SlopeScores, signs: Int8Array, totals: Totals): void {
  const totalG = totals.g.fill(0);
  const totalQ = totals.q.fill(0);
  for (let company = 0, at = 0; company < signs.length; company += 1) {
    const sign = signs[company];
    for (let k = 0; k < size; k += 1, at += 1) {
      totalG[k] += sign * g[at];
      totalQ[k] += sign * q[at];
    }
  }
}

function writeStatistics(
  { q, size, alpha, kappa }: SlopeScores,
  signs: Int8Array,
  totals: Totals,
  target: Float64Array,
): void {
  const totalG = totals.g;
  const totalQ = totals.q;
  target.fill(0, 0, drawWidth);
  for (let company = 0, at = 0; company < signs.length; company += 1) {
    const signedAlpha = signs[company] * alpha[company];
    const signedKappa = signs[company] * kappa[company];
    let constant = signedAlpha;
    let linear = signedKappa;
    for (let k = 0; k < size; k += 1, at += 1) {
      constant -= q[at] * totalG[k];
      linear -= q[at] * totalQ[k];
    }
    target[0] += signedAlpha;
    target[1] += signedKappa;
    target[2] += constant * constant;
    target[3] += 2 * constant * linear;
    target[4] += linear * linear;
  }
}
