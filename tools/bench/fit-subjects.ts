import { createHash } from 'node:crypto';
import {
  type Evidence,
  evidenceOf,
  type FitResult,
  type OpenFit,
  openFit,
  type PanelColumns,
  type Specification,
} from '../../backend/stats';
import { intervalContext } from '../../backend/stats/intervals/interval-context';
import { selectSample } from '../../backend/stats/panel/select-sample';
import { withinFit } from '../../backend/stats/regression/within-fit';
import { companyProducts } from '../../backend/stats/slopes/company-products';
import { slopeInference } from '../../backend/stats/slopes/slope-inference';
import { standingOf } from '../../backend/stats/standing/standing-of';

const own = 'C000003';

export const plain: Specification = {
  effects: 'company',
  form: 'levels',
  lag: 0,
  slopes: 'cr2',
  confidence: 0.95,
  seed: null,
};

/** Reads the three columns once: what any method has to do at the least. */
export function barePass({ outcome, regressors: [capex, equity] }: PanelColumns): number {
  let sum = 0;
  for (let row = 0; row < outcome.values.length; row += 1) {
    sum += outcome.values[row] + capex.values[row] + equity.values[row];
  }
  return sum;
}

/**
 * Slopes, classical and company-clustered covariance, all intercepts, the standing with its interval.
 *
 * @param atStage  called at the end of each stage.
 */
export function estimates(data: PanelColumns, atStage: () => void = () => undefined): unknown {
  const after = <Part>(part: Part): Part => {
    atStage();
    return part;
  };
  const sample = after(selectSample(data, own, undefined));
  const fit = after(withinFit(sample, 'company'));
  const ground = { fit, products: after(companyProducts(fit)) };
  const context = after(intervalContext(fit, plain.confidence));
  return [
    after(slopeInference(ground, 'classical', plain)),
    after(slopeInference(ground, 'cr1', plain)),
    fit.relativeIntercepts,
    after(standingOf(context, { own: sample.companies.indexOf(own), pairs: [], form: 'levels' })),
  ];
}

/** All that a fit shows: every interval, rank set, goodness, leave-one-out, drift, the basis of scenarios, the hash. */
export function wholeFit(data: PanelColumns): FitResult {
  return opened(data).result;
}

/** A whole fit and its evidence, without the bootstrap by draws. */
export function evidence(data: PanelColumns): Evidence {
  return evidenceOf(opened(data));
}

function opened(data: PanelColumns): OpenFit {
  return openFit(
    { data, specification: plain, own, members: undefined },
    { sha256: (text) => createHash('sha256').update(text).digest('hex') },
  );
}
