import type { ModelRole } from '../model-role';
import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';

/** What each column of the model cannot usually be. Capital expenditure of 0 is as odd as a negative one. */
const isOdd: Readonly<Record<ModelRole, (value: number) => boolean>> = {
  marketValue: (value) => value <= 0,
  capex: (value) => value <= 0,
  bookEquity: (value) => value < 0,
};

/** Figures of the model with a sign that they rarely have. */
export function signFlags({ panel, model }: FlagGround): FlaggedCell[] {
  return (Object.keys(isOdd) as ModelRole[]).flatMap((role) => {
    const column = model[role];
    if (column === undefined) return [];
    const cells = panel.values[column];
    const found: FlaggedCell[] = [];
    for (let row = 0; row < cells.length; row++)
      if (isOdd[role](cells[row])) found.push({ row, column, facts: { code: 'sign' } });
    return found;
  });
}
