import type { NumberFormat } from '../ui/number-format';
import { driftFinding, poolabilityCaution, warningRemarks } from './evidence-words';
import { exampleLogResult, exampleResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('evidence in words', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  it('tells a drift from none by its interval', () => {
    const drift = { estimate: 84, standardError: 30, low: 12, high: 156, pValue: 0.03 };
    expect(driftFinding(exampleResult, 'Velmara', numbers)).toBe(
      'No clear drift in the gap to peers',
    );
    expect(driftFinding({ ...exampleResult, drift }, 'Velmara', numbers)).toBe(
      'Velmara has gained on its peers by 84.0 a year',
    );
    expect(
      driftFinding(
        { ...exampleResult, drift: { ...drift, estimate: -84, low: -156, high: -12 } },
        'Velmara',
        numbers,
      ),
    ).toBe('Velmara has lost ground to its peers by 84.0 a year');
    expect(driftFinding({ ...exampleResult, drift: null }, 'Velmara', numbers)).toBe(
      'The gap of Velmara to its peers, year by year',
    );
  });

  it('gives the drift of a fit in logs as a percentage', () => {
    expect(driftFinding(exampleLogResult, 'Velmara', numbers)).toBe(
      'Velmara has gained on its peers by 2.0 % a year',
    );
  });

  it('names what the test of company levels is against where year effects are there', () => {
    expect(poolabilityCaution(exampleResult)).toBe(
      'The test assumes errors that do not persist from year to year.',
    );
    expect(poolabilityCaution(exampleLogResult)).toContain('against year effects alone');
  });

  it('says every warning, and that there is none', () => {
    expect(warningRemarks(exampleResult).map(({ kind }) => kind)).toEqual(['fine']);
    const warnings = [{ code: 'few-years' as const, detail: 'Only 6 fiscal years.' }];
    expect(warningRemarks({ warnings })).toEqual([
      { kind: 'caution', text: 'Only 6 fiscal years.' },
    ]);
  });
});
