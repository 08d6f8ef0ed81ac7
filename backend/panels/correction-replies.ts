import type { CellHistoryReply, FlagCode, FlagDismissal, PanelDifferencesReply } from '../contract';
import type { PanelDifferences } from '../panel-data';
import type { PlacedDismissal } from './flag-dismissal-service';
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
