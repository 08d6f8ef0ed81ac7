import { correlatedSquare, correlationProduct, fillYearDecays } from './correlation-product';

describe('correlationProduct', () => {
  it('equals the product with the matrix written out, also over gaps', () => {
    const year = Int32Array.of(2001, 2002, 2005, 2006, 2010);
    const values = Float64Array.of(1, -2, 3, 0.5, 7);
    for (const persistence of [0, 0.4, 0.95]) {
      const product = new Float64Array(5);
      const decays = new Float64Array(5);
      fillYearDecays(year, { from: 0, to: 5, persistence }, decays, 0);
      correlationProduct(values, { count: 5, decays }, product);
      const form = values.reduce((sum, value, row) => sum + value * product[row], 0);
      expect(correlatedSquare(values, { from: 0, to: 5, decays, centre: 0 })).toBeCloseTo(form, 11);
      const moved = values.map((value) => value + 20);
      expect(correlatedSquare(moved, { from: 0, to: 5, decays, centre: 20 })).toBeCloseTo(form, 11);
      year.forEach((left, row) => {
        const expected = year.reduce(
          (sum, right, column) => sum + persistence ** Math.abs(left - right) * values[column],
          0,
        );
        expect(product[row]).toBeCloseTo(expected, 12);
      });
    }
  });
});

describe('correlatedSquare', () => {
  it('sums the forms of companies whose rows follow each other', () => {
    const year = Int32Array.of(2001, 2002, 2005, 2000, 2001);
    const values = Float64Array.of(1, -2, 3, 0.5, 7);
    const decays = new Float64Array(5);
    fillYearDecays(year, { from: 0, to: 3, persistence: 0.4 }, decays, 0);
    fillYearDecays(year, { from: 3, to: 5, persistence: 0.9 }, decays, 3);
    const form = (from: number, to: number): number =>
      correlatedSquare(values, { from, to, decays, centre: 0 });
    expect(form(3, 5)).toBeCloseTo(0.25 + 49 + 2 * 0.9 * 3.5, 12);
    expect(form(0, 5)).toBeCloseTo(form(0, 3) + form(3, 5), 12);
  });
});
