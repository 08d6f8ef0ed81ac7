import type { PlanOutlook } from '@contract';
import type { SensitivityRow } from '@figures';
import {
  type PredictionBasis,
  type SensitivityEnd,
  type TQuantile,
  sensitivity,
} from '@prediction';
import type { NumberFormat } from '../../ui/number-format';
import { lagText } from '../../ui/phrases';
import { capitalised } from '../../ui/plan/plan-words';
import { regressorKind } from '../../ui/plan/regressor-labels';
import { boundsOf, familiarRemark } from './result-words';

export type SensitivityRows =
  { readonly rows: readonly SensitivityRow[] } | { readonly rows: null; readonly reason: string };

/** The inputs of one planned year over the peers' spread, the one that moves most first; or why there are none. */
export function sensitivityRows(
  basis: PredictionBasis,
  read: { readonly year: number; readonly regressors: readonly number[] },
  outlook: PlanOutlook,
  words: { readonly labels: readonly string[]; readonly numbers: NumberFormat },
  tQuantile: TQuantile,
): SensitivityRows {
  const { start, yearEffect } = outlook;
  const found = sensitivity(basis, { ...read, start, yearEffect }, tQuantile);
  if (found.regressors === null) return { rows: null, reason: found.reason };
  return {
    rows: found.regressors.map(({ index, low, high }) => {
      const kind = regressorKind(index);
      const digits = words.numbers.columnDigits([low.value, high.value], kind);
      const end = (at: SensitivityEnd) => ({
        at: words.numbers.figure(at.value, kind, digits),
        remark: familiarRemark(at.familiar),
        ...(at.expected === null
          ? { expected: null, reason: at.reason }
          : { expected: boundsOf(at.expected) }),
      });
      return {
        name: capitalised(words.labels[index]) + lagText(basis.lag),
        low: end(low),
        high: end(high),
      };
    }),
  };
}

/** `Capex moves the expected value of FY2028 most: 2,540 at the peers’ 10th percentile, 3,100 at their 90th`. */
export function sensitivityFinding(
  [first]: readonly SensitivityRow[],
  year: number,
  numbers: NumberFormat,
): string {
  const [low, high] = [first.low, first.high].map(({ expected }) =>
    expected === null ? 'n/a' : numbers.headline(expected.estimate),
  );
  return `${first.name} moves the expected value of FY${year} most: ${low} at the peers’ 10th percentile, ${high} at their 90th`;
}
