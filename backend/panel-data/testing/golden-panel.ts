import { readFileSync } from 'node:fs';
import type { PanelCells } from '../panel-cells';

const goldenFolder = new URL('../../stats/golden/', import.meta.url);

/** A file of the golden panels: market value is its column `value`, capex `inv`, book equity `capital`. */
export function goldenPanel(name: string): PanelCells {
  const [header, ...lines] = readFileSync(new URL(`${name}.csv`, goldenFolder), 'utf8')
    .trim()
    .split(/\r?\n/)
    .map((line) => line.split(',').map((cell) => cell.replaceAll('"', '')));
  const at = (column: string): number => header.indexOf(column);
  const companies = [...new Set(lines.map((cells) => cells[at('company')]))];
  const numbers = (column: string): Float64Array =>
    Float64Array.from(lines, (cells) => Number(cells[at(column)]));
  return {
    companies,
    company: Int32Array.from(lines, (cells) => companies.indexOf(cells[at('company')])),
    year: Int32Array.from(numbers('year')),
    columns: modelColumns,
    values: [numbers('value'), numbers('inv'), numbers('capital')],
  };
}

export const modelColumns: PanelCells['columns'] = [
  { name: 'Market value', role: 'marketValue' },
  { name: 'Capex', role: 'capex' },
  { name: 'Book equity', role: 'bookEquity' },
];

/** A panel from rows of company, year, market value, capex, book equity; NaN for a missing cell. */
export function panelOf(
  rows: readonly (readonly [string, number, number, number, number])[],
): PanelCells {
  const companies = [...new Set(rows.map(([company]) => company))];
  return {
    companies,
    company: rows.map(([company]) => companies.indexOf(company)),
    year: rows.map(([, year]) => year),
    columns: modelColumns,
    values: [2, 3, 4].map((cell) => rows.map((row) => Number(row[cell]))),
  };
}

type GoldenColumn = 'marketValue' | 'capex' | 'bookEquity';

interface GoldenOutlier {
  readonly company: string;
  readonly year: number;
  readonly column: string;
  readonly score: number;
}
interface GoldenWindow {
  readonly firstYear: number;
  readonly lastYear: number;
  readonly companies: readonly string[];
}
interface GoldenDistance {
  readonly company: string;
  readonly distance: number;
  readonly parts: readonly number[];
}

/** Made by tools/reference/panel_data.R: R with robustbase; its header tells the definitions. */
export interface GoldenPanelData {
  readonly jumps: Readonly<
    Record<
      'grunfeld10' | 'grunfeld11',
      readonly (GoldenOutlier & { readonly ratio: number; readonly usualRatio: number })[]
    >
  >;
  readonly peerOutliers: Readonly<Record<'grunfeld10' | 'grunfeld11', readonly GoldenOutlier[]>>;
  readonly duplicates: {
    /** Figures of one company that stand in another's row of the year as well. */
    readonly copies: readonly {
      readonly year: number;
      readonly from: string;
      readonly to: string;
      readonly columns: readonly GoldenColumn[];
    }[];
    readonly emptied: readonly {
      readonly company: string;
      readonly year: number;
      readonly column: GoldenColumn;
    }[];
    readonly found: readonly {
      readonly company: string;
      readonly year: number;
      readonly other: string;
      readonly more: number;
      readonly columns: readonly GoldenColumn[];
    }[];
  };
  readonly nearNames: {
    readonly spans: readonly {
      readonly company: string;
      readonly first: number;
      readonly last: number;
    }[];
    readonly pairs: readonly (readonly [string, string])[];
  };
  readonly windows: Readonly<
    Record<'balanced' | 'unbalanced' | 'unbalancedWithF07' | 'unbalancedWithF02', GoldenWindow>
  >;
  readonly measures: readonly {
    readonly company: string;
    readonly logMarketValue: number;
    readonly logBookEquity: number;
    readonly capexToBookEquity: number;
    readonly growth: number;
    readonly volatility: number;
  }[];
  readonly distances: {
    readonly own: string;
    readonly classical: readonly GoldenDistance[];
    readonly robust: readonly GoldenDistance[];
  };
  readonly scatter: {
    readonly points: readonly (readonly number[])[];
    readonly classical: readonly (readonly number[])[];
    readonly robust: readonly (readonly number[])[];
  };
}

export const goldenPanelData = JSON.parse(
  readFileSync(new URL('../golden/panel-data.json', import.meta.url), 'utf8'),
) as GoldenPanelData;
