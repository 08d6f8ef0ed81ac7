import type { PanelCells } from '../panel-cells';
import { goldenPanel, goldenPanelData, modelColumns, panelOf } from '../testing/golden-panel';
import { duplicateFlags } from './duplicate-flags';
import { duplicateNameFlags } from './duplicate-name-flags';
import { flagGround } from './flag-ground';
import { flagsOf } from './flags-of';

function copiedPanel(): PanelCells {
  const panel = goldenPanel('grunfeld10');
  const values = panel.values.map((cells) => Float64Array.from(cells));
  const rowOf = (company: string, year: number): number =>
    Array.from(panel.year).findIndex(
      (at, row) => at === year && panel.companies[panel.company[row]] === company,
    );
  const place = (role: string): number => modelColumns.findIndex((column) => column.role === role);
  const { copies, emptied } = goldenPanelData.duplicates;
  for (const { year, from, to, columns } of copies)
    for (const column of columns)
      values[place(column)][rowOf(to, year)] = values[place(column)][rowOf(from, year)];
  for (const { company, year, column } of emptied)
    values[place(column)][rowOf(company, year)] = NaN;
  return { ...panel, values };
}

describe('figures that are another company’s', () => {
  it('are those that R finds by holding every row against every other', () => {
    const panel = copiedPanel();
    const found = new Map<string, { other: string; more: number; columns: readonly string[] }>();
    for (const { row, column, facts } of duplicateFlags(flagGround(panel))) {
      if (facts.code !== 'duplicate' || facts.of !== 'figures')
        throw new Error(`expected a duplicate; found ${facts.code}`);
      const key = `${panel.companies[panel.company[row]]} ${panel.year[row]}`;
      const columns = [...(found.get(key)?.columns ?? []), modelColumns[column].role];
      expect(columns.length).toBeLessThanOrEqual(facts.columns);
      found.set(key, { other: facts.company, more: facts.more, columns });
    }
    const golden = goldenPanelData.duplicates.found.map(
      ({ company, year, other, more, columns }) =>
        [`${company} ${year}`, { other, more, columns: columns.map(String) }] as const,
    );
    expect(golden.length).toBe(7);
    expect(Object.fromEntries(found)).toEqual(Object.fromEntries(golden));
  });

  it('are none in the panel as it was published', () => {
    expect(duplicateFlags(flagGround(goldenPanel('grunfeld10')))).toEqual([]);
  });

  it('are none where two companies share one figure, zeros or another year’s', () => {
    const rows: Parameters<typeof panelOf>[0] = [
      ['Aldren', 2010, 12.5, 0, 0],
      ['Brovik', 2010, 12.5, 0, 0],
      ['Cestra', 2010, 40, 7, 9],
      ['Dunmere', 2011, 40, 7, 9],
      ['Elvane', 2010, 40, 7, 11],
    ];
    expect(duplicateFlags(flagGround(panelOf(rows)))).toEqual([]);
  });

  it('are told of both rows, cell by cell, in the order in which flags are told', () => {
    const panel = panelOf([
      ['Brovik', 2010, 40, 7, 9],
      ['Aldren', 2010, 40, 7, NaN],
    ]);
    expect(
      flagsOf(panel).map(({ company, column, facts }) => [company, column, facts.code]),
    ).toEqual([
      ['Aldren', 0, 'duplicate'],
      ['Aldren', 1, 'duplicate'],
      ['Aldren', 2, 'missing'],
      ['Brovik', 0, 'duplicate'],
      ['Brovik', 1, 'duplicate'],
    ]);
  });

  it('are looked for in 200,000 rows in little time', () => {
    const rows = 200_000;
    const company = Int32Array.from({ length: rows }, (_, row) => Math.floor(row / 20));
    const panel: PanelCells = {
      companies: Array.from({ length: rows / 20 }, (_, code) => `Company ${code}`),
      company,
      year: Int32Array.from({ length: rows }, (_, row) => 2000 + (row % 20)),
      columns: modelColumns,
      values: [1, 2, 3].map((step) =>
        Float64Array.from({ length: rows }, (_, row) => row * step + 0.5),
      ),
    };
    const ground = flagGround(panel);
    const start = performance.now();
    expect(duplicateFlags(ground)).toEqual([]);
    expect(performance.now() - start).toBeLessThan(8000);
  });
});

describe('names that may be one company’s', () => {
  function flagged(spans: readonly { company: string; first: number; last: number }[]): string[] {
    const rows = spans.flatMap(({ company, first, last }) =>
      [first, last].map((year): [string, number, number, number, number] => [
        company,
        year,
        1,
        1,
        1,
      ]),
    );
    return duplicateNameFlags(flagGround(panelOf(rows))).map(({ company, year, column, facts }) => {
      if (facts.code !== 'duplicate') throw new Error(`expected a duplicate; found ${facts.code}`);
      return [company, year, column, facts.of, facts.company, facts.more].join(' | ');
    });
  }

  it('are those that R finds by spelling and years', () => {
    const { spans, pairs } = goldenPanelData.nearNames;
    const first = new Map(spans.map((span) => [span.company, span.first]));
    const told = (company: string, other: string): string =>
      [company, first.get(company), null, 'name', other, 0].join(' | ');
    expect(pairs.length).toBe(3);
    expect(flagged(spans).sort()).toEqual(
      pairs.flatMap(([one, other]) => [told(one, other), told(other, one)]).sort(),
    );
  });

  it('follow on each other without a gap, or overlap', () => {
    const nordwerk = { company: 'Nordwerk AG', first: 2001, last: 2004 };
    const of = (first: number, last: number): number =>
      flagged([nordwerk, { company: 'nordwerk', first, last }]).length;
    expect(of(2005, 2009)).toBe(2);
    expect(of(1990, 2000)).toBe(2);
    expect(of(2006, 2009)).toBe(0);
    expect(of(1990, 1999)).toBe(0);
  });

  it('are told beside the one with the most rows, and how many more there are', () => {
    const panel = panelOf([
      ['Nordwerk AG', 2001, 1, 1, 1],
      ['NORDWERK', 2001, 1, 1, 1],
      ['NORDWERK', 2002, 1, 1, 1],
      ['Nord Werk', 2002, 1, 1, 1],
      ['Werk, Nord', 2002, 1, 1, 1],
      ['nordwerk ag', 2003, 1, 1, 1],
    ]);
    const found = duplicateNameFlags(flagGround(panel));
    expect(found.find(({ company }) => company === 'Nordwerk AG')?.facts).toEqual({
      code: 'duplicate',
      of: 'name',
      company: 'NORDWERK',
      more: 2,
    });
    expect(found.find(({ company }) => company === 'NORDWERK')?.facts).toEqual(
      jasmine.objectContaining({ company: 'Nord Werk', more: 3 }),
    );
  });
});
