import { StatsError } from '../stats-error';
import { fitOf, panelOf, type PanelRow } from '../testing/golden-panels';
import { expectDigits } from '../testing/expect-digits';

const names = { outcome: 'value', regressors: ['capex', 'equity'] };

/** Three companies over six years with nothing special about them. */
function plainRows(): PanelRow[] {
  return ['A', 'B', 'C'].flatMap((company, index) =>
    Array.from({ length: 6 }, (_, year) => ({
      company,
      year: 2000 + year,
      outcome: 100 * index + 3 * year + ((year * 7 + index * 5) % 4),
      regressors: [((year * 5 + index) % 6) + index, ((year * year + 2 * index) % 7) + 10 * index],
    })),
  );
}

function change(rows: PanelRow[], index: number, row: Partial<PanelRow>): PanelRow[] {
  return rows.map((old, place) => (place === index ? { ...old, ...row } : old));
}

function refusal(
  rows: readonly PanelRow[],
  own: string | null = null,
  members?: string[],
): StatsError {
  try {
    fitOf(panelOf(rows, names), own, {}, members);
  } catch (error) {
    if (error instanceof StatsError) return error;
    throw error;
  }
  throw new Error('the panel was not refused');
}

describe('the sample of a fit', () => {
  it('drops rows with a missing value and lists each missing cell with its company, year and line', () => {
    const rows = change(plainRows(), 4, { outcome: NaN, regressors: [NaN, 1] });
    const { sample } = fitOf(panelOf(rows, names));
    expect(sample.observations).toBe(17);
    expect(sample.balanced).toBeFalse();
    expect(sample.dropped).toEqual([
      { company: 'A', year: 2004, row: 6, column: 'value', reason: 'missing' },
      { company: 'A', year: 2004, row: 6, column: 'capex', reason: 'missing' },
    ]);
  });

  it('names the company and year of each dropped row where they share a line or have none', () => {
    const rows = change(change(plainRows(), 1, { outcome: NaN }), 8, { outcome: NaN });
    const data = panelOf(rows, names);
    const places = [4, 0].map((line) => {
      const { sample } = fitOf({ ...data, fileRow: data.fileRow.map(() => line) });
      return sample.dropped.map(({ company, year, row }) => [company, year, row]);
    });
    expect(places).toEqual([
      [
        ['A', 2001, 4],
        ['B', 2002, 4],
      ],
      [
        ['A', 2001, 0],
        ['B', 2002, 0],
      ],
    ]);
  });

  it('names the row itself where a regressor of the year before is missing', () => {
    const rows = change(plainRows(), 3, { regressors: [NaN, 1] });
    const { sample } = fitOf(panelOf(rows, names), null, { lag: 1 });
    const ofA = sample.dropped.filter(({ company }) => company === 'A');
    expect(ofA.map(({ year, column }) => [year, column])).toEqual([
      [2000, 'capex'],
      [2000, 'equity'],
      [2004, 'capex'],
    ]);
  });

  it('takes a company with a single row out before anything is counted, and still lists it', () => {
    const single = { company: 'S', year: 1990, outcome: 500, regressors: [4, 20] };
    const plain = fitOf(panelOf(plainRows(), names), 'A');
    const fit = fitOf(panelOf([...plainRows(), single], names), 'A');
    expect(fit.sample).toEqual({ ...plain.sample, singleRow: ['S'] });
    expect(fit.slopes).toEqual(plain.slopes);
    expect(fit.standing).toEqual(plain.standing);
    expect(fit.goodness).toEqual(plain.goodness);
    const [capex, equity] = fit.slopes.map(({ estimate }) => estimate);
    const listed = fit.intercepts.find(({ company }) => company === 'S');
    expectDigits(listed?.estimate, 500 - 4 * capex - 20 * equity, 12);
    expect(listed?.low).toBeNull();
    expect(listed?.intervalReason).toContain('One row');
    expect(listed?.deviation).toBeNull();
    expect(fit.warnings.map(({ code }) => code)).toContain('single-row');
  });

  it('says why a company with a single row has no standing', () => {
    const single = { company: 'S', year: 2001, outcome: 500, regressors: [4, 20] };
    const fit = fitOf(panelOf([...plainRows(), single], names), 'S');
    expect(fit.standing).toBeNull();
    expect(fit.standingReason).toBe('S has one complete row; a standing needs at least two.');
    expect(fit.prediction).toBeNull();
  });

  it('restricts to the members and adds the own company', () => {
    const fit = fitOf(panelOf(plainRows(), names), 'C', {}, ['A']);
    expect(fit.members).toEqual(['A', 'C']);
    expect(fit.intercepts.map(({ company }) => company)).toEqual(['A', 'C']);
  });

  it('refuses a company and year twice, with every place', () => {
    const rows = [...plainRows(), { ...plainRows()[1], outcome: 7 }];
    const { code, data } = refusal(rows);
    expect(code).toBe('duplicate-rows');
    expect(data.rows).toEqual([
      { row: 3, company: 'A', year: 2001 },
      { row: 20, company: 'A', year: 2001 },
    ]);
  });

  it('refuses an own company or a member without rows, by name', () => {
    const { data, message } = refusal(plainRows(), 'Z');
    expect(data.companies).toEqual(['Z']);
    expect(message).toBe(
      'expected rows with a year in the panel for every company; found none for Z',
    );
    expect(refusal(plainRows(), null, ['A', 'B', 'Y']).code).toBe('unknown-company');
  });

  it('refuses fewer than two companies with two rows', () => {
    const { code, data } = refusal(plainRows(), null, ['A']);
    expect(code).toBe('too-few-companies');
    expect(data.companies).toEqual(['A']);
  });

  it('refuses an infinite or enormous number, with its place', () => {
    expect(refusal(change(plainRows(), 2, { outcome: -1e61 })).code).toBe('non-finite');
    const { code, data } = refusal(change(plainRows(), 2, { outcome: Infinity }));
    expect(code).toBe('non-finite');
    expect(data.rows).toEqual([{ row: 4, column: 'value' }]);
  });

  it('refuses a column of numbers too small to square, by name, but not zeros beside ordinary ones', () => {
    const tiny = plainRows().map((row) => ({
      ...row,
      regressors: [row.regressors[0], row.regressors[1] * 1e-62],
    }));
    const { code, data, message } = refusal(tiny);
    expect(code).toBe('non-finite');
    expect(data.columns).toEqual(['equity']);
    expect(message).toContain('1e-60');
    const still = plainRows().map((row) => ({ ...row, regressors: [row.regressors[0], 0] }));
    expect(refusal(still).code).toBe('constant-within-companies');
    const one = change(plainRows(), 2, { outcome: 1e-70 });
    expect(fitOf(panelOf(one, names)).sample.observations).toBe(18);
  });

  it('refuses more years than any company has fiscal years', () => {
    const rows = ['A', 'B'].flatMap((company) =>
      Array.from({ length: 1001 }, (_, year) => ({
        company,
        year,
        outcome: year % 7,
        regressors: [year % 5, year % 3],
      })),
    );
    expect(refusal(rows).code).toBe('too-many-years');
  });
});

describe('the design of a fit', () => {
  it('refuses an outcome that never varies within a company', () => {
    const rows = plainRows().map((row) => ({ ...row, outcome: row.company.charCodeAt(0) + 0.1 }));
    expect(refusal(rows).code).toBe('outcome-constant');
  });

  it('refuses a regressor that never varies within a company, and names it', () => {
    const rows = plainRows().map((row) => ({
      ...row,
      regressors: [row.regressors[0], row.company.charCodeAt(0) / 3],
    }));
    const { code, data } = refusal(rows);
    expect(code).toBe('constant-within-companies');
    expect(data.columns).toEqual(['equity']);
  });

  it('refuses collinear regressors with the combination that never varies', () => {
    const rows = plainRows().map((row) => ({
      ...row,
      regressors: [row.regressors[0], 5 - 2 * row.regressors[0] + row.company.charCodeAt(0)],
    }));
    const { code, data, message } = refusal(rows);
    expect(code).toBe('collinear-regressors');
    expect(data.columns).toEqual(['capex', 'equity']);
    expectDigits(data.combination?.[1].weight, 0.5, 9);
    expect(message).toContain('capex + 0.5 × equity never varies');
  });

  it('refuses a panel that leaves no residual degrees of freedom', () => {
    const rows = plainRows()
      .filter(({ year }) => year < 2002)
      .slice(0, 4);
    expect(refusal(rows).code).toBe('no-residual-degrees-of-freedom');
  });

  it('refuses a specification it does not offer', () => {
    for (const specification of [
      { confidence: 1 },
      { lag: 2 },
      { slopes: 'wild' },
      { slopes: 'cr3' },
      { seed: 1 },
      { effects: 'year' },
      { form: 'sqrt' },
    ]) {
      expect(() =>
        fitOf(panelOf(plainRows(), names), null, specification as object),
      ).toThrowMatching((error) => error instanceof StatsError && error.code === 'specification');
    }
  });
});
