import { fitOf, goldenPanel, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';

describe('what is left without each company', () => {
  const data = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);

  it('says beside every missing standing why it is missing', () => {
    const none = 'No company of two complete rows or more is the own one, so there is no standing.';
    for (const { slopes, standing, reason } of fitOf(data).withoutCompany) {
      expect(slopes).not.toBeNull();
      expect(standing).toBeNull();
      expect(reason).toBe(none);
    }
    const random = randomNumbers(5);
    const rows = Array.from({ length: 25 }, (_, index) => ({
      company: `K${Math.floor(index / 12)}`,
      year: 2000 + (index % 12),
      outcome: random(),
      regressors: [random()],
    }));
    const single = fitOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'K2');
    expect(single.withoutCompany.map(({ reason }) => reason)).toEqual([none, none]);
    const two = fitOf(data, 'F01', {}, ['F02']);
    expect(two.withoutCompany.map(({ standing, reason }) => [standing, reason])).toEqual([
      [null, 'Without the own company there is no standing.'],
      [null, 'Without the only peer there is no standing.'],
    ]);
  });
  describe('with year effects', () => {
    it('equals a fit without the company, also where it alone has a year', () => {
      const alone = new Map([
        [1999, 'K0'],
        [2004, 'K1'],
        [2010, 'K2'],
        [2011, 'K2'],
      ]);
      const rows = rowsOf(5, (company, year) => (alone.get(year) ?? company) === company);
      const fit = fitOf(panelOf(rows, randomPanelNames), 'K3', { effects: 'company,year' });
      expect(fit.withoutCompany.map(({ slopes }) => slopes === null)).toEqual(Array(5).fill(false));
      for (const { company, slopes, standing } of fit.withoutCompany) {
        const left = panelOf(
          rows.filter((row) => row.company !== company),
          randomPanelNames,
        );
        const own = company === 'K3' ? null : 'K3';
        const refit = fitOf(left, own, { effects: 'company,year' });
        refit.slopes.forEach(({ estimate }, k) => {
          expect(slopes?.[k]).toBeCloseTo(estimate, 9);
        });
        if (own === null) expect(standing).toBeNull();
        else expect(standing).toBeCloseTo(refit.standing?.estimate ?? NaN, 7);
      }
    });

    it('gives the slopes and no standing where the years fall apart without the company', () => {
      const rows = rowsOf(5, (company, year) => {
        if (company === 'K4') return true;
        return ['K0', 'K1'].includes(company) ? year < 2005 : year >= 2005;
      });
      const { withoutCompany } = fitOf(panelOf(rows, randomPanelNames), 'K0', {
        effects: 'company,year',
      });
      const { slopes, standing, reason } = withoutCompany[4];
      expect(slopes).not.toBeNull();
      expect(standing).toBeNull();
      expect(reason).toBe(
        'Without this company the fiscal years fall into parts that share no company, so there is no standing.',
      );
    });

    it('has no slopes where the one company left over has only its own years', () => {
      const rows = rowsOf(2, () => true);
      const { withoutCompany } = fitOf(panelOf(rows, randomPanelNames), null, {
        effects: 'company,year',
      });
      expect(withoutCompany.map(({ slopes }) => slopes)).toEqual([null, null]);
    });
  });
});

/** Rows of 1999 to 2011 that are kept; noise of the size of the slopes' part. */
function rowsOf(companies: number, isKept: (company: string, year: number) => boolean): PanelRow[] {
  const random = randomNumbers(17);
  return Array.from({ length: 13 * companies }, (_, index): PanelRow => {
    const regressors = [10 * random(), 5 * random()];
    return {
      company: `K${Math.floor(index / 13)}`,
      year: 1999 + (index % 13),
      outcome: 20 * index + 2 * regressors[0] - regressors[1] + 10 * random(),
      regressors,
    };
  }).filter(({ company, year }) => isKept(company, year));
}
