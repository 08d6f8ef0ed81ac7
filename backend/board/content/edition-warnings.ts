import type { EditionWarning, FitResult } from '../../contract';
import { type EditionFacts, labelsOf, listed } from './edition-terms';
import { farWords } from './five-lines';
import { countPart, type SentencePart, words } from './sentence';

/** Fewer companies than this are few: `few-companies` of the engine has the same limit. */
const fewCompanies = 8;
/** Common practice, no source: a year that ended longer ago no longer speaks for today. */
const staleMonths = 18;
/** Common practice, no source: from here on the reader has to know that the choice was tried often. */
const manyGroups = 5;

const saidOtherwise: ReadonlySet<FitResult['warnings'][number]['code']> = new Set([
  'few-companies',
  'dominated',
]);

/** What a reader should know before relying on an edition: the serious ones first, then what the engine warned of. */
export function editionWarnings(facts: EditionFacts): readonly EditionWarning[] {
  return [
    ...outsideRange(facts),
    ...fewCompaniesWarning(facts.fit),
    ...dominated(facts.fit),
    ...signChange(facts),
    ...staleData(facts),
    ...manyGroupsTried(facts),
    ...edgeOfRange(facts),
    ...facts.fit.warnings
      .filter(({ code }) => !saidOtherwise.has(code))
      .map(({ code, detail }, index): EditionWarning => ({
        id: `fit.${code}.${index}`,
        code: 'fit',
        isSerious: false,
        title: 'From the fit',
        sentence: [words(detail)],
      })),
  ];
}

function serious(
  code: EditionWarning['code'],
  title: string,
  sentence: readonly SentencePart[],
): EditionWarning {
  return { id: code, code, isSerious: true, title, sentence: [...sentence] };
}

function outsideRange({ scenarios }: EditionFacts): readonly EditionWarning[] {
  const found = farPlans(scenarios, 'outside');
  return found.length === 0
    ? []
    : [
        serious('outside-familiar-range', 'A plan outside the familiar range', [
          words(
            `${found.join('; ')}. No company of the group has been so far from its own average, so the model has nothing to judge these years by.`,
          ),
        ]),
      ];
}

function edgeOfRange({ scenarios }: EditionFacts): readonly EditionWarning[] {
  const found = farPlans(scenarios, 'edge');
  return found.length === 0
    ? []
    : [
        {
          id: 'edge-of-familiar-range',
          code: 'outside-familiar-range',
          isSerious: false,
          title: 'A plan at the edge of the familiar range',
          sentence: [words(`${found.join('; ')}.`)],
        },
      ];
}

function farPlans(
  scenarios: EditionFacts['scenarios'],
  kind: 'edge' | 'outside',
): readonly string[] {
  return scenarios.flatMap(({ name, years }) => {
    const found = years.filter(({ familiar }) => familiar === kind).map(({ year }) => year);
    return found.length === 0 ? [] : [`${name}: ${farWords(found, kind)}`];
  });
}

function fewCompaniesWarning({ sample }: FitResult): readonly EditionWarning[] {
  return sample.companies >= fewCompanies
    ? []
    : [
        serious('few-companies', 'Few companies', [
          words('The peer group has '),
          countPart(sample.companies),
          words(
            ` companies with figures; below ${fewCompanies} one company more or less can change what is said here.`,
          ),
        ]),
      ];
}

function dominated({ warnings }: FitResult): readonly EditionWarning[] {
  const found = warnings.filter(({ code }) => code === 'dominated');
  return found.length === 0
    ? []
    : [
        serious('dominated', 'One company dominates', [
          words(found.map(({ detail }) => detail).join(' ')),
        ]),
      ];
}

function signChange(facts: EditionFacts): readonly EditionWarning[] {
  const { fit } = facts;
  const labels = labelsOf(facts);
  const turned = fit.withoutCompany.flatMap(({ company, slopes, standing }) => {
    const names = (slopes ?? []).flatMap((slope, k) =>
      isTurned(slope, fit.slopes[k].estimate) ? [`the slope of ${labels[k]}`] : [],
    );
    if (standing !== null && fit.standing !== null && isTurned(standing, fit.standing.estimate))
      names.push('the standing');
    return names.length === 0 ? [] : [`without ${company}, ${listed(names)}`];
  });
  return turned.length === 0
    ? []
    : [
        serious('sign-change', 'A sign that hangs on one company', [
          words(`The sign changes when one company is left out: ${turned.join('; ')}.`),
        ]),
      ];
}

function isTurned(without: number, whole: number): boolean {
  return Math.sign(without) * Math.sign(whole) === -1;
}

function staleData({ fit, publishedAt }: EditionFacts): readonly EditionWarning[] {
  const { lastYear } = fit.sample;
  const published = new Date(publishedAt);
  const months = (published.getUTCFullYear() - lastYear) * 12 + published.getUTCMonth() - 11;
  return months <= staleMonths
    ? []
    : [
        serious('stale-data', 'Old figures', [
          words(`The last year of the panel, FY${lastYear}, ended about `),
          countPart(months),
          words(' months before this edition, counted from December.'),
        ]),
      ];
}

function manyGroupsTried({ peerGroupsTried }: EditionFacts): readonly EditionWarning[] {
  return peerGroupsTried < manyGroups
    ? []
    : [
        serious('many-groups-tried', 'Many peer groups tried', [
          countPart(peerGroupsTried),
          words(
            ' peer group versions were saved up to this edition. Choosing among many makes a pleasing standing easier to find than its interval says.',
          ),
        ]),
      ];
}
