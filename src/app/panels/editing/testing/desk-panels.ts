import type { PanelVersionReply } from '@contract';
import { exampleId, panelVersion } from '../../../api/testing/panel-version';

export const id = exampleId;

export const version = panelVersion({ number: 4, companies: 2, rows: 4, lastYear: 2012 });

export const small: PanelVersionReply = {
  version,
  companyHeader: 'firm',
  yearHeader: 'fy',
  columns: [
    { name: 'mv', role: 'marketValue' },
    { name: 'inv', role: 'capex' },
    { name: 'equity', role: 'bookEquity' },
  ],
  rows: {
    fileRow: [2, 3, 4, 5],
    company: ['Sarvane', 'Sarvane', 'Velmara', 'Velmara'],
    year: [2010, 2011, 2010, 2011],
    values: [
      [100.125, 110, 900, 910],
      [null, 11, 90, 91],
      [50, 55, 450, 460],
    ],
  },
};

/** 60 rows of 21 figures with awkward digits. */
export function wide(): PanelVersionReply {
  const rows = Array.from({ length: 60 }, (_, row) => row);
  const columns = Array.from({ length: 21 }, (_, column) => column);
  return {
    ...small,
    columns: columns.map((column) => ({
      name: `c${column}`,
      role: column === 0 ? 'capex' : 'other',
    })),
    rows: {
      fileRow: rows.map((row) => row + 2),
      company: rows.map((row) => `Company ${String(Math.floor(row / 10)).padStart(2, '0')}`),
      year: rows.map((row) => 2000 + (row % 10)),
      values: columns.map((column) =>
        rows.map((row) => ((row * 7 + column) % 13 === 0 ? null : (row - 30) / (column + 3))),
      ),
    },
  };
}
