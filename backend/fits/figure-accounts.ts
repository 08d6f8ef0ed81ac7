import type { FTest, FitResult } from '../stats';
import { bare, type FigureAccount, type FigureWriter, slopeInputs } from './figure-text';
import { inModelWords } from './model-words';

const interceptFormula =
  'The company’s mean market value minus its mean capex and mean book equity (and any further regressor) times their slopes. Its interval comes from how the company’s residuals move over the years, equal-weighted cosines calibrated for persistence.';

/** Every kind of figure that a fit has, by the first part of its key: one writer each. */
const writers: Readonly<Record<string, FigureWriter>> = {
  standing: ({ standing, intercepts }) => {
    if (standing === null) return undefined;
    return {
      label: `Standing of ${standing.company}`,
      value: standing,
      text: null,
      isMoney: true,
      formula:
        'The own company’s intercept minus the unweighted mean of its peers’ intercepts. The interval allows for errors that persist over the years and for shocks that hit all companies in one year.',
      inputs: intercepts.flatMap((intercept, index) =>
        intercept.deviation === null
          ? []
          : [
              {
                label: `intercept of ${intercept.company}`,
                value: intercept.estimate,
                isMoney: true,
                figure: `intercept.${index}`,
              },
            ],
      ),
    };
  },
  'rank-set': ({ standing, pairs, intercepts }) => {
    if (!standing?.rankSet || pairs === null) return undefined;
    const [first, last] = standing.rankSet;
    const places = first === last ? `place ${first}` : `place ${first} to ${last}`;
    return {
      label: `Rank set of ${standing.company}`,
      value: null,
      text: `${places} of ${intercepts.filter(({ deviation }) => deviation !== null).length}`,
      isMoney: false,
      formula:
        'All places that the data cannot rule out: one more than the peers shown to be higher, up to all but the peers shown to be lower. Each difference to a peer is judged with Holm’s correction over all of them.',
      inputs: pairs.map((pair, index) => ({
        label: `${standing.company} minus ${pair.company}`,
        value: pair.estimate,
        isMoney: true,
        figure: `pair.${index}`,
      })),
    };
  },
  slope: ({ slopes, outcome }, index) => {
    const slope = slopes[index];
    if (slope === undefined) return undefined;
    return {
      label: `Slope of ${slope.name}`,
      value: slope,
      text: null,
      isMoney: false,
      formula: `How much more ${outcome} goes with 1 more of ${slope.name} within a company, the other regressors held: least squares on every company’s deviations from its own means.`,
      inputs:
        slope.degreesOfFreedom === null
          ? []
          : [plain('degrees of freedom of its interval', slope.degreesOfFreedom)],
    };
  },
  intercept: (result, index) => {
    const intercept = result.intercepts[index];
    if (intercept === undefined) return undefined;
    return {
      label: `Intercept of ${intercept.company}`,
      value: intercept,
      text: null,
      isMoney: true,
      formula: interceptFormula,
      inputs: slopeInputs(result),
      cells: { company: intercept.company },
    };
  },
  pair: (result, index) => {
    const pair = result.pairs?.[index];
    if (pair === undefined || result.standing === null) return undefined;
    const named = (company: string) => {
      const at = result.intercepts.findIndex((intercept) => intercept.company === company);
      return {
        label: `intercept of ${company}`,
        value: result.intercepts[at]?.estimate ?? null,
        isMoney: true,
        figure: `intercept.${at}`,
      };
    };
    return {
      label: `${result.standing.company} minus ${pair.company}`,
      value: pair,
      text: null,
      isMoney: true,
      formula: 'The difference of the two company intercepts.',
      inputs: [named(result.standing.company), named(pair.company)],
    };
  },
  gap: (result, year) => {
    const gap = result.gapPath?.find((candidate) => candidate.year === year);
    if (gap === undefined || gap.gap === null) return undefined;
    return {
      label: `Gap to peers in ${year}`,
      value: bare(gap.gap),
      text: null,
      isMoney: true,
      formula:
        'The own company’s intercept and its residual of the year, minus the mean of all peers’ intercepts and the mean residual of the peers present in the year. A peer’s entry or exit makes no jump.',
      inputs: [plain('peers present', gap.peers), ...slopeInputs(result)],
      cells: { year },
    };
  },
  drift: ({ drift }) => {
    if (drift === null) return undefined;
    return {
      label: 'Drift of the gap, a year',
      value: drift,
      text: null,
      isMoney: true,
      formula:
        'How much faster than its peers the own company’s market value moved a year with the slopes taken out: the difference of two straight lines over the years, put into the regression.',
      inputs: drift.pValue === null ? [] : [plain('p', drift.pValue)],
    };
  },
  fitted: (result, year) => {
    const own = result.ownYears?.find((candidate) => candidate.year === year);
    if (own === undefined) return undefined;
    return {
      label: `Expected value in ${year}`,
      value: bare(own.fitted),
      text: null,
      isMoney: true,
      formula:
        'The own company’s intercept plus its actual regressors of the year times the slopes.',
      inputs: [
        ...result.slopes.map((slope, index) => ({
          label: slope.name,
          value: own.regressors[index],
          isMoney: true,
          figure: null,
        })),
        ...slopeInputs(result),
      ],
      cells: { company: result.standing?.company ?? '', year },
    };
  },
  expected: (result, year) =>
    plannedFigure(
      result,
      `Expected value in ${year} under the plan`,
      'The own company’s intercept plus the planned regressors of the year times the slopes.',
    ),
  difference: (result, year) =>
    plannedFigure(
      result,
      `Difference to the base in ${year}`,
      'Each slope times the plan’s regressor minus the base’s, and nothing else: intercept and noise are the same on both sides. The base holds the last actual values.',
    ),
  'within-r-squared': ({ goodness }) =>
    goodness.withinRSquared === null
      ? undefined
      : share(
          'Within R²',
          goodness.withinRSquared,
          'The share of the movement within companies that the slopes account for.',
        ),
  'r-squared': ({ goodness }) =>
    share(
      'R²',
      goodness.rSquared,
      'The share of all variation of market value that company intercepts and slopes account for together.',
    ),
  'adjusted-r-squared': ({ goodness }) =>
    share('Adjusted R²', goodness.adjustedRSquared, 'R² with a charge for each coefficient.'),
  'pooled-r-squared': ({ pooled }) =>
    share(
      'R² of one pooled line',
      pooled.rSquared,
      'The share that one constant and the slopes, the same for every company, account for.',
    ),
  'residual-standard-error': ({ goodness }) => ({
    ...share(
      'Residual standard error',
      goodness.residualStandardError,
      'The root of the residual sum of squares over its degrees of freedom.',
    ),
    isMoney: true,
  }),
  f: ({ goodness }) =>
    test(
      'F of the whole regression',
      goodness.f,
      'All slopes and company differences against a single constant.',
    ),
  'f-slopes': ({ goodness }) =>
    test('F of the slopes', goodness.fSlopes, 'All slopes against company intercepts alone.'),
  poolability: ({ poolability }) =>
    test(
      'Poolability F',
      poolability,
      'Company intercepts that differ against one constant for all. It assumes errors that do not persist.',
    ),
};

/** Accounts for the figure with this key; undefined when the fit has none. */
export function accountFor(result: FitResult, figure: string): FigureAccount | undefined {
  const [kind, index] = figure.split('.');
  const account = Object.hasOwn(writers, kind) ? writers[kind](result, Number(index)) : undefined;
  return account === undefined ? undefined : inModelWords(account, kind, result.specification);
}

function plannedFigure(
  result: FitResult,
  label: string,
  formula: string,
): FigureAccount | undefined {
  const own = result.intercepts.findIndex(
    (intercept) => intercept.company === result.standing?.company,
  );
  if (result.prediction === null) return undefined;
  return {
    label,
    value: null,
    text: null,
    isMoney: true,
    formula,
    inputs: [
      {
        label: `intercept of ${result.prediction.company}`,
        value: result.prediction.coefficients[0],
        isMoney: true,
        figure: `intercept.${own}`,
      },
      ...slopeInputs(result),
    ],
  };
}

function plain(label: string, value: number): FigureAccount['inputs'][number] {
  return { label, value, isMoney: false, figure: null };
}

function share(label: string, value: number, formula: string): FigureAccount {
  return { label, value: bare(value), text: null, isMoney: false, formula, inputs: [] };
}

function test(label: string, statistic: FTest, formula: string): FigureAccount | undefined {
  if (statistic.value === null) return undefined;
  return {
    label,
    value: bare(statistic.value),
    text: null,
    isMoney: false,
    formula,
    inputs: [
      plain('numerator degrees of freedom', statistic.df1),
      plain('denominator degrees of freedom', statistic.df2),
      ...(statistic.pValue === null ? [] : [plain('p', statistic.pValue)]),
    ],
  };
}
