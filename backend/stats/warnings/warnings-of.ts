import type {
  FitResult,
  FitWarning,
  SlopeCovarianceName,
  SlopeEstimate,
  Smearing,
} from '../fit-result';
import type { IntervalContext } from '../intervals/interval-context';
import { isPerfectFit } from '../regression/goodness';
import type { SlopeInference } from '../slopes/slope-inference';
import { dominatedWarnings } from './dominated';
import { persistenceWarnings } from './persistence-warnings';
import { spellingWarning } from './spelling';

export interface WarningInput {
  readonly context: IntervalContext;
  readonly covariance: SlopeCovarianceName;
  readonly inference: SlopeInference;
  /** Null in levels. */
  readonly smearing: Smearing | null;
  readonly withoutCompany: FitResult['withoutCompany'];
  /** Index of the own company; −1 without one. */
  readonly own: number;
  /** Every company name of the panel. */
  readonly names: readonly string[];
}

const fewest = 8;
const smallDegreesOfFreedom = 4;
const largeConditionNumber = 1e6;
const noticeableSmear = 0.1;

/** Everything a reader has to know before relying on a figure, in plain words. */
export function warningsOf(input: WarningInput): FitWarning[] {
  return [
    ...sizeWarnings(input),
    ...(input.covariance === 'cr2' ? degreesWarnings(input.inference.slopes) : []),
    ...persistenceWarnings(input.context, input.own),
    // What moves in a perfect fit without one company is rounding.
    ...(isPerfectFit(input.context.fit)
      ? []
      : dominatedWarnings(input.inference.slopes, input.withoutCompany)),
    ...fitWarnings(input.context),
    ...input.inference.notes,
    ...smearingWarnings(input),
    ...spellingWarning(input.names),
  ];
}

function sizeWarnings({ context }: WarningInput): FitWarning[] {
  const { companies, years, singles } = context.fit.sample;
  const warnings: FitWarning[] = [];
  if (companies.length < fewest) {
    const detail = `Only ${companies.length} companies: with fewer than ${fewest} the intervals of the slopes rest on very few independent cases.`;
    warnings.push({ code: 'few-companies', detail });
  }
  if (years.length < fewest) {
    const detail = `Only ${years.length} fiscal years: with fewer than ${fewest} the variation over time is hardly known.`;
    warnings.push({ code: 'few-years', detail });
  }
  if (singles.length > 0) {
    const subjects = singles.map(({ company }) => company);
    const detail = `${subjects.join(', ')}: one complete row only. Such a company is listed, but counts in no slope, no mean and no ranking.`;
    warnings.push({ code: 'single-row', detail, subjects });
  }
  return warnings;
}

function degreesWarnings(slopes: readonly SlopeEstimate[]): FitWarning[] {
  const small = slopes.flatMap(({ name, degreesOfFreedom: degrees }) =>
    degrees !== null && degrees < smallDegreesOfFreedom ? [{ name, degrees }] : [],
  );
  if (small.length === 0) return [];
  const list = small.map(({ name, degrees }) => `${degrees.toFixed(2)} for ${name}`).join(' and ');
  const detail = `Satterthwaite degrees of freedom are ${list}: one large company then drives the result.`;
  return [{ code: 'small-degrees-of-freedom', detail, subjects: small.map(({ name }) => name) }];
}

function fitWarnings({ fit }: IntervalContext): FitWarning[] {
  const warnings: FitWarning[] = [];
  if (isPerfectFit(fit)) {
    const detail =
      'The regressors explain every row exactly. Real data never do: is a regressor computed from the outcome?';
    warnings.push({ code: 'perfect-fit', detail });
  }
  if (fit.conditionNumber > largeConditionNumber) {
    const detail = `Within companies the regressors move almost together (condition number ${fit.conditionNumber.toExponential(1)}): their slopes can hardly be told apart.`;
    warnings.push({ code: 'ill-conditioned', detail, subjects: fit.sample.regressorNames });
  }
  return warnings;
}

function smearingWarnings({ smearing, own, context }: WarningInput): FitWarning[] {
  if (typeof smearing?.own !== 'number' || smearing.factor === null) return [];
  const distance = smearing.own / smearing.factor - 1;
  if (Math.abs(distance) <= noticeableSmear) return [];
  const company = context.fit.sample.companies[own];
  const percent = Math.abs(100 * distance).toFixed(0);
  const detail = `${company}’s own mean of exp(residual) lies ${percent} % ${distance > 0 ? 'above' : 'below'} that of all companies, which turns logs back into levels: expected values may be that far off.`;
  return [{ code: 'smear-differs', detail, subjects: [company] }];
}
