import { type Specification, tQuantile } from '../../backend/stats';
import type { FitParts } from '../../backend/stats/fit-parts';
import { intervalContext } from '../../backend/stats/intervals/interval-context';
import { ownYearsOf } from '../../backend/stats/own-years';
import { selectSample } from '../../backend/stats/panel/select-sample';
import { expectedValue, marketValueBand } from '../../backend/stats/prediction';
import { predictionBasisOf } from '../../backend/stats/prediction-basis-of';
import { withinFit } from '../../backend/stats/regression/within-fit';
import { companyProducts } from '../../backend/stats/slopes/company-products';
import type { SlopeGround } from '../../backend/stats/slopes/slope-ground';
import { slopeInference } from '../../backend/stats/slopes/slope-inference';
import { driftOf } from '../../backend/stats/standing/drift-of';
import { pairComparisons } from '../../backend/stats/standing/pair-comparisons';
import { standingOf } from '../../backend/stats/standing/standing-of';
import {
  driftMeasure,
  expectedMeasure,
  matrixCovariances,
  nominal,
  rankSetMeasure,
  slopeMeasure,
  standingMeasure,
  startingPoints,
  usualBand,
  valueMeasure,
  wildMeasure,
} from './measures';
import type { SimulatedPanel } from './simulate-panel';
import { trueSlope } from './company-paths';
import { judge, judgeInterval, type Tallies } from './tally';
import { keepsTrueSlope } from './wild-rejection';

const usual: Specification = {
  effects: 'company',
  form: 'levels',
  lag: 0,
  slopes: 'cr2',
  confidence: nominal,
  seed: null,
};

type Opened = Pick<FitParts, 'context' | 'ownIndex' | 'inference' | 'data' | 'specification'>;

export interface FitChoice {
  readonly effects: Specification['effects'];
  /** Of the bootstrap's draws; null where it is not tried. */
  readonly wildSeed: number | null;
}

/** Fits one simulated panel by the engine's own pieces and counts which of its intervals hold the truth. */
export function judgeReplication(
  tallies: Tallies,
  panel: SimulatedPanel,
  { effects, wildSeed }: FitChoice,
): void {
  const specification: Specification = { ...usual, effects };
  const sample = selectSample(panel.data, panel.own, undefined, specification);
  const fit = withinFit(sample, effects);
  const ground: SlopeGround = { fit, products: companyProducts(fit) };
  const inference = slopeInference(ground, specification.slopes, specification);
  for (const name of matrixCovariances) {
    const { slopes } =
      name === specification.slopes ? inference : slopeInference(ground, name, specification);
    judgeInterval(tallies, slopeMeasure(name), slopes[0], trueSlope);
  }
  if (wildSeed !== null) judge(tallies, wildMeasure, keepsTrueSlope(ground, wildSeed));
  const context = intervalContext(fit, nominal);
  const ownIndex = sample.companies.indexOf(panel.own);
  judgeStanding(tallies, context, ownIndex);
  if (effects === 'company') {
    judgeAhead(tallies, panel, { context, ownIndex, inference, data: panel.data, specification });
  }
}

/** All intercepts are equal: the standing is 0, and whoever is shown to be higher or lower is shown wrongly. */
function judgeStanding(tallies: Tallies, context: FitParts['context'], own: number): void {
  const pairs = pairComparisons(context, own);
  const standing = standingOf(context, { own, pairs, form: usual.form });
  judgeInterval(tallies, standingMeasure, standing, 0);
  judge(
    tallies,
    rankSetMeasure,
    pairs.every(({ shown }) => shown === 0),
  );
  const { drift } = driftOf(context, own);
  if (drift !== null) judgeInterval(tallies, driftMeasure, drift, 0);
}

function judgeAhead(tallies: Tallies, { ahead }: SimulatedPanel, opened: Opened): void {
  const ownYears = ownYearsOf(opened.context.fit, opened.ownIndex, null);
  // Null in log form alone.
  if (ownYears === null) return;
  const basis = predictionBasisOf({ ...opened, ownYears, smearing: null });
  for (const { year, steps, regressors, expected, value } of ahead) {
    const interval = expectedValue(basis, regressors, { year });
    judgeInterval(tallies, expectedMeasure(steps), interval, expected);
    for (const start of startingPoints) {
      for (const bandConfidence of [nominal, usualBand]) {
        const outlook = { year, start, bandConfidence };
        const band = marketValueBand(basis, regressors, outlook, tQuantile);
        judgeInterval(tallies, valueMeasure(start, steps, bandConfidence), band, value);
      }
    }
  }
}
