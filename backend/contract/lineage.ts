import * as z from 'zod';
import { IntervalEstimate, SlopeCovariance } from './fits';
import { PanelColumn, PanelVersionSummary } from './panels';
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
  /** The cells used: one row of the file each, `values` in the order of `columns`. */
  cells: z.object({
    columns: z.array(PanelColumn),
    rows: z.array(
      z.object({
        fileRow: z.number().int(),
        company: z.string(),
        year: z.number().int(),
        values: z.array(z.number().nullable()),
      }),
    ),
  }),
});
export type LineageReply = z.infer<typeof LineageReply>;
