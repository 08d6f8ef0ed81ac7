import type { FitResult, Specification } from '../fit-result';
import { type IntervalContext, intervalContext } from '../intervals/interval-context';
import type { OpenFit } from '../fit-parts';
import { selectSample } from '../panel/select-sample';
import type { PanelSample } from '../panel/panel-sample';
import { type WithinFit, withinFit } from '../regression/within-fit';
import { companyProducts } from '../slopes/company-products';
import { slopeInference } from '../slopes/slope-inference';
import { pairComparisons } from '../standing/pair-comparisons';
import { standingOf } from '../standing/standing-of';

/** What tells one fixed effects model from another. */
export type AlternativeModel = Pick<Specification, 'effects' | 'form' | 'lag'>;

/** What is shown of another model. */
export interface AlternativeFigures extends Pick<
  FitResult,
  'slopes' | 'standing' | 'standingReason'
> {
  readonly observations: number;
}

/** Operations beyond which another model takes longer than a reader waits for a side glance. */
const mostWork = 5e8;

/** The same of its rank set, whose steps are cheaper each. */
const mostRankWork = 1e9;

export function isModelOf(specification: Specification, model: AlternativeModel): boolean {
  return (
    specification.effects === model.effects &&
    specification.form === model.form &&
    specification.lag === model.lag
  );
}

/**
 * Slopes, standing and rank set of another fixed effects model of the same members, with the covariance of the
 * specification (`cr2` in place of the bootstrap, which is too slow for a side glance).
 *
 * @returns the reason where the sample is too large for it.
 * @throws {StatsError} what the engine refuses of that model.
 */
export function alternativeFit(
  open: OpenFit,
  model: AlternativeModel,
): AlternativeFigures | string {
  const { specification, own } = open;
  const sample = sampleFor(open, model);
  const tooLarge = tooLargeReason(sample, model);
  if (tooLarge !== undefined) return tooLarge;
  const fit = withinFit(sample, model.effects);
  const { slopes } = slopeInference(
    { fit, products: companyProducts(fit) },
    specification.slopes === 'wild' ? 'cr2' : specification.slopes,
    { confidence: specification.confidence, seed: null },
  );
  const observations = sample.year.length;
  if (own === null) return { observations, slopes, standing: null };
  return { observations, slopes, ...standingIn(fit, { own, model, specification }) };
}

function sampleFor(open: OpenFit, { form, lag }: AlternativeModel): PanelSample {
  const isSame = open.specification.form === form && open.specification.lag === lag;
  return isSame ? open.sample : selectSample(open.data, open.own, open.members, { form, lag });
}

/** Factor and company products cost n·P² + N·P³. */
function tooLargeReason(sample: PanelSample, { effects }: AlternativeModel): string | undefined {
  if (effects === 'company') return undefined;
  const years = sample.years.length;
  const columns = years - 1 + sample.regressors.length;
  const work = (sample.year.length + sample.companies.length * columns) * columns ** 2;
  if (work <= mostWork) return undefined;
  return `Year effects take ${years - 1} more columns beside ${sample.year.length} rows: choose them in the specification to fit this model.`;
}

function standingIn(
  fit: WithinFit,
  {
    own,
    model,
    specification,
  }: { own: string; model: AlternativeModel; specification: Specification },
): Pick<FitResult, 'standing' | 'standingReason'> {
  const index = fit.sample.companies.indexOf(own);
  if (index === -1) {
    const standingReason = `${own} has fewer than two complete rows in this model; a standing needs at least two.`;
    return { standing: null, standingReason };
  }
  const context = intervalContext(fit, specification.confidence);
  const rankReason = noRankReason(context);
  const pairs = rankReason === undefined ? pairComparisons(context, index) : [];
  const standing = standingOf(context, { own: index, pairs, form: model.form });
  if (rankReason === undefined) return { standing };
  return { standing: { ...standing, rankSet: null, rankReason } };
}

/** The forms behind every pair cost n·B·(2P + 1)². */
function noRankReason({ fit, rankCosines }: IntervalContext): string | undefined {
  const rows = fit.sample.year.length;
  if (rows * rankCosines * (2 * fit.columns.length + 1) ** 2 <= mostRankWork) return undefined;
  return `${rows} rows and ${fit.columns.length} columns are too many to compare every pair beside the fit.`;
}
