import * as z from 'zod';
import { PeerGroupSummary } from './peers';
import { PanelVersionSummary } from './panels';

export const SlopeCovariance = z.enum(['cr2', 'cr1', 'cr0', 'classical']);
export type SlopeCovariance = z.infer<typeof SlopeCovariance>;

/** Starts a fit; regressors beside capex and book equity are named columns of the panel. */
export const StartFit = z.strictObject({
  peerGroupId: z.uuid(),
  slopes: SlopeCovariance.default('cr2'),
  confidence: z.number().gt(0.5).lt(1).default(0.95),
  furtherRegressors: z.array(z.string().min(1)).max(10).default([]),
});
export type StartFit = z.infer<typeof StartFit>;

const nullable = z.number().nullable();
const matrix = z.array(z.array(z.number()));
const interval = {
  estimate: z.number(),
  standardError: nullable,
  low: nullable,
  high: nullable,
  intervalReason: z.string().optional(),
};
export const IntervalEstimate = z.object(interval);
export type IntervalEstimate = z.infer<typeof IntervalEstimate>;

const fTest = z.object({
  value: nullable,
  df1: z.number(),
  df2: z.number(),
  pValue: nullable,
  pValueReason: z.string().optional(),
});

const ownYear = z.object({
  year: z.number().int(),
  fileRow: z.number().int(),
  actual: z.number(),
  fitted: z.number(),
  residual: z.number(),
  regressors: z.array(z.number()),
});

const observedRange = z.object({ low: z.number(), high: z.number() });

export const PredictionBasis = z.object({
  company: z.string(),
  regressors: z.array(z.string()),
  coefficients: z.array(z.number()),
  ownLevel: z.number(),
  ownMeans: z.array(z.number()),
  years: z.number().int(),
  lambdas: matrix,
  a: matrix,
  d: matrix,
  quantile: z.number(),
  intervalReason: z.string().optional(),
  confidence: z.number(),
  slopeCovariance: matrix,
  slopeDegreesOfFreedom: z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('fixed'), value: z.number() }),
    z.object({ kind: z.literal('satterthwaite'), s: matrix, quartic: z.array(z.number()) }),
  ]),
  slopeIntervalReason: z.string().optional(),
  last: ownYear,
  inverseCrossProduct: matrix,
  residualVariance: z.number(),
  largestOwnLeverage: z.number(),
  largestLeverage: z.number(),
  ownRange: z.array(observedRange),
  peerRange: z.array(observedRange),
});
export type PredictionBasis = z.infer<typeof PredictionBasis>;

const warningCode = z.enum([
  'few-companies',
  'few-years',
  'small-degrees-of-freedom',
  'persistent-errors',
  'persistence-capped',
  'own-persistence',
  'dominated',
  'single-row',
  'perfect-fit',
  'ill-conditioned',
  'spelling',
]);

export const FitWarning = z.object({
  code: warningCode,
  detail: z.string(),
  subjects: z.array(z.string()).optional(),
});
export type FitWarning = z.infer<typeof FitWarning>;

/** Estimates as the engine gives them; money in the panel's currency unit. */
export const FitResult = z.object({
  engine: z.string(),
  hash: z.string(),
  specification: z.object({
    effects: z.literal('company'),
    form: z.literal('levels'),
    lag: z.literal(0),
    slopes: SlopeCovariance,
    confidence: z.number(),
    seed: nullable,
  }),
  outcome: z.string(),
  members: z.array(z.string()),
  sample: z.object({
    companies: z.number().int(),
    years: z.number().int(),
    observations: z.number().int(),
    balanced: z.boolean(),
    firstYear: z.number().int(),
    lastYear: z.number().int(),
    dropped: z.array(
      z.object({ row: z.number().int(), column: z.string(), reason: z.literal('missing') }),
    ),
    singleRow: z.array(z.string()),
  }),
  slopes: z.array(
    z.object({
      name: z.string(),
      ...interval,
      statistic: nullable,
      degreesOfFreedom: nullable,
      pValue: nullable,
    }),
  ),
  slopeCovariance: matrix,
  intercepts: z.array(
    z.object({
      company: z.string(),
      ...interval,
      deviation: nullable,
      rows: z.number().int(),
    }),
  ),
  yearEffects: z.null(),
  standing: z
    .object({
      company: z.string(),
      ...interval,
      calibration: nullable,
      cosines: z.number().int(),
      persistence: nullable,
      ownPersistence: nullable,
      rank: nullable,
      rankSet: z.tuple([z.number().int(), z.number().int()]).nullable(),
      rankReason: z.string().optional(),
    })
    .nullable(),
  standingReason: z.string().optional(),
  pairs: z
    .array(
      z.object({
        company: z.string(),
        ...interval,
        shown: z.union([z.literal(-1), z.literal(0), z.literal(1)]),
      }),
    )
    .nullable(),
  gapPath: z
    .array(z.object({ year: z.number().int(), gap: nullable, peers: z.number().int() }))
    .nullable(),
  drift: z.object({ ...interval, pValue: nullable }).nullable(),
  driftReason: z.string().optional(),
  goodness: z.object({
    withinRSquared: z.number(),
    rSquared: z.number(),
    adjustedRSquared: z.number(),
    residualStandardError: z.number(),
    f: fTest,
    fSlopes: fTest,
  }),
  pooled: z.object({
    constant: z.number(),
    slopes: z.record(z.string(), z.number()),
    rSquared: z.number(),
    f: fTest,
  }),
  poolability: fTest,
  withoutCompany: z.array(
    z.object({
      company: z.string(),
      slopes: z.array(z.number()).nullable(),
      standing: nullable,
      reason: z.string().optional(),
    }),
  ),
  ownYears: z.array(ownYear).nullable(),
  prediction: PredictionBasis.nullable(),
  predictionReason: z.string().optional(),
  warnings: z.array(FitWarning),
});
export type FitResult = z.infer<typeof FitResult>;

export const FitState = z.enum(['queued', 'running', 'done', 'failed', 'cancelled']);
export type FitState = z.infer<typeof FitState>;

export const FitSummary = z.object({
  id: z.uuid(),
  /** First characters of the hash for the eye; null until the fit is done. */
  hash: z.string().nullable(),
  state: FitState,
  peerGroupId: z.uuid(),
  panelVersionId: z.uuid(),
  ownCompany: z.string(),
  regressors: z.array(z.string()),
  slopes: SlopeCovariance,
  confidence: z.number(),
  standing: IntervalEstimate.nullable(),
  rankSet: z.tuple([z.number().int(), z.number().int()]).nullable(),
  companies: z.number().int().nullable(),
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
});
export type FitSummary = z.infer<typeof FitSummary>;

export const FitsReply = z.object({ fits: z.array(FitSummary) });
export type FitsReply = z.infer<typeof FitsReply>;

export const FitReply = z.object({
  fit: FitSummary,
  progress: z.object({ phase: z.string(), done: z.number(), total: z.number() }).nullable(),
  /** Why it failed, where it did; a problem as the command prints it. */
  failure: z
    .object({ code: z.string(), detail: z.string(), subjects: z.array(z.string()) })
    .nullable(),
  result: FitResult.nullable(),
  panelVersion: PanelVersionSummary,
  peerGroup: PeerGroupSummary,
});
export type FitReply = z.infer<typeof FitReply>;
