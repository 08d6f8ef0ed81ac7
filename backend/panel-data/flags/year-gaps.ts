import type { Flag } from './flag';
import type { FlagGround } from './flag-ground';

/** Years between a company's first and last in which it has no row. */
export function yearGaps({ panel, rowsOf }: FlagGround): Flag[] {
  return rowsOf.flatMap((rows, code) => {
    const found: Flag[] = [];
    for (let place = 1; place < rows.length; place++) {
      const next = panel.year[rows[place]];
      for (let year = panel.year[rows[place - 1]] + 1; year < next; year++) {
        const facts = { code: 'year-gap' } as const;
        found.push({ company: panel.companies[code], year, column: null, value: null, facts });
      }
    }
    return found;
  });
}
