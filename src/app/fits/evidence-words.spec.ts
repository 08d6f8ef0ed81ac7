import type { NumberFormat } from '../ui/number-format';
import {
  driftFinding,
  poolabilityCaution,
  poolabilityText,
  warningRemarks,
} from './evidence-words';
import { exampleLogResult, exampleResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('evidence in words', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  it('keeps company levels where one line is ruled out, and says what each explains', () => {
    expect(poolabilityText(exampleResult, numbers)).toBe(
      'No. Company levels differ, so each company keeps its own. One pooled line explains 75.3 %, company levels with common slopes 96.3 %.',
    );
  });

  it('does not call companies equal where one line is not ruled out', () => {
    const poolability = { ...exampleResult.poolability, pValue: 0.2 };
    expect(poolabilityText({ ...exampleResult, poolability }, numbers)).toMatch(
      /^The data do not rule it out/,
    );
  });

  it('gives the reason where the test has no p-value', () => {
    const poolability = { ...exampleResult.poolability, pValue: null, pValueReason: 'perfect fit' };
    expect(poolabilityText({ ...exampleResult, poolability }, numbers)).toMatch(
      /^Not decided: perfect fit\./,
    );
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
    expect(poolabilityText(exampleLogResult, numbers)).toContain(
      'company levels and year effects with common slopes 96.3 %',
    );
  });

  it('says every warning, and that there is none', () => {
    expect(warningRemarks(exampleResult).map(({ kind }) => kind)).toEqual(['fine']);
    const warnings = [{ code: 'few-years' as const, detail: 'Only 6 fiscal years.' }];
    expect(warningRemarks({ warnings })).toEqual([
      { kind: 'caution', text: 'Only 6 fiscal years.' },
    ]);
  });
});
