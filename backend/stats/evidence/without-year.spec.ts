import * as fc from 'fast-check';
import { openFit, type Specification } from '../index';
import type { OpenFit } from '../fit-parts';
import { expectDigits } from '../testing/expect-digits';
import {
  fitOf,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { randomNumbers, randomPanelNames, randomPanels } from '../testing/random-panels';
import { withoutEachYear } from './without-year';

const names = { outcome: 'y', regressors: ['x'] };

function openOf(
  rows: readonly PanelRow[],
  own: string | null,
  specification: Partial<Specification> = {},
  columns: typeof names = randomPanelNames,
): OpenFit {
  const request = {
    data: panelOf(rows, columns),
    specification: { ...plainSpecification, ...specification },
    own,
    members: undefined,
  };
  return openFit(request, { sha256 });
}

describe('withoutEachYear', () => {
  for (const effects of ['company', 'company,year'] as const) {
    it(`equals a fit of the panel without that year, with ${effects} effects`, () => {
      fc.assert(
        fc.property(randomPanels, (rows) => {
          const { fit } = openOf(rows, 'K1', { effects });
          for (const { year, slopes, standing } of withoutEachYear(fit, 'K1').withoutYear) {
            const rest = rows.filter((row) => row.year !== year);
            const refit = fitOf(panelOf(rest, randomPanelNames), 'K1', { effects });
            refit.slopes.forEach(({ estimate }, k) =>
              expectDigits(slopes?.[k], estimate, 9, String(year)),
            );
            expectDigits(standing, refit.standing?.estimate ?? NaN, 8, String(year));
          }
        }),
        { numRuns: 20 },
      );
    });
  }

  it('keeps the lagged values of the rows that stay, which a panel without the year would lose', () => {
    const random = randomNumbers(7);
    const rows = Array.from({ length: 40 }, (_, index): PanelRow => {
      const x = random();
      const company = `K${Math.floor(index / 10)}`;
      return { company, year: 2000 + (index % 10), outcome: x + random(), regressors: [x] };
    });
    const { fit } = openOf(rows, 'K0', { lag: 1 }, names);
    const before = new Map(rows.map((row) => [`${row.company} ${row.year + 1}`, row.regressors]));
    const shifted = rows.flatMap((row): PanelRow[] => {
      const regressors = before.get(`${row.company} ${row.year}`);
      return regressors === undefined || row.year === 2004 ? [] : [{ ...row, regressors }];
    });
    const expected = fitOf(panelOf(shifted, names), 'K0');
    const found = withoutEachYear(fit, 'K0').withoutYear.find(({ year }) => year === 2004);
    expectDigits(found?.slopes?.[0], expected.slopes[0].estimate, 10);
  });

  /** Companies K0 to K3 over 2000 to 2007; K3 in 2000 and 2001 alone. */
  const short = Array.from({ length: 32 }, (_, index): PanelRow => {
    const x = (index * 37) % 17;
    const company = `K${Math.floor(index / 8)}`;
    return {
      company,
      year: 2000 + (index % 8),
      outcome: 2 * x + ((index * 7) % 5),
      regressors: [x],
    };
  }).filter(({ company, year }) => company !== 'K3' || year < 2002);

  it('names a peer that falls out with a year', () => {
    const { withoutYear } = withoutEachYear(openOf(short, 'K0', {}, names).fit, 'K0');
    expect(withoutYear[0].leftOut).toEqual(['K3']);
    expect(withoutYear[0].standing).not.toBeNull();
    expect(withoutYear[0].reason).toBeUndefined();
    expect(withoutYear[2].leftOut).toBeUndefined();
  });

  it('says that the own company falls out, and gives the slopes without it', () => {
    const { withoutYear } = withoutEachYear(openOf(short, 'K3', {}, names).fit, 'K3');
    const rest = short.filter(({ year }) => year !== 2001);
    expectDigits(withoutYear[1].slopes?.[0], fitOf(panelOf(rest, names)).slopes[0].estimate, 10);
    expect(withoutYear[1].standing).toBeNull();
    expect(withoutYear[1].reason).toBe(
      'Without 2001 K3 has a single row left, so there is no standing.',
    );
  });

  it('says why a year cannot be left out', () => {
    const moving = short.map((row) => ({
      ...row,
      regressors: [row.year === 2004 ? row.regressors[0] : 1],
    }));
    const { withoutYear } = withoutEachYear(openOf(moving, 'K0', {}, names).fit, 'K0');
    const found = withoutYear.find(({ year }) => year === 2004);
    expect(found?.slopes).toBeNull();
    expect(found?.reason).toBe(
      'Without 2004 the model cannot be estimated: x never varies within a company: the company effects take it up entirely.',
    );
  });

  it('says that there is no standing without an own company', () => {
    const { withoutYear } = withoutEachYear(openOf(short, null, {}, names).fit, null);
    expect(withoutYear[4].slopes).not.toBeNull();
    expect(withoutYear[4].reason).toContain('no standing');
  });

  it('leaves a sample of millions of row-fits alone, and says so', () => {
    const { fit } = openOf(short, 'K0', {}, names);
    const years = Array.from({ length: 1000 }, (_, index) => index);
    const year = { length: 5e5 } as Int32Array;
    const large = { ...fit, sample: { ...fit.sample, years, year } };
    const { withoutYear, withoutYearReason } = withoutEachYear(large, 'K0');
    expect(withoutYear).toEqual([]);
    expect(withoutYearReason).toContain('1000 years');
  });
});
