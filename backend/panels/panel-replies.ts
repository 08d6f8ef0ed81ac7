import type { PanelRows, PanelVersionRow } from '../../db/repositories/panels-repository';
import type { ImportReply, PanelVersionReply, PanelVersionSummary } from '../contract';
import type { ImportDraft } from './import-service';

export function toPanelVersionSummary(row: PanelVersionRow): PanelVersionSummary {
  return {
    id: row.id,
    panelId: row.panelId,
    panelName: row.panelName,
    number: row.number,
    currency: row.currency,
    unit: row.unit,
    note: row.note,
    companies: row.companies,
    rows: row.rowCount,
    firstYear: row.firstYear,
    lastYear: row.lastYear,
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdByName,
    file: {
      id: row.fileId,
      name: row.fileName,
      byteSize: row.fileByteSize,
      sha256: row.fileSha256,
    },
  };
}

export function toPanelVersionReply(version: PanelVersionRow, rows: PanelRows): PanelVersionReply {
  return {
    version: toPanelVersionSummary(version),
    companyHeader: version.companyHeader,
    yearHeader: version.yearHeader,
    columns: [...version.columns],
    rows: {
      fileRow: [...rows.fileRow],
      company: [...rows.company],
      year: [...rows.year],
      values: version.columns.map((_, column) => rows.cells.map((row) => row[column])),
    },
  };
}

export function toImportReply(draft: ImportDraft): ImportReply {
  const { preview, mapping, check } = draft;
  return {
    id: draft.id,
    fileName: draft.fileName,
    byteSize: draft.byteSize,
    state: draft.state,
    headers: [...preview.headers],
    firstRows: preview.firstRows.map(({ row, cells }) => ({ row, cells: [...cells] })),
    rowCount: preview.rowCount,
    mapping: { ...mapping, others: [...(mapping.others ?? [])] },
    check: check === null ? null : { ...check, findings: [...check.findings] },
    panelVersionId: draft.panelVersionId,
  };
}
