import type { CovarianceSlope, CovarianceSummary } from '../evidence/evidence';
import type { SlopeCovarianceName, SlopeEstimate, Specification } from '../fit-result';
import { mostEnumerated, randomDraws } from './bootstrap/sign-draws';
import type {
  CovarianceMethod,
  InferenceOptions,
  SlopeInference,
  SlopeNote,
} from './covariance-method';
import { covarianceNames } from './covariance-names';
import { covarianceTable, defaultCovariance } from './covariance-table';
import { slopeEstimates } from './slope-estimates';
import type { SlopeGround } from './slope-ground';

/** What the summaries are made from; an open fit has it all. */
export interface CovarianceGround {
  readonly ground: SlopeGround;
  readonly specification: Specification;
  /** Of the covariance that the specification names. */
  readonly inference: SlopeInference;
}

/**
 * Every covariance for the same slopes, in the table's order. The bootstrap stands among them where all sign vectors can be
 * looked at or the specification names it; by draws it takes a while and is run by `bootstrapSummary` when asked for.
 */
export function covarianceSummaries(open: CovarianceGround): CovarianceSummary[] {
  return covarianceNames.map((name) => summaryOf(open, name));
}

/** The bootstrap's line of the summaries, run now, beside a fit that has another covariance. */
export function bootstrapSummary(
  ground: SlopeGround,
  options: InferenceOptions,
): CovarianceSummary {
  return {
    ...headOf('wild', false),
    ...figuresOf(covarianceTable.wild.bootstrap(ground, options)),
  };
}

function summaryOf(
  { ground, specification, inference }: CovarianceGround,
  name: SlopeCovarianceName,
): CovarianceSummary {
  const isChosen = name === specification.slopes;
  const head = headOf(name, isChosen);
  if (isChosen) return { ...head, ...figuresOf(inference) };
  const method: CovarianceMethod = covarianceTable[name];
  if (method.kind === 'matrix') {
    const covariance = method.covariance(ground);
    const slopes = slopeEstimates(ground, method, covariance, specification.confidence);
    return { ...head, ...figuresOf({ slopes, notes: covariance.notes }) };
  }
  const companies = ground.products.length;
  if (companies > mostEnumerated) {
    const reason = `Not run yet: with ${companies} companies it takes ${randomDraws.toLocaleString('en')} random draws.`;
    return { ...head, slopes: null, reason, notes: [] };
  }
  const { confidence } = specification;
  return { ...head, ...figuresOf(method.bootstrap(ground, { confidence, seed: null })) };
}

function headOf(
  code: SlopeCovarianceName,
  isChosen: boolean,
): Pick<CovarianceSummary, 'code' | 'definition' | 'source' | 'isChosen' | 'isDefault'> {
  const { definition, source } = covarianceTable[code];
  return { code, definition, source, isChosen, isDefault: code === defaultCovariance };
}

function figuresOf({
  slopes,
  notes,
}: {
  readonly slopes: readonly SlopeEstimate[];
  readonly notes: readonly SlopeNote[];
}): Pick<CovarianceSummary, 'slopes' | 'notes'> {
  return { slopes: slopes.map(slopeOf), notes: notes.map(({ detail }) => detail) };
}

function slopeOf(slope: SlopeEstimate): CovarianceSlope {
  const { name, standardError, degreesOfFreedom, pValue, low, high, unbounded } = slope;
  const figures = { name, standardError, degreesOfFreedom, pValue, low, high };
  return {
    ...figures,
    ...(unbounded === undefined ? {} : { unbounded }),
    ...(slope.intervalReason === undefined ? {} : { reason: slope.intervalReason }),
  };
}
