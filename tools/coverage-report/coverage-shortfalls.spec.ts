import { drawsFrom } from './normal-draws';
import { slopeMeasure, standingMeasure } from './measures';
import { promises } from './promises';
import { settings } from './settings';
import { breaksPromise, type SettingResult, shortfallsOf } from './shortfalls';
import type { Setting } from './setting';
import { judge, judgeInterval, type Tallies } from './tally';

const promised = settingNamed('n12-t20-rho0.5');
const weak = settingNamed('n12-t20-own-more-persistent');

describe('Shortfalls of the coverage report', () => {
  it('keeps a promise with intervals of the right length', () => {
    expect(shortfallsOf([withStandings(promised, 1.96)])).toEqual([]);
    expect(breaksPromise([withStandings(promised, 1.96)])).toBeFalse();
  });

  it('breaks the promise and fails with intervals made too narrow on purpose', () => {
    // 2Φ(1.6) − 1 = .890
    const result = withStandings(promised, 1.6);
    const found = shortfallsOf([result]);
    expect(found.map(({ measure }) => measure)).toEqual([standingMeasure]);
    expect(found[0].coverage.share).toBeCloseTo(0.89, 1);
    expect(found[0].broken.map(({ name }) => name)).toEqual(['standing and expected value']);
    expect(breaksPromise([result])).toBeTrue();
  });

  it('names an interval that is too narrow where nothing is promised, and does not fail for it', () => {
    const result = withStandings(weak, 1.6);
    expect(shortfallsOf([result]).map(({ measure }) => measure)).toEqual([standingMeasure]);
    expect(breaksPromise([result])).toBeFalse();
  });

  it('promises nothing of standings with fewer companies than the methods state, and names them', () => {
    const few = withStandings(settingNamed('n8-t10-rho0.8-skewed'), 1.6);
    expect(shortfallsOf([few]).map(({ measure }) => measure)).toEqual([standingMeasure]);
    expect(breaksPromise([few])).toBeFalse();
    expect(breaksPromise([withStandings(settingNamed('n20-t10-rho0.8-skewed'), 1.6)])).toBeTrue();
  });

  it('holds standing and expected value of an own company with few rows', () => {
    const result = withStandings(settingNamed('n12-t20-rho0-own-last-5'), 1.6);
    expect(breaksPromise([result])).toBeTrue();
    expect(shortfallsOf([result])[0].broken.map(({ name }) => name)).toEqual(['short own company']);
  });

  it('fails where a promised interval is never given', () => {
    const result = withStandings(promised, 1.96);
    result.tallies.delete(slopeMeasure('cr2'));
    expect(breaksPromise([result])).toBeTrue();
  });

  it('holds every promise against at least one setting, and no other covariance to any', () => {
    for (const { covers } of promises) expect(settings.some(covers)).toBeTrue();
    const measures = promises.flatMap((promise) => promise.measures);
    expect(measures.filter((measure) => measure.startsWith('slope'))).toEqual([
      slopeMeasure('cr2'),
    ]);
  });
});

/** Everything promised holds in all replications, but the standing's intervals are ±`reach` of normal errors. */
function withStandings(setting: Setting, reach: number): SettingResult {
  const { normal } = drawsFrom(7);
  const tallies: Tallies = new Map();
  const measures = new Set(promises.flatMap((promise) => promise.measures));
  measures.delete(standingMeasure);
  for (let replication = 0; replication < 4000; replication += 1) {
    for (const measure of measures) judge(tallies, measure, true);
    const estimate = normal();
    judgeInterval(tallies, standingMeasure, { low: estimate - reach, high: estimate + reach }, 0);
  }
  return { setting, tallies };
}

function settingNamed(name: string): Setting {
  const setting = settings.find((it) => it.name === name);
  if (setting === undefined) throw new Error(`expected a setting ${name}`);
  return setting;
}
