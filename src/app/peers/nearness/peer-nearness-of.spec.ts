import { panelCompany, scatteredCompanies } from '../testing/panel-company';
import { addingUp } from './adding-up';
import { modelMeasures, peerMeasures } from './peer-measures';
import { nearestFirst, peerNearnessOf } from './peer-nearness-of';

const companies = scatteredCompanies(30);
const question = {
  companies,
  ownCompany: 'Company 1',
  measures: modelMeasures,
  scatter: 'classical',
} as const;

describe('nearness to the own company', () => {
  it('has every other company, nearest first, with parts that add up to the squared distance', () => {
    const nearness = peerNearnessOf(question);
    expect(nearness.remarks).toEqual([]);
    expect(nearness.byCompany.size).toBe(29);
    for (const { distance, parts } of nearness.byCompany.values())
      expect(parts.reduce((sum, part) => sum + part, 0) / distance ** 2).toBeCloseTo(1, 12);
    const order = nearestFirst(companies.slice(1), nearness).map(
      ({ name }) => nearness.byCompany.get(name)?.distance ?? NaN,
    );
    expect(order).toEqual([...order].sort((a, b) => a - b));
  });

  it('is another where the spread is robust to outliers', () => {
    const usual = peerNearnessOf(question).byCompany.get('Company 2');
    const robust = peerNearnessOf({ ...question, scatter: 'robust' }).byCompany.get('Company 2');
    expect(robust?.distance).toBeGreaterThan(0);
    expect(robust?.distance).not.toBeCloseTo(usual?.distance ?? 0, 6);
  });

  it('leaves out a measure that the own company lacks, and says so', () => {
    const [own, ...others] = companies;
    const lacking = { ...own, firstYear: 2020, measures: { ...own.measures, growth: null } };
    const found = peerNearnessOf({ ...question, companies: [lacking, ...others] });
    expect(found.measures.map(({ key }) => key)).not.toContain('growth');
    expect(found.byCompany.size).toBe(29);
    expect(found.remarks).toEqual([
      'Growth does not count: Company 1 has no value (one year only).',
    ]);
  });

  it('counts fewer measures where companies are too few: the least known falls away first', () => {
    const few = companies
      .slice(0, 8)
      .map((company, place) =>
        place < 3
          ? company
          : { ...company, measures: { ...company.measures, logBookEquity: null } },
      );
    const found = peerNearnessOf({ ...question, companies: few });
    expect(found.remarks[0]).toBe(
      'Book equity does not count: 5 measures need 11 companies that have them all, and 3 have.',
    );
    expect(found.measures.map(({ key }) => key)).toEqual([
      'logMarketValue',
      'capexToBookEquity',
      'growth',
    ]);
    expect(found.byCompany.size).toBe(7);
  });

  it('names measures that say the same, and lets one of them go', () => {
    const doubled = companies.map((company) => ({
      ...company,
      measures: {
        ...company.measures,
        others: { double: 2 * (company.measures.growth ?? 0), staff: 1 },
      },
    }));
    const found = peerNearnessOf({
      ...question,
      companies: doubled,
      measures: peerMeasures(doubled),
    });
    expect(found.remarks).toEqual([
      'Staff does not count: it is the same for all companies.',
      'Growth and double say the same: double does not count.',
    ]);
    expect(found.measures).toEqual(modelMeasures);
  });

  it('says why a company has no distance, and lists it after the others', () => {
    const young = panelCompany('Aldren', {
      firstYear: 2020,
      measures: { ...companies[1].measures, growth: null, volatility: null },
    });
    const found = peerNearnessOf({ ...question, companies: [...companies, young] });
    expect(found.without).toEqual(new Map([['Aldren', 'no growth or volatility: one year only']]));
    expect(nearestFirst([young, ...companies.slice(1)], found).at(-1)?.name).toBe('Aldren');
  });

  it('asks for what it needs, and never gives up silently', () => {
    expect(peerNearnessOf({ ...question, ownCompany: '' }).remarks).toEqual([
      'Choose the own company to see how near the others are.',
    ]);
    expect(peerNearnessOf({ ...question, measures: [] }).remarks[0]).toContain('No measure counts');
    const two = peerNearnessOf({ ...question, companies: companies.slice(0, 2) });
    expect(two.byCompany.size).toBe(0);
    expect(two.remarks.length).toBe(6);
    expect(two.remarks.at(-1)).toBe('No distance can be computed.');
  });
});

describe('parts rounded to two digits', () => {
  it('add up to their rounded sum, and none is off by a whole digit', () => {
    const parts = [1.005, 2.334, -0.337, 0.124, 0.005];
    const rounded = addingUp(parts, 2);
    expect(rounded.reduce((sum, part) => sum + part, 0)).toBeCloseTo(3.13, 10);
    rounded.forEach((part, place) => {
      expect(Math.abs(part - parts[place])).toBeLessThan(0.01);
    });
    expect(addingUp([], 2)).toEqual([]);
  });
});
