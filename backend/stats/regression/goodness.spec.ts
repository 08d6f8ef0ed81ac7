import { fitOf, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';

/** Five companies over eight years; the outcome is level plus year effect and nothing else. */
function effectsAlone(): PanelRow[] {
  const random = randomNumbers(8);
  return Array.from({ length: 40 }, (_, index) => {
    const year = index % 8;
    return {
      company: `K${Math.floor(index / 8)}`,
      year: 2000 + year,
      outcome: 1.1 * Math.floor(index / 8) + 10.3 * year * year * (year % 3),
      regressors: [random(), random()],
    };
  });
}

describe('goodnessOf', () => {
  it('has no within R² where the effects explain every row', () => {
    const { goodness } = fitOf(panelOf(effectsAlone(), randomPanelNames), null, {
      effects: 'company,year',
    });
    expect(goodness.withinRSquared).toBeNull();
    expect(goodness.withinRSquaredReason).toBe(
      'The effects alone explain every row: they leave nothing for the slopes to explain.',
    );
    expect(goodness.rSquared).toBe(1);
  });

  it('has a within R² of 1 where the slopes explain what the effects leave', () => {
    const rows = effectsAlone().map((row) => ({
      ...row,
      outcome: row.outcome + row.regressors[0],
    }));
    const { goodness } = fitOf(panelOf(rows, randomPanelNames), null, { effects: 'company,year' });
    expect(goodness.withinRSquared).toBeCloseTo(1, 12);
    expect(goodness.withinRSquaredReason).toBeUndefined();
  });
});
