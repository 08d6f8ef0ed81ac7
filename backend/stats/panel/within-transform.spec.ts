import { fTest } from '../regression/goodness';
import { sumOfSquares } from '../regression/sum-of-squares';
import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenRows } from '../testing/golden-panels';
import { withinTransform } from './within-transform';

interface Anova {
  readonly csv: string;
  readonly F: number;
  readonly df_between: number;
  readonly df_within: number;
}

/** Data about 1e6 and 1e12 lose 6 and 12 of their 16 digits before any program sees them. */
const digits: Readonly<Record<string, number>> = {
  SiRstv: 12,
  SmLs01: 12,
  AtmWtAg: 8,
  SmLs04: 8,
  SmLs07: 2,
};

describe('withinTransform', () => {
  for (const [name, golden] of Object.entries(
    goldenJson<{ anova: Record<string, Anova> }>('nist.json').anova,
  )) {
    it(`leaves the certified F of equal means of ${name} to ${digits[name]} digits`, () => {
      const rows = goldenRows(`nist/${golden.csv}`);
      const starts = [0];
      rows.forEach((row, index) => {
        if (index > 0 && row['company'] !== rows[index - 1]['company']) starts.push(index);
      });
      const column = Float64Array.from(rows, (row) => Number(row['y']));
      const ends = Int32Array.from([...starts, rows.length]);
      const { values, means, grandMean } = withinTransform(column, ends);
      let gain = 0;
      means.forEach(
        (mean, group) => (gain += (ends[group + 1] - ends[group]) * (mean - grandMean) ** 2),
      );
      const test = fTest(
        { gain, rest: sumOfSquares(values), isPerfect: false },
        golden.df_between,
        golden.df_within,
      );
      expectDigits(test.value, golden.F, digits[name]);
    });
  }

  it('makes a constant exactly zero, whatever its size', () => {
    const { values } = withinTransform(
      Float64Array.of(0.1, 0.1, 0.1, 1e9 + 0.3, 1e9 + 0.3),
      Int32Array.of(0, 3, 5),
    );
    expect(values.every((value) => value === 0)).toBeTrue();
  });
});
