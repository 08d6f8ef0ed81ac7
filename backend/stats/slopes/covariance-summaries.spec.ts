import type { Specification } from '../fit-result';
import type { OpenFit } from '../fit-parts';
import { openFit } from '../open-fit';
import { goldenPanel, panelOf, plainSpecification, sha256 } from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';
import { covarianceNames } from './covariance-names';
import { bootstrapSummary, covarianceSummaries } from './covariance-summaries';
import { slopeInference } from './slope-inference';

function open(
  data: ReturnType<typeof panelOf>,
  specification: Partial<Specification> = {},
): OpenFit {
  const asked = { ...plainSpecification, ...specification };
  return openFit({ data, own: null, members: undefined, specification: asked }, { sha256 });
}

/** Companies of ten years each, exact or with noise. */
function panel(companies: number, noise: number): ReturnType<typeof panelOf> {
  const random = randomNumbers(31);
  const rows = Array.from({ length: companies * 10 }, (_, index) => {
    const company = Math.floor(index / 10);
    const regressors = [random() * 8, random() * 8];
    const outcome = company + 2 * regressors[0] - regressors[1] + noise * random();
    return {
      company: `K${String(company).padStart(2, '0')}`,
      year: 2000 + (index % 10),
      outcome,
      regressors,
    };
  });
  return panelOf(rows, { outcome: 'y', regressors: ['x', 'z'] });
}

describe('the covariances side by side', () => {
  const grunfeld = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);

  it('stand in the table’s order, each with the figures of its own fit', () => {
    const summaries = covarianceSummaries(open(grunfeld, { slopes: 'hc3' }));
    expect(summaries.map(({ code }) => code)).toEqual([...covarianceNames]);
    expect(summaries.filter(({ isChosen }) => isChosen).map(({ code }) => code)).toEqual(['hc3']);
    expect(summaries.filter(({ isDefault }) => isDefault).map(({ code }) => code)).toEqual(['cr2']);
    for (const { code, slopes } of summaries) {
      const fit = open(grunfeld, { slopes: code, seed: code === 'wild' ? 1 : null }).result;
      expect(slopes).not.toBeNull();
      slopes?.forEach((slope, k) => {
        const { name, standardError, degreesOfFreedom, pValue, low, high } = fit.slopes[k];
        expect(slope).toEqual({ name, standardError, degreesOfFreedom, pValue, low, high });
      });
    }
    expect(summaries.find(({ code }) => code === 'wild')?.notes[0]).toContain('capital');
  });

  it('leave the bootstrap by draws until it is asked for', () => {
    const data = panel(13, 5);
    const { ground, ...rest } = open(data);
    const waiting = covarianceSummaries({ ground, ...rest })[1];
    expect([waiting.code, waiting.slopes]).toEqual(['wild', null]);
    expect(waiting.reason).toContain('9,999 random draws');
    const run = bootstrapSummary(ground, { confidence: 0.95, seed: 8 });
    const chosen = covarianceSummaries(open(data, { slopes: 'wild', seed: 8 }))[1];
    expect(run.slopes).toEqual(chosen.slopes);
    expect([run.isChosen, chosen.isChosen]).toEqual([false, true]);
    expect(run.slopes?.every(({ low }) => low !== null)).toBeTrue();
  });

  it('draw nothing without a seed', () => {
    const { ground } = open(panel(13, 5));
    expect(() => slopeInference(ground, 'wild', { confidence: 0.95, seed: null })).toThrowError(
      /seed/u,
    );
  });

  it('have no figure but the slopes where the fit is perfect, and say so', () => {
    for (const effects of ['company', 'company,year'] as const) {
      for (const { slopes } of covarianceSummaries(open(panel(6, 0), { effects }))) {
        for (const { standardError, pValue, low, high, reason } of slopes ?? []) {
          expect([standardError, pValue, low, high]).toEqual([null, null, null, null]);
          expect(reason).toContain('perfect');
        }
      }
    }
  });

  it('have a confidence interval that holds the estimate, with every method', () => {
    for (const name of covarianceNames) {
      const { ground } = open(panel(8, 5), { effects: 'company,year' });
      const options = { confidence: 0.9, seed: 1 };
      slopeInference(ground, name, options).slopes.forEach(({ estimate, low, high }) => {
        expect(low).toBeLessThan(estimate);
        expect(high).toBeGreaterThan(estimate);
      });
    }
  });
});
