import type { DismissFlag, FlagDismissal } from '@contract';
import type { Flag } from '@panel-data';

export interface DismissedFlag {
  readonly flag: Flag;
  readonly dismissal: FlagDismissal;
}

export interface SortedFlags {
  /** To look at. */
  readonly open: readonly Flag[];
  /** Looked at, and right as they are. */
  readonly dismissed: readonly DismissedFlag[];
}

/** Sorts the flags by whether somebody found them right; that holds while the cell has the value it had then. */
export function sortedFlags(
  flags: readonly Flag[],
  dismissals: readonly FlagDismissal[],
): SortedFlags {
  const known = new Map(dismissals.map((each) => [keyOf(each), each]));
  const open: Flag[] = [];
  const dismissed: DismissedFlag[] = [];
  for (const flag of flags) {
    const dismissal = known.get(keyOf({ ...flag, code: flag.facts.code }));
    if (dismissal === undefined) open.push(flag);
    else dismissed.push({ flag, dismissal });
  }
  return { open, dismissed };
}

export function dismissalOf(flag: Flag, reason: string): DismissFlag {
  const { company, year, column, value, facts } = flag;
  return { company, year, column, code: facts.code, value, reason };
}

function keyOf(flag: Pick<DismissFlag, 'company' | 'year' | 'column' | 'code' | 'value'>): string {
  return [flag.code, flag.year, flag.column, flag.value, flag.company].join('\u0000');
}
