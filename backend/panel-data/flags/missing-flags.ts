import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';

/** Every empty cell of a row that is there. */
export function missingFlags({ panel }: FlagGround): FlaggedCell[] {
  return panel.values.flatMap((cells, column) => {
    const found: FlaggedCell[] = [];
    for (let row = 0; row < cells.length; row++)
      if (Number.isNaN(cells[row])) found.push({ row, column, facts: { code: 'missing' } });
    return found;
  });
}
