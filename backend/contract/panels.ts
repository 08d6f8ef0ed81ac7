import * as z from 'zod';

/** What a column of the panel is to the model. */
export const ColumnRole = z.enum(['marketValue', 'capex', 'bookEquity', 'other']);
export type ColumnRole = z.infer<typeof ColumnRole>;

export const Unit = z.enum(['units', 'thousands', 'millions', 'billions']);
export type Unit = z.infer<typeof Unit>;

/** Which column of the file is what. Header texts, exactly as they stand in the file. */
export const ImportMapping = z.strictObject({
  panelName: z.string().trim().min(1, 'expected a name for the panel').max(120),
  company: z.string().min(1),
  year: z.string().min(1),
  marketValue: z.string().min(1),
  capex: z.string().min(1),
  bookEquity: z.string().min(1),
  /** Further numeric columns to bring in. */
  others: z.array(z.string().min(1)).max(50),
  /** ISO 4217. */
  currency: z.string().regex(/^[A-Z]{3}$/, 'expected a currency code of three letters, as EUR'),
  unit: Unit,
});
export type ImportMapping = z.infer<typeof ImportMapping>;

/** One thing the check found, at one place of the file. */
export const ImportFinding = z.object({
  /** Line of the file, the header being line 1. */
  row: z.number().int(),
  column: z.string(),
  found: z.string(),
  code: z.enum(['missing', 'duplicate', 'not-a-number', 'year', 'no-company', 'spelling']),
  detail: z.string(),
  /** Whether the panel cannot be brought in while this stands. */
  isBlocking: z.boolean(),
});
export type ImportFinding = z.infer<typeof ImportFinding>;

export const ImportReply = z.object({
  id: z.uuid(),
  fileName: z.string(),
  byteSize: z.number().int(),
  state: z.enum(['mapped', 'checked', 'committed']),
  /** The file's header and its first rows, as text. */
  headers: z.array(z.string()),
  firstRows: z.array(z.object({ row: z.number().int(), cells: z.array(z.string()) })),
  rowCount: z.number().int(),
  /** The likely mapping before a check; the analyst's own after it. */
  mapping: ImportMapping.partial(),
  check: z
    .object({
      companies: z.number().int(),
      years: z.number().int(),
      firstYear: z.number().int().nullable(),
      lastYear: z.number().int().nullable(),
      rows: z.number().int(),
      completeRows: z.number().int(),
      /** At most 500 are listed; the counts are over all. */
      findings: z.array(ImportFinding),
      findingCount: z.number().int(),
      blockingCount: z.number().int(),
    })
    .nullable(),
  panelVersionId: z.uuid().nullable(),
});
export type ImportReply = z.infer<typeof ImportReply>;

export const PanelColumn = z.object({
  /** The header in the file. */
  name: z.string(),
  role: ColumnRole,
});
export type PanelColumn = z.infer<typeof PanelColumn>;

export const PanelVersionSummary = z.object({
  id: z.uuid(),
  panelId: z.uuid(),
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
    }),
  ),
});
export type PanelCompaniesReply = z.infer<typeof PanelCompaniesReply>;

/** Makes a checked import a panel version. */
export const CommitImport = z.strictObject({ note: z.string().trim().max(2000) });
export type CommitImport = z.infer<typeof CommitImport>;
