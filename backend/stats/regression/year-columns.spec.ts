import type { PanelSample } from '../panel/panel-sample';
import { selectSample } from '../panel/select-sample';
import { StatsError } from '../stats-error';
import { panelOf } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';
import { yearColumns } from './year-columns';

function sampleOfYears(years: number): PanelSample {
  const random = randomNumbers(9);
  const rows = Array.from({ length: 3 * years }, (_, index) => ({
    company: `K${Math.floor(index / years)}`,
    year: 1800 + (index % years),
    outcome: random(),
    regressors: [random(), random()],
  }));
  return selectSample(panelOf(rows, randomPanelNames), null, undefined);
}

describe('yearColumns', () => {
  it('takes 100 fiscal years and refuses more, saying what to do', () => {
    expect(yearColumns(sampleOfYears(100)).length).toBe(99);
    expect(() => yearColumns(sampleOfYears(101))).toThrowMatching(
      (error) =>
        error instanceof StatsError &&
        error.code === 'too-many-years' &&
        error.message ===
          'expected at most 100 different fiscal years with year effects, whose cost grows with their square; found 101: leave the year effects out, or fit fewer years',
    );
  });
});
