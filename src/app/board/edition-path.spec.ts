import { editionBandName, editionPath } from './edition-path';
import { editionContent, logEditionContent } from './testing/edition-content';

describe('the path of an edition', () => {
  it('has a base that the differences of the plan add up to', () => {
    const path = editionPath(editionContent);
    expect(path?.base).toEqual([
      { year: 2026, estimate: 2720 },
      { year: 2027, estimate: 2720 },
    ]);
    expect(path?.plans[0].years.map(({ estimate }) => estimate)).toEqual([2740, 2880]);
  });

  it('has it in amounts also where differences are of logs', () => {
    const path = editionPath(logEditionContent);
    expect(path?.base[0].estimate).toBeCloseTo(2740 / 1.1, 9);
  });

  it('carries the band that was frozen, by its own name', () => {
    const [scenario] = editionContent.scenarios;
    const banded = {
      ...editionContent,
      scenarios: [
        {
          ...scenario,
          outlook: {
            start: 'model-level' as const,
            yearEffect: 'last' as const,
            confidence: 0.95,
            bandConfidence: 0.9,
          },
          years: scenario.years.map((year) => ({ ...year, band: { low: 2000, high: 3500 } })),
        },
      ],
    };
    expect(editionPath(banded)?.plans[0].years[0]).toEqual(
      jasmine.objectContaining({ bandLow: 2000, bandHigh: 3500 }),
    );
    expect(editionBandName(banded)).toBe('90 % band of the market value');
    expect(editionBandName(editionContent)).toBe('80 % band of the market value');
  });

  it('is none without a prediction', () => {
    const { fit } = editionContent;
    expect(editionPath({ ...editionContent, fit: { ...fit, prediction: null } })).toBeNull();
  });
});
