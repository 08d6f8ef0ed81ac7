import { TestBed } from '@angular/core/testing';
import type { PredictionBasis } from '@prediction';
import { NumberFormat } from '../../ui/number-format';
import { usualOutlook } from '../../ui/plan/asked-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { sensitivityFinding, sensitivityRows } from './sensitivity-rows';

const read = { year: 2026, regressors: [110, 1000] };
const spread: PredictionBasis = {
  ...planBasis,
  peerSpread: [
    { low: 50, high: 300 },
    { low: 900, high: 1100 },
  ],
};

describe('rows of the sensitivity', () => {
  beforeEach(() => TestBed.inject(NumberFormat).unit.set('units'));

  const rows = (basis: PredictionBasis) =>
    sensitivityRows(
      basis,
      read,
      usualOutlook(basis),
      { labels: ['capex', 'book equity'], numbers: TestBed.inject(NumberFormat) },
      tQuantile,
    );

  it('put the input that moves most first, at the peers’ percentiles', () => {
    const found = rows(spread);
    // Capex: 2 × (300 − 50) = 500; book equity: 0.5 × 200 = 100. Level 2,700 at 100 and 1,000.
    expect(found.rows?.map(({ name, low, high }) => [name, low.at, high.at])).toEqual([
      ['Capex', '50.0', '300.0'],
      ['Book equity', '900', '1,100'],
    ]);
    expect(found.rows?.[0].low.expected?.estimate).toBe(2600);
    expect(found.rows?.[0].high.expected?.estimate).toBe(3100);
  });

  it('say in words where an end leaves the familiar range', () => {
    const [capex] = rows(spread).rows!;
    expect(capex.low.remark).toBe('');
    expect(capex.high.remark).toBe('outside the familiar range');
  });

  it('are none where the fit has no spread of its peers, and say why', () => {
    const found = rows(planBasis);
    expect(found.rows).toBeNull();
    expect('reason' in found && found.reason).toContain('run it again');
  });

  it('have a finding in words', () => {
    expect(sensitivityFinding(rows(spread).rows!, 2026, TestBed.inject(NumberFormat))).toBe(
      'Capex moves the expected value of FY2026 most: 2,600 at the peers’ 10th percentile, 3,100 at their 90th',
    );
  });
});
