import type { SlopeEstimate } from '../../fit-result';
import { withoutInterval } from '../../prediction';
import { isPerfectFit, perfectFitReason } from '../../regression/goodness';
import {
  acceptedStretches,
  bootstrapPValue,
  farthest,
  isAccepted,
  type Stretch,
} from '../bootstrap/accepted-values';
import { blockedStatistics } from '../bootstrap/blocked-statistics';
import { drawStatistics, slopeScores } from '../bootstrap/draw-statistics';
import { mostEnumerated, type SignDraws, signDraws } from '../bootstrap/sign-draws';
import {
  type BootstrapMethod,
  noCompanyVarianceReason,
  type SlopeNote,
} from '../covariance-method';
import { judgedSlopes } from '../slope-estimates';
import { cr0 } from './cr0';

/** Wild cluster bootstrap-t by company, with the hypothesis imposed. */
export const wild: BootstrapMethod = {
  kind: 'bootstrap',
  code: 'wild',
  name: 'Wild bootstrap by company',
  definition:
    'Bootstrap of t by company: the residuals under each value of the slope get random signs by company and the t statistic of cr0 is taken again; p is the share of draws that are as far out, all 2^N sign vectors for up to 12 companies, 9,999 seeded draws for more; the interval holds every value that p does not reject.',
  source: 'Cameron, Gelbach & Miller (2008), Review of Economics and Statistics 90, 414–427',
  reference: ['wild_cluster_bootstrap'],
  covarianceReason:
    'The bootstrap gives each slope an interval and a p value, and the slopes together no covariance.',
  bootstrap: (ground, options) => {
    const { fit, products } = ground;
    const { matrix } = cr0.covariance(ground);
    const size = fit.slopes.length;
    const judged = judgedSlopes(ground, matrix);
    const onProgress = everyPercent(options.onProgress);
    const results = fit.sample.regressorNames.map((name, k): BootstrapSlope => {
      const estimate = fit.slopes[k];
      if (isPerfectFit(fit)) return withoutDraws(name, estimate, perfectFitReason);
      if (!judged[k]) return withoutDraws(name, estimate, noCompanyVarianceReason(ground));
      const standardError = Math.sqrt(matrix[k * size + k]);
      const draws = signDraws(products.length, options.seed);
      const statisticsOf = products.length > mostEnumerated ? blockedStatistics : drawStatistics;
      const statistics = statisticsOf(slopeScores(ground, k, standardError), draws, (share) => {
        onProgress((k + share) / size);
      });
      const slope = { name, estimate, standardError };
      return bootstrapSlope(slope, { statistics, draws }, options.confidence);
    });
    onProgress(1);
    return {
      slopes: results.map(({ slope }) => slope),
      notes: results.flatMap(({ note }) => (note === undefined ? [] : [note])),
    };
  },
};

interface BootstrapSlope {
  readonly slope: SlopeEstimate;
  readonly note?: SlopeNote;
}

interface SlopeFigures {
  readonly name: string;
  readonly estimate: number;
  /** The `cr0` root. */
  readonly standardError: number;
}

function withoutDraws(name: string, estimate: number, reason: string): BootstrapSlope {
  const none = { statistic: null, degreesOfFreedom: null, pValue: null };
  return { slope: { name, ...withoutInterval(estimate, reason), ...none } };
}

function bootstrapSlope(
  { name, estimate, standardError }: SlopeFigures,
  { statistics, draws }: { readonly statistics: Float64Array; readonly draws: SignDraws },
  confidence: number,
): BootstrapSlope {
  const level = 1 - confidence;
  const statistic = estimate / standardError;
  const pValue = bootstrapPValue(statistics, draws, statistic);
  const figures = { name, estimate, standardError, statistic, degreesOfFreedom: null, pValue };
  if (isAccepted(draws.smallest, level)) {
    const intervalReason = `The smallest p value that so few companies or draws can give is ${draws.smallest}, so no value is rejected at ${percent(confidence)} % confidence.`;
    return { slope: { ...figures, low: null, high: null, intervalReason } };
  }
  const stretches = acceptedStretches(statistics, draws, { level });
  return {
    slope: { ...figures, ...endsOf(stretches, estimate, standardError) },
    note: stretches.length > 1 ? disconnected(name, stretches.length, confidence) : undefined,
  };
}

/** b0 = b − τ·se: the lowest τ is the highest value. */
function endsOf(
  stretches: readonly Stretch[],
  estimate: number,
  standardError: number,
): Pick<SlopeEstimate, 'low' | 'high' | 'unbounded' | 'intervalReason'> {
  const { from } = stretches[0];
  const { to } = stretches[stretches.length - 1];
  const low = to === farthest ? null : estimate - to * standardError;
  const high = from === -farthest ? null : estimate - from * standardError;
  if (low === null && high === null) {
    const intervalReason =
      'No value is rejected, up to a million standard errors away on both sides.';
    return { low, high, unbounded: 'both', intervalReason };
  }
  if (low === null) return { low, high, unbounded: 'low' };
  if (high === null) return { low, high, unbounded: 'high' };
  return { low, high };
}

function disconnected(name: string, parts: number, confidence: number): SlopeNote {
  return {
    code: 'wild-set-disconnected',
    detail: `The values of the slope of ${name} that the bootstrap does not reject at ${percent(confidence)} % confidence fall into ${parts} parts: its interval spans values between them that are rejected.`,
    subjects: [name],
  };
}

function percent(confidence: number): number {
  return Number((100 * confidence).toPrecision(12));
}

/** Passes on what moves the share done by a hundredth or more, and the end. */
function everyPercent(onProgress: ((share: number) => void) | undefined): (share: number) => void {
  let told = 0;
  return (share) => {
    if (onProgress === undefined || (share < 1 && share - told < 0.01)) return;
    told = share;
    onProgress(share);
  };
}
