import { fitOf, goldenPanel, panelOf, type PanelRow } from '../testing/golden-panels';
import type { FitResult, Specification } from '../fit-result';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';

const names = { outcome: 'y', regressors: ['x'] };

interface Shape {
  readonly companies: number;
  readonly years: number;
}

/** A panel of noise around y = x, the same every time. */
function noise(
  { companies, years }: Shape,
  change: (row: PanelRow, index: number) => PanelRow = (row) => row,
  specification: Partial<Specification> = {},
): FitResult {
  let state = 4711;
  const random = (): number => {
    state = (state * 1103515245 + 12345) % 2147483648;
    return state / 2147483648 - 0.5;
  };
  const rows = Array.from({ length: companies * years }, (_, index): PanelRow => {
    const x = 10 * random();
    return change(
      {
        company: `K${Math.floor(index / years)}`,
        year: 2000 + (index % years),
        outcome: x + random(),
        regressors: [x],
      },
      index,
    );
  });
  return fitOf(panelOf(rows, names), 'K0', specification);
}

const codes = (fit: FitResult): string[] => fit.warnings.map(({ code }) => code);

describe('warningsOf', () => {
  it('says nothing of a large, well-behaved panel', () => {
    expect(codes(noise({ companies: 12, years: 20 }))).toEqual([]);
  });

  it('speaks of few companies and few years', () => {
    expect(codes(noise({ companies: 7, years: 20 }))).toContain('few-companies');
    expect(codes(noise({ companies: 12, years: 7 }))).toContain('few-years');
  });

  it('puts small Satterthwaite degrees of freedom in words, with their numbers', () => {
    const { warnings } = fitOf(
      goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']),
    );
    const warning = warnings.find(({ code }) => code === 'small-degrees-of-freedom');
    expect(warning?.detail).toBe(
      'Satterthwaite degrees of freedom are 2.07 for inv and 3.46 for capital: one large company then drives the result.',
    );
    expect(warning?.subjects).toEqual(['inv', 'capital']);
  });

  it('says nothing of Satterthwaite where the errors have other degrees of freedom', () => {
    const fit = noise({ companies: 4, years: 20 }, undefined, { slopes: 'cr1' });
    expect(codes(fit)).not.toContain('small-degrees-of-freedom');
  });

  it('names the one company without which a slope changes sign', () => {
    const { warnings } = fitOf(
      goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']),
    );
    const dominated = warnings.filter(({ code }) => code === 'dominated');
    expect(dominated.map(({ subjects }) => subjects)).toEqual([['C06', 'capital']]);
  });

  it('names the one company without which a slope is not determined at all', () => {
    const fit = noise({ companies: 9, years: 10 }, (row) => ({
      ...row,
      regressors: [row.company === 'K3' ? row.regressors[0] : 1],
    }));
    const warning = fit.warnings.find(({ code }) => code === 'dominated');
    expect(warning?.subjects).toEqual(['K3']);
    expect(fit.slopes[0].low).toBeNull();
    expect(fit.slopes[0].intervalReason).toContain('one company alone');
    expect(fit.slopes[0].degreesOfFreedom).toBeNull();
  });

  it('speaks of errors that persist, at their bound, and more than the peers’', () => {
    const { warnings } = fitOf(goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']));
    expect(warnings.map(({ code }) => code)).toContain('persistent-errors');
    expect(warnings.find(({ code }) => code === 'persistence-capped')?.subjects).toEqual([
      'F03',
      'F05',
      'F07',
      'F08',
      'F09',
    ]);
    const drifting = noise({ companies: 12, years: 20 }, (row) =>
      row.company === 'K0' ? { ...row, outcome: row.outcome + Math.sin(row.year / 4) } : row,
    );
    expect(drifting.warnings.find(({ code }) => code === 'own-persistence')?.subjects).toEqual([
      'K0',
    ]);
  });

  it('speaks of a perfect fit, and gives no interval, F or p', () => {
    const fit = noise({ companies: 9, years: 10 }, (row) => ({
      ...row,
      outcome: 3 * row.regressors[0] + row.company.length,
    }));
    expect(codes(fit)).toEqual(['perfect-fit']);
    expect(fit.slopes[0].low).toBeNull();
    expect(fit.slopes[0].pValue).toBeNull();
    expect(fit.goodness.f.value).toBeNull();
    expect(fit.poolability.pValue).toBeNull();
    expect(fit.standing?.low).toBeNull();
    expect(fit.standing?.intervalReason).toContain('perfect');
    expect(fit.standing?.rankSet).toBeNull();
    expect(fit.prediction?.slopeIntervalReason).toContain('perfect');
  });

  it('blames no company for what rounding does to a slope of zero in a perfect fit', () => {
    let turned = 0;
    for (let seed = 1; seed <= 12; seed += 1) {
      const random = randomNumbers(seed);
      const rows = Array.from({ length: 90 }, (_, index): PanelRow => {
        const regressors = [10 + 3 * random(), 5 + random()];
        const company = Math.floor(index / 10);
        const outcome = 2 * regressors[0] + 3 * company;
        return { company: `K${company}`, year: 2000 + (index % 10), outcome, regressors };
      });
      const fit = fitOf(panelOf(rows, randomPanelNames), 'K0');
      const sign = Math.sign(fit.slopes[1].estimate);
      if (fit.withoutCompany.some(({ slopes }) => slopes !== null && slopes[1] * sign < 0)) {
        turned += 1;
      }
      expect(codes(fit)).toEqual(['perfect-fit']);
    }
    expect(turned).toBeGreaterThan(0);
  });

  it('speaks of regressors that can hardly be told apart', () => {
    const rows = Array.from({ length: 90 }, (_, index): PanelRow => {
      const x = (index * 37) % 17;
      return {
        company: `K${index % 9}`,
        year: 2000 + Math.floor(index / 9),
        outcome: x + (index % 5),
        regressors: [x, x + 1e-7 * ((index * 13) % 11)],
      };
    });
    const fit = fitOf(panelOf(rows, { outcome: 'y', regressors: ['x', 'z'] }));
    expect(codes(fit)).toContain('ill-conditioned');
  });

  it('names spellings that differ only by case or blanks', () => {
    const fit = noise({ companies: 9, years: 10 }, (row) => ({
      ...row,
      company: row.company === 'K1' ? 'k 0' : row.company,
    }));
    expect(fit.warnings.find(({ code }) => code === 'spelling')?.subjects).toEqual(['K0', 'k 0']);
  });
});

describe('intervals that do not exist', () => {
  it('are null with a reason for fewer than 6 years', () => {
    const { standing } = noise({ companies: 9, years: 5 });
    expect(standing?.low).toBeNull();
    expect(standing?.intervalReason).toContain('5 fiscal years');
    expect(standing?.rankSet).toBeNull();
    expect(standing?.rankReason).toContain('5 fiscal years');
    expect(standing?.rank).not.toBeNull();
  });

  it('are null with a reason where no two years follow each other', () => {
    const { standing } = noise({ companies: 9, years: 8 }, (row) => ({
      ...row,
      year: 2 * row.year,
    }));
    expect(standing?.intervalReason).toContain('two fiscal years in a row');
    expect(standing?.persistence).toBeNull();
  });

  it('are null with a reason where companies have fewer than 5 rows on average', () => {
    const fit = noise({ companies: 9, years: 4 }, (row, index) => ({
      ...row,
      year: row.year + 4 * (Math.floor(index / 4) % 2),
    }));
    expect(fit.standing?.intervalReason).toContain('4.0 rows on average');
  });

  it('are null for a company of two rows, which has no rank either', () => {
    let kept = 0;
    const fit = noise({ companies: 9, years: 10 }, (row) => {
      if (row.company !== 'K0') return row;
      kept += 1;
      return kept > 2 ? { ...row, outcome: NaN } : row;
    });
    expect(fit.standing?.intervalReason).toBe('K0 has 2 rows; an interval needs at least 3.');
    expect(fit.standing?.rank).toBeNull();
    expect(fit.standing?.rankReason).toContain('2 rows');
    expect(fit.drift).toBeNull();
    expect(fit.driftReason).toContain('at least 8');
    expect(fit.prediction?.intervalReason).toContain('2 rows');
  });

  it('leave a company of two rows out of everybody’s ranking', () => {
    let kept = 0;
    const { standing, pairs } = noise({ companies: 3, years: 10 }, (row) => {
      if (row.company !== 'K1') return row;
      kept += 1;
      return { ...row, outcome: kept > 2 ? NaN : row.outcome + 1000 };
    });
    expect(standing?.rankSet?.[1]).toBeLessThanOrEqual(2);
    expect(pairs?.find(({ company }) => company === 'K1')?.shown).toBe(0);
  });
});

describe('gapPath', () => {
  it('has no gap in a year without any peer', () => {
    const fit = noise({ companies: 9, years: 10 }, (row) =>
      row.company !== 'K0' && row.year === 2003 ? { ...row, outcome: NaN } : row,
    );
    expect(fit.gapPath?.find(({ year }) => year === 2003)).toEqual({
      year: 2003,
      gap: null,
      peers: 0,
    });
  });
});
