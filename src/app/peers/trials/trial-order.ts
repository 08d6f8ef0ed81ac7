import type { TrialChange } from './trial-changes';

/** By what a table of changes is ordered: a column, or the change of a slope by its place. */
export type TrialOrderKey = 'company' | 'standing' | 'change' | `slope-${number}`;

export interface TrialOrder {
  readonly by: TrialOrderKey;
  readonly isDescending: boolean;
}

/** What moves the standing most stands first. */
export const largestFirst: TrialOrder = { by: 'change', isDescending: true };

/** The order after a column's header was pressed: turned round where it was ordered by it already. */
export function pressed(order: TrialOrder, by: TrialOrderKey): TrialOrder {
  if (order.by === by) return { by, isDescending: !order.isDescending };
  return { by, isDescending: by !== 'company' };
}

/** Changes go by their size whichever way they point; what has no figure stands last in either direction. */
export function ordered(
  changes: readonly TrialChange[],
  { by, isDescending }: TrialOrder,
): readonly TrialChange[] {
  const sign = isDescending ? -1 : 1;
  const byName = (a: TrialChange, b: TrialChange): number =>
    a.company.localeCompare(b.company, 'en');
  if (by === 'company') return [...changes].sort((a, b) => sign * byName(a, b));
  return [...changes].sort((a, b) => {
    const [left, right] = [valueOf(a, by), valueOf(b, by)];
    if (left === null || right === null)
      return Number(left === null) - Number(right === null) || byName(a, b);
    return sign * (left - right) || byName(a, b);
  });
}

function valueOf(change: TrialChange, by: Exclude<TrialOrderKey, 'company'>): number | null {
  if (by === 'standing') return change.standing?.estimate ?? null;
  const moved =
    by === 'change' ? change.change : (change.slopes.at(Number(by.slice(6)))?.change ?? null);
  return moved === null ? null : Math.abs(moved);
}
