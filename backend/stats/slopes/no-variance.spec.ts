import type { SlopeCovarianceName, Specification } from '../fit-result';
import { tQuantile } from '../distributions/t-distribution';
import { differenceToBase } from '../prediction';
import { fitOf, panelOf } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';

function reasonsIn(
  shape: { readonly companies: number; readonly years: number },
  specification: Partial<Specification>,
): (string | undefined)[] {
  const random = randomNumbers(11);
  const { companies, years } = shape;
  const rows = Array.from({ length: companies * years }, (_, index) => ({
    company: `K${Math.floor(index / years)}`,
    year: 2000 + (index % years),
    outcome: 10 * random(),
    regressors: [random(), random()],
  }));
  const fit = fitOf(panelOf(rows, randomPanelNames), 'K0', specification);
  const difference = differenceToBase(fit.prediction!, [1, 0], tQuantile);
  return [...fit.slopes, difference].map(({ intervalReason }) => intervalReason);
}

const start = 'No variance is left to judge it by: with ';

describe('a slope without variance', () => {
  for (const slopes of ['cr2', 'cr1', 'cr0'] as const satisfies readonly SlopeCovarianceName[])
    it(`has none by construction with two companies and year effects (${slopes})`, () => {
      const reason = `${start}two companies and year effects the residuals of one mirror those of the other, so what companies add to the variance is zero by construction.`;
      const shape = { companies: 2, years: 12 };
      expect(reasonsIn(shape, { effects: 'company,year', slopes })).toEqual([
        reason,
        reason,
        reason,
      ]);
      expect(reasonsIn(shape, { slopes })).toEqual([undefined, undefined, undefined]);
    });

  it('has none by construction with two companies and year effects (wild)', () => {
    const [first] = reasonsIn(
      { companies: 2, years: 12 },
      { effects: 'company,year', slopes: 'wild', seed: 1 },
    );
    expect(first).toContain(`${start}two companies and year effects`);
  });

  it('has none by construction with two fiscal years clustered by year', () => {
    const reason = `${start}two fiscal years the residuals of one mirror those of the other, so what years add to the variance is zero by construction.`;
    for (const effects of ['company', 'company,year'] as const) {
      const shape = { companies: 12, years: 2 };
      expect(reasonsIn(shape, { effects, slopes: 'driscoll-kraay' })).toEqual([
        reason,
        reason,
        reason,
      ]);
    }
  });
});
