import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenRows } from '../testing/golden-panels';
import { leastSquares } from './least-squares';

interface Certified {
  readonly csv: string;
  readonly columns: readonly string[];
  readonly model: string;
  readonly coef: readonly number[];
  readonly se: readonly number[];
  readonly rss: number;
}

const certified = goldenJson<{ linear: Record<string, Certified> }>('nist.json').linear;

/** Digits asked of each data set; the polynomials of Filip lose 8 already when powers are rounded. */
const digits: Readonly<Record<string, number>> = {
  longley: 10,
  filip: 7,
  norris: 12,
  wampler1: 12,
  wampler2: 12,
  wampler3: 12,
  wampler4: 12,
  pontius: 11,
  noint1: 13,
  noint2: 13,
};

function design(problem: Certified): { columns: Float64Array[]; outcome: Float64Array } {
  const rows = goldenRows(`nist/${problem.csv}`);
  const column = (name: string): Float64Array =>
    Float64Array.from(rows, (row) => Number(row[name]));
  const count = problem.coef.length;
  const outcome = column('y');
  if (problem.columns.length > 1) {
    return { columns: [outcome.map(() => 1), ...problem.columns.map(column)], outcome };
  }
  const x = column('x');
  const first = problem.model.includes('no intercept') ? 1 : 0;
  const columns = Array.from({ length: count }, (_, power) =>
    x.map((value) => value ** (power + first)),
  );
  return { columns, outcome };
}

describe('leastSquares', () => {
  for (const [name, problem] of Object.entries(certified)) {
    it(`reproduces the certified coefficients of ${name} to ${digits[name]} digits`, () => {
      const { columns, outcome } = design(problem);
      const { coefficients, residuals } = leastSquares(columns, outcome);
      problem.coef.forEach((expected, k) => {
        expectDigits(coefficients[k], expected, digits[name], `coefficient ${k}`);
      });
      const squares = residuals.reduce((sum, value) => sum + value * value, 0);
      if (problem.rss > 0)
        expectDigits(squares, problem.rss, Math.min(digits[name], 9), 'residuals');
      else expect(squares).toBeLessThan(1e-18);
    });
  }

  it('returns an orthonormal basis and the R that leads back to the columns', () => {
    const columns = [Float64Array.of(1, 2, 3, 5), Float64Array.of(1e6, -3e6, 2e6, 7e6)];
    const { basis, r } = leastSquares(columns, Float64Array.of(1, 0, 0, 0));
    const product = (left: Float64Array, right: Float64Array): number =>
      left.reduce((sum, value, row) => sum + value * right[row], 0);
    expect(product(basis[0], basis[0])).toBeCloseTo(1, 14);
    expect(product(basis[1], basis[1])).toBeCloseTo(1, 14);
    expect(product(basis[0], basis[1])).toBeCloseTo(0, 14);
    columns[1].forEach((value, row) => {
      expectDigits(basis[0][row] * r[1] + basis[1][row] * r[3], value, 14);
    });
  });
});
