import * as z from 'zod';
import { Unit } from './panels';

const company = z.string().trim().min(1).max(200);
const year = z.number().int().min(1000).max(9999);

/** One cell of the panel as it should be. A filled-in or changed value carries why and from where. */
export const CellCorrection = z
  .strictObject({
    company,
    year,
    /** Position among the version's columns. */
    column: z.number().int().min(0).max(199),
    value: z.number().nullable(),
    reason: z.string().trim().min(1, 'expected why the value changes').max(500),
    /** Where the value was found, as a report and its page; may be empty only where the cell becomes missing. */
    source: z.string().trim().max(500),
  })
  .refine(({ value, source }) => value === null || source !== '', {
    path: ['source'],
    error: 'expected where the value was found, as a report and its page',
  });
export type CellCorrection = z.infer<typeof CellCorrection>;

const RowKey = z.strictObject({ company, year });

/**
 * A set of corrections of the newest version of a panel; it becomes the next version, all of it or none. Answered with
 * 201 and the next version's summary; with 409 `stale-version` and `latestId` when a newer version exists; with 400 and
 * a pointer for a cell named twice or that holds the value already, a row added that is there, or corrected or removed
 * that is not. A cell of an added row needs the row among `addedRows`; cells of it that are not named are missing.
 */
export const SaveCorrections = z.strictObject({
  note: z.string().trim().min(1, 'expected a note').max(2000),
  cells: z.array(CellCorrection).max(50_000),
  addedRows: z.array(RowKey).max(5000),
  removedRows: z.array(RowKey).max(5000),
});
export type SaveCorrections = z.infer<typeof SaveCorrections>;

/** Makes the next version hold what this older one holds; answered with 201 and the next version's summary. */
export const RestoreVersion = z.strictObject({ note: z.string().trim().min(1).max(2000) });
export type RestoreVersion = z.infer<typeof RestoreVersion>;

const wholeNumber = z
  .string()
  .regex(/^\d{1,4}$/, 'expected a whole number of at most 4 digits')
  .transform(Number);

/** Query of a cell's history. */
export const CellPlace = z.strictObject({ company, year: wholeNumber, column: wholeNumber });
export type CellPlace = z.infer<typeof CellPlace>;

/**
 * One cell through all versions of its panel, oldest first; only versions in which it differs from the one before, in
 * the value, in the header of its column or in the unit.
 */
export const CellHistoryReply = z.object({
  entries: z.array(
    z.object({
      panelVersionId: z.uuid(),
      number: z.number().int(),
      value: z.number().nullable(),
      /** Whether the version has the row at all. */
      hasRow: z.boolean(),
      /** Of the cell's column in this version; null where it does not have the column. */
      header: z.string().nullable(),
      /** Of the version: what a figure of the model is in. */
      currency: z.string(),
      unit: Unit,
      at: z.iso.datetime(),
      by: z.string(),
      note: z.string(),
      /** Of a correction of this cell; null of an import, a restored version, a row added or removed. */
      reason: z.string().nullable(),
      source: z.string().nullable(),
    }),
  ),
});
export type CellHistoryReply = z.infer<typeof CellHistoryReply>;

export const FlagCode = z.enum([
  'missing',
  'duplicate',
  'jump',
  'unit-slip',
  'sign',
  'stale-copy',
  'peer-outlier',
  'year-gap',
]);
export type FlagCode = z.infer<typeof FlagCode>;

/**
 * A flag that somebody looked at and found to be right as it is; it holds while the cell keeps its value. Answered with
 * 201 and the dismissal; with 409 when the newest version holds another value, or the flag is dismissed with this one.
 */
export const DismissFlag = z.strictObject({
  company,
  year,
  /** Position among the columns; null where the whole row is meant. */
  column: z.number().int().min(0).max(199).nullable(),
  code: FlagCode,
  /** The cell's value when it was looked at. */
  value: z.number().nullable(),
  reason: z.string().trim().min(1, 'expected why the value is right').max(500),
});
export type DismissFlag = z.infer<typeof DismissFlag>;

export const FlagDismissal = DismissFlag.extend({
  id: z.uuid(),
  at: z.iso.datetime(),
  by: z.string(),
});
export type FlagDismissal = z.infer<typeof FlagDismissal>;

/** Columns are those of the newest version; dismissals of a column that it does not have are not among them. */
export const FlagDismissalsReply = z.object({ dismissals: z.array(FlagDismissal) });
export type FlagDismissalsReply = z.infer<typeof FlagDismissalsReply>;
