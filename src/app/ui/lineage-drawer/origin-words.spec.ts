import type { CellOrigin, LineageReply } from '@contract';
import { originLines } from './origin-words';
import { standingLineage } from './testing/standing-lineage';

const plain: CellOrigin['conversion'] = {
  currency: null,
  rate: null,
  rateKind: null,
  unit: null,
  priceIndex: null,
};

function wordsOf(origin: CellOrigin | null): readonly string[] {
  const { cells } = standingLineage;
  const [row] = cells.rows;
  const lineage: LineageReply = {
    ...standingLineage,
    cells: { ...cells, rows: [{ ...row, origins: [origin] }] },
  };
  return originLines(lineage).map(({ place, words }) => `${place}. ${words}`);
}

describe('what the lineage says of cells that differ from the file', () => {
  const place = `Velmara FY2024 ${standingLineage.cells.columns[0].name}`;

  it('says nothing of a cell that is as the file has it', () => {
    expect(wordsOf(null)).toEqual([]);
    expect(wordsOf({ corrected: null, conversion: plain })).toEqual([]);
  });

  it('tells currency, rate and which rate it is', () => {
    const conversion = { ...plain, currency: 'USD', rate: 0.95, rateKind: 'year-end' as const };
    expect(wordsOf({ corrected: null, conversion })).toEqual([
      `${place}. Converted: USD at 0.95, the year-end rate.`,
    ]);
  });

  it('tells every step of a conversion', () => {
    const conversion = {
      currency: 'USD',
      rate: 0.9,
      rateKind: 'average' as const,
      unit: 'thousands' as const,
      priceIndex: { year: 104.2, baseYear: 2020, base: 100 },
    };
    expect(wordsOf({ corrected: null, conversion })).toEqual([
      `${place}. Converted: USD at 0.9, the year’s average rate, thousands into millions and prices at index 104.2 into those of 2020, index 100.`,
    ]);
  });

  it('tells who corrected a cell, why, by which source, and what it held', () => {
    const corrected = {
      by: 'M. Oduya',
      at: '2026-11-12T09:30:00.000Z',
      reason: 'A digit was lost',
      source: 'Annual report, p. 81',
      before: 412,
    };
    expect(wordsOf({ corrected, conversion: null })).toEqual([
      `${place}. Corrected from 412 by M. Oduya: A digit was lost. Source: Annual report, p. 81.`,
    ]);
  });
});
