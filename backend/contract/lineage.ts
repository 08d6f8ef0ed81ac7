import * as z from 'zod';
import { IntervalEstimate, SlopeCovariance } from './fits';
import { PanelColumn, PanelVersionSummary, Unit } from './panels';
import { PeerGroupSummary } from './peers';

/**
 * The key of a figure of a fit: `standing`, `rank-set`, `slope.0`, `intercept.3`, `pair.2`, `gap.2014`, `fitted.2014`, `drift`,
 * `within-r-squared`, `r-squared`, `adjusted-r-squared`, `residual-standard-error`, `f`, `f-slopes`,
 * `pooled-r-squared`, `poolability`, `expected.2026`, `difference.2026`.
 */
export const FigureKey = z
  .string()
  .regex(/^[a-z-]+(\.\d{1,6})?$/, 'expected a figure, as standing or slope.0')
  .max(60);
export type FigureKey = z.infer<typeof FigureKey>;

/** How a cell came to be other than the file has it. */
export const CellOrigin = z.object({
  /** The last correction that still holds; `before` is what the cell held until then, in the panel's terms. */
  corrected: z
    .object({
      by: z.string(),
      at: z.iso.datetime(),
      reason: z.string(),
      source: z.string(),
      before: z.number().nullable(),
    })
    .nullable(),
  /** What the file's figure was converted by; null of a corrected cell, which is in the panel's terms already. */
  conversion: z
    .object({
      /** The row's currency in the file and what one unit of it costs in the panel's; null where none was converted. */
      currency: z.string().nullable(),
      rate: z.number().nullable(),
      rateKind: z.enum(['average', 'year-end']).nullable(),
      /** The column's unit in the file; null where it is the panel's. */
      unit: Unit.nullable(),
      /** Prices of the year that became those of the base year; null where prices stayed as they were. */
      priceIndex: z
        .object({ year: z.number(), baseYear: z.number().int(), base: z.number() })
        .nullable(),
    })
    .nullable(),
});
export type CellOrigin = z.infer<typeof CellOrigin>;

/** For one figure: how it came about, down to the cells of the imported file. */
export const LineageReply = z.object({
  figure: z.string(),
  label: z.string(),
  /** Null where the value is of a plan that only the screen knows yet. */
  value: IntervalEstimate.nullable(),
  /** For a rank set or a statistic that is no amount. */
  text: z.string().nullable(),
  isMoney: z.boolean(),
  confidence: z.number(),
  /** The formula in words. */
  formula: z.string(),
  inputs: z.array(
    z.object({
      label: z.string(),
      value: z.number().nullable(),
      isMoney: z.boolean(),
      figure: z.string().nullable(),
    }),
  ),
  fit: z.object({
    id: z.uuid(),
    hash: z.string(),
    engine: z.string(),
    slopes: SlopeCovariance,
    createdAt: z.iso.datetime(),
    createdBy: z.string(),
  }),
  peerGroup: PeerGroupSummary,
  panelVersion: PanelVersionSummary,
  /** The cells used: one row of the panel each, `fileRow` 0 where it was typed in; `values` in the order of `columns`. */
  cells: z.object({
    columns: z.array(PanelColumn),
    rows: z.array(
      z.object({
        fileRow: z.number().int(),
        company: z.string(),
        year: z.number().int(),
        values: z.array(z.number().nullable()),
        /** In the order of `values`; null where the cell is as the file has it. */
        origins: z.array(CellOrigin.nullable()),
      }),
    ),
  }),
});
export type LineageReply = z.infer<typeof LineageReply>;
