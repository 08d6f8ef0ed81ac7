import type { Flag, FlagCode } from '@panel-data';
import type { PanelRow } from '../panel-rows';
import { type PanelEdits, type RowPlace, cellKey, rowKey } from './panel-edits';

/** Which rows the grid shows. */
export type RowFilter = 'all' | 'gaps' | 'edited' | FlagCode;

/** Flags of the panel by cell key. */
export type CellFlags = ReadonlyMap<string, readonly Flag[]>;

export const flagNames: Readonly<Record<FlagCode, string>> = {
  missing: 'missing',
  duplicate: 'same as another company',
  sign: 'sign',
  'unit-slip': 'unit slip',
  'stale-copy': 'same as the year before',
  jump: 'jump',
  'peer-outlier': 'far from its peers',
  'year-gap': 'year without a row',
};

/** The flags of cells, by how many cells have each; a year without a row has no cell. */
export function flagCounts(flags: CellFlags): ReadonlyMap<FlagCode, number> {
  const counts = new Map<FlagCode, number>();
  for (const list of flags.values())
    for (const code of new Set(list.map(({ facts }) => facts.code)))
      if (code !== 'year-gap') counts.set(code, (counts.get(code) ?? 0) + 1);
  return counts;
}

/**
 * The rows to show. A row with an edit stays whatever is chosen: it must not vanish under the hands that mend it.
 *
 * @param rows  as they would be saved.
 */
export function filteredRows(
  rows: readonly PanelRow[],
  filter: RowFilter,
  { edits, flags }: { readonly edits: PanelEdits; readonly flags: CellFlags },
): readonly PanelRow[] {
  if (filter === 'all') return rows;
  const kept = editedKeys(edits);
  if (filter !== 'gaps' && filter !== 'edited')
    for (const list of flags.values())
      for (const flag of list) if (flag.facts.code === filter) kept.add(rowKey(flag));
  return rows.filter(
    (row) => (filter === 'gaps' && row.values.includes(null)) || kept.has(rowKey(row)),
  );
}

function editedKeys({ cells, added }: PanelEdits): Set<string> {
  return new Set([...added.keys(), ...[...cells.values()].map(({ place }) => rowKey(place))]);
}

/** The flags of a cell; none for company, year and line. */
export function flagsAt(
  flags: CellFlags,
  row: RowPlace,
  column: number | undefined,
): readonly Flag[] {
  return column === undefined
    ? []
    : (flags.get(cellKey({ company: row.company, year: row.year, column })) ?? []);
}
