import type { CellHistoryReply, FlagCode, FlagDismissal, PanelDifferencesReply } from '../contract';
import type { PlacedDismissal } from './flag-dismissal-service';
import type { CellEntry, VersionDifferences } from './panel-history-service';

export function toPanelDifferencesReply({
  listed,
  columns,
  renamed,
  ...rest
}: VersionDifferences): PanelDifferencesReply {
  return { ...rest, listed: [...listed], columns: [...columns], renamed: [...renamed] };
}

export function toCellHistoryReply(entries: readonly CellEntry[]): CellHistoryReply {
  return {
    entries: entries.map(({ version, ...entry }) => ({
      panelVersionId: version.id,
      number: version.number,
      at: version.createdAt.toISOString(),
      by: version.createdByName,
      note: version.note,
      currency: version.currency,
      unit: version.unit,
      ...entry,
    })),
  };
}

export function toFlagDismissal(row: PlacedDismissal): FlagDismissal {
  return {
    id: row.id,
    company: row.company,
    year: row.year,
    column: row.column,
    code: row.code as FlagCode,
    value: row.value,
    reason: row.reason,
    at: row.createdAt.toISOString(),
    by: row.createdByName,
  };
}
