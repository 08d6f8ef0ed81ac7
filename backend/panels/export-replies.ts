import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import { insideInformationCaution } from '../contract';
import { beginningOf } from '../files/beginning-of';
import type { ExportFormat } from './panel-export-service';
import { type PanelExport, panelTable } from './panel-table';
import type { NotedLine, NotedTable } from './table-workbook';

const made: Readonly<Record<PanelVersionRow['origin'], string>> = {
  import: 'from the source file',
  correction: 'by corrections of the version before',
  restore: 'by putting an older version back',
};

/** A name that every file system takes: letters and digits of any language, with hyphens between them. */
export function exportFileName(
  { panelName, number }: Pick<PanelVersionRow, 'panelName' | 'number'>,
  format: ExportFormat,
): string {
  const words = panelName.match(/[\p{L}\p{M}\p{N}]+/gu) ?? ['panel'];
  const name = beginningOf(words.join('-'), 60);
  return `${name}-version-${number}.${format}`;
}

export function toNotedTable(panel: PanelExport): NotedTable {
  const { version } = panel;
  const lines: readonly NotedLine[] = [
    ['Panel', version.panelName],
    ['Version', version.number],
    ['Note', version.note],
    ['Made', made[version.origin]],
    ['Made by', version.createdByName],
    ['Made on (UTC)', version.createdAt],
    ['Companies', version.companies],
    ['Rows', version.rowCount],
    ['First fiscal year', version.firstYear],
    ['Last fiscal year', version.lastYear],
    ['Currency', version.currency],
    ['Unit', version.unit],
    ['Source file', version.fileName],
    ['SHA-256 of the source file', version.fileSha256],
    ['Caution', insideInformationCaution],
  ];
  return {
    name: 'Panel',
    table: panelTable(panel),
    notes: { name: 'About', lines },
    createdAt: version.createdAt,
  };
}
