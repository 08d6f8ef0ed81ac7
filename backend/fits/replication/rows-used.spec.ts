import { rowsUsed } from './rows-used';

const specification = {
  effects: 'company',
  form: 'levels',
  slopes: 'cr2',
  confidence: 0.95,
  seed: null,
} as const;
const sample = { singleRow: [] };

/** One line of the file with four years, one of them without capex. */
const columns = {
  companies: ['A'],
  company: Int32Array.of(0, 0, 0, 0),
  year: Int32Array.of(2001, 2002, 2003, 2004),
  fileRow: Int32Array.of(7, 7, 7, 7),
  outcome: { name: 'value', values: Float64Array.of(10, 11, 12, 13) },
  regressors: [{ name: 'capex', values: Float64Array.of(1, NaN, 3, 4) }],
};

const yearsUsed = (lag: 0 | 1): readonly (readonly [number, number])[] =>
  [...rowsUsed(columns, { members: ['A'], sample, specification: { ...specification, lag } })].map(
    ({ year, regressors }) => [year, regressors[0]] as const,
  );

describe('the rows that went into a fit', () => {
  it('are told apart by company and year, though they share a line of the file', () => {
    expect(yearsUsed(0)).toEqual([
      [2001, 1],
      [2003, 3],
      [2004, 4],
    ]);
  });

  it('of a lagged fit are those whose year before is there', () => {
    expect(yearsUsed(1)).toEqual([
      [2002, 1],
      [2004, 3],
    ]);
  });
});
