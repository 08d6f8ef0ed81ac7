import type { FlagDismissalRow } from '../../db/repositories/flag-dismissals-repository';
import type { CellHistoryReply, FlagCode, FlagDismissal, PanelDifferencesReply } from '../contract';
import type { PanelDifferences } from '../panel-data';
import type { CellEntry } from './panel-history-service';

export function toPanelDifferencesReply({
  listed,
  ...counts
}: PanelDifferences): PanelDifferencesReply {
  return { ...counts, listed: listed.map((difference) => ({ ...difference })) };
}

export function toCellHistoryReply(entries: readonly CellEntry[]): CellHistoryReply {
  return {
    entries: entries.map(({ version, ...entry }) => ({
      panelVersionId: version.id,
      number: version.number,
      at: version.createdAt.toISOString(),
      by: version.createdByName,
      note: version.note,
      ...entry,
    })),
  };
}

export function toFlagDismissal(row: FlagDismissalRow): FlagDismissal {
  return {
    id: row.id,
    company: row.company,
    year: row.year,
    column: row.columnIndex,
    code: row.code as FlagCode,
    value: row.value,
    reason: row.reason,
    at: row.createdAt.toISOString(),
    by: row.createdByName,
  };
}
