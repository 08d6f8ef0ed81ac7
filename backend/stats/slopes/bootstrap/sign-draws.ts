import { StatsError } from '../../stats-error';
import { randomWords, seededWords } from '../../prediction';

/** With so few companies every sign vector is looked at. */
export const mostEnumerated = 12;

/** Random sign vectors, with more companies. */
export const randomDraws = 9999;

/** The sign vectors of a bootstrap. */
export interface SignDraws {
  readonly count: number;
  /** Writes the next vector, −1 or 1 a company. */
  readonly next: (signs: Int8Array) => void;
  /** The p value of so many draws that are as far out as the data. */
  readonly pValue: (count: number) => number;
  /** The smallest p value there is. */
  readonly smallest: number;
}

/**
 * All sign vectors for up to 12 companies, the data's own among them, and 9,999 seeded ones for more, to which the data's
 * own is added. A vector and its opposite give the same |t|, so the first company keeps its sign: 2^(N − 1) vectors are all.
 *
 * @throws {StatsError} 'specification' where draws need a seed and have none.
 */
export function signDraws(companies: number, seed: number | null): SignDraws {
  if (companies <= mostEnumerated) return everyVector(companies);
  if (seed === null) throw new StatsError('specification', 'expected a seed for the draws');
  const word = randomWords(seededWords(seed));
  return {
    count: randomDraws,
    next: (signs) => {
      let bits = 0;
      for (let company = 0; company < companies; company += 1) {
        // A fresh word for every 32 companies; each of its bits is a sign.
        if (company % 32 === 0) bits = word();
        signs[company] = bits & 1 ? -1 : 1;
        bits >>>= 1;
      }
    },
    pValue: (count) => (1 + count) / (1 + randomDraws),
    smallest: 1 / (1 + randomDraws),
  };
}

function everyVector(companies: number): SignDraws {
  const count = 2 ** (companies - 1);
  let vector = 0;
  return {
    count,
    next: (signs) => {
      signs[0] = 1;
      for (let company = 1; company < companies; company += 1) {
        signs[company] = (vector >>> (company - 1)) & 1 ? -1 : 1;
      }
      vector += 1;
    },
    pValue: (outlying) => outlying / count,
    smallest: 1 / count,
  };
}
