import { goldenPanel, goldenPanelData, modelColumns, panelOf } from '../testing/golden-panel';
import type { FlagFacts } from './flag';
import { flagGround } from './flag-ground';
import { flagsOf } from './flags-of';
import { jumpFlags } from './jump-flags';
import { peerOutlierFlags } from './peer-outlier-flags';

type Row = readonly [string, number, number, number, number];

/** Ten years of figures that nothing can be said against. */
function steady(company: string, size = 1): Row[] {
  const wiggle = [1, 1.07, 1.02, 1.11, 1.19, 1.14, 1.26, 1.33, 1.29, 1.41];
  return wiggle.map((factor, place) => [
    company,
    2010 + place,
    917 * size * factor,
    43 * size * factor * (place % 2 === 0 ? 1.01 : 0.97),
    511 * size * (1 + place / 40),
  ]);
}

function changed(rows: readonly Row[], year: number, cell: 2 | 3 | 4, value: number): Row[] {
  return rows.map((row) => {
    if (row[1] !== year) return row;
    const copy: [string, number, number, number, number] = [...row];
    copy[cell] = value;
    return copy;
  });
}

function told(rows: readonly Row[]): string[] {
  return flagsOf(panelOf(rows)).map(
    ({ company, year, column, facts }) => `${company} ${year} ${String(column)} ${facts.code}`,
  );
}

describe('flags of a panel', () => {
  for (const name of ['grunfeld10', 'grunfeld11'] as const) {
    const panel = goldenPanel(
      name === 'grunfeld11' ? 'grunfeld11_value_on_inv_capital' : 'grunfeld10',
    );
    const place = (row: number, column: number): string =>
      `${panel.companies[panel.company[row]]} ${panel.year[row]} ${modelColumns[column].role}`;

    it(`find the jumps of ${name} that R's mad finds`, () => {
      const expected = new Map(
        goldenPanelData.jumps[name].map((jump) => [
          `${jump.company} ${jump.year} ${jump.column}`,
          jump,
        ]),
      );
      const found = jumpFlags(flagGround(panel));
      expect(found.map(({ row, column }) => place(row, column)).sort()).toEqual(
        [...expected.keys()].sort(),
      );
      for (const { row, column, facts } of found) {
        const golden = expected.get(place(row, column));
        if (facts.code !== 'jump' || golden === undefined) throw new Error('a jump without origin');
        expect(facts.score / golden.score).toBeCloseTo(1, 11);
        expect(facts.ratio / golden.ratio).toBeCloseTo(1, 11);
        expect(facts.usualRatio / golden.usualRatio).toBeCloseTo(1, 11);
      }
    });

    it(`find the outliers among peers of ${name} that R's mad finds`, () => {
      const expected = new Map(
        goldenPanelData.peerOutliers[name].map((outlier) => [
          `${outlier.company} ${outlier.year} ${outlier.column}`,
          outlier.score,
        ]),
      );
      const found = peerOutlierFlags(flagGround(panel));
      expect(found.map(({ row, column }) => place(row, column)).sort()).toEqual(
        [...expected.keys()].sort(),
      );
      for (const { row, column, facts } of found) {
        const score = facts.code === 'peer-outlier' ? facts.score : NaN;
        expect(score / (expected.get(place(row, column)) ?? NaN)).toBeCloseTo(1, 11);
      }
    });
  }

  it('say nothing of figures that are in order', () => {
    expect(told(steady('Aldren'))).toEqual([]);
  });

  it('name an empty cell and a year without a row', () => {
    const rows = changed(steady('Aldren'), 2013, 3, NaN).filter(([, year]) => year !== 2016);
    expect(told(rows)).toEqual(['Aldren 2013 1 missing', 'Aldren 2016 null year-gap']);
  });

  it('name a negative book equity, and market value or capex of 0 and below, but no book equity of 0', () => {
    const panel = panelOf([
      ['Aldren', 2010, 0, 0, 0],
      ['Aldren', 2011, -1, -2, -3],
    ]);
    const signs = flagsOf(panel).filter(({ facts }) => facts.code === 'sign');
    expect(signs.map(({ year, column }) => [year, column])).toEqual([
      [2010, 0],
      [2010, 1],
      [2011, 0],
      [2011, 1],
      [2011, 2],
    ]);
  });

  it('see a figure a thousand times too large as one slip and not as two jumps besides', () => {
    const slipped = steady('Aldren').map((row): Row => {
      const [company, year, value, capex, equity] = row;
      return year === 2014 ? [company, year, value * 1000, capex, equity] : row;
    });
    expect(told(slipped)).toEqual(['Aldren 2014 0 unit-slip']);
    const { facts } = flagsOf(panelOf(slipped))[0];
    expect(facts).toEqual(
      jasmine.objectContaining<FlagFacts>({
        code: 'unit-slip',
        factor: 1000,
        isTooLarge: true,
        against: 'own-years',
      }),
    );
  });

  it('see a figure of a millionth as a slip downwards', () => {
    const slipped = changed(steady('Aldren'), 2015, 4, 0.00055);
    const [flag] = flagsOf(panelOf(slipped));
    expect(flag.facts).toEqual(
      jasmine.objectContaining<FlagFacts>({
        code: 'unit-slip',
        factor: 1_000_000,
        isTooLarge: false,
      }),
    );
  });

  it('see a company’s whole column in another unit by its ratio to the others', () => {
    const names = ['Aldren', 'Brovik', 'Cestra', 'Dunmere', 'Elvane', 'Fenwold'];
    const rows = names.flatMap((name, place) => steady(name, 1 + place));
    const slip = (cell: 2 | 3 | 4): string[] => [
      ...new Set(
        flagsOf(
          panelOf(
            rows.map((row): Row => {
              const copy: [string, number, number, number, number] = [...row];
              if (row[0] === 'Cestra') copy[cell] *= 1000;
              return copy;
            }),
          ),
        ).map(({ company, column, facts }) => `${company} ${String(column)} ${facts.code}`),
      ),
    ];
    expect(slip(2)).toEqual(['Cestra 0 unit-slip']);
    expect(slip(3)).toEqual(['Cestra 1 unit-slip']);
    expect(slip(4)).toEqual(['Cestra 2 unit-slip']);
  });

  it('see last year’s figures copied, a whole row or one long figure, but no short one', () => {
    const rows = steady('Aldren');
    const last = rows[4];
    const copied = rows.map((row, place): Row =>
      place === 5 ? [row[0], row[1], last[2], last[3], last[4]] : row,
    );
    expect(told(copied).filter((text) => text.endsWith('stale-copy'))).toEqual([
      'Aldren 2015 0 stale-copy',
      'Aldren 2015 1 stale-copy',
      'Aldren 2015 2 stale-copy',
    ]);
    const long = changed(changed(rows, 2014, 3, 45.12), 2015, 3, 45.12);
    expect(told(long)).toContain('Aldren 2015 1 stale-copy');
    const short = changed(changed(rows, 2014, 3, 50), 2015, 3, 50);
    expect(told(short)).not.toContain('Aldren 2015 1 stale-copy');
  });

  it('do not depend on the order of rows', () => {
    const rows = [...changed(steady('Brovik'), 2013, 2, 100_000), ...steady('Aldren', 3)];
    expect(told([...rows].reverse())).toEqual(told(rows));
    expect(told(rows).length).toBeGreaterThan(0);
  });
});
