import { goldenPanel, goldenPanelData, panelOf } from '../testing/golden-panel';
import { companyMeasures } from './company-measures';
import { peerDistances } from './peer-distances';
import { classicalScatter, robustScatter } from './scatter';

const measureNames = [
  'logMarketValue',
  'logBookEquity',
  'capexToBookEquity',
  'growth',
  'volatility',
] as const;
const grunfeld = goldenPanel('grunfeld11_value_on_inv_capital');

function candidates() {
  return companyMeasures(grunfeld).map((measures) => ({
    company: measures.company,
    values: measureNames.map((name) => measures[name]),
  }));
}

describe('measures of a company', () => {
  it('are those that R computes from the same panel', () => {
    const found = companyMeasures(grunfeld);
    expect(found.length).toBe(goldenPanelData.measures.length);
    goldenPanelData.measures.forEach((golden, place) => {
      expect(found[place].company).toBe(golden.company);
      for (const name of measureNames)
        expect((found[place][name] ?? NaN) / golden[name])
          .withContext(`${golden.company} ${name}`)
          .toBeCloseTo(1, 11);
    });
  });

  it('are unknown where the cells do not say, and take the last value that is there', () => {
    const [measures] = companyMeasures(
      panelOf([
        ['Aldren', 2010, 100, 5, -1],
        ['Aldren', 2011, 110, NaN, -2],
        ['Aldren', 2012, NaN, 6, NaN],
      ]),
    );
    expect(measures.logMarketValue).toBe(Math.log(110));
    expect(measures.logBookEquity).toBeNull();
    expect(measures.capexToBookEquity).toBeNull();
    expect(measures.growth).toBeCloseTo(Math.log(1.1), 14);
    expect(measures.volatility).toBeNull();
  });
});

describe('distances to the own company', () => {
  for (const scatter of ['classical', 'robust'] as const) {
    it(`are R's mahalanobis with the ${scatter} scatter, parts and order`, () => {
      const golden = goldenPanelData.distances[scatter];
      const found = peerDistances(candidates(), goldenPanelData.distances.own, scatter);
      if (found.kind !== 'found') throw new Error(found.kind);
      expect(found.distances.map(({ company }) => company)).toEqual(
        golden.map(({ company }) => company),
      );
      golden.forEach(({ distance, parts }, place) => {
        const mine = found.distances[place];
        expect(mine.distance / distance).toBeCloseTo(1, 9);
        parts.forEach((part, k) => {
          expect((mine.parts[k] - part) / distance ** 2).toBeCloseTo(0, 9);
        });
        const sum = mine.parts.reduce((total, part) => total + part, 0);
        expect(sum / mine.distance ** 2).toBeCloseTo(1, 12);
      });
    });

    it(`have the ${scatter} scatter that R and robustbase give for the stack-loss data`, () => {
      const { points, [scatter]: golden } = goldenPanelData.scatter;
      const found = (scatter === 'robust' ? robustScatter : classicalScatter)(points);
      golden.forEach((row, i) => {
        row.forEach((value, j) => {
          expect(found.get(i, j) / value).toBeCloseTo(1, 10);
        });
      });
    });
  }

  it('do not depend on the units of a measure', () => {
    const rescaled = candidates().map(({ company, values }) => ({
      company,
      values: values.map((value, k) => (k === 2 && value !== null ? value * 1e6 : value)),
    }));
    const own = goldenPanelData.distances.own;
    const [plain, scaled] = [candidates(), rescaled].map((list) =>
      peerDistances(list, own, 'classical'),
    );
    if (plain.kind !== 'found' || scaled.kind !== 'found') throw new Error('expected distances');
    plain.distances.forEach(({ distance }, place) => {
      expect(scaled.distances[place].distance / distance).toBeCloseTo(1, 9);
    });
  });

  it('name the measures that say the same', () => {
    const doubled = candidates()
      .map(({ company, values }) => ({ company, values: [values[0], values[1], values[0]] }))
      .map(({ company, values }) => ({
        company,
        values: [...values.slice(0, 2), (values[2] ?? 0) * 2],
      }));
    expect(peerDistances(doubled, goldenPanelData.distances.own, 'classical')).toEqual({
      kind: 'dependent',
      measures: [0, 2],
    });
    const flat = candidates().map(({ company, values }) => ({ company, values: [values[0], 7] }));
    expect(peerDistances(flat, goldenPanelData.distances.own, 'robust')).toEqual({
      kind: 'dependent',
      measures: [1],
    });
  });

  it('leave out whom a measure is missing of, and say when the own company lacks one', () => {
    const own = goldenPanelData.distances.own;
    const gappy = candidates().map(({ company, values }) => ({
      company,
      values: company === 'C01' ? [null, values[1]] : values.slice(0, 2),
    }));
    const found = peerDistances(gappy, own, 'classical');
    expect(found.kind === 'found' ? found.left : found.kind).toEqual(['C01']);
    expect(peerDistances(gappy, 'C01', 'classical')).toEqual({
      kind: 'own-unknown',
      measures: [0],
    });
    expect(peerDistances(gappy, 'Nobody', 'classical')).toEqual({
      kind: 'own-unknown',
      measures: [],
    });
  });

  it('ask for more companies than twice the measures', () => {
    const few = candidates().slice(0, 5);
    expect(peerDistances(few, few[0].company, 'classical')).toEqual({
      kind: 'too-few',
      needed: 11,
      found: 5,
    });
  });
});
