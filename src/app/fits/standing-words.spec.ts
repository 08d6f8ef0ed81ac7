import type { FitResult } from '@contract';
import type { NumberFormat } from '../ui/number-format';
import {
  levelsSource,
  meanOfPeers,
  rankedCount,
  standingFinding,
  standingSource,
} from './standing-words';
import { exampleLogResult, exampleResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('the finding of a fit', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  function finding(change: Partial<NonNullable<FitResult['standing']>>): string {
    const standing = exampleResult.standing;
    if (standing === null) throw new Error('expected a standing in the example');
    const result = { ...exampleResult, standing: { ...standing, ...change } };
    return standingFinding(result, 'Velmara', numbers);
  }

  it('says how far above, with interval and places', () => {
    expect(finding({})).toBe(
      'Velmara stands 1,810 (1,170 to 2,450) above its peers, place 1 to 2 of 3',
    );
  });

  it('turns a wholly negative interval round and says below', () => {
    expect(finding({ estimate: -1811, low: -2450, high: -1172, rankSet: [3, 3] })).toBe(
      'Velmara stands 1,810 (1,170 to 2,450) below its peers, place 3 of 3',
    );
  });

  it('calls nobody above or below while the interval spans zero', () => {
    expect(finding({ estimate: 210, low: -400, high: 820 })).toBe(
      'Velmara is not clearly apart from its peers: 210 (−400 to 820), place 1 to 2 of 3',
    );
  });

  it('says that there is no interval rather than leaving it out', () => {
    expect(finding({ low: null, high: null, rankSet: null })).toBe(
      'Velmara stands 1,810 above its peers (no interval)',
    );
  });

  it('says that there is no standing', () => {
    expect(standingFinding({ ...exampleResult, standing: null }, 'Velmara', numbers)).toBe(
      'Velmara has no standing among its peers',
    );
  });

  it('is a percentage in logs, whatever the unit of money', () => {
    numbers.unit.set('thousands');
    expect(standingFinding(exampleLogResult, 'Velmara', numbers)).toBe(
      'Velmara stands 34.2 % (12.0 to 60.3 %) above its peers, place 1 to 2 of 3',
    );
    const standing = exampleLogResult.standing && {
      ...exampleLogResult.standing,
      estimate: Math.log(0.8),
      low: Math.log(0.7),
      high: Math.log(0.9),
      rankSet: null,
    };
    expect(standingFinding({ ...exampleLogResult, standing }, 'Velmara', numbers)).toBe(
      'Velmara stands 20.0 % (10.0 to 30.0 %) below its peers',
    );
  });

  it('names logs, year effects and the year before in its source, with the unit of each chart', () => {
    const model =
      '95 % intervals · company intercepts of market value on capex and book equity of the year before, in logs, year effects taken out · 3 companies';
    expect(standingSource(exampleLogResult, numbers)).toContain(`percent · ${model}`);
    expect(levelsSource(exampleLogResult, numbers)).toContain(`natural logs · ${model}`);
    expect(levelsSource(exampleResult, numbers)).toBe(standingSource(exampleResult, numbers));
  });

  it('follows the unit switch', () => {
    numbers.unit.set('billions');
    expect(finding({})).toContain('1.81 (1.17 to 2.45)');
    expect(standingSource(exampleResult, numbers)).toBe(
      'EUR bn · 95 % intervals · company intercepts of market value on capex and book equity · 3 companies, FY2010–FY2020, 32 rows',
    );
  });
});

describe('peers that count', () => {
  it('leaves a company without a deviation out of places and mean', () => {
    const intercepts = exampleResult.intercepts.map((row) =>
      row.company === 'Kesdrin' ? { ...row, deviation: null } : row,
    );
    expect(rankedCount({ intercepts })).toBe(2);
    expect(meanOfPeers({ intercepts }, 'Velmara')).toBe(1438);
    expect(meanOfPeers(exampleResult, 'Velmara')).toBe(1128);
  });

  it('has no mean without any peer', () => {
    expect(meanOfPeers({ intercepts: [] }, 'Velmara')).toBeNull();
  });
});
