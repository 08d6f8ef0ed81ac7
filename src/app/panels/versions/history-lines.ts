import type { CellHistoryReply } from '@contract';
import { unitText } from '@figures';

type Entry = CellHistoryReply['entries'][number];

/** What changed about a cell that is no figure, a line each: the header of its column, and the unit of money. */
export function historyLines(entries: readonly Entry[], isMoney: boolean): readonly string[] {
  return entries.flatMap((entry, index) => {
    const before = entries.at(index - 1);
    if (index === 0 || before === undefined) return [];
    const [was, is] = [unitOf(before), unitOf(entry)];
    const isRenamed =
      before.header !== null && entry.header !== null && before.header !== entry.header;
    return [
      ...(isMoney && was !== is
        ? [`v${entry.number} is in ${is}, what came before in ${was}.`]
        : []),
      ...(isRenamed
        ? [`The column “${before.header}” is called “${entry.header}” from v${entry.number} on.`]
        : []),
    ];
  });
}

export function unitOf({ currency, unit }: Pick<Entry, 'currency' | 'unit'>): string {
  return unitText(currency, unit);
}
