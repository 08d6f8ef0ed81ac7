import * as z from 'zod';
import {
  Effects,
  FitState,
  IntervalEstimate,
  Lag,
  ModelForm,
  Seed,
  SlopeCovariance,
  Unbounded,
} from './fits';

const nullable = z.number().nullable();
const count = z.number().int();
const places = z.tuple([count, count]).nullable();

export const Objection = z.object({
  code: z.string(),
  weight: z.enum(['serious', 'notable']),
  detail: z.string(),
});
export type Objection = z.infer<typeof Objection>;

export const Verdict = z.object({
  grade: z.enum(['carries', 'carries-with-care', 'does-not-carry']),
  sentence: z.string(),
  against: z.array(Objection),
});
export type Verdict = z.infer<typeof Verdict>;

const point = z.tuple([z.number(), z.number()]);
const lineEnds = { from: point, to: point };

/** Straight lines of the outcome against one regressor; in the model's scale. */
export const RegressorLines = z.object({
  regressor: z.string(),
  companies: z.array(z.object({ company: z.string(), ...lineEnds })),
  of: count,
  pooled: z.object(lineEnds),
});
export type RegressorLines = z.infer<typeof RegressorLines>;

export const WithoutYear = z.object({
  year: count,
  slopes: z.array(z.number()).nullable(),
  standing: nullable,
  leftOut: z.array(z.string()).optional(),
  reason: z.string().optional(),
});
export type WithoutYear = z.infer<typeof WithoutYear>;

const estimatorSlope = IntervalEstimate.extend({ name: z.string() });

export const EstimatorSummary = z.object({
  code: z.enum(['fixed-effects', 'pooled', 'between', 'random-effects', 'first-differences']),
  slopes: z.array(estimatorSlope).nullable(),
  constant: nullable,
  observations: count,
  degreesOfFreedom: nullable,
  components: z.object({ error: z.number(), company: z.number(), theta: point }).optional(),
  reason: z.string().optional(),
});
export type EstimatorSummary = z.infer<typeof EstimatorSummary>;

export const CovarianceSummary = z.object({
  code: SlopeCovariance,
  definition: z.string(),
  source: z.string(),
  isChosen: z.boolean(),
  isDefault: z.boolean(),
  slopes: z
    .array(
      z.object({
        name: z.string(),
        standardError: nullable,
        degreesOfFreedom: nullable,
        pValue: nullable,
        low: nullable,
        high: nullable,
        unbounded: Unbounded.optional(),
        reason: z.string().optional(),
      }),
    )
    .nullable(),
  reason: z.string().optional(),
  /** Of the bootstrap by random draws, once it has been run. */
  seed: count.optional(),
  draws: count.optional(),
  notes: z.array(z.string()),
});
export type CovarianceSummary = z.infer<typeof CovarianceSummary>;

export const Alternative = z.object({
  code: z.enum([
    'this-fit',
    'pooled',
    'fixed-effects',
    'year-effects',
    'log-form',
    'lag',
    'random-effects',
  ]),
  isThisFit: z.boolean(),
  effects: Effects.nullable(),
  form: ModelForm,
  lag: Lag,
  observations: count.nullable(),
  slopes: z.array(estimatorSlope).nullable(),
  slopesNote: z.string().optional(),
  standing: IntervalEstimate.nullable(),
  standingUnit: z.enum(['level', 'percent']),
  standingReason: z.string().optional(),
  rankSet: places,
  rankReason: z.string().optional(),
  reason: z.string().optional(),
});
export type Alternative = z.infer<typeof Alternative>;

export const TestResult = z.object({
  code: z.string(),
  name: z.string(),
  definition: z.string(),
  source: z.string(),
  statistic: nullable,
  distribution: z.enum(['F', 'chi-squared', 'normal', 't']).nullable(),
  degreesOfFreedom: z.array(z.number()),
  pValue: nullable,
  reason: z.string().optional(),
  holm: z.enum(['rejects', 'keeps', 'shown-only', 'none']),
  reading: z.string(),
  caution: z.string().optional(),
});
export type TestResult = z.infer<typeof TestResult>;

export const TestSummary = z.object({
  lookedAt: count,
  inHolm: count,
  level: z.number(),
  list: z.array(TestResult),
});
export type TestSummary = z.infer<typeof TestSummary>;

const residualGroup = {
  label: z.string(),
  count,
  standardDeviation: z.number(),
  largest: z.number(),
};

export const ResidualPoint = z.object({
  company: z.string(),
  year: count,
  fileRow: count,
  regressors: z.array(z.number()),
  actual: z.number(),
  fitted: z.number(),
  residual: z.number(),
  leverage: z.number(),
  studentised: nullable,
  cook: nullable,
});
export type ResidualPoint = z.infer<typeof ResidualPoint>;

export const ResidualSummary = z.object({
  byCompany: z.array(z.object(residualGroup)),
  byYear: z.array(z.object({ ...residualGroup, mean: z.number() })),
  points: z.array(ResidualPoint),
  of: count,
  largest: z.array(ResidualPoint),
  varianceInflation: z.array(z.object({ name: z.string(), value: z.number() })),
});
export type ResidualSummary = z.infer<typeof ResidualSummary>;

/** What speaks for and against a fit, as the engine gives it. */
export const Evidence = z.object({
  engine: z.string(),
  hash: z.string(),
  verdict: Verdict,
  lines: z.array(RegressorLines),
  withoutYear: z.array(WithoutYear),
  withoutYearReason: z.string().optional(),
  estimators: z.array(EstimatorSummary),
  covariances: z.array(CovarianceSummary),
  alternatives: z.array(Alternative),
  tests: TestSummary,
  residuals: ResidualSummary,
});
export type Evidence = z.infer<typeof Evidence>;

/** Asks for the bootstrap's intervals of a fit whose own are others'. */
export const StartBootstrap = z.strictObject({ seed: Seed.default(1) });
export type StartBootstrap = z.infer<typeof StartBootstrap>;

/** The newest bootstrap that was asked for; done, its intervals stand in the row `wild` of `covariances`. */
export const Bootstrap = z.object({
  seed: count,
  state: FitState,
  /** Draws; null before and after they run. */
  progress: z.object({ done: count, total: count }).nullable(),
  /** Why it failed, where it did. */
  failure: z.string().nullable(),
});
export type Bootstrap = z.infer<typeof Bootstrap>;

export const EvidenceReply = z.discriminatedUnion('state', [
  z.object({
    state: z.literal('ready'),
    evidence: Evidence,
    bootstrap: Bootstrap.nullable(),
  }),
  /** The fit or its evidence is being computed: ask again. */
  z.object({ state: z.literal('computing') }),
  z.object({ state: z.literal('unavailable'), reason: z.string() }),
]);
export type EvidenceReply = z.infer<typeof EvidenceReply>;

/** How far the evidence and its newest bootstrap are: small, to be asked for again and again. */
export const EvidenceStateReply = z.object({
  state: z.enum(['ready', 'computing', 'unavailable']),
  bootstrap: Bootstrap.nullable(),
});
export type EvidenceStateReply = z.infer<typeof EvidenceStateReply>;
