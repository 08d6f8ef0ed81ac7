import { estimatorSummaries } from '../../estimators/estimator-summaries';
import type { EstimatorSummary } from '../../evidence/evidence';
import { withoutEachYear } from '../../evidence/without-year';
import type { SlopeCovarianceName, SlopeEstimate } from '../../fit-result';
import { residualSummary } from '../../influence/residual-summary';
import type { OpenFit } from '../../fit-parts';
import { covarianceTable } from '../../slopes/covariance-table';
import { slopeInference } from '../../slopes/slope-inference';
import { testTable } from '../../tests/test-table';
import { type FigureValues, orNull } from './figure-values';

/** With more companies the bootstrap draws, and its draws are ours alone. */
const mostEnumerated = 12;

/** Covariances, estimators, tests and influence of one fit, in the order of the outside values. */
export function evidenceFigures(open: OpenFit): FigureValues {
  const residuals = residualSummary(open);
  const { withoutYear } = withoutEachYear(open.fit, open.own);
  return {
    ...covarianceFigures(open),
    ...(open.specification.effects === 'company' && {
      ...estimatorFigures(open),
      ...testFigures(open),
    }),
    withoutYear: withoutYear.flatMap(({ slopes }) => orNull(slopes)),
    withoutYearStanding: withoutYear.map(({ standing }) => standing),
    varianceInflation: residuals.varianceInflation.map(({ value }) => value),
    leverages: residuals.largest.map(({ leverage }) => leverage),
    studentised: residuals.largest.map(({ studentised }) => studentised),
    cook: residuals.largest.map(({ cook }) => cook),
  };
}

function covarianceFigures({ ground, specification, sample }: OpenFit): FigureValues {
  const names = Object.keys(covarianceTable) as SlopeCovarianceName[];
  const computed = names.filter(
    (name) => name !== 'wild' || sample.companies.length <= mostEnumerated,
  );
  return Object.fromEntries(
    computed.map((name) => {
      const { slopes } = slopeInference(ground, name, {
        confidence: specification.confidence,
        seed: name === 'wild' ? 1 : null,
      });
      const all = (key: keyof SlopeEstimate): (number | null)[] =>
        slopes.map((slope) => slope[key] as number | null);
      const degrees = name === 'wild' ? [] : all('degreesOfFreedom');
      return [
        `covariance.${name}`,
        [...all('standardError'), ...degrees, ...all('pValue'), ...all('low'), ...all('high')],
      ];
    }),
  );
}

function estimatorFigures(open: OpenFit): FigureValues {
  const summaries = new Map(estimatorSummaries(open).map((summary) => [summary.code, summary]));
  const random = summaries.get('random-effects');
  const differences = summaries.get('first-differences');
  const components = random?.components;
  return {
    between: estimatorValues(summaries.get('between')),
    randomEffects: estimatorValues(random),
    randomComponents:
      components === undefined
        ? [null]
        : [components.error, components.company, ...components.theta],
    firstDifferences: [...estimatorValues(differences), differences?.observations],
  };
}

/** Constant if any and slopes, then the standard errors of the slopes. */
function estimatorValues(summary: EstimatorSummary | undefined): (number | null)[] {
  if (summary?.slopes === undefined || summary.slopes === null) return [null];
  return [
    ...(summary.constant === null ? [] : [summary.constant]),
    ...summary.slopes.map(({ estimate }) => estimate),
    ...summary.slopes.map(({ standardError }) => standardError),
  ];
}

/** Statistic, and p value where there is one, by the code of the test. */
function testFigures(open: OpenFit): FigureValues {
  return Object.fromEntries(
    testTable.map((test) => {
      const outcome = test.compute(open);
      const values =
        outcome.statistic === null || outcome.pValue === null
          ? [outcome.statistic]
          : [outcome.statistic, outcome.pValue];
      return [`test.${test.code}`, values];
    }),
  );
}
