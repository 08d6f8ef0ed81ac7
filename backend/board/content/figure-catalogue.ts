import type { FitResult } from '../../contract';
import { decidingYear, type EditionFacts, rankedCount } from './edition-terms';
import type { FigureKind, ShownEstimate } from './sentence';
import { differenceKind, shownDifference } from './shown-difference';

/** A figure of an edition that its headline may write. */
export interface KnownFigure {
  /** Key of its lineage; null of a count. */
  readonly figure: string | null;
  /** In words, for whoever wrote another number. */
  readonly label: string;
  readonly kind: FigureKind;
  readonly shown: ShownEstimate;
  /** Whether it is an estimate, which never stands without its interval. */
  readonly isEstimate: boolean;
}

/** Every figure that a headline may write, what it is most likely to mean first. */
export function figureCatalogue(facts: EditionFacts): readonly KnownFigure[] {
  return [...ofFit(facts.fit), ...ofScenarios(facts), ...counts(facts)];
}

function ofFit(fit: FitResult): readonly KnownFigure[] {
  const { form } = fit.specification;
  const kind = differenceKind(form);
  const found: KnownFigure[] = [];
  if (fit.standing !== null)
    found.push(estimate('standing', 'the standing', kind, shownDifference(fit.standing, form)));
  fit.slopes.forEach((slope, index) => {
    found.push(estimate(`slope.${index}`, `the slope of ${slope.name}`, 'plain', slope));
  });
  if (fit.drift !== null)
    found.push(estimate('drift', 'the drift a year', kind, shownDifference(fit.drift, form)));
  const last = fit.ownYears?.at(-1);
  if (last !== undefined)
    found.push(
      known(null, `the market value of FY${last.year}`, 'money', alone(last.actual)),
      known(
        `fitted.${last.year}`,
        `what the model expected of FY${last.year}`,
        'money',
        alone(last.fitted),
      ),
    );
  const { withinRSquared } = fit.goodness;
  if (withinRSquared !== null)
    found.push(known('within-r-squared', 'the within R²', 'plain', alone(withinRSquared)));
  return found;
}

function ofScenarios({ scenarios, fit }: EditionFacts): readonly KnownFigure[] {
  const { form } = fit.specification;
  return scenarios.flatMap(({ name, years }) => {
    const deciding = decidingYear(years)?.year;
    // The year a plan is judged by comes before the others, whose figures may look the same.
    const ordered = [...years].sort(
      (a, b) => Number(b.year === deciding) - Number(a.year === deciding),
    );
    return ordered.flatMap(({ year, expected, difference, band }) => [
      estimate(
        `difference.${year}`,
        `what ${name} changes by FY${year}`,
        differenceKind(form),
        shownDifference(difference, form),
      ),
      estimate(
        `expected.${year}`,
        `the expected value of FY${year} under ${name}`,
        'money',
        expected,
      ),
      ...(band === undefined || band.low === null || band.high === null
        ? []
        : [
            known(
              null,
              `the low end of the band of FY${year} under ${name}`,
              'money',
              alone(band.low),
            ),
            known(
              null,
              `the high end of the band of FY${year} under ${name}`,
              'money',
              alone(band.high),
            ),
          ]),
    ]);
  });
}

function counts(facts: EditionFacts): readonly KnownFigure[] {
  const { fit, peerGroup, scenarios, number, peerGroupsTried } = facts;
  const count = (label: string, value: number) => known(null, label, 'count', alone(value));
  return [
    ...(fit.standing?.rankSet ?? []).map((place) => count('a place of the rank set', place)),
    count('companies with a place', rankedCount(facts)),
    count('companies in the fit', fit.sample.companies),
    count('peers', peerGroup.peerCount),
    count('years', fit.sample.years),
    count('rows', fit.sample.observations),
    count('scenarios', scenarios.length),
    count('the number of this edition', number),
    count('peer group versions tried', peerGroupsTried),
    known(null, 'the confidence level', 'percent', alone(fit.specification.confidence)),
    known(null, 'the level of the band', 'percent', alone(0.8)),
  ];
}

function estimate(
  figure: string,
  label: string,
  kind: FigureKind,
  { estimate: value, low, high, unbounded }: ShownEstimate,
): KnownFigure {
  return {
    figure,
    label,
    kind,
    shown: { estimate: value, low, high, unbounded },
    isEstimate: true,
  };
}

function known(
  figure: string | null,
  label: string,
  kind: FigureKind,
  shown: ShownEstimate,
): KnownFigure {
  return { figure, label, kind, shown, isEstimate: false };
}

function alone(value: number): ShownEstimate {
  return { estimate: value, low: null, high: null };
}
