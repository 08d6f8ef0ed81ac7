import * as z from 'zod';

/** What a column of the panel is to the model. */
export const ColumnRole = z.enum(['marketValue', 'capex', 'bookEquity', 'other']);
export type ColumnRole = z.infer<typeof ColumnRole>;

export const Unit = z.enum(['units', 'thousands', 'millions', 'billions']);
export type Unit = z.infer<typeof Unit>;

/** One cell, or one row where `column` is null, that differs between two versions of a panel. */
export const CellDifference = z.object({
  company: z.string(),
  year: z.number().int(),
  kind: z.enum(['added-row', 'removed-row', 'changed-cell']),
  /** Header of the column, the later version's; null for a row. */
  column: z.string().nullable(),
  before: z.number().nullable(),
  after: z.number().nullable(),
});
export type CellDifference = z.infer<typeof CellDifference>;

const Money = z.object({ currency: z.string(), unit: Unit });

export const PanelColumn = z.object({
  /** The header in the file. */
  name: z.string(),
  role: ColumnRole,
});
export type PanelColumn = z.infer<typeof PanelColumn>;

/** What changed from one panel version to another: columns of the model are one whatever their headers. */
export const PanelDifferencesReply = z.object({
  /** What is compared, as the later version calls it. */
  columns: z.array(PanelColumn),
  /** Columns of the model that the two versions call otherwise. */
  renamed: z.array(z.object({ role: ColumnRole, before: z.string(), after: z.string() })),
  /** What money of both versions is given in, the later one's; null where their currencies differ: each its own. */
  money: Money.nullable(),
  addedRows: z.number().int(),
  removedRows: z.number().int(),
  changedCells: z.number().int(),
  /** At most 5,000 are listed; the counts are over all. */
  listed: z.array(CellDifference),
});
export type PanelDifferencesReply = z.infer<typeof PanelDifferencesReply>;

export const PanelVersionSummary = z.object({
  id: z.uuid(),
  panelId: z.uuid(),
  parentId: z.uuid().nullable(),
  /** What made it: a file, a set of corrections, or an older version put back. */
  origin: z.enum(['import', 'correction', 'restore']),
  /** Of the version that was put back; null of another origin. */
  restoredNumber: z.number().int().nullable(),
  panelName: z.string(),
  number: z.number().int(),
  currency: z.string(),
  unit: Unit,
  note: z.string(),
  companies: z.number().int(),
  rows: z.number().int(),
  firstYear: z.number().int(),
  lastYear: z.number().int(),
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
  file: z.object({
    id: z.uuid(),
    name: z.string(),
    byteSize: z.number().int(),
    sha256: z.string(),
  }),
});
export type PanelVersionSummary = z.infer<typeof PanelVersionSummary>;

/** Query of an export: the decimal sign of a CSV file; with a comma, a semicolon separates the columns. */
export const PanelExportOptions = z.strictObject({ decimalSign: z.enum(['.', ',']).default('.') });
export type PanelExportOptions = z.infer<typeof PanelExportOptions>;

/** The newest version of the same panel, where it is not the one that a thing stands on; null where it is. */
export const NewerPanelVersion = z.object({ id: z.uuid(), number: z.number().int() }).nullable();
export type NewerPanelVersion = z.infer<typeof NewerPanelVersion>;

export const PanelVersionsReply = z.object({ versions: z.array(PanelVersionSummary) });
export type PanelVersionsReply = z.infer<typeof PanelVersionsReply>;

/** A whole panel version, by column; rows sorted by company, then year. A missing cell is null. */
export const PanelVersionReply = z.object({
  version: PanelVersionSummary,
  companyHeader: z.string(),
  yearHeader: z.string(),
  columns: z.array(PanelColumn),
  rows: z.object({
    fileRow: z.array(z.number().int()),
    company: z.array(z.string()),
    year: z.array(z.number().int()),
    /** values[column][row] */
    values: z.array(z.array(z.number().nullable())),
  }),
});
export type PanelVersionReply = z.infer<typeof PanelVersionReply>;

/** Companies of a panel version with what the choice of peers needs. */
export const PanelCompaniesReply = z.object({
  companies: z.array(
    z.object({
      name: z.string(),
      rows: z.number().int(),
      completeRows: z.number().int(),
      firstYear: z.number().int(),
      lastYear: z.number().int(),
      /** Last present values, in the panel's unit. */
      marketValue: z.number().nullable(),
      capex: z.number().nullable(),
      bookEquity: z.number().nullable(),
      /** The text columns that describe it, by header. */
      attributes: z.record(z.string(), z.string()),
      /** What it can be compared by, as the panel-data module defines it; null where its cells do not say. */
      measures: z.object({
        logMarketValue: z.number().nullable(),
        logBookEquity: z.number().nullable(),
        capexToBookEquity: z.number().nullable(),
        growth: z.number().nullable(),
        volatility: z.number().nullable(),
        /** Last value of each further column, by header. */
        others: z.record(z.string(), z.number().nullable()),
      }),
    }),
  ),
});
export type PanelCompaniesReply = z.infer<typeof PanelCompaniesReply>;
