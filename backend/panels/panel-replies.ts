import type { PanelBlockRows } from '../../db/repositories/panel-rows-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { PanelCompaniesReply, PanelVersionReply, PanelVersionSummary } from '../contract';
import type { CompanySummary } from './company-summaries';

export function toPanelVersionSummary(row: PanelVersionRow): PanelVersionSummary {
  return {
    id: row.id,
    panelId: row.panelId,
    parentId: row.parentId,
    origin: row.origin,
    restoredNumber: row.restoredNumber,
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

export function toPanelVersionReply(
  version: PanelVersionRow,
  rows: PanelBlockRows,
): PanelVersionReply {
  return {
    version: toPanelVersionSummary(version),
    companyHeader: version.companyHeader,
    yearHeader: version.yearHeader,
    columns: [...version.columns],
    rows: {
      fileRow: [...rows.fileRow],
      company: Array.from(rows.company, (code) => rows.companies[code]),
      year: [...rows.year],
      values: rows.values.map((cells) =>
        Array.from(cells, (cell) => (Number.isNaN(cell) ? null : cell)),
      ),
    },
  };
}

export function toPanelCompaniesReply(companies: readonly CompanySummary[]): PanelCompaniesReply {
  return {
    companies: companies.map((company) => ({
      ...company,
      attributes: { ...company.attributes },
      measures: { ...company.measures, others: { ...company.measures.others } },
    })),
  };
}
