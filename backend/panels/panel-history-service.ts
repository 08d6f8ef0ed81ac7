import type { RowInVersion } from '../../db/repositories/panel-corrections-repository';
import type { RowKey } from '../../db/repositories/panel-copies-repository';
import type { DifferingRow } from '../../db/repositories/panel-differences-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { Invalid, NotFound } from '../errors/app-error';
import {
  isSameColumn,
  type MatchedColumn,
  matchedColumns,
  type PanelColumn,
  type PanelDifference,
  type PanelDifferences,
} from '../panel-data';
import { findPanelVersion } from './find-panel-version';

/** What two versions hold that is not the same, and what each calls what it holds. */
export interface VersionDifferences extends PanelDifferences {
  /** As the later version has them. */
  readonly columns: readonly PanelColumn[];
  /** Columns of the model that the two call otherwise. */
  readonly renamed: readonly {
    readonly role: PanelColumn['role'];
    readonly before: string;
    readonly after: string;
  }[];
  /** What the money of both is given in: the later one's; null where their currencies differ. */
  readonly money: Pick<PanelVersionRow, 'currency' | 'unit'> | null;
}

/** A version in which a cell is other than in the version before. */
export interface CellEntry {
  readonly version: PanelVersionRow;
  readonly value: number | null;
  readonly hasRow: boolean;
  /** Header of the cell's column; null where the version does not have it. */
  readonly header: string | null;
  /** Of a correction; null of any other change. */
  readonly reason: string | null;
  readonly source: string | null;
}

const mostListed = 5000;

/** What changed between the versions of a panel. */
export class PanelHistoryService {
  constructor(private readonly repositories: Repositories) {}

  /**
   * From the first to the second; of one currency, the money of the first is counted in the second's unit.
   *
   * @throws {NotFound}, also for versions of different panels.
   */
  async differences(
    workspaceId: string,
    versionId: string,
    otherId: string,
  ): Promise<VersionDifferences> {
    return this.repositories.inWorkspace(workspaceId, (tx) =>
      differencesBetween(tx, versionId, otherId),
    );
  }

  /**
   * One cell through all versions of the panel, the first one first; a column of the model is found by what it is to it,
   * a further one by its header.
   *
   * @param column  position among the columns of the version that is named.
   * @throws {NotFound}; {Invalid} for a column that the version does not have.
   */
  async ofCell(
    workspaceId: string,
    versionId: string,
    { column, ...key }: RowKey & { readonly column: number },
  ): Promise<readonly CellEntry[]> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const { panelId, columns } = await findPanelVersion(tx, versionId);
      if (column >= columns.length)
        throw new Invalid(
          `Expected one of ${columns.length} columns, counted from 0; found ${column}.`,
        );
      const rows = await tx.panelCorrections.rowInVersions(panelId, key);
      const rowOf = new Map(rows.map((row) => [row.panelVersionId, row]));
      const versions = await tx.panels.versionsOfPanel(panelId);
      const asked = columns[column];
      const entries = versions.map((version) => entryOf(version, rowOf.get(version.id), asked));
      return changesOf(entries, asked.role !== 'other');
    });
  }
}

/** From the first version to the second. @throws {NotFound}, also for versions of different panels. */
export async function differencesBetween(
  tx: WorkspaceRepositories,
  versionId: string,
  otherId: string,
): Promise<VersionDifferences> {
  const before = await findPanelVersion(tx, versionId);
  const after = await findPanelVersion(tx, otherId);
  if (before.panelId !== after.panelId)
    throw new NotFound('These two versions are of different panels.');
  const matched = matchedColumns(before.columns, after.columns);
  const shift = unitShift(before, after);
  const { first, ...counts } = await tx.panelDifferences.between(
    before.id,
    after.id,
    matched.map(({ column, ...places }) => ({
      ...places,
      shift: column.role === 'other' ? 0 : shift,
    })),
    mostListed,
  );
  const listed = first.flatMap((row) => differencesOf(row, matched));
  const { currency, unit } = after;
  return {
    ...counts,
    listed: listed.slice(0, mostListed),
    columns: matched.map(({ column }) => column),
    renamed: matched.flatMap((column) => renameOf(column, before)),
    money: before.currency === currency ? { currency, unit } : null,
  };
}

const unitPowers = { units: 0, thousands: 3, millions: 6, billions: 9 } as const;

/** Power of ten that turns money of the one version into the other's unit; 0 where the currencies differ. */
function unitShift(before: PanelVersionRow, after: PanelVersionRow): number {
  return before.currency === after.currency ? unitPowers[before.unit] - unitPowers[after.unit] : 0;
}

function renameOf(
  { column, before, after }: MatchedColumn,
  { columns }: PanelVersionRow,
): VersionDifferences['renamed'] {
  if (before === null || after === null || columns[before].name === column.name) return [];
  return [{ role: column.role, before: columns[before].name, after: column.name }];
}

function differencesOf(
  row: DifferingRow,
  columns: readonly MatchedColumn[],
): readonly PanelDifference[] {
  const { company, year, before, after, isChanged } = row;
  const whole = { company, year, column: null, before: null, after: null };
  if (before === null) return [{ ...whole, kind: 'added-row' }];
  if (after === null) return [{ ...whole, kind: 'removed-row' }];
  return columns.flatMap(({ column }, at) => {
    const cell = { company, year, column: column.name, before: before[at], after: after[at] };
    return isChanged[at] ? [{ ...cell, kind: 'changed-cell' as const }] : [];
  });
}

function entryOf(
  version: PanelVersionRow,
  row: RowInVersion | undefined,
  asked: PanelColumn,
): CellEntry {
  const column = version.columns.findIndex((other) => isSameColumn(other, asked));
  const made = row?.corrections.find(({ columnIndex }) => columnIndex === column);
  return {
    version,
    value: row?.cells[column] ?? null,
    hasRow: row !== undefined,
    header: column === -1 ? null : version.columns[column].name,
    reason: made?.reason ?? null,
    source: made?.source ?? null,
  };
}

/**
 * Those that differ from the one before, in the value or in how it is to be read; before the first version there is no
 * row.
 */
function changesOf(entries: readonly CellEntry[], isMoney: boolean): readonly CellEntry[] {
  return entries.filter((entry, index) => {
    if (index === 0) return entry.hasRow;
    const before = entries[index - 1];
    if (entry.value !== before.value || entry.hasRow !== before.hasRow) return true;
    return (
      entry.hasRow && (entry.header !== before.header || (isMoney && !isInOneUnit(entry, before)))
    );
  });
}

function isInOneUnit({ version }: CellEntry, before: CellEntry): boolean {
  return version.unit === before.version.unit && version.currency === before.version.currency;
}
