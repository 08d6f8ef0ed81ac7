import * as fc from 'fast-check';
import type { PanelRow } from './golden-panels';

export const randomPanelNames = { outcome: 'y', regressors: ['x', 'z'] };

/** A linear congruential generator: the same numbers for the same seed. */
export function randomNumbers(seed: number): () => number {
  let state = seed;
  const next = (): number => {
    state = (state * 1103515245 + 12345) % 2147483648;
    return state / 2147483648;
  };
  for (let warm = 0; warm < 5; warm += 1) next();
  return next;
}

/** Panels of 3 to 6 companies and 6 to 9 years, some rows missing, figures of the size of a balance sheet. */
export const randomPanels = fc
  .record({
    companies: fc.integer({ min: 3, max: 6 }),
    years: fc.integer({ min: 6, max: 9 }),
    seed: fc.integer({ min: 1, max: 1e6 }),
  })
  .map(({ companies, years, seed }) => {
    const random = randomNumbers(seed);
    const rows: PanelRow[] = [];
    for (let company = 0; company < companies; company += 1) {
      for (let year = 0; year < years; year += 1) {
        const regressors = [100 * random() * (company + 1), 50 * random()];
        const outcome = 1000 * company + 2 * regressors[0] - regressors[1] + 40 * random();
        if (year < 4 || random() > 0.15) {
          rows.push({ company: `K${company}`, year: 2000 + year, outcome, regressors });
        }
      }
    }
    return rows;
  });
