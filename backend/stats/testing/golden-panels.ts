import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { fitPanel, type FitResult, type PanelColumns, type Specification } from '../index';

const folder = new URL('../golden/', import.meta.url);

export const plainSpecification: Specification = {
  effects: 'company',
  form: 'levels',
  lag: 0,
  slopes: 'cr2',
  confidence: 0.95,
  seed: null,
};

export function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** A golden file's JSON. Its shape is the caller's to know. */
export function goldenJson<Shape>(file: string): Shape {
  return JSON.parse(readFileSync(new URL(file, folder), 'utf8')) as Shape;
}

/** A golden CSV as records; the golden files hold neither quoted commas nor line ends inside quotes. */
export function goldenRows(file: string): Record<string, string>[] {
  const [header, ...lines] = readFileSync(new URL(file, folder), 'utf8')
    .trim()
    .split(/\r?\n/u)
    .map((line) => line.split(',').map((cell) => cell.replaceAll('"', '')));
  return lines.map((cells) =>
    Object.fromEntries(header.map((name, index) => [name, cells[index]])),
  );
}

/** A golden panel as columns for a fit. */
export function goldenPanel(
  file: string,
  outcome: string,
  regressors: readonly string[],
): PanelColumns {
  const rows = goldenRows(file);
  return panelOf(
    rows.map((row) => ({
      company: row['company'],
      year: Number(row['year']),
      outcome: Number(row[outcome]),
      regressors: regressors.map((name) => Number(row[name])),
    })),
    { outcome, regressors },
  );
}

export interface PanelRow {
  readonly company: string;
  readonly year: number;
  readonly outcome: number;
  readonly regressors: readonly number[];
}

/** Columns from rows; row i stands on line i + 2 of an imagined file. */
export function panelOf(
  rows: readonly PanelRow[],
  names: { readonly outcome: string; readonly regressors: readonly string[] },
): PanelColumns {
  const companies = [...new Set(rows.map(({ company }) => company))];
  return {
    companies,
    company: Int32Array.from(rows, ({ company }) => companies.indexOf(company)),
    year: Int32Array.from(rows, ({ year }) => year),
    outcome: { name: names.outcome, values: Float64Array.from(rows, (row) => row.outcome) },
    regressors: names.regressors.map((name, k) => ({
      name,
      values: Float64Array.from(rows, (row) => row.regressors[k]),
    })),
    fileRow: Int32Array.from(rows, (_, index) => index + 2),
  };
}

/** A fit under the plain specification unless told otherwise. */
export function fitOf(
  data: PanelColumns,
  own: string | null = null,
  specification: Partial<Specification> = {},
  members?: readonly string[],
): FitResult {
  return fitPanel(data, { ...plainSpecification, ...specification }, own, members, { sha256 });
}
