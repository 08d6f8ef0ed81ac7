import type { PredictionBasis } from '../stats/prediction';
import { copyOntoFit } from './copy-onto-fit';
import { type PlanReading, typedByHand, usualOutlook } from './plan-reading';

type Basis = Pick<PredictionBasis, 'company' | 'regressors' | 'confidence' | 'held' | 'last'>;

function basis(lastYear: number, regressors: readonly string[], held: readonly number[]) {
  const found: Basis = {
    company: 'Velmara',
    regressors,
    confidence: 0.95,
    held,
    last: { year: lastYear, fileRow: 2, actual: 1, fitted: 1, residual: 0, regressors: held },
  };
  return found as PredictionBasis;
}

const outlook = usualOutlook({ confidence: 0.95 });
const hold = { rule: { kind: 'hold' } as const, moves: [] };

function reading(years: readonly number[], values: readonly number[]): PlanReading {
  return {
    plan: years.map((year) => ({ year, values })),
    outlook,
    rules: values.map(() => hold),
    uncertainty: { seed: 1, ranges: years.map(() => values.map(() => ({ low: 0, high: 99 }))) },
  };
}

describe('copyOntoFit', () => {
  it('drops years that the new fit has observed and keeps the amounts of the others', () => {
    const source = reading([2025, 2026, 2027], [10, 20]);
    const onto = basis(2025, ['capex', 'equity'], [11, 21]);
    const copied = copyOntoFit(source, basis(2024, ['capex', 'equity'], [10, 20]), onto);
    expect(copied.reading.plan).toEqual([
      { year: 2026, values: [10, 20] },
      { year: 2027, values: [10, 20] },
    ]);
    expect(copied.changes.droppedYears).toEqual([2025]);
    // Holding the new last values would give 11 and 21: the amounts stay, the rules do not.
    expect(copied.changes.droppedRules).toEqual(['capex', 'equity']);
    expect(copied.reading.rules).toEqual([typedByHand, typedByHand]);
    expect(copied.reading.uncertainty?.ranges.length).toBe(2);
  });

  it('holds a regressor that the plan never had and names the one the fit does not have', () => {
    const source = reading([2025], [10, 20]);
    const onto = basis(2024, ['equity', 'staff'], [20, 300]);
    const copied = copyOntoFit(source, basis(2024, ['capex', 'equity'], [10, 20]), onto);
    expect(copied.reading.plan).toEqual([{ year: 2025, values: [20, 300] }]);
    expect(copied.changes.heldRegressors).toEqual(['staff']);
    expect(copied.changes.droppedRegressors).toEqual(['capex']);
    expect(copied.changes.droppedRules).toEqual([]);
    expect(copied.reading.rules).toEqual([hold, typedByHand]);
    expect(copied.reading.uncertainty?.ranges).toEqual([[{ low: 0, high: 99 }, null]]);
  });

  it('fills years between the fit’s last one and the plan’s first with what was last observed', () => {
    const copied = copyOntoFit(
      reading([2026], [10, 20]),
      basis(2025, ['capex', 'equity'], [10, 20]),
      basis(2024, ['capex', 'equity'], [9, 19]),
    );
    expect(copied.reading.plan).toEqual([
      { year: 2025, values: [9, 19] },
      { year: 2026, values: [10, 20] },
    ]);
    expect(copied.changes.addedYears).toEqual([2025]);
  });

  it('refuses a plan whose years are all observed, and one that lies too far ahead', () => {
    const from = basis(2023, ['capex', 'equity'], [10, 20]);
    const later = basis(2026, ['capex', 'equity'], [10, 20]);
    expect(() => copyOntoFit(reading([2024], [10, 20]), from, later)).toThrowError(
      /Every planned year is observed by now/,
    );
    const early = basis(2018, ['capex', 'equity'], [10, 20]);
    expect(() => copyOntoFit(reading([2024], [10, 20]), from, early)).toThrowError(
      /6 years after 2018/,
    );
  });
});
