import { fitHash } from './fit-hash';
import { goldenPanel, plainSpecification, sha256 } from './testing/golden-panels';
import { fitPanel } from './fit-panel';
import { StatsError } from './stats-error';

const data = goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']);
const members = ['C01', 'C02', 'C06'];

describe('the digest of a fit without fitting', () => {
  for (const change of [{}, { lag: 1 }, { form: 'log', effects: 'company,year' }] as const)
    it(`is the fit’s own (${JSON.stringify(change)})`, () => {
      const specification = { ...plainSpecification, ...change };
      const fit = fitPanel(data, specification, 'C06', members, { sha256 });
      expect(fitHash({ data, specification, own: 'C06', members }, { sha256 })).toBe(fit.hash);
      const fewer = { data, specification, own: 'C06', members: ['C01', 'C06'] };
      expect(fitHash(fewer, { sha256 })).not.toBe(fit.hash);
    });

  it('refuses what has no sample', () => {
    const request = { data, specification: plainSpecification, own: 'C06', members: [] };
    expect(() => fitHash(request, { sha256 })).toThrowError(StatsError);
  });
});
