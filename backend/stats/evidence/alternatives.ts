import type { FitResult, Specification } from '../fit-result';
import type { OpenFit } from '../fit-parts';
import { StatsError } from '../stats-error';
import { type AlternativeModel, alternativeFit, isModelOf } from './alternative-fit';
import type { Alternative, AlternativeCode, EstimatorSlope, EstimatorSummary } from './evidence';

/** The fixed effects models asked about; each changes one thing of the plain one. */
const models: readonly (AlternativeModel & { readonly code: AlternativeCode })[] = [
  { code: 'fixed-effects', effects: 'company', form: 'levels', lag: 0 },
  { code: 'year-effects', effects: 'company,year', form: 'levels', lag: 0 },
  { code: 'log-form', effects: 'company', form: 'log', lag: 0 },
  { code: 'lag', effects: 'company', form: 'levels', lag: 1 },
];

const pooledReason = 'One constant for all companies places none of them.';
const randomReason =
  'Effects drawn from one distribution are no figure of any company, so they place none.';
const bootstrapNote = 'CR2 here: the wild bootstrap is run for this fit alone.';
const classicalNote = 'Classical intervals.';

/**
 * The same question asked of other models: pooled and random effects in this fit's own form and lag, the fixed effects
 * models each from the same members with the parts of the engine that made this fit. Where the specification combines
 * several of them, it stands as a row of its own.
 *
 * @param estimators  of this fit, which pooled and random effects are read from.
 */
export function alternativesOf(
  open: OpenFit,
  estimators: readonly EstimatorSummary[],
  onProgress: (share: number) => void = () => undefined,
): Alternative[] {
  const { specification } = open;
  const { effects, form, lag } = specification;
  const isListed = models.some((model) => isModelOf(specification, model));
  const own: Alternative[] = isListed
    ? []
    : [fixedEffects(open, { code: 'this-fit', effects, form, lag })];
  const [plain, ...others] = models.map((model, place) => {
    onProgress(place / models.length);
    return fixedEffects(open, model);
  });
  return [
    ...own,
    estimated('pooled', estimators, { specification, standingReason: pooledReason }),
    plain,
    ...others,
    estimated('random-effects', estimators, { specification, standingReason: randomReason }),
  ];
}

function fixedEffects(
  open: OpenFit,
  model: AlternativeModel & { readonly code: AlternativeCode },
): Alternative {
  const { code, effects, form, lag } = model;
  const isThisFit = isModelOf(open.specification, model);
  const shared = {
    code,
    isThisFit,
    effects,
    form,
    lag,
    standingUnit: form === 'log' ? ('percent' as const) : ('level' as const),
  };
  const refused = (reason: string): Alternative => ({
    ...shared,
    observations: null,
    slopes: null,
    standing: null,
    rankSet: null,
    reason,
  });
  try {
    const figures = isThisFit
      ? { ...open.result, observations: open.sample.year.length }
      : alternativeFit(open, model);
    if (typeof figures === 'string') return refused(figures);
    const { observations, slopes, standing, standingReason } = figures;
    return {
      ...shared,
      observations,
      slopes: slopes.map(plainSlope),
      slopesNote: open.specification.slopes === 'wild' && !isThisFit ? bootstrapNote : undefined,
      ...(standing === null
        ? { standing, standingReason: standingReason ?? noOwnReason }
        : inItsUnit(standing)),
      rankSet: standing?.rankSet ?? null,
      rankReason: standing?.rankReason,
    };
  } catch (error) {
    if (!(error instanceof StatsError)) throw error;
    return refused(`This model cannot be estimated: ${error.message}.`);
  }
}

const noOwnReason = 'No own company is named, so there is no standing.';

function plainSlope({
  name,
  estimate,
  standardError,
  low,
  high,
  intervalReason,
}: FitResult['slopes'][number]): EstimatorSlope {
  return { name, estimate, standardError, low, high, intervalReason };
}

/** In levels as it is; in log form as percent, which has no standard error of its own. */
function inItsUnit(
  standing: NonNullable<FitResult['standing']>,
): Pick<Alternative, 'standing' | 'standingReason'> {
  const { estimate, standardError, low, high, intervalReason, percent } = standing;
  if (percent === undefined) {
    return { standing: { estimate, standardError, low, high, intervalReason } };
  }
  if (percent.estimate === null) {
    return { standing: null, standingReason: percent.intervalReason };
  }
  return { standing: { ...percent, estimate: percent.estimate, standardError: null } };
}

function estimated(
  code: 'pooled' | 'random-effects',
  estimators: readonly EstimatorSummary[],
  {
    specification,
    standingReason,
  }: { readonly specification: Specification; readonly standingReason: string },
): Alternative {
  const summary = estimators.find((one) => one.code === code);
  return {
    code,
    isThisFit: false,
    effects: null,
    form: specification.form,
    lag: specification.lag,
    observations: summary?.observations ?? null,
    slopes: summary?.slopes ?? null,
    slopesNote: summary?.slopes ? classicalNote : undefined,
    standing: null,
    standingUnit: specification.form === 'log' ? 'percent' : 'level',
    standingReason,
    rankSet: null,
    reason: summary?.reason,
  };
}
