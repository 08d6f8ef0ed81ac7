import { openFit, type PanelColumns, type Specification } from '../index';
import type { OpenFit } from '../fit-parts';
import { goldenJson, goldenPanel, plainSpecification, sha256 } from '../testing/golden-panels';
import { evidenceOf } from './evidence-of';

interface Meta {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
}

function panelOfFile(file: string): PanelColumns {
  const { dependent, regressors } = goldenJson<Meta>(`${file}.json`).meta;
  return goldenPanel(`${file}.csv`, dependent, regressors);
}

function open(
  data: PanelColumns,
  own: string | null,
  change: Partial<Specification> = {},
): OpenFit {
  const specification = { ...plainSpecification, ...change };
  return openFit({ data, specification, own, members: undefined }, { sha256 });
}

/** Every number of a value, with the path to it. */
function numbers(value: unknown, path = ''): (readonly [string, number])[] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbers(inner, `${path}.${key}`));
}

describe('evidenceOf', () => {
  for (const file of [
    'grunfeld10',
    'grunfeld11',
    'grunfeld11_value_on_inv_capital',
    'grunfeld10_unbalanced',
    'grunfeld10_loglog',
    'usairlines',
    'instinnovation120',
  ]) {
    const data = panelOfFile(file);
    for (const own of [data.companies[0], null]) {
      for (const effects of ['company', 'company,year'] as const) {
        it(`of ${file} holds no number that is not one, ${own ?? 'without own company'}, ${effects} effects`, () => {
          const evidence = evidenceOf(open(data, own, { effects }));
          const wrong = numbers(evidence).filter(([, value]) => !Number.isFinite(value));
          expect(wrong).toEqual([]);
          expect(evidence.lines.length).toBe(data.regressors.length);
          expect(evidence.alternatives.filter(({ isThisFit }) => isThisFit).length).toBe(1);
          expect(evidence.verdict.grade === 'does-not-carry').toBe(own === null);
        });
      }
    }
  }

  it('gives a reason for every slope and test it does not have', () => {
    const evidence = evidenceOf(open(panelOfFile('instinnovation120'), 'C001'));
    for (const { slopes, reason } of [
      ...evidence.estimators,
      ...evidence.covariances,
      ...evidence.alternatives,
      ...evidence.withoutYear,
    ]) {
      expect(slopes === null).toBe(reason !== undefined);
    }
    for (const { code, pValue, statistic, reason } of evidence.tests.list) {
      if (statistic === null) expect(reason).withContext(code).toBeTruthy();
      if (pValue !== null) expect(statistic).withContext(code).not.toBeNull();
    }
  });

  it('tells its progress from 0 to 1, never back', () => {
    const shares: number[] = [];
    evidenceOf(open(panelOfFile('grunfeld10'), 'F01'), (share) => shares.push(share));
    expect(shares).toEqual([...shares].sort((left, right) => left - right));
    expect(shares[shares.length - 1]).toBe(1);
  });

  it('is of the fit: same hash, same engine, same figures', () => {
    const fit = open(panelOfFile('grunfeld10'), 'F01');
    const evidence = evidenceOf(fit);
    expect([evidence.hash, evidence.engine]).toEqual([fit.result.hash, fit.result.engine]);
    const chosen = evidence.covariances.find(({ isChosen }) => isChosen);
    const within = evidence.estimators.find(({ code }) => code === 'fixed-effects');
    const same = evidence.alternatives.find(({ isThisFit }) => isThisFit);
    fit.result.slopes.forEach(({ low, estimate }, k) => {
      expect(chosen?.slopes?.[k].low).toBe(low);
      expect(within?.slopes?.[k].estimate).toBe(estimate);
      expect(same?.slopes?.[k].low).toBe(low);
    });
    expect(same?.standing?.low).toBe(fit.result.standing?.low);
  });

  it('survives a perfect fit: no interval, no test, no statement', () => {
    const data = panelOfFile('grunfeld10');
    const [value, capital] = data.regressors;
    const outcome = {
      name: 'inv',
      values: value.values.map((one, row) => 2 * one - capital.values[row] + data.company[row]),
    };
    const evidence = evidenceOf(open({ ...data, outcome }, 'F01'));
    expect(evidence.verdict.grade).toBe('does-not-carry');
    expect(evidence.verdict.against.map(({ code }) => code)).toContain('perfect-fit');
    expect(evidence.tests.inHolm).toBe(0);
    expect(numbers(evidence).filter(([, one]) => !Number.isFinite(one))).toEqual([]);
  });
});
