import type { RowInVersion } from '../../db/repositories/panel-corrections-repository';
import type { RowKey } from '../../db/repositories/panel-copies-repository';
import type { DifferingRow } from '../../db/repositories/panel-differences-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { Invalid, NotFound } from '../errors/app-error';
import type { PanelDifference, PanelDifferences } from '../panel-data';
import { findPanelVersion } from './find-panel-version';

/** A version in which a cell is other than in the version before. */
export interface CellEntry {
  readonly version: PanelVersionRow;
  readonly value: number | null;
  readonly hasRow: boolean;
  /** Of a correction; null of any other change. */
  readonly reason: string | null;
  readonly source: string | null;
}

const mostListed = 5000;

/** What changed between the versions of a panel. */
export class PanelHistoryService {
  constructor(private readonly repositories: Repositories) {}

  /** From the first to the second. @throws {NotFound}, also for versions of different panels. */
  async differences(
    workspaceId: string,
    versionId: string,
    otherId: string,
  ): Promise<PanelDifferences> {
    return this.repositories.inWorkspace(workspaceId, (tx) =>
      differencesBetween(tx, versionId, otherId),
    );
  }

  /**
   * One cell through all versions of the panel, the first one first; columns are found by their header.
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
      const { name } = columns[column];
      return changesOf(versions.map((version) => entryOf(version, rowOf.get(version.id), name)));
    });
  }
}

/** From the first version to the second. @throws {NotFound}, also for versions of different panels. */
export async function differencesBetween(
  tx: WorkspaceRepositories,
  versionId: string,
  otherId: string,
): Promise<PanelDifferences> {
  const before = await findPanelVersion(tx, versionId);
  const after = await findPanelVersion(tx, otherId);
  if (before.panelId !== after.panelId)
    throw new NotFound('These two versions are of different panels.');
  const headers = headersOf(before, after);
  const { first, ...counts } = await tx.panelDifferences.between(
    { id: versionId, positions: positionsOf(before, headers) },
    { id: otherId, positions: positionsOf(after, headers) },
    mostListed,
  );
  const listed = first.flatMap((row) => differencesOf(row, headers));
  return { ...counts, listed: listed.slice(0, mostListed) };
}

/** Columns are matched by header; one that a version does not have counts as missing in all of its rows. */
function headersOf(before: PanelVersionRow, after: PanelVersionRow): readonly string[] {
  return [...new Set([...after.columns, ...before.columns].map(({ name }) => name))];
}

function positionsOf(
  { columns }: PanelVersionRow,
  headers: readonly string[],
): readonly (number | null)[] {
  const names = columns.map(({ name }) => name);
  return headers.map((header) => (names.includes(header) ? names.indexOf(header) : null));
}

function differencesOf(row: DifferingRow, headers: readonly string[]): readonly PanelDifference[] {
  const { company, year, before, after } = row;
  const whole = { company, year, column: null, before: null, after: null };
  if (before === null) return [{ ...whole, kind: 'added-row' }];
  if (after === null) return [{ ...whole, kind: 'removed-row' }];
  return headers.flatMap((column, at) => {
    const cell = { company, year, column, before: before[at], after: after[at] };
    return cell.before === cell.after ? [] : [{ ...cell, kind: 'changed-cell' as const }];
  });
}

function entryOf(
  version: PanelVersionRow,
  row: RowInVersion | undefined,
  columnName: string,
): CellEntry {
  const column = version.columns.findIndex(({ name }) => name === columnName);
  const made = row?.corrections.find(({ columnIndex }) => columnIndex === column);
  return {
    version,
    value: row?.cells[column] ?? null,
    hasRow: row !== undefined,
    reason: made?.reason ?? null,
    source: made?.source ?? null,
  };
}

/** Those that differ from the one before; before the first version there is no row. */
function changesOf(entries: readonly CellEntry[]): readonly CellEntry[] {
  return entries.filter((entry, index) => {
    const before = index === 0 ? { value: null, hasRow: false } : entries[index - 1];
    return entry.value !== before.value || entry.hasRow !== before.hasRow;
  });
}
