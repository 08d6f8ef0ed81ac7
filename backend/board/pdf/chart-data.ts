import type { EditionContent } from '../../contract';
import type {
  ExpectedPathData,
  FigureKind,
  GapYear,
  IntervalFigure,
  StandingChartData,
} from '../../figures';
import { expectedValue, heldRegressors } from '../../stats/prediction';
import { differenceKind, shownDifference } from '../content/shown-difference';

/** Company intercepts with the mean of the peers. Logs are written as they are, no unit changes them. */
export function levelsData({ fit, ownCompany }: EditionContent): {
  readonly kind: FigureKind;
  readonly data: StandingChartData;
} {
  const own = fit.intercepts.find(({ company }) => company === ownCompany);
  const meanOfPeers =
    own === undefined || fit.standing === null ? null : own.estimate - fit.standing.estimate;
  return {
    kind: fit.specification.form === 'log' ? 'plain' : 'money',
    data: { intercepts: fit.intercepts, ownCompany, meanOfPeers },
  };
}

export function shownStanding({ fit }: EditionContent): {
  readonly kind: FigureKind;
  readonly standing: IntervalFigure | null;
} {
  const { form } = fit.specification;
  return {
    kind: differenceKind(form),
    standing: fit.standing && shownDifference(fit.standing, form),
  };
}

export function shownGaps({ fit }: EditionContent): readonly GapYear[] | null {
  const { form } = fit.specification;
  return (
    fit.gapPath?.map((year) => ({
      ...year,
      gap: year.gap === null || form !== 'log' ? year.gap : Math.expm1(year.gap),
    })) ?? null
  );
}

/** History, the base held as long as the longest plan, and the plans with interval and band; null without an own path. */
export function pathData({ fit, scenarios }: EditionContent): ExpectedPathData | null {
  if (fit.prediction === null || fit.ownYears === null) return null;
  const base = expectedValue(fit.prediction, heldRegressors(fit.prediction));
  const years = new Set(scenarios.flatMap((scenario) => scenario.years.map(({ year }) => year)));
  return {
    ownYears: fit.ownYears,
    base: [...years].sort((a, b) => a - b).map((year) => ({ year, estimate: base.estimate })),
    plans: scenarios.map(({ name, years: planned }) => ({
      name,
      years: planned.map(({ year, expected, band }) => ({
        year,
        estimate: expected.estimate,
        low: expected.low,
        high: expected.high,
        bandLow: band?.low ?? null,
        bandHigh: band?.high ?? null,
      })),
    })),
  };
}
