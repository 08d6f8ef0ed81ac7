import * as z from 'zod';
import { PeerGroupSummary } from './peers';
import { NewerPanelVersion, PanelVersionSummary } from './panels';

export const SlopeCovariance = z.enum([
  'cr2',
  'wild',
  'cr1',
  'cr0',
  'classical',
  'hc0',
  'hc1',
  'hc2',
  'hc3',
  'two-way',
  'driscoll-kraay',
]);
export type SlopeCovariance = z.infer<typeof SlopeCovariance>;

export const Effects = z.enum(['company', 'company,year']);
export type Effects = z.infer<typeof Effects>;

export const ModelForm = z.enum(['levels', 'log']);
export type ModelForm = z.infer<typeof ModelForm>;

export const Lag = z.union([z.literal(0), z.literal(1)]);
export type Lag = z.infer<typeof Lag>;

/** Of random draws: a whole number that a double holds exactly. */
export const Seed = z.int().min(0);

/** What a fit is asked for; regressors beside capex and book equity are named columns of the panel. */
const specification = {
  effects: Effects.default('company'),
  form: ModelForm.default('levels'),
  lag: Lag.default(0),
  slopes: SlopeCovariance.default('cr2'),
  confidence: z.number().gt(0.5).lt(1).default(0.95),
  /** Of the wild bootstrap, 1 unless named; the other covariances draw nothing. */
  seed: Seed.optional(),
  furtherRegressors: z.array(z.string().min(1)).max(10).default([]),
};

function drawsWhereSeeded(asked: { slopes: SlopeCovariance; seed?: number | undefined }): boolean {
  return asked.slopes === 'wild' || asked.seed === undefined;
}
const seedAlone = {
  path: ['seed'],
  error: 'expected a seed with the wild bootstrap alone',
};

export const FitSpecification = z.strictObject(specification).refine(drawsWhereSeeded, seedAlone);
export type FitSpecification = z.infer<typeof FitSpecification>;

/** Starts a fit of a saved peer group. */
export const StartFit = z
  .strictObject({ peerGroupId: z.uuid(), ...specification })
  .refine(drawsWhereSeeded, seedAlone);
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

/** A cell that a row lacks. Company and year are missing in results stored before rows were told apart by them. */
const DroppedRow = z.object({
  company: z.string().optional(),
  year: z.number().int().optional(),
  row: z.number().int(),
  column: z.string(),
  reason: z.literal('missing'),
});

const observedRange = z.object({ low: z.number(), high: z.number() });

/** What is optional is missing in fits of earlier engines; see `PredictionBasis` of the engine for the measures. */
export const PredictionBasis = z.object({
  company: z.string(),
  regressors: z.array(z.string()),
  form: ModelForm.optional(),
  lag: Lag.optional(),
  smear: nullable.optional(),
  coefficients: z.array(z.number()),
  ownLevel: z.number(),
  ownMeans: z.array(z.number()),
  yearEffects: z
    .object({
      ownMean: z.number(),
      last: z.number(),
      lastYear: z.number().int(),
      lastThree: z.number(),
      ownLast: z.number(),
    })
    .nullable()
    .optional(),
  years: z.number().int(),
  lambdas: matrix,
  a: matrix,
  d: matrix,
  quantile: z.number(),
  intervalReason: z.string().optional(),
  confidence: z.number(),
  slopeCovariance: matrix.nullable(),
  slopeDegreesOfFreedom: z
    .discriminatedUnion('kind', [
      z.object({ kind: z.literal('fixed'), value: z.number() }),
      z.object({ kind: z.literal('satterthwaite'), s: matrix, quartic: z.array(z.number()) }),
    ])
    .nullable(),
  slopeIntervalReason: z.string().optional(),
  slopeNoVarianceReason: z.string().optional(),
  last: ownYear,
  held: z.array(z.number()).nullable().optional(),
  ownErrors: z
    .object({
      persistence: nullable,
      persistenceReason: z.string().optional(),
      years: z.array(z.number().int()),
      variance: z.number(),
    })
    .optional(),
  peers: z
    .array(
      z.object({
        company: z.string(),
        interceptGap: z.number(),
        regressors: z.array(z.number()),
        residual: z.number(),
      }),
    )
    .optional(),
  inverseCrossProduct: matrix,
  slopeInverse: matrix.optional(),
  residualVariance: z.number(),
  largestOwnLeverage: z.number(),
  largestLeverage: z.number(),
  ownRange: z.array(observedRange),
  peerRange: z.array(observedRange),
  peerSpread: z.array(observedRange).optional(),
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
  'wild-set-disconnected',
  'negative-eigenvalues',
  'smear-differs',
]);

export const FitWarning = z.object({
  code: warningCode,
  detail: z.string(),
  subjects: z.array(z.string()).optional(),
});
export type FitWarning = z.infer<typeof FitWarning>;

/** Null where a double cannot hold it, with the reason. */
const percent = z.object({
  estimate: nullable,
  low: nullable,
  high: nullable,
  intervalReason: z.string().optional(),
});

/** Which ends a bootstrap interval does not have. */
export const Unbounded = z.enum(['low', 'high', 'both']);

/**
 * Estimates as the engine gives them; money in the panel's currency unit, in log form estimates of logs. What results
 * of engines before 2 lack, in fits and in editions, has what it would have been as its default.
 */
export const FitResult = z.object({
  engine: z.string(),
  hash: z.string(),
  specification: z.object({
    effects: Effects,
    form: ModelForm,
    lag: Lag,
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
    dropped: z.array(DroppedRow),
    singleRow: z.array(z.string()),
  }),
  slopes: z.array(
    z.object({
      name: z.string(),
      ...interval,
      statistic: nullable,
      degreesOfFreedom: nullable,
      pValue: nullable,
      unbounded: Unbounded.optional(),
    }),
  ),
  slopeCovariance: matrix.nullable(),
  slopeCovarianceReason: z.string().optional(),
  intercepts: z.array(
    z.object({
      company: z.string(),
      ...interval,
      deviation: nullable,
      rows: z.number().int(),
    }),
  ),
  yearEffects: z.array(z.object({ year: z.number().int(), estimate: z.number() })).nullable(),
  smearing: z
    .object({ factor: nullable, own: nullable, reason: z.string().optional() })
    .nullable()
    .default(null),
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
      percent: percent.optional(),
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
    withinRSquared: nullable,
    withinRSquaredReason: z.string().optional(),
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
  effects: Effects,
  form: ModelForm,
  lag: Lag,
  slopes: SlopeCovariance,
  confidence: z.number(),
  /** In the panel's currency unit, or in log form a difference of logs. */
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
  newerPanelVersion: NewerPanelVersion,
  peerGroup: PeerGroupSummary,
});
export type FitReply = z.infer<typeof FitReply>;
