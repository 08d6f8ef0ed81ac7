import type { NumberFormat } from '../ui/number-format';
import {
  type FinishedFit,
  comparisonFinding,
  incomparableReason,
  memberDifference,
  slopeNames,
  specificationLines,
} from './compare-words';
import { inUnit, moneyOf } from './panel-money';
import {
  exampleFit,
  exampleLogFit,
  exampleLogResult,
  examplePanelVersion,
  exampleResult,
} from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('two fits beside each other', () => {
  const a = { reply: exampleFit, result: exampleResult };
  const b = {
    reply: {
      ...exampleFit,
      fit: { ...exampleFit.fit, hash: '2c85db00', slopes: 'classical' as const },
      peerGroup: { ...exampleFit.peerGroup, number: 3 },
    },
    result: {
      ...exampleResult,
      standing: null,
      members: ['Velmara', 'Sarvane', 'Zethorin'],
      slopes: [...exampleResult.slopes, { ...exampleResult.slopes[0], name: 'employees' }],
    },
  };
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  it('marks what they were not both made from', () => {
    const different = specificationLines(a, b).filter(({ isSame }) => !isSame);
    expect(different.map(({ label }) => label)).toEqual([
      'Peer group',
      'Regressors',
      'Slope intervals',
    ]);
    expect(specificationLines(a, a).every(({ isSame }) => isSame)).toBeTrue();
  });

  it('names members that only one of them has', () => {
    expect(memberDifference(a.result, b.result)).toEqual({
      onlyA: ['Kesdrin'],
      onlyB: ['Zethorin'],
      both: 2,
    });
  });

  it('says both standings and the cause in one sentence', () => {
    expect(comparisonFinding(a, b, numbers)).toBe(
      'Standing 1,810 (1,170 to 2,450) under fit 6f3a91, none under fit 2c85db: they differ in peer group, regressors and slope intervals',
    );
  });

  it('writes a percentage beside an amount, and says why no scale holds both', () => {
    const inLogs: FinishedFit = { reply: exampleLogFit, result: exampleLogResult };
    expect(comparisonFinding(a, inLogs, numbers)).toContain(
      'Standing 1,810 (1,170 to 2,450) under fit 6f3a91, 34.2 % (12.0 to 60.3 %) under fit a41b7c',
    );
    expect(incomparableReason(a, inLogs)).toContain('not comparable');
    expect(incomparableReason(a, a)).toBe('');
    const swedish = {
      ...a,
      reply: { ...a.reply, panelVersion: { ...examplePanelVersion, currency: 'SEK' } },
    };
    expect(incomparableReason(a, swedish)).toContain('different currencies');
  });

  it('lists the slopes of either once', () => {
    expect(slopeNames(a.result, b.result)).toEqual(['capex', 'equity', 'employees']);
  });

  it('brings panels of unlike units onto one scale, and names another currency', () => {
    const value = { estimate: 2_000, low: 1_000, high: null };
    expect(inUnit(value, 'thousands', 'millions')).toEqual({ estimate: 2, low: 1, high: null });
    const other = { ...examplePanelVersion, currency: 'SEK', unit: 'thousands' as const };
    expect(moneyOf({ ...value, high: 3_000 }, other, numbers)).toBe('SEK 2.000 (1.000 to 3.000)');
  });
});
