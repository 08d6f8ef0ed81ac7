import { expectDigits } from '../testing/expect-digits';
import { randomNumbers } from '../testing/random-panels';
import { blockedQr } from './blocked-qr';
import { householderQr } from './householder';
import { leastSquares } from './least-squares';

/** More rows than two blocks and a half. */
const rows = 700;

function randomColumns(count: number): Float64Array[] {
  const random = randomNumbers(11);
  return Array.from({ length: count }, () =>
    Float64Array.from({ length: rows }, () => random() - 0.5),
  );
}

describe('blockedQr', () => {
  it('gives the R of one factorisation of all rows, and what it leaves of the outcome', () => {
    const [first, second, third, outcome] = randomColumns(4);
    const { r, head, restSquares } = blockedQr([first, second, third], outcome);
    const whole = householderQr([first, second, third, outcome]).r;
    for (let k = 0; k < 3; k += 1) {
      for (let l = k; l < 3; l += 1) {
        expectDigits(Math.abs(r[k * 3 + l]), Math.abs(whole[k * 4 + l]), 13, `R ${k} ${l}`);
      }
      expectDigits(Math.abs(head[k]), Math.abs(whole[k * 4 + 3]), 13, `Q'y ${k}`);
    }
    expectDigits(restSquares, whole[15] ** 2, 13);
  });

  it('takes columns that are zero throughout or until a late block', () => {
    const [first, late, outcome] = randomColumns(3);
    late.fill(0, 0, 600);
    const { r } = blockedQr([first, new Float64Array(rows), late], outcome);
    const lateWhole = householderQr([first, late]).r;
    expect([r[1], r[4]]).toEqual([0, 0]);
    expectDigits(Math.hypot(r[5], r[8]), Math.abs(lateWhole[3]), 13);
  });

  it('leaves columns and outcome as they are', () => {
    const columns = randomColumns(3);
    const before = columns.map((column) => column.slice());
    blockedQr(columns.slice(0, 2), columns[2]);
    expect(columns).toEqual(before);
  });
});

describe('leastSquares of many rows', () => {
  it('keeps its digits where squares of the columns leave the range of a double', () => {
    const [first, second, outcome] = randomColumns(3);
    const plain = leastSquares([first, second], outcome);
    for (const size of [2 ** 600, 2 ** -600]) {
      const sized = leastSquares([first.map((value) => size * value), second], outcome);
      expectDigits(size * sized.coefficients[0], plain.coefficients[0], 14);
      expectDigits(sized.coefficients[1], plain.coefficients[1], 14);
      expectDigits(sized.residualSquares, plain.residualSquares, 14);
    }
  });
});
